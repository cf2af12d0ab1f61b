using System.Collections.Immutable;
using StackTiming.Rules.RuleFiles;

namespace StackTiming.Rules.Kinds;

/// <summary>The kinds of rules. A new kind is one file and one line here.</summary>
public static class RuleKinds
{
    /// <summary>All kinds, in the order in which help texts list them.</summary>
    public static ImmutableArray<RuleKind> All { get; } =
    [
        ImpedanceRule.Kind,
        StepRule.Kind,
        LayersRule.Kind,
        LossRule.Kind,
        MatchRule.Kind,
        OffsetRule.Kind,
        FlightTimeRule.Kind,
        PairSkewRule.Kind,
        StubRule.Kind,
        FirstWaveRule.Kind,
        OvershootRule.Kind,
        RingbackRule.Kind,
        SettlingRule.Kind,
        SetupHoldRule.Kind,
    ];

    private static readonly Dictionary<string, RuleKind> ByName = All.ToDictionary(k => k.Name, StringComparer.Ordinal);

    /// <summary>The kind of that name, or null.</summary>
    /// <param name="name">Name in rule files.</param>
    public static RuleKind? Find(string name) => ByName.GetValueOrDefault(name);
}
