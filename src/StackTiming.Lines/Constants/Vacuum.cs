namespace StackTiming.Lines.Constants;

/// <summary>The constants of empty space (CODATA 2018; the speed of light is exact by the definition of the metre).</summary>
public static class Vacuum
{
    /// <summary>Speed of light, m/s.</summary>
    public const double SpeedOfLight = 299_792_458.0;

    /// <summary>Magnetic constant, H/m: 4π·10⁻⁷, which differs from the measured value by less than 10⁻⁹.</summary>
    public const double Mu0 = 4e-7 * Math.PI;

    /// <summary>Electric constant, F/m.</summary>
    public const double Epsilon0 = 1 / (Mu0 * SpeedOfLight * SpeedOfLight);

    /// <summary>Wave impedance, ohm.</summary>
    public const double Impedance = Mu0 * SpeedOfLight;
}
