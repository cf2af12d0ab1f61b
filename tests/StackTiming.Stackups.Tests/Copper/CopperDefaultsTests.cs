using CsCheck;
using StackTiming.Stackups.Copper;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Stackups.Tests.Copper;

public sealed class CopperDefaultsTests
{
    private static CopperDefaults Read(string keys, CopperDefaults? over = null)
    {
        var problems = new ProblemList();
        var map = new MapReader(YamlDocument.ReadMap(new InputFile("f.yaml", $"copper: {{ {keys} }}", ""), problems)!, DefaultUnits.None, problems).Map("copper")!;
        var read = over is null ? CopperDefaults.Read(map) : over.With(map);
        Assert.Empty(problems.Items);
        return read;
    }

    private static Quantity Micrometres(double value) => Quantity.Exact(value * 1e-6);

    // The definition of formats.md: etch factor = thickness / undercut of one side.
    [Fact]
    public void The_undercut_is_the_thickness_over_the_etch_factor()
    {
        Gen.Select(Gen.Double[5, 200], Gen.Double[0.5, 50]).Sample((thickness, factor) =>
        {
            var written = FormattableString.Invariant($"etch-factor: {factor:R}");
            var undercut = Read(written).For(Micrometres(thickness)).UndercutMetres.Value;
            Assert.Equal(factor, thickness * 1e-6 / undercut, factor * 1e-9);
        }, iter: 200);
    }

    [Fact]
    public void The_largest_etch_factor_gives_the_smallest_undercut()
    {
        var undercut = Read("etch-factor: 2.5 ±20 % limits").For(Micrometres(45)).UndercutMetres;
        Assert.Equal(45e-6 / 3, undercut.Lowest, 1e-15);
        Assert.Equal(45e-6 / 2, undercut.Highest, 1e-15);
        Assert.Equal(Spread.Limits, undercut.Tolerance.Spread);
    }

    [Fact]
    public void A_layer_overrides_only_what_it_states()
    {
        var board = Read("resistivity: 2.0e-8 ohm m, roughness: 1.2 um, etch-factor: 2.5");
        var rough = Read("roughness: 3 um", board).For(Micrometres(45));
        Assert.Equal(2.0e-8, rough.ResistivityOhmMetres.Value);
        Assert.Equal(3e-6, rough.RoughnessRms.Value, 1e-15);
        Assert.Equal(18e-6, rough.UndercutMetres.Value, 1e-15);
        Assert.Equal(12e-6, Read("undercut: 12 um", board).For(Micrometres(45)).UndercutMetres.Value, 1e-15);
        var steep = Read("etch-factor: 5", Read("undercut: 12 um"));
        Assert.Equal(9e-6, steep.For(Micrometres(45)).UndercutMetres.Value, 1e-15);
    }

    // IEC 60028: annealed copper has 1/58 ohm mm²/m = 1.7241e-8 ohm m at 20 °C; the default is its three-digit rounding.
    [Fact]
    public void Silence_means_annealed_copper_with_smooth_faces_and_vertical_walls()
    {
        var silent = CopperDefaults.Read(null);
        Assert.True(silent.LacksShape && silent.LacksRoughness);
        var copper = silent.For(Micrometres(35));
        Assert.Equal(1 / 58e6, copper.ResistivityOhmMetres.Value, 0.005e-8);
        Assert.Equal(0, copper.RoughnessRms.Value);
        Assert.Equal(0, copper.UndercutMetres.Value);
    }
}
