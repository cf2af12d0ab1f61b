using CsCheck;
using MathNet.Numerics.LinearAlgebra;
using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Sections;
using Xunit;
using static StackTiming.Lines.Tests.Fields.SampleSections;

namespace StackTiming.Lines.Tests.Fields;

/// <summary>What must hold of any quasi-static solution.</summary>
public sealed class FieldSolverPhysicsTests
{
    private static readonly FieldSolver Fine = new(new FieldSolverOptions(3e-5));

    [Fact]
    public void Product_of_C_and_L_is_that_of_the_medium_in_one_dielectric()
    {
        // Three slabs of one permittivity under different names between planes, trapezoids of several kinds.
        var section = Section(
            [Slab("a", 4.2, 0, 80), Slab("b", 4.2, 80, 150), Slab("c", 4.2, 150, 320)],
            [Trace("x", -140, 120, 100, 18, 80), Trace("y", 20, 90, 70, 35, 115, wideFaceDown: false), Trace("z", 210, 150, 150, 0, 150)],
            320);

        var line = FieldSolver.Default.Solve(section).Line;

        var product = Matrix<double>.Build.DenseOfArray(line.CapacitanceFaradPerMetre)
            * Matrix<double>.Build.DenseOfArray(line.InductanceHenryPerMetre) * (Vacuum.SpeedOfLight * Vacuum.SpeedOfLight / 4.2);
        Assert.True((product - Matrix<double>.Build.DenseIdentity(3)).InfinityNorm() < 1e-9);
        Assert.Equal(1, line.EnergyShares.Sum(s => s.Share), 1e-12);
    }

    [Fact]
    public void Matrices_are_symmetric_with_the_signs_of_a_passive_line()
    {
        var line = FieldSolver.Default.Solve(MicrostripBus(5, Mask(3.5, 25, 15)) with { TopMask = Mask(3.5, 20, 10) }).Line;
        var (c, l) = (line.CapacitanceFaradPerMetre, line.InductanceHenryPerMetre);
        for (var i = 0; i < 5; i++)
        {
            var row = 0.0;
            for (var j = 0; j < 5; j++)
            {
                Assert.Equal(c[i, j], c[j, i]);
                Assert.True(i == j ? c[i, j] > 0 : c[i, j] < 0);
                Assert.True(l[i, j] > 0);
                row += c[i, j];
            }

            Assert.True(row > 0);
        }

        Assert.True(Matrix<double>.Build.DenseOfArray(l).Evd().EigenValues.All(v => v.Real > 0));
    }

    [Fact]
    public void Charges_are_reciprocal_before_the_matrix_is_made_symmetric()
    {
        // An asymmetric pair with its two unit drives: each conductor's charge, read from the flux through a closed path round it.
        var section = Section([Slab("laminate", 4.5, 0, 120)], [Trace("a", 0, 150, 120, 35, 120), Trace("b", 210, 90, 70, 50, 120)],
            mask: Mask(3.4, 20, 15));
        var solution = Fine.Solve(section);

        var onB = FluxThroughRectangle(solution.Drive([1, 0]), section, 160e-6, 270e-6);
        var onA = FluxThroughRectangle(solution.Drive([0, 1]), section, -80e-6, 80e-6);

        Assert.Equal(solution.Line.CapacitanceFaradPerMetre[0, 1], onB, 1e-3 * Math.Abs(onB));
        Assert.Equal(onA, onB, 1e-3 * Math.Abs(onB));
    }

    [Theory]
    [InlineData(null)]
    [InlineData(260.0)]
    public void Power_through_the_section_is_voltage_times_current(double? topPlane)
    {
        var section = Section([Slab("laminate", 4.3, 0, 100), Slab("cover", 3.1, 100, 260)], [Trace("a", 0, 140, 140, 30, 100)], topPlane);
        var solution = Fine.Solve(section);
        var electric = solution.Drive([1]);
        var magnetic = solution.DriveInAir([1]);
        // The air drive of one volt belongs to the current c C0 of one volt.
        var current = 1 / (Vacuum.SpeedOfLight * solution.Line.InductanceHenryPerMetre[0, 0]);

        var power = SectionIntegral.Over(section, 0, 400e-6, (x, y) =>
        {
            var (ex, ey) = electric.FieldVoltsPerMetre(x, y);
            var (ax, ay) = magnetic.FieldVoltsPerMetre(x, y);
            return [.. ex.Select((e, i) => (e * ax[i] + ey[i] * ay[i]) / Vacuum.Impedance)];
        });

        Assert.Equal(1 * current, power, 1e-3 * current);
    }

