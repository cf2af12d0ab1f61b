using StackTiming.Lines.Fields;
using StackTiming.Lines.Loss;
using StackTiming.Lines.Materials;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Sweeps;
using Xunit;

namespace StackTiming.Lines.Tests.Sweeps;

public sealed class LineSweepTests
{
    private const double Resistivity = 1.72e-8;

    [Fact]
    public void Frequencies_are_evenly_spaced_with_both_ends_exact()
    {
        var hertz = new FrequencyRange(1e6, 2e10, 10).Hertz();

        Assert.Equal(1e6, hertz[0]);
        Assert.Equal(2e10, hertz[^1]);
        // 4.3 decades at 10 each.
        Assert.Equal(45, hertz.Length);
        for (var i = 2; i < hertz.Length; i++)
            Assert.Equal(hertz[1] / hertz[0], hertz[i] / hertz[i - 1], 1e-9);
    }

    [Fact]
    public void Resistance_begins_at_the_area_of_the_trapezoid_and_grows_as_the_root_of_frequency()
    {
        var sweep = LineSweep.Of(_ => Microstrip(0, 0), [1, 1e11, 4e11], FieldSolver.Default)!.Value;

        var direct = Resistivity / (0.5 * (150e-6 + 130e-6) * 35e-6);
        Assert.Equal(direct, sweep[0].ResistanceOhmPerMetre[0, 0], 1e-3 * direct);
        Assert.Equal(2, sweep[2].ResistanceOhmPerMetre[0, 0] / sweep[1].ResistanceOhmPerMetre[0, 0], 0.02);
    }

    /// <summary>
    /// Wheeler's incremental inductance of the closed forms (Hammerstad and Jensen) is a second way to the skin-effect loss of a smooth line; they differ by
    /// what the thickness correction of the closed form lacks.
    /// </summary>
    [Fact]
    public void Both_methods_agree_on_a_smooth_microstrip_in_the_skin_effect()
    {
        var field = LineSweep.Of(_ => Microstrip(0.02, 0), [2e10], FieldSolver.Default)!.Value[0].Modes[0];
        var closed = LineSweep.Of(_ => Microstrip(0.02, 0), [2e10], ClosedForms.Calculator)!.Value[0].Modes[0];

        Assert.Equal(closed.ConductorDecibelPerMetre, field.ConductorDecibelPerMetre, 0.1 * closed.ConductorDecibelPerMetre);
        Assert.Equal(closed.DielectricDecibelPerMetre, field.DielectricDecibelPerMetre, 0.02 * closed.DielectricDecibelPerMetre);
        Assert.Equal(closed.DelaySecondsPerMetre, field.DelaySecondsPerMetre, 0.01 * closed.DelaySecondsPerMetre);
    }

    /// <summary>In one dielectric α_d = π·f·tanδ·√ε/c, whatever the shape.</summary>
    [Fact]
    public void Dielectric_loss_of_a_homogeneous_line_is_that_of_the_material()
    {
        const double hertz = 5e9, dk = 4, df = 0.01, b = 400e-6;
        var section = new CrossSection(
            [new DielectricSlab(new SectionDielectric("laminate", dk, df), 0, b)], 0, b,
            [new SectionConductor("a", false, 0, 150e-6, 150e-6, 18e-6, 191e-6, true)], null, null, new SectionMetal(1e-14, 0));

        var wave = LineSweep.Of(_ => section, [hertz], FieldSolver.Default)!.Value[0].Modes[0];

        var expected = 20 / Math.Log(10) * Math.PI * hertz * df * 2 / 299792458.0;
        Assert.Equal(expected, wave.DielectricDecibelPerMetre, 1e-3 * expected);
    }

    [Fact]
    public void Roughness_adds_what_its_factor_says_and_nothing_at_low_frequency()
    {
        const double rms = 1.2e-6;
        var rough = LineSweep.Of(_ => Microstrip(0, rms), [1e4, 2e10], FieldSolver.Default)!.Value;

        var depth = SkinEffect.DepthMetres(Resistivity, 2e10);
        var factor = 1 + 2 / Math.PI * Math.Atan(1.4 * rms * rms / (depth * depth));
        var wave = rough[1].Modes[0];
        Assert.Equal(factor, (wave.ConductorDecibelPerMetre + wave.RoughnessDecibelPerMetre) / wave.ConductorDecibelPerMetre, 0.02);
        Assert.True(rough[0].Modes[0].RoughnessDecibelPerMetre < 1e-4 * rough[0].Modes[0].ConductorDecibelPerMetre);
    }

    [Fact]
    public void Constants_of_the_waves_of_a_pair_give_their_impedances()
    {
        var line = IncrementalInductance.At(
            new CrossSection(
                [new DielectricSlab(new SectionDielectric("laminate", 4, 0), 0, 100e-6)], 0, null,
                [
                    new SectionConductor("p", false, -150e-6, 150e-6, 150e-6, 35e-6, 100e-6, true),
                    new SectionConductor("n", false, 150e-6, 150e-6, 150e-6, 35e-6, 100e-6, true),
                ],
                null, null, new SectionMetal(1e-14, 0)),
            1e9, FieldSolver.Default)!;

        for (var mode = 0; mode < 2; mode++)
        {
            var of = ModeConstants.Of(line, mode);
            Assert.Equal(Math.Sqrt(of.InductanceHenryPerMetre / of.CapacitanceFaradPerMetre), line.Modes[mode].Z0Ohms, 1e-3);
        }
        Assert.Equal(["differential", "common"], line.Modes.Select(m => m.Name));
    }

    private static CrossSection Microstrip(double df, double roughness) => new(
        [new DielectricSlab(new SectionDielectric("laminate", 4.2, df), 0, 110e-6)], 0, null,
        [new SectionConductor("a", false, 0, 150e-6, 130e-6, 35e-6, 110e-6, true)], null, null, new SectionMetal(Resistivity, roughness));
}
