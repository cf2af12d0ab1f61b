using System.Collections.Immutable;
using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Electrical;

/// <summary>The electrical nets of a board: every net alone, or joined with others by series parts.</summary>
public sealed class ElectricalNets
{
    private readonly int[] groupOfNet;

    private ElectricalNets(LengthList lengths, ImmutableArray<ElectricalNet> all, int[] groupOfNet)
    {
        (Lengths, All, this.groupOfNet) = (lengths, all, groupOfNet);
    }

    /// <summary>The length list.</summary>
    public LengthList Lengths { get; }

    /// <summary>The electrical nets, in the order of their first nets.</summary>
    public ImmutableArray<ElectricalNet> All { get; }

    /// <summary>The electrical net that a net belongs to.</summary>
    /// <param name="net">A net of the length list.</param>
    public ElectricalNet Of(Net net) => All[groupOfNet[net.Index]];

    /// <summary>The electrical net that a net belongs to.</summary>
    /// <param name="netName">Name of the net.</param>
    /// <returns>The electrical net, or null where the length list has no such net.</returns>
    public ElectricalNet? Find(string netName) => Lengths.Find(netName) is { } net ? Of(net) : null;

    /// <summary>Joins the nets of a board and makes sure that each is a connected tree.</summary>
    /// <param name="lengths">The routed lengths.</param>
    /// <param name="parts">The parts.</param>
    /// <param name="problems">Where problems go: loops, rows that do not connect, pins on two nets; and notes on open ends and unstated pins.</param>
    /// <returns>The electrical nets, or null where there are errors.</returns>
    public static ElectricalNets? Build(LengthList lengths, PartList parts, ProblemList problems)
    {
        var before = problems.ErrorCount;
        var pins = new PinPlaces(lengths, parts, problems);
        var joins = new List<(Part Part, SeriesJoin Join, int Net)>();
        var root = new int[lengths.Nets.Length];
        for (var i = 0; i < root.Length; i++)
            root[i] = i;
        foreach (var part in parts.Parts.Values.OrderBy(p => p.At.Line).ThenBy(p => p.At.Column))
        {
            foreach (var join in part.Joins)
            {
                var first = pins.NetOf($"{part.Name}{NetEnd.PinSeparator}{join.FirstPin}");
                var second = pins.NetOf($"{part.Name}{NetEnd.PinSeparator}{join.SecondPin}");
                if (first < 0 || second < 0)
                {
                    var lost = first < 0 ? join.FirstPin : join.SecondPin;
                    problems.Note(part.At, $"the series part '{part.Name}' joins nothing: no row of the length list ends at '{part.Name}.{lost}'");
                    continue;
                }
                joins.Add((part, join, first));
                var (a, b) = (RootOf(root, first), RootOf(root, second));
                root[Math.Max(a, b)] = Math.Min(a, b);
            }
        }
        var groups = BuildAll(lengths, pins, joins, root, problems, out var groupOfNet);
        return problems.ErrorCount == before ? new ElectricalNets(lengths, groups, groupOfNet) : null;
    }

    private static ImmutableArray<ElectricalNet> BuildAll(
        LengthList lengths, PinPlaces pins, List<(Part Part, SeriesJoin Join, int Net)> joins, int[] root, ProblemList problems, out int[] groupOfNet)
    {
        var members = new List<int>?[root.Length];
        for (var i = 0; i < root.Length; i++)
            (members[RootOf(root, i)] ??= []).Add(i);
        var joinsByRoot = joins.ToLookup(j => RootOf(root, j.Net));
        var builder = new NetTreeBuilder(lengths, pins, problems);
        var groups = ImmutableArray.CreateBuilder<ElectricalNet>();
        groupOfNet = new int[root.Length];
        for (var i = 0; i < root.Length; i++)
        {
            if (members[i] is not { } nets)
                continue;
            builder.Clear();
            foreach (var net in nets)
            {
                builder.AddNet(lengths.Nets[net]);
                groupOfNet[net] = groups.Count;
            }
            if (nets.Count > 1 || joinsByRoot.Contains(i))
            {
                foreach (var (part, join, _) in joinsByRoot[i])
                    builder.AddJoin(part, join);
            }
            groups.Add(builder.Build(nets));
        }
        return groups.DrainToImmutable();
    }

    private static int RootOf(int[] root, int net)
    {
        while (root[net] != net)
            net = root[net] = root[root[net]];
        return net;
    }
}
