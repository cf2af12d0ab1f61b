using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Electrical;

/// <summary>
/// Builds the tree of one electrical net, net by net and then its series parts. One builder serves a whole board, so that its tables are
/// allocated once.
/// </summary>
internal sealed class NetTreeBuilder(LengthList lengths, PinPlaces pins, ProblemList problems)
{
    private readonly List<NetNode> nodes = [];
    private readonly List<NetBranch> branches = [];
    private readonly List<int> group = [];
    private readonly Dictionary<string, int> nodeOfName = new(StringComparer.Ordinal);
    private readonly Dictionary<string, int> nodeOfPin = new(StringComparer.Ordinal);

    /// <summary>Starts another electrical net.</summary>
    public void Clear()
    {
        nodes.Clear();
        branches.Clear();
        group.Clear();
        nodeOfPin.Clear();
    }

    /// <summary>The net as built so far.</summary>
    /// <param name="nets">Indices of its nets.</param>
    public ElectricalNet Build(IReadOnlyList<int> nets) => new(lengths, [.. nets], [.. nodes], [.. branches]);

    /// <summary>Adds the rows of a net.</summary>
    public void AddNet(Net net)
    {
        nodeOfName.Clear();
        var first = nodes.Count;
        var rows = lengths.SegmentsOf(net);
        if (!HasOpenEnds(rows))
            AddLabelled(net, rows);
        else if (FindMixedRow(rows) is >= 0 and var mixed)
        {
            ref readonly var row = ref rows[mixed];
            problems.Error(
                lengths.PositionOf(row), $"the row of '{net.Name}' leaves '{(row.From.Length == 0 ? "from" : "to")}' empty, although other rows of the net state both",
                "write both ends in every row, or in none: then the rows form a chain in file order, with pins at its first 'from' and last 'to' only");
            return;
        }
        else
            AddChain(net, rows);
        CheckConnected(net, rows, first);
    }

    /// <summary>Adds a series part between two pins of nets that have been added.</summary>
    public void AddJoin(Part part, SeriesJoin join)
    {
        if (!nodeOfPin.TryGetValue($"{part.Name}{NetEnd.PinSeparator}{join.FirstPin}", out var from)
            || !nodeOfPin.TryGetValue($"{part.Name}{NetEnd.PinSeparator}{join.SecondPin}", out var to))
            return;
        if (!Unite(from, to))
        {
            problems.Error(
                part.At, $"the series part '{part.Name}' closes a loop: its pins are joined already, {Describe(from, to)}",
                "a path must be unique; remove one of the ways");
            return;
        }
        branches.Add(new NetBranch(from, to, -1, part, join));
    }

    private static bool HasOpenEnds(ReadOnlySpan<Segment> rows)
    {
        foreach (ref readonly var row in rows)
        {
            if (row.From.Length == 0 || row.To.Length == 0)
                return true;
        }
        return false;
    }

    // The first row that fits neither a chain nor rows with both ends; −1 for a chain.
    private static int FindMixedRow(ReadOnlySpan<Segment> rows)
    {
        var stated = false;
        for (var i = 0; i < rows.Length; i++)
            stated |= (i > 0 && rows[i].From.Length > 0) || (i < rows.Length - 1 && rows[i].To.Length > 0);
        for (var i = 0; stated && i < rows.Length; i++)
        {
            if (rows[i].From.Length == 0 || rows[i].To.Length == 0)
                return i;
        }
        return -1;
    }

    private void AddLabelled(Net net, ReadOnlySpan<Segment> rows)
    {
        for (var i = 0; i < rows.Length; i++)
        {
            ref readonly var row = ref rows[i];
            if (row.From == row.To)
            {
                problems.Error(lengths.PositionOf(row), $"the row of '{net.Name}' starts and ends at '{row.From}'", "write two different ends");
                continue;
            }
            var from = NodeOf(row.From, net.Index);
            var to = NodeOf(row.To, net.Index);
            if (Unite(from, to))
                branches.Add(new NetBranch(from, to, net.FirstSegment + i, null, null));
            else
            {
                problems.Error(
                    lengths.PositionOf(row), $"the row of '{net.Name}' from '{row.From}' to '{row.To}' closes a loop: the two are joined already, {Describe(from, to)}",
                    "a path must be unique; remove a row, or give one of them another label");
            }
        }
        foreach (var (name, _, pin) in pins.StatedByParts(net.Index))
        {
            problems.Error(
                pin.At, $"'{name}' is said to lie on '{net.Name}', whose rows name other ends", $"write '{name}' as 'from' or 'to' of the row that ends there");
        }
    }

