using StackTiming.Lines.Coupled;
using StackTiming.Lines.Layered;
using StackTiming.Lines.Microstrip;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using Xunit;

namespace StackTiming.Lines.Tests.Coupled;

public sealed class KirschningJansen1984Tests
{
    /// <summary>
    /// No reference set has bare thin pairs, so the judge is the variational method, which the references hold to 0.5 % on every pair; the two
    /// papers share nothing.
    /// </summary>
    [Theory]
    [InlineData(0.5, 0.3, 4.2)]
    [InlineData(1, 0.5, 4.2)]
    [InlineData(1, 1.5, 3.7)]
    [InlineData(2, 0.5, 4.2)]
    [InlineData(2, 2, 9.8)]
    public void Thin_pairs_agree_with_the_variational_method(double widthOverHeight, double gapOverHeight, double dk)
    {
        const double h = 1e-4;
        double w = widthOverHeight * h, pitch = w + gapOverHeight * h;
        var a = new SectionConductor("a", false, -0.5 * pitch, w, w, 0, h, true);
        var section = new CrossSection(
            [new DielectricSlab(new SectionDielectric("laminate", dk, 0), 0, h)], 0, null, [a, a with { Name = "b", CentreMetres = 0.5 * pitch }],
            null, null, new SectionMetal(1.7e-8, 0));

        var modes = PairModes.Of(new Yamashita1968().Calculate(section));
        var (odd, even) = KirschningJansen1984.Thin(w, h, gapOverHeight * h, dk);

        Assert.Equal(1, odd.Z0Ohms / modes.ZOddOhms!.Value, 0.012);
        Assert.Equal(1, even.Z0Ohms / modes.ZEvenOhms!.Value, 0.012);
        Assert.Equal(1, odd.EpsEff / modes.EpsEffOdd!.Value, 0.012);
        Assert.Equal(1, even.EpsEff / modes.EpsEffEven!.Value, 0.012);
    }

    [Fact]
    public void Far_traces_are_single_lines()
    {
        var (odd, even) = KirschningJansen1984.Thin(1, 1, 10, 4.2);
        var alone = HammerstadJensen1980.Line(1, 1, 0, 4.2);

        Assert.Equal(1, odd.Z0Ohms / alone.Z0Ohms, 0.01);
        Assert.Equal(1, even.Z0Ohms / alone.Z0Ohms, 0.01);
        Assert.Equal(1, odd.EpsEff / alone.EpsEff, 0.01);
    }
}
