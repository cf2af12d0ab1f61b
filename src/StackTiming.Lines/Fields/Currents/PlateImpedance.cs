using System.Numerics;

namespace StackTiming.Lines.Fields.Currents;

/// <summary>
/// Internal impedance of one conductor between direct current and skin effect: R·(a·f(q₁) + (1-a)·f(q₂)) with f(q) = q·coth(q), q =
/// √(jωτ), the function of a plate with current on both faces (S. Ramo, J. R. Whinnery and T. Van Duzer, Fields and Waves in
/// Communication Electronics, 3rd ed. 1994, ch. 3.17): the current first crowds from the middle to the sides of a flat trace and, at a
/// higher frequency, from the inside to the faces. The two times follow from the inductance at direct current and from the skin-effect
/// limit, so that both ends are exact; in between, a = 0.3 stays within 8 % of filaments (W. T. Weeks, L. L. Wu, M. F. McAllister and A.
/// Singh, Resistive and inductive skin effect in rectangular conductors, IBM J. Res. Dev. 23, 1979) for widths of two to nine
/// thicknesses. Being one analytic function its resistance and inductance are causal together.
/// </summary>
internal sealed class PlateImpedance
{
    private const double SidesShare = 0.3;

    private readonly double direct;
    private readonly double sides;
    private readonly double faces;

    /// <param name="directOhmPerMetre">Resistance to direct current.</param>
    /// <param name="inductanceHenryPerMetre">Internal inductance at direct current.</param>
    /// <param name="skinFactor">Skin-effect limit of the impedance over √(jω): spread times √(μ0 ρ).</param>
    public PlateImpedance(double directOhmPerMetre, double inductanceHenryPerMetre, double skinFactor)
    {
        direct = directOhmPerMetre;
        // With x and y the roots of the times: a x + b y = K/R and (a x² + b y²)/3 = L/R.
        var (mean, square) = (skinFactor / direct, 3 * inductanceHenryPerMetre / direct);
        var spread = Math.Sqrt(Math.Max(0, square - mean * mean));
        sides = mean + spread * Math.Sqrt((1 - SidesShare) / SidesShare);
        faces = mean - spread * Math.Sqrt(SidesShare / (1 - SidesShare));
        if (faces < 0)
            (sides, faces) = (mean / SidesShare, 0);
    }

    /// <summary>Impedance in ohm per metre at an angular frequency.</summary>
    public Complex At(double omega)
    {
        var root = Complex.Sqrt(Complex.ImaginaryOne * omega);
        return direct * (SidesShare * Plate(root * sides) + (1 - SidesShare) * Plate(root * faces));
    }

    private static Complex Plate(Complex q) => q.Magnitude < 1e-3 ? 1 + q * q / 3 : q / Complex.Tanh(q);
}
