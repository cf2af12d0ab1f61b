using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;
using StackTiming.Rules.RuleFiles;
using StackTiming.Rules.Waivers;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Rules.Tests.Waivers;

public class WaiverBookTests
{
    private static readonly DateOnly Today = new(2026, 12, 1);

    private static Finding Make(FindingStatus status, params string[] nets) => new()
    {
        Rule = "STUB",
        Kind = "stub",
        Subject = string.Join('/', nets),
        Status = status,
        Severity = Severity.Must,
        Explanation = "It is long.",
        RuleAt = FilePosition.WholeFile("x"),
        Nets = [.. nets],
    };

    private static ResolvedWaiver Waiver(DateOnly? until, string rule, params string[] nets)
    {
        var at = new FilePosition("board.yaml", 9, 5);
        var selector = new NetSelector(at, [.. nets.Select(n => new SelectorItem(at, n))]);
        return ResolvedWaiver.Of(
            new Waiver(at, rule, selector, "it is measured", "hardware lead", until), new RuleScope(), new NetIndex(["SCK", "MOSI", "P", "N"]));
    }

    private static ImmutableArray<Finding> Apply(Finding finding, params ResolvedWaiver[] waivers) =>
        WaiverBook.Apply([finding], [.. waivers], ["STUB", "STEP"], Today);

    [Theory]
    [InlineData(FindingStatus.Fail)]
    [InlineData(FindingStatus.Unchecked)]
    public void A_valid_waiver_accepts_what_fails_or_could_not_be_judged(FindingStatus status)
    {
        var finding = Assert.Single(Apply(Make(status, "SCK"), Waiver(Today, "STUB", "SCK")));
        Assert.Equal(FindingStatus.Waived, finding.Status);
        Assert.Equal(("it is measured", "hardware lead"), (finding.Waiver!.Reason, finding.Waiver.ApprovedBy));
        Assert.Contains("Waived by hardware lead until 2026-12-01", finding.Explanation, StringComparison.Ordinal);
        Assert.Equal(Verdict.Pass, FindingCounts.Of([finding]).Verdict);
    }

    [Fact]
    public void A_waiver_past_its_date_accepts_nothing_and_is_a_finding()
    {
        var findings = Apply(Make(FindingStatus.Fail, "SCK"), Waiver(Today.AddDays(-1), "STUB", "SCK"));
        Assert.Equal([FindingStatus.Fail, FindingStatus.Fail], findings.Select(f => f.Status));
        Assert.Equal("waiver", findings[1].Kind);
        Assert.Contains("ended on 2026-11-30", findings[1].Explanation, StringComparison.Ordinal);
        Assert.Equal(2, FindingCounts.Of(findings).FailedMust);
    }

    [Theory]
    [InlineData("STUBB", "SCK", "no rule is called STUBB (did you mean 'STUB'?)")]
    [InlineData("STEP", "SCK", "the rule does not judge these nets")]
    [InlineData("STUB", "MOSI", "the rule does not judge these nets")]
    [InlineData("STUB", "NOSUCH", "no group, pair or net is called 'NOSUCH'")]
    public void A_waiver_that_matches_nothing_is_a_finding(string rule, string net, string words)
    {
        var findings = Apply(Make(FindingStatus.Fail, "SCK"), Waiver(Today, rule, net));
        Assert.Equal(FindingStatus.Fail, findings[0].Status);
        Assert.Equal(Severity.Must, findings[1].Severity);
        Assert.Contains(words, findings[1].Explanation, StringComparison.Ordinal);
    }

    [Fact]
    public void A_waiver_that_is_no_longer_needed_is_reported_without_failing_the_board()
    {
        var findings = Apply(Make(FindingStatus.Pass, "SCK"), Waiver(Today, "STUB", "SCK"));
        Assert.Equal((FindingStatus.Fail, Severity.Should), (findings[1].Status, findings[1].Severity));
        Assert.Equal(Verdict.Pass, FindingCounts.Of(findings).Verdict);
    }

    [Fact]
    public void A_finding_about_two_nets_needs_both_in_the_waiver()
    {
        Assert.Equal(FindingStatus.Waived, Apply(Make(FindingStatus.Fail, "P", "N"), Waiver(Today, "STUB", "P", "N"))[0].Status);
        var part = Apply(Make(FindingStatus.Fail, "P", "N"), Waiver(Today, "STUB", "P"));
        Assert.Equal(FindingStatus.Fail, part[0].Status);
        Assert.Contains("names some nets of a finding, but not all", part[1].Explanation, StringComparison.Ordinal);
    }

    [Fact]
    public void A_waiver_without_a_date_holds() =>
        Assert.Equal(FindingStatus.Waived, Apply(Make(FindingStatus.Fail, "SCK"), Waiver(null, "STUB", "SCK"))[0].Status);

    [Fact]
    public void An_unchecked_must_fails_the_board() =>
        Assert.Equal(Verdict.Fail, FindingCounts.Of([Make(FindingStatus.Unchecked, "SCK")]).Verdict);
}
