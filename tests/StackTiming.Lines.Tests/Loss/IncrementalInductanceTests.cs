using StackTiming.Lines.Fields;
using StackTiming.Lines.Fields.Currents;
using StackTiming.Lines.Loss;
using StackTiming.Lines.Materials;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using Xunit;

namespace StackTiming.Lines.Tests.Loss;

public sealed class IncrementalInductanceTests
{
    private const double Copper = 1 / 5.813e7;

    /// <summary>
    /// D. M. Pozar, Microwave Engineering, example 3.5 (from memory): copper stripline of 50 ohm, b 3.2 mm, ε_r 2.20, tanδ 0.001, t 0.01 mm at 10 GHz: w 2.66 mm,
    /// dielectric 0.155 Np/m, conductor 0.122 Np/m.
    /// </summary>
    [Fact]
    public void Stripline_of_the_textbook_has_its_attenuation()
    {
        const double spacing = 3.2e-3, thickness = 0.01e-3, width = 2.66e-3, decibelPerNeper = 8.685889638;
        var section = Stripline(width, thickness, spacing, new SectionDielectric("laminate", 2.2, 0.001), 0);

        var line = IncrementalInductance.At(section, 10e9, ClosedForms.Calculator)!;

        var wave = line.Modes[0];
        // The book takes the strip for thin; its thickness lowers the impedance by 1 %.
        Assert.Equal(50, wave.Z0Ohms, 0.6);
        Assert.Equal(0.155, wave.DielectricDecibelPerMetre / decibelPerNeper, 0.001);
        Assert.Equal(0.122, wave.ConductorDecibelPerMetre / decibelPerNeper, 0.004);
        Assert.Equal(0, wave.RoughnessDecibelPerMetre);
    }

    [Fact]
    public void Wide_trace_over_a_plane_carries_its_current_on_two_facing_surfaces()
    {
        const double h = 50e-6, w = 20e-3, hertz = 10e9;
        var section = new CrossSection(
            [new DielectricSlab(new SectionDielectric("laminate", 4, 0), 0, h)], 0, null,
            [new SectionConductor("a", false, 0, w, w, 20e-6, h, true)], null, null, new SectionMetal(Copper, 0));

        var line = IncrementalInductance.At(section, hertz, ClosedForms.Calculator)!;

        Assert.Equal(2 * SkinEffect.SurfaceResistanceOhms(Copper, hertz) / w, line.ResistanceOhmPerMetre[0, 0], 0.03 * line.ResistanceOhmPerMetre[0, 0]);
    }

    /// <summary>
    /// Judged by the current distribution of the field solver, which shares no step with the incremental inductance of the closed forms. Below the skin-effect limit both
    /// interpolate, each in its own way.
    /// </summary>
    [Theory]
    [InlineData("F1_microstrip_bare")]
    [InlineData("F2_microstrip_mask")]
    [InlineData("F3_embedded")]
    [InlineData("F4_stripline_sym")]
    [InlineData("F5_stripline_offset_2d")]
    [InlineData("F6_stripline_3d")]
    [InlineData("F7_pair_microstrip_mask")]
    [InlineData("F8_pair_stripline_2d")]
    [InlineData("F9_broadside")]
    [InlineData("F10_coplanar_mask")]
    [InlineData("F12_three_mask")]
    [InlineData("h_stripline_thick_3")]
    public void Resistance_agrees_with_the_current_distribution_of_the_field_solver(string name)
    {
        var section = ReferenceSections.Named(name).Section;
        var judge = ConductorLoss.Of(FieldSolver.Default.Solve(section));
        foreach (var (hertz, limit) in new[] { (1e8, 0.1), (1e9, 0.05), (100e9, 0.03) })
        {
            var expected = judge.At(hertz).ResistanceOhmPerMetre;
            var actual = IncrementalInductance.At(section, hertz, ClosedForms.Calculator)!.ResistanceOhmPerMetre;
            Assert.Equal(1, actual[0, 0] / expected[0, 0], limit);
            if (section.Signals.Count() > 1)
                Assert.Equal(expected[0, 1] / expected[0, 0], actual[0, 1] / actual[0, 0], 0.02);
        }
    }

