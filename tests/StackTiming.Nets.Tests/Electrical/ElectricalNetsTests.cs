using CsCheck;
using StackTiming.Nets.Electrical;
using StackTiming.Nets.Parts;
using Xunit;
using static StackTiming.Nets.Tests.Electrical.BoardParts;

namespace StackTiming.Nets.Tests.Electrical;

public class ElectricalNetsTests
{
    [Fact]
    public void Labels_join_the_rows_of_a_net_into_a_tree()
    {
        var nets = BuildWhole(
            Rows("D0 U1.A *1 10", "D0 *1 *2 20", "D0 U2.A *2 5", "D0 *2 U3.A 7"), PartsOf("U1.A out", "U2.A in", "U3.A in"));
        var net = nets.Find("D0")!;
        Assert.Equal("U1.A 10 *1 20 *2 5 U2.A", Show(Path(net, "U1.A", "U2.A")));
        Assert.Equal("U3.A 7 *2 20 *1 10 U1.A", Show(Path(net, "U3.A", "U1.A")));
        Assert.Equal(0.035, Path(net, "U1.A", "U2.A").TraceLengthMetres, 1e-12);
        Assert.Equal(["U1.A"], net.DriverNodes.Select(n => net.Nodes[n].Name));
        Assert.Equal(["U2.A", "U3.A"], net.ReceiverNodes.Select(n => net.Nodes[n].Name).Order());
    }

    [Fact]
    public void Labels_are_local_to_their_net()
    {
        var nets = BuildWhole(Rows("A U1.A *1 1", "B U1.B *1 2", "A *1 U2.A 3", "B *1 U2.B 4"), PartList.Empty);
        Assert.Equal("U1.A 1 *1 3 U2.A", Show(Path(nets.Find("A")!, "U1.A", "U2.A")));
        Assert.Equal("U1.B 2 *1 4 U2.B", Show(Path(nets.Find("B")!, "U1.B", "U2.B")));
    }

    [Fact]
    public void Series_parts_join_nets()
    {
        var nets = BuildWhole(
            Rows("S U1.A R1.1 2", "M R1.2 C1.1 3", "T C1.2 U2.A 4", "X U1.B U2.B 9"), PartsOf("U1.A out", "U2.A in", "U1.B out", "U2.B in", "R1 1-2", "C1 1-2"));
        Assert.Equal(2, nets.All.Length);
        var net = nets.Find("T")!;
        Assert.Same(net, nets.Find("S"));
        Assert.Equal(["S", "M", "T"], net.NetNames);
        Assert.Equal("U1.A 2 R1.1 R1 R1.2 3 C1.1 C1 C1.2 4 U2.A", Show(Path(net, "U1.A", "U2.A")));
        Assert.Equal(["X"], nets.Find("X")!.NetNames);
    }

    [Fact]
    public void A_resistor_network_joins_its_pairs_of_pins()
    {
        var nets = BuildWhole(
            Rows("A U1.A RN1.1 2", "B U1.B RN1.2 2", "C RN1.8 U2.A 3", "D RN1.7 U2.B 3"),
            PartsOf("U1.A out", "U1.B out", "U2.A in", "U2.B in", "RN1 1-8", "RN1 2-7"));
        Assert.Equal(["A", "C"], nets.Find("A")!.NetNames);
        Assert.Equal(["B", "D"], nets.Find("B")!.NetNames);
    }

    [Fact]
    public void Rows_without_ends_form_a_chain_in_file_order()
    {
        var nets = BuildWhole(Rows("A - - 1", "A - - 2", "A - - 3"), PartList.Empty);
        var net = nets.Find("A")!;
        var path = new NetTree(net, 0).PathTo(net.Nodes.Length - 1);
        Assert.Equal(" 1 - 2 - 3 -", Show(path));
    }

    [Fact]
    public void A_chain_takes_pins_from_its_first_and_last_row()
    {
        var nets = BuildWhole(Rows("A U1.A - 1", "A - - 2", "A - U2.A 3"), PartList.Empty);
        Assert.Equal("U1.A 1 - 2 - 3 U2.A", Show(Path(nets.Find("A")!, "U1.A", "U2.A")));
    }

    [Fact]
    public void A_chain_without_pins_takes_them_from_the_parts_file()
    {
        var nets = BuildWhole(
            Rows("S - - 1", "T - - 2", "T - - 3"), PartsOf("U2.A in T", "R1 1-2 S T", "U1.A out S"));
        Assert.Equal("U1.A 1 R1.1 R1 R1.2 2 - 3 U2.A", Show(Path(nets.Find("S")!, "U1.A", "U2.A")));
    }

