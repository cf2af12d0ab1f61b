using StackTiming.Lines.Fields;
using StackTiming.Lines.Sections;
using Xunit;
using static StackTiming.Lines.Tests.Fields.SampleSections;

namespace StackTiming.Lines.Tests.Fields;

/// <summary>Sections that are the same thing described differently, and placements of conductors that references do not cover.</summary>
public sealed class FieldSolverGeometryTests
{
    // Conductors standing, hanging, sunk half-way into a slab and through a boundary, a strip, and a grounded pour.
    private static readonly CrossSection Mixed = Section(
        [Slab("core", 4.4, 0, 120), Slab("ply", 3.3, 120, 200)],
        [
            Trace("standing", -400, 120, 95, 35, 200), Trace("hanging", -190, 110, 90, 30, 90, wideFaceDown: false),
            Trace("sunk", 10, 130, 110, 40, 180), Trace("through", 220, 90, 80, 30, 105), Trace("strip", 420, 150, 150, 0, 120),
            Trace("pour", 800, 400, 380, 35, 200, grounded: true),
        ],
        mask: Mask(3.6, 22, 14));

    [Fact]
    public void Two_finenesses_agree_within_the_estimate_on_every_placement()
    {
        var line = FieldSolver.Default.Solve(Mixed).Line;
        var fine = new FieldSolver(new FieldSolverOptions(1e-5)).Solve(Mixed).Line;

        Assert.True(MatrixErrors.Largest(line.CapacitanceFaradPerMetre, fine.CapacitanceFaradPerMetre) < 2 * line.RelativeError);
        Assert.True(MatrixErrors.Largest(line.InductanceHenryPerMetre, fine.InductanceHenryPerMetre) < 2 * line.RelativeError);
        Assert.True(line.RelativeError <= FieldSolverOptions.Default.RelativeTolerance);
    }

    [Fact]
    public void A_section_moved_aside_or_mirrored_is_the_same()
    {
        var line = FieldSolver.Default.Solve(Mixed).Line;
        var moved = FieldSolver.Default.Solve(Mixed with
        {
            Conductors = [.. Mixed.Conductors.Select(c => c with { CentreMetres = 0.07 - c.CentreMetres })],
        }).Line;

        Assert.True(MatrixErrors.Largest(moved.CapacitanceFaradPerMetre, line.CapacitanceFaradPerMetre) < 1e-6);
        Assert.True(MatrixErrors.Largest(moved.InductanceHenryPerMetre, line.InductanceHenryPerMetre) < 1e-6);
    }

    [Fact]
    public void A_section_a_thousand_times_as_large_has_the_same_constants()
    {
        var large = Mixed with
        {
            Slabs = [.. Mixed.Slabs.Select(s => s with { BottomMetres = 1e3 * s.BottomMetres, TopMetres = 1e3 * s.TopMetres })],
            Conductors =
            [
                .. Mixed.Conductors.Select(c => new SectionConductor(
                    c.Name, c.Grounded, 1e3 * c.CentreMetres, 1e3 * c.WideMetres, 1e3 * c.NarrowMetres, 1e3 * c.ThicknessMetres,
                        1e3 * c.BottomMetres, c.WideFaceDown))
            ],
            TopMask = Mask(3.6, 22e3, 14e3),
        };

        Assert.True(MatrixErrors.Largest(
            FieldSolver.Default.Solve(large).Line.CapacitanceFaradPerMetre,
                FieldSolver.Default.Solve(Mixed).Line.CapacitanceFaradPerMetre) < 1e-9);
    }

