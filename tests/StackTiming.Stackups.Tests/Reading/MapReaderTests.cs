using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Stackups.Tests.Reading;

public sealed class MapReaderTests
{
    private readonly ProblemList problems = new();

    private MapReader Reader(string text)
    {
        var map = YamlDocument.ReadMap(new InputFile("f.yaml", text, ""), problems)!;
        var plain = new MapReader(map, DefaultUnits.None, problems);
        return new MapReader(map, DefaultUnitsReader.Read(plain), problems);
    }

    private string Said() => Assert.Single(problems.Items).ToString();

    [Fact]
    public void Unknown_keys_are_reported_with_the_nearest_known_one()
    {
        var reader = Reader("name: x\ntickness: 3 um\n");
        reader.Text("name");
        reader.Quantity("thickness", Dimension.Length, QuantityRange.Positive);
        reader.Finish();
        Assert.Equal("f.yaml:2:1: error: unknown key 'tickness'; did you mean 'thickness'?", Said());
    }

    [Fact]
    public void A_missing_key_is_reported_where_the_mapping_begins()
    {
        Assert.Null(Reader("a: { b: 1 }").Map("a")!.NeedText("rise", "rise: 150 ps"));
        Assert.Equal("f.yaml:1:4: error: 'rise' is missing; write rise: 150 ps", Said());
    }

    [Theory]
    [InlineData("a: 0 um", "f.yaml:1:4: error: 'a' must be above zero, but it says '0 um'")]
    [InlineData("a: 3 um ±4", "f.yaml:1:4: error: 'a' must be above zero everywhere inside its tolerance, but it says '3 um ±4'")]
    [InlineData("a: 3", "f.yaml:1:4: error: 'a': '3' has no unit; write a number and a unit (um, mm, mil, in, m, nm, oz), such as 75 um")]
    [InlineData("a: [3]", "f.yaml:1:4: error: 'a' must be a single value")]
    public void Wrong_quantities_are_located_and_explained(string text, string expected)
    {
        Assert.Null(Reader(text).Quantity("a", Dimension.Length, QuantityRange.Positive));
        Assert.Equal(expected, Said());
    }

    [Fact]
    public void Bare_numbers_take_the_units_of_the_file() =>
        Assert.Equal(45e-6, Reader("units: { length: um }\na: 45").Quantity("a", Dimension.Length, QuantityRange.Positive)!.Value.Value, 1e-15);

    [Theory]
    [InlineData("units: { length: furlong }", "f.yaml:1:18: error: 'furlong' is not a unit of length; it can be um, mm, mil, in, m, nm, oz")]
    [InlineData("units: { length: ps }", "f.yaml:1:18: error: 'ps' is not a unit of length; it can be um, mm, mil, in, m, nm, oz")]
    [InlineData("units: { length: UM }", "f.yaml:1:18: error: 'UM' is not a unit of length; did you mean 'um'?")]
    [InlineData("units: { lenght: um }", "f.yaml:1:10: error: unknown key 'lenght'; did you mean 'length'?")]
    [InlineData("units: um", "f.yaml:1:8: error: 'units' must be a mapping; write units: { key: value, … }")]
    public void Wrong_default_units_are_located_and_explained(string text, string expected)
    {
        Reader(text);
        Assert.Equal(expected, Said());
    }

    [Fact]
    public void A_wrong_default_unit_is_reported_once_and_not_for_each_number()
    {
        var reader = Reader("units: { length: um, time: parsec }\na: 3\nb: 4");
        reader.Quantity("a", Dimension.Time, QuantityRange.Positive);
        reader.Quantity("b", Dimension.Time, QuantityRange.Positive);
        Assert.Contains("'parsec' is not a unit of time", Said());
    }

    [Theory]
    [InlineData("format: 1", true)]
    [InlineData("name: x", true)]
    [InlineData("format: 2", false)]
    [InlineData("format: one", false)]
    public void Only_known_versions_of_the_format_are_read(string text, bool accepted)
    {
        FormatVersion.Check(Reader(text));
        Assert.Equal(accepted, !problems.HasErrors);
        if (!accepted)
            Assert.EndsWith("is not read by this version; write format: 1", Said());
    }

    [Theory]
    [InlineData("a: yes", "f.yaml:1:4: error: 'a' cannot be 'yes'; it can be false, true")]
    [InlineData("a: True", "f.yaml:1:4: error: 'a' cannot be 'True'; did you mean 'true'?")]
    public void Flags_are_true_or_false(string text, string expected)
    {
        Assert.Null(Reader(text).Flag("a"));
        Assert.Equal(expected, Said());
        Assert.True(Reader("a: true").Flag("a"));
    }

    [Fact]
    public void A_single_value_counts_as_a_list_of_one()
    {
        Assert.Equal(["x"], Reader("a: x").List("a").Select(n => ((DataScalar)n).Text));
        Assert.Equal(["x", "y"], Reader("a: [x, y]").List("a").Select(n => ((DataScalar)n).Text));
        Assert.Empty(Reader("a: x").List("b"));
    }

    [Fact]
    public void Many_unknown_keys_cost_no_more_than_their_count()
    {
        Reader(string.Join('\n', Enumerable.Range(0, 20000).Select(i => $"k{i}: 1"))).Finish();
        Assert.Equal(ProblemList.Capacity, problems.Items.Count);
        Assert.Equal(20000, problems.ErrorCount);
        Assert.Equal(20000 - ProblemList.Capacity, problems.Omitted);
        Assert.Null(Record.Exception(() => problems.Note(default, "one more")));
        Assert.Equal(20001 - ProblemList.Capacity, problems.Omitted);
    }
}
