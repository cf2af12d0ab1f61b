using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Results;

/// <summary>Everything that a check found: what the reports are written from.</summary>
public sealed record CheckResult
{
    /// <summary>Name of the board.</summary>
    public required string Board { get; init; }

    /// <summary>Its revision; may be empty.</summary>
    public required string Revision { get; init; }

    /// <summary>The day of the check, against which waivers are held.</summary>
    public required DateOnly CheckedOn { get; init; }

    /// <summary>The verdict.</summary>
    public Verdict Verdict => Counts.Verdict;

    /// <summary>Number of findings of each outcome.</summary>
    public required FindingCounts Counts { get; init; }

    /// <summary>The input files.</summary>
    public required ImmutableArray<InputDigest> Inputs { get; init; }

    /// <summary>The stack-up that was judged.</summary>
    public required StackUp StackUp { get; init; }

    /// <summary>The rules in file order.</summary>
    public required ImmutableArray<RuleSummary> Rules { get; init; }

    /// <summary>The findings, worst first.</summary>
    public required ImmutableArray<Finding> Findings { get; init; }

    /// <summary>Delays that were compared, one entry per rule and group, in rule order.</summary>
    public required ImmutableArray<GroupDelays> Groups { get; init; }

    /// <summary>Waveforms of the nets whose reflection rules fail or are close, worst first; of the others none are kept.</summary>
    public required ImmutableArray<ReceiverWave> Waves { get; init; }

    /// <summary>The distinct cross-sections of the board, by layer and width.</summary>
    public required ImmutableArray<LineUse> Lines { get; init; }

    /// <summary>The methods used.</summary>
    public required ImmutableArray<MethodUse> Methods { get; init; }

    /// <summary>What was assumed where the inputs are silent, in sentences.</summary>
    public required ImmutableArray<string> Assumptions { get; init; }

    /// <summary>Notes of the readers.</summary>
    public required ImmutableArray<Problem> Notes { get; init; }

    /// <summary>Elapsed time of each phase.</summary>
    public required ImmutableArray<PhaseTime> Phases { get; init; }

    /// <summary>Number of nets on the board.</summary>
    public required int NetCount { get; init; }

    /// <summary>Number of routed segments.</summary>
    public required int SegmentCount { get; init; }
}
