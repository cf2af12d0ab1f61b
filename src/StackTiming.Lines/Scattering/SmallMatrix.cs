using System.Numerics;

namespace StackTiming.Lines.Scattering;

/// <summary>A complex matrix of two rows; one signal stands twice on the diagonal.</summary>
internal readonly record struct SmallMatrix(Complex A, Complex B, Complex C, Complex D)
{
    /// <summary>The unit matrix.</summary>
    public static SmallMatrix Identity { get; } = new(1, 0, 0, 1);

    /// <summary>The entry of a row and a column.</summary>
    public Complex this[int row, int column] => (row, column) switch { (0, 0) => A, (0, _) => B, (_, 0) => C, _ => D };

    /// <summary>Real part plus jω times the other matrix.</summary>
    public static SmallMatrix Of(int signals, double[,] real, double[,] imaginaryOverOmega, double omega)
    {
        Complex At(int i, int j) => new(real[i, j], omega * imaginaryOverOmega[i, j]);
        return signals == 1 ? new(At(0, 0), 0, 0, At(0, 0)) : new(At(0, 0), At(0, 1), At(1, 0), At(1, 1));
    }

    /// <summary>The inverse.</summary>
    public SmallMatrix Inverse()
    {
        var det = A * D - B * C;
        return new(D / det, -B / det, -C / det, A / det);
    }

    /// <summary>
    /// Γ = √M, and exp(−Γ·length), as functions of a matrix: f(M) = (f₁ + f₂)/2 + f[λ₁,λ₂]·(M − (λ₁ + λ₂)/2) with the divided
    /// difference f[λ₁,λ₂] in a form that stays exact where both modes are equally fast, as between two planes in one dielectric.
    /// </summary>
    public (SmallMatrix Gamma, SmallMatrix Decay) RootAndDecay(double length)
    {
        var mean = 0.5 * (A + D);
        var half = Complex.Sqrt(0.25 * (A - D) * (A - D) + B * C);
        var (g1, g2) = (Root(mean + half), Root(mean - half));
        var (e1, e2) = (Complex.Exp(-g1 * length), Complex.Exp(-g2 * length));
        var apart = 2 * half / (g1 + g2);
        var slope = -length * Complex.Exp(-0.5 * (g1 + g2) * length) * SinhOverArgument(0.5 * apart * length) / (g1 + g2);
        var deviation = this - mean * Identity;
        return (0.5 * (g1 + g2) * Identity + 1 / (g1 + g2) * deviation, 0.5 * (e1 + e2) * Identity + slope * deviation);
    }

    public static SmallMatrix operator +(SmallMatrix x, SmallMatrix y) => new(x.A + y.A, x.B + y.B, x.C + y.C, x.D + y.D);

    public static SmallMatrix operator -(SmallMatrix x, SmallMatrix y) => new(x.A - y.A, x.B - y.B, x.C - y.C, x.D - y.D);

    public static SmallMatrix operator *(Complex s, SmallMatrix y) => new(s * y.A, s * y.B, s * y.C, s * y.D);

    public static SmallMatrix operator *(SmallMatrix x, SmallMatrix y) =>
        new(x.A * y.A + x.B * y.C, x.A * y.B + x.B * y.D, x.C * y.A + x.D * y.C, x.C * y.B + x.D * y.D);

    // A passive line turns the phase back along its way; rounding must not turn a lossless one round.
    private static Complex Root(Complex square)
    {
        var root = Complex.Sqrt(square);
        return root.Imaginary < 0 ? -root : root;
    }

    private static Complex SinhOverArgument(Complex x) => Complex.Abs(x) < 1e-4 ? 1 + x * x / 6 : Complex.Sinh(x) / x;
}
