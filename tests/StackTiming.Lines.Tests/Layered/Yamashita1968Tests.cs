using CsCheck;
using StackTiming.Lines.Layered;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using Xunit;

namespace StackTiming.Lines.Tests.Layered;

public sealed class Yamashita1968Tests
{
    private static readonly Yamashita1968 Form = new();

    /// <summary>
    /// Three conductors at two heights in two dielectrics: C. Wei, R. F. Harrington, J. R. Mautz, T. K. Sarkar, "Multiconductor transmission lines in multilayered dielectric
    /// media", IEEE Trans. MTT-32, 1984, pp. 439–450 (values from memory, agreeing with those quoted of Delbare and De Zutter 1989; geometry as in design/standards.md 6.6).
    /// </summary>
    [Fact]
    public void Three_conductors_in_two_dielectrics_agree_with_Wei_1984()
    {
        const double micrometre = 1e-6;
        SectionConductor At(string name, double left, double bottom) =>
            new(name, false, (left + 175) * micrometre, 350 * micrometre, 350 * micrometre, 70 * micrometre, bottom * micrometre, true);
        var section = new CrossSection(
            [
                new DielectricSlab(new SectionDielectric("lower", 4.3, 0), 0, 200 * micrometre),
                new DielectricSlab(new SectionDielectric("upper", 3.2, 0), 200 * micrometre, 300 * micrometre),
            ],
            0, null, [At("1", -675, 200), At("2", -175, 300), At("3", 325, 300)], null, null, new SectionMetal(1.7e-8, 0));

        var c = Form.Calculate(section).CapacitanceFaradPerMetre;

        Assert.Equal(142.1e-12, c[0, 0], 142.1e-12 * 0.01);
        Assert.Equal(93.5e-12, c[1, 1], 93.5e-12 * 0.01);
        Assert.Equal(88.0e-12, c[2, 2], 88.0e-12 * 0.01);
        Assert.Equal(-21.77e-12, c[0, 1], 21.77e-12 * 0.02);
        Assert.Equal(-18.1e-12, c[1, 2], 18.1e-12 * 0.02);
        // The far coupling, 0.6 % of the own capacitance, is less certain: 6 % low.
        Assert.Equal(-0.892e-12, c[0, 2], 0.892e-12 * 0.08);
    }

    /// <summary>The inductance is that of the section in air: tests/references/sections, F5 and F8.</summary>
    [Theory]
    [InlineData("F5_stripline_offset_2d")]
    [InlineData("F8_pair_stripline_2d")]
    public void Air_under_a_top_plane_counts_where_no_slab_fills_it(string name)
    {
        var reference = ReferenceSections.Named(name);

        var line = Form.Calculate(reference.Section with { Slabs = [] });

        Assert.Equal(reference.Inductance[0, 0], line.InductanceHenryPerMetre[0, 0], 0.003 * reference.Inductance[0, 0]);
    }

    [Fact]
    public void Impedance_falls_with_width_and_permittivity_stays_between_air_and_the_densest_dielectric() =>
        Lines.Sample(
            section =>
            {
                var line = Form.Calculate(section);
                var wider = Form.Calculate(Widen(section, 1.05));
                var densest = section.Slabs.Select(s => s.Dielectric.Dk).Append(section.TopMask?.Dielectric.Dk ?? 1).Max();
                return wider.Z0Ohms < line.Z0Ohms && line.EpsEff >= 1 && line.EpsEff <= densest * (1 + 1e-9) && Math.Abs(line.EnergyShares.Sum(s => s.Share) - 1) < 1e-9;
            },
            iter: 100, threads: 1);

