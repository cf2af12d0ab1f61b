using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Tests.Judging;

/// <summary>Judges one rule on a tiny board.</summary>
internal static class Judge
{
    public static RuleHeader Header(string kind) => new("R1", kind, Severity.Must, "because", "common practice", new FilePosition("rules.yaml", 3, 5));

    public static NetSet Nets(params string[] names) => new(string.Join(", ", names), [.. names.Order(NaturalOrder.Instance)], null, null);

    public static DelayQuery TimeOfFlight { get; } = new(Drivers.OnlyDriver, new ReceiverChoice(""), DelayBasis.TimeOfFlight);

    public static DelayQuery Automatic { get; } = TimeOfFlight with { Basis = DelayBasis.Automatic };

    public static EdgeQuery Edges(params Edge[] edges) => new(Drivers.OnlyDriver, new ReceiverChoice(""), [.. edges]);

    public static ImmutableArray<Finding> Run(Rule rule, IBoardPhysics board) => [.. Full(rule, board).Findings];

    public static Judgement Full(Rule rule, IBoardPhysics board)
    {
        var judgement = new Judgement(rule.Header);
        rule.Judge(board, judgement);
        return judgement;
    }
}