    private void AddChain(Net net, ReadOnlySpan<Segment> rows)
    {
        var (start, end) = ChainEnds(net, rows[0].From, rows[^1].To);
        var from = NodeOf(start, net.Index);
        for (var i = 0; i < rows.Length; i++)
        {
            var to = NodeOf(i == rows.Length - 1 ? end : "", net.Index);
            if (!Unite(from, to))
            {
                problems.Error(lengths.PositionOf(rows[i]), $"the chain '{net.Name}' starts and ends at '{start}'", "write two different ends");
                return;
            }
            branches.Add(new NetBranch(from, to, net.FirstSegment + i, null, null));
            from = to;
        }
    }

    // A chain whose rows name no pin takes them from the parts file: what drives at its start, what receives at its end; a series part
    // hands the signal from its first pin, at the end of one chain, to its second pin, at the start of the next.
    private (string Start, string End) ChainEnds(Net net, string start, string end)
    {
        foreach (var (name, part, pin) in pins.StatedByParts(net.Index).OrderBy(p => p.Pin.Model?.Receiver is not null))
        {
            var atStart = pin.Model?.Driver is not null || part.Joins.Any(j => j.SecondPin == pin.Name);
            if (atStart && start.Length == 0)
                start = name;
            else if (end.Length == 0)
                end = name;
            else if (start.Length == 0)
                start = name;
            else
            {
                problems.Error(
                    pin.At, $"the chain '{net.Name}' has no end left for '{name}': it runs from '{start}' to '{end}'",
                    "write 'from' and 'to' in the rows of a net with more than two pins");
            }
        }
        return (start, end);
    }

    private void CheckConnected(Net net, ReadOnlySpan<Segment> rows, int first)
    {
        for (var i = first + 1; i < nodes.Count; i++)
        {
            if (Root(i) == Root(first))
                continue;
            var row = branches.FindLast(b => b.From == i || b.To == i) is { Segment: >= 0 } branch ? lengths.Segments[branch.Segment] : rows[0];
            problems.Error(
                lengths.PositionOf(row), $"'{nodes[i].Name}' of '{net.Name}' is not connected with '{nodes[first].Name}'",
                "name the same branch label, such as *1, at the ends that meet");
            return;
        }
        foreach (var node in Dangling(first))
        {
            var branch = branches.FindLast(b => b.From == node || b.To == node);
            problems.Note(
                lengths.PositionOf(lengths.Segments[branch.Segment]), $"'{net.Name}' ends open at '{nodes[node].Name}', where no pin is; it counts as a stub");
        }
    }

    private List<int> Dangling(int first)
    {
        var found = new List<int>();
        if (nodes.Count - first < 2)
            return found;
        Span<int> degree = nodes.Count - first <= 256 ? stackalloc int[nodes.Count - first] : new int[nodes.Count - first];
        degree.Clear();
        for (var i = branches.Count - 1; i >= 0 && branches[i].From >= first; i--)
        {
            degree[branches[i].From - first]++;
            degree[branches[i].To - first]++;
        }
        for (var i = first; i < nodes.Count; i++)
        {
            if (degree[i - first] == 1 && NetEnd.IsLabel(nodes[i].Name))
                found.Add(i);
        }
        return found;
    }

    // An empty name is a point of its own every time.
    private int NodeOf(string name, int net)
    {
        if (name.Length > 0 && nodeOfName.TryGetValue(name, out var known))
            return known;
        var node = nodes.Count;
        if (name.Length == 0 || NetEnd.IsLabel(name))
            nodes.Add(new NetNode(name, net, null, null));
        else
        {
            var (part, pin) = pins.Find(name);
            nodes.Add(new NetNode(name, net, part, pin));
            if (part is { Joins.IsEmpty: false })
                nodeOfPin[name] = node;
        }
        if (name.Length > 0)
            nodeOfName.Add(name, node);
        group.Add(node);
        return node;
    }

    private int Root(int node)
    {
        while (group[node] != node)
            node = group[node] = group[group[node]];
        return node;
    }

    // False where the two are connected already.
    private bool Unite(int a, int b)
    {
        var (rootA, rootB) = (Root(a), Root(b));
        // The older root stays, so that long chains stay shallow together with the halving in Root.
        group[Math.Max(rootA, rootB)] = Math.Min(rootA, rootB);
        return rootA != rootB;
    }

    // The way from a to b, for a message: "by line 4, line 5 and R12".
    private string Describe(int a, int b)
    {
        var tree = new NetTree(Build([]), a);
        var steps = new List<string>();
        for (var node = b; node != a && steps.Count < 6; node = tree.ParentOf(node))
        {
            var branch = branches[tree.BranchTo(node)];
            steps.Add(branch.IsSeriesPart ? branch.Part!.Name : "line " + lengths.Segments[branch.Segment].Line.ToString(System.Globalization.CultureInfo.InvariantCulture));
            if (steps.Count == 6)
                steps[^1] = "others";
        }
        steps.Reverse();
        return "by " + (steps.Count == 1 ? steps[0] : string.Join(", ", steps.Take(steps.Count - 1)) + " and " + steps[^1]);
    }
}
