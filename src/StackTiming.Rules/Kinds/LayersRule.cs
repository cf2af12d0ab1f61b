using System.Collections.Immutable;
using StackTiming.Nets.Lengths;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Kinds;

/// <summary>Layers that traces may use, and the reference planes that they must have.</summary>
/// <param name="Header">What every rule states.</param>
/// <param name="Nets">The nets.</param>
/// <param name="Allowed">Layers allowed, or empty for all.</param>
/// <param name="Planes">Reference planes that a trace must have, or null.</param>
/// <param name="OutsideMetres">Length that may run elsewhere, metres.</param>
public sealed record LayersRule(
    RuleHeader Header, NetSet Nets, ImmutableArray<string> Allowed, PlaneNeed Planes, double OutsideMetres) : Rule(Header)
{
    /// <summary>The kind.</summary>
    public static RuleKind Kind { get; } = new(
        "layers",
        "Layers that the traces of a net may use, and reference planes that they must have above and below.",
        "a layer has a plane on a side where the stack-up has a copper layer with use: plane there, at any distance",
        [
            RuleKeys.Nets,
            new("allowed", "[ L3, L6 ]", false, "layers that traces may use; all where missing"),
            new("planes", "both", false, "both: above and below; either: on one side at least; none. Where missing: either without 'allowed', none with it"),
            new("outside", "2 mm", false, "trace length that may break the rule, such as breakouts; 0 where missing"),
        ],
        Read);

    private static readonly Dictionary<string, PlaneNeed> PlaneWords = new(StringComparer.Ordinal)
    {
        ["both"] = PlaneNeed.Both,
        ["either"] = PlaneNeed.Either,
        ["none"] = PlaneNeed.None,
    };

    /// <inheritdoc/>
    public override string NetsText => Nets.Text;

    /// <inheritdoc/>
    public override string LimitText
    {
        get
        {
            var where = Allowed.IsEmpty ? "on any layer" : $"on {string.Join(", ", Allowed)}";
            var planes = Planes switch
            {
                PlaneNeed.Both => " with planes on both sides",
                PlaneNeed.Either => " with a plane on one side at least",
                _ => "",
            };
            return where + planes + (OutsideMetres > 0 ? $", but for {DisplayUnit.Millimetres.Show(OutsideMetres)}" : "");
        }
    }

    /// <inheritdoc/>
    public override void Judge(IBoardPhysics board, Judgement judgement)
    {
        var wrong = board.StackUp.CopperLayers.ToDictionary(l => l.Name, l => Objection(board.StackUp, l.Name), StringComparer.Ordinal);
        foreach (var net in Nets.Names)
            Judge(board, judgement, net, wrong);
    }

    private static LayersRule? Read(RuleReader reader, RuleHeader header)
    {
        var nets = reader.NeedNets();
        var errors = reader.Map.Problems.ErrorCount;
        var allowed = ImmutableArray.CreateBuilder<string>();
        foreach (var node in reader.Map.List("allowed"))
        {
            if (reader.Map.TextOf(node, "allowed") is { } name)
            {
                if (reader.Layers is { } known && !known.Contains(name))
                    reader.Map.Problems.Error(node.At, $"the stack-up has no copper layer '{Suggestion.Shorten(name)}'", Suggestion.For(name, known));
                allowed.Add(name);
            }
        }
        var planes = reader.Map.Choice("planes", PlaneWords) ?? (allowed.Count == 0 ? PlaneNeed.Either : PlaneNeed.None);
        var outside = reader.NotNegative("outside", Dimension.Length) ?? 0;
        if (allowed.Count == 0 && planes == PlaneNeed.None)
            reader.Map.Problems.Error(reader.Map.PositionOf("planes"), "without 'allowed' and with planes: none the rule says nothing", "write allowed: [ L3, L6 ]");
        return nets is null || reader.Map.Problems.ErrorCount > errors
            ? null
            : new LayersRule(header, nets, allowed.ToImmutable(), planes, outside);
    }

    private void Judge(IBoardPhysics board, Judgement judgement, string net, Dictionary<string, string?> wrong)
    {
        var traces = 0;
        double outside = 0, whole = 0;
        var why = new SortedDictionary<string, double>(NaturalOrder.Instance);
        foreach (ref readonly var segment in board.SegmentsOf(net))
        {
            if (segment.Kind != SegmentKind.Trace)
                continue;
            traces++;
            whole += segment.LengthMetres;
            if (wrong.TryGetValue(segment.Layer, out var objection) && objection is null)
                continue;
            outside += segment.LengthMetres;
            var text = $"{segment.Layer}{objection}";
            why[text] = why.GetValueOrDefault(text) + segment.LengthMetres;
        }
        if (traces == 0)
        {
            judgement.Unchecked(net, [net], "it has no trace");
            return;
        }
        var unit = DisplayUnit.Millimetres;
        var explanation = outside == 0
            ? $"{net} runs {LimitText}, as wanted."
            : $"{net} runs {string.Join(" and ", why.Select(w => $"{unit.Show(w.Value)} on {w.Key}"))}; allowed is {LimitText}.";
        judgement.Measured(
            net, [net], outside, Window.AtMost(OutsideMetres), unit, "layers of the length list against the stack-up", explanation,
            outside > OutsideMetres ? new Fix(FixKind.Other, $"move {unit.Show(outside - OutsideMetres)} of {net} to {Proposal(wrong)}", net, "", double.NaN) : null,
            relativeMargin: outside == 0 ? 1 : (OutsideMetres - outside) / whole);
    }

    private string? Objection(StackUp stackUp, string layer)
    {
        if (!Allowed.IsEmpty && !Allowed.Contains(layer))
            return ", which is not allowed";
        var (above, below) = ReferencePlanes.Of(stackUp, layer);
        return Planes switch
        {
            PlaneNeed.Both when !above && !below => ", which has no reference plane",
            PlaneNeed.Both when !above => ", which has no plane above",
            PlaneNeed.Both when !below => ", which has no plane below",
            PlaneNeed.Either when !above && !below => ", which has no reference plane",
            _ => null,
        };
    }

    private static string Proposal(Dictionary<string, string?> wrong)
    {
        var right = wrong.Where(w => w.Value is null).Select(w => w.Key).Order(NaturalOrder.Instance).ToArray();
        return right.Length == 0 ? "a layer that the rule accepts; the stack-up has none" : string.Join(" or ", right);
    }
}

/// <summary>Reference planes that a trace must have.</summary>
public enum PlaneNeed
{
    /// <summary>None.</summary>
    None,
    /// <summary>On one side at least.</summary>
    Either,
    /// <summary>On both sides.</summary>
    Both,
}
