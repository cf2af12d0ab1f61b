using System.Collections.Immutable;
using StackTiming.Nets.Electrical;
using StackTiming.Nets.Lengths;
using StackTiming.Waves.Vias;

namespace StackTiming.Waves.Paths;

/// <summary>Computes delays of paths and stubs from the lines and vias of a board. Safe on several threads.</summary>
/// <param name="lines">The lines.</param>
/// <param name="vias">The vias.</param>
public sealed class PathDelays(LineTable lines, ViaTable vias)
{
    private const string MeanderNote = "meanders are counted with their full length; coupling between their legs makes them a little faster";

    /// <summary>The delay of a path.</summary>
    /// <param name="path">The path.</param>
    /// <param name="objection">Why there is none, in a sentence without a full stop; empty where there is one.</param>
    public PathDelay? Of(NetPath path, out string objection)
    {
        var pieces = ImmutableArray.CreateBuilder<DelayPiece>(path.Branches.Length + 2);
        var notes = new List<string>();
        AddPackage(path.Start, pieces);
        for (var i = 0; i < path.Branches.Length; i++)
        {
            var branch = path.Net.Branches[path.Branches[i]];
            if (branch.IsSeriesPart)
            {
                pieces.Add(new DelayPiece(DelayPieceKind.SeriesPart, path.Branches[i], -1, branch.Part!.Name, 0, 0, 0, 0, double.NaN));
                continue;
            }
            var segment = path.Net.SegmentOf(branch);
            var net = path.Net.Nodes[branch.From].Net;
            var piece = segment.Kind == SegmentKind.Trace
                ? TracePiece(segment, path.Branches[i], net, notes, out objection)
                : ViaPiece(segment, path.Branches[i], net, TraceOhms(path, i), notes, out objection);
            if (piece is null)
            {
                objection = $"{path.Net.Lengths.PositionOf(segment)}: {objection}";
                return null;
            }
            pieces.Add(piece.Value);
        }
        if (path.Branches.Length > 0)
            AddPackage(path.End, pieces);
        objection = "";
        return new PathDelay(path, pieces.DrainToImmutable(), [.. notes]);
    }

    /// <summary>The delay of a stub to its farthest end.</summary>
    /// <param name="path">The path that it hangs on.</param>
    /// <param name="stub">One of the path's stubs.</param>
    /// <param name="objection">Why there is none, in a sentence without a full stop; empty where there is one.</param>
    public StubDelay? Of(NetPath path, PathStub stub, out string objection)
    {
        var reach = new Dictionary<int, (double Seconds, double Metres, BoardLine? Longest, double LongestMetres)>
        {
            [path.Nodes[stub.Place]] = default,
        };
        var farthest = (Node: path.Nodes[stub.Place], Seconds: -1.0);
        foreach (var (index, near, far) in stub.Branches)
        {
            var here = reach[near];
            var branch = path.Net.Branches[index];
            if (!branch.IsSeriesPart)
            {
                var segment = path.Net.SegmentOf(branch);
                if (segment.Kind == SegmentKind.Trace)
                {
                    if (lines.Find(LineKey.Of(segment), out objection) is not { } line)
                        return null;
                    here.Seconds += segment.LengthMetres * line.DelaySecondsPerMetre;
                    here.Metres += segment.LengthMetres;
                    if (segment.LengthMetres > here.LongestMetres)
                        (here.Longest, here.LongestMetres) = (line, segment.LengthMetres);
                }
                else
                {
                    if (vias.Find(ViaHole.Of(segment), out objection) is not { } via)
                        return null;
                    here.Seconds += via.BarrelDelaySeconds;
                }
            }
            reach[far] = here;
            if (here.Seconds > farthest.Seconds)
                farthest = (far, here.Seconds);
        }
        objection = "";
        var end = reach[farthest.Node];
        return new StubDelay(stub, path.Net.Nodes[farthest.Node], end.Seconds, end.Metres, end.Longest);
    }

    private DelayPiece? TracePiece(in Segment segment, int branch, int net, List<string> notes, out string objection)
    {
        if (lines.Find(LineKey.Of(segment), out objection) is not { } line)
            return null;
        if (segment.Meanders)
            AddOnce(notes, MeanderNote);
        return new DelayPiece(
            DelayPieceKind.Trace, branch, net, segment.Layer, segment.LengthMetres, segment.WidthMetres, segment.GapMetres,
            segment.LengthMetres * line.DelaySecondsPerMetre, line.WaveOhms);
    }

    private DelayPiece? ViaPiece(in Segment segment, int branch, int net, double? traceOhms, List<string> notes, out string objection)
    {
        if (vias.Find(ViaHole.Of(segment), out objection) is not { } via)
            return null;
        foreach (var assumption in via.Assumptions)
            AddOnce(notes, $"via from {segment.Layer} to {segment.ToLayer}: {assumption}");
        // Without a trace beside it the via is its own reference: √(L·C).
        var ohms = traceOhms ?? Math.Sqrt(via.InductanceHenry / via.CapacitanceFarad);
        return new DelayPiece(
            DelayPieceKind.Via, branch, net, $"{segment.Layer}>{segment.ToLayer}", via.Geometry.ThroughMetres, 0, 0, via.DelaySeconds(ohms), via.Z0Ohms);
    }

    // Geometric mean of the impedances of the nearest traces on both sides of a via; null where there are none.
    private double? TraceOhms(NetPath path, int step)
    {
        var before = NearestTraceOhms(path, step, -1);
        var after = NearestTraceOhms(path, step, 1);
        return before is { } a && after is { } b ? Math.Sqrt(a * b) : before ?? after;
    }

    private double? NearestTraceOhms(NetPath path, int step, int direction)
    {
        for (var i = step + direction; i >= 0 && i < path.Branches.Length; i += direction)
        {
            var branch = path.Net.Branches[path.Branches[i]];
            if (branch.IsSeriesPart)
                return null;
            var segment = path.Net.SegmentOf(branch);
            if (segment.Kind == SegmentKind.Trace)
                return lines.Find(LineKey.Of(segment), out _)?.WaveOhms;
        }
        return null;
    }

    private static void AddPackage(NetNode node, ImmutableArray<DelayPiece>.Builder pieces)
    {
        if (node.Pin is { PackageDelaySeconds: > 0 } pin)
            pieces.Add(new DelayPiece(DelayPieceKind.Package, -1, -1, node.Name, 0, 0, 0, pin.PackageDelaySeconds, double.NaN));
    }

    private static void AddOnce(List<string> notes, string note)
    {
        if (!notes.Contains(note))
            notes.Add(note);
    }
}