    [Fact]
    public void A_plane_above_is_as_good_as_one_below()
    {
        var below = Section([Slab("core", 4.1, 0, 130)], [Trace("a", 0, 120, 100, 35, 130), Trace("b", 260, 150, 130, 35, 130)],
            mask: Mask(3.5, 20, 12));
        var above = below with
        {
            Slabs = [Slab("core", 4.1, 500, 630)],
            BottomPlaneMetres = null,
            TopPlaneMetres = 630e-6,
            Conductors = [Trace("a", 0, 120, 100, 35, 465, wideFaceDown: false), Trace("b", 260, 150, 130, 35, 465, wideFaceDown: false)],
            TopMask = null,
            BottomMask = below.TopMask,
        };

        var (expected, actual) = (FieldSolver.Default.Solve(below), FieldSolver.Default.Solve(above));

        Assert.True(MatrixErrors.Largest(actual.Line.CapacitanceFaradPerMetre, expected.Line.CapacitanceFaradPerMetre) < 1e-9);
        var (x, y) = expected.Drive([1, 0.5]).FieldVoltsPerMetre([100e-6], [60e-6]);
        var (xAbove, yAbove) = actual.Drive([1, 0.5]).FieldVoltsPerMetre([100e-6], [570e-6]);
        Assert.Equal(x[0], xAbove[0], 1e-6 * Math.Abs(x[0]));
        Assert.Equal(y[0], -yAbove[0], 1e-6 * Math.Abs(y[0]));
    }

    [Fact]
    public void Symmetry_changes_nothing_but_the_work()
    {
        // A distant grounded wire breaks the symmetry of the pair without a part in the field.
        var pair = Section(
            [Slab("a", 3.9, 0, 100), Slab("b", 3.5, 100, 250)], [Trace("p", -110, 100, 88, 17, 100), Trace("n", 110, 100, 88, 17, 100)],
                250);
        var broken = pair with { Conductors = pair.Conductors.Add(Trace("far", 9_000, 10, 10, 5, 20, grounded: true)) };
        var solver = new FieldSolver(new FieldSolverOptions(3e-5));

        var (half, whole) = (solver.Solve(pair), solver.Solve(broken));

        Assert.True(MatrixErrors.Largest(half.Line.CapacitanceFaradPerMetre, whole.Line.CapacitanceFaradPerMetre) < 1e-5);
        Assert.True(MatrixErrors.Largest(half.Line.InductanceHenryPerMetre, whole.Line.InductanceHenryPerMetre) < 1e-5);
        Assert.True(half.Unknowns < 0.6 * whole.Unknowns);
        foreach (var share in half.Line.EnergyShares)
            Assert.Equal(share.Share, whole.EnergyShares([0.5, -0.5]).Single(s => s.Dielectric == share.Dielectric).Share, 1e-4);
    }

    [Fact]
    public void A_slab_cut_in_two_of_the_same_material_is_one_slab()
    {
        var whole = Section([Slab("m", 4.0, 0, 200)], [Trace("a", 0, 150, 130, 35, 200)], mask: Mask(3.6, 20, 12));
        var cut = whole with { Slabs = [Slab("lower", 4.0, 0, 70), Slab("upper", 4.0, 70, 200)] };

        var (one, two) = (FieldSolver.Default.Solve(whole).Line, FieldSolver.Default.Solve(cut).Line);

        Assert.Equal(one.CapacitanceFaradPerMetre[0, 0], two.CapacitanceFaradPerMetre[0, 0], 2e-4 * one.CapacitanceFaradPerMetre[0, 0]);
        Assert.Equal(
            one.EnergyShares.Single(s => s.Dielectric == "m").Share,
                two.EnergyShares.Where(s => s.Dielectric is "lower" or "upper").Sum(s => s.Share), 5e-4);
    }

    [Fact]
    public void Mask_of_the_material_of_a_cover_slab_is_that_slab_where_the_surface_is_flat()
    {
        // A strip without thickness and mask of one thickness everywhere: the same as a second slab over an embedded strip.
        var strip = Trace("a", 0, 150, 150, 0, 100);
        var masked = Section([Slab("m", 4.0, 0, 100)], [strip], mask: Mask(3.5, 30, 30) with { OverCopperMetres = 30e-6 });
        var covered = Section([Slab("m", 4.0, 0, 100), Slab("mask", 3.5, 100, 130)], [strip]);

        var (one, two) = (FieldSolver.Default.Solve(masked).Line, FieldSolver.Default.Solve(covered).Line);

        Assert.Equal(two.CapacitanceFaradPerMetre[0, 0], one.CapacitanceFaradPerMetre[0, 0], 1e-4 * two.CapacitanceFaradPerMetre[0, 0]);
        foreach (var share in two.EnergyShares)
            Assert.Equal(share.Share, one.EnergyShares.Single(s => s.Dielectric == share.Dielectric).Share, 2e-4);
    }

