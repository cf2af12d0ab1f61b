using System.Text.Json;
using Xunit;

namespace StackTiming.Acceptance;

/// <summary>
/// <c>stacktiming net</c> against the independent responses of tests/references/waves: instants within 0.5 ps, voltages within 0.5 % of the swing.
/// A settling instant on a slow tail is compared within what 0.1 % of the swing shifts it (tests/references/waves/README.md).
/// </summary>
public sealed class WaveReferenceTests
{
    private const double TimeLimit = 0.5e-12;

    public static TheoryData<string> Cases() => [.. ReferenceFiles.Names("waves/visible")];

    [Theory]
    [MemberData(nameof(Cases))]
    public void Net_command_agrees_with_the_reference(string name)
    {
        var reference = ReferenceFiles.Read("waves/visible", name);
        using var files = new TemporaryFolder();
        var run = Tool.Run("net", files.Write("case.net.yaml", NetSketchYaml.From(reference)), "--json");
        Assert.True(run.ExitCode == 0, run.Error);
        var receivers = JsonDocument.Parse(run.Output).RootElement.GetProperty("receivers");
        var driver = reference.GetProperty("net").GetProperty("driver");
        var swing = driver.GetProperty("high").GetDouble() - driver.GetProperty("low").GetDouble();
        foreach (var expected in reference.GetProperty("metrics").EnumerateObject())
        {
            var actual = receivers.EnumerateArray().First(r => r.GetProperty("at").GetString() == expected.Name);
            foreach (var metric in expected.Value.EnumerateObject())
                Compare(name, expected.Name, metric, actual, swing, reference);
        }
    }

    private static void Compare(string name, string at, JsonProperty metric, JsonElement actual, double swing, JsonElement reference)
    {
        var isTime = metric.Name.StartsWith("t_", StringComparison.Ordinal) || metric.Name == "flight_time";
        var key = metric.Name + (isTime ? "_s" : "_v");
        Assert.True(actual.TryGetProperty(key, out var found), $"{name} {at}: {key} is missing");
        var error = Math.Abs(found.GetDouble() - metric.Value.GetDouble());
        var limit = !isTime ? 0.005 * swing : metric.Name == "t_settle_5pct" ? SettlingLimit(at, metric.Value.GetDouble(), swing, reference) : TimeLimit;
        Assert.True(error <= limit, $"{name} {at}: {key} is {found} instead of {metric.Value}, off by {error:g3} where {limit:g3} is allowed");
    }

    private static double SettlingLimit(string at, double settle, double swing, JsonElement reference)
    {
        var waveforms = reference.GetProperty("waveforms");
        var times = waveforms.GetProperty("time_s").EnumerateArray().Select(v => v.GetDouble()).ToArray();
        var volts = waveforms.GetProperty(at).EnumerateArray().Select(v => v.GetDouble()).ToArray();
        var after = Array.FindIndex(times, t => t > settle);
        if (after < 1)
            return TimeLimit;
        var slope = Math.Abs(volts[after] - volts[after - 1]) / (times[after] - times[after - 1]);
        return Math.Max(TimeLimit, 0.001 * swing / slope);
    }
}
