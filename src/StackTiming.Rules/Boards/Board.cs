using System.Collections.Immutable;
using StackTiming.Nets.Electrical;
using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Results;
using StackTiming.Rules.RuleFiles;
using StackTiming.Rules.Waivers;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Boards;

/// <summary>Everything that the files of a board say, ready to be checked.</summary>
public sealed record Board
{
    /// <summary>Name.</summary>
    public required string Name { get; init; }

    /// <summary>Revision; may be empty.</summary>
    public required string Revision { get; init; }

    /// <summary>The stack-up.</summary>
    public required StackUp StackUp { get; init; }

    /// <summary>The routed lengths.</summary>
    public required LengthList Lengths { get; init; }

    /// <summary>The nets as series parts join them.</summary>
    public required ElectricalNets Electrical { get; init; }

    /// <summary>The parts; none where the board file names no parts file.</summary>
    public required PartList Parts { get; init; }

    /// <summary>The rules in file order, with their nets found.</summary>
    public required ImmutableArray<Rule> Rules { get; init; }

    /// <summary>The waivers in file order, with their nets.</summary>
    public required ImmutableArray<ResolvedWaiver> Waivers { get; init; }

    /// <summary>Coupon files that the board names; kept for the comparison with readings, not judged by a check.</summary>
    public required ImmutableArray<string> Coupons { get; init; }

    /// <summary>What is assumed of signals where parts and rules say nothing.</summary>
    public required SignalAssumptions Assumed { get; init; }

    /// <summary>The files that were read.</summary>
    public required ImmutableArray<InputDigest> Inputs { get; init; }

    /// <summary>What the readers want the author to know.</summary>
    public required ImmutableArray<Problem> Notes { get; init; }
}
