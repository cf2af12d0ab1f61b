using System.Collections.Immutable;

namespace StackTiming.Rules.Judging;

/// <summary>
/// The delays of some nets, sorted into those that can be compared: where nets have several receivers, those at the same part.
/// </summary>
public sealed class DelayTable
{
    private DelayTable(ImmutableArray<Comparison> comparisons, ImmutableArray<(string Net, string Reason)> missing, DelayBasis basis)
    {
        Comparisons = comparisons;
        Missing = missing;
        Basis = basis;
    }

    /// <summary>The delays to compare with each other.</summary>
    public ImmutableArray<Comparison> Comparisons { get; }

    /// <summary>Nets without a delay, and why.</summary>
    public ImmutableArray<(string Net, string Reason)> Missing { get; }

    /// <summary>What the delays count: never <see cref="DelayBasis.Automatic"/>.</summary>
    public DelayBasis Basis { get; }

    /// <summary>How the delays were computed, for findings.</summary>
    /// <param name="board">The board.</param>
    /// <param name="edges">Which edges count.</param>
    public string MethodText(IBoardPhysics board, string edges = "rising edge") => Basis == DelayBasis.FlightTime
        ? $"flight time against the reference load, {edges}; lines by {board.CalculatorName}"
        : $"time of flight: line, via and package delays; lines by {board.CalculatorName}";

    /// <summary>Collects the delays of nets.</summary>
    /// <param name="board">The board.</param>
    /// <param name="nets">The nets.</param>
    /// <param name="query">Who drives, where the delays end and what they count.</param>
    public static DelayTable Collect(IBoardPhysics board, ImmutableArray<string> nets, DelayQuery query)
    {
        var missing = ImmutableArray.CreateBuilder<(string, string)>();
        var ways = new List<(DrivenNet Driven, ReceiverPath Path)>();
        var several = false;
        foreach (var (net, drives, objection) in JudgedNet.Of(board, nets, query.Drive))
        {
            var before = ways.Count;
            foreach (var driven in drives)
            {
                foreach (var path in driven.Receivers)
                {
                    if (query.At.Includes(path.Receiver))
                        ways.Add((driven, path));
                }
                several |= driven.Receivers.Length > 1;
            }
            several |= drives.Length > 1;
            if (ways.Count == before)
                missing.Add((net, drives.IsEmpty ? objection : query.At.Text.Length == 0 ? "no receiver is on it" : $"it does not reach {query.At.Text}"));
        }
        var basis = query.Basis;
        double[]? seconds = null;
        if (basis != DelayBasis.TimeOfFlight)
        {
            seconds = FlightTimes(board, ways, out var reason);
            if (seconds is null && basis == DelayBasis.FlightTime)
                return new DelayTable([], [.. nets.Select(n => (n, reason))], basis);
            basis = seconds is null ? DelayBasis.TimeOfFlight : DelayBasis.FlightTime;
        }
        var delays = new List<ReceiverDelay>(ways.Count);
        for (var i = 0; i < ways.Count; i++)
            delays.Add(new ReceiverDelay(ways[i].Driven, ways[i].Path, seconds?[i] ?? ways[i].Path.DelaySeconds));
        var comparisons = several
            ? delays.GroupBy(d => (From: PinName.PartOf(d.Driven.Driver), To: d.Path.Part))
                .OrderBy(g => g.Key.From, Findings.NaturalOrder.Instance).ThenBy(g => g.Key.To, Findings.NaturalOrder.Instance)
                .Select(g => new Comparison(g.Key.From, g.Key.To, [.. g]))
            : [new Comparison("", "", [.. delays])];
        return new DelayTable([.. comparisons.Where(c => !c.Delays.IsEmpty)], missing.ToImmutable(), basis);
    }

    private static double[]? FlightTimes(IBoardPhysics board, List<(DrivenNet Driven, ReceiverPath Path)> ways, out string reason)
    {
        reason = "";
        var seconds = new double[ways.Count];
        for (var i = 0; i < ways.Count; i++)
        {
            if (board.FlightTime(ways[i].Driven, ways[i].Path.Receiver, Edge.Rise, out reason) is not { } flight)
                return null;
            seconds[i] = flight;
        }
        return seconds;
    }
}

/// <summary>Delays that can be compared with each other.</summary>
/// <param name="From">Part that drives, or empty where each net has one driver and one receiver.</param>
/// <param name="To">Part that receives, or empty.</param>
/// <param name="Delays">The delays.</param>
public sealed record Comparison(string From, string To, ImmutableArray<ReceiverDelay> Delays)
{
    /// <summary>Number of different nets.</summary>
    public int NetCount => Delays.Select(d => d.Driven.Net).Distinct(StringComparer.Ordinal).Count();

    /// <summary>Names a delay: its net, and its driver and receiver where there are several.</summary>
    /// <param name="delay">One of the delays.</param>
    public string SubjectOf(ReceiverDelay delay) =>
        To.Length == 0 ? delay.Driven.Net : $"{delay.Driven.Net} from {delay.Driven.Driver} to {delay.Path.Receiver}";
}

/// <summary>Which delays a rule looks at.</summary>
/// <param name="Drive">Who drives.</param>
/// <param name="At">Where the delays end.</param>
/// <param name="Basis">What they count.</param>
public readonly record struct DelayQuery(Drivers Drive, ReceiverChoice At, DelayBasis Basis);
