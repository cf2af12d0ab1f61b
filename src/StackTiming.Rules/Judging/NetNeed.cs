using System.Collections.Immutable;

namespace StackTiming.Rules.Judging;

/// <summary>
/// What a rule is going to ask of a net, so that it can be computed beforehand, each once, on all cores.
/// </summary>
/// <param name="Net">The net.</param>
/// <param name="Drive">Who drives.</param>
/// <param name="Edge">The edge whose waveform is wanted; null where paths are enough.</param>
/// <param name="ArrivalOnly">Whether only its flight time is wanted, which a short look at the beginning gives.</param>
public readonly record struct NetNeed(string Net, DriveChoice Drive, Edge? Edge, bool ArrivalOnly)
{
    /// <summary>Paths alone.</summary>
    /// <param name="nets">The nets.</param>
    /// <param name="drive">Who drives.</param>
    public static IEnumerable<NetNeed> ForPaths(ImmutableArray<string> nets, Drivers drive) => nets.Select(n => new NetNeed(n, drive.Of(n), null, false));

    /// <summary>Delays: rising edges, unless time of flight is asked for.</summary>
    /// <param name="nets">The nets.</param>
    /// <param name="query">Which delays.</param>
    public static IEnumerable<NetNeed> ForDelays(ImmutableArray<string> nets, DelayQuery query) =>
        ForDelays(nets, query, [Judging.Edge.Rise]);

    /// <summary>Delays of edges, unless time of flight is asked for.</summary>
    /// <param name="nets">The nets.</param>
    /// <param name="query">Which delays.</param>
    /// <param name="edges">The edges.</param>
    public static IEnumerable<NetNeed> ForDelays(ImmutableArray<string> nets, DelayQuery query, ImmutableArray<Edge> edges) =>
        query.Basis == DelayBasis.TimeOfFlight ? ForPaths(nets, query.Drive) : Of(nets, query.Drive, edges, arrivalOnly: true);

    /// <summary>Waveforms of edges.</summary>
    /// <param name="nets">The nets.</param>
    /// <param name="drive">Who drives.</param>
    /// <param name="edges">The edges.</param>
    public static IEnumerable<NetNeed> ForEdges(ImmutableArray<string> nets, Drivers drive, ImmutableArray<Edge> edges) =>
        Of(nets, drive, edges, arrivalOnly: false);

    private static IEnumerable<NetNeed> Of(ImmutableArray<string> nets, Drivers drive, ImmutableArray<Edge> edges, bool arrivalOnly)
    {
        foreach (var net in nets)
        {
            foreach (var edge in edges)
                yield return new NetNeed(net, drive.Of(net), edge, arrivalOnly);
        }
    }
}
