namespace StackTiming.Nets.Electrical;

/// <summary>An electrical net seen from one of its nodes: which way leads back to that node.</summary>
public sealed class NetTree
{
    private readonly int[] parents;
    private readonly int[] branchTo;

    /// <summary>Walks a net from a node.</summary>
    /// <param name="net">The net.</param>
    /// <param name="root">Index of the node.</param>
    public NetTree(ElectricalNet net, int root)
    {
        (Net, Root) = (net, root);
        parents = new int[net.Nodes.Length];
        branchTo = new int[net.Nodes.Length];
        Array.Fill(parents, -1);
        Array.Fill(branchTo, -1);
        var stack = new Stack<int>();
        stack.Push(root);
        while (stack.TryPop(out var node))
        {
            foreach (var index in net.BranchesAt(node))
            {
                var branch = net.Branches[index];
                var other = branch.From == node ? branch.To : branch.From;
                if (other == root || parents[other] >= 0)
                    continue;
                parents[other] = node;
                branchTo[other] = index;
                stack.Push(other);
            }
        }
    }

    /// <summary>The net.</summary>
    public ElectricalNet Net { get; }

    /// <summary>Index of the node that everything is seen from.</summary>
    public int Root { get; }

    /// <summary>The next node on the way to the root; −1 at the root.</summary>
    /// <param name="node">Index of a node.</param>
    public int ParentOf(int node) => parents[node];

    /// <summary>The branch on the way to the root; −1 at the root.</summary>
    /// <param name="node">Index of a node.</param>
    public int BranchTo(int node) => branchTo[node];

    /// <summary>The path from the root to a node.</summary>
    /// <param name="node">Index of a node that is connected with the root.</param>
    public NetPath PathTo(int node)
    {
        var count = 0;
        for (var n = node; n != Root; n = parents[n])
            count++;
        var nodes = new int[count + 1];
        var branches = new int[count];
        nodes[count] = node;
        for (var i = count - 1; i >= 0; i--)
        {
            branches[i] = branchTo[nodes[i + 1]];
            nodes[i] = parents[nodes[i + 1]];
        }
        return new NetPath(Net, [.. nodes], [.. branches]);
    }
}
