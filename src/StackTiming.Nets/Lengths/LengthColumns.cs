using System.Collections.Frozen;
using System.Collections.Immutable;

namespace StackTiming.Nets.Lengths;

/// <summary>The names that a header gives to the columns, and which of them hold lengths.</summary>
public static class LengthColumns
{
    /// <summary>Header names in the order of <see cref="LengthColumn"/>.</summary>
    public static ImmutableArray<string> Names { get; } =
    [
        "net", "from", "to", "kind", "layer", "length", "width", "gap", "meander-gap", "meander-leg",
        "drill", "pad", "antipad", "neighbour", "neighbour-gap", "neighbour-length", "barrel",
    ];

    private static readonly FrozenDictionary<string, LengthColumn> ByName =
        Names.Select((name, i) => (name, i)).ToFrozenDictionary(p => p.name, p => (LengthColumn)p.i, StringComparer.OrdinalIgnoreCase);

    /// <summary>The column of that name, in either case, or null.</summary>
    /// <param name="name">Name such as <c>meander-gap</c>.</param>
    public static LengthColumn? Find(string name) => ByName.TryGetValue(name, out var column) ? column : null;

    /// <summary>The header name of a column.</summary>
    /// <param name="column">The column.</param>
    public static string NameOf(LengthColumn column) => Names[(int)column];

    /// <summary>True for a column of numbers with a unit.</summary>
    /// <param name="column">The column.</param>
    public static bool IsLength(LengthColumn column) =>
        column is >= LengthColumn.Length and <= LengthColumn.Antipad or LengthColumn.NeighbourGap or LengthColumn.NeighbourLength;

    /// <summary>The largest value that a board can have in a column, in metres: more than that is a wrong unit.</summary>
    /// <param name="column">A column of lengths.</param>
    public static double MostMetres(LengthColumn column) => column switch
    {
        LengthColumn.Length or LengthColumn.NeighbourLength => 20,
        LengthColumn.MeanderLeg => 1,
        LengthColumn.Drill or LengthColumn.Pad or LengthColumn.Antipad => 0.02,
        _ => 0.1,
    };
}
