using System.Collections.Immutable;
using System.Text;
using CsCheck;
using StackTiming.Nets.Lengths;
using StackTiming.Stackups.Copper;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Nets.Tests.Lengths;

public class LengthListReaderTests
{
    private static (LengthList? List, string[] Problems) Read(string text, LengthListFormat? format = null, StackUp? stackUp = null)
    {
        var problems = new ProblemList();
        var list = LengthListReader.Read(new InputFile("a.csv", text, ""), format ?? LengthListFormat.Own, stackUp, problems);
        Assert.Equal(problems.HasErrors, list is null);
        return (list, [.. problems.Items.Select(p => p.ToString())]);
    }

    private static LengthList ReadWhole(string text, LengthListFormat? format = null)
    {
        var (list, problems) = Read(text, format);
        Assert.Empty(problems);
        return list!;
    }

    private static StackUp FourLayers()
    {
        var copper = new CopperProperties(Quantity.Exact(1.72e-8), Quantity.Exact(0), Quantity.Exact(0));
        CopperLayer Layer(string name, CopperUse use) => new(default, name, Quantity.Exact(35e-6), use, copper, WideFace.Down, Tolerance.None);
        return new StackUp("four", "A", [Layer("L1", CopperUse.Signal), Layer("L2", CopperUse.Plane), Layer("L3", CopperUse.Mixed), Layer("L4", CopperUse.Signal)]);
    }

    [Fact]
    public void A_list_in_the_documented_form_is_read_in_metres()
    {
        var list = ReadWhole(
            """
            net,from,to,kind,layer,length[mm],width[mm],gap[mm],meander-gap[mm],meander-leg[mm],drill[mm],pad[mm],antipad[mm]
            D0,U1.A3,*1,trace,L1,12.5,0.11,0.2,0.3,2,,,
            D0,*1,U2.B4,via,L1>L3,,,,,,0.2,0.45,0.7
            """);
        var net = Assert.Single(list.Nets);
        var trace = list.SegmentsOf(net)[0];
        Assert.Equal(("U1.A3", "*1", "L1", "", 2), (trace.From, trace.To, trace.Layer, trace.ToLayer, trace.Line));
        Assert.Equal(12.5e-3, trace.LengthMetres, 1e-15);
        Assert.Equal(0.11e-3, trace.WidthMetres, 1e-15);
        Assert.Equal(0.2e-3, trace.GapMetres, 1e-15);
        Assert.Equal(0.3e-3, trace.Details.MeanderGapMetres, 1e-15);
        Assert.Equal(2e-3, trace.Details.MeanderLegMetres, 1e-15);
        var via = list.SegmentsOf(net)[1];
        Assert.Equal((SegmentKind.Via, "L1", "L3"), (via.Kind, via.Layer, via.ToLayer));
        Assert.Equal(0.2e-3, via.Details.DrillMetres, 1e-15);
        Assert.Equal(0.45e-3, via.Details.PadMetres, 1e-15);
        Assert.Equal(0.7e-3, via.Details.AntipadMetres, 1e-15);
        Assert.Equal("a.csv:3", list.PositionOf(via).ToString());
    }

    [Theory]
    [InlineData("length[m]", "0.0125")]
    [InlineData("length[cm]", "1.25")]
    [InlineData("length[mm]", "12.5")]
    [InlineData("length[mm]", "1.25e1")]
    [InlineData("length[mm]", "+12.5")]
    [InlineData("length[mm]", " 12.5 ")]
    [InlineData("length[mm]", "12.500000000000000000")]
    [InlineData("length[mm]", "12.5 mm")]
    [InlineData("length", "12.5mm")]
    [InlineData("length[um]", "12500")]
    [InlineData("length[µm]", "12500")]
    [InlineData("length[nm]", "12500000")]
    [InlineData("length[in]", "0.492125984251968504")]
    [InlineData("length (mil)", "492.125984251968504")]
    [InlineData("LENGTH [MIL]", "492.125984251968504")]
    public void Every_unit_gives_the_same_length(string header, string cell)
    {
        var list = ReadWhole($"net,layer,width[mm],{header}\nA,L1,0.1,{cell}\n");
        Assert.Equal(0.0125, list.Segments[0].LengthMetres, 1e-15);
    }

