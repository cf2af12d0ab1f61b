using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Waivers;

/// <summary>
/// Applies waivers to findings. A waiver covers a finding of its rule when it names all nets of the finding. One that is past its date covers
/// nothing; that, or covering nothing that needs it, is a finding of its own.
/// </summary>
public static class WaiverBook
{
    /// <summary>Kind of the findings about waivers.</summary>
    public const string FindingKind = "waiver";

    /// <summary>The findings with those that are waived marked so, and the findings about the waivers themselves.</summary>
    /// <param name="findings">The findings of the rules.</param>
    /// <param name="waivers">The waivers, with their nets.</param>
    /// <param name="ruleIds">Ids of the board's rules.</param>
    /// <param name="today">The day of the check.</param>
    public static ImmutableArray<Finding> Apply(
        IReadOnlyList<Finding> findings, ImmutableArray<ResolvedWaiver> waivers, IReadOnlyCollection<string> ruleIds, DateOnly today)
    {
        var result = ImmutableArray.CreateBuilder<Finding>(findings.Count + waivers.Length);
        var byRule = waivers.ToLookup(w => w.Waiver.Rule, StringComparer.Ordinal);
        var uses = waivers.ToDictionary(w => w, _ => new Use());
        foreach (var finding in findings)
        {
            var judged = finding;
            foreach (var waiver in byRule[finding.Rule])
            {
                if (!waiver.Covers(finding.Nets))
                {
                    uses[waiver].Part |= waiver.Touches(finding.Nets);
                    continue;
                }
                var needs = finding.Status is FindingStatus.Fail or FindingStatus.Unchecked;
                uses[waiver].Covered++;
                uses[waiver].Needed += needs ? 1 : 0;
                if (needs && judged.Status != FindingStatus.Waived && IsValid(waiver.Waiver, today))
                    judged = Accept(finding, waiver.Waiver);
            }
            result.Add(judged);
        }
        var known = ruleIds as IReadOnlySet<string> ?? ruleIds.ToHashSet(StringComparer.Ordinal);
        foreach (var waiver in waivers)
        {
            if (About(waiver, uses[waiver], known, today) is { } about)
                result.Add(about);
        }
        return result.ToImmutable();
    }

    private static bool IsValid(Waiver waiver, DateOnly today) => waiver.Until is not { } until || today <= until;

    private static Finding Accept(Finding finding, Waiver waiver)
    {
        var until = waiver.Until is { } date ? $" until {Day(date)}" : "";
        return finding with
        {
            Status = FindingStatus.Waived,
            Waiver = new WaiverNote(waiver.Reason, waiver.ApprovedBy, waiver.Until, waiver.At),
            Explanation = $"{finding.Explanation} Waived by {waiver.ApprovedBy}{until}: {waiver.Reason}.",
        };
    }

    private static Finding? About(ResolvedWaiver resolved, Use use, IReadOnlySet<string> rules, DateOnly today)
    {
        var waiver = resolved.Waiver;
        var what = $"the waiver of {waiver.Rule} for {waiver.Nets.Text}";
        if (!IsValid(waiver, today))
        {
            return Make(
                resolved, Severity.Must, $"{Capital(what)} ended on {Day(waiver.Until!.Value)}; {Findings(use.Needed)} it would have covered.",
                "mend the board, or have the waiver approved again with a new date");
        }
        if (!rules.Contains(waiver.Rule))
        {
            var advice = Suggestion.For(waiver.Rule, rules) is { } hint ? $" ({hint})" : "";
            return Make(resolved, Severity.Must, $"{Capital(what)} matches nothing: no rule is called {waiver.Rule}{advice}.", "correct the rule's id, or remove the waiver");
        }
        if (resolved.Objection.Length > 0)
            return Make(resolved, Severity.Must, $"{Capital(what)} matches nothing: {resolved.Objection}.", "correct the nets, or remove the waiver");
        if (use.Covered == 0)
        {
            var why = use.Part
                ? "it names some nets of a finding, but not all of them"
                : "the rule does not judge these nets";
            return Make(resolved, Severity.Must, $"{Capital(what)} matches nothing: {why}.", "correct the nets, or remove the waiver");
        }
        return use.Needed > 0
            ? null
            : Make(resolved, Severity.Should, $"{Capital(what)} is no longer needed: the rule holds for them.", "remove the waiver, so that it cannot hide a later mistake");
    }

    private static Finding Make(ResolvedWaiver resolved, Severity severity, string explanation, string advice) => new()
    {
        Rule = resolved.Waiver.Rule,
        Kind = FindingKind,
        Subject = $"waiver for {resolved.Waiver.Nets.Text}",
        Status = FindingStatus.Fail,
        Explanation = explanation,
        Fix = new Fix(FixKind.Other, advice, "", "", double.NaN),
        Severity = severity,
        Method = "waivers against findings and the day of the check",
        RuleReason = resolved.Waiver.Reason,
        RuleSource = $"approved by {resolved.Waiver.ApprovedBy}",
        RuleAt = resolved.Waiver.At,
        Nets = resolved.Names,
    };

    private static string Findings(int count) => count switch
    {
        0 => "nothing needs it any more, so there is nothing that",
        1 => "there is one finding that",
        _ => $"there are {count} findings that",
    };

    private static string Capital(string text) => char.ToUpperInvariant(text[0]) + text[1..];

    private static string Day(DateOnly date) => date.ToString("yyyy-MM-dd", System.Globalization.CultureInfo.InvariantCulture);

    private sealed class Use
    {
        public int Covered { get; set; }

        public int Needed { get; set; }

        public bool Part { get; set; }
    }
}

/// <summary>A waiver with its nets found.</summary>
/// <param name="Waiver">The waiver.</param>
/// <param name="Names">Its nets; empty where they were not found.</param>
/// <param name="Objection">Why they were not found, or empty.</param>
public sealed record ResolvedWaiver(Waiver Waiver, ImmutableArray<string> Names, string Objection)
{
    private readonly HashSet<string> names = new(Names, StringComparer.Ordinal);

    /// <summary>Whether all of some nets are waived.</summary>
    /// <param name="nets">The nets.</param>
    public bool Covers(ImmutableArray<string> nets)
    {
        foreach (var net in nets)
        {
            if (!names.Contains(net))
                return false;
        }
        return nets.Length > 0;
    }

    /// <summary>Whether at least one of some nets is waived.</summary>
    /// <param name="nets">The nets.</param>
    public bool Touches(ImmutableArray<string> nets)
    {
        foreach (var net in nets)
        {
            if (names.Contains(net))
                return true;
        }
        return false;
    }

    /// <summary>Finds the nets of a waiver; what is not found is no error of the file, but a finding.</summary>
    /// <param name="waiver">The waiver.</param>
    /// <param name="scope">The names that it can use.</param>
    /// <param name="nets">Names of the board's nets.</param>
    public static ResolvedWaiver Of(Waiver waiver, RuleScope scope, NetIndex nets)
    {
        var quiet = new ProblemList();
        var set = new NetResolver(nets, quiet).Resolve(scope, waiver.Nets);
        return set is null
            ? new ResolvedWaiver(waiver, [], quiet.Items.Count > 0 ? quiet.Items[0].Message : "its nets were not found")
            : new ResolvedWaiver(waiver, set.Names, "");
    }
}