    [Theory]
    [InlineData(null)]
    [InlineData(260.0)]
    public void Energy_shares_are_those_of_the_integrated_energy_density(double? topPlane)
    {
        var section = Section([Slab("laminate", 4.3, 0, 100), Slab("cover", 3.1, 100, 260)], [Trace("a", 0, 140, 140, 30, 100)], topPlane);
        var solution = Fine.Solve(section);
        var electric = solution.Drive([1]);
        double Energy(double from, double to, double dk) => SectionIntegral.Over(section, from * 1e-6, to * 1e-6, (x, y) =>
        {
            var (ex, ey) = electric.FieldVoltsPerMetre(x, y);
            return [.. ex.Select((e, i) => 0.5 * dk * Vacuum.Epsilon0 * (e * e + ey[i] * ey[i]))];
        });

        var total = 0.5 * solution.Line.CapacitanceFaradPerMetre[0, 0];
        Assert.Equal(solution.Line.EnergyShares.Single(s => s.Dielectric == "laminate").Share, Energy(0, 100, 4.3) / total, 1e-3);
        Assert.Equal(solution.Line.EnergyShares.Single(s => s.Dielectric == "cover").Share, Energy(100, 260, 3.1) / total, 1e-3);
    }

    [Fact]
    public void A_wide_strip_becomes_a_parallel_plate()
    {
        // The fringe of each edge is a constant, so that the slope of C over width is exactly that of the plate.
        var narrow = Fine.Solve(BareTrace(20_000, 100, 4.0)).Line.CapacitanceFaradPerMetre[0, 0];
        var wide = Fine.Solve(BareTrace(40_000, 100, 4.0)).Line.CapacitanceFaradPerMetre[0, 0];

        var plate = 4.0 * Vacuum.Epsilon0 / 100e-6;
        Assert.Equal(plate, (wide - narrow) / 20e-3, 1e-3 * plate);
    }

    [Fact]
    public void A_wide_gap_uncouples_a_pair()
    {
        var single = Fine.Solve(BareTrace(120, 100, 4.0)).Line;
        var pair = Fine.Solve(Section(
            [Slab("laminate", 4.0, 0, 100)], [Trace("a", -20_000, 120, 120, 35, 100), Trace("b", 20_000, 120, 120, 35, 100)])).Line;

        Assert.Equal(single.CapacitanceFaradPerMetre[0, 0], pair.CapacitanceFaradPerMetre[0, 0],
            1e-4 * single.CapacitanceFaradPerMetre[0, 0]);
        Assert.True(Math.Abs(pair.CapacitanceFaradPerMetre[0, 1]) < 1e-4 * pair.CapacitanceFaradPerMetre[0, 0]);
    }

    [Fact]
    public void A_thinning_mask_tends_to_the_bare_trace()
    {
        var bare = BareTrace(150, 100, 4.0);
        var limit = FieldSolver.Default.Solve(bare).Line.CapacitanceFaradPerMetre[0, 0];

        var difference = new[] { 8.0, 4.0, 2.0, 1.0, 0.5, 0.25 }
            .Select(t => FieldSolver.Default.Solve(bare with { TopMask = Mask(3.5, t, t) }).Line.CapacitanceFaradPerMetre[0, 0] / limit - 1)
            .ToArray();

        // Nearly in proportion to the mask; the fields at the corners make it a little slower.
        Assert.All(difference.Zip(difference.Skip(1)), d => Assert.InRange(d.First / d.Second, 1.7, 2.0));
        Assert.InRange(difference[^1], 0, 3e-3);
    }

    [Fact]
    public void Impedance_falls_with_width_and_permittivity_and_rises_with_height()
    {
        Gen.Select(Gen.Double[40, 400], Gen.Double[50, 300], Gen.Double[2, 8], Gen.Double[1.02, 1.5]).Sample(
            (width, height, dk, factor) =>
            {
                var z = Z(BareTrace(width, height, dk));
                Assert.True(Z(BareTrace(width * factor, height, dk)) < z);
                Assert.True(Z(BareTrace(width, height, dk * factor)) < z);
                Assert.True(Z(BareTrace(width, height * factor, dk)) > z);
                Assert.True(Z(BareTrace(width, height, dk) with { TopMask = Mask(3.5, 20, 15) }) < z);
            },
            iter: 40);

        static double Z(CrossSection section) => FieldSolver.Default.Solve(section).Line.Z0Ohms;
    }

