using System.Collections.Immutable;
using StackTiming.Nets.Electrical;
using StackTiming.Rules.Findings;
using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Boards;

/// <summary>
/// Reports nets of which a rule asks who drives while the files leave it open: several pins can, or pins have models and none of them can. A net
/// without any model is no mistake; its delay is measured from end to end.
/// </summary>
internal static class DriverCheck
{
    private const int NetsNamed = 4;

    /// <summary>Checks the rules of a board.</summary>
    /// <param name="rules">The rules.</param>
    /// <param name="nets">The electrical nets.</param>
    /// <param name="problems">Where problems go.</param>
    public static void Run(ImmutableArray<Rule> rules, ElectricalNets nets, ProblemList problems)
    {
        foreach (var rule in rules)
        {
            var several = new SortedSet<string>(NaturalOrder.Instance);
            var none = new SortedSet<string>(NaturalOrder.Instance);
            foreach (var need in rule.Needs())
            {
                if (need.Drive.Text.Length > 0 || nets.Find(need.Net) is not { } net)
                    continue;
                var drivers = net.DriverNodes.Count();
                if (drivers > 1)
                    several.Add($"'{Suggestion.Shorten(need.Net)}' ({string.Join(", ", net.DriverNodes.Take(3).Select(n => net.Nodes[n].Name))})");
                else if (drivers == 0 && need.Edge is not null && net.ReceiverNodes.Any())
                    none.Add($"'{Suggestion.Shorten(need.Net)}'");
            }
            if (several.Count > 0)
                problems.Error(rule.Header.At, $"several pins can drive {Named(several)}", "say which one in the rule or its group, such as drive: U1, or drive: both to judge each");
            if (none.Count > 0)
                problems.Error(rule.Header.At, $"no pin can drive {Named(none)}, though others receive", "give one of its pins a model with a driver in the parts file");
        }
    }

    private static string Named(SortedSet<string> nets) =>
        string.Join(", ", nets.Take(NetsNamed)) + (nets.Count > NetsNamed ? $" and {nets.Count - NetsNamed} more" : "");
}
