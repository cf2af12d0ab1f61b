using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Rules.Kinds;

/// <summary>Setup and hold margin of a transfer, with every uncertainty that its author gives.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The data nets.</param>
/// <param name="Budget">The equations and their figures.</param>
/// <param name="MarginSeconds">Margin that must remain, s.</param>
/// <param name="Query">Which delays.</param>
public sealed record SetupHoldRule(RuleHeader Header, NetSet Nets, TransferBudget Budget, double MarginSeconds, DelayQuery Query) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "setup-hold",
        "Setup and hold margin of a transfer: source-synchronous (against a strobe) or common-clock.",
        "source-synchronous: setup = valid-before − (Tdata,max − Tstrobe,min) − setup − jitter, hold = valid-after + (Tdata,min − Tstrobe,max) − hold − jitter; "
            + "common-clock: setup = period + (Tcapture − Tlaunch) − tco-max − Tdata,max − setup − skew − jitter, hold = tco-min + Tdata,min − (Tcapture − Tlaunch) − hold − skew "
            + "(S. Hall, G. Hall, J. McCall, High-Speed Digital System Design, Wiley 2000, chapter 8; from memory)",
        [
            RuleKeys.Nets,
            new("transfer", "source-synchronous", true, "source-synchronous or common-clock"),
            new("setup", "60 ps", true, "setup time of the receiver"),
            new("hold", "60 ps", true, "hold time of the receiver"),
            new("to", "MEM_DQS0", false, "source-synchronous: strobe, pair or group; otherwise that of the rule's group"),
            new("valid-before", "180 ps", false, "source-synchronous, required: how long before the strobe the driver's data are valid at its pins"),
            new("valid-after", "180 ps", false, "source-synchronous, required: how long after the strobe they stay valid"),
            new("period", "10 ns", false, "common-clock, required: clock period, or bit time"),
            new("tco-min", "1 ns", false, "common-clock, required: shortest clock-to-output of the driver, into the reference load"),
            new("tco-max", "4 ns", false, "common-clock, required: longest clock-to-output of the driver"),
            new("launch-clock", "CLK_A", false, "common-clock: clock net of the driver; with capture-clock the difference of their delays counts"),
            new("capture-clock", "CLK_B", false, "common-clock: clock net of the receiver"),
            new("skew", "100 ps", false, "common-clock: uncertainty between the clock buffer's outputs; 0 where missing"),
            new("jitter", "50 ps", false, "jitter of strobe or clock; 0 where missing"),
            new("margin", "20 ps", false, "margin that must remain; 0 where missing"),
            RuleKeys.Delay, RuleKeys.Drive, RuleKeys.At,
        ],
        Read);

    private static readonly Dictionary<string, bool> Transfers = new(StringComparer.Ordinal)
    {
        ["source-synchronous"] = true,
        ["common-clock"] = false,
    };

    private Drivers ReferenceDrive => Budget is SourceSynchronousBudget ? Query.Drive.ForReferencesOf(Nets.Names[0]) : Query.Drive with { Stated = null };

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText => $"margin of at least {DisplayUnit.Picoseconds.Show(MarginSeconds)}, {Budget.Name}";

    /// <inheritdoc/>
    public override IEnumerable<NetNeed> Needs() => NetNeed.ForDelays(Nets.Names, Query, [Edge.Rise, Edge.Fall])
        .Concat(NetNeed.ForDelays(Budget.ReferenceNames, Query with { Drive = ReferenceDrive }, [Edge.Rise, Edge.Fall]));

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        ImmutableArray<string> judged = [.. Nets.Names.Except(Budget.ReferenceNames)];
        var data = DelayTable.Collect(board, judged, Query);
        foreach (var (net, reason) in data.Missing)
            judgement.Unchecked(net, [net], reason);
        var references = new TransferReferences(board, Budget, Query with { Basis = data.Basis, Drive = ReferenceDrive });
        foreach (var comparison in data.Comparisons)
        {
            foreach (var delay in comparison.Delays)
                Judge(board, judgement, comparison.SubjectOf(delay), delay, references, data);
        }
    }

    private static SetupHoldRule? Read(RuleReader reader, RuleHeader header)
    {
        var errors = reader.Map.Problems.ErrorCount;
        var nets = reader.NeedNets();
        var word = reader.Map.NeedText("transfer", "transfer: source-synchronous or transfer: common-clock");
        var setup = reader.Map.NeedQuantity("setup", Dimension.Time, QuantityRange.Any, "setup: 60 ps")?.Value ?? 0;
        var hold = reader.Map.NeedQuantity("hold", Dimension.Time, QuantityRange.Any, "hold: 60 ps")?.Value ?? 0;
        var jitter = reader.NotNegative("jitter", Dimension.Time) ?? 0;
        var margin = reader.Any("margin", Dimension.Time) ?? 0;
        var query = reader.Delays(nets);
        TransferBudget? budget = null;
        if (word is not null && reader.Map.Choice("transfer", Transfers) is { } sourceSynchronous)
            budget = sourceSynchronous ? ReadSource(reader, nets, setup, hold, jitter) : ReadCommon(reader, setup, hold, jitter);
        else
            DeclareAllKeys(reader);
        return nets is null || budget is null || reader.Map.Problems.ErrorCount > errors
            ? null
            : new SetupHoldRule(header, nets, budget, margin, query);
    }

    /// <summary>Without the word that says which keys belong there, none of them is unknown.</summary>
    private static void DeclareAllKeys(RuleReader reader)
    {
        foreach (var key in Kind.Keys)
            reader.Map.Has(key.Key);
    }

    private static SourceSynchronousBudget? ReadSource(RuleReader reader, NetSet? nets, double setup, double hold, double jitter)
    {
        var before = reader.Map.NeedQuantity("valid-before", Dimension.Time, QuantityRange.Any, "valid-before: 180 ps")?.Value;
        var after = reader.Map.NeedQuantity("valid-after", Dimension.Time, QuantityRange.Any, "valid-after: 180 ps")?.Value;
        var to = reader.NeedReference("to", nets);
        return before is null || after is null || to is null
            ? null
            : new SourceSynchronousBudget(to, before.Value, after.Value, setup, hold, jitter);
    }

    private static CommonClockBudget? ReadCommon(RuleReader reader, double setup, double hold, double jitter)
    {
        var period = reader.NeedPositive("period", Dimension.Time, "period: 10 ns");
        var least = reader.Map.NeedQuantity("tco-min", Dimension.Time, QuantityRange.Any, "tco-min: 1 ns")?.Value;
        var most = reader.Map.NeedQuantity("tco-max", Dimension.Time, QuantityRange.Any, "tco-max: 4 ns")?.Value;
        var skew = reader.NotNegative("skew", Dimension.Time) ?? 0;
        var launch = reader.Net("launch-clock");
        var capture = reader.Net("capture-clock");
        if ((launch is null) != (capture is null) && reader.Map.Has("launch-clock") != reader.Map.Has("capture-clock"))
            reader.Map.Problems.Error(reader.Map.At, "'launch-clock' and 'capture-clock' belong together", "name the clock nets of both parts, or neither");
        if (least > most)
            reader.Map.Problems.Error(reader.Map.PositionOf("tco-min"), "'tco-min' is above 'tco-max'", "swap them");
        return period is null || least is null || most is null
            ? null
            : new CommonClockBudget(period.Value, least.Value, most.Value, launch, capture, setup, hold, skew, jitter);
    }

    private void Judge(
        IBoardPhysics board, Judgement judgement, string subject, ReceiverDelay delay, TransferReferences references, DelayTable data)
    {
        ImmutableArray<string> nets = [delay.Driven.Net];
        var flight = DelaySpan.Of(board, delay, data.Basis);
        if (references.At(delay, out var objection) is not { } reference)
        {
            judgement.Unchecked(subject, nets, objection);
            return;
        }
        var unit = DisplayUnit.Picoseconds;
        var setup = Budget.SetupMargin(flight, reference);
        var hold = Budget.HoldMargin(flight, reference);
        var window = Window.AtLeast(MarginSeconds);
        var method = $"{Budget.Name} budget; {data.MethodText(board, "both edges")}";
        judgement.Measured(
            $"{subject}, setup", nets, setup, window, unit, method,
            $"{subject} has a setup margin of {unit.Show(setup)}: {Budget.SetupText(flight, reference)}; {unit.Show(MarginSeconds)} must remain.",
            Judgement.Holds(setup, window) ? null : PathLength.Change(delay.Path, setup - MarginSeconds), Budget.SetupSeconds);
        judgement.Measured(
            $"{subject}, hold", nets, hold, window, unit, method,
            $"{subject} has a hold margin of {unit.Show(hold)}: {Budget.HoldText(flight, reference)}; {unit.Show(MarginSeconds)} must remain.",
            Judgement.Holds(hold, window) ? null : PathLength.Change(delay.Path, MarginSeconds - hold), Budget.HoldSeconds);
    }
}
