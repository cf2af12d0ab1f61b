namespace StackTiming.Waves.Vias;

/// <summary>
/// Capacitance and inductance of a via from the handbook: H. W. Johnson and M. Graham, "High-Speed Digital Design: A Handbook of Black Magic",
/// Prentice Hall 1993, section 7.3: C = 1.41·εr·T·D1/(D2−D1) pF and L = 5.08·h·(ln(4h/d)+1) nH, lengths in inches. Rules of thumb: the
/// capacitance counts pads all along the barrel, the inductance is that of the bare barrel without a return conductor, so both lie high. Shown as a
/// second opinion beside <see cref="CoaxialBarrel"/>.
/// </summary>
public static class JohnsonGraham1993
{
    private const double Inch = 0.0254;

    /// <summary>Capacitance, F.</summary>
    /// <param name="barrelMetres">Length of the barrel.</param>
    /// <param name="padMetres">Diameter of the pads.</param>
    /// <param name="antipadMetres">Diameter of the clearance in the planes; above the pad's.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static double CapacitanceFarad(double barrelMetres, double padMetres, double antipadMetres, double dk) =>
        1.41e-12 * dk * (barrelMetres / Inch) * padMetres / (antipadMetres - padMetres);

    /// <summary>Inductance, H; 0 for a barrel without length. For barrels longer than a quarter of their diameter.</summary>
    /// <param name="barrelMetres">Length of the barrel.</param>
    /// <param name="drillMetres">Diameter of the barrel.</param>
    public static double InductanceHenry(double barrelMetres, double drillMetres) =>
        barrelMetres <= 0 ? 0 : 5.08e-9 * (barrelMetres / Inch) * (Math.Log(4 * barrelMetres / drillMetres) + 1);
}
