namespace StackTiming.Waves.Characteristics;

/// <summary>Nodes that lumped elements or coupled ends tie together within one step; between clusters only lines lead.</summary>
/// <param name="Nodes">The nodes.</param>
/// <param name="Inverse">Inverse of their conductance matrix, by rows, ohms.</param>
internal sealed record NodeCluster(int[] Nodes, double[] Inverse)
{
    /// <summary>The clusters of a circuit for a conductance matrix.</summary>
    /// <param name="conductance">Conductances between all nodes, siemens.</param>
    /// <param name="setOf">The set of each node.</param>
    public static NodeCluster[] Of(double[,] conductance, int[] setOf)
    {
        var clusters = new List<NodeCluster>();
        foreach (var group in Enumerable.Range(0, setOf.Length).GroupBy(i => setOf[i]))
        {
            var nodes = group.ToArray();
            var values = new double[nodes.Length * nodes.Length];
            for (var i = 0; i < nodes.Length; i++)
            {
                for (var j = 0; j < nodes.Length; j++)
                    values[(i * nodes.Length) + j] = conductance[nodes[i], nodes[j]];
            }
            SmallMatrix.Invert(values, nodes.Length);
            clusters.Add(new NodeCluster(nodes, values));
        }
        return [.. clusters];
    }

    /// <summary>Node voltages from the currents into the nodes.</summary>
    public void Solve(double[] currents, double[] volts)
    {
        var n = Nodes.Length;
        for (var i = 0; i < n; i++)
        {
            var sum = 0.0;
            for (var j = 0; j < n; j++)
                sum += Inverse[(i * n) + j] * currents[Nodes[j]];
            volts[Nodes[i]] = sum;
        }
    }
}
