using System.Globalization;
using System.Numerics;
using System.Text;
using StackTiming.Reports.Results;
using Xunit;

namespace StackTiming.Reports.Tests.Results;

/// <summary>Files are read back by a small reader of the published format (IBIS Open Forum, Touchstone 2.0, 2009), written for this test alone.</summary>
public class TouchstoneWriterTests
{
    [Theory]
    [InlineData(2, false)]
    [InlineData(2, true)]
    [InlineData(4, false)]
    [InlineData(4, true)]
    [InlineData(6, false)]
    public void Every_entry_comes_back_from_its_place(int ports, bool version2)
    {
        var network = Network(ports);
        var (hertz, matrices, reference) = Read(Text(network, version2), ports);

        Assert.Equal(network.Hertz, hertz);
        Assert.Equal(47.5, reference);
        for (var k = 0; k < hertz.Count; k++)
        {
            for (var i = 0; i < ports; i++)
            {
                for (var j = 0; j < ports; j++)
                    Assert.Equal(0, (network.Scattering[k][i, j] - matrices[k][i, j]).Magnitude, 1e-9);
            }
        }
    }

    [Fact]
    public void Two_ports_stand_on_one_line_with_21_before_12()
    {
        var row = Text(Network(2), false).Split('\n').Last(l => l.Length > 0).Split(' ');

        Assert.Equal(9, row.Length);
        Assert.Equal(2.1 / 10, double.Parse(row[3], CultureInfo.InvariantCulture), 1e-9);
        Assert.Equal(1.2 / 10, double.Parse(row[5], CultureInfo.InvariantCulture), 1e-9);
    }

    [Fact]
    public void Lines_hold_at_most_four_pairs_and_rows_begin_lines()
    {
        var lines = Text(Network(6), false).Split('\n').Where(l => l.Length > 0 && l[0] is not ('!' or '#')).ToArray();

        // Six ports: rows of four pairs and two pairs; the first line of a frequency carries the frequency too.
        Assert.Equal(2 * 12, lines.Length);
        for (var i = 0; i < lines.Length; i++)
            Assert.Equal((i % 2 == 0 ? 8 : 4) + (i % 12 == 0 ? 1 : 0), lines[i].Split(' ', StringSplitOptions.RemoveEmptyEntries).Length);
    }

    [Fact]
    public void Comments_are_plain_ascii_and_cannot_become_data()
    {
        var text = Text(Network(2) with { Comments = ["line of Ω\n1e9 0 0 0 0 0 0 0 0"] }, true);

        Assert.Equal("! line of ??1e9 0 0 0 0 0 0 0 0", text.Split('\n')[0]);
        Assert.True(Encoding.UTF8.GetBytes(text).All(b => b is (byte)'\n' or (>= 32 and < 127)));
        Assert.Contains("[Two-Port Data Order] 21_12\n", text, StringComparison.Ordinal);
        Assert.EndsWith("[End]\n", text, StringComparison.Ordinal);
    }

    // Entry ij is i.j/10 + jk/100, so that none can be taken for another.
    private static TouchstoneNetwork Network(int ports)
    {
        Complex[,] Matrix(int k)
        {
            var s = new Complex[ports, ports];
            for (var i = 0; i < ports; i++)
            {
                for (var j = 0; j < ports; j++)
                    s[i, j] = new Complex((i + 1 + 0.1 * (j + 1)) / 10, (k + 1) / 100.0 * (i + 1) / (j + 1));
            }
            return s;
        }
        return new TouchstoneNetwork(47.5, [1e6, 12345678.9], [Matrix(0), Matrix(1)], ["a line"]);
    }

    private static string Text(TouchstoneNetwork network, bool version2)
    {
        using var stream = new MemoryStream();
        TouchstoneWriter.Write(network, version2, stream);
        return Encoding.ASCII.GetString(stream.ToArray());
    }

    private static (List<double> Hertz, List<Complex[,]> Matrices, double Reference) Read(string text, int ports)
    {
        List<double> numbers = [];
        var reference = double.NaN;
        foreach (var line in text.Split('\n').Select(l => l.Split('!')[0].Trim()).Where(l => l.Length > 0))
        {
            if (line[0] == '#')
            {
                var words = line[1..].Split(' ', StringSplitOptions.RemoveEmptyEntries);
                Assert.Equal(["Hz", "S", "RI", "R"], words[..4]);
                reference = double.Parse(words[4], CultureInfo.InvariantCulture);
            }
            else if (line[0] != '[')
            {
                numbers.AddRange(line.Split(' ', StringSplitOptions.RemoveEmptyEntries).Select(w => double.Parse(w, CultureInfo.InvariantCulture)));
            }
        }
        var size = 1 + 2 * ports * ports;
        Assert.Equal(0, numbers.Count % size);
        List<double> hertz = [];
        List<Complex[,]> matrices = [];
        for (var start = 0; start < numbers.Count; start += size)
        {
            hertz.Add(numbers[start]);
            var s = new Complex[ports, ports];
            for (var p = 0; p < ports * ports; p++)
            {
                var (row, column) = ports == 2 ? (p % 2, p / 2) : (p / ports, p % ports);
                s[row, column] = new Complex(numbers[start + 1 + 2 * p], numbers[start + 2 + 2 * p]);
            }
            matrices.Add(s);
        }
        return (hertz, matrices, reference);
    }
}
