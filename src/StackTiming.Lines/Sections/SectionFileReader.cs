using System.Collections.Immutable;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Lines.Sections;

/// <summary>Reads section files (<c>*.section.yaml</c>): a stack-up, referenced or written inside, and the conductors in it.</summary>
public static class SectionFileReader
{
    private const int MostConductors = 200;

    // Wider than any board; catches a forgotten unit prefix.
    private static readonly QuantityRange Width = new(0, false, 2, "must be above zero and at most 2 m");
    private static readonly QuantityRange Place = new(-2, true, 2, "must be between -2 m and 2 m");

    /// <summary>Reads a section file, with all problems of it and of its stack-up, or null where there are any.</summary>
    /// <param name="file">The file.</param>
    /// <param name="problems">Where problems go.</param>
    public static SectionFile? Read(InputFile file, ProblemList problems)
    {
        var before = problems.ErrorCount;
        if (YamlDocument.ReadMap(file, problems) is not { } map)
            return null;
        var units = DefaultUnitsReader.Read(new MapReader(map, DefaultUnits.None, problems));
        var reader = new MapReader(map, units, problems);
        FormatVersion.Check(reader);
        reader.Has("units");
        reader.Has("name");
        var stackUp = ReadStackUp(reader, file.Path);
        var conductors = ReadConductors(reader, stackUp);
        reader.Finish();
        if (problems.ErrorCount > before || stackUp is null)
            return null;
        var section = new SectionFile(stackUp, conductors);
        // What stands where no conductor can stand is a fault of the file: found here, before anything is computed.
        return section.At(null, problems) is null ? null : section;
    }

    private static StackUp? ReadStackUp(MapReader reader, string path)
    {
        switch (reader.Need("stackup", "stackup: board.stackup.yaml, or the stack-up itself as a mapping"))
        {
            case DataMap inline:
                return StackUpReader.Read(inline, reader.Problems, allowThinCopper: true);
            case DataScalar { Text.Length: > 0 } reference:
                if (InputPath.Resolve(path, reference.Text, reader.Problems, reference.At) is not { } target)
                    return null;
                InputPath.NoteIfOutside(Path.GetDirectoryName(path) ?? "", target, reader.Problems, reference.At);
                return InputFileLoader.Load(target, reference.At, reader.Problems) is { } file && YamlDocument.ReadMap(file, reader.Problems) is { } map
                    ? StackUpReader.Read(map, reader.Problems, allowThinCopper: true)
                    : null;
            case { } other:
                reader.Problems.Error(other.At, "'stackup' must be a path or a mapping", "write stackup: board.stackup.yaml");
                return null;
            default:
                return null;
        }
    }

    private static ImmutableArray<PlacedConductor> ReadConductors(MapReader reader, StackUp? stackUp)
    {
        if (reader.Need("conductors", "conductors: with one entry a trace, such as - { name: a, layer: L1, x: 0 mm, width: 0.1 mm }") is null)
            return [];
        var items = reader.List("conductors");
        if (items.Length is 0 or > MostConductors)
        {
            reader.Problems.Error(
                reader.PositionOf("conductors"), items.IsEmpty ? "the section has no conductors" : $"the section has {items.Length} conductors; at most {MostConductors} are read");
            return [];
        }
        var placed = ImmutableArray.CreateBuilder<PlacedConductor>(items.Length);
        foreach (var item in items)
        {
            if (reader.MapOf(item, "conductors") is { } map && ReadConductor(map, stackUp) is { } conductor)
                placed.Add(conductor);
        }
        return placed.ToImmutable();
    }

    private static PlacedConductor? ReadConductor(MapReader map, StackUp? stackUp)
    {
        var name = map.NeedText("name", "name: a");
        var layer = map.NeedText("layer", "layer: L1");
        var span = ReadSpan(map);
        var grounded = map.Flag("grounded");
        map.Finish();
        if (name is null || layer is null || span is not var (left, right))
            return null;
        var isPlane = stackUp?.FindCopper(layer)?.Use == CopperUse.Plane;
        // A plane with edges stays a plane: it is grounded unless the file says otherwise.
        return new PlacedConductor(map.At, name, layer, left, right, grounded ?? (isPlane && map.Has("from")));
    }

    private static (double Left, double Right)? ReadSpan(MapReader map)
    {
        bool byCentre = map.Has("x") | map.Has("width"), byEdges = map.Has("from") | map.Has("to");
        if (byCentre == byEdges)
        {
            map.Problems.Error(
                map.At, byCentre ? "the conductor states both a centre with a width and its edges" : "the conductor does not say where it lies",
                "write x and width, or from and to");
            return null;
        }
        if (byCentre)
        {
            var x = map.NeedQuantity("x", Dimension.Length, Place, "x: 0 mm");
            var width = map.NeedQuantity("width", Dimension.Length, Width, "width: 0.1 mm");
            return x is null || width is null ? null : (x.Value.Value - 0.5 * width.Value.Value, x.Value.Value + 0.5 * width.Value.Value);
        }
        var from = map.NeedQuantity("from", Dimension.Length, Place, "from: 0.5 mm");
        var to = map.NeedQuantity("to", Dimension.Length, Place, "to: 3.5 mm");
        if (from is null || to is null)
            return null;
        if (from.Value.Value < to.Value.Value)
            return (from.Value.Value, to.Value.Value);
        map.Problems.Error(map.PositionOf("from"), "'from' must lie to the left of 'to'", "exchange them");
        return null;
    }
}
