using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.RuleFiles;

/// <summary>A named differential pair as its file states it.</summary>
/// <param name="At">Where it is stated.</param>
/// <param name="Name">Its name.</param>
/// <param name="Members">Its two nets, positive first, or null where a reusable rule set leaves it open.</param>
public sealed record NetPair(FilePosition At, string Name, (SelectorItem Positive, SelectorItem Negative)? Members)
{
    /// <summary>Reads the value of one key of <c>pairs</c>.</summary>
    /// <param name="entry">The key and its value.</param>
    /// <param name="problems">Where problems go.</param>
    public static NetPair Read(DataEntry entry, ProblemList problems) =>
        new(entry.KeyAt, entry.Key, NetGroup.IsNothing(entry.Value) ? null : MembersOf(entry.Value, entry.Key, problems));

    /// <summary>The two net names of a list, or null with a problem.</summary>
    /// <param name="node">The list.</param>
    /// <param name="what">What messages call it.</param>
    /// <param name="problems">Where problems go.</param>
    public static (SelectorItem Positive, SelectorItem Negative)? MembersOf(DataNode node, string what, ProblemList problems)
    {
        if (node is DataList { Items: [DataScalar { Text.Length: > 0 } p, DataScalar { Text.Length: > 0 } n] })
        {
            if (p.Text != n.Text)
                return (new SelectorItem(p.At, p.Text), new SelectorItem(n.At, n.Text));
            problems.Error(n.At, $"both members of pair '{what}' are '{p.Text}'");
            return null;
        }
        problems.Error(node.At, $"pair '{what}' must name two nets", $"write {what}: [ USB_P, USB_N ]");
        return null;
    }
}
