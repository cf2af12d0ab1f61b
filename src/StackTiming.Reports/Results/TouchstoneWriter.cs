using System.Globalization;
using System.Text;

namespace StackTiming.Reports.Results;

/// <summary>
/// Writes Touchstone files of the IBIS Open Forum: version 1 (<c>.sNp</c>; read alike by readers of 1.0 and 1.1, as all ports have one reference) and
/// version 2.0 (<c>.ts</c>). Frequencies in hertz, real and imaginary parts with 10 digits. Two ports in the order 11, 21, 12, 22 that the format wants, more
/// ports row by row with at most four pairs on a line. ASCII throughout: other characters of a comment become question marks.
/// </summary>
public static class TouchstoneWriter
{
    private const int PairsOnLine = 4;

    /// <summary>Writes the file.</summary>
    /// <param name="network">The network.</param>
    /// <param name="version2">True for version 2.0.</param>
    /// <param name="output">Where to.</param>
    public static void Write(TouchstoneNetwork network, bool version2, Stream output)
    {
        using var writer = new StreamWriter(output, Encoding.ASCII, 1 << 14, leaveOpen: true) { NewLine = "\n" };
        foreach (var comment in network.Comments)
            writer.WriteLine("! " + Ascii(comment));
        if (version2)
            writer.WriteLine("[Version] 2.0");
        writer.WriteLine("# Hz S RI R " + Text(network.ReferenceOhms));
        if (version2)
            WriteKeywords(network, writer);
        for (var k = 0; k < network.Hertz.Length; k++)
            WriteMatrix(network, k, writer);
        if (version2)
            writer.WriteLine("[End]");
    }

    private static void WriteKeywords(TouchstoneNetwork network, StreamWriter writer)
    {
        writer.WriteLine($"[Number of Ports] {Text(network.Ports)}");
        if (network.Ports == 2)
            writer.WriteLine("[Two-Port Data Order] 21_12");
        writer.WriteLine($"[Number of Frequencies] {Text(network.Hertz.Length)}");
        writer.WriteLine("[Reference] " + string.Join(' ', Enumerable.Repeat(Text(network.ReferenceOhms), network.Ports)));
        writer.WriteLine("[Network Data]");
    }

    private static void WriteMatrix(TouchstoneNetwork network, int k, StreamWriter writer)
    {
        var s = network.Scattering[k];
        writer.Write(network.Hertz[k].ToString("R", CultureInfo.InvariantCulture));
        for (var i = 0; i < network.Ports; i++)
        {
            for (var j = 0; j < network.Ports; j++)
            {
                // The row of a matrix begins a line, except for two ports, whose four pairs share one.
                if (network.Ports > 2 && j % PairsOnLine == 0 && i + j > 0)
                    writer.Write("\n ");
                var value = network.Ports == 2 ? s[j, i] : s[i, j];
                writer.Write($" {Part(value.Real)} {Part(value.Imaginary)}");
            }
        }
        writer.WriteLine();
    }

    private static string Part(double value) => value.ToString("0.000000000e+00", CultureInfo.InvariantCulture);

    private static string Text(double value) => value.ToString("R", CultureInfo.InvariantCulture);

    private static string Ascii(string comment) => new([.. comment.Select(c => c is >= ' ' and <= '~' ? c : '?')]);
}