    [Theory]
    [InlineData(",")]
    [InlineData(";")]
    [InlineData("\t")]
    [InlineData("|")]
    public void The_separator_and_the_order_of_columns_do_not_matter(string separator)
    {
        var text = "width[mm],net,length[mm],layer\n0.1,A,5,L1\n".Replace(",", separator, StringComparison.Ordinal);
        Assert.Equal(5e-3, ReadWhole(text).Segments[0].LengthMetres, 1e-15);
    }

    [Fact]
    public void Quoted_cells_keep_separators_and_quotes()
    {
        var list = ReadWhole("net,layer,\"length[mm]\",width[mm]\n\"A, \"\"B\"\"\",L1,\"5\",0.1\n");
        Assert.Equal("A, \"B\"", list.Nets[0].Name);
    }

    [Fact]
    public void Rows_of_a_net_are_gathered_in_file_order_wherever_they_stand()
    {
        var list = ReadWhole("net,layer,length[mm],width[mm]\nA,L1,1,0.1\nB,L1,2,0.1\nA,L1,3,0.1\nB,L1,4,0.1\n");
        Assert.Equal(["A", "B"], list.Nets.Select(n => n.Name));
        Assert.Equal([1e-3, 3e-3], list.SegmentsOf(list.Nets[0]).ToArray().Select(s => s.LengthMetres));
        Assert.Equal([2e-3, 4e-3], list.SegmentsOf(list.Find("B")!.Value).ToArray().Select(s => s.LengthMetres));
        Assert.Null(list.Find("C"));
    }

    [Fact]
    public void Two_layers_say_that_a_row_is_a_via()
    {
        Assert.Equal(SegmentKind.Via, ReadWhole("net,layer,length[mm],width[mm]\nA,L1 > L3,,\n").Segments[0].Kind);
    }

    [Fact]
    public void Blank_lines_and_rows_of_separators_are_passed_over_and_lines_still_count()
    {
        var list = ReadWhole("\n\nnet,layer,length[mm],width[mm]\n\n,,,\nA,L1,1,0.1\n,,,\n");
        Assert.Equal(6, list.Segments[0].Line);
    }

    [Fact]
    public void Several_files_make_one_list()
    {
        var problems = new ProblemList();
        var list = LengthListReader.Read(
            [
                (new InputFile("a.csv", "net,layer,length[mm],width[mm]\nA,L1,1,0.1\n", ""), LengthListFormat.Own),
                (new InputFile("b.csv", "net,layer,length[mil],width[mil]\nB,L1,1,4\nA,L1,1,4\n", ""), LengthListFormat.Own),
            ],
            null,
            problems);
        Assert.False(problems.HasErrors);
        Assert.Equal(["a.csv:2", "b.csv:3", "b.csv:2"], list!.Segments.ToArray().Select(s => list.PositionOf(s).ToString()));
    }

    [Fact]
    public void A_foreign_report_is_read_as_it_is()
    {
        var format = LengthListFormat.Own with
        {
            Columns = new Dictionary<LengthColumn, ForeignHeader>
            {
                [LengthColumn.Net] = new(default, "Signal", null),
                [LengthColumn.Length] = new(default, "Routed (mil)", null),
                [LengthColumn.From] = new(default, "Start", null),
                [LengthColumn.To] = new(default, "End", null),
                [LengthColumn.Width] = new(default, "W", 2.54e-5),
            }.ToImmutableDictionary(),
            DefaultLayer = "TOP",
            LayerNames = ImmutableDictionary<string, string>.Empty.Add("TOP", "L1"),
            SkipLines = 2,
            PinSeparator = '-',
            DecimalComma = true,
        };
        var list = ReadWhole("Length report\n\"made, today\"\nSignal;Start;End;W;Class;Routed (mil)\nA;U1-3;U2-4;4,5;fast;1000,5\n", format);
        var segment = list.Segments[0];
        Assert.Equal(("U1.3", "U2.4", "L1", 4), (segment.From, segment.To, segment.Layer, segment.Line));
        Assert.Equal(1000.5 * 2.54e-5, segment.LengthMetres, 1e-15);
        Assert.Equal(4.5 * 2.54e-5, segment.WidthMetres, 1e-15);
    }

