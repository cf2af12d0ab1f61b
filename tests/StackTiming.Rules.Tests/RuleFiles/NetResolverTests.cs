using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Rules.Tests.RuleFiles;

public class NetResolverTests
{
    private static readonly FilePosition At = new("rules.yaml", 2, 3);
    private readonly ProblemList problems = new();
    private readonly RuleScope scope = new();
    private readonly NetResolver resolver;

    public NetResolverTests() => resolver = new NetResolver(
        new NetIndex(["D0", "D1", "D2", "D10", "DM", "DQS", "USB_P", "USB_N", "CK_P", "CK_N", "X[0..1]"]), problems);

    private static NetSelector Selector(params string[] items) => new(At, [.. items.Select(i => new SelectorItem(At, i))]);

    private void Group(string name, params string[] nets) =>
        scope.Add(new NetGroup(At, name, nets.Length == 0 ? null : Selector(nets), null, null), problems);

    private void Pair(string name, string p, string n) =>
        scope.Add(new NetPair(At, name, (new SelectorItem(At, p), new SelectorItem(At, n))), problems);

    [Theory]
    [InlineData("D[0..2]", "D0 D1 D2")]
    [InlineData("D*", "D0 D1 D2 D10 DM DQS")]
    [InlineData("D?", "D0 D1 D2 DM")]
    [InlineData("DQS", "DQS")]
    [InlineData("X[0..1]", "X[0..1]")]
    public void Names_wildcards_and_ranges_find_nets_in_natural_order(string item, string expected) =>
        Assert.Equal(expected, string.Join(' ', resolver.Resolve(scope, Selector(item))!.Names));

    [Fact]
    public void Groups_may_name_groups_and_pairs_and_overlap()
    {
        Group("bits", "D[0..2]");
        Pair("usb", "USB_P", "USB_N");
        Group("all", "bits", "usb", "D1", "DM");
        Assert.Equal("D0 D1 D2 DM USB_N USB_P", string.Join(' ', resolver.Resolve(scope, Selector("all"))!.Names));
        Assert.False(problems.HasErrors);
    }

    [Fact]
    public void A_group_that_contains_itself_is_an_error_however_deep()
    {
        Group("a", "b", "b");
        Group("b", "c", "c");
        Group("c", "a", "a");
        Assert.Null(resolver.Resolve(scope, Selector("a")));
        Assert.Contains(problems.Items, p => p.Message.Contains("contains itself", StringComparison.Ordinal));
    }

    [Fact]
    public void A_range_means_each_of_its_nets()
    {
        Assert.Null(resolver.Resolve(scope, Selector("D[0..3]")));
        Assert.Equal("the board has no net 'D3', which 'D[0..3]' stands for", problems.Items[0].Message);
    }

    [Fact]
    public void A_name_that_means_nothing_gets_the_nearest()
    {
        Group("lane0", "D0");
        Assert.Null(resolver.Resolve(scope, Selector("lan0")));
        Assert.Equal("no group, pair or net is called 'lan0'", problems.Items[0].Message);
        Assert.Equal("did you mean 'lane0'?", problems.Items[0].Advice);
    }

    [Fact]
    public void An_open_name_stands_for_what_it_is_bound_to()
    {
        var set = new RuleScope();
        set.Add(new NetGroup(At, "lane", null, null, null), problems);
        set.Add(new NetPair(At, "pair", null), problems);
        Group("mine", "D[0..1]");
        Pair("usb", "USB_P", "USB_N");
        Pair("ck", "CK_P", "CK_N");
        set.Bind("lane", new Binding(scope, Selector("mine")));
        set.Bind("pair", new Binding(scope, Selector("u*", "ck")));
        Assert.Equal("D0 D1", string.Join(' ', resolver.Resolve(set, Selector("lane"))!.Names));
        Assert.Equal(["usb", "ck"], resolver.ResolvePairs(set, Selector("pair"))!.Select(p => p.Name));
        Assert.Equal("CK_N CK_P USB_N USB_P", string.Join(' ', resolver.Resolve(set, Selector("pair"))!.Names));
    }

    [Fact]
    public void An_open_name_that_nobody_bound_is_an_error()
    {
        Group("lane");
        Assert.Null(resolver.Resolve(scope, Selector("lane")));
        Assert.Contains("is left open", problems.Items[0].Message, StringComparison.Ordinal);
    }

    [Fact]
    public void The_strobe_and_driver_of_a_single_group_come_with_it()
    {
        Pair("dqs", "CK_P", "CK_N");
        scope.Add(new NetGroup(At, "lane", Selector("D[0..1]"), new SelectorItem(At, "dqs"), new SelectorItem(At, "both")), problems);
        var set = resolver.Resolve(scope, Selector("lane"))!;
        Assert.Equal(["CK_N", "CK_P"], set.Strobe!.Nets);
        Assert.Equal("both", set.Drive!.Value.Text);
        Assert.Null(resolver.Resolve(scope, Selector("lane", "DM"))!.Strobe);
    }

    [Fact]
    public void Two_nets_may_stand_for_a_pair()
    {
        var pair = Assert.Single(resolver.ResolvePairs(scope, Selector("USB_P", "USB_N"))!);
        Assert.Equal(("USB_P", "USB_N"), (pair.Positive, pair.Negative));
    }

    [Fact]
    public void Without_a_length_list_nothing_more_is_said_about_nets()
    {
        var blind = new NetResolver(null, problems);
        Assert.Null(blind.Resolve(scope, Selector("NOSUCH")));
        Assert.False(problems.HasErrors);
    }

    [Fact]
    public void Unknown_keys_of_a_group_get_the_nearest()
    {
        var map = new DataMap(At, [new DataEntry(At, "net", new DataScalar(At, "D0", false))]);
        NetGroup.Read(new DataEntry(At, "g", map), DefaultUnits.None, problems);
        Assert.Equal("did you mean 'nets'?", problems.Items[0].Advice);
    }
}
