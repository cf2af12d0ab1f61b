using StackTiming.Rules.Findings;

namespace StackTiming.Rules.Judging;

/// <summary>Turns a delay into the trace length that makes it.</summary>
public static class PathLength
{
    /// <summary>
    /// How to change the delay of a way: on the layer of its longest trace of the net, by the delay per metre that this trace has.
    /// </summary>
    /// <param name="path">The way.</param>
    /// <param name="net">The net that may be changed.</param>
    /// <param name="seconds">Wanted change of delay: positive to add.</param>
    /// <returns>The fix, or null where the net has no trace on the way, or not enough of it to take away.</returns>
    public static Fix? Change(ReceiverPath path, string net, double seconds)
    {
        var longest = LongestTrace(path, net);
        if (longest is not { } trace || seconds == 0)
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

    private static PathPiece? LongestTrace(ReceiverPath path, string net)
    {
        PathPiece? best = null;
        foreach (var piece in path.Pieces)
        {
            if (piece.Kind != PieceKind.Trace || piece.LengthMetres <= 0)
                continue;
            if (best is null || (piece.Net == net) != (best.Value.Net == net) ? piece.Net == net || best is null : piece.LengthMetres > best.Value.LengthMetres)
                best = piece;
        }
        return best;
    }
}
