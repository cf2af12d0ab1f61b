using System.Collections.Concurrent;
using System.Collections.Immutable;
using StackTiming.Lines.Solutions;
using StackTiming.Nets.Lengths;
using StackTiming.Rules.Boards;
using StackTiming.Rules.Judging;
using StackTiming.Stackups.Layers;
using StackTiming.Waves.Paths;
using StackTiming.Waves.Vias;

namespace StackTiming.Rules.Checking;

/// <summary>Answers what rules ask of a board, from its lines, paths and waveforms, each computed once.</summary>
internal sealed class BoardPhysics : IBoardPhysics
{
    private readonly Board board;
    private readonly LineTable lines;
    private readonly PathTracer tracer;
    private readonly LineFigures figures;
    private readonly ConcurrentDictionary<string, bool> notes = new(StringComparer.Ordinal);
    private readonly ConcurrentDictionary<(string Net, DriveChoice Drive), (ImmutableArray<DrivenNet> Drives, string Objection)> traced = [];

    public BoardPhysics(Board board, ILineCalculator calculator, LineTable lines)
    {
        this.board = board;
        this.lines = lines;
        var delays = new PathDelays(lines, new ViaTable(board.StackUp, board.Lengths, board.Assumed.FrequencyHertz));
        tracer = new PathTracer(board.Electrical, delays, note => notes.TryAdd(note, true));
        figures = new LineFigures(board.StackUp, calculator, board.Assumed.FrequencyHertz);
    }

    public StackUp StackUp => board.StackUp;

    public SignalAssumptions Assumed => board.Assumed;

    public string CalculatorName => lines.CalculatorName;

    /// <summary>What delays and waveforms assumed so far, in ordinal order.</summary>
    public IEnumerable<string> Notes => notes.Keys.Order(StringComparer.Ordinal);

    public ReadOnlySpan<Segment> SegmentsOf(string net) =>
        board.Lengths.Find(net) is { } found ? board.Lengths.SegmentsOf(found) : [];

    public BoardLine? LineOf(in Segment trace, out string objection) => lines.Find(LineKey.Of(trace), out objection);

    public double? WidthFor(string layer, double gapMetres, double targetOhms, bool differential) =>
        figures.WidthFor(layer, differential ? gapMetres : 0, targetOhms);

    public double? AttenuationDbPerMetre(in PathPiece trace, double hertz, out string objection)
    {
        (var attenuation, objection) = figures.Attenuation(new LineKey(trace.Layer, trace.WidthMetres, trace.GapMetres), hertz);
        return attenuation;
    }

    public ImmutableArray<DrivenNet> Drives(string net, DriveChoice drive, out string objection)
    {
        if (!traced.TryGetValue((net, drive), out var found))
        {
            found.Drives = tracer.Trace(net, drive, out found.Objection);
            found = traced.GetOrAdd((net, drive), found);
        }
        objection = found.Objection;
        return found.Drives;
    }

    public ReceiverResponse? Response(DrivenNet driven, string receiver, Edge edge, out string objection)
    {
        objection = "waveforms of board nets are not computed yet";
        return null;
    }
}