    [Fact]
    public void Three_conductors_in_two_dielectrics_agree_with_Wei_1984_and_Delbare_1989()
    {
        // C. Wei, R. F. Harrington, J. R. Mautz, T. K. Sarkar, IEEE Trans. MTT-32, 1984; N. Delbare, D. De Zutter, IEEE Trans. MTT-37,
        // 1989. The dimensions are a reconstruction from the published figures, so that the bounds are those of the design notes: 1 %, 2
        // % and a range.
        var section = Section(
            [Slab("lower", 4.3, 0, 200), Slab("upper", 3.2, 200, 300)],
            [Trace("1", -500, 350, 350, 70, 200), Trace("2", 0, 350, 350, 70, 300), Trace("3", 500, 350, 350, 70, 300)]);

        var c = FieldSolver.Default.Solve(section).Line.CapacitanceFaradPerMetre;

        Assert.Equal(142.09e-12, c[0, 0], 0.01 * 142.09e-12);
        Assert.Equal(93.529e-12, c[1, 1], 0.01 * 93.529e-12);
        Assert.Equal(87.962e-12, c[2, 2], 0.01 * 87.962e-12);
        Assert.Equal(-21.765e-12, c[0, 1], 0.02 * 21.765e-12);
        Assert.Equal(-18.098e-12, c[1, 2], 0.02 * 18.098e-12);
        Assert.InRange(c[0, 2], -0.92e-12, -0.85e-12);
    }

    [Fact]
    public void Two_grounded_pours_that_touch_are_one()
    {
        var apart = Section([Slab("m", 4.0, 0, 150)],
            [Trace("a", 0, 150, 150, 30, 150), Trace("g", 700, 1000, 1000, 30, 150, grounded: true)]);
        var touching = apart with
        {
            Conductors = [apart.Conductors[0], Trace("g1", 400, 400, 400, 30, 150, grounded: true),
                Trace("g2", 900, 600, 600, 30, 150, grounded: true)],
        };

        Assert.Equal(
            FieldSolver.Default.Solve(apart).Line.CapacitanceFaradPerMetre[0, 0],
                FieldSolver.Default.Solve(touching).Line.CapacitanceFaradPerMetre[0, 0], 1e-15);
    }

    [Fact]
    public void A_wide_finite_plane_is_as_good_as_an_infinite_one_and_a_slot_in_it_raises_the_impedance()
    {
        var infinite = BareTrace(150, 100, 4.0);
        CrossSection Over(params SectionConductor[] plane) => infinite with
        {
            BottomPlaneMetres = null,
            Conductors = [infinite.Conductors[0], .. plane],
        };
        double Z(CrossSection section) => FieldSolver.Default.Solve(section).Line.Z0Ohms;

        var z = Z(infinite);
        Assert.Equal(z, Z(Over(Trace("plane", 0, 40_000, 40_000, 35, -35, grounded: true))), 1e-3 * z);
        // The lost return at an edge four heights beyond the trace is small, straight under its middle large.
        var nearEdge = Z(Over(Trace("plane", -19_525, 40_000, 40_000, 35, -35, grounded: true)));
        var underMiddle = Z(Over(Trace("plane", -20_000, 40_000, 40_000, 35, -35, grounded: true)));
        Assert.InRange(nearEdge / z, 1.0001, 1.01);
        Assert.InRange(underMiddle / z, 1.2, 2);
        var slot = Z(Over(Trace("left", -10_150, 20_000, 20_000, 35, -35, grounded: true),
            Trace("right", 10_150, 20_000, 20_000, 35, -35, grounded: true)));
        Assert.InRange(slot / z, 1.1, 2);
    }
}
