using System.Collections.Immutable;
using StackTiming.Reports.Results;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Compliance;

/// <summary>What a compliance report is built from.</summary>
/// <param name="Result">The results of the check.</param>
/// <param name="Tool">The program that made them.</param>
/// <param name="Date">The day that the report carries.</param>
public sealed record ReportInput(CheckResult Result, ToolIdentity Tool, DateOnly Date)
{
    /// <summary>What is known of the methods; those that the check did not use are left out of the report.</summary>
    public ImmutableArray<MethodDescription> Methods { get; init; } = MethodDescription.OfLineMethods();

    /// <summary>The results as JSON, attached to the report; null where nothing is attached.</summary>
    public ReadOnlyMemory<byte>? ResultsJson { get; init; }

    /// <summary>Whether the fields of the most routed lines are drawn. They take most of the time of a small report.</summary>
    public bool ShowFields { get; init; }

    /// <summary>Whether the elapsed times are shown. They differ from run to run, and so would the bytes of the report.</summary>
    public bool ShowTimings { get; init; }
}
