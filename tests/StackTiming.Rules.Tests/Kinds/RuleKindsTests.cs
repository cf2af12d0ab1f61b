using StackTiming.Rules.Kinds;
using StackTiming.Rules.RuleFiles;
using StackTiming.Rules.Tests.Boards;
using Xunit;

namespace StackTiming.Rules.Tests.Kinds;

public sealed class RuleKindsTests : IDisposable
{
    private readonly BoardFolder folder = new();

    public void Dispose() => folder.Dispose();

    public static TheoryData<string> Names => [.. RuleKinds.All.Select(k => k.Name)];

    [Fact]
    public void Names_are_unique_and_those_of_the_format()
    {
        string[] promised =
        [
            "impedance", "match", "offset", "flight-time", "pair-skew", "stub", "step", "layers", "first-wave", "overshoot", "ringback", "settling", "loss", "setup-hold",
        ];
        Assert.Equal(promised.Order(), RuleKinds.All.Select(k => k.Name).Order());
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Every_documented_key_is_one_that_the_kind_reads(string name)
    {
        var kind = RuleKinds.Find(name)!;
        var keys = string.Join(", ", kind.Keys.Select(k => $"{k.Key}: {{ }}"));
        folder.WriteBoard($"rules: [ {{ id: R, kind: {name}, {keys} }} ]");
        folder.Read();
        Assert.DoesNotContain(folder.Errors(), e => e.Contains("unknown key", StringComparison.Ordinal));
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void Every_key_that_a_kind_reads_is_documented(string name)
    {
        // A key like no other is answered with the whole list of known ones, as far as a message has room for it.
        var kind = RuleKinds.Find(name)!;
        var documented = kind.Keys.Concat(RuleKind.CommonKeys).Select(k => k.Key).ToHashSet();
        folder.WriteBoard($"rules: [ {{ id: R, kind: {name}, qqqqqqqqqqqqqqqqqqqqqqqqqqqq: 1 }} ]");
        folder.Read();
        var advice = folder.Problems.Items.Single(p => p.Message.Contains("unknown key", StringComparison.Ordinal)).Advice!;
        var listed = advice["it can be ".Length..].Split(", ").Where(k => k != "…");
        Assert.All(listed, key => Assert.Contains(key, documented));
    }

    [Theory]
    [MemberData(nameof(Names))]
    public void A_kind_says_what_it_judges_and_by_what(string name)
    {
        var kind = RuleKinds.Find(name)!;
        Assert.EndsWith(".", kind.Summary, StringComparison.Ordinal);
        Assert.NotEmpty(kind.Basis);
        Assert.All(kind.Keys, k => Assert.NotEmpty(k.Meaning));
    }
}
