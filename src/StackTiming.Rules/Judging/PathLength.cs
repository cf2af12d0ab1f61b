using StackTiming.Rules.Findings;

namespace StackTiming.Rules.Judging;

/// <summary>Turns a delay into the trace length that makes it.</summary>
public static class PathLength
{
    /// <summary>
    /// How to change the delay of a way: on the layer of its longest trace, by the delay per metre that this trace has.
    /// </summary>
    /// <param name="path">The way.</param>
    /// <param name="seconds">Wanted change of delay: positive to add.</param>
    /// <returns>The fix, or null where the way has no trace.</returns>
    public static Fix? Change(ReceiverPath path, double seconds)
    {
        if (LongestTrace(path) is not { } trace || seconds == 0)
            return null;
        var perMetre = trace.DelaySeconds / trace.LengthMetres;
        var metres = Math.Abs(seconds) / perMetre;
        var figures = $"{DisplayUnit.Millimetres.Show(metres)} on {trace.Layer} ({DisplayUnit.Picoseconds.Show(Math.Abs(seconds))} at {Slope(perMetre)})";
        if (seconds > 0)
            return new Fix(FixKind.AddLength, $"lengthen {trace.Net} by {figures}", trace.Net, trace.Layer, metres);
        return metres < trace.LengthMetres
            ? new Fix(FixKind.RemoveLength, $"shorten {trace.Net} by {figures}", trace.Net, trace.Layer, metres)
            : new Fix(FixKind.Other, $"{trace.Net} would have to be shorter by {figures}, which is more than it has there", trace.Net, trace.Layer, double.NaN);
    }

    /// <summary>A delay per length as text.</summary>
    /// <param name="secondsPerMetre">Delay per metre, s/m.</param>
    public static string Slope(double secondsPerMetre) =>
        (secondsPerMetre * 1e9).ToString("F3", System.Globalization.CultureInfo.InvariantCulture) + " ps/mm";

    /// <summary>The longest trace of a way, or null where it has none.</summary>
    /// <param name="path">The way.</param>
    public static PathPiece? LongestTrace(ReceiverPath path)
    {
        PathPiece? longest = null;
        foreach (var piece in path.Pieces)
        {
            if (piece.Kind == PieceKind.Trace && piece.LengthMetres > (longest?.LengthMetres ?? 0))
                longest = piece;
        }
        return longest;
    }
}
