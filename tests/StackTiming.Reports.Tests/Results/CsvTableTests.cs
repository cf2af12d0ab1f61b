using System.Text;
using StackTiming.Reports.Results;
using StackTiming.Reports.Tests.Compliance;
using Xunit;

namespace StackTiming.Reports.Tests.Results;

public class CsvTableTests
{
    private static string Write(params string[] cells)
    {
        using var stream = new MemoryStream();
        CsvTable.Write(["a", "b"], [cells], stream);
        return Encoding.UTF8.GetString(stream.ToArray());
    }

    [Theory]
    [InlineData("plain", "plain")]
    [InlineData("with, comma", "\"with, comma\"")]
    [InlineData("with \"quotes\"", "\"with \"\"quotes\"\"\"")]
    [InlineData("two\nlines", "\"two\nlines\"")]
    [InlineData(" space", "\" space\"")]
    [InlineData("Ω", "Ω")]
    [InlineData("", "")]
    public void Cells_are_quoted_as_RFC_4180_asks(string cell, string written) => Assert.Equal($"a,b\r\n{written},x\r\n", Write(cell, "x"));

    [Theory]
    [InlineData("=1+2", "'=1+2")]
    [InlineData("+cmd", "'+cmd")]
    [InlineData("@name", "'@name")]
    [InlineData("-x", "'-x")]
    [InlineData("\tx", "'\tx")]
    [InlineData("=HYPERLINK(\"a\",\"b\")", "\"'=HYPERLINK(\"\"a\"\",\"\"b\"\")\"")]
    public void Formulas_are_disarmed(string cell, string written) => Assert.Equal($"a,b\r\n{written},x\r\n", Write(cell, "x"));

    [Theory]
    [InlineData("-4.21")]
    [InlineData("+1e-9")]
    public void Signed_numbers_stay_numbers(string cell) => Assert.Equal($"a,b\r\n{cell},x\r\n", Write(cell, "x"));

    [Fact]
    public void File_has_no_byte_order_mark() => Assert.Equal((byte)'a', Encoding.UTF8.GetBytes(Write("x", "y"))[0]);

    [Fact]
    public void Findings_make_one_row_each()
    {
        var check = SampleCheck.Create();
        using var stream = new MemoryStream();
        FindingsCsv.Write(check, stream);
        var lines = Encoding.UTF8.GetString(stream.ToArray()).Split("\r\n", StringSplitOptions.RemoveEmptyEntries);
        Assert.Equal(check.Findings.Length + 1, lines.Length);
        Assert.StartsWith("rule,kind,subject", lines[0], StringComparison.Ordinal);
    }
}
