using System.Globalization;
using StackTiming.Lines.Methods;
using StackTiming.Rules.Checking;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Tests.Boards;
using Xunit;

namespace StackTiming.Rules.Tests.Checking;

/// <summary>What a fix proposes is done to the board's files, and the board is judged again with the real lines and waveforms.</summary>
public sealed class FixTests : IDisposable
{
    private readonly BoardFolder folder = new();

    public void Dispose() => folder.Dispose();

    private Finding[] Run(string rule, params (string Net, double LengthMillimetres, double WidthMillimetres)[] nets)
    {
        var rows = nets.Select((n, i) => string.Create(
            CultureInfo.InvariantCulture, $"{n.Net},U1.{i + 1},U2.{i + 1},L1,{n.LengthMillimetres:R},{n.WidthMillimetres:R}\n"));
        folder.Write("nets.lengths.csv", "net,from,to,layer,length[mm],width[mm]\n" + string.Concat(rows)).WriteBoard($"rules: [ {rule} ]");
        return [.. BoardCheck.Run(folder.ReadWhole(), new CheckOptions(ClosedForms.Calculator, new DateOnly(2026, 12, 1))).Findings];
    }

    [Theory]
    [InlineData(35)]
    [InlineData(48)]
    public void A_length_matches_by_flight_time_with_loaded_receivers(double wrong)
    {
        const string rule = "{ id: M, kind: match, nets: \"D*\", within: 10 ps, delay: flight-time }";
        var failed = Assert.Single(Run(rule, ("D0", 40, 0.18), ("D1", 40.5, 0.18), ("D2", wrong, 0.18)), f => f.Status == FindingStatus.Fail);
        var mended = wrong + (failed.Fix!.Kind == FixKind.AddLength ? 1 : -1) * failed.Fix.Value * 1e3;
        var again = Run(rule, ("D0", 40, 0.18), ("D1", 40.5, 0.18), ("D2", mended, 0.18));
        Assert.All(again, f => Assert.Equal(FindingStatus.Pass, f.Status));
        // The fix aims at the middle, 40.25 mm; loads shift all alike.
        Assert.Equal(40.25, mended, 0.05);
    }

    [Theory]
    [InlineData(0.10)]
    [InlineData(0.35)]
    public void A_width_has_the_target_impedance(double wrong)
    {
        const string rule = "{ id: Z, kind: impedance, nets: D0, target: 55 ohm ±5 % }";
        var fix = Assert.Single(Run(rule, ("D0", 40, wrong))).Fix!;
        Assert.Equal(FixKind.SetWidth, fix.Kind);
        Assert.Equal(55, Assert.Single(Run(rule, ("D0", 40, fix.Value * 1e3))).Value!.Value, 0.05);
    }

    [Fact]
    public void A_shorter_trace_has_the_loss_that_is_allowed()
    {
        const string rule = "{ id: L, kind: loss, nets: D0, at: 2 GHz, max: 0.5 dB }";
        var failed = Assert.Single(Run(rule, ("D0", 80, 0.18)));
        Assert.Equal(FixKind.RemoveLength, failed.Fix!.Kind);
        Assert.Equal(0.5, Assert.Single(Run(rule, ("D0", 80 - failed.Fix.Value * 1e3, 0.18))).Value!.Value, 1e-6);
    }

    [Fact]
    public void A_delay_is_met_exactly_at_its_limit()
    {
        const string rule = "{ id: T, kind: flight-time, nets: D0, max: 250 ps, delay: time-of-flight }";
        var failed = Assert.Single(Run(rule, ("D0", 60, 0.18)));
        var again = Assert.Single(Run(rule, ("D0", 60 - failed.Fix!.Value * 1e3, 0.18)));
        Assert.Equal(250, again.Value!.Value, 1e-6);
        Assert.Equal(FindingStatus.Pass, again.Status);
    }
}
