using StackTiming.Lines.Methods;
using StackTiming.Lines.Solutions;
using Xunit;

namespace StackTiming.Lines.Tests.Solutions;

public sealed class PairModesTests
{
    [Theory]
    [InlineData("F7_pair_microstrip_mask")]
    [InlineData("F9_broadside")]
    [InlineData("b_coupled_stripline_t0_2")]
    public void Modes_of_the_reference_matrices_are_those_of_the_reference(string name)
    {
        var reference = ReferenceSections.Named(name);
        var modes = PairModes.Of(new LineSolution(["a", "b"], "reference", reference.Capacitance, reference.Inductance, [], 0, []));

        Assert.True(modes.IsSymmetric);
        foreach (var (expected, actual) in new[]
                 {
                     (reference.Impedances["z_odd"], modes.ZOddOhms!.Value), (reference.Impedances["z_even"], modes.ZEvenOhms!.Value),
                     (reference.Impedances["z_diff"], modes.ZDiffOhms), (reference.Impedances["z_common"], modes.ZCommonOhms),
                     (reference.EpsEff["eps_eff_odd"], modes.EpsEffOdd!.Value), (reference.EpsEff["eps_eff_even"], modes.EpsEffEven!.Value),
                 })
            Assert.Equal(1, actual / expected, 1e-5);
    }

    [Fact]
    public void Unlike_traces_have_differential_but_no_odd_impedance()
    {
        var section = ReferenceSections.Named("F8_pair_stripline_2d").Section;
        var wide = section.Conductors[1] with { WideMetres = 0.15e-3, NarrowMetres = 0.138e-3 };

        var modes = PairModes.Of(ClosedForms.Calculate(section with { Conductors = [section.Conductors[0], wide] })!);

        Assert.False(modes.IsSymmetric);
        Assert.Null(modes.ZOddOhms);
        Assert.InRange(modes.ZDiffOhms, 80, 106);
    }

    [Fact]
    public void Single_line_has_no_pair_modes() =>
        Assert.Throws<ArgumentException>(() => PairModes.Of(ClosedForms.Calculate(ReferenceSections.Named("F1_microstrip_bare").Section)!));
}
