using System.Diagnostics;
using System.Globalization;
using System.Text;
using Xunit;

namespace StackTiming.Acceptance;

/// <summary>Wrong input through the built program: exit code 2, a located message, nothing written.</summary>
public sealed class BadInputTests : IDisposable
{
    private const string StackUp = """
        units: { length: um }
        dielectrics: { core: { dk: 4, df: 0.02, at: 1 GHz } }
        copper: { roughness: 1 um, etch-factor: 3 }
        layers:
          - { copper: L1, thickness: 35, use: signal }
          - { core: core, thickness: 100 }
          - { copper: L2, thickness: 35, use: plane }
        """;

    private const string Lengths = "net,from,to,layer,length[mm],width[mm]\nA,U1.1,U2.1,L1,40,0.2\n";

    private const string Parts = """
        models:
          out: { driver: { low: 0 V, high: 1.8 V, resistance: 45 ohm, rise: 400 ps } }
          in: { receiver: { capacitance: 2 pF, vil: 0.6 V, vih: 1.2 V, threshold: 0.9 V } }
        parts:
          U1: { pins: { 1: { model: out } } }
          U2: { pins: { 1: { model: in } } }
        """;

    private const string Rules = "rules: [ { id: R, kind: flight-time, nets: A, max: 1 ns } ]\n";
    private const string Board = "name: b\nstackup: s.yaml\nlengths: l.csv\nparts: p.yaml\nrules: r.yaml\n";

    private readonly TemporaryFolder folder = new();

    public void Dispose() => folder.Dispose();

    private ToolResult Check(string file, string right, string wrong, params string[] further)
    {
        foreach (var (name, text) in new[] { ("s.yaml", StackUp), ("l.csv", Lengths), ("p.yaml", Parts), ("r.yaml", Rules), ("board.yaml", Board) })
        {
            Assert.True(name != file || text.Contains(right, StringComparison.Ordinal), $"{right} is not in {name}");
            folder.Write(name, name == file ? text.Replace(right, wrong, StringComparison.Ordinal) : text);
        }
        return Tool.RunIn(folder.Path, null, ["check", "board.yaml", "--report", "out.pdf", .. further]);
    }

    [Theory]
    [InlineData("s.yaml", "thickness: 100", "thickness: 0", "s.yaml:6:", "above zero")]
    [InlineData("l.csv", "L1,40", "L3,40", "l.csv:2:", "no copper layer 'L3'")]
    [InlineData("l.csv", "40,0.2", "NaN,0.2", "l.csv:2:", "not a number")]
    [InlineData("l.csv", "40,0.2", "40,500", "l.csv:2:", "no board has")]
    [InlineData("l.csv", "40,0.2\n", "40,0.2\nA,U1.1,U2.1,L1,30,0.2\n", "l.csv:3", "closes a loop")]
    [InlineData("p.yaml", "model: in }", "model: out }", "r.yaml:1:", "several pins can drive")]
    [InlineData("p.yaml", "U1: { pins: { 1: { model: out } } }", "U1: { pins: { 1: { model: in } } }", "r.yaml:1:", "no pin can drive")]
    [InlineData("r.yaml", "nets: A", "nets: \"B*\"", "r.yaml:1:", "no group, pair or net")]
    [InlineData("r.yaml", "max: 1 ns", "max: 1", "r.yaml:1:", "no unit")]
    [InlineData("r.yaml", "rules: [", "rules: [ { use: r.yaml },", "r.yaml:1:", "circle")]
    [InlineData("board.yaml", "name: b", "name: b\nname: c", "board.yaml:2:", "stands twice")]
    [InlineData("board.yaml", "lengths: l.csv", "lengths: /dev/zero", "board.yaml:3:", "not a regular file")]
    [InlineData("board.yaml", "parts: p.yaml", "parts: q.yaml", "board.yaml:4:", "does not exist")]
    public void Is_located_and_explained_and_nothing_is_written(string file, string right, string wrong, string place, string message)
    {
        var run = Check(file, right, wrong);
        Assert.True(run.ExitCode == 2, $"{run.ExitCode}: {run.Error}");
        Assert.Contains(run.Error.Split('\n'), l => l.StartsWith(place, StringComparison.Ordinal) && l.Contains(message, StringComparison.Ordinal));
        Assert.DoesNotContain("   at ", run.Error);
        Assert.False(File.Exists(folder.PathOf("out.pdf")));
    }

    [Fact]
    public void The_files_of_these_tests_are_right_without_the_mistake()
    {
        Assert.Equal(0, Check("board.yaml", "name: b", "name: b").ExitCode);
        Assert.True(File.Exists(folder.PathOf("out.pdf")));
    }

    [Fact]
    public void Of_several_outputs_none_is_written_where_one_cannot_be()
    {
        var run = Check("board.yaml", "name: b", "name: b", "--json", "missing/out.json");
        Assert.Equal(2, run.ExitCode);
        Assert.Contains("the folder", run.Error);
        Assert.Empty(Directory.GetFiles(folder.Path, "*.p*f").Concat(Directory.GetFiles(folder.Path, ".*.part")));
    }

    [Fact]
    public void UTF_16_with_a_byte_order_mark_is_read()
    {
        Check("board.yaml", "name: b", "name: b");
        File.WriteAllText(folder.PathOf("l.csv"), Lengths, Encoding.Unicode);
        Assert.Equal(0, Tool.RunIn(folder.Path, null, "check", "board.yaml").ExitCode);
    }

    [Fact]
    public void Interrupted_work_leaves_nothing_behind()
    {
        if (OperatingSystem.IsWindows())
            return;
        Check("board.yaml", "name: b", "name: b");
        File.Delete(folder.PathOf("out.pdf"));
        // Enough nets to be in the middle of the work when the signal comes.
        const int nets = 30_000;
        var rows = new StringBuilder("net,from,to,layer,length[mm],width[mm]\n");
        for (var i = 0; i < nets; i++)
            rows.Append(CultureInfo.InvariantCulture, $"N{i},U1.P{i},U2.P{i},L1,{20 + (i % 97)},0.2\n");
        folder.Write("l.csv", rows.ToString());
        string Pins(string model) => string.Join(", ", Enumerable.Range(0, nets / 1000).Select(k => $"\"P{k * 1000}..P{(k * 1000) + 999}\": {{ model: {model} }}"));
        folder.Write("p.yaml", Parts.Replace("1: { model: out }", Pins("out"), StringComparison.Ordinal).Replace("1: { model: in }", Pins("in"), StringComparison.Ordinal));
        folder.Write("r.yaml", "rules: [ { id: R, kind: ringback, nets: \"N*\", margin: 1 mV } ]\n");
        using var process = Tool.Start(folder.Path, null, "check", "board.yaml", "--report", "out.pdf");
        Thread.Sleep(1500);
        Process.Start("kill", $"-INT {process.Id}").WaitForExit();
        Assert.True(process.WaitForExit(TimeSpan.FromSeconds(30)));
        Assert.True(process.ExitCode == 130, process.StandardError.ReadToEnd());
        Assert.False(File.Exists(folder.PathOf("out.pdf")));
        Assert.Empty(Directory.GetFiles(folder.Path, ".*"));
    }
}
