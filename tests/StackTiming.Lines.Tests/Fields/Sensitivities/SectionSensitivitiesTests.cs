using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Fields.Sensitivities;
using Xunit;
using static StackTiming.Lines.Tests.Fields.SampleSections;

namespace StackTiming.Lines.Tests.Fields.Sensitivities;

public sealed class SectionSensitivitiesTests
{
    private static readonly FieldSolver Fine = new(new FieldSolverOptions(1e-5));

    [Fact]
    public void Exact_slopes_of_permittivities_are_those_of_differences()
    {
        var section = Section(
            [Slab("core", 4.2, 0, 90), Slab("ply", 3.4, 90, 160)],
            [Trace("a", 0, 120, 100, 35, 160), Trace("b", 240, 90, 80, 35, 90)], mask: Mask(3.6, 20, 15));
        var solution = Fine.Solve(section);
        foreach (var parameter in SectionParameters.Of(section).Where(p => p.Kind == ParameterKind.DielectricConstant))
        {
            var exact = solution.CapacitanceSlope(parameter.Subject);
            var difference = SectionSensitivities.Of(solution, parameter).CapacitanceSlope;
            var largest = exact.Cast<double>().Max(Math.Abs);
            for (var i = 0; i < 2; i++)
            {
                for (var j = 0; j < 2; j++)
                    Assert.Equal(exact[i, j], difference[i, j], 1e-3 * largest);
            }
        }
    }

    [Fact]
    public void Slopes_of_permittivities_times_these_sum_to_the_capacitance()
    {
        // C is homogeneous of the first degree in all permittivities, air among them.
        var section = Section([Slab("core", 4.2, 0, 90)], [Trace("a", 0, 120, 100, 35, 90), Trace("b", 190, 90, 80, 35, 90)],
            mask: Mask(3.6, 20, 15));
        var solution = FieldSolver.Default.Solve(section);

        var (core, mask, air) = (solution.CapacitanceSlope("core"), solution.CapacitanceSlope("mask"), solution.CapacitanceSlope("air"));

        var c = solution.Line.CapacitanceFaradPerMetre;
        for (var i = 0; i < 2; i++)
        {
            for (var j = 0; j < 2; j++)
                Assert.Equal(c[i, j], 4.2 * core[i, j] + 3.6 * mask[i, j] + air[i, j], 1e-3 * c[0, 0]);
        }
    }

    [Fact]
    public void Every_length_together_scales_the_section_and_changes_nothing()
    {
        var section = Section(
            [Slab("core", 4.2, 0, 90), Slab("ply", 3.4, 90, 160)], [Trace("a", -20, 120, 100, 35, 160)], mask: Mask(3.6, 20, 15));
        var line = Fine.Solve(section).Line;

        var sum = 0.0;
        foreach (var s in SectionSensitivities.Of(section))
        {
            // Width moves both faces; the narrow face's own parameter carries what is left of its scaling.
            var weight = s.Parameter.Kind switch
            {
                ParameterKind.DielectricConstant => 0,
                ParameterKind.NarrowWidth => s.Parameter.Value - 120e-6,
                _ => s.Parameter.Value,
            };
            sum += weight * s.CapacitanceSlope[0, 0] / line.CapacitanceFaradPerMetre[0, 0];
        }

        Assert.Equal(0, sum, 1e-3);
    }

    [Fact]
    public void Slope_of_the_thickness_between_plates_is_that_of_the_plate()
    {
        var section = BareTrace(50_000, 100, 4);
        var line = Fine.Solve(section).Line;
        var thickness = SectionSensitivities.Of(section).Single(s => s.Parameter.Kind == ParameterKind.SlabThickness);

        var (z, delay) = thickness.Of(line, [1]);

        Assert.Equal(line.Z0Ohms / 100e-6, z, 0.01 * line.Z0Ohms / 100e-6);
        Assert.Equal(0, delay * 100e-6 / line.DelaySecondsPerMetre, 0.005);
    }

