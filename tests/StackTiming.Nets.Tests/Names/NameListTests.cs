using StackTiming.Nets.Names;
using Xunit;

namespace StackTiming.Nets.Tests.Names;

public class NameListTests
{
    [Theory]
    [InlineData("", "")]
    [InlineData("A1", "A1")]
    [InlineData("A1, B1..B8 ,C*", "A1|B1..B8|C*")]
    [InlineData("D[0,2], E", "D[0,2]|E")]
    [InlineData(" , A,, ", "A")]
    [InlineData("A], B", "A]|B")]
    [InlineData("A[1,2", "A[1,2")]
    public void Commas_outside_brackets_separate_names(string text, string expected)
    {
        Assert.Equal(expected, string.Join('|', NameList.Split(text)));
    }
}
