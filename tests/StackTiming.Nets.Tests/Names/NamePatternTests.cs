using StackTiming.Nets.Names;
using Xunit;

namespace StackTiming.Nets.Tests.Names;

public class NamePatternTests
{
    [Theory]
    [InlineData("D[0..3]", "D0 D1 D2 D3")]
    [InlineData("D[1,3..4]_X", "D1_X D3_X D4_X")]
    [InlineData("A[08..10]", "A08 A09 A10")]
    [InlineData("B1..B3", "B1 B2 B3")]
    [InlineData("B1..3", "B1 B2 B3")]
    [InlineData("P[0..1][0..1]", "P00 P01 P10 P11")]
    [InlineData("D[0]", "D[0]")]
    [InlineData("PLAIN", "PLAIN")]
    [InlineData("odd[x", "odd[x")]
    public void Ranges_stand_for_the_names_that_they_count_out(string text, string expected)
    {
        var pattern = NamePattern.TryParse(text, out var problem);
        Assert.Equal("", problem);
        Assert.Equal(expected, string.Join(' ', pattern!.Alternatives));
    }

    [Theory]
    [InlineData("CLK_*", "CLK_A", true)]
    [InlineData("CLK_*", "CLK_", true)]
    [InlineData("CLK_*", "XCLK_A", false)]
    [InlineData("*_P", "USB_P", true)]
    [InlineData("*A*B*", "xxAyyBzz", true)]
    [InlineData("*A*B*", "xxByyAzz", false)]
    [InlineData("D?", "D7", true)]
    [InlineData("D?", "D77", false)]
    [InlineData("D[0..7]*", "D3_R", true)]
    [InlineData("D[0..7]*", "D8_R", false)]
    public void Wildcards_match_as_they_do_in_file_names(string text, string name, bool fits) =>
        Assert.Equal(fits, NamePattern.TryParse(text, out _)!.Matches(name));

    [Theory]
    [InlineData("D[7..0]", "runs backwards")]
    [InlineData("D[0..9999999]", "more than")]
    public void Wrong_ranges_say_what_is_wrong(string text, string words)
    {
        Assert.Null(NamePattern.TryParse(text, out var problem));
        Assert.Contains(words, problem, StringComparison.Ordinal);
    }

    [Fact]
    public void Hostile_wildcards_take_no_exponential_time() =>
        Assert.False(NamePattern.TryParse(new string('*', 40) + "b", out _)!.Matches(new string('a', 2000)));
}