    [Fact]
    public void Potential_is_that_of_the_conductors_on_and_in_them_and_of_the_planes()
    {
        var section = Section([Slab("a", 4, 0, 100), Slab("b", 3, 100, 260)],
            [Trace("x", -90, 100, 80, 30, 100), Trace("y", 90, 100, 80, 30, 100)], 260);
        var field = Fine.Solve(section).Drive([0.75, -0.25]);

        var volts = field.PotentialVolts([-90e-6, -60e-6, 90e-6, 0, 33e-6], [115e-6, 101e-6, 129e-6, 0, 260e-6]);

        Assert.Equal([0.75, 0.75, -0.25, 0, 0], volts, (a, b) => Math.Abs(a - b) < 1e-4);
    }

    [Fact]
    public void Surface_charges_sum_to_those_of_the_capacitance_matrix()
    {
        var section = Section(
            [Slab("a", 4, 0, 100)], [Trace("x", -90, 100, 80, 30, 100), Trace("y", 90, 100, 80, 30, 100)]) with
        {
            TopMask = Mask(4, 20,
                20)
        };
        var solution = FieldSolver.Default.Solve(section);
        var c = solution.Line.CapacitanceFaradPerMetre;

        // Slab and mask have one permittivity, so that all faces lie in it: free charge is four times the total.
        var free = solution.SurfaceCharges([1, 0.25]).Where(s => s.Conductor == "x").Sum(s => 4 * s.CoulombPerMetre);

        Assert.Equal(c[0, 0] + 0.25 * c[0, 1], free, 1e-4 * c[0, 0]);
        Assert.Equal(4, solution.PermittivityAt(0, 110e-6));
        Assert.Equal(1, solution.PermittivityAt(0, 130e-6));
        Assert.Null(solution.PermittivityAt(90e-6, 110e-6));
    }

    [Fact]
    public void Conductance_is_that_of_the_loss_tangent_in_one_dielectric()
    {
        var section = Section([Slab("m", 3.7, 0, 300)], [Trace("x", -90, 100, 80, 30, 100), Trace("y", 90, 100, 80, 30, 100)], 300);
        section = section with { Slabs = [section.Slabs[0] with { Dielectric = new SectionDielectric("m", 3.7, 0.02) }] };
        var solution = FieldSolver.Default.Solve(section);
        var (loss, c) = (solution.LossCapacitance(), solution.Line.CapacitanceFaradPerMetre);

        Assert.Equal(0.02 * c[0, 0], loss[0, 0], 1e-9 * c[0, 0]);
        Assert.Equal(0.02 * c[0, 1], loss[0, 1], 1e-9 * c[0, 0]);
    }

    /// <summary>Flux of D out of a rectangle from the plane to far above, between two verticals, over the section's dielectrics.</summary>
    private static double FluxThroughRectangle(DrivenField field, CrossSection section, double left, double right)
    {
        // Down through the slab just above the plane counts the charge that the plane sees of it; the rest leaves sideways and above.
        double Line(Func<double, (double X, double Y)> at, double from, double to, Func<double, double, double> dk, bool vertical)
        {
            var sum = 0.0;
            const int steps = 800;
            var (xs, ys) = (new double[steps], new double[steps]);
            for (var i = 0; i < steps; i++)
                (xs[i], ys[i]) = at(from + (to - from) * (i + 0.5) / steps);
            var (ex, ey) = field.FieldVoltsPerMetre(xs, ys);
            for (var i = 0; i < steps; i++)
                sum += dk(xs[i], ys[i]) * (vertical ? ex[i] : ey[i]) * (to - from) / steps;
            return sum * Vacuum.Epsilon0;
        }

        var slab = section.Slabs[0];
        var mask = section.TopMask!;
        double Dk(double x, double y) => y < slab.TopMetres ? slab.Dielectric.Dk
            : y < slab.TopMetres + mask.OverLaminateMetres || InOutline(x, y) ? mask.Dielectric.Dk : 1;
        bool InOutline(double x, double y) => section.Conductors.Any(c =>
        {
            var height = (y - c.BottomMetres) / (c.ThicknessMetres + mask.OverCopperMetres);
            return height is >= 0 and <= 1
                && Math.Abs(x - c.CentreMetres) < mask.OverCopperMetres + 0.5 * (c.WideMetres + (c.NarrowMetres - c.WideMetres) * height);
        });
        const double top = 300e-6;
        return Line(s => (right, s), 0, top, Dk, true) - Line(s => (left, s), 0, top, Dk, true)
            + Line(s => (s, top), left, right, Dk, false) - Line(s => (s, 1e-9), left, right, Dk, false);
    }
}
