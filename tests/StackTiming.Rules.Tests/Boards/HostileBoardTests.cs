using CsCheck;
using StackTiming.Rules.Boards;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Rules.Tests.Boards;

/// <summary>Whatever stands in a board or rule file, reading ends with a board or with located errors, and never with an exception.</summary>
public sealed class HostileBoardTests : IDisposable
{
    private const string Rules = """
        groups:
          lane: { nets: "D[0..2]", strobe: DQS, drive: U1 }
          open: {}
        pairs:
          pair: [ D0, D1 ]
        rules:
          - { use: board.rules.yaml, prefix: X- }
          - { id: M, kind: match, nets: lane, within: 10 ps }
          - { id: Z, kind: impedance, pair: pair, target: 90 ohm ±10 % }
          - { id: O, kind: offset, nets: lane, to: strobe, min: -5 ps, max: 5 ps }
          - { id: S, kind: stub, nets: [ lane, DQS ], max: 10 % }
          - { id: L, kind: layers, nets: "D*", allowed: [ L1 ], planes: either, outside: 1 mm }
          - { id: H, kind: setup-hold, nets: lane, transfer: source-synchronous, setup: 10 ps, hold: 10 ps, valid-before: 90 ps, valid-after: 90 ps }
        waivers:
          - { rule: M, nets: D0, reason: x, approved-by: y, until: 2027-01-01 }
        assume: { rise: 100 ps, frequency: 1 GHz, reference-load: { resistance: 50 ohm, to: 0.6 V } }
        """;

    private static readonly string[] Pieces =
    [
        "{", "}", "[", "]", ":", "- ", ", ", "\"", "'", "#", "*", "&a", "!x", "|", ">", "\n", "\n  ", "\t", "..", "D[9..0]", "1e999 ps", "-", "~", "use", "kind", "nets", "\u00b5", "\u0000"
    ];

    private readonly BoardFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void Damaged_files_never_throw()
    {
        folder.WriteBoard(Rules);
        folder.ReadWhole();
        var damage = Gen.Select(Gen.Int[0, Rules.Length - 1], Gen.Int[0, 12], Gen.Int[0, Pieces.Length - 1].Select(i => Pieces[i])).Array[1, 6];
        damage.Sample(
            cuts =>
            {
                var text = Rules;
                foreach (var (at, length, piece) in cuts)
                {
                    var start = Math.Min(at, text.Length);
                    text = text[..start] + piece + text[Math.Min(text.Length, start + length)..];
                }
                folder.WriteBoard(text);
                var problems = new ProblemList();
                var board = BoardReader.Read(folder.BoardPath, problems, CancellationToken.None);
                Assert.Equal(board is null, problems.HasErrors);
                Assert.All(problems.Items, p => Assert.NotEmpty(p.At.File));
            },
            iter: 400, threads: 1);
    }

    [Fact]
    public void Arbitrary_bytes_never_throw() => Gen.Byte.Array[0, 200].Sample(
        bytes =>
        {
            File.WriteAllBytes(folder.BoardPath, bytes);
            var problems = new ProblemList();
            Assert.Null(BoardReader.Read(folder.BoardPath, problems, CancellationToken.None));
            Assert.True(problems.HasErrors);
        },
        iter: 200, threads: 1);

    [Fact]
    public void A_name_of_a_million_characters_is_an_error_of_reasonable_length()
    {
        folder.WriteBoard($"rules: [ {{ id: M, kind: match, nets: {new string('x', 1_000_000)}, within: 1 ps }} ]");
        Assert.Null(folder.Read());
        Assert.All(folder.Errors(), e => Assert.True(e.Length < 1000));
    }
}