    [Fact]
    public void Pair_is_symmetric_and_its_odd_mode_has_the_lower_impedance() =>
        Lines.Sample(
            section =>
            {
                var solution = Form.Calculate(Pair(section, 1.2 * section.Conductors[0].WideMetres));
                var (c, l) = (solution.CapacitanceFaradPerMetre, solution.InductanceHenryPerMetre);
                var modes = PairModes.Of(solution);
                return modes.IsSymmetric && c[0, 1] < 0 && l[0, 1] > 0 && Math.Abs(c[0, 1] - c[1, 0]) < 1e-9 * c[0, 0] && modes.ZOddOhms < modes.ZEvenOhms;
            },
            iter: 25, threads: 1);

    [Fact]
    public void Far_traces_are_single_lines() =>
        Lines.Sample(
            section =>
            {
                var far = PairModes.Of(Form.Calculate(Pair(section, 40 * section.Conductors[0].BottomMetres)));
                var alone = Form.Calculate(section);
                return Math.Abs(far.ZDiffOhms / (2 * alone.Z0Ohms) - 1) < 0.006 && Math.Abs(far.ZCommonOhms / (0.5 * alone.Z0Ohms) - 1) < 0.006;
            },
            iter: 15, threads: 1);

    [Fact]
    public void Very_wide_trace_is_a_plate()
    {
        const double h = 1e-4, w = 100 * h;
        var section = new CrossSection(
            [new DielectricSlab(new SectionDielectric("laminate", 4, 0), 0, h)], 0, null,
            [new SectionConductor("a", false, 0, w, w, 0, h, true)], null, null, new SectionMetal(1.7e-8, 0));

        var line = Form.Calculate(section);

        // The fringe of w/h = 100 adds 4 % (Hammerstad and Jensen 1980 in air); its field lies half in the air.
        Assert.Equal(376.730313668 / (2 * 100), line.Z0Ohms, 0.05 * line.Z0Ohms);
        Assert.InRange(line.EpsEff, 3.85, 4);
    }

    [Fact]
    public void Space_under_the_upper_plane_counts_whether_air_is_written_as_a_slab_or_not()
    {
        var section = ReferenceSections.Named("F5_stripline_offset_2d").Section;
        var top = section.TopPlaneMetres!.Value;
        var written = section with { Slabs = [new DielectricSlab(SectionDielectric.Air, 0, top)] };
        var halfWritten = section with { Slabs = [new DielectricSlab(SectionDielectric.Air, 0, 0.5 * top)] };

        Assert.Equal(Form.Calculate(written).Z0Ohms, Form.Calculate(section with { Slabs = [] }).Z0Ohms, 9);
        Assert.Equal(1, Form.Calculate(halfWritten).Z0Ohms / Form.Calculate(written).Z0Ohms, 1e-4);
        Assert.Equal(1, Form.Calculate(written).InductanceHenryPerMetre[0, 0] / Form.Calculate(section).InductanceHenryPerMetre[0, 0], 1e-6);
    }

    [Fact]
    public void Vanishing_mask_is_no_mask()
    {
        var masked = ReferenceSections.Named("F2_microstrip_mask").Section;
        var thin = masked with { TopMask = masked.TopMask! with { OverLaminateMetres = 1e-9, OverCopperMetres = 1e-9 } };
        var airy = masked with { TopMask = masked.TopMask! with { Dielectric = new SectionDielectric("mask", 1, 0) } };
        var bare = Form.Calculate(masked with { TopMask = null });

        Assert.Equal(1, Form.Calculate(thin).EpsEff / bare.EpsEff, 2e-3);
        Assert.Equal(1, Form.Calculate(airy).EpsEff / bare.EpsEff, 2e-3);
    }

    [Fact]
    public void Mask_lowers_the_impedance()
    {
        var masked = ReferenceSections.Named("F2_microstrip_mask").Section;

        Assert.True(Form.Calculate(masked).Z0Ohms < Form.Calculate(masked with { TopMask = null }).Z0Ohms);
    }

