using CsCheck;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Stackups.Tests.Reading;

public sealed class YamlDocumentTests
{
    private static (DataMap? Map, ProblemList Problems) Read(string text)
    {
        var problems = new ProblemList();
        return (YamlDocument.ReadMap(new InputFile("f.yaml", text, ""), problems), problems);
    }

    private static string[] Problems(string text)
    {
        var (map, problems) = Read(text);
        Assert.Null(map);
        Assert.True(problems.HasErrors);
        return [.. problems.Items.Select(p => p.ToString())];
    }

    [Fact]
    public void Keys_and_values_know_their_lines_and_columns()
    {
        var (map, problems) = Read("name: Board\nlayers:\n  - { copper: L1, thickness: 45 ±8 }\n  - 'two'\n");
        Assert.Empty(problems.Items);
        Assert.Equal(new FilePosition("f.yaml", 2, 1), map!.Entries[1].KeyAt);
        var list = Assert.IsType<DataList>(map.Entries[1].Value);
        var layer = Assert.IsType<DataMap>(list.Items[0]);
        Assert.Equal(new FilePosition("f.yaml", 3, 5), layer.At);
        Assert.Equal(new FilePosition("f.yaml", 3, 19), layer.Entries[1].KeyAt);
        Assert.Equal(new DataScalar(new FilePosition("f.yaml", 3, 30), "45 ±8", Quoted: false), layer.Entries[1].Value);
        Assert.Equal(new DataScalar(new FilePosition("f.yaml", 4, 5), "two", Quoted: true), list.Items[1]);
    }

    [Theory]
    [InlineData("\n")]
    [InlineData("\r\n")]
    public void Places_do_not_depend_on_line_ends(string end)
    {
        var (map, _) = Read($"a: 1{end}b: 2{end}c: 3{end}");
        Assert.Equal(3, map!.Entries[2].KeyAt.Line);
        Assert.Equal("2", Assert.IsType<DataScalar>(map.Entries[1].Value).Text);
    }

    [Theory]
    [InlineData("a: 1\nb: 2\na: 3", "f.yaml:3:1: error: 'a' stands twice; keep one; the first is in line 1")]
    [InlineData("a: { b: 1, 'b': 2 }", "f.yaml:1:12: error: 'b' stands twice; keep one; the first is in line 1")]
    [InlineData("a: &x 1", "f.yaml:1:4: error: the anchor '&x' is not accepted; write the value out where it is needed")]
    [InlineData("a: *x", "f.yaml:1:4: error: the alias '*x' is not accepted; write the value out, or put a text that begins with * in quotes")]
    [InlineData("from: [U1, *1]", "f.yaml:1:12: error: the alias '*1' is not accepted; write the value out, or put a text that begins with * in quotes")]
    [InlineData("a: !!int 1", "f.yaml:1:4: error: tags (words that begin with !) are not accepted; remove the tag, or put the text in quotes")]
    [InlineData("a: 1\n---\nb: 1", "f.yaml:2:1: error: a second document begins here; keep one document a file; remove the line ---")]
    [InlineData("a:\nb: 1", "f.yaml:1:1: error: 'a' has no value; write one after the colon, or remove the key")]
    [InlineData("a: ~", "f.yaml:1:1: error: 'a' has no value; write one after the colon, or remove the key")]
    [InlineData("a: null", "f.yaml:1:1: error: 'a' has no value; write one after the colon, or remove the key")]
    [InlineData("a: [1, ~]", "f.yaml:1:8: error: the list has an item without a value; write the value after the -, or remove the item")]
    [InlineData("a: { dk:3.9 }", "f.yaml:1:6: error: 'dk:3.9' has no value; put a blank after the colon: dk: 3.9")]
    [InlineData("a:{ dk: 3.9 }", "f.yaml:1:1: error: no blank follows the colon in 'a:{ dk'; write key: { … }, with a blank after the colon")]
    [InlineData(": 1", "f.yaml:1:1: error: a key is empty; write the key before the colon")]
    [InlineData("[a, b]: 1", "f.yaml:1:1: error: a key must be a single word; put a text that begins with a bracket in quotes")]
    [InlineData("a: \"x\\u001b[31m\"", "f.yaml:1:4: error: the text has a control character in it; write the text without it")]
    [InlineData("- a\n- b", "f.yaml:1:1: error: the file must be a mapping; begin with lines such as name: my board")]
    [InlineData("just words", "f.yaml:1:1: error: the file must be a mapping; begin with lines such as name: my board")]
    [InlineData("# nothing\n", "f.yaml: error: the file has no content")]
    public void What_YAML_would_accept_but_a_board_file_should_not_say_is_explained(string text, string expected) => Assert.Equal(expected, Problems(text)[0]);

