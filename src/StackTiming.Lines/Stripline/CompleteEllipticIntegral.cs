namespace StackTiming.Lines.Stripline;

/// <summary>
/// The complete elliptic integral of the first kind K by Gauss's arithmetic-geometric mean, which doubles the number of correct digits with
/// every step (M. Abramowitz, I. A. Stegun, Handbook of Mathematical Functions, 1964, section 17.6).
/// </summary>
public static class CompleteEllipticIntegral
{
    /// <summary>K(k′)/K(k), the ratio that conformal maps of strips give, from both moduli so that neither end loses digits.</summary>
    /// <param name="k">Modulus, above 0.</param>
    /// <param name="complement">Complementary modulus √(1−k²), above 0.</param>
    public static double ComplementRatio(double k, double complement) => Mean(complement) / Mean(k);

    /// <summary>K as a function of the complementary modulus k′ = √(1−k²).</summary>
    /// <param name="complement">Complementary modulus, above 0.</param>
    public static double OfComplement(double complement) => 0.5 * Math.PI / Mean(complement);

    private static double Mean(double b)
    {
        var a = 1.0;
        while (Math.Abs(a - b) > 1e-8 * a)
            (a, b) = (0.5 * (a + b), Math.Sqrt(a * b));
        return 0.5 * (a + b);
    }
}
