using System.Text;
using System.Text.Json;
using StackTiming.Reports.Results;
using StackTiming.Reports.Tests.Compliance;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;
using Xunit;

namespace StackTiming.Reports.Tests.Results;

public class ResultsJsonTests
{
    private static readonly ToolIdentity Tool = new("StackTiming", "0.1.0");

    private static JsonElement Parse(CheckResult result) => JsonDocument.Parse(Write(result)).RootElement;

    private static byte[] Write(CheckResult result)
    {
        using var stream = new MemoryStream();
        ResultsJson.Write(result, Tool, stream);
        return stream.ToArray();
    }

    [Fact]
    public void Keys_of_the_contract_are_all_there()
    {
        var root = Parse(SampleCheck.Create());
        Assert.Equal("Harbour buoy recorder", root.GetProperty("board").GetString());
        Assert.Equal("B", root.GetProperty("revision").GetString());
        Assert.Equal("fail", root.GetProperty("verdict").GetString());
        Assert.Equal("StackTiming", root.GetProperty("tool").GetProperty("name").GetString());
        Assert.Equal("0.1.0", root.GetProperty("tool").GetProperty("version").GetString());
        Assert.Equal(64, root.GetProperty("inputs")[0].GetProperty("sha256").GetString()!.Length);
        Assert.Equal(1, root.GetProperty("counts").GetProperty("waived").GetInt32());
        string[] keys = ["rule", "kind", "subject", "status", "value", "limit", "margin", "unit", "spread", "method", "explanation", "fix"];
        foreach (var finding in root.GetProperty("findings").EnumerateArray())
            Assert.All(keys, k => Assert.True(finding.TryGetProperty(k, out _), k));
    }

    [Fact]
    public void Limit_is_the_one_from_which_the_margin_is_measured()
    {
        var findings = Parse(SampleCheck.Create()).GetProperty("findings").EnumerateArray();
        foreach (var finding in findings.Where(f => f.GetProperty("kind").GetString() is "impedance" or "offset"))
        {
            var distance = Math.Abs(finding.GetProperty("value").GetDouble() - finding.GetProperty("limit").GetDouble());
            Assert.Equal(Math.Abs(finding.GetProperty("margin").GetDouble()), distance, 9);
        }
    }

    [Fact]
    public void Unchecked_finding_says_why_and_has_no_value()
    {
        var finding = Parse(SampleCheck.Create()).GetProperty("findings").EnumerateArray().First(f => f.GetProperty("status").GetString() == "unchecked");
        Assert.StartsWith("no part on the net", finding.GetProperty("unchecked_reason").GetString(), StringComparison.Ordinal);
        Assert.Equal(JsonValueKind.Null, finding.GetProperty("value").ValueKind);
    }

    [Fact]
    public void Not_a_number_and_infinity_become_null()
    {
        var check = SampleCheck.Create();
        var odd = check.Findings[0] with { Value = double.NaN, Margin = double.PositiveInfinity, Spread = new MarginSpread(double.NaN, 0.5) };
        var bytes = Write(check with { Findings = [odd] });
        Assert.DoesNotContain("NaN", Encoding.UTF8.GetString(bytes), StringComparison.Ordinal);
        var finding = JsonDocument.Parse(bytes).RootElement.GetProperty("findings")[0];
        Assert.Equal(JsonValueKind.Null, finding.GetProperty("value").ValueKind);
        Assert.Equal(JsonValueKind.Null, finding.GetProperty("margin").ValueKind);
        Assert.Equal(0.5, finding.GetProperty("spread").GetProperty("probability").GetDouble());
    }

    [Fact]
    public void Hostile_names_survive_as_json()
    {
        var check = SampleCheck.Create();
        const string name = "a\"b\\c\u0000\u0007\n<script>&Ω\ud83d\ude00";
        var root = Parse(check with { Board = name, Findings = [check.Findings[0] with { Subject = "half \ud83d surrogate" }] });
        Assert.Equal(name, root.GetProperty("board").GetString());
        Assert.StartsWith("half", root.GetProperty("findings")[0].GetProperty("subject").GetString(), StringComparison.Ordinal);
    }

    [Fact]
    public void Same_results_give_same_bytes() => Assert.Equal(Write(SampleCheck.Create()), Write(SampleCheck.Create()));

    [Fact]
    public void Board_without_rules_is_written_too()
    {
        var root = Parse(SampleCheck.Empty());
        Assert.Equal("pass", root.GetProperty("verdict").GetString());
        Assert.Equal(0, root.GetProperty("findings").GetArrayLength());
    }
}
