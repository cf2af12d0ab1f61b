using StackTiming.Lines.Fields;
using StackTiming.Lines.Sections;
using Xunit;
using static StackTiming.Lines.Tests.Fields.SampleSections;

namespace StackTiming.Lines.Tests.Fields;

/// <summary>Sections at the edge of what can be solved: a right answer, or an error that names the fault.</summary>
public sealed class DegenerateSectionTests
{
    public static TheoryData<string, CrossSection> Unsolvable => new()
    {
        { "Conductors a and b touch", Pair(0) },
        { "Conductors a and b touch or overlap", Pair(-20) },
        { "Conductors a and b touch", Section([Slab("m", 4, 0, 200)],
            [Trace("a", 0, 100, 100, 20, 80), Trace("b", 100, 100, 100, 20, 100)]) },
        { "Signal conductor b lies inside another",
            Section([Slab("m", 4, 0, 200)], [Trace("a", 0, 100, 100, 40, 80), Trace("b", 0, 20, 20, 10, 95)]) },
        { "Signal conductor a touches a plane", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 100, 100, 0)], 100) },
        { "Signal conductor a touches a plane", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 100, 40, 60)], 100) },
        { "Conductor a reaches through a plane", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 100, 50, 60)], 100) },
        { "nothing at zero volts", Section([Slab("m", 4, 0, 100)],
            [Trace("a", 0, 100, 100, 35, 100), Trace("b", 250, 100, 100, 35, 100)]) with { BottomPlaneMetres = null } },
        { "no signal conductor", Section([Slab("m", 4, 0, 100)], [Trace("g", 0, 100, 100, 35, 100, grounded: true)]) },
        { "Conductor a has faces 120 um and 100 um wide", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 120, 35, 100)]) },
        { "not a finite number", Section([Slab("m", 4, 0, 100)], [Trace("a", double.NaN, 100, 100, 35, 100)]) },
        { "must not be negative", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 100, -35, 100)]) },
        { "Dielectric m is 0 um thick", Section([Slab("m", 4, 0, 0)], [Trace("a", 0, 100, 100, 35, 100)]) },
        { "Dielectric m has Dk 0.5", Section([Slab("m", 0.5, 0, 100)], [Trace("a", 0, 100, 100, 35, 100)]) },
        { "slabs must touch", Section([Slab("m", 4, 0, 100), Slab("n", 4, 120, 200)], [Trace("a", 0, 100, 100, 35, 200)]) },
        { "top mask has a thickness that is negative",
            Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 100, 35, 100)], mask: Mask(3.5, -1, 10)) },
    };

    public static TheoryData<string, CrossSection> Extreme => new()
    {
        { "gap of 0.2 um", Pair(0.2) },
        { "gap a thousandth of the width",
            Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 2000, 2000, 30, 100), Trace("b", 2002, 2000, 2000, 30, 100)]) },
        { "width a thousand heights", BareTrace(100_000, 100, 4) },
        { "height a thousand widths", BareTrace(20, 20_000, 4, 5) },
        { "thickness a thousandth of the width", BareTrace(1000, 100, 4, 1) },
        { "wide stripline", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 50_000, 50_000, 20, 40)], 100) },
        { "trace that nearly fills its dielectric", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 100, 99, 0.5)], 100) },
        { "trace of the thickness of its slab",
            Section([Slab("l", 4, 0, 80), Slab("m", 3, 80, 115), Slab("n", 4.5, 115, 200)], [Trace("a", 0, 100, 80, 35, 80)], 200) },
        { "mask thicker than the trace", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 80, 12, 100)], mask: Mask(3.5, 60, 40)) },
        { "mask of the height of the trace", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 80, 20, 100)], mask: Mask(3.5, 20, 10)) },
        { "mask on laminate only", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 80, 35, 100)], mask: Mask(3.5, 20, 0)) },
        { "mask on copper only", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 80, 35, 100)], mask: Mask(3.5, 0, 15)) },
        { "mask without thickness", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 80, 35, 100)], mask: Mask(3.5, 0, 0)) },
        { "outlines of mask that meet at a point",
            Section([Slab("m", 4, 0, 100)], [Trace("a", -65, 100, 80, 35, 100), Trace("b", 65, 100, 80, 35, 100)],
            mask: Mask(3.5, 5, 15)) },
        { "nearly pointed trapezoid", Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 60, 0.5, 30, 100)]) },
        { "high permittivity", BareTrace(100, 100, 100) },
        { "pour that stands on the plane",
            Section([Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 100, 20, 60), Trace("g", 300, 200, 200, 100, 0, grounded: true)]) },
    };

    [Theory]
    [MemberData(nameof(Unsolvable))]
    public void Says_what_is_wrong(string fault, CrossSection section)
    {
        var error = Assert.Throws<SectionNotSolvableException>(() => FieldSolver.Default.Solve(section));
        Assert.Contains(fault, error.Message, StringComparison.Ordinal);
        Assert.Null(FieldSolver.Default.Calculate(section));
        Assert.Contains(fault, FieldSolver.Default.Objection(section), StringComparison.Ordinal);
    }

    [Theory]
    [MemberData(nameof(Extreme))]
    public void Solves_what_is_merely_extreme(string what, CrossSection section)
    {
        var line = FieldSolver.Default.Solve(section).Line;
        var fine = new FieldSolver(new FieldSolverOptions(3e-5)).Solve(section).Line;

        Assert.True(line.RelativeError <= FieldSolverOptions.Default.RelativeTolerance, what);
        Assert.True(MatrixErrors.Largest(line.CapacitanceFaradPerMetre, fine.CapacitanceFaradPerMetre) < 5e-4, what);
        Assert.True(MatrixErrors.Largest(line.InductanceHenryPerMetre, fine.InductanceHenryPerMetre) < 5e-4, what);
        Assert.Equal(1, line.EnergyShares.Sum(s => s.Share), 1e-9);
        Assert.All(line.EnergyShares, s => Assert.InRange(s.Share, 0, 1 + 1e-9));
    }

    [Fact]
    public void A_section_with_too_many_unknowns_is_refused()
    {
        var solver = new FieldSolver(FieldSolverOptions.Default with { MostUnknowns = 100 });
        var error = Assert.Throws<SectionNotSolvableException>(() => solver.Solve(MicrostripBus(5, Mask(3.5, 25, 15))));
        Assert.Contains("more than the 100 allowed", error.Message, StringComparison.Ordinal);
    }

    [Fact]
    public void A_result_that_could_not_be_refined_warns_of_its_error()
    {
        var section = MicrostripBus(1, Mask(3.5, 25, 15));
        var unknowns = new FieldSolver(new FieldSolverOptions(1)).Solve(section).Unknowns;

        var line = new FieldSolver(FieldSolverOptions.Default with { MostUnknowns = unknowns - 1 }).Solve(section).Line;

        Assert.Equal(1e-2, line.RelativeError);
        Assert.Contains("stopped at an estimated error of 1.00", Assert.Single(line.Warnings), StringComparison.Ordinal);
        var converged = FieldSolver.Default.Solve(section).Line;
        Assert.True(MatrixErrors.Largest(line.CapacitanceFaradPerMetre, converged.CapacitanceFaradPerMetre) < line.RelativeError);
    }

    [Fact]
    public void Thirty_two_traces_are_solved()
    {
        var line = new FieldSolver(new FieldSolverOptions(1e-3)).Solve(MicrostripBus(32)).Line;
        var eight = FieldSolver.Default.Solve(MicrostripBus(8)).Line;

        Assert.Empty(line.Warnings);
        // The middle of a wide bus looks the same from everywhere.
        Assert.Equal(line.CapacitanceFaradPerMetre[15, 15], line.CapacitanceFaradPerMetre[10, 10], 1e-4 * line.CapacitanceFaradPerMetre[15, 15]);
        Assert.Equal(eight.CapacitanceFaradPerMetre[3, 3], line.CapacitanceFaradPerMetre[15, 15], 2e-3 * line.CapacitanceFaradPerMetre[15, 15]);
    }

    private static CrossSection Pair(double gap) => Section(
        [Slab("m", 4, 0, 100)], [Trace("a", 0, 100, 100, 35, 100), Trace("b", 100 + gap, 100, 100, 35, 100)]);
}
