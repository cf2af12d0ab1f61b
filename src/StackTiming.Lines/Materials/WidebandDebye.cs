namespace StackTiming.Lines.Materials;

/// <summary>
/// The wideband Debye model of a laminate: a loss tangent that hardly varies with frequency and a permittivity that falls by the same
/// amount per decade, tied together by causality: ε(f) = ε∞ + Δε/(m₂−m₁) · log₁₀((10^m₂ + jf)/(10^m₁ + jf)), f in hertz.
/// A. R. Djordjević, R. M. Biljić, V. D. Likar-Smiljanić, T. K. Sarkar, "Wideband frequency-domain characterization of FR-4 and time-domain
/// causality", IEEE Trans. EMC 43(4), 2001, pp. 662–667. Valid between the corner frequencies, 1 kHz and 1 THz unless stated otherwise.
/// </summary>
/// <param name="EpsInfinity">Relative permittivity far above the upper corner.</param>
/// <param name="SlopePerNeper">Δε/(ln f₂ − ln f₁): how much the permittivity falls when the frequency rises by a factor of e.</param>
/// <param name="LowerCornerHertz">Lower corner f₁, Hz.</param>
/// <param name="UpperCornerHertz">Upper corner f₂, Hz.</param>
public readonly record struct WidebandDebye(double EpsInfinity, double SlopePerNeper, double LowerCornerHertz, double UpperCornerHertz)
{
    /// <summary>Lower corner where none is stated: 1 kHz.</summary>
    public const double DefaultLowerCornerHertz = 1e3;

    /// <summary>Upper corner where none is stated: 1 THz.</summary>
    public const double DefaultUpperCornerHertz = 1e12;

    /// <summary>Whole fall of the permittivity from below the lower corner to above the upper one.</summary>
    public double DeltaEps => SlopePerNeper * Math.Log(UpperCornerHertz / LowerCornerHertz);

    /// <summary>The model that has the given Dk and Df at one frequency.</summary>
    /// <param name="dk">Relative permittivity there.</param>
    /// <param name="df">Loss tangent there.</param>
    /// <param name="atHertz">The frequency, Hz.</param>
    /// <param name="lowerCornerHertz">Lower corner, Hz.</param>
    /// <param name="upperCornerHertz">Upper corner, Hz.</param>
    public static WidebandDebye Through(
        double dk, double df, double atHertz,
        double lowerCornerHertz = DefaultLowerCornerHertz, double upperCornerHertz = DefaultUpperCornerHertz)
    {
        var (real, minusImaginary) = Shape(atHertz, lowerCornerHertz, upperCornerHertz);
        var slope = dk * df / minusImaginary;
        return new WidebandDebye(dk - slope * real, slope, lowerCornerHertz, upperCornerHertz);
    }

    /// <summary>Relative permittivity at a frequency.</summary>
    /// <param name="hertz">Frequency, Hz; 0 is allowed.</param>
    public double Dk(double hertz) => EpsInfinity + SlopePerNeper * Shape(hertz, LowerCornerHertz, UpperCornerHertz).Real;

    /// <summary>Loss tangent at a frequency.</summary>
    /// <param name="hertz">Frequency, Hz; 0 is allowed.</param>
    public double Df(double hertz)
    {
        var (real, minusImaginary) = Shape(hertz, LowerCornerHertz, UpperCornerHertz);
        return SlopePerNeper * minusImaginary / (EpsInfinity + SlopePerNeper * real);
    }

    /// <summary>Real and negative imaginary part of ln((f₂ + jf)/(f₁ + jf)).</summary>
    private static (double Real, double MinusImaginary) Shape(double f, double f1, double f2) =>
        (0.5 * Math.Log((f2 * f2 + f * f) / (f1 * f1 + f * f)), Math.Atan2(f, f1) - Math.Atan2(f, f2));
}
