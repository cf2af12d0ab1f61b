using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Fields.Currents;
using StackTiming.Lines.Sections;
using Xunit;
using static StackTiming.Lines.Tests.Fields.SampleSections;

namespace StackTiming.Lines.Tests.Fields.Currents;

public sealed class ConductorLossTests
{
    private const double Resistivity = 1.7241e-8;

    private static readonly FieldSolver Fine = new(new FieldSolverOptions(1e-5));

    [Theory]
    [InlineData(100, 100)]
    [InlineData(100, 92)]
    public void Skin_effect_is_the_inductance_of_receding_walls(double wide, double narrow)
    {
        // H. A. Wheeler, Formulas for the skin effect, Proc. IRE 30, 1942: the spread is dL/dn / mu0 when every wall recedes by n.
        const double step = 0.05;
        var slope = Math.Atan2(18, (wide - narrow) / 2);
        CrossSection Receded(double n, double plane)
        {
            var (foot, side) = (2 * n / Math.Tan(slope), 2 * n / Math.Sin(slope));
            return Section([Slab("m", 4, 0, 100)], [Trace("a", 0, wide - foot - side, narrow + foot - side, 18 - 2 * n, 100 + n + plane)]);
        }

        double L(double n, double plane) => Fine.Solve(Receded(n, plane)).Line.InductanceHenryPerMetre[0, 0];
        var loss = ConductorLoss.Of(Fine.Solve(Receded(0, 0)));

        var trace = (L(step, 0) - L(-step, 0)) / (2e-6 * step * Vacuum.Mu0);
        var plane = (L(0, step) - L(0, -step)) / (2e-6 * step * Vacuum.Mu0);

        var spread = loss.SkinSpreadPerMetre()[0, 0];
        Assert.Equal(trace + plane, spread, 3e-3 * spread);
        Assert.Equal(plane / (trace + plane), loss.PlaneShare(0), 3e-3);
    }

    [Fact]
    public void Stripline_agrees_with_the_worked_example_of_the_textbook()
    {
        // D. M. Pozar, Microwave Engineering, 4th ed. 2012, example 3.5 (from memory): b 3.2 mm, t 0.01 mm, eps 2.2, w 2.66 mm, copper,
        // 10 GHz, Rs 0.026 ohm: Z0 50 ohm, attenuation by conductors 0.122 Np/m. His formula is Cohn's approximation of 1955; both
        // figures are rounded.
        const double resistance = 0.026;
        var section = Section([Slab("m", 2.2, 0, 3200)], [Trace("a", 0, 2660, 2660, 10, 1595)], 3200);
        var solution = Fine.Solve(section);

        var attenuation = resistance * ConductorLoss.Of(solution).SkinSpreadPerMetre()[0, 0] / (2 * solution.Line.Z0Ohms);

        Assert.Equal(50, solution.Line.Z0Ohms, 0.5);
        Assert.Equal(0.122, attenuation, 0.03 * 0.122);
    }

    [Fact]
    public void A_wide_trace_loses_as_a_parallel_plate()
    {
        // Half of the loss on the trace's lower face, half on the plane; the edges add a length of the order of the height.
        var spread = ConductorLoss.Of(Fine.Solve(BareTrace(50_000, 100, 4))).SkinSpreadPerMetre()[0, 0];

        Assert.Equal(2 / 50e-3, spread, 0.02 * spread);
    }

    [Fact]
    public void Resistance_starts_at_that_of_the_trapezoid_and_ends_with_the_root_of_frequency()
    {
        var section = Section([Slab("m", 4, 0, 100)], [Trace("a", -110, 120, 96, 30, 100), Trace("b", 110, 120, 96, 30, 100)]);
        var loss = ConductorLoss.Of(FieldSolver.Default.Solve(section));

        var direct = Resistivity / (0.5 * (120e-6 + 96e-6) * 30e-6);
        Assert.Equal(direct, loss.At(0).ResistanceOhmPerMetre[0, 0], 1e-4 * direct);
        Assert.Equal(direct, loss.DirectResistanceOhmPerMetre[1], 1e-9 * direct);
        Assert.Equal(0, loss.At(0).ResistanceOhmPerMetre[0, 1], 1e-4 * direct);
        var (low, high) = (loss.At(10e9).ResistanceOhmPerMetre, loss.At(40e9).ResistanceOhmPerMetre);
        Assert.Equal(2, high[0, 0] / low[0, 0], 2e-3);
        Assert.Equal(2, high[0, 1] / low[0, 1], 2e-3);
        // Internal inductance of skin effect is R/omega.
        Assert.Equal(high[0, 0] / (2 * Math.PI * 40e9), loss.At(40e9).InternalInductanceHenryPerMetre[0, 0],
            5e-3 * high[0, 0] / (2 * Math.PI * 40e9));
    }

    [Fact]
    public void Resistance_rises_and_inductance_falls_with_frequency()
    {
        var loss = ConductorLoss.Of(FieldSolver.Default.Solve(BareTrace(150, 100, 4)));
        var last = loss.At(1e3);
        for (var f = 2e3; f < 1e11; f *= 1.5)
        {
            var next = loss.At(f);
            Assert.True(next.ResistanceOhmPerMetre[0, 0] > last.ResistanceOhmPerMetre[0, 0]);
            Assert.True(next.InternalInductanceHenryPerMetre[0, 0] < last.InternalInductanceHenryPerMetre[0, 0]);
            last = next;
        }
    }

    [Theory]
    [InlineData(150, 35, 100)]
    [InlineData(100, 18, 60)]
    [InlineData(80, 35, 70)]
    public void Transition_to_skin_effect_agrees_with_filaments(double width, double thickness, double height)
    {
        var solution = Fine.Solve(Section([Slab("m", 4, 0, height)], [Trace("a", 0, width, width, thickness, height)]));
        var loss = ConductorLoss.Of(solution);
        var planeSpread = loss.PlaneShare(0) * loss.SkinSpreadPerMetre()[0, 0];
        foreach (var frequency in new[] { 1e3, 3e6, 1e7, 3e7, 1e8 })
        {
            var filaments = FilamentImpedance.Of(width * 1e-6, thickness * 1e-6, height * 1e-6, Resistivity, frequency, 20, 10);
            var internalFilaments = filaments.Imaginary / (2 * Math.PI * frequency) - solution.Line.InductanceHenryPerMetre[0, 0];
            // The filaments' plane is perfect.
            var plane = planeSpread * Math.Sqrt(Math.PI * frequency * Vacuum.Mu0 * Resistivity);
            var (resistance, inductance) = loss.At(frequency);

            Assert.Equal(filaments.Real, resistance[0, 0] - plane, 0.08 * filaments.Real);
            Assert.Equal(internalFilaments, inductance[0, 0] - plane / (2 * Math.PI * frequency),
                (frequency < 1e4 ? 0.005 : 0.08) * internalFilaments);
        }
    }

    [Fact]
    public void A_strip_without_thickness_has_no_resistance()
    {
        var error = Assert.Throws<SectionNotSolvableException>(() =>
            ConductorLoss.Of(FieldSolver.Default.Solve(BareTrace(100, 100, 4, 0))));
        Assert.Contains("Conductor a has no thickness", error.Message, StringComparison.Ordinal);
    }
}
