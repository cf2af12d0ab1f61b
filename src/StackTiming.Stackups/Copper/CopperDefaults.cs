using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Stackups.Copper;

/// <summary>
/// What a stack-up says of its copper, for all layers or for one. Where it says nothing: resistivity 1.72e-8 ohm m (annealed copper, IEC 60028
/// gives 1.7241e-8 at 20 °C), smooth faces, vertical walls.
/// </summary>
/// <param name="Resistivity">Resistivity, ohm metres, or null.</param>
/// <param name="Roughness">Root-mean-square roughness, metres, or null.</param>
/// <param name="EtchFactor">Thickness over undercut of one side, or null.</param>
/// <param name="Undercut">Undercut of one side, metres; wins over the etch factor; or null.</param>
public sealed record CopperDefaults(Quantity? Resistivity, Quantity? Roughness, Quantity? EtchFactor, Quantity? Undercut)
{
    private static readonly QuantityRange Factor = new(0.1, true, 1000, "must be between 0.1 and 1000");
    private static readonly QuantityRange RoughnessRange = new(0, true, 20e-6, "must be between zero and 20 um");
    private static readonly QuantityRange ResistivityRange = new(1e-9, true, 1e-3, "must be between 1e-9 and 1e-3 ohm m");

    private const double AnnealedOhmMetres = 1.72e-8;

    private static CopperDefaults Silent { get; } = new(null, null, null, null);

    /// <summary>True where nothing is said of the faces' roughness.</summary>
    public bool LacksRoughness => Roughness is null;

    /// <summary>True where nothing is said of the shape after etching.</summary>
    public bool LacksShape => EtchFactor is null && Undercut is null;

    /// <summary>Reads the <c>copper:</c> mapping of a stack-up.</summary>
    /// <param name="map">The mapping, or null where the stack-up has none.</param>
    public static CopperDefaults Read(MapReader? map)
    {
        if (map is null)
            return Silent;
        var result = Silent.With(map);
        map.Finish();
        return result;
    }

    /// <summary>These, overridden by what a mapping says.</summary>
    /// <param name="map">A layer, or the stack-up's copper mapping.</param>
    public CopperDefaults With(MapReader map)
    {
        var resistivity = map.Quantity("resistivity", Dimension.Resistivity, ResistivityRange);
        var roughness = map.Quantity("roughness", Dimension.Length, RoughnessRange);
        var factor = map.Quantity("etch-factor", Dimension.None, Factor);
        var undercut = map.Quantity("undercut", Dimension.Length, QuantityRange.NotNegative);
        if (factor is not null && undercut is not null)
            map.Problems.Error(map.PositionOf("undercut"), "'etch-factor' and 'undercut' say the same thing twice", "keep one of them");
        var restated = factor is not null || undercut is not null;
        return new CopperDefaults(resistivity ?? Resistivity, roughness ?? Roughness, restated ? factor : EtchFactor, restated ? undercut : Undercut);
    }

    /// <summary>The copper of a layer of this thickness.</summary>
    /// <param name="thickness">Copper thickness, metres.</param>
    public CopperProperties For(Quantity thickness)
    {
        var undercut = Undercut ?? (EtchFactor is { } factor ? UndercutOf(thickness.Value, factor) : Quantity.Exact(0));
        return new CopperProperties(Resistivity ?? Quantity.Exact(AnnealedOhmMetres), Roughness ?? Quantity.Exact(0), undercut);
    }

    // A larger etch factor undercuts less: the bounds change sides, and are those of the quotient itself rather than of its slope.
    private static Quantity UndercutOf(double thicknessMetres, Quantity factor)
    {
        var nominal = thicknessMetres / factor.Value;
        return new Quantity(nominal, factor.Tolerance with { Minus = nominal - thicknessMetres / factor.Highest, Plus = thicknessMetres / factor.Lowest - nominal });
    }
}
