using StackTiming.Waves.Vias;
using Xunit;

namespace StackTiming.Waves.Tests.Vias;

public class ViaBuilderTests
{
    private static readonly ViaBuilder Builder = new(TestBoards.FourLayers(), null);

    private static ViaModel Build(ViaHole hole)
    {
        var model = Builder.Build(hole, out var objection);
        Assert.Equal("", objection);
        return model!;
    }

    private static ViaHole Hole(string from, string to, string first = "", string second = "") => new(from, to, first, second, 0.2e-3, 0.4e-3, 0.65e-3);

    [Theory]
    [InlineData("L1", "L4", 1.52, 0, 0)]
    [InlineData("L4", "L1", 1.52, 0, 0)]
    [InlineData("L1", "L2", 0.24, 0, 1.28)]
    [InlineData("L2", "L3", 1.04, 0.24, 0.24)]
    [InlineData("L4", "L3", 0.24, 1.28, 0)]
    public void Heights_run_from_mid_copper_to_mid_copper_of_the_stack_up(string from, string to, double through, double above, double below)
    {
        var g = Build(Hole(from, to)).Geometry;
        Assert.Equal(through, 1e3 * g.ThroughMetres, 1e-9);
        Assert.Equal(above, 1e3 * g.StubAboveMetres, 1e-9);
        Assert.Equal(below, 1e3 * g.StubBelowMetres, 1e-9);
    }

    [Fact]
    public void A_blind_barrel_has_no_stub()
    {
        var g = Build(Hole("L1", "L2", "L1", "L2")).Geometry;
        Assert.Equal(0, g.StubAboveMetres + g.StubBelowMetres);
        Assert.Equal(0.24e-3, Build(Hole("L1", "L2", "L3", "L1")).Geometry.BarrelMetres - 1.04e-3, 1e-12);
    }

    [Fact]
    public void Permittivity_is_the_mean_along_the_barrel()
    {
        // 0.22 mm of Dk 4 (sheet and half of L1), then copper of L2 filled like the sheet above it.
        Assert.Equal(4, Build(Hole("L1", "L2")).Geometry.DkThrough, 1e-12);
        // From mid L2 to mid L3: half of L2 (Dk 4), 1 mm of Dk 3, half of L3 (Dk 3).
        Assert.Equal((0.02 * 4 + 1.02 * 3) / 1.04, Build(Hole("L2", "L3")).Geometry.DkThrough, 1e-9);
    }

    [Fact]
    public void What_the_list_does_not_state_is_assumed_and_said()
    {
        var model = Build(new ViaHole("L1", "L2", "", "", 0, 0, 0));
        Assert.Equal(
            ["the hole is taken to be 0.25 mm wide", "the pad is taken to be 0.5 mm wide", "the clearance is taken to be 0.75 mm wide", "the hole is taken to go through the whole board"],
            model.Assumptions);
        Assert.Empty(Build(Hole("L1", "L4")).Assumptions);
    }

    [Theory]
    [InlineData("L1", "L9", "", "", 0.2, 0.4, "the stack-up has no copper layer 'L9'")]
    [InlineData("L1", "L4", "L1", "L2", 0.2, 0.4, "the barrel from L1 to L2 does not reach from L1 to L4")]
    [InlineData("L1", "L4", "", "", 0.5, 0.4, "the diameters of the via do not grow from hole (0.5 mm) to pad (0.4 mm) to clearance (0.65 mm)")]
    public void Impossible_vias_are_refused(string from, string to, string first, string second, double drill, double pad, string expected)
    {
        Assert.Null(Builder.Build(new ViaHole(from, to, first, second, 1e-3 * drill, 1e-3 * pad, 0.65e-3), out var objection));
        Assert.Equal(expected, objection);
    }
}