    [Fact]
    public void Two_pins_that_both_drive_and_receive_take_both_ends_of_a_chain()
    {
        var net = BuildWhole(Rows("A - - 1", "A - - 2"), PartsOf("U1.A io A", "U2.A io A")).Find("A")!;
        Assert.Equal("U1.A 1 - 2 U2.A", Show(Path(net, "U1.A", "U2.A")));
    }

    [Fact]
    public void A_loop_is_refused_with_its_rows()
    {
        var (_, problems) = Build(Rows("A U1.A *1 1", "A *1 *2 2", "A *2 U2.A 3", "A *1 *2 4"), PartList.Empty);
        Assert.Equal(
            ["a.csv:5: error: the row of 'A' from '*1' to '*2' closes a loop: the two are joined already, by line 3; a path must be unique; remove a row, or give one of them another label"],
            problems);
    }

    [Fact]
    public void A_loop_of_several_rows_names_them_in_order()
    {
        var (_, problems) = Build(Rows("A U1.A *1 1", "A *1 *2 2", "A *2 *3 3", "A *3 U2.A 1", "A *3 *1 4"), PartList.Empty);
        Assert.Contains("joined already, by line 4 and line 3", Assert.Single(problems), StringComparison.Ordinal);
    }

    [Fact]
    public void A_loop_through_series_parts_is_refused_at_the_part()
    {
        var (_, problems) = Build(Rows("A U1.A *1 1", "A *1 R1.1 2", "A *1 R2.1 3", "B R1.2 R2.2 3"), PartsOf("U1.A out", "R1 1-2", "R2 1-2"));
        Assert.Equal(
            ["p.yaml:3:1: error: the series part 'R2' closes a loop: its pins are joined already, by line 4, line 3, R1 and line 5; a path must be unique; remove one of the ways"],
            problems);
    }

    [Fact]
    public void Rows_that_do_not_connect_are_refused()
    {
        var (_, problems) = Build(Rows("A U1.A *1 1", "A *2 U2.A 2"), PartList.Empty);
        Assert.Equal(
            ["a.csv:3: error: '*2' of 'A' is not connected with 'U1.A'; name the same branch label, such as *1, at the ends that meet"], problems);
    }

    [Fact]
    public void A_row_that_leaves_one_end_open_between_others_is_refused()
    {
        var (_, problems) = Build(Rows("A U1.A *1 1", "A - U2.A 2"), PartList.Empty);
        Assert.Equal(
            ["a.csv:3: error: the row of 'A' leaves 'from' empty, although other rows of the net state both; write both ends in every row, or in none: then the rows form a chain in file order, with pins at its first 'from' and last 'to' only"],
            problems);
    }

    [Fact]
    public void A_row_from_a_point_to_itself_is_refused()
    {
        var (_, problems) = Build(Rows("A U1.A U2.A 1", "A U1.A U1.A 2"), PartList.Empty);
        Assert.Equal(["a.csv:3: error: the row of 'A' starts and ends at 'U1.A'; write two different ends"], problems);
    }

    [Fact]
    public void A_pin_on_two_nets_is_refused()
    {
        var (_, problems) = Build(Rows("A U1.A U2.A 1", "B U1.A U2.B 2"), PartList.Empty);
        Assert.Equal(["a.csv:3: error: the pin 'U1.A' lies on two nets, 'A' and 'B'; a pin lies on one net"], problems);
    }

    [Fact]
    public void Open_ends_are_noted_as_stubs()
    {
        var (nets, problems) = Build(Rows("A U1.A *1 1", "A *1 U2.A 2", "A *1 *2 3"), PartList.Empty);
        Assert.NotNull(nets);
        Assert.Equal(["a.csv:4: note: 'A' ends open at '*2', where no pin is; it counts as a stub"], problems);
    }

    [Fact]
    public void Pins_that_the_parts_file_does_not_state_are_noted_once_per_part()
    {
        var (_, problems) = Build(Rows("A U1.A U2.A 1", "B U1.B U2.B 2", "C U1.C U3.C 2"), PartsOf("U1.A out", "U2.A in", "U2.B in", "R9 1-2"));
        Assert.Equal(
            ["a.csv:3: note: the parts file does not state the pin 'U1.B' and 1 more of its pins; they neither drive nor load",
            "a.csv:4: note: the part 'U3' is not in the parts file, nor 'U3.C'; it neither drives nor loads",
            "p.yaml:4:1: note: the series part 'R9' joins nothing: no row of the length list ends at 'R9.1'"],
            problems);
    }