    [Fact]
    public void Offset_trapezoid_loses_as_much_by_the_closed_form_as_by_the_field_solver_and_as_much_upside_down()
    {
        var section = ReferenceSections.Named("F5_stripline_offset_2d").Section;
        double R(CrossSection s, ILineCalculator calculator) => IncrementalInductance.At(s, 10e9, calculator)!.ResistanceOhmPerMetre[0, 0];
        var closed = R(section, ClosedForms.Calculator);

        Assert.Equal(R(section, new FieldSolver(FieldSolverOptions.Default)), closed, 0.05 * closed);
        Assert.Equal(closed, R(Mirror.UpsideDown(section), ClosedForms.Calculator), 0.01 * closed);
    }

    [Fact]
    public void Low_frequencies_see_the_area_of_the_trapezoid_and_high_ones_the_root_of_frequency()
    {
        var section = ReferenceSections.Named("F5_stripline_offset_2d").Section;
        double R(double hertz) => IncrementalInductance.At(section, hertz, ClosedForms.Calculator)!.ResistanceOhmPerMetre[0, 0];
        var area = 0.5 * (100e-6 + 88e-6) * 15.2e-6;

        Assert.Equal(section.Metal.ResistivityOhmMetres / area, R(1e4), 0.001 * R(1e4));
        Assert.Equal(Math.Sqrt(10), R(100e9) / R(10e9), 0.03);
        Assert.True(R(1e9) > R(1e8));
    }

    [Fact]
    public void Dielectric_loss_is_the_shares_of_the_loss_tangents()
    {
        var reference = ReferenceSections.Named("F6_stripline_3d");
        var lossy = reference.Section with
        {
            Slabs = [.. reference.Section.Slabs.Select((s, i) => s with { Dielectric = s.Dielectric with { Df = 0.01 * (i + 1) } })],
        };
        const double hertz = 5e9;

        var line = IncrementalInductance.At(lossy, hertz, ClosedForms.Calculator)!;

        var expected = 0.01 * reference.EnergyShares["core"] + 0.02 * reference.EnergyShares["ply1"] + 0.03 * reference.EnergyShares["ply2"];
        Assert.Equal(expected, line.ConductanceSiemensPerMetre[0, 0] / (2 * Math.PI * hertz * line.CapacitanceFaradPerMetre[0, 0]), 1e-4);
    }

    [Fact]
    public void Roughness_raises_the_loss_and_the_parts_add_up()
    {
        var smooth = ReferenceSections.Named("F7_pair_microstrip_mask").Section;
        var rough = smooth with { Metal = smooth.Metal with { RoughnessRmsMetres = 1e-6 } };

        var before = IncrementalInductance.At(smooth, 5e9, ClosedForms.Calculator)!.Modes[0];
        var after = IncrementalInductance.At(rough, 5e9, ClosedForms.Calculator)!.Modes[0];

        Assert.Equal("differential", after.Name);
        Assert.Equal(before.ConductorDecibelPerMetre, after.ConductorDecibelPerMetre, 0.001 * before.ConductorDecibelPerMetre);
        Assert.True(after.RoughnessDecibelPerMetre > 0.2 * after.ConductorDecibelPerMetre);
        Assert.Equal(
            after.ConductorDecibelPerMetre + after.RoughnessDecibelPerMetre + after.DielectricDecibelPerMetre, after.AttenuationDecibelPerMetre, 12);
    }

    [Fact]
    public void Inductance_falls_towards_the_external_one()
    {
        var section = ReferenceSections.Named("F5_stripline_offset_2d").Section;
        double L(double hertz) => IncrementalInductance.At(section, hertz, ClosedForms.Calculator)!.InductanceHenryPerMetre[0, 0];
        var external = ClosedForms.Calculate(section)!.InductanceHenryPerMetre[0, 0];

        Assert.True(L(1e6) > L(1e8) && L(1e8) > L(10e9) && L(10e9) > external);
        Assert.Equal(1, L(1e12) / external, 0.005);
    }

    [Fact]
    public void Thin_strip_says_that_its_copper_loss_is_unknown()
    {
        var section = ReferenceSections.Named("a_stripline_t0_1").Section;

        var line = IncrementalInductance.At(section, 1e9, ClosedForms.Calculator)!;

        Assert.Equal(0, line.ResistanceOhmPerMetre[0, 0]);
        Assert.Contains(line.Warnings, w => w.Contains("without thickness", StringComparison.Ordinal));
    }

    private static CrossSection Stripline(double width, double thickness, double spacing, SectionDielectric dielectric, double roughness) => new(
        [new DielectricSlab(dielectric, 0, spacing)], 0, spacing,
        [new SectionConductor("a", false, 0, width, width, thickness, 0.5 * (spacing - thickness), true)], null, null, new SectionMetal(Copper, roughness));
}
