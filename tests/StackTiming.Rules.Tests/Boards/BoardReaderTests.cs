using StackTiming.Rules.Boards;
using StackTiming.Rules.Kinds;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Rules.Tests.Boards;

public sealed class BoardReaderTests : IDisposable
{
    private readonly BoardFolder folder = new();

    public void Dispose() => folder.Dispose();

    [Fact]
    public void A_board_is_read_with_all_its_files_and_their_digests()
    {
        var board = folder.ReadWhole();
        Assert.Equal(("Test board", "A"), (board.Name, board.Revision));
        Assert.Equal(["board", "stackup", "lengths", "parts", "rules"], board.Inputs.Select(i => i.Role));
        Assert.All(board.Inputs, i => Assert.Equal(64, i.Sha256.Length));
        var rule = Assert.IsType<MatchRule>(Assert.Single(board.Rules));
        Assert.Equal(["D0", "D1", "D2"], rule.Nets.Names);
        Assert.Equal(10e-12, rule.WithinSeconds, 1e-18);
        Assert.Empty(folder.Problems.Items);
    }

    [Fact]
    public void Problems_of_all_files_are_found_in_one_run()
    {
        folder.Write("four.stackup.yaml", "name: x\nlayers: []\nlayerz: []\n")
            .Write("nets.lengths.csv", "net,layer,length[mm],width[mm]\nD0,L1,-4,0.18\n")
            .Write("parts.yaml", "parts: { U1: { pinz: {} } }\n")
            .Write("board.rules.yaml", "rules: [ { id: A, kind: mach, nets: D0 } ]\n")
            .WriteBoard("rules: board.rules.yaml", "waivers: [ { rule: A } ]", "revison: B");
        Assert.Null(folder.Read());
        var files = folder.Problems.Items.Where(p => p.IsError).Select(p => Path.GetFileName(p.At.File)).Distinct().Order();
        Assert.Equal(["board.rules.yaml", "board.yaml", "four.stackup.yaml", "nets.lengths.csv", "parts.yaml"], files);
        Assert.Contains(folder.Errors(), e => e.Contains("there is no kind of rule called 'mach'; did you mean 'match'?", StringComparison.Ordinal));
        Assert.Contains(folder.Errors(), e => e.Contains("unknown key 'revison'; did you mean 'revision'?", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("match, nets: lane, within: 10 ps, wihin: 2 ps", "unknown key 'wihin'; did you mean 'within'?")]
    [InlineData("match, nets: lane", "'within' is missing; write within: 10 ps")]
    [InlineData("match, nets: lane, within: 10 mm", "'within'")]
    [InlineData("match, nets: lane, within: 0 ps", "must be above zero")]
    [InlineData("match, nets: D0, within: 10 ps", "is a single net, which has nothing to match")]
    [InlineData("match, nets: [ D0, NOPE ], within: 10 ps", "no group, pair or net is called 'NOPE'")]
    [InlineData("match, nets: \"D[0..9]\", within: 10 ps", "the board has no net 'D3', which 'D[0..9]' stands for")]
    [InlineData("match, nets: lane, within: 10 ps, delay: flight", "'delay' cannot be 'flight'")]
    [InlineData("match, nets: lane, within: 10 ps, severity: shall", "'severity' cannot be 'shall'; it can be must, should")]
    [InlineData("offset, nets: D0, min: -5 ps", "'to' is missing, and 'D0' is no group with a strobe or clock")]
    [InlineData("offset, nets: lane, to: strobe", "neither 'min' nor 'max' is given")]
    [InlineData("offset, nets: lane, min: 5 ps, max: -5 ps", "'min' is above 'max', so that nothing can pass; swap them")]
    [InlineData("offset, nets: DQS, to: DQS, max: 1 ps", "'DQS' is compared with itself")]
    [InlineData("impedance, nets: lane, target: 50 ohm", "'target' has no tolerance; write target: 50 ohm ±10 %")]
    [InlineData("impedance, nets: lane, pair: [ D0, D1 ], target: 50 ohm ±10 %", "either 'nets' or 'pair'")]
    [InlineData("pair-skew, pair: usb, max: 5 ps", "no pair is called 'usb'")]
    [InlineData("pair-skew, pair: [ D0, D0 ], max: 5 ps", "both members of the pair are 'D0'")]
    [InlineData("pair-skew, pair: [ D0, D1 ]", "none of 'max', 'along' and 'uncoupled' is given")]
    [InlineData("step, nets: lane, max: 2", "a reflection coefficient is at most 1")]
    [InlineData("layers, nets: lane, allowed: [ L9 ]", "the stack-up has no copper layer 'L9'; did you mean 'L1'?")]
    [InlineData("layers, nets: lane, planes: none", "the rule says nothing")]
    [InlineData("stub, nets: lane, max: 10 V", "'max'")]
    [InlineData("ringback, nets: lane, margin: 50 mV, edge: up", "'edge' cannot be 'up'; it can be both, fall, rise")]
    [InlineData("setup-hold, nets: lane, transfer: source-synchronous, setup: 1 ps, hold: 1 ps, valid-after: 1 ps", "'valid-before' is missing")]
    [InlineData("setup-hold, nets: lane, transfer: common-clock, setup: 1 ps, hold: 1 ps, period: 10 ns, tco-min: 2 ns, tco-max: 1 ns", "'tco-min' is above 'tco-max'")]
    [InlineData("setup-hold, nets: lane, transfer: common, setup: 1 ps, hold: 1 ps", "'transfer' cannot be 'common'")]
    public void Wrong_rules_say_what_is_wrong_and_where(string rule, string words)
    {
        folder.WriteBoard("groups: { lane: { nets: \"D[0..2]\", strobe: DQS } }", "rules:", $"  - {{ id: R, kind: {rule} }}");
        Assert.Null(folder.Read());
        var error = Assert.Single(folder.Errors());
        Assert.Contains(words, error, StringComparison.Ordinal);
        Assert.StartsWith("board.yaml:9:", error, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("groups: { empty: \"X*\" }", "no group, pair or net is called 'X*'")]
    [InlineData("groups: { a: { nets: D0, strobe: DQS, clock: D1 } }", "names both a strobe and a clock")]
    [InlineData("groups: { a: { nets: D0 } }\npairs: { a: [ D0, D1 ] }", "'a' is a group already")]
    [InlineData("pairs: { a: [ D0 ] }", "pair 'a' must name two nets; write a: [ USB_P, USB_N ]")]
    [InlineData("groups: { a: {} }\nrules: [ { id: R, kind: match, nets: a, within: 1 ps } ]", "'a' is left open")]
    [InlineData("rules: [ { id: R, kind: layers, nets: D0 }, { id: R, kind: layers, nets: D1 } ]", "a rule with the id 'R' is stated already")]
    [InlineData("rules: [ { kind: layers, nets: D0 } ]", "'id' is missing")]
    [InlineData("rules: []", "the board has no rule")]
    [InlineData("rules: nowhere.rules.yaml", "does not exist")]
    [InlineData("rules: [ 5 ps ]", "does not exist")]
    [InlineData("rules: [ { use: nowhere.rules.yaml } ]", "does not exist")]
    [InlineData("rules: board.rules.yaml\nwaivers: [ { rule: MATCH, nets: D0, reason: x, approved-by: y, until: soon } ]", "'soon' is not a date; write until: 2027-06-30")]
    [InlineData("rules: board.rules.yaml\nassume: { rise: 10 mV }", "'rise'")]
    [InlineData("rules: board.rules.yaml\nassume: { reference-load: { to: 1 V } }", "'to' needs a 'resistance'")]
    public void Wrong_boards_say_what_is_wrong(string lines, string words)
    {
        if (!lines.Contains("rules:", StringComparison.Ordinal))
            lines = "rules: board.rules.yaml\n" + lines;
        folder.WriteBoard(lines.Split('\n'));
        Assert.Null(folder.Read());
        Assert.Contains(folder.Errors(), e => e.Contains(words, StringComparison.Ordinal));
    }

    [Fact]
    public void A_rule_set_is_used_twice_with_prefixes()
    {
        folder.Write("set.rules.yaml", "groups: { lane: {} }\nrules: [ { id: Z, kind: layers, nets: lane } ]\n")
            .WriteBoard("rules:", "  - { use: set.rules.yaml, prefix: A-, bind: { lane: \"D[0..1]\" } }", "  - { use: set.rules.yaml, prefix: B-, bind: { lane: DQS } }");
        var board = folder.ReadWhole();
        Assert.Equal(["A-Z", "B-Z"], board.Rules.Select(r => r.Header.Id));
        Assert.Equal([2, 1], board.Rules.Cast<LayersRule>().Select(r => r.Nets.Names.Length));
        Assert.Single(board.Inputs, i => i.Path.EndsWith("set.rules.yaml", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("{ use: set.rules.yaml }", "set.rules.yaml leaves open: lane; write bind: { lane: a group or net of yours }")]
    [InlineData("{ use: set.rules.yaml, bind: { lame: D0 } }", "has no group or pair 'lame'; did you mean 'lane'?")]
    [InlineData("{ use: set.rules.yaml, bind: { lane: D0, fixed: D1 } }", "'fixed' has nets of its own")]
    [InlineData("{ use: set.rules.yaml, bind: { lane: NOPE } }", "no group, pair or net is called 'NOPE'")]
    [InlineData("{ use: set.rules.yaml, bnd: { lane: D0 } }", "unknown key 'bnd'; did you mean 'bind'?")]
    public void Binding_is_checked(string use, string words)
    {
        folder.Write("set.rules.yaml", "groups: { lane: {}, fixed: D0 }\nrules: [ { id: Z, kind: layers, nets: lane } ]\n").WriteBoard($"rules: [ {use} ]");
        Assert.Null(folder.Read());
        Assert.Contains(folder.Errors(), e => e.Contains(words, StringComparison.Ordinal));
    }

    [Fact]
    public void Rule_files_that_use_each_other_in_a_circle_are_an_error()
    {
        folder.Write("a.rules.yaml", "rules: [ { use: sub/b.rules.yaml } ]\n").Write("sub/b.rules.yaml", "rules: [ { use: ../a.rules.yaml } ]\n")
            .WriteBoard("rules: a.rules.yaml");
        Assert.Null(folder.Read());
        Assert.Contains(folder.Errors(), e => e.Contains("in a circle: a.rules.yaml → b.rules.yaml → a.rules.yaml", StringComparison.Ordinal));
    }

    [Fact]
    public void Rule_sets_that_double_themselves_come_to_an_end()
    {
        for (var i = 0; i < 30; i++)
            folder.Write($"s{i}.rules.yaml", $"rules: [ {{ use: s{i + 1}.rules.yaml }}, {{ use: s{i + 1}.rules.yaml }} ]\n");
        folder.Write("s30.rules.yaml", "rules: [ { id: X, kind: layers, nets: D0 } ]\n").WriteBoard("rules: s0.rules.yaml");
        Assert.Null(folder.Read());
        Assert.Contains(folder.Errors(), e => e.Contains("rule sets are used more than", StringComparison.Ordinal));
    }

    [Fact]
    public void Files_outside_the_boards_folder_are_read_and_noted()
    {
        folder.Write("sub/board.yaml", "name: Sub\nstackup: ../four.stackup.yaml\nlengths: ../nets.lengths.csv\nparts: ../parts.yaml\nrules: ../board.rules.yaml\n");
        var problems = new ProblemList();
        var path = Path.Combine(Path.GetDirectoryName(folder.BoardPath)!, "sub", "board.yaml");
        Assert.NotNull(BoardReader.Read(path, problems, TestContext.Current.CancellationToken));
        var note = Assert.Single(problems.Items, p => p.Message.Contains("outside the board's folder", StringComparison.Ordinal));
        Assert.Equal(4, note.Message.Split(", ").Length);
    }

    [Fact]
    public void A_folder_whose_name_begins_like_the_boards_is_outside_all_the_same()
    {
        folder.Write("b/board.yaml", "name: Sub\nstackup: ../b2/four.yaml\nlengths: ../nets.lengths.csv\nrules: ../board.rules.yaml\n");
        File.Copy(Path.Combine(Path.GetDirectoryName(folder.BoardPath)!, "four.stackup.yaml"), Path.Combine(Directory.CreateDirectory(Path.Combine(Path.GetDirectoryName(folder.BoardPath)!, "b2")).FullName, "four.yaml"));
        var problems = new ProblemList();
        BoardReader.Read(Path.Combine(Path.GetDirectoryName(folder.BoardPath)!, "b", "board.yaml"), problems, TestContext.Current.CancellationToken);
        Assert.Contains(problems.Items, p => p.Message.Contains("outside the board's folder", StringComparison.Ordinal) && p.Message.Contains("/b2/four.yaml", StringComparison.Ordinal));
    }

    [Theory]
    [InlineData("")]
    [InlineData("  ")]
    [InlineData("a\0b")]
    [InlineData("no/such/board.yaml")]
    public void A_board_path_that_leads_nowhere_is_an_error(string path)
    {
        var problems = new ProblemList();
        Assert.Null(BoardReader.Read(path, problems, TestContext.Current.CancellationToken));
        Assert.True(problems.HasErrors);
    }

    [Fact]
    public void Foreign_headers_may_be_mapped_for_one_list()
    {
        folder.Write("foreign.csv", "Signal,Layer,Routed (mil),W (mil)\nX0,L1,1000,7\n")
            .Write("board.yaml", """
                name: Foreign
                stackup: four.stackup.yaml
                lengths:
                  - nets.lengths.csv
                  - { file: foreign.csv, columns: { net: Signal, layer: Layer, length: "Routed (mil)", width: "W (mil)" } }
                parts: parts.yaml
                rules: [ { id: Z, kind: layers, nets: [ "D*", X0 ] } ]
                """);
        var board = folder.ReadWhole();
        Assert.Equal(25.4e-3, board.Lengths.SegmentsOf(board.Lengths.Find("X0")!.Value)[0].LengthMetres, 1e-12);
    }

    [Fact]
    public void Waivers_may_stand_in_a_file_of_their_own_and_use_the_boards_groups()
    {
        folder.Write("waivers.yaml", "format: 1\nwaivers: [ { rule: MATCH, nets: lane, reason: measured, approved-by: lead, until: 2027-01-31 } ]\n")
            .WriteBoard("rules: board.rules.yaml", "waivers: waivers.yaml");
        var waiver = Assert.Single(folder.ReadWhole().Waivers);
        Assert.Equal(["D0", "D1", "D2"], waiver.Names);
        Assert.Equal(new DateOnly(2027, 1, 31), waiver.Waiver.Until);
    }

    [Fact]
    public void A_waiver_without_an_end_is_noted()
    {
        folder.WriteBoard("rules: board.rules.yaml", "waivers: [ { rule: MATCH, nets: D0, reason: measured, approved-by: lead } ]");
        folder.ReadWhole();
        Assert.Equal(["the waiver has no end"], folder.Notes());
    }

    [Fact]
    public void What_groups_say_of_their_driver_holds_for_their_nets_and_strobe_in_every_rule()
    {
        folder.WriteBoard(
            "groups: { lane: { nets: \"D[0..2]\", strobe: DQS, drive: U1 } }",
            "rules: [ { id: A, kind: flight-time, nets: [ D0, DQS ], max: 1 ns }, { id: B, kind: flight-time, nets: lane, drive: both, max: 1 ns } ]");
        var rules = folder.ReadWhole().Rules.Cast<FlightTimeRule>().ToArray();
        Assert.Equal("U1", rules[0].Query.Drive.Of("D0").Text);
        Assert.Equal("U1", rules[0].Query.Drive.Of("DQS").Text);
        Assert.Equal("both", rules[1].Query.Drive.Of("D0").Text);
    }

    [Fact]
    public void Reading_stops_when_it_is_cancelled()
    {
        using var stopped = new CancellationTokenSource();
        stopped.Cancel();
        Assert.Throws<OperationCanceledException>(() => BoardReader.Read(folder.BoardPath, new ProblemList(), stopped.Token));
    }
}
