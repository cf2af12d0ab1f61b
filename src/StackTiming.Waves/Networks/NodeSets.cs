namespace StackTiming.Waves.Networks;

/// <summary>Sets of nodes that are joined by something (union-find).</summary>
internal sealed class NodeSets
{
    private readonly int[] parent;

    public NodeSets(int count)
    {
        parent = new int[count];
        for (var i = 0; i < count; i++)
            parent[i] = i;
    }

    /// <summary>The node that stands for the set of a node.</summary>
    public int Of(int node)
    {
        while (parent[node] != node)
            node = parent[node] = parent[parent[node]];
        return node;
    }

    public void Join(int a, int b) => parent[Of(a)] = Of(b);
}
