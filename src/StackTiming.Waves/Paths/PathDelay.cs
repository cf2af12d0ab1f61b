using System.Collections.Immutable;
using StackTiming.Nets.Electrical;

namespace StackTiming.Waves.Paths;

/// <summary>
/// The time of flight along a path, piece by piece from the die of its first pin to that of its last. Loads at the ends are not in it: the shift
/// that they cause is the difference between this and the flight time that the waveform gives.
/// </summary>
/// <param name="Path">The path.</param>
/// <param name="Pieces">The contributions, in the order in which the signal meets them.</param>
/// <param name="Notes">What was assumed or left out, in sentences without a final full stop, each once.</param>
public sealed record PathDelay(NetPath Path, ImmutableArray<DelayPiece> Pieces, ImmutableArray<string> Notes)
{
    /// <summary>The whole delay, s.</summary>
    public double Seconds { get; } = Sum(Pieces, null);

    /// <summary>The part that traces, vias or packages have in it, s.</summary>
    /// <param name="kind">Which pieces.</param>
    public double SecondsOf(DelayPieceKind kind) => Sum(Pieces, kind);

    private static double Sum(ImmutableArray<DelayPiece> pieces, DelayPieceKind? kind)
    {
        var sum = 0.0;
        foreach (var piece in pieces)
            sum += kind is null || piece.Kind == kind ? piece.DelaySeconds : 0;
        return sum;
    }
}

/// <summary>The delay of a stub, from the path to its farthest end.</summary>
/// <param name="Stub">The stub.</param>
/// <param name="End">Node of its farthest end.</param>
/// <param name="Seconds">Delay from the path to that end, s.</param>
/// <param name="TraceMetres">Length of the traces to that end, metres.</param>
/// <param name="LongestTrace">The line of the longest trace on the way, or null where there is none.</param>
public sealed record StubDelay(PathStub Stub, NetNode End, double Seconds, double TraceMetres, BoardLine? LongestTrace);
