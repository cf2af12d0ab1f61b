using System.Globalization;
using System.Text;
using System.Xml;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Results;

/// <summary>
/// Writes the results of a check in the JUnit XML form that build servers read: a suite for each rule, a case for each finding. A pass and
/// a waived finding pass (the waived one says so in a property); a failed one is a failure; an unchecked one is skipped, or an error where its rule
/// must hold, because then it fails the board. No times are given, so that the same input gives the same bytes.
/// </summary>
public static class JUnitXml
{
    /// <summary>Writes the results.</summary>
    /// <param name="result">The results.</param>
    /// <param name="output">Where to.</param>
    public static void Write(CheckResult result, Stream output)
    {
        var settings = new XmlWriterSettings { Encoding = new UTF8Encoding(false), Indent = true, NewLineChars = "\n", CloseOutput = false };
        using var xml = XmlWriter.Create(output, settings);
        xml.WriteStartDocument();
        xml.WriteStartElement("testsuites");
        Attribute(xml, "name", result.Revision.Length == 0 ? result.Board : $"{result.Board}, revision {result.Revision}");
        WriteTotals(xml, result.Findings);
        foreach (var suite in result.Findings.GroupBy(f => f.Rule).OrderBy(g => g.Key, NaturalOrder.Instance))
        {
            xml.WriteStartElement("testsuite");
            Attribute(xml, "name", suite.Key);
            WriteTotals(xml, suite);
            foreach (var finding in suite)
                WriteCase(xml, finding);
            xml.WriteEndElement();
        }
        xml.WriteEndElement();
        xml.WriteEndDocument();
    }

    private static void WriteTotals(XmlWriter xml, IEnumerable<Finding> findings)
    {
        int total = 0, failures = 0, errors = 0, skipped = 0;
        foreach (var finding in findings)
        {
            total++;
            failures += finding.Status == FindingStatus.Fail ? 1 : 0;
            errors += IsError(finding) ? 1 : 0;
            skipped += finding.Status == FindingStatus.Unchecked && !IsError(finding) ? 1 : 0;
        }
        Attribute(xml, "tests", total.ToString(CultureInfo.InvariantCulture));
        Attribute(xml, "failures", failures.ToString(CultureInfo.InvariantCulture));
        Attribute(xml, "errors", errors.ToString(CultureInfo.InvariantCulture));
        Attribute(xml, "skipped", skipped.ToString(CultureInfo.InvariantCulture));
    }

    private static bool IsError(Finding finding) => finding.Status == FindingStatus.Unchecked && finding.Severity == Severity.Must;

    private static void WriteCase(XmlWriter xml, Finding finding)
    {
        xml.WriteStartElement("testcase");
        Attribute(xml, "classname", finding.Rule);
        Attribute(xml, "name", finding.Subject);
        xml.WriteStartElement("properties");
        Property(xml, "kind", finding.Kind);
        Property(xml, "severity", StatusName.Of(finding.Severity));
        Property(xml, "status", StatusName.Of(finding.Status));
        if (finding.Margin is { } margin)
            Property(xml, "margin", $"{Figure(margin)} {finding.Unit.Symbol}".TrimEnd());
        if (finding.Waiver is { } waiver)
            Property(xml, "waived", $"{waiver.Reason} (approved by {waiver.ApprovedBy})");
        xml.WriteEndElement();
        switch (finding.Status)
        {
            case FindingStatus.Fail:
                Outcome(xml, "failure", finding, finding.Explanation);
                break;
            case FindingStatus.Unchecked:
                Outcome(xml, IsError(finding) ? "error" : "skipped", finding, finding.UncheckedReason);
                break;
            default:
                break;
        }
        xml.WriteEndElement();
    }

    private static void Outcome(XmlWriter xml, string element, Finding finding, string message)
    {
        xml.WriteStartElement(element);
        Attribute(xml, "message", message);
        if (element != "skipped")
        {
            Attribute(xml, "type", finding.Kind);
            var text = new StringBuilder(finding.Explanation);
            if (finding.Value is { } value)
                text.Append($"\nvalue {Figure(value)} {finding.Unit.Symbol}".TrimEnd());
            if (ResultsJson.NearestLimit(finding) is { } limit)
                text.Append($"\nlimit {Figure(limit)} {finding.Unit.Symbol}".TrimEnd());
            if (finding.Fix is { } fix)
                text.Append("\nfix: ").Append(fix.Text);
            text.Append("\nrule: ").Append(finding.RuleAt);
            xml.WriteString(Legal(text.ToString()));
        }
        xml.WriteEndElement();
    }

    private static void Property(XmlWriter xml, string name, string value)
    {
        xml.WriteStartElement("property");
        Attribute(xml, "name", name);
        Attribute(xml, "value", value);
        xml.WriteEndElement();
    }

    private static string Figure(double value) => value.ToString("G6", CultureInfo.InvariantCulture);

    private static void Attribute(XmlWriter xml, string name, string value) => xml.WriteAttributeString(name, Legal(value));

    // XML 1.0 has no way to write most control characters and half surrogates: they are shown by their code point.
    private static string Legal(string text)
    {
        var legal = true;
        for (var i = 0; i < text.Length && legal; i++)
        {
            if (char.IsHighSurrogate(text[i]) && i + 1 < text.Length && char.IsLowSurrogate(text[i + 1]))
                i++;
            else
                legal = XmlConvert.IsXmlChar(text[i]);
        }
        if (legal)
            return text;
        var result = new StringBuilder(text.Length + 16);
        for (var i = 0; i < text.Length; i++)
        {
            if (char.IsHighSurrogate(text[i]) && i + 1 < text.Length && char.IsLowSurrogate(text[i + 1]))
                result.Append(text[i]).Append(text[++i]);
            else if (XmlConvert.IsXmlChar(text[i]))
                result.Append(text[i]);
            else
                result.Append(CultureInfo.InvariantCulture, $"<U+{(int)text[i]:X4}>");
        }
        return result.ToString();
    }
}
