using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Nets.Sketches;
using StackTiming.Stackups.Reading;
using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Sketches;

/// <summary>Turns a net sketch into a network.</summary>
/// <param name="calculator">Computes the lines that name a layer.</param>
public sealed class SketchNetwork(ILineCalculator calculator)
{
    private const double WindowInDelays = 40;
    private const double WindowInRamps = 10;

    /// <summary>The network of a sketch, or null with located problems.</summary>
    /// <param name="sketch">The sketch.</param>
    /// <param name="problems">Where problems go.</param>
    public Network? Build(NetSketch sketch, ProblemList problems)
    {
        var errorsBefore = problems.ErrorCount;
        var builder = new NetworkBuilder();
        var d = sketch.Driver;
        var driver = new Driver(
            builder.Node(d.Node), d.LowVolts, d.HighVolts, d.ResistanceOhms,
            d is { PackageHenries: 0, PackageFarads: 0 } ? null : new DriverPackage(d.PackageHenries, d.PackageFarads));
        var whole = 0.0;
        foreach (var line in sketch.Lines)
            whole += AddLine(builder, sketch, line, problems);
        foreach (var pair in sketch.CoupledLines)
        {
            builder.Coupled(CoupledLines.SymmetricPair(
                (builder.Node(pair.FromA), builder.Node(pair.FromB)), (builder.Node(pair.ToA), builder.Node(pair.ToB)),
                pair.ZEvenOhms, pair.ZOddOhms, pair.DelayEvenSeconds, pair.DelayOddSeconds));
            whole += Math.Max(pair.DelayEvenSeconds, pair.DelayOddSeconds);
        }
        foreach (var s in sketch.Series)
            builder.SeriesElement(s.From, s.To, s.ResistanceOhms, s.InductanceHenries, s.CapacitanceFarads);
        foreach (var s in sketch.Shunts)
            builder.ShuntElement(s.Node, s.CapacitanceFarads, s.ResistanceOhms, s.ToVolts, s.InductanceHenries);
        foreach (var r in sketch.Receivers)
        {
            Thresholds? levels = r is { VilVolts: { } vil, VihVolts: { } vih, ThresholdVolts: { } mid } ? new Thresholds(vil, vih, mid) : null;
            builder.Receiver(r.Node, r.CapacitanceFarads, levels, r.ResistanceOhms, r.ToVolts);
        }
        var stimulus = sketch.Edge.Bits.IsEmpty
            ? new Stimulus(sketch.Edge.Rising ? Edge.Rise : Edge.Fall, d.RiseSeconds, d.FallSeconds, [], 0)
            : new Stimulus(Edge.Pattern, d.RiseSeconds, d.FallSeconds, sketch.Edge.Bits, sketch.Edge.BitSeconds);
        var load = sketch.ReferenceLoad is { } l ? new ReferenceLoad(l.ResistanceOhms, l.ToVolts, l.CapacitanceFarads) : null;
        // Twenty round trips of the whole net settle all but the wildest ringing.
        var duration = sketch.DurationSeconds
            ?? (WindowInRamps * d.RiseSeconds) + (WindowInDelays * whole) + (sketch.Edge.Bits.Length * sketch.Edge.BitSeconds);
        if (problems.ErrorCount > errorsBefore)
            return null;
        var network = builder.Build(driver, stimulus, duration, load);
        foreach (var problem in NetworkCheck.Problems(network))
            problems.Error(PositionOf(sketch, problem), problem.Message, problem.Advice);
        return problems.ErrorCount > errorsBefore ? null : network;
    }

    private double AddLine(NetworkBuilder builder, NetSketch sketch, SketchLine line, ProblemList problems)
    {
        switch (line)
        {
            case IdealSketchLine ideal:
                builder.Line(line.From, line.To, ideal.Z0Ohms, ideal.DelaySeconds);
                return ideal.DelaySeconds;
            case LossySketchLine lossy:
                builder.LossyLine(line.From, line.To, lossy.LengthMetres, new LossyLineConstants(
                    lossy.HenryPerMetre, lossy.FaradPerMetre, lossy.DcOhmPerMetre, lossy.SkinOhmPerMetreRootHertz, lossy.Df, lossy.AtHertz));
                return lossy.LengthMetres * Math.Sqrt(lossy.HenryPerMetre * lossy.FaradPerMetre);
            default:
                return AddTrace(builder, sketch, (TraceSketchLine)line, problems);
        }
    }

    private double AddTrace(NetworkBuilder builder, NetSketch sketch, TraceSketchLine trace, ProblemList problems)
    {
        var request = new SectionRequest(trace.At, trace.Layer, trace.WidthMetres) { FrequencyHertz = KneeHertz(sketch.Driver.RiseSeconds) };
        if (sketch.StackUp is not { } stackUp || SectionBuilder.Build(stackUp, request, problems) is not { } section)
            return 0;
        if (calculator.Calculate(section) is not { } solution)
        {
            problems.Error(trace.At, calculator.Objection(section) ?? "there is no method for this cross-section");
            return 0;
        }
        var delay = trace.LengthMetres * solution.DelaySecondsPerMetre;
        builder.Line(trace.From, trace.To, solution.Z0Ohms, delay);
        return delay;
    }

    /// <summary>
    /// The frequency up to which an edge has most of its energy, 0.5 over the 10–90 % rise time (H. W. Johnson and M. Graham, High-Speed Digital Design,
    /// Prentice Hall 1993, chapter 1); 0.8 of a linear ramp is its 10–90 % time.
    /// </summary>
    /// <param name="rampSeconds">0–100 % ramp, s.</param>
    public static double KneeHertz(double rampSeconds) => 0.5 / (0.8 * rampSeconds);

    private static FilePosition PositionOf(NetSketch sketch, NetworkProblem problem) => problem.Part switch
    {
        NetworkPart.Line => sketch.Lines.Where(l => l is not LossySketchLine).ElementAt(problem.Index).At,
        NetworkPart.LossyLine => sketch.Lines.OfType<LossySketchLine>().ElementAt(problem.Index).At,
        NetworkPart.CoupledLines => sketch.CoupledLines[problem.Index].At,
        NetworkPart.Series => sketch.Series[problem.Index].At,
        NetworkPart.Shunt => sketch.Shunts[problem.Index].At,
        NetworkPart.Receiver => sketch.Receivers[problem.Index].At,
        NetworkPart.Stimulus => sketch.Edge.At,
        _ => sketch.Driver.At,
    };
}