    [Fact]
    public void Plane_with_an_edge_under_a_trace_is_declined()
    {
        var section = ReferenceSections.Named("F4_stripline_sym").Section;
        var plane = new SectionConductor("plane", true, -0.2e-3, 0.5e-3, 0.5e-3, 0.015e-3, 0.05e-3, true);

        Assert.Contains("plane with an edge", Form.Objection(section with { Conductors = section.Conductors.Add(plane) }), StringComparison.Ordinal);
    }

    [Theory]
    [InlineData(0.02e-3)]
    [InlineData(0.004e-3)]
    public void Close_traces_are_flagged(double gapMetres)
    {
        var single = ReferenceSections.Named("F7_pair_microstrip_mask").Section;
        var a = single.Conductors[0];
        var pitch = 0.5 * (a.WideMetres + gapMetres);
        var section = single with { Conductors = [a with { CentreMetres = -pitch }, a with { Name = "b", CentreMetres = pitch }] };

        var solution = Form.Calculate(section);

        Assert.NotEmpty(solution.Warnings);
        Assert.All(solution.CapacitanceFaradPerMetre.Cast<double>(), c => Assert.True(double.IsFinite(c)));
    }

    [Fact]
    public void Extreme_proportions_give_finite_results()
    {
        foreach (var (width, thickness, height) in new[] { (1e-6, 1e-7, 1e-3), (1e-2, 1e-8, 1e-5), (1e-4, 1e-4, 1e-5), (1e-4, 1e-12, 1e-4), (5e-3, 1e-5, 5e-5) })
        {
            var section = new CrossSection(
                [new DielectricSlab(new SectionDielectric("laminate", 4, 0), 0, height)], 0, null,
                [new SectionConductor("a", false, 0, width, width, thickness, height, true)], null, null, new SectionMetal(1.7e-8, 0));
            var line = Form.Calculate(section);
            Assert.True(double.IsFinite(line.Z0Ohms) && line.EpsEff is > 1 and < 4, $"{width} {thickness} {height}: {line.Z0Ohms}, {line.EpsEff}");
        }
    }

    /// <summary>Single traces as boards have them: bare, masked, embedded, between planes.</summary>
    private static Gen<CrossSection> Lines { get; } =
        from height in Gen.Double[50e-6, 300e-6]
        from widthOverHeight in Gen.Double[0.4, 3]
        from thickness in Gen.Double[0, 50e-6]
        from undercut in Gen.Double[0, 8e-6]
        from dk in Gen.Double[2, 6]
        from coverDk in Gen.Double[2, 6]
        from kind in Gen.Int[0, 3]
        select Line(height, widthOverHeight * height, thickness, Math.Min(undercut, 0.1 * widthOverHeight * height), dk, coverDk, kind);

    private static CrossSection Line(double height, double width, double thickness, double undercut, double dk, double coverDk, int kind)
    {
        var laminate = new DielectricSlab(new SectionDielectric("laminate", dk, 0), 0, height);
        var cover = new DielectricSlab(new SectionDielectric("cover", coverDk, 0), height, 2 * height + thickness);
        var mask = new SectionMask(new SectionDielectric("mask", 3.5, 0), 25e-6, 15e-6);
        return new CrossSection(
            kind < 2 ? [laminate] : [laminate, cover], 0, kind == 3 ? cover.TopMetres : null,
            [new SectionConductor("a", false, 0, width, width - 2 * undercut, thickness, height, true)],
            kind == 1 ? mask : null, null, new SectionMetal(1.7e-8, 0));
    }

    private static CrossSection Widen(CrossSection section, double factor)
    {
        var c = section.Conductors[0];
        return section with { Conductors = [c with { WideMetres = factor * c.WideMetres, NarrowMetres = c.NarrowMetres + (factor - 1) * c.WideMetres }] };
    }

    private static CrossSection Pair(CrossSection section, double gap)
    {
        var c = section.Conductors[0];
        var pitch = 0.5 * (c.WideMetres + gap);
        return section with { Conductors = [c with { CentreMetres = -pitch }, c with { Name = "b", CentreMetres = pitch }] };
    }
}
