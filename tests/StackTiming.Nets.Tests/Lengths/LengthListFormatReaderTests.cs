using StackTiming.Nets.Lengths;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Nets.Tests.Lengths;

public class LengthListFormatReaderTests
{
    private static (LengthListFormat Format, string[] Problems) Read(string text)
    {
        var problems = new ProblemList();
        var map = new MapReader(YamlDocument.ReadMap(new InputFile("b.yaml", text, ""), problems)!, DefaultUnits.None, problems);
        var format = LengthListFormatReader.Read(map);
        map.Finish();
        return (format, [.. problems.Items.Select(p => p.ToString())]);
    }

    [Fact]
    public void The_description_of_a_foreign_report_is_read()
    {
        var (format, problems) = Read(
            """
            columns: { net: Signal, length: "Routed (mil)", width: { header: W, unit: mil } }
            defaults: { layer: L3, gap: 0.15 mm }
            layers: { TOP: L1, "Inner 1": L2 }
            skip-lines: 3
            separator: tab
            decimal: comma
            pin-separator: "-"
            """);
        Assert.Empty(problems);
        Assert.Equal("Signal", format.Columns[LengthColumn.Net].Header);
        Assert.Equal("b.yaml:1:33", format.Columns[LengthColumn.Length].At.ToString());
        Assert.Equal(("W", 2.54e-5), (format.Columns[LengthColumn.Width].Header, format.Columns[LengthColumn.Width].UnitMetres));
        Assert.Equal("L3", format.DefaultLayer);
        Assert.Equal(0.15e-3, format.Defaults[LengthColumn.Gap], 1e-15);
        Assert.Equal("L2", format.LayerNames["Inner 1"]);
        Assert.Equal((3, '\t', true, '-'), (format.SkipLines, format.Separator, format.DecimalComma, format.PinSeparator));
    }

    [Fact]
    public void Nothing_said_is_the_projects_own_form()
    {
        var (format, problems) = Read("{}");
        Assert.Empty(problems);
        Assert.Empty(format.Columns);
        Assert.Equal((0, null, false, '.'), (format.SkipLines, format.Separator, format.DecimalComma, format.PinSeparator));
    }

    [Theory]
    [InlineData("columns: { lenght: X }", "b.yaml:1:12: error: unknown column 'lenght'; did you mean 'length'?")]
    [InlineData("columns: { width: { header: W, unit: furlong } }", "b.yaml:1:38: error: 'furlong' is not a unit of length; units are m, cm, mm, um, nm, in, mil")]
    [InlineData("columns: { net: { header: N, unit: mm } }", "b.yaml:1:36: error: 'net' has no unit; remove 'unit'")]
    [InlineData("columns: { width: { unit: mm } }", "b.yaml:1:19: error: 'header' is missing; write header: Routed")]
    [InlineData("defaults: { length: 3 mm }", "b.yaml:1:13: error: 'length' cannot have a default; every row states it")]
    [InlineData("defaults: { width: -3 mm }", "b.yaml:1:20: error: 'width' must be above zero, but it says '-3 mm'")]
    [InlineData("skip-lines: many", "b.yaml:1:13: error: 'skip-lines' cannot be 'many'; write the number of lines before the header, 0 to 1000")]
    [InlineData("colums: {}", "b.yaml:1:1: error: unknown key 'colums'; did you mean 'columns'?")]
    public void Wrong_descriptions_are_refused(string text, string expected)
    {
        Assert.Equal([expected], Read(text).Problems);
    }
}
