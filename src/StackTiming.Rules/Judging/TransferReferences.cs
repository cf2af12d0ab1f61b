namespace StackTiming.Rules.Judging;

/// <summary>The delays of strobe or clocks that a transfer is held against.</summary>
/// <param name="board">The board.</param>
/// <param name="budget">The budget.</param>
/// <param name="query">Which delays; the same basis as the data's, so that the difference means something.</param>
internal sealed class TransferReferences(IBoardPhysics board, TransferBudget budget, DelayQuery query)
{
    private readonly DelayTable? strobe = budget is SourceSynchronousBudget source ? DelayTable.Collect(board, source.Strobe.Nets, query) : null;

    /// <summary>The reference for a data delay.</summary>
    /// <param name="data">The data delay.</param>
    /// <param name="objection">Why there is none.</param>
    public DelaySpan? At(ReceiverDelay data, out string objection)
    {
        objection = "";
        switch (budget)
        {
            case SourceSynchronousBudget source:
                return AtStrobe(data, source, out objection);
            case CommonClockBudget { LaunchClock: { } launch, CaptureClock: { } capture }:
                var first = Clock(launch, PinName.PartOf(data.Driven.Driver), out objection);
                var second = first is null ? null : Clock(capture, data.Path.Part, out objection);
                return first is { } l && second is { } c ? new DelaySpan(c.Earliest - l.Latest, c.Latest - l.Earliest) : null;
            default:
                return new DelaySpan(0, 0);
        }
    }

    private DelaySpan? AtStrobe(ReceiverDelay data, SourceSynchronousBudget source, out string objection)
    {
        objection = "";
        if (!strobe!.Missing.IsEmpty)
        {
            objection = $"{strobe.Missing[0].Net}: {strobe.Missing[0].Reason}";
            return null;
        }
        var from = PinName.PartOf(data.Driven.Driver);
        var spans = strobe.Comparisons.SelectMany(c => c.Delays)
            .Where(d => d.Path.Part == data.Path.Part && PinName.PartOf(d.Driven.Driver) == from)
            .Select(d => DelaySpan.Of(board, d, strobe.Basis)).ToArray();
        if (spans.Length == 0)
        {
            objection = $"{source.Strobe.Name} does not run from {from} to {data.Path.Part}";
            return null;
        }
        return new DelaySpan(spans.Average(s => s.Earliest), spans.Average(s => s.Latest));
    }

    private DelaySpan? Clock(string net, string part, out string objection)
    {
        var table = DelayTable.Collect(board, [net], query with { At = new ReceiverChoice(part) });
        if (table.Comparisons.IsEmpty)
        {
            objection = $"{net}: {table.Missing[0].Reason}";
            return null;
        }
        objection = "";
        var spans = table.Comparisons.SelectMany(c => c.Delays).Select(d => DelaySpan.Of(board, d, table.Basis)).ToArray();
        return new DelaySpan(spans.Min(s => s.Earliest), spans.Max(s => s.Latest));
    }
}
