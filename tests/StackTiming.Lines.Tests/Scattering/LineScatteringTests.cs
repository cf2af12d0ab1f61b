using System.Collections.Immutable;
using System.Numerics;
using MathNet.Numerics.LinearAlgebra;
using StackTiming.Lines.Loss;
using StackTiming.Lines.Scattering;
using Xunit;

namespace StackTiming.Lines.Tests.Scattering;

public sealed class LineScatteringTests
{
    [Fact]
    public void Matched_lossless_line_reflects_nothing_and_turns_the_phase_by_its_delay()
    {
        const double z = 50, delay = 6e-9, length = 0.05, hertz = 3.1e9;
        var s = LineScattering.Of(Single(hertz, 0, z * delay, 0, delay / z), length, z);

        Assert.Equal(0, s[0, 0].Magnitude, 1e-12);
        Assert.Equal(1, s[1, 0].Magnitude, 1e-12);
        var turned = Complex.FromPolarCoordinates(1, -2 * Math.PI * hertz * delay * length);
        Assert.Equal(0, (s[1, 0] - turned).Magnitude, 1e-11);
    }

    /// <summary>A half wave repeats its load, a quarter wave inverts it: the poles of coth and tanh, where S must stay finite.</summary>
    [Theory]
    [InlineData(0.5, 0)]
    [InlineData(0.25, (100.0 * 100 / 50 - 50) / (100.0 * 100 / 50 + 50))]
    public void Lossless_line_of_a_part_of_a_wave_transforms_the_reference(double waves, double reflection)
    {
        const double z = 100, delay = 5e-9, hertz = 1e9;
        var s = LineScattering.Of(Single(hertz, 0, z * delay, 0, delay / z), waves / (hertz * delay), 50);

        Assert.Equal(0, (s[0, 0] - reflection).Magnitude, 1e-10);
    }

    /// <summary>Low frequencies leave the resistance of the copper between the ports: S11 = R/(R + 2 Z), S21 = 2 Z/(R + 2 Z).</summary>
    [Fact]
    public void Line_at_almost_no_frequency_is_its_resistance()
    {
        const double resistance = 20, length = 0.5;
        var s = LineScattering.Of(Single(1e-3, resistance, 300e-9, 0, 130e-12), length, 50);

        Assert.Equal(10 / 110.0, s[0, 0].Real, 1e-9);
        Assert.Equal(100 / 110.0, s[1, 0].Real, 1e-9);
    }

    [Fact]
    public void Line_of_no_length_joins_its_ports()
    {
        var s = LineScattering.Of(Pair(1e9, 0.3, 0.2), 0, 50);
        for (var i = 0; i < 4; i++)
        {
            for (var j = 0; j < 4; j++)
                Assert.Equal(0, (s[i, j] - (Math.Abs(i - j) == 2 ? 1 : 0)).Magnitude, 1e-12);
        }
    }

    [Fact]
    public void Very_long_line_shows_its_own_impedance_and_passes_nothing()
    {
        const double hertz = 1e9, r = 30, l = 300e-9, g = 0.01, c = 130e-12;
        var s = LineScattering.Of(Single(hertz, r, l, g, c), 1e5, 50);
        var omega = 2 * Math.PI * hertz;
        var z = Complex.Sqrt(new Complex(r, omega * l) / new Complex(g, omega * c));

        Assert.Equal(0, (s[0, 0] - (z - 50) / (z + 50)).Magnitude, 1e-12);
        Assert.Equal(0, s[1, 0].Magnitude, 1e-12);
    }