    [Theory]
    [InlineData("", "a.csv: error: the file is empty; write a header such as net,from,to,kind,layer,length[mm],width[mm], then one row per segment")]
    [InlineData(" \n\n", "a.csv: error: the file is empty; write a header such as net,from,to,kind,layer,length[mm],width[mm], then one row per segment")]
    [InlineData("net,layer,length[mm],width[mm]\n", "a.csv: error: the file has a header but no rows; write one row per segment")]
    [InlineData("nett,layer,length[mm],width[mm]\nA,L1,1,1\n", "a.csv:1:1: error: unknown column 'nett'; did you mean 'net'?",
        "a.csv:1: error: the column 'net' is missing; write a header such as net,from,to,kind,layer,length[mm],width[mm]")]
    [InlineData("net,layer,length[mm]\nA,L1,1\nA,L1,1\n",
        "a.csv:1: error: the column 'width' is missing; write a header such as net,from,to,kind,layer,length[mm],width[mm]")]
    [InlineData("net,layer,length,width[mm]\nA,L1,1,0.1\nA,L1,1,0.1\n",
        "a.csv:1:11: error: 'length' has no unit; write length[mm] in the header; units are m, cm, mm, um, nm, in, mil")]
    [InlineData("net,layer,length[furlong],width[mm]\nA,L1,1,0.1\n",
        "a.csv:1:11: error: 'furlong' is not a unit of length; write length[mm]; units are m, cm, mm, um, nm, in, mil")]
    [InlineData("net,layer,length[mm],width[mm],net\nA,L1,1,0.1,B\n", "a.csv:1:32: error: two columns have the header 'net'; remove one of them")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,12 mil,0.1\n",
        "a.csv:2:6: error: 'length' says '12 mil', another unit than its header; use the header's unit in every cell, without writing it")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,12 parsec,0.1\n",
        "a.csv:2:6: error: 'length' says '12 parsec', which is not a length; units are m, cm, mm, um, nm, in, mil")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,NaN,0.1\n", "a.csv:2:6: error: 'length' says 'NaN', which is not a number; write a number such as 12.5")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,1e999,0.1\n", "a.csv:2:6: error: 'length' says '1e999', which is not a number; write a number such as 12.5")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,-3,0.1\n",
        "a.csv:2:6: error: 'length' must be above zero, but it says '-3'; leave the row out if nothing is routed")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,0,0.1\n",
        "a.csv:2:6: error: 'length' must be above zero, but it says '0'; leave the row out if nothing is routed")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,123456,0.1\n",
        "a.csv:2:6: error: 'length' says '123456': more than 20 m, which no board has; check the unit in the header")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,1,110\n",
        "a.csv:2:8: error: 'width' says '110': more than 0.1 m, which no board has; check the unit in the header")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,\"1,234.5\",0.1\n",
        "a.csv:2:6: error: 'length' says '1,234.5', which is not a number; write a decimal point and no thousands separator, or 'decimal: comma' in the board file")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,,0.1\n", "a.csv:2:6: error: 'length' is empty; every trace needs its length")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,1,\n", "a.csv:2:8: error: 'width' is empty; every trace needs its width")]
    [InlineData("net,layer,length[mm],width[mm]\n,L1,1,0.1\n", "a.csv:2:1: error: 'net' is empty; write the net's name in every row")]
    [InlineData("net,layer,length[mm],width[mm]\nA,,1,0.1\n", "a.csv:2:3: error: 'layer' is empty; write a layer such as L1, or L1>L3 for a via")]
    [InlineData("net,layer,length[mm],width[mm]\nA,L1,1,0.1,9\n",
        "a.csv:2:12: error: the row has 5 cells, the header 4; quote cells that hold the separator")]
    [InlineData("net,from,to,layer,length[mm],width[mm]\nA,U1,*1,L1,1,0.1\n",
        "a.csv:2:3: error: 'from' says 'U1', which is neither a pin nor a branch label; write a pin such as U1.A3 or a branch label such as *1")]
    [InlineData("net,kind,layer,length[mm],width[mm]\nA,vai,L1>L3,,\n", "a.csv:2:3: error: 'kind' cannot be 'vai'; it can be trace, via")]
    [InlineData("net,kind,layer,length[mm],width[mm]\nA,trace,L1>L3,1,0.1\n",
        "a.csv:2:3: error: a trace lies on one layer, but 'layer' names two; write via in 'kind', or one layer")]
    [InlineData("net,kind,layer,length[mm],width[mm]\nA,via,L1,,\n",
        "a.csv:2:7: error: a via joins two layers, but 'layer' says only 'L1'; write both, such as L1>L3")]
    [InlineData("net,kind,layer,length[mm],width[mm]\nA,via,L1>L1,,\n",
        "a.csv:2:7: error: a via from 'L1' to the same layer joins nothing; write two different layers, such as L1>L3")]
    [InlineData("net,layer,length[mm],width[mm],drill[mm],pad[mm]\nA,L1>L3,,,0.5,0.4\n",
        "a.csv:2:15: error: 'pad' must be larger than 'drill'; check both diameters")]
    [InlineData("net,layer,length[mm],width[mm],meander-gap[mm],meander-leg[mm]\nA,L1,1,0.1,0.3,\n",
        "a.csv:2:16: error: a meander needs both 'meander-gap' and 'meander-leg'; 'meander-leg' is empty; fill both or neither")]
    public void Wrong_input_is_refused_with_its_place_and_what_to_write(string text, params string[] expected)
    {
        Assert.Equal(expected, Read(text).Problems);
    }

    [Fact]
    public void Every_problem_of_a_file_is_found_in_one_run()
    {
        var (_, problems) = Read("net,layer,length[mm],width[mm]\nA,L1,x,0.1\nB,L1,1,y\nC,L1,-1,-2\n");
        Assert.Equal(["a.csv:2:6", "a.csv:3:8", "a.csv:4:6", "a.csv:4:9"], problems.Select(p => p[..p.IndexOf(": ", StringComparison.Ordinal)]));
    }

    [Fact]
    public void Places_are_right_behind_cells_that_span_lines()
    {
        var (_, problems) = Read("net,layer,length[mm],width[mm]\n\"A\nB\",L1,1,y\n");
        Assert.Equal(
            ["a.csv:2:1: error: 'net' holds a control character; check the separators and quotes of the row",
            "a.csv:3:9: error: 'width' says 'y', which is not a number; write a number such as 12.5"],
            problems);
    }

    [Fact]
    public void Layers_are_compared_with_the_stack_up_and_reported_once()
    {
        var (_, problems) = Read("net,layer,length[mm],width[mm]\nA,L9,1,0.1\nA,L9,1,0.1\nA,L2,1,0.1\nA,L2,1,0.1\nA,L1>L2,,\nA,L3,1,0.1\n", null, FourLayers());
        Assert.Equal(
            ["a.csv:2:3: error: the stack-up 'four' has no copper layer 'L9'; did you mean 'L1'?",
            "a.csv:4:3: error: a trace cannot run on 'L2', which the stack-up uses as a plane; say 'use: mixed' in the stack-up if it carries both"],
            problems);
    }

    [Fact]
    public void A_foreign_header_that_is_not_there_is_reported_where_the_board_file_names_it()
    {
        var format = LengthListFormat.Own with
        {
            Columns = ImmutableDictionary<LengthColumn, ForeignHeader>.Empty.Add(
                LengthColumn.Length, new ForeignHeader(new FilePosition("board.yaml", 7, 3), "Routed (mil)", null)),
        };
        var (_, problems) = Read("net,layer,Routd (mil),width[mm]\nA,L1,1,0.1\n", format);
        Assert.Equal(["board.yaml:7:3: error: no column of a.csv has the header 'Routed (mil)'; did you mean 'Routd (mil)'?"], problems);
    }

    [Fact]
    public void A_field_of_a_million_characters_is_refused_with_a_short_message()
    {
        var (_, problems) = Read($"net,layer,length[mm],width[mm]\n{new string('A', 1_000_000)},L1,1,0.1\nA,L1,{new string('7', 1_000_000)},0.1\nA,{new string('L', 1_000_000)},1,0.1\n");
        Assert.Equal(3, problems.Length);
        Assert.Equal("a.csv:2:1: error: 'net' is 1000000 characters long; a name has at most 256; check the separators and quotes of the row", problems[0]);
        Assert.All(problems, p => Assert.InRange(p.Length, 1, 300));
    }

    [Fact]
    public void A_file_with_very_many_problems_keeps_the_first_and_counts_the_rest()
    {
        var text = new StringBuilder("net,layer,length[mm],width[mm]\n");
        for (var i = 0; i < 1000; i++)
            text.Append("A,L1,x,0.1\n");
        var problems = new ProblemList();
        Assert.Null(LengthListReader.Read(new InputFile("a.csv", text.ToString(), ""), LengthListFormat.Own, null, problems));
        Assert.Equal((ProblemList.Capacity, 800, 1000), (problems.Items.Count, problems.Omitted, problems.ErrorCount));
    }

    [Fact]
    public void The_length_of_a_via_row_is_noted_as_unused()
    {
        var (list, problems) = Read("net,layer,length[mm],width[mm]\nA,L1>L3,1.6,\nA,L1>L3,1.6,\n");
        Assert.NotNull(list);
        Assert.Equal(["a.csv:2:9: note: the length of a via follows from the stack-up; what its rows say is not used"], problems);
    }

    [Fact]
    public void No_text_makes_the_reader_throw()
    {
        var pieces = Gen.OneOf<string>("net", "layer", "length[mm]", "width[mm]", ",", ";", "\t", "\"", "\n", "\r", "\r\n", "L1", "L1>L2", ">", "*1", "U1.A", ".", "1", "-1", "1e9", "NaN", "mm", "\0", "\ufeff", "é", "[", ")", " ");
        Gen.OneOf(Gen.String, pieces.Array[0, 60].Select(string.Concat), pieces.Array[0, 60].Select(p => "net,layer,length[mm],width[mm]\n" + string.Concat(p)))
            .Sample(text => Read(text), iter: 5000);
    }

    [Fact]
    public void Lengths_written_with_the_invariant_format_come_back_exactly()
    {
        Gen.Double[1e-6, 19].Sample(metres =>
        {
            var list = ReadWhole(string.Create(System.Globalization.CultureInfo.InvariantCulture, $"net,layer,length[m],width[mm]\nA,L1,{metres:R},0.1\n"));
            Assert.Equal(metres, list.Segments[0].LengthMetres);
        });
    }

    [Fact]
    public void A_file_in_UTF_16_reads_like_one_in_UTF_8()
    {
        const string text = "net,layer,length[µm],width[mm]\nÄ1,L1,5000,0.1\n";
        foreach (var encoding in new[] { Encoding.Unicode, Encoding.BigEndianUnicode, Encoding.UTF8 })
        {
            var problems = new ProblemList();
            var file = InputFileLoader.Decode("a.csv", [.. encoding.GetPreamble(), .. encoding.GetBytes(text)], problems);
            var list = LengthListReader.Read(file!, LengthListFormat.Own, null, problems);
            Assert.Empty(problems.Items);
            Assert.Equal("Ä1", list!.Nets[0].Name);
            Assert.Equal(5e-3, list.Segments[0].LengthMetres, 1e-15);
        }
    }

    [Fact]
    public void Memory_grows_linearly_with_the_rows()
    {
        // Allocated bytes do not depend on the machine's load, as time would.
        static double BytesPerNet(int nets)
        {
            var text = new StringBuilder("net,from,to,layer,length[mm],width[mm]\n");
            for (var i = 0; i < nets; i++)
                text.Append(System.Globalization.CultureInfo.InvariantCulture, $"N{i:000000},U1.P{i:000000},*1,L1,5,0.1\nN{i:000000},*1,U2.P{i:000000},L1,5,0.1\n");
            var file = new InputFile("a.csv", text.ToString(), "");
            var problems = new ProblemList();
            var before = GC.GetAllocatedBytesForCurrentThread();
            LengthListReader.Read(file, LengthListFormat.Own, null, problems);
            Assert.Empty(problems.Items);
            return (GC.GetAllocatedBytesForCurrentThread() - before) / (double)nets;
        }

        BytesPerNet(100);
        Assert.InRange(BytesPerNet(32_000) / BytesPerNet(8_000), 0.5, 1.3);
        Assert.InRange(BytesPerNet(32_000), 100, 600);
    }

    private static string LargeList(int rows)
    {
        var text = new StringBuilder("\n\r\nnet,from,to,layer,length[mm],width[mm]\r\n");
        for (var i = 0; i < rows; i++)
        {
            // Nets come back after others, and pieces of the file end inside nets.
            text.Append(System.Globalization.CultureInfo.InvariantCulture, $"N{i / 3 % 5000:0000},*{i % 3},*{(i % 3) + 1},L{(i % 4) + 1},{1 + (i % 997)},0.{100 + (i % 7)}{(i % 2 == 0 ? "\r\n" : "\n")}");
            if (i % 1000 == 0)
                text.Append(i % 2000 == 0 ? "\n" : ",,,,,\n");
        }
        return text.ToString();
    }

    [Fact]
    public void A_large_list_is_the_same_read_in_pieces_or_in_one()
    {
        var text = LargeList(60_000);
        Assert.True(text.Length > 1_500_000);
        var inPieces = ReadWhole(text);
        // A quote in a place where it changes nothing keeps the text in one piece.
        var inOne = ReadWhole(text.Replace(",from,", ",\"from\",", StringComparison.Ordinal));
        Assert.Equal(inOne.Nets, inPieces.Nets);
        Assert.Equal(inOne.Segments.ToArray(), inPieces.Segments.ToArray());
        var lines = text.Split('\n');
        foreach (var segment in inPieces.Segments)
            Assert.Contains($",L{segment.Layer[1..]},{Math.Round(1e3 * segment.LengthMetres)},", lines[segment.Line - 1], StringComparison.Ordinal);
    }

    [Fact]
    public void Problems_of_a_large_list_are_reported_as_in_a_small_one()
    {
        var lines = LargeList(60_000).Split('\n');
        (lines[10], lines[50_000]) = ("A,*1,*2,L1,x,0.1", "A,*1,*2,L9,1,0.1");
        var (_, problems) = Read(string.Join('\n', lines), null, FourLayers());
        Assert.Equal("a.csv:6:13: error: a trace cannot run on 'L2', which the stack-up uses as a plane; say 'use: mixed' in the stack-up if it carries both", problems[0]);
        Assert.Equal("a.csv:11:12: error: 'length' says 'x', which is not a number; write a number such as 12.5", problems[1]);
        Assert.StartsWith("a.csv:50001:9: error: the stack-up 'four' has no copper layer 'L9'", problems[2], StringComparison.Ordinal);
        Assert.Equal(3, problems.Length);
    }
}
