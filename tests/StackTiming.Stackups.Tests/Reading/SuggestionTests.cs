using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Stackups.Tests.Reading;

public sealed class SuggestionTests
{
    [Theory]
    [InlineData("thicknes", "did you mean 'thickness'?")]
    [InlineData("DK", "did you mean 'dk'?")]
    [InlineData("THICKNESS", "did you mean 'thickness'?")]
    [InlineData("colour", "it can be df, dk, thickness")]
    [InlineData("", "it can be df, dk, thickness")]
    public void Proposes_the_nearest_word_or_all(string word, string expected) => Assert.Equal(expected, Suggestion.For(word, ["thickness", "dk", "df"]));

    [Fact]
    public void Proposes_nothing_where_nothing_is_known() => Assert.Null(Suggestion.For("a", []));

    [Fact]
    public void Lists_of_many_words_are_cut()
    {
        var said = Suggestion.For("zzzzzzzz", Enumerable.Range(10, 50).Select(i => $"name{i}"))!;
        Assert.EndsWith("name21, …", said);
        Assert.Equal("did you mean '" + new string('a', 57) + "…'?", Suggestion.For(new string('A', 64), [new string('a', 64)]));
    }

    [Fact]
    public void Quoted_text_is_short_on_one_line_and_obeyed_by_no_terminal()
    {
        Assert.Equal(new string('x', 60), Suggestion.Shorten(new string('x', 60)));
        Assert.Equal(new string('x', 57) + "…", Suggestion.Shorten(new string('x', 61)));
        Assert.Equal("a�[31mb�c", Suggestion.Shorten("a\u001b[31mb\nc"));
        // A pair of surrogates at the cut goes as a whole.
        Assert.Equal(new string('x', 56) + "…", Suggestion.Shorten(new string('x', 56) + "😀" + new string('x', 9)));
    }

    [Fact]
    public void Problems_bound_what_readers_forget_to_shorten()
    {
        var problems = new ProblemList();
        problems.Error(new FilePosition("f", 2, 0), new string('m', 100_000) + "\u001b", new string('a', 100_000));
        var said = Assert.Single(problems.Items).ToString();
        Assert.StartsWith("f:2: error: mmm", said);
        Assert.True(said.Length < 2100);
    }
}
