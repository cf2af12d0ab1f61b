using System.Collections.Immutable;
using StackTiming.Stackups.Copper;
using StackTiming.Stackups.Materials;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Stackups.Layers;

/// <summary>Reads stack-up files (<c>*.stackup.yaml</c>) and the stack-ups written inside section files.</summary>
public static class StackUpReader
{
    // Thicker than any laminate; catches a forgotten unit prefix.
    private static readonly QuantityRange Thickness = new(0, false, 20e-3, "must be above zero and at most 20 mm");
    private static readonly QuantityRange ThinOrThick = new(0, true, 20e-3, "must be between zero and 20 mm");
    private static readonly QuantityRange Permittivity = new(1, true, 1000, "must be between 1 and 1000");
    private static readonly QuantityRange LossTangent = new(0, true, 1, "must be between 0 and 1");
    private static readonly QuantityRange Share = new(0, true, 1, "must be between 0 % and 100 %");

    private static readonly string[] LayerKinds = ["copper", "core", "prepreg", "mask"];

    private static readonly Dictionary<string, CopperUse> Uses = new(StringComparer.Ordinal)
    {
        ["signal"] = CopperUse.Signal,
        ["plane"] = CopperUse.Plane,
        ["mixed"] = CopperUse.Mixed,
    };

    private static readonly Dictionary<string, WideFace> Faces = new(StringComparer.Ordinal) { ["up"] = WideFace.Up, ["down"] = WideFace.Down };

    /// <summary>Reads a stack-up file.</summary>
    /// <param name="file">The file.</param>
    /// <param name="problems">Where problems go.</param>
    public static StackUp? Read(InputFile file, ProblemList problems) =>
        YamlDocument.ReadMap(file, problems) is { } map ? Read(map, problems) : null;

    /// <summary>Reads a stack-up from its mapping.</summary>
    /// <param name="map">The mapping.</param>
    /// <param name="problems">Where problems go.</param>
    /// <param name="allowThinCopper">Accepts copper of no thickness, for comparisons with results for thin strips.</param>
    public static StackUp? Read(DataMap map, ProblemList problems, bool allowThinCopper = false)
    {
        var errorsBefore = problems.ErrorCount;
        var plain = new MapReader(map, DefaultUnits.None, problems);
        var units = DefaultUnitsReader.Read(plain);
        var file = new MapReader(map, units, problems);
        FormatVersion.Check(file);
        file.Has("units");
        var name = file.Text("name") ?? "";
        var revision = file.Text("revision") ?? "";
        var dielectrics = ReadDielectrics(file);
        var defaults = CopperDefaults.Read(file.Map("copper"));
        var silences = new CopperSilences();
        var layers = ReadLayers(file, dielectrics, defaults, allowThinCopper, silences);
        file.Finish();
        if (layers is { } whole)
            StackUpOrder.Check(map.At, whole, problems);
        if (problems.ErrorCount > errorsBefore)
            return null;
        silences.Note(file.PositionOf("copper"), problems);
        return new StackUp(name, revision, StackUpOrder.WithWideFaces(layers!.Value, problems));
    }

    private static Dictionary<string, Dielectric> ReadDielectrics(MapReader file)
    {
        var found = new Dictionary<string, Dielectric>(StringComparer.Ordinal);
        foreach (var entry in file.Named("dielectrics"))
        {
            if (file.MapOf(entry.Value, entry.Key) is not { } map)
            {
                found[entry.Key] = Unread(entry.Key);
                continue;
            }
            var dk = map.NeedQuantity("dk", Dimension.None, Permittivity, "dk: 3.9");
            var df = map.Quantity("df", Dimension.None, LossTangent);
            var at = map.Quantity("at", Dimension.Frequency, QuantityRange.Positive);
            var resin = map.Quantity("resin", Dimension.Ratio, Share);
            map.Finish();
            if (!map.Has("df"))
                file.Problems.Note(map.At, $"'{Suggestion.Shorten(entry.Key)}' states no df and counts as lossless", "write df: 0.02");
            else if (at is null && !map.Has("at"))
                file.Problems.Note(map.At, $"'{Suggestion.Shorten(entry.Key)}' does not say at which frequency its dk and df hold; 1 GHz is taken", "write at: 1 GHz");
            if (string.Equals(entry.Key, "air", StringComparison.OrdinalIgnoreCase) && dk is { Value: not 1 })
                file.Problems.Error(entry.KeyAt, "the name 'air' is kept for the space around the board", "choose another name");
            found[entry.Key] = new Dielectric(entry.Key, dk ?? Quantity.Exact(1), df ?? Quantity.Exact(0), at?.Value ?? 1e9, resin);
        }
        return found;
    }

    // A material that is refused still counts as named, so that its layers are not reported too.
    private static Dielectric Unread(string name) => new(name, Quantity.Exact(1), Quantity.Exact(0), 1e9, null);

