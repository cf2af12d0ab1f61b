using StackTiming.Rules.Findings;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Rules.Tests.Findings;

public class OrderTests
{
    private static Finding Make(FindingStatus status, Severity severity, double? relative, string rule = "R", string subject = "S") => new()
    {
        Rule = rule,
        Kind = "match",
        Subject = subject,
        Status = status,
        Severity = severity,
        RelativeMargin = relative,
        Explanation = "",
        RuleAt = FilePosition.WholeFile("x"),
        Nets = [],
    };

    [Fact]
    public void Worst_come_first()
    {
        Finding[] expected =
        [
            Make(FindingStatus.Fail, Severity.Must, -2),
            Make(FindingStatus.Fail, Severity.Must, -1),
            Make(FindingStatus.Unchecked, Severity.Must, null),
            Make(FindingStatus.Fail, Severity.Should, -5),
            Make(FindingStatus.Unchecked, Severity.Should, null),
            Make(FindingStatus.Waived, Severity.Must, -9),
            Make(FindingStatus.Pass, Severity.Must, 0.1, "A2"),
            Make(FindingStatus.Pass, Severity.Should, 0.1, "A10"),
            Make(FindingStatus.Pass, Severity.Must, 0.1, "A10", "T"),
            Make(FindingStatus.Pass, Severity.Must, 0.5),
        ];
        Assert.Equal(expected, expected.Reverse().Order(WorstFirst.Instance));
    }

    [Theory]
    [InlineData("D2", "D10", -1)]
    [InlineData("D10", "D2", 1)]
    [InlineData("D02", "D2", -1)]
    [InlineData("A", "A", 0)]
    [InlineData("A", "A1", -1)]
    [InlineData("A9B10", "A9B9", 1)]
    [InlineData("99999999999999999999", "100000000000000000000", -1)]
    public void Names_are_ordered_as_an_engineer_reads_them(string x, string y, int sign) =>
        Assert.Equal(sign, Math.Sign(NaturalOrder.Instance.Compare(x, y)));

    [Theory]
    [InlineData(12.3456e-12, "12.35 ps")]
    [InlineData(-0.0001e-12, "0.00 ps")]
    [InlineData(-1.5e-12, "-1.50 ps")]
    public void Figures_are_shown_in_their_unit(double si, string text) => Assert.Equal(text, DisplayUnit.Picoseconds.Show(si));
}
