using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Compliance;

/// <summary>The findings of a check sorted by rule, with the anchors under which the report shows them.</summary>
internal sealed class Judgements
{
    // Rules with a table of their own; of more rules the worst have one, and the summary names them all.
    private const int RulesWithTable = 120;

    private readonly Dictionary<string, List<Finding>> byRule = [];
    private readonly Dictionary<string, string> anchors = [];

    /// <summary>Sorts the findings.</summary>
    /// <param name="result">The results of the check.</param>
    public Judgements(CheckResult result)
    {
        foreach (var finding in result.Findings)
        {
            if (!byRule.TryGetValue(finding.Rule, out var list))
                byRule[finding.Rule] = list = [];
            list.Add(finding);
        }
        WorstOfEachRule = [.. byRule.Values.Select(list => list[0]).Order(WorstFirst.Instance)];

        var rank = WorstOfEachRule.Select((f, i) => (f.Rule, i)).ToDictionary(p => p.Rule, p => p.i);
        Tabled = [.. result.Rules.Select((r, i) => (Rule: r, Index: i)).OrderBy(p => rank.GetValueOrDefault(p.Rule.Id, int.MaxValue)).ThenBy(p => p.Index)
            .Take(RulesWithTable).OrderBy(p => p.Index).Select(p => p.Rule)];
        foreach (var rule in result.Rules)
            anchors.TryAdd(rule.Id, Anchors.Rules);
        for (var i = 0; i < Tabled.Count; i++)
            anchors[Tabled[i].Id] = string.Create(System.Globalization.CultureInfo.InvariantCulture, $"rule-{i + 1}");
    }

    /// <summary>The worst finding of each rule, worst first.</summary>
    public List<Finding> WorstOfEachRule { get; }

    /// <summary>The rules that have a table of their own, in file order.</summary>
    public List<RuleSummary> Tabled { get; }

    /// <summary>The findings of a rule, worst first.</summary>
    /// <param name="rule">Id of the rule.</param>
    public List<Finding> Of(string rule) => byRule.TryGetValue(rule, out var list) ? list : [];

    /// <summary>Where the report shows the rule.</summary>
    /// <param name="rule">Id of the rule.</param>
    public string AnchorOf(string rule) => anchors.GetValueOrDefault(rule, Anchors.Findings);
}

/// <summary>The places of the report that links lead to.</summary>
internal static class Anchors
{
    public const string Contents = "contents";
    public const string Findings = "findings";
    public const string FailedMust = "failed-must";
    public const string UncheckedMust = "unchecked-must";
    public const string FailedShould = "failed-should";
    public const string UncheckedShould = "unchecked-should";
    public const string StackUp = "stack-up";
    public const string Matching = "matching";
    public const string Waveforms = "waveforms";
    public const string Rules = "rules";
    public const string Waivers = "waivers";
    public const string Methods = "methods";
    public const string Cautions = "cautions";
    public const string Digests = "digests";
    public const string Notes = "notes";
    public const string Timings = "timings";
}
