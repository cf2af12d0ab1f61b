using StackTiming.Lines.Fields;
using StackTiming.Lines.Fields.Currents;
using Xunit;
using static StackTiming.Lines.Tests.Fields.SampleSections;

namespace StackTiming.Lines.Tests.Fields.Currents;

public sealed class ReturnCurrentTests
{
    private static readonly FieldSolver Fine = new(new FieldSolverOptions(1e-5));

    [Fact]
    public void Under_a_thin_wire_it_is_the_image_of_a_line_current()
    {
        // K = I h / (pi (x² + h²)); 95 % of it flows within h tan(0.475 pi) to each side.
        const double height = 1000e-6;
        var current = ReturnCurrent.InPlane(Fine.Solve(Section([Slab("m", 3, 0, 500)], [Trace("a", 0, 2, 2, 2, 999)])), 0, [1]);

        Assert.Equal(1, current.TotalAmperes, 1e-4);
        for (var i = 0; i < current.XMetres.Length; i++)
        {
            var x = current.XMetres[i];
            var expected = height / (Math.PI * (x * x + height * height));
            Assert.Equal(expected, current.DensityAmperePerMetre[i], 1e-4 * expected);
        }

        Assert.Equal(2 * height * Math.Tan(0.475 * Math.PI), current.WidthMetres, 0.02 * current.WidthMetres);
        Assert.Equal(0, current.LowMetres + current.HighMetres, 1e-6 * current.WidthMetres);
    }

    [Fact]
    public void Between_two_planes_a_thin_wire_sends_back_the_current_of_its_images()
    {
        // Midway between planes b apart each carries half; K = I / (2 b cosh(pi x/b)), whose integral is the Gudermannian.
        const double gap = 400e-6;
        var solution = Fine.Solve(Section([Slab("m", 3, 0, 400)], [Trace("a", 0, 1, 1, 1, 199.5)], 400));
        var current = ReturnCurrent.InPlane(solution, solution.Section.TopPlaneMetres!.Value, [1]);

        Assert.Equal(0.5, current.TotalAmperes, 1e-4);
        for (var i = 0; i < current.XMetres.Length; i++)
        {
            var expected = 1 / (2 * gap * Math.Cosh(Math.PI * current.XMetres[i] / gap));
            Assert.Equal(expected, current.DensityAmperePerMetre[i], 1e-4 * expected + 1e-3);
        }

        var half = gap / Math.PI * Math.Asinh(Math.Tan(0.475 * Math.PI));
        Assert.Equal(2 * half, current.WidthMetres, 0.02 * current.WidthMetres);
    }

    [Fact]
    public void Planes_and_pours_together_carry_all_of_the_current()
    {
        var section = Section(
            [Slab("m", 4, 0, 150)], [Trace("a", 0, 150, 130, 35, 150), Trace("g1", -500, 600, 580, 35, 150, grounded: true),
                Trace("g2", 500, 600, 580, 35, 150, grounded: true)]);
        var solution = Fine.Solve(section);

        var plane = ReturnCurrent.InPlane(solution, 0, [1]).TotalAmperes;
        var pours = ReturnCurrent.InConductors(solution, [1]);

        Assert.InRange(plane, 0.3, 0.9);
        Assert.Equal(1, plane + pours["g1"] + pours["g2"], 1e-4);
        Assert.Equal(pours["g1"], pours["g2"], 1e-6);
    }

    [Fact]
    public void Under_an_odd_pair_it_flows_both_ways_and_stays_near()
    {
        var section = Section([Slab("m", 4, 0, 100)], [Trace("p", -120, 120, 100, 35, 100), Trace("n", 120, 120, 100, 35, 100)]);
        var solution = Fine.Solve(section);

        var odd = ReturnCurrent.InPlane(solution, 0, [1, -1]);
        var even = ReturnCurrent.InPlane(solution, 0, [1, 1]);

        Assert.Equal(0, odd.TotalAmperes, 1e-6);
        Assert.Equal(2, even.TotalAmperes, 1e-3);
        Assert.True(odd.WidthMetres < 0.5 * even.WidthMetres);
    }
}
