using StackTiming.Lines.Constants;

namespace StackTiming.Waves.Vias;

/// <summary>
/// The barrel of a via inside the clearances of closely stacked planes as a coaxial line: inner diameter the hole, outer diameter the
/// clearance. L' = μ0/(2π)·ln(D/d), C' = 2πε0·εr/ln(D/d): the exact constants of the coaxial line (e.g. Ramo, Whinnery and Van Duzer,
/// "Fields and Waves in Communication Electronics", 3rd ed., Wiley 1994, table 5.11b). An idealisation: it takes the return current to flow in the
/// planes' edges all along the barrel, so it is a lower bound of the inductance where no ground via stands near, and of the capacitance where
/// pads lie on layers without a trace.
/// </summary>
public static class CoaxialBarrel
{
    /// <summary>Inductance per metre, H/m.</summary>
    /// <param name="innerMetres">Inner diameter, above zero.</param>
    /// <param name="outerMetres">Outer diameter, above the inner.</param>
    public static double InductancePerMetre(double innerMetres, double outerMetres) =>
        Vacuum.Mu0 / (2 * Math.PI) * Math.Log(outerMetres / innerMetres);

    /// <summary>Capacitance per metre, F/m.</summary>
    /// <param name="innerMetres">Inner diameter, above zero.</param>
    /// <param name="outerMetres">Outer diameter, above the inner.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static double CapacitancePerMetre(double innerMetres, double outerMetres, double dk) =>
        2 * Math.PI * Vacuum.Epsilon0 * dk / Math.Log(outerMetres / innerMetres);

    /// <summary>Characteristic impedance, ohm.</summary>
    /// <param name="innerMetres">Inner diameter, above zero.</param>
    /// <param name="outerMetres">Outer diameter, above the inner.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static double Z0Ohms(double innerMetres, double outerMetres, double dk) =>
        Vacuum.Impedance / (2 * Math.PI * Math.Sqrt(dk)) * Math.Log(outerMetres / innerMetres);
}
