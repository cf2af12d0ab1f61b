using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Waves.Paths;
using Xunit;

namespace StackTiming.Waves.Tests.Paths;

public class LineTableTests
{
    private sealed class CountingCalculator : ILineCalculator
    {
        private int calls;

        public int Calls => calls;

        public string Name => "counting";

        public LineSolution? Calculate(CrossSection section)
        {
            Interlocked.Increment(ref calls);
            return ClosedForms.Calculate(section);
        }

        public string? Objection(CrossSection section) => null;
    }

    [Fact]
    public void Every_line_is_computed_once_however_many_traces_use_it()
    {
        var lengths = TestBoards.Lengths("A,U1.1,*1,L1,5,0.3\nA,*1,*2,L1>L4,,\nA,*2,U2.1,L4,5,0.3\nB,U1.2,*1,L1,5,0.3\nB,*1,U2.2,L1,5,0.2\nC,U1.3,U2.3,L1,7,0.2,0.2\n");
        var keys = LineTable.KeysOf(lengths);
        Assert.Equal([new("L1", 0.3e-3, 0), new("L4", 0.3e-3, 0), new("L1", 0.2e-3, 0), new LineKey("L1", 0.2e-3, 0.2e-3)], keys);
        var calculator = new CountingCalculator();
        var table = LineTable.Build(TestBoards.FourLayers(), keys, calculator, null, TestContext.Current.CancellationToken);
        Assert.Equal(4, calculator.Calls);
        Assert.Equal(4, table.Lines.Count());
        Assert.Equal("counting", table.CalculatorName);
    }

    [Fact]
    public void Mirrored_layers_have_equal_lines()
    {
        var table = LineTable.Build(
            TestBoards.FourLayers(), [new("L1", 0.3e-3, 0), new("L4", 0.3e-3, 0)], ClosedForms.Calculator, null, TestContext.Current.CancellationToken);
        var lines = table.Lines.ToArray();
        Assert.Equal(lines[0].WaveOhms, lines[1].WaveOhms, 1e-9);
        Assert.Equal(lines[0].DelaySecondsPerMetre, lines[1].DelaySecondsPerMetre, 1e-18);
        Assert.Equal(0.012, lines[0].MetresFor(0.012 * lines[0].DelaySecondsPerMetre), 1e-12);
    }

    [Fact]
    public void A_pair_carries_its_differential_signal()
    {
        var table = LineTable.Build(TestBoards.FourLayers(), [new("L1", 0.2e-3, 0.2e-3)], ClosedForms.Calculator, null, TestContext.Current.CancellationToken);
        var line = table.Find(new LineKey("L1", 0.2e-3, 0.2e-3), out var objection)!;
        Assert.Equal("", objection);
        Assert.Equal(0.5 * line.Pair!.ZDiffOhms, line.WaveOhms);
        Assert.Equal(line.Pair.DiffDelaySecondsPerMetre, line.DelaySecondsPerMetre);
    }

    [Fact]
    public void The_field_inside_the_copper_slows_a_line_at_a_frequency_by_less_than_a_few_percent()
    {
        var key = new LineKey("L1", 0.3e-3, 0);
        double Delay(double? hertz) =>
            LineTable.Build(TestBoards.FourLayers(), [key], ClosedForms.Calculator, hertz, TestContext.Current.CancellationToken).Find(key, out _)!.DelaySecondsPerMetre;
        Assert.InRange(Delay(1e9) / Delay(null), 1.001, 1.03);
        Assert.InRange(Delay(1e10) / Delay(null), 1, Delay(1e9) / Delay(null));
    }

    [Fact]
    public void A_line_that_cannot_be_computed_says_why()
    {
        var table = LineTable.Build(
            TestBoards.FourLayers(), [new("L2", 0.3e-3, 0), new("L9", 0.3e-3, 0)], ClosedForms.Calculator, null, TestContext.Current.CancellationToken);
        Assert.Empty(table.Lines);
        Assert.Null(table.Find(new LineKey("L2", 0.3e-3, 0), out var objection));
        Assert.Contains("L2 is a plane", objection, StringComparison.Ordinal);
        Assert.Null(table.Find(new LineKey("L9", 0.3e-3, 0), out objection));
        Assert.Contains("L9", objection, StringComparison.Ordinal);
        Assert.Null(table.Find(new LineKey("L1", 0.3e-3, 0), out objection));
        Assert.Equal("no line of 0.3 mm on L1 has been computed", objection);
    }
}
