using System.Collections.Immutable;
using StackTiming.Nets.Electrical;
using StackTiming.Rules.Judging;

namespace StackTiming.Rules.Checking;

/// <summary>A net, the node that drives it, and the edge that it sends.</summary>
/// <param name="Net">The electrical net.</param>
/// <param name="DriverNode">Node of its driver.</param>
/// <param name="Edge">The edge.</param>
internal readonly record struct WaveKey(ElectricalNet Net, int DriverNode, Edge Edge)
{
    /// <summary>The same net with the other edge.</summary>
    public WaveKey Opposite => this with { Edge = Edge == Edge.Rise ? Edge.Fall : Edge.Rise };
}

/// <summary>What the receivers of a net see of an edge.</summary>
/// <param name="Objection">Why there is no answer; empty where there is one.</param>
/// <param name="Receivers">The responses by the receiver's node.</param>
internal sealed record SolvedWave(string Objection, ImmutableDictionary<int, ReceiverResponse> Receivers);

/// <summary>What the waves phase solves in one go.</summary>
/// <param name="Key">Net, driver and edge.</param>
/// <param name="ArrivalOnly">Whether only flight times are wanted.</param>
/// <param name="BothEdges">Whether the opposite edge is wanted too.</param>
internal readonly record struct WaveJob(WaveKey Key, bool ArrivalOnly, bool BothEdges);
