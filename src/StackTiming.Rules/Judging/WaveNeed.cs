using System.Collections.Immutable;

namespace StackTiming.Rules.Judging;

/// <summary>Responses that a rule is going to ask for, so that they can be computed beforehand, each once, on all cores.</summary>
/// <param name="Net">The net.</param>
/// <param name="Drive">Who drives.</param>
/// <param name="Edge">The edge.</param>
public readonly record struct WaveNeed(string Net, DriveChoice Drive, Edge Edge)
{
    /// <summary>What delays need: rising edges, where flight time may be meant.</summary>
    /// <param name="nets">The nets.</param>
    /// <param name="query">Which delays.</param>
    public static IEnumerable<WaveNeed> ForDelays(ImmutableArray<string> nets, DelayQuery query) =>
        query.Basis == DelayBasis.TimeOfFlight ? [] : nets.Select(n => new WaveNeed(n, query.Drive.Of(n), Edge.Rise));

    /// <summary>What a rule over edges needs.</summary>
    /// <param name="nets">The nets.</param>
    /// <param name="drive">Who drives.</param>
    /// <param name="edges">The edges.</param>
    public static IEnumerable<WaveNeed> ForEdges(ImmutableArray<string> nets, Drivers drive, ImmutableArray<Edge> edges)
    {
        foreach (var net in nets)
        {
            foreach (var edge in edges)
                yield return new WaveNeed(net, drive.Of(net), edge);
        }
    }
}
