using StackTiming.Waves.Networks;
using Xunit;

namespace StackTiming.Waves.Tests.Networks;

public sealed class NetworkCheckTests
{
    private static readonly Stimulus Rise = Stimulus.Rising(200e-12);

    [Fact]
    public void A_sound_network_has_no_problem() => Assert.Empty(NetworkCheck.Problems(Build(Sound())));

    [Fact]
    public void Every_problem_is_found_in_one_go_with_the_element_it_is_about()
    {
        var builder = new NetworkBuilder().Line("U1", "b", -50, 1e-9).Line("b", "c", 50, 0)
            .SeriesElement("c", "d", -1).ShuntElement("d", resistanceOhms: 0).Receiver("d", -1e-12).Receiver("island");
        var problems = NetworkCheck.Problems(Build(builder, new Driver(0, 1.8, 0, 0, null)));
        Assert.Contains(problems, p => p is { Part: NetworkPart.Line, Index: 0 } && p.Message.Contains("z0"));
        Assert.Contains(problems, p => p is { Part: NetworkPart.Line, Index: 1 } && p.Message.Contains("delay"));
        Assert.Contains(problems, p => p.Part == NetworkPart.Series);
        Assert.Contains(problems, p => p.Part == NetworkPart.Shunt);
        Assert.Contains(problems, p => p is { Part: NetworkPart.Receiver, Index: 0 });
        Assert.Contains(problems, p => p.Part == NetworkPart.Driver && p.Message.Contains("resistance"));
        Assert.Contains(problems, p => p.Message.Contains("island"));
        Assert.All(problems, p => Assert.NotEmpty(p.Advice));
    }

    [Theory]
    [InlineData(double.NaN)]
    [InlineData(double.PositiveInfinity)]
    [InlineData(0)]
    [InlineData(-1e-9)]
    public void A_delay_must_be_a_positive_number(double delay) =>
        Assert.Contains(NetworkCheck.Problems(Build(new NetworkBuilder().Line("U1", "U2", 50, delay).Receiver("U2"))), p => p.Part == NetworkPart.Line);

    [Fact]
    public void A_net_without_receiver_is_refused() =>
        Assert.Contains(NetworkCheck.Problems(Build(new NetworkBuilder().Line("U1", "U2", 50, 1e-9))), p => p.Message.Contains("no receiver"));

    [Fact]
    public void A_line_must_have_two_different_ends() =>
        Assert.Contains(NetworkCheck.Problems(Build(Sound().Line("U2", "U2", 50, 1e-9))), p => p.Part == NetworkPart.Line && p.Message.Contains("U2"));

    [Fact]
    public void A_pattern_needs_bits_that_are_longer_than_its_ramps()
    {
        Assert.Contains(
            NetworkCheck.Problems(Build(Sound(), stimulus: new Stimulus(Edge.Pattern, 200e-12, 200e-12, [false, true], 100e-12))),
            p => p.Part == NetworkPart.Stimulus && p.Message.Contains("bit"));
        Assert.Contains(
            NetworkCheck.Problems(Build(Sound(), stimulus: new Stimulus(Edge.Pattern, 200e-12, 200e-12, [], 1e-9))),
            p => p.Part == NetworkPart.Stimulus && p.Message.Contains("no bits"));
    }

    private static NetworkBuilder Sound() => new NetworkBuilder().Line("U1", "U2", 50, 1e-9).Receiver("U2", 1e-12);

    private static Network Build(NetworkBuilder builder, Driver? driver = null, Stimulus? stimulus = null) =>
        builder.Build(driver ?? new Driver(builder.Node("U1"), 0, 1.8, 30, null), stimulus ?? Rise, 10e-9);
}