    [Fact]
    public void Impedance_and_delay_of_a_pair_follow_the_slopes_of_its_matrices()
    {
        var section = Section([Slab("m", 4, 0, 100)], [Trace("p", -100, 110, 90, 35, 100), Trace("n", 100, 110, 90, 35, 100)]);
        var line = Fine.Solve(section).Line;
        var dk = SectionSensitivities.Of(section).Single(s => s.Parameter.Kind == ParameterKind.DielectricConstant);
        double Odd(double change)
        {
            var changed = Fine.Solve(dk.Parameter.With(4 + change)).Line;
            var c = 0.5 * (changed.CapacitanceFaradPerMetre[0, 0] - changed.CapacitanceFaradPerMetre[0, 1]);
            var l = 2 * (changed.InductanceHenryPerMetre[0, 0] - changed.InductanceHenryPerMetre[0, 1]);
            return Math.Sqrt(l / c);
        }

        var (z, delay) = dk.Of(line, [0.5, -0.5]);

        Assert.Equal((Odd(0.05) - Odd(-0.05)) / 0.1, z, 2e-3 * Math.Abs(z));
        // Delay per permittivity: share/(2 eps) of the delay.
        var share = line.EnergyShares.Single(s => s.Dielectric == "m").Share;
        var odd = Math.Sqrt((line.CapacitanceFaradPerMetre[0, 0] - line.CapacitanceFaradPerMetre[0, 1]) * (line.InductanceHenryPerMetre[0,
            0] - line.InductanceHenryPerMetre[0, 1]));
        Assert.InRange(odd * Vacuum.SpeedOfLight, 1, 2);
        Assert.Equal(odd * share / 8, delay, 1e-3 * delay);
    }

    [Fact]
    public void Losses_of_parallel_plates_follow_their_dimensions()
    {
        // Skin spread 2/w and conductance tan(d)·C: their slopes with width and height are those of the formulas, up to the edges.
        var plate = BareTrace(60_000, 100, 4);
        var section = plate with { Slabs = [plate.Slabs[0] with { Dielectric = plate.Slabs[0].Dielectric with { Df = 0.01 } }] };
        var slopes = SectionSensitivities.Of(section);
        var width = slopes.Single(s => s.Parameter.Kind == ParameterKind.Width);
        var height = slopes.Single(s => s.Parameter.Kind == ParameterKind.SlabThickness);

        Assert.Equal(-2 / (60e-3 * 60e-3), width.SkinSpreadSlope![0, 0], 0.05 * 2 / (60e-3 * 60e-3));
        Assert.Equal(0.01 * 4 * Vacuum.Epsilon0 / 100e-6, width.LossCapacitanceSlope[0, 0], 0.01 * 0.01 * 4 * Vacuum.Epsilon0 / 100e-6);
        var conductance = 0.01 * 4 * Vacuum.Epsilon0 * 60e-3 / 100e-6;
        Assert.Equal(-conductance / 100e-6, height.LossCapacitanceSlope[0, 0], 0.02 * conductance / 100e-6);
    }

    [Fact]
    public void One_step_is_as_good_as_stated_against_two_steps_extrapolated()
    {
        var section = Section(
            [Slab("core", 4.2, 0, 90), Slab("ply", 3.4, 90, 160)], [Trace("a", 0, 120, 100, 35, 160), Trace("b", 240, 90, 80, 35, 90)],
                mask: Mask(3.6, 20, 15));
        var coarse = new FieldSolver(new FieldSolverOptions(1e-4)).Solve(section);
        var fine = Fine.Solve(section);
        foreach (var parameter in SectionParameters.Of(section))
        {
            var (once, twice) = (SectionSensitivities.Of(coarse, parameter), SectionSensitivities.Extrapolated(fine, parameter));
            Assert.True(Distance(once.CapacitanceSlope, twice.CapacitanceSlope, fine.Line.CapacitanceFaradPerMetre) < once.RelativeError);
            Assert.True(Distance(once.InductanceSlope, twice.InductanceSlope, fine.Line.InductanceHenryPerMetre) < once.RelativeError);
            Assert.True(twice.RelativeError < 1e-3);
            double Distance(double[,] a, double[,] b, double[,] value) =>
                a.Cast<double>().Zip(b.Cast<double>(), (x, y) =>
                    Math.Abs(x - y)).Max() * parameter.Scale / value.Cast<double>().Max(Math.Abs);
        }
    }
}
