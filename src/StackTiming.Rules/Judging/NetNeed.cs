using System.Collections.Immutable;

namespace StackTiming.Rules.Judging;

/// <summary>
/// What a rule is going to ask of a net, so that it can be computed beforehand, each once, on all cores.
/// </summary>
/// <param name="Net">The net.</param>
/// <param name="Drive">Who drives.</param>
/// <param name="Edge">The edge whose waveform is wanted; null where paths are enough.</param>
public readonly record struct NetNeed(string Net, DriveChoice Drive, Edge? Edge)
{
    /// <summary>Paths alone.</summary>
    /// <param name="nets">The nets.</param>
    /// <param name="drive">Who drives.</param>
    public static IEnumerable<NetNeed> ForPaths(ImmutableArray<string> nets, Drivers drive) => nets.Select(n => new NetNeed(n, drive.Of(n), null));

    /// <summary>Delays: rising edges, unless time of flight is asked for.</summary>
    /// <param name="nets">The nets.</param>
    /// <param name="query">Which delays.</param>
    public static IEnumerable<NetNeed> ForDelays(ImmutableArray<string> nets, DelayQuery query) =>
        query.Basis == DelayBasis.TimeOfFlight ? ForPaths(nets, query.Drive) : ForEdges(nets, query.Drive, [Judging.Edge.Rise]);

    /// <summary>Waveforms of edges.</summary>
    /// <param name="nets">The nets.</param>
    /// <param name="drive">Who drives.</param>
    /// <param name="edges">The edges.</param>
    public static IEnumerable<NetNeed> ForEdges(ImmutableArray<string> nets, Drivers drive, ImmutableArray<Edge> edges)
    {
        foreach (var net in nets)
        {
            foreach (var edge in edges)
                yield return new NetNeed(net, drive.Of(net), edge);
        }
    }
}
