namespace StackTiming.Rules.Judging;

/// <summary>What a delay counts.</summary>
public enum DelayBasis
{
    /// <summary>Flight time where all of the compared receivers allow it, time of flight otherwise.</summary>
    Automatic,
    /// <summary>
    /// From the instant at which the driver would cross the receiver's threshold into its reference load to the first crossing at the receiver:
    /// the load of the receiver and the reflections count.
    /// </summary>
    FlightTime,
    /// <summary>The sum of line, via and package delays along the way.</summary>
    TimeOfFlight,
}

/// <summary>The delay from a driver to a receiver.</summary>
/// <param name="Driven">The net from its driver.</param>
/// <param name="Path">The way to the receiver.</param>
/// <param name="Seconds">The delay, s.</param>
public readonly record struct ReceiverDelay(DrivenNet Driven, ReceiverPath Path, double Seconds);
