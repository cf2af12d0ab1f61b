using System.Collections.Immutable;

namespace StackTiming.Rules.Results;

/// <summary>
/// The delays that a <c>match</c>, <c>offset</c>, <c>pair-skew</c> or <c>flight-time</c> rule compared: the data of a matching chart.
/// </summary>
/// <param name="Rule">Id of the rule.</param>
/// <param name="Kind">Its kind.</param>
/// <param name="Group">The nets as the rule names them.</param>
/// <param name="ReferenceName">Net that the others are compared with, or empty.</param>
/// <param name="ReferenceSeconds">Its delay, or null.</param>
/// <param name="LowestSeconds">Lowest delay that the rule allows, absolute; null where there is none.</param>
/// <param name="HighestSeconds">Highest delay that the rule allows, absolute; null where there is none.</param>
/// <param name="Delays">The delays, in natural order of their nets.</param>
public sealed record GroupDelays(
    string Rule,
    string Kind,
    string Group,
    string ReferenceName,
    double? ReferenceSeconds,
    double? LowestSeconds,
    double? HighestSeconds,
    ImmutableArray<NetDelay> Delays);

/// <summary>The delay of one net to one receiver.</summary>
/// <param name="Net">The net.</param>
/// <param name="From">Driver pin.</param>
/// <param name="To">Receiver pin.</param>
/// <param name="DelaySeconds">Delay, seconds.</param>
/// <param name="LengthMetres">Routed length, metres.</param>
/// <param name="Holds">Whether it lies inside the limits.</param>
public sealed record NetDelay(string Net, string From, string To, double DelaySeconds, double LengthMetres, bool Holds);
