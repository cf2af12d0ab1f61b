using System.Collections.Immutable;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.RuleFiles;

/// <summary>What a file writes to choose nets: names of groups or pairs, net names, wildcards and ranges.</summary>
/// <param name="At">Where it stands.</param>
/// <param name="Items">Its items in file order.</param>
public sealed record NetSelector(FilePosition At, ImmutableArray<SelectorItem> Items)
{
    /// <summary>The selector as one text for headings: its items with commas between.</summary>
    public string Text => string.Join(", ", Items.Select(i => i.Text));

    /// <summary>Reads a selector from a single value or a list of values.</summary>
    /// <param name="node">The value.</param>
    /// <param name="what">What messages call it.</param>
    /// <param name="problems">Where problems go.</param>
    /// <returns>The selector, or null with a problem where the value is no such thing.</returns>
    public static NetSelector? Read(DataNode node, string what, ProblemList problems)
    {
        var nodes = node is DataList list ? list.Items : [node];
        var items = ImmutableArray.CreateBuilder<SelectorItem>(nodes.Length);
        foreach (var item in nodes)
        {
            if (item is not DataScalar scalar || scalar.Text.Length == 0)
                problems.Error(item.At, $"'{what}' takes the name of a group, a net, a pattern, or a list of these", $"write {what}: [ \"D[0..7]\", DM0 ]");
            else
                items.Add(new SelectorItem(scalar.At, scalar.Text));
        }
        if (items.Count == nodes.Length && items.Count > 0)
            return new NetSelector(node.At, items.MoveToImmutable());
        if (nodes.Length == 0)
            problems.Error(node.At, $"'{what}' is an empty list", $"write {what}: [ \"D[0..7]\", DM0 ]");
        return null;
    }
}

/// <summary>One item of a selector.</summary>
/// <param name="At">Where it stands.</param>
/// <param name="Text">The name or pattern.</param>
public readonly record struct SelectorItem(FilePosition At, string Text);