    [Theory]
    [InlineData("U9.A in B", "p.yaml:1:1: error: the length list has no net 'B'; did you mean 'A'?")]
    [InlineData("U9.A in A", "p.yaml:1:1: error: 'U9.A' is said to lie on 'A', whose rows name other ends; write 'U9.A' as 'from' or 'to' of the row that ends there")]
    [InlineData("U1.A in AB", "p.yaml:1:1: error: the pin 'U1.A' is said to lie on 'AB', but the length list has it on 'A'; remove 'net'")]
    public void A_pin_put_on_a_net_must_fit_the_rows(string part, string expected)
    {
        var (_, problems) = Build(Rows("A U1.A U2.A 1", "AB U3.A U3.B 1"), PartsOf(part));
        Assert.Equal(expected, problems.First(p => p.Contains("error", StringComparison.Ordinal)));
    }

    [Fact]
    public void A_chain_has_two_ends_only()
    {
        var (_, problems) = Build(Rows("A - - 1"), PartsOf("U1.A out A", "U2.A in A", "U3.A in A"));
        Assert.Equal(
            ["p.yaml:3:1: error: the chain 'A' has no end left for 'U3.A': it runs from 'U1.A' to 'U2.A'; write 'from' and 'to' in the rows of a net with more than two pins"],
            problems);
    }

    [Fact]
    public void Stubs_are_what_hangs_on_a_path()
    {
        var net = BuildWhole(
            Rows("A U1.A *1 1", "A *1 U2.A 2", "A *1 *2 3", "A *2 U3.A 4", "A *2 U4.A 5", "A U2.A U5.A 6"),
            PartsOf("U1.A out", "U2.A in", "U3.A in", "U4.A in", "U5.A in")).Find("A")!;
        var stubs = Path(net, "U1.A", "U2.A").Stubs().ToArray();
        Assert.Equal(2, stubs.Length);
        Assert.Equal((1, 3), (stubs[0].Place, stubs[0].Branches.Length));
        Assert.Equal(["U3.A", "U4.A"], stubs[0].Pins.Select(p => net.Nodes[p].Name).Order());
        Assert.Equal((2, 1), (stubs[1].Place, stubs[1].Branches.Length));
        Assert.Equal(["U5.A"], stubs[1].Pins.Select(p => net.Nodes[p].Name));
    }

    [Fact]
    public void The_order_and_direction_of_rows_do_not_change_a_path()
    {
        var rows = new[] { "A U1.A *1 1", "A *1 *2 2", "A *2 *3 3", "A *3 U2.A 4", "A *2 U3.A 5", "A *1 U4.A 6" };
        Gen.Select(Gen.Shuffle(rows), Gen.Bool.Array[rows.Length]).Sample((shuffled, swap) =>
        {
            var turned = shuffled.Select((row, i) => row.Split(' ') is var w && swap[i] ? $"{w[0]} {w[2]} {w[1]} {w[3]}" : row);
            var net = BuildWhole(Rows([.. turned]), PartList.Empty).Find("A")!;
            Assert.Equal("U1.A 1 *1 2 *2 3 *3 4 U2.A", Show(Path(net, "U1.A", "U2.A")));
        }, iter: 200);
    }

    [Fact]
    public void Random_trees_are_accepted_and_one_more_row_makes_a_loop()
    {
        Gen.Int[2, 30].SelectMany(n => Gen.Select(Gen.Int[0, 1000].Array[n], Gen.Int[0, 1000].Array[2])).Sample((parents, extra) =>
        {
            var rows = new List<string>();
            for (var i = 0; i < parents.Length; i++)
                rows.Add($"A U{parents[i] % (i + 1)}.1 U{i + 1}.1 1");
            Assert.Equal(parents.Length, BuildWhole(Rows([.. rows]), PartList.Empty).Find("A")!.Branches.Length);
            var (a, b) = (extra[0] % (parents.Length + 1), extra[1] % (parents.Length + 1));
            rows.Add($"A U{a}.1 U{b}.1 1");
            Assert.Single(Build(Rows([.. rows]), PartList.Empty).Problems);
        }, iter: 300);
    }
}