    // Null where a layer is refused: what then seems to be missing between its neighbours is not.
    private static ImmutableArray<Layer>? ReadLayers(
        MapReader file, Dictionary<string, Dielectric> dielectrics, CopperDefaults defaults, bool allowThinCopper, CopperSilences silences)
    {
        if (file.Need("layers", "layers: with one entry a layer, from the top face to the bottom face") is not { } node)
            return null;
        if (node is not DataList list)
        {
            file.Problems.Error(node.At, "'layers' must be a list", "begin each layer with - { copper: L1, … }");
            return null;
        }
        var layers = ImmutableArray.CreateBuilder<Layer>();
        foreach (var item in list.Items)
        {
            if (item is not DataMap entry)
                file.Problems.Error(item.At, "a layer must be a mapping", "write - { copper: L1, thickness: …, use: … } or - { core: MATERIAL, thickness: … }");
            else if (ReadLayer(new MapReader(entry, file.Units, file.Problems), dielectrics, defaults, allowThinCopper, silences) is { } layer)
                layers.Add(layer);
        }
        return layers.Count == list.Items.Length ? layers.ToImmutable() : null;
    }

    private static Layer? ReadLayer(
        MapReader map, Dictionary<string, Dielectric> dielectrics, CopperDefaults defaults, bool allowThinCopper, CopperSilences silences)
    {
        var kinds = LayerKinds.Where(map.Has).ToArray();
        if (kinds.Length != 1)
        {
            map.Problems.Error(map.At, kinds.Length == 0 ? "the layer does not say what it is" : $"the layer says that it is {string.Join(" and ", kinds)}",
                "write one of copper: NAME, core: MATERIAL, prepreg: MATERIAL, mask: MATERIAL");
            return null;
        }
        Layer? layer = kinds[0] switch
        {
            "copper" => ReadCopper(map, defaults, allowThinCopper, silences),
            "mask" => ReadMask(map, dielectrics),
            var kind => ReadDielectricLayer(map, kind, dielectrics),
        };
        map.Finish();
        return layer;
    }

    private static CopperLayer? ReadCopper(MapReader map, CopperDefaults defaults, bool allowThinCopper, CopperSilences silences)
    {
        var name = map.Text("copper");
        if (name is not null && string.IsNullOrWhiteSpace(name))
            map.Problems.Error(map.PositionOf("copper"), "the copper layer has no name", "write copper: L1");
        var thickness = map.NeedQuantity("thickness", Dimension.Length, allowThinCopper ? ThinOrThick : Thickness, "thickness: 35 um");
        map.Need("use", "use: signal, use: plane or use: mixed");
        var use = map.Choice("use", Uses);
        var width = map.Tolerance("width-tolerance", Dimension.Length);
        var face = map.Choice("base", Faces);
        var stated = defaults.With(map);
        if (name is null || thickness is null || use is null)
            return null;
        // Planes are taken as flat, and copper without thickness has no walls.
        if (use != CopperUse.Plane && thickness.Value.Value > 0)
            silences.Add(name, stated);
        return new CopperLayer(map.At, name, thickness.Value, use.Value, stated.For(thickness.Value), face ?? WideFace.Down, width) { WideFaceStated = face is not null };
    }

    private static DielectricLayer? ReadDielectricLayer(MapReader map, string kind, Dictionary<string, Dielectric> dielectrics)
    {
        var material = Material(map, kind, dielectrics);
        var thickness = map.NeedQuantity("thickness", Dimension.Length, Thickness, "thickness: 100 um");
        if (material is null || thickness is null)
            return null;
        return new DielectricLayer(map.At, kind == "core" ? DielectricKind.Core : DielectricKind.Prepreg, material, thickness.Value);
    }

    private static MaskLayer? ReadMask(MapReader map, Dictionary<string, Dielectric> dielectrics)
    {
        var material = Material(map, "mask", dielectrics);
        var laminate = map.NeedQuantity("over-laminate", Dimension.Length, Thickness, "over-laminate: 25 um");
        var copper = map.NeedQuantity("over-copper", Dimension.Length, Thickness, "over-copper: 15 um");
        return material is null || laminate is null || copper is null ? null : new MaskLayer(map.At, material, laminate.Value, copper.Value);
    }

    private static Dielectric? Material(MapReader map, string kind, Dictionary<string, Dielectric> dielectrics)
    {
        if (map.Text(kind) is not { } name)
            return null;
        if (dielectrics.TryGetValue(name, out var material))
            return material;
        map.Problems.Error(map.PositionOf(kind), $"the material '{Suggestion.Shorten(name)}' is not among the dielectrics",
            Suggestion.For(name, dielectrics.Keys) ?? "declare it under dielectrics:");
        return null;
    }
}