    [Theory]
    [InlineData("a:\n  b: 1\n\tc: 2", "f.yaml:3:1: error: a tab stands in the indent of this line; indent with blanks")]
    [InlineData("format:1\nunits: { a: b }", "f.yaml:1:7: error: no blank follows the colon here; write key: value, with a blank after the colon")]
    [InlineData("format: 1\nname:x\nb: 1", "f.yaml:2:5: error: no blank follows the colon here; write key: value, with a blank after the colon")]
    [InlineData("l:\n  - { p: a, t: 7\n  - { c: b }", "f.yaml:2:5: error: the { that opens here is not closed; write the } where it ends")]
    [InlineData("l: [ a, # b ]\n", "f.yaml:1:4: error: the [ that opens here is not closed; write the ] where it ends")]
    [InlineData("l: { a: 1 ]", "f.yaml:1:4: error: the { that opens here is not closed; write the } where it ends")]
    [InlineData("l:\n  - { t: 7 }}\n", "f.yaml:2:13: error: the } here closes nothing; remove it, or put the text in quotes")]
    [InlineData("a: \"it is\nb: 1", "f.yaml:1:4: error: a quotation mark opens here and is not closed where it should be; write the same mark at the end of the text")]
    [InlineData("a: 'it's'", "f.yaml:1:8: error: the text is not valid YAML here; nothing may follow the closing quotation mark; write an apostrophe inside single quotes twice, or use double quotes")]
    [InlineData("a: \"C:\\parts\"", "f.yaml:1:4: error: the text is not valid YAML here; write the character itself, \\\\ for a backslash, or use single quotes")]
    [InlineData("a: {b: 1} x", "f.yaml:1:11: error: the text is not valid YAML here; nothing may follow the closing bracket but a comma or a comment")]
    [InlineData("a: \"b\" c", "f.yaml:1:8: error: the text is not valid YAML here; nothing may follow the closing quotation mark; write an apostrophe inside single quotes twice, or use double quotes")]
    [InlineData("nets: [ MEM_D[0..7], X ]", "f.yaml:1:14: error: the text is not valid YAML here; separate entries by commas, and put a text with brackets, such as \"D[0..7]\", in quotes")]
    [InlineData("l: { p: a t: 7 }", "f.yaml:1:12: error: the text is not valid YAML here; separate entries by commas, and put a text with brackets, such as \"D[0..7]\", in quotes")]
    [InlineData("a: b: c", "f.yaml:1:5: error: the text is not valid YAML here; keep the keys of one mapping at the same indent, and put a text that contains ': ' in quotes")]
    [InlineData("a: %x", "f.yaml:1:4: error: the text is not valid YAML here; put a text that begins with % in quotes")]
    [InlineData("a: @x", "f.yaml:1:4: error: the text is not valid YAML here; put a text that begins with @ in quotes")]
    [InlineData("a: - b", "f.yaml:1:4: error: the text is not valid YAML here; begin a list on the next line, or write it as [a, b]")]
    [InlineData("a:\n  - x\n - y", "f.yaml:3:2: error: the text is not valid YAML here; indent this line like the entries that it belongs to, and begin each with - in a list, with key: in a mapping")]
    public void Mistakes_of_form_are_located_in_plain_words(string text, string expected) => Assert.Equal(expected, Assert.Single(Problems(text)));

    [Fact]
    public void One_run_reports_every_problem_that_leaves_the_form_intact() =>
        Assert.Equal(["f.yaml:1:4", "f.yaml:2:1", "f.yaml:4:1", "f.yaml:5:5"], Problems("a: &x 1\nb:\nc: 1\nc: 2\nd: [*x]\n").Select(p => p[..p.IndexOf(": error", StringComparison.Ordinal)]));

    [Theory]
    [InlineData("[")]
    [InlineData("{a: ")]
    [InlineData("- ")]
    public void Nesting_is_bounded(string opening)
    {
        var said = Assert.Single(Problems(string.Concat(Enumerable.Repeat(opening, 1_000_000))));
        Assert.EndsWith("error: the file nests too deeply", said);
    }

    [Fact]
    public void The_deepest_nesting_accepted_is_read()
    {
        var opening = string.Concat(Enumerable.Repeat("[", YamlDocument.DeepestNesting - 1));
        Assert.NotNull(Read($"a: {opening}x{opening.Replace('[', ']')}").Map);
        Assert.Null(Read($"a: {opening}[[x]]{opening.Replace('[', ']')}").Map);
    }

    [Fact]
    public void The_number_of_values_is_bounded() =>
        Assert.EndsWith("error: the file has too many values", Assert.Single(Problems("a: [" + string.Concat(Enumerable.Repeat("x,", YamlDocument.MostNodes)) + "]")));

    [Fact]
    public void Anchors_that_would_grow_in_memory_are_refused_without_growing()
    {
        var bomb = "a: &a [x,x,x,x,x,x,x,x,x]\n" + string.Concat("bcdefghi".Select(c => $"{c}: &{c} [{string.Join(',', Enumerable.Repeat("*" + (char)(c - 1), 9))}]\n"));
        Assert.All(Problems(bomb), p => Assert.Contains("is not accepted", p));
    }

    [Theory]
    [InlineData("a: ", "")]
    [InlineData("'", "': 1")]
    [InlineData("a: &", " 1")]
    [InlineData("a: *", "")]
    [InlineData("a: { b:", " }")]
    [InlineData("a: \"", "")]
    [InlineData("", ": 1")]
    public void Fields_of_a_million_characters_do_not_swell_messages(string before, string after)
    {
        var (map, problems) = Read(before + new string('x', 1_000_000) + after);
        if (map is not null)
            new MapReader(map, Stackups.Quantities.DefaultUnits.None, problems).Finish();
        Assert.NotEmpty(problems.Items);
        Assert.All(problems.Items, p => Assert.True(p.ToString().Length < 300, p.ToString().Length.ToString(System.Globalization.CultureInfo.InvariantCulture)));
    }

    [Fact]
    public void Never_throws_and_never_fails_without_a_problem()
    {
        Gen.String[Gen.Char["ab:{}[],-?#&*!|>'\"%@` \n\t\\0\u0085\u2028é\ud83d"], 0, 60].Sample(text =>
        {
            var (map, problems) = Read(text);
            Assert.Equal(map is null, problems.HasErrors);
        }, iter: 20000);
    }
}
