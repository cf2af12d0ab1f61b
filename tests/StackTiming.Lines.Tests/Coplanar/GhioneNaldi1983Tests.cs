using StackTiming.Lines.Coplanar;
using StackTiming.Lines.Layered;
using StackTiming.Lines.Sections;
using Xunit;

namespace StackTiming.Lines.Tests.Coplanar;

public sealed class GhioneNaldi1983Tests
{
    [Fact]
    public void Far_plane_leaves_the_line_of_Wen_1969()
    {
        var (z0, epsEff) = GhioneNaldi1983.Line(0.2, 0.1, 200, 4.3);

        Assert.Equal(1, z0 / Wen1969.Z0Ohms(0.2, 0.1, 4.3), 1e-4);
        Assert.Equal(2.65, epsEff, 3);
    }

    /// <summary>Judged by the variational method on thin lines, where both should agree; the magnetic wall in the slots is good where the slots are narrow.</summary>
    [Theory]
    [InlineData(0.2, 0.1, 0.36)]
    [InlineData(0.3, 0.1, 0.2)]
    public void Thin_lines_agree_with_the_variational_method(double widthMillimetres, double gapMillimetres, double heightMillimetres)
    {
        double w = widthMillimetres * 1e-3, g = gapMillimetres * 1e-3, h = heightMillimetres * 1e-3, pour = 3e-3;
        var trace = new SectionConductor("a", false, 0, w, w, 0, h, true);
        var left = new SectionConductor("left", true, -(0.5 * w + g + 0.5 * pour), pour, pour, 0, h, true);
        var section = new CrossSection(
            [new DielectricSlab(new SectionDielectric("laminate", 4.3, 0), 0, h)], 0, null,
            [trace, left, left with { Name = "right", CentreMetres = -left.CentreMetres }], null, null, new SectionMetal(1.7e-8, 0));

        var judged = new Yamashita1968().Calculate(section);
        var solution = new GhioneNaldi1983().Calculate(section);

        Assert.Empty(solution.Warnings);
        Assert.Equal(1, solution.Z0Ohms / judged.Z0Ohms, 0.02);
        Assert.Equal(1, solution.EpsEff / judged.EpsEff, 0.02);
    }
}
