using System.Collections.Immutable;

namespace StackTiming.Nets.Electrical;

/// <summary>The way of a signal from one node of an electrical net to another.</summary>
/// <param name="Net">The net.</param>
/// <param name="Nodes">Indices of the nodes, from the first to the last.</param>
/// <param name="Branches">Indices of the branches between them; one less than nodes.</param>
public sealed record NetPath(ElectricalNet Net, ImmutableArray<int> Nodes, ImmutableArray<int> Branches)
{
    /// <summary>Where the path starts.</summary>
    public NetNode Start => Net.Nodes[Nodes[0]];

    /// <summary>Where the path ends.</summary>
    public NetNode End => Net.Nodes[Nodes[^1]];

    /// <summary>True where the path runs through a branch in the direction of its row.</summary>
    /// <param name="step">Place of the branch on the path.</param>
    public bool IsForward(int step) => Net.Branches[Branches[step]].From == Nodes[step];

    /// <summary>Routed length of the path's traces in metres, without vias.</summary>
    public double TraceLengthMetres
    {
        get
        {
            var sum = 0.0;
            foreach (var index in Branches)
            {
                if (!Net.Branches[index].IsSeriesPart)
                    sum += Net.SegmentOf(Net.Branches[index]).LengthMetres;
            }
            return sum;
        }
    }

    /// <summary>
    /// What hangs on the path without being part of it, each branch-off by itself: open stubs, stubs to other pins, and what goes on
    /// behind the path's ends.
    /// </summary>
    public IEnumerable<PathStub> Stubs()
    {
        var onPath = Branches.ToHashSet();
        for (var i = 0; i < Nodes.Length; i++)
        {
            foreach (var first in Net.BranchesAt(Nodes[i]).ToArray())
            {
                if (!onPath.Contains(first))
                    yield return Follow(i, first);
            }
        }
    }

    private PathStub Follow(int place, int first)
    {
        var branches = ImmutableArray.CreateBuilder<(int Branch, int NearNode, int FarNode)>();
        var pins = ImmutableArray.CreateBuilder<int>();
        var stack = new Stack<(int Branch, int Near)>();
        stack.Push((first, Nodes[place]));
        while (stack.TryPop(out var step))
        {
            var branch = Net.Branches[step.Branch];
            var far = branch.From == step.Near ? branch.To : branch.From;
            branches.Add((step.Branch, step.Near, far));
            if (Net.Nodes[far].IsPin)
                pins.Add(far);
            foreach (var next in Net.BranchesAt(far))
            {
                if (next != step.Branch)
                    stack.Push((next, far));
            }
        }
        return new PathStub(place, branches.DrainToImmutable(), pins.DrainToImmutable());
    }
}

/// <summary>A part of an electrical net that hangs on a path.</summary>
/// <param name="Place">Where on the path it hangs: place in <see cref="NetPath.Nodes"/>.</param>
/// <param name="Branches">Its branches, each after the one that it hangs on, with the nodes at their near and far ends.</param>
/// <param name="Pins">Nodes of the pins on it; empty for an open stub.</param>
public sealed record PathStub(int Place, ImmutableArray<(int Branch, int NearNode, int FarNode)> Branches, ImmutableArray<int> Pins);
