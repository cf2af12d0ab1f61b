using System.Globalization;
using System.Text.Encodings.Web;
using System.Text.Json;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Results;

/// <summary>
/// Writes the results of a check as JSON (UTF-8, no byte order mark). Figures of a finding are in its own <c>unit</c>; every other figure is
/// in SI units and its key says which. What is unknown is <c>null</c>; NaN and infinities never appear. Figures carry 12 digits.
/// </summary>
public static class ResultsJson
{
    private const int FindingsBetweenFlushes = 512;

    // The file is data, never part of a page: letters such as Ω stay as they are.
    private static readonly JsonWriterOptions Options = new() { Indented = true, Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping, NewLine = "\n" };

    /// <summary>Writes the results.</summary>
    /// <param name="result">The results.</param>
    /// <param name="tool">The program that made them.</param>
    /// <param name="output">Where to.</param>
    public static void Write(CheckResult result, ToolIdentity tool, Stream output)
    {
        using (var json = new Utf8JsonWriter(output, Options))
        {
            json.WriteStartObject();
            json.WriteNumber("format", 1);
            json.WriteString("board", result.Board);
            json.WriteString("revision", result.Revision);
            json.WriteString("verdict", StatusName.Of(result.Verdict));
            json.WriteString("checked_on", result.CheckedOn.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture));
            json.WriteStartObject("tool");
            json.WriteString("name", tool.Name);
            json.WriteString("version", tool.Version);
            json.WriteEndObject();
            WriteInputs(json, result);
            WriteCounts(json, result);
            WriteFindings(json, result);
            WriteRules(json, result);
            WriteGroups(json, result);
            WriteLines(json, result);
            WriteMethods(json, result);
            WriteTexts(json, "assumptions", result.Assumptions);
            WriteTexts(json, "notes", result.Notes.Select(n => n.ToString()));
            json.WriteEndObject();
        }
        output.WriteByte((byte)'\n');
    }

    private static void WriteInputs(Utf8JsonWriter json, CheckResult result)
    {
        json.WriteStartArray("inputs");
        foreach (var input in result.Inputs)
        {
            json.WriteStartObject();
            json.WriteString("role", input.Role);
            json.WriteString("path", input.Path);
            json.WriteString("sha256", input.Sha256);
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    private static void WriteCounts(Utf8JsonWriter json, CheckResult result)
    {
        var counts = result.Counts;
        json.WriteStartObject("counts");
        json.WriteNumber("findings", counts.Total);
        json.WriteNumber("pass", counts.Passed);
        json.WriteNumber("fail", counts.Failed);
        json.WriteNumber("waived", counts.Waived);
        json.WriteNumber("unchecked", counts.Unchecked);
        json.WriteNumber("fail_must", counts.FailedMust);
        json.WriteNumber("fail_should", counts.FailedShould);
        json.WriteNumber("unchecked_must", counts.UncheckedMust);
        json.WriteNumber("unchecked_should", counts.UncheckedShould);
        json.WriteNumber("rules", result.Rules.Length);
        json.WriteNumber("nets", result.NetCount);
        json.WriteNumber("segments", result.SegmentCount);
        json.WriteEndObject();
    }

    private static void WriteFindings(Utf8JsonWriter json, CheckResult result)
    {
        json.WriteStartArray("findings");
        for (var i = 0; i < result.Findings.Length; i++)
        {
            WriteFinding(json, result.Findings[i]);
            if (i % FindingsBetweenFlushes == FindingsBetweenFlushes - 1)
                json.Flush();
        }
        json.WriteEndArray();
    }

    private static void WriteFinding(Utf8JsonWriter json, Finding finding)
    {
        json.WriteStartObject();
        json.WriteString("rule", finding.Rule);
        json.WriteString("kind", finding.Kind);
        json.WriteString("subject", finding.Subject);
        json.WriteString("severity", StatusName.Of(finding.Severity));
        json.WriteString("status", StatusName.Of(finding.Status));
        if (finding.UncheckedReason.Length > 0)
            json.WriteString("unchecked_reason", finding.UncheckedReason);
        Number(json, "value", finding.Value);
        Number(json, "limit", NearestLimit(finding));
        Number(json, "lower_limit", finding.LowerLimit);
        Number(json, "upper_limit", finding.UpperLimit);
        Number(json, "margin", finding.Margin);
        Number(json, "relative_margin", finding.RelativeMargin);
        json.WriteString("unit", finding.Unit.Symbol ?? "");
        if (finding.Spread is { } spread)
        {
            json.WriteStartObject("spread");
            Number(json, "standard_deviation", spread.StandardDeviation);
            Number(json, "probability", spread.Probability);
            json.WriteEndObject();
        }
        else
        {
            json.WriteNull("spread");
        }
        json.WriteString("method", finding.Method);
        json.WriteString("explanation", finding.Explanation);
        WriteFix(json, finding.Fix);
        WriteTexts(json, "nets", finding.Nets);
        json.WriteString("rule_at", finding.RuleAt.ToString());
        if (finding.Waiver is { } waiver)
        {
            json.WriteStartObject("waiver");
            json.WriteString("reason", waiver.Reason);
            json.WriteString("approved_by", waiver.ApprovedBy);
            json.WriteString("until", waiver.Until?.ToString("yyyy-MM-dd", CultureInfo.InvariantCulture));
            json.WriteString("at", waiver.At.ToString());
            json.WriteEndObject();
        }
        json.WriteEndObject();
    }

    /// <summary>The limit from which the margin is measured.</summary>
    /// <param name="finding">The finding.</param>
    internal static double? NearestLimit(Finding finding)
    {
        if (finding.LowerLimit is not { } lower)
            return finding.UpperLimit;
        if (finding.UpperLimit is not { } upper)
            return lower;
        return finding.Value is { } value && value - lower < upper - value ? lower : upper;
    }

    private static void WriteFix(Utf8JsonWriter json, Fix? fix)
    {
        if (fix is null)
        {
            json.WriteNull("fix");
            return;
        }
        json.WriteStartObject("fix");
        json.WriteString("text", fix.Text);
        json.WriteString("kind", fix.Kind switch
        {
            FixKind.AddLength => "add-length",
            FixKind.RemoveLength => "remove-length",
            FixKind.SetWidth => "set-width",
            FixKind.SetGap => "set-gap",
            FixKind.SeriesResistor => "series-resistor",
            FixKind.EndResistor => "end-resistor",
            FixKind.Later => "later",
            _ => "other",
        });
        json.WriteString("net", fix.Net);
        json.WriteString("layer", fix.Layer);
        Number(json, "value_si", fix.Value);
        json.WriteEndObject();
    }

    private static void WriteRules(Utf8JsonWriter json, CheckResult result)
    {
        json.WriteStartArray("rules");
        foreach (var rule in result.Rules)
        {
            json.WriteStartObject();
            json.WriteString("id", rule.Id);
            json.WriteString("kind", rule.Kind);
            json.WriteString("nets", rule.Nets);
            json.WriteString("limit", rule.Limit);
            json.WriteString("severity", StatusName.Of(rule.Severity));
            json.WriteString("reason", rule.Reason);
            json.WriteString("source", rule.Source);
            json.WriteString("at", rule.At.ToString());
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    private static void WriteGroups(Utf8JsonWriter json, CheckResult result)
    {
        json.WriteStartArray("groups");
        foreach (var group in result.Groups)
        {
            json.WriteStartObject();
            json.WriteString("rule", group.Rule);
            json.WriteString("kind", group.Kind);
            json.WriteString("group", group.Group);
            json.WriteString("reference", group.ReferenceName);
            Number(json, "reference_s", group.ReferenceSeconds);
            Number(json, "lowest_s", group.LowestSeconds);
            Number(json, "highest_s", group.HighestSeconds);
            json.WriteStartArray("delays");
            foreach (var delay in group.Delays)
            {
                json.WriteStartObject();
                json.WriteString("net", delay.Net);
                json.WriteString("from", delay.From);
                json.WriteString("to", delay.To);
                Number(json, "delay_s", delay.DelaySeconds);
                Number(json, "length_m", delay.LengthMetres);
                json.WriteBoolean("holds", delay.Holds);
                json.WriteEndObject();
            }
            json.WriteEndArray();
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    private static void WriteLines(Utf8JsonWriter json, CheckResult result)
    {
        json.WriteStartArray("lines");
        foreach (var line in result.Lines)
        {
            json.WriteStartObject();
            json.WriteString("layer", line.Layer);
            Number(json, "width_m", line.WidthMetres);
            Number(json, "gap_m", line.GapMetres);
            Number(json, "z0_ohm", line.Z0Ohms);
            Number(json, "z_diff_ohm", line.ZDiffOhms);
            Number(json, "eps_eff", line.EpsEff);
            Number(json, "delay_s_per_m", line.DelaySecondsPerMetre);
            json.WriteStartObject("energy_fraction");
            foreach (var share in line.Shares)
                Number(json, share.Dielectric, share.Share);
            json.WriteEndObject();
            json.WriteString("method", line.MethodId);
            Number(json, "relative_error", line.RelativeError);
            json.WriteNumber("segments", line.SegmentCount);
            Number(json, "total_length_m", line.TotalLengthMetres);
            if (line.CrossCheck is { } check)
            {
                json.WriteStartObject("cross_check");
                json.WriteString("method", check.MethodId);
                Number(json, "impedance_ohm", check.Ohms);
                Number(json, "difference", check.Difference);
                Number(json, "allowed", check.Allowed);
                json.WriteBoolean("disagrees", check.Disagrees);
                json.WriteBoolean("outside_validity", check.OutsideValidity);
                json.WriteEndObject();
            }
            WriteTexts(json, "warnings", line.Warnings);
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    private static void WriteMethods(Utf8JsonWriter json, CheckResult result)
    {
        json.WriteStartArray("methods");
        foreach (var method in result.Methods)
        {
            json.WriteStartObject();
            json.WriteString("id", method.Id);
            json.WriteString("used_for", method.UsedFor);
            Number(json, "worst_relative_error", method.WorstRelativeError);
            json.WriteEndObject();
        }
        json.WriteEndArray();
    }

    private static void WriteTexts(Utf8JsonWriter json, string name, IEnumerable<string> texts)
    {
        json.WriteStartArray(name);
        foreach (var text in texts)
            json.WriteStringValue(text);
        json.WriteEndArray();
    }

    private static void Number(Utf8JsonWriter json, string name, double? value)
    {
        if (value is { } number && double.IsFinite(number))
            json.WriteNumber(name, double.Parse(number.ToString("G12", CultureInfo.InvariantCulture), CultureInfo.InvariantCulture));
        else
            json.WriteNull(name);
    }
}
