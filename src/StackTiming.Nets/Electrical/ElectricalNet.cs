using System.Collections.Immutable;
using StackTiming.Nets.Lengths;

namespace StackTiming.Nets.Electrical;

/// <summary>
/// The nets that series parts join into one, as a tree of segments and series parts between nodes. Building it has made sure that it
/// is connected and free of loops.
/// </summary>
public sealed class ElectricalNet
{
    private readonly int[] firstBranch;
    private readonly int[] branchesByNode;

    internal ElectricalNet(LengthList lengths, ImmutableArray<int> nets, ImmutableArray<NetNode> nodes, ImmutableArray<NetBranch> branches)
    {
        (Lengths, Nets, Nodes, Branches) = (lengths, nets, nodes, branches);
        firstBranch = new int[nodes.Length + 1];
        foreach (var branch in branches)
        {
            firstBranch[branch.From + 1]++;
            firstBranch[branch.To + 1]++;
        }
        for (var i = 0; i < nodes.Length; i++)
            firstBranch[i + 1] += firstBranch[i];
        branchesByNode = new int[2 * branches.Length];
        Span<int> next = nodes.Length <= 256 ? stackalloc int[nodes.Length] : new int[nodes.Length];
        firstBranch.AsSpan(0, nodes.Length).CopyTo(next);
        for (var i = 0; i < branches.Length; i++)
        {
            branchesByNode[next[branches[i].From]++] = i;
            branchesByNode[next[branches[i].To]++] = i;
        }
    }

    /// <summary>The length list that the segments belong to.</summary>
    public LengthList Lengths { get; }

    /// <summary>Indices of the nets that are joined, in file order.</summary>
    public ImmutableArray<int> Nets { get; }

    /// <summary>The nodes.</summary>
    public ImmutableArray<NetNode> Nodes { get; }

    /// <summary>Segments and series parts between the nodes: those of each net in file order, then the series parts.</summary>
    public ImmutableArray<NetBranch> Branches { get; }

    /// <summary>Names of the nets that are joined.</summary>
    public IEnumerable<string> NetNames => Nets.Select(n => Lengths.Nets[n].Name);

    /// <summary>Nodes whose pins can drive.</summary>
    public IEnumerable<int> DriverNodes => Enumerable.Range(0, Nodes.Length).Where(i => Nodes[i].Pin?.Model?.Driver is not null);

    /// <summary>Nodes whose pins receive, among them those that can drive as well.</summary>
    public IEnumerable<int> ReceiverNodes => Enumerable.Range(0, Nodes.Length).Where(i => Nodes[i].Pin?.Model?.Receiver is not null);

    /// <summary>The branches that meet at a node.</summary>
    /// <param name="node">Index of the node.</param>
    public ReadOnlySpan<int> BranchesAt(int node) => branchesByNode.AsSpan(firstBranch[node]..firstBranch[node + 1]);

    /// <summary>The segment of a branch.</summary>
    /// <param name="branch">A branch that is not a series part.</param>
    public Segment SegmentOf(NetBranch branch) => Lengths.Segments[branch.Segment];

    /// <summary>The node of a pin.</summary>
    /// <param name="pin">Name of the pin, such as <c>U1.A3</c>.</param>
    /// <returns>Its index, or −1 where the net has no such pin.</returns>
    public int FindPin(string pin)
    {
        for (var i = 0; i < Nodes.Length; i++)
        {
            if (Nodes[i].IsPin && Nodes[i].Name == pin)
                return i;
        }
        return -1;
    }
}
