using System.Xml.Linq;
using StackTiming.Reports.Results;
using StackTiming.Reports.Tests.Compliance;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;
using Xunit;

namespace StackTiming.Reports.Tests.Results;

public class JUnitXmlTests
{
    private static XElement Write(CheckResult result)
    {
        using var stream = new MemoryStream();
        JUnitXml.Write(result, stream);
        stream.Position = 0;
        return XDocument.Load(stream).Root!;
    }

    [Fact]
    public void Every_finding_is_a_case_in_the_suite_of_its_rule()
    {
        var check = SampleCheck.Create();
        var root = Write(check);
        Assert.Equal("testsuites", root.Name);
        Assert.Equal(check.Findings.Length, root.Descendants("testcase").Count());
        Assert.Equal(check.Findings.Select(f => f.Rule).Distinct().Count(), root.Elements("testsuite").Count());
        Assert.Equal(8, root.Elements("testsuite").Single(s => (string?)s.Attribute("name") == "LANE0-Z").Elements("testcase").Count());
    }

    [Fact]
    public void Outcomes_follow_status_and_severity()
    {
        var root = Write(SampleCheck.Create());
        XElement Case(string rule) => root.Descendants("testcase").First(c => (string?)c.Attribute("classname") == rule);
        Assert.Contains("23.4 ps", Case("LANE0-MATCH").Element("failure")!.Attribute("message")!.Value, StringComparison.Ordinal);
        Assert.Contains("fix: shorten MEM_D5 by 2.02 mm", Case("LANE0-MATCH").Element("failure")!.Value, StringComparison.Ordinal);
        Assert.Null(Case("USB-SKEW").Element("failure"));
        Assert.Contains(Case("USB-SKEW").Descendants("property"), p => (string?)p.Attribute("name") == "waived");
        Assert.Single(root.Descendants("error"));
        Assert.Empty(root.Descendants("skipped"));

        var check = SampleCheck.Create();
        var should = Write(check with { Findings = [.. check.Findings.Select(f => f with { Severity = Severity.Should })] });
        Assert.Single(should.Descendants("skipped"));
        Assert.Empty(should.Descendants("error"));
    }

    [Fact]
    public void Totals_add_up()
    {
        var root = Write(SampleCheck.Create());
        foreach (var name in new[] { "tests", "failures", "errors", "skipped" })
            Assert.Equal((int)root.Attribute(name)!, root.Elements("testsuite").Sum(s => (int)s.Attribute(name)!));
        Assert.Equal((int)root.Attribute("failures")!, root.Descendants("failure").Count());
    }

    [Theory]
    [InlineData("control \u0000 \u0001 \u001f \ufffe", "control <U+0000> <U+0001> <U+001F> <U+FFFE>")]
    [InlineData("]]> <a b=\"c\"> & 'd' \ud83d\ude00", "]]> <a b=\"c\"> & 'd' \ud83d\ude00")]
    public void Hostile_names_stay_well_formed(string name, string shown) => AssertShown(name, shown);

    [Fact]
    public void Half_a_surrogate_pair_stays_well_formed() => AssertShown("half " + (char)0xD800 + " pair", "half <U+D800> pair");

    private static void AssertShown(string name, string shown)
    {
        var check = SampleCheck.Create();
        var root = Write(check with { Findings = [check.Findings[0] with { Rule = name, Subject = name, Explanation = name }] });
        Assert.Equal(shown, (string?)root.Descendants("testcase").Single().Attribute("name"));
        Assert.StartsWith(shown, root.Descendants("failure").Single().Value, StringComparison.Ordinal);
    }
}