    /// <summary>
    /// The chain matrix exp([0 Z; Y 0]·length), summed as a power series of a short piece and squared up: another way to the same equations
    /// (unequal signals, unequal loss; and a pair in one dielectric whose modes are equally fast).
    /// </summary>
    [Theory]
    [InlineData(0.3, 0.2)]
    [InlineData(0.25, 0.25)]
    public void Pair_agrees_with_its_chain_matrix(double inductive, double capacitive)
    {
        const double length = 0.12, reference = 42;
        var line = Pair(7e9, inductive, capacitive);
        var s = Matrix<Complex>.Build.DenseOfArray(LineScattering.Of(line, length, reference));

        var chain = Chain(line, length);
        var one = Matrix<Complex>.Build.DenseIdentity(2);
        // V1 = A V2 + B I2, I1 = C V2 + D I2 with I2 flowing out; waves a = (V + R I)/2, b = (V - R I)/2 with currents into the ports.
        var (a, b) = (chain.SubMatrix(0, 2, 0, 2), chain.SubMatrix(0, 2, 2, 2));
        var (c, d) = (chain.SubMatrix(2, 2, 0, 2), chain.SubMatrix(2, 2, 2, 2));
        var voltages = Stack(a, b.Multiply(-1), one, one.Multiply(0));
        var currents = Stack(c, d.Multiply(-1), one.Multiply(0), one).Multiply(reference);
        var expected = (voltages - currents) * (voltages + currents).Inverse();

        Assert.Equal(0, (s - expected).FrobeniusNorm(), 1e-9);
    }

    [Theory]
    [InlineData(1e6)]
    [InlineData(1e9)]
    [InlineData(2e10)]
    public void Pair_with_loss_is_reciprocal_and_passive(double hertz)
    {
        var s = Matrix<Complex>.Build.DenseOfArray(LineScattering.Of(Pair(hertz, 0.3, 0.2), 0.1, 50));

        Assert.Equal(0, (s - s.Transpose()).FrobeniusNorm(), 1e-10);
        Assert.True(s.Svd(false).S[0].Real < 1);
    }

    private static LineAtFrequency Single(double hertz, double r, double l, double g, double c) => new(
        ["a"], hertz, new[,] { { r } }, new[,] { { l } }, new[,] { { g } }, new[,] { { c } }, ImmutableArray<WaveAtFrequency>.Empty, []);

    private static LineAtFrequency Pair(double hertz, double inductive, double capacitive)
    {
        // Equal couplings and LC proportional to the unit matrix make both modes equally fast.
        var equal = inductive == capacitive;
        double l2 = equal ? 300e-9 : 350e-9, c2 = equal ? 130e-12 : 110e-12;
        return new(
            ["a", "b"], hertz,
            new[,] { { 12.0, 0.8 }, { 0.8, equal ? 12.0 : 15.0 } }, new[,] { { 300e-9, inductive * 300e-9 }, { inductive * 300e-9, l2 } },
            new[,] { { 6e-3, -6e-3 * capacitive }, { -6e-3 * capacitive, equal ? 6e-3 : 5e-3 } },
            new[,] { { 130e-12, -capacitive * 130e-12 }, { -capacitive * 130e-12, c2 } },
            ImmutableArray<WaveAtFrequency>.Empty, []);
    }

    private static Matrix<Complex> Chain(LineAtFrequency line, double length)
    {
        const int halvings = 24;
        var omega = 2 * Math.PI * line.FrequencyHertz;
        var rate = Matrix<Complex>.Build.Dense(4, 4);
        for (var i = 0; i < 2; i++)
        {
            for (var j = 0; j < 2; j++)
            {
                rate[i, 2 + j] = new Complex(line.ResistanceOhmPerMetre[i, j], omega * line.InductanceHenryPerMetre[i, j]);
                rate[2 + i, j] = new Complex(line.ConductanceSiemensPerMetre[i, j], omega * line.CapacitanceFaradPerMetre[i, j]);
            }
        }
        var piece = rate * (length / (1 << halvings));
        // exp − 1 is doubled as (2 + x)·x, which keeps the digits of a short piece.
        var grown = piece + 0.5 * piece * piece;
        for (var k = 0; k < halvings; k++)
            grown = 2 * grown + grown * grown;
        return Matrix<Complex>.Build.DenseIdentity(4) + grown;
    }

    private static Matrix<Complex> Stack(Matrix<Complex> a, Matrix<Complex> b, Matrix<Complex> c, Matrix<Complex> d) =>
        a.Append(b).Stack(c.Append(d));
}
