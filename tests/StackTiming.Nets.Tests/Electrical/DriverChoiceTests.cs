using StackTiming.Nets.Electrical;
using Xunit;
using static StackTiming.Nets.Tests.Electrical.BoardParts;

namespace StackTiming.Nets.Tests.Electrical;

public class DriverChoiceTests
{
    private static string Choose(string? drive, params string[] parts)
    {
        var net = BuildWhole(Rows("A U1.A U2.A 1", "A U2.A U3.A 1"), PartsOf(parts)).Find("A")!;
        var choice = DriverChoice.Of(net, drive);
        Assert.Equal(choice.IsFound, choice.Objection.Length == 0);
        return choice.IsFound ? net.Nodes[choice.Node].Name : $"{choice.Objection}; {choice.Advice}";
    }

    [Theory]
    [InlineData(null, "U1.A")]
    [InlineData("U1", "U1.A")]
    [InlineData("U1.A", "U1.A")]
    [InlineData("U2", "'U2' has no pin that can drive 'A'; its drivers are U1.A")]
    public void The_only_driver_drives(string? drive, string expected)
    {
        Assert.Equal(expected, Choose(drive, "U1.A out", "U2.A in", "U3.A in"));
    }

    [Theory]
    [InlineData(null, "several pins can drive 'A': U1.A, U3.A; say which one, such as drive: U1")]
    [InlineData("U3", "U3.A")]
    public void Several_drivers_need_a_choice(string? drive, string expected)
    {
        Assert.Equal(expected, Choose(drive, "U1.A io", "U2.A in", "U3.A io"));
    }

    [Fact]
    public void A_net_without_driver_says_so()
    {
        Assert.Equal("no pin of 'A' can drive it; give one of its pins a model with a driver in the parts file", Choose(null, "U1.A in", "U2.A in", "U3.A in"));
    }
}
