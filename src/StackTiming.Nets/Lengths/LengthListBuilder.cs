using System.Collections.Immutable;

namespace StackTiming.Nets.Lengths;

/// <summary>Collects rows in file order, and sorts them by net where the files do not do so already.</summary>
internal sealed class LengthListBuilder
{
    private readonly List<string> files = [];
    private readonly List<string> names = [];
    private readonly List<int> counts = [];
    private readonly Dictionary<string, int> indices;
    private Segment[] segments;
    private int[] netOfRow;
    private int total;
    private bool grouped = true;

    /// <summary>Starts a list.</summary>
    /// <param name="expectedRows">A guess at the number of rows; any number works.</param>
    public LengthListBuilder(int expectedRows)
    {
        segments = new Segment[Math.Max(expectedRows, 16)];
        netOfRow = new int[segments.Length];
        indices = new Dictionary<string, int>(expectedRows / 8, StringComparer.Ordinal);
    }

    /// <summary>Number of rows added so far.</summary>
    public int RowCount => total;

    /// <summary>Starts another file.</summary>
    /// <param name="path">Its path as messages show it.</param>
    /// <returns>The index that its segments carry.</returns>
    public short AddFile(string path)
    {
        files.Add(path);
        return checked((short)(files.Count - 1));
    }

    /// <summary>The index of a net, or −1 where it has no row yet.</summary>
    /// <param name="name">Its name.</param>
    public int Find(ReadOnlySpan<char> name) =>
        indices.GetAlternateLookup<ReadOnlySpan<char>>().TryGetValue(name, out var index) ? index : -1;

    /// <summary>The name of a net.</summary>
    /// <param name="index">Its index.</param>
    public string NameOf(int index) => names[index];

    /// <summary>Adds a net.</summary>
    /// <param name="name">A name that the list does not have yet.</param>
    /// <returns>Its index.</returns>
    public int AddNet(string name)
    {
        indices.Add(name, names.Count);
        names.Add(name);
        counts.Add(0);
        return names.Count - 1;
    }

    /// <summary>Adds a row.</summary>
    /// <param name="net">Index of its net.</param>
    /// <param name="segment">The row.</param>
    public void Add(int net, in Segment segment)
    {
        if (total == segments.Length)
        {
            Array.Resize(ref segments, 2 * total);
            Array.Resize(ref netOfRow, 2 * total);
        }
        segments[total] = segment;
        netOfRow[total] = net;
        grouped &= total == 0 || net >= netOfRow[total - 1];
        total++;
        counts[net]++;
    }

    /// <summary>Adds all rows of another builder after those of this one.</summary>
    /// <param name="other">The other; its rows carry the file index of this one.</param>
    public void Append(LengthListBuilder other)
    {
        if (total + other.total > segments.Length)
        {
            var capacity = Math.Max(2 * total, total + other.total);
            Array.Resize(ref segments, capacity);
            Array.Resize(ref netOfRow, capacity);
        }
        var map = new int[other.names.Count];
        for (var i = 0; i < map.Length; i++)
        {
            map[i] = Find(other.names[i]) is >= 0 and var known ? known : AddNet(other.names[i]);
            counts[map[i]] += other.counts[i];
        }
        Array.Copy(other.segments, 0, segments, total, other.total);
        for (var row = 0; row < other.total; row++, total++)
        {
            netOfRow[total] = map[other.netOfRow[row]];
            grouped &= total == 0 || netOfRow[total] >= netOfRow[total - 1];
        }
    }

    /// <summary>The list. The builder is not used after it.</summary>
    public LengthList Build()
    {
        var nets = ImmutableArray.CreateBuilder<Net>(names.Count);
        var next = new int[names.Count];
        var first = 0;
        for (var i = 0; i < names.Count; i++)
        {
            nets.Add(new Net(names[i], i, first, counts[i]));
            next[i] = first;
            first += counts[i];
        }
        var sorted = segments;
        if (!grouped)
        {
            sorted = new Segment[total];
            for (var row = 0; row < total; row++)
                sorted[next[netOfRow[row]]++] = segments[row];
        }
        return new LengthList([.. files], nets.MoveToImmutable(), sorted.AsMemory(0, total), indices);
    }
}
