using StackTiming.Rules.Boards;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Tests.Boards;

/// <summary>A folder with the files of a small board, in a state that reads without problems; tests replace what they need.</summary>
internal sealed class BoardFolder : IDisposable
{
    private readonly string folder = Directory.CreateTempSubdirectory("stacktiming-rules-").FullName;

    public BoardFolder()
    {
        Write("four.stackup.yaml", """
            name: Four layers
            units: { length: um }
            dielectrics:
              core: { dk: 4.2, df: 0.016, at: 1 GHz }
              prepreg: { dk: 4.0, df: 0.018, at: 1 GHz }
            copper: { resistivity: 1.72e-8 ohm m, roughness: 1 um, etch-factor: 2.5 }
            layers:
              - { copper: L1, thickness: 40, use: signal }
              - { prepreg: prepreg, thickness: 100 }
              - { copper: L2, thickness: 18, use: plane }
              - { core: core, thickness: 1200 }
              - { copper: L3, thickness: 18, use: plane }
              - { prepreg: prepreg, thickness: 100 }
              - { copper: L4, thickness: 40, use: signal }
            """);
        Write("nets.lengths.csv", """
            net,from,to,layer,length[mm],width[mm]
            D0,U1.1,U2.1,L1,40,0.18
            D1,U1.2,U2.2,L1,41,0.18
            D2,U1.3,U2.3,L1,40.5,0.18
            DQS,U1.4,U2.4,L1,40.2,0.18
            """);
        Write("parts.yaml", """
            models:
              out: { driver: { low: 0 V, high: 1.2 V, resistance: 40 ohm, rise: 150 ps } }
              in: { receiver: { capacitance: 1.5 pF, vil: 0.45 V, vih: 0.75 V, threshold: 0.6 V } }
            parts:
              U1: { pins: { "1..4": { model: out } } }
              U2: { pins: { "1..4": { model: in } } }
            """);
        Write("board.rules.yaml", """
            groups:
              lane: { nets: "D[0..2]", strobe: DQS }
            rules:
              - { id: MATCH, kind: match, nets: lane, within: 10 ps, delay: time-of-flight }
            """);
        WriteBoard("rules: board.rules.yaml");
    }

    public string BoardPath => Path.Combine(folder, "board.yaml");

    public ProblemList Problems { get; private set; } = new();

    public BoardFolder Write(string name, string text)
    {
        var path = Path.Combine(folder, name);
        Directory.CreateDirectory(Path.GetDirectoryName(path)!);
        File.WriteAllText(path, text);
        return this;
    }

    public BoardFolder WriteBoard(params string[] lines) => Write("board.yaml", string.Join('\n', (string[])[
        "format: 1", "name: Test board", "revision: A", "stackup: four.stackup.yaml", "lengths: nets.lengths.csv", "parts: parts.yaml", .. lines]));

    public Board? Read()
    {
        Problems = new ProblemList();
        return BoardReader.Read(BoardPath, Problems, Xunit.TestContext.Current.CancellationToken);
    }

    public Board ReadWhole()
    {
        var board = Read();
        Xunit.Assert.True(board is not null, string.Join('\n', Problems.Items));
        return board!;
    }

    /// <summary>The errors without the folder in their places.</summary>
    public string[] Errors() => [.. Problems.Items.Where(p => p.IsError).Select(p => p.ToString().Replace(folder + Path.DirectorySeparatorChar, "", StringComparison.Ordinal))];

    public string[] Notes() => [.. Problems.Items.Where(p => !p.IsError).Select(p => p.Message)];

    public void Dispose() => Directory.Delete(folder, recursive: true);
}
