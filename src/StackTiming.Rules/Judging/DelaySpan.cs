namespace StackTiming.Rules.Judging;

/// <summary>Earliest and latest of the delays of both edges, s.</summary>
/// <param name="Earliest">The smaller.</param>
/// <param name="Latest">The larger.</param>
public readonly record struct DelaySpan(double Earliest, double Latest)
{
    /// <summary>The span of a delay: both edges where flight time counts, one value otherwise.</summary>
    /// <param name="board">The board.</param>
    /// <param name="delay">The delay of the rising edge.</param>
    /// <param name="basis">What delays count.</param>
    public static DelaySpan Of(IBoardPhysics board, ReceiverDelay delay, DelayBasis basis)
    {
        var falling = basis == DelayBasis.FlightTime
            ? board.FlightTime(delay.Driven, delay.Path.Receiver, Edge.Fall, out _)
            : null;
        var other = falling ?? delay.Seconds;
        return new DelaySpan(Math.Min(delay.Seconds, other), Math.Max(delay.Seconds, other));
    }
}
