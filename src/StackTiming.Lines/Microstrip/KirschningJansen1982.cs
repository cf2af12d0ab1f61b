namespace StackTiming.Lines.Microstrip;

/// <summary>
/// How the effective permittivity of microstrip rises with frequency as the field is drawn into the dielectric. M. Kirschning, R. H. Jansen, "Accurate model for effective
/// dielectric constant of microstrip with validity up to millimetre-wave frequencies", Electronics Letters 18, 1982, pp. 272–273.
/// Valid for 1 ≤ ε_r ≤ 20, 0.1 ≤ w/h ≤ 100, 0 ≤ h/λ₀ ≤ 0.13; stated accuracy 0.6 %.
/// </summary>
public static class KirschningJansen1982
{
    /// <summary>Effective permittivity at a frequency.</summary>
    /// <param name="epsEffStatic">Quasi-static effective permittivity.</param>
    /// <param name="dk">Relative permittivity of the dielectric.</param>
    /// <param name="widthMetres">Width w, metres.</param>
    /// <param name="heightMetres">Height h, metres.</param>
    /// <param name="hertz">Frequency, Hz.</param>
    public static double EpsEff(double epsEffStatic, double dk, double widthMetres, double heightMetres, double hertz)
    {
        var u = widthMetres / heightMetres;
        // The paper's frequency-thickness product in GHz·cm.
        var fh = hertz * 1e-9 * heightMetres * 1e2;
        var p1 = 0.27488 + (0.6315 + 0.525 / Math.Pow(1 + 0.157 * fh, 20)) * u - 0.065683 * Math.Exp(-8.7513 * u);
        var p2 = 0.33622 * (1 - Math.Exp(-0.03442 * dk));
        var p3 = 0.0363 * Math.Exp(-4.6 * u) * (1 - Math.Exp(-Math.Pow(fh / 3.87, 4.97)));
        var p4 = 1 + 2.751 * (1 - Math.Exp(-Math.Pow(dk / 15.916, 8)));
        var p = p1 * p2 * Math.Pow((0.1844 + p3 * p4) * 10 * fh, 1.5763);
        return dk - (dk - epsEffStatic) / (1 + p);
    }

    /// <summary>True inside the validity range.</summary>
    /// <param name="dk">Relative permittivity.</param>
    /// <param name="widthMetres">Width, metres.</param>
    /// <param name="heightMetres">Height, metres.</param>
    /// <param name="hertz">Frequency, Hz.</param>
    public static bool IsValid(double dk, double widthMetres, double heightMetres, double hertz) =>
        dk is >= 1 and <= 20 && widthMetres / heightMetres is >= 0.1 and <= 100 && heightMetres * hertz / Constants.Vacuum.SpeedOfLight <= 0.13;
}
