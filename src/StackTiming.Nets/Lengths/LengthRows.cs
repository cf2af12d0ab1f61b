using nietras.SeparatedValues;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Lengths;

/// <summary>Turns the rows of one length list into segments. Texts become strings only when they are seen for the first time.</summary>
internal sealed class LengthRows
{
    private readonly HeaderRow header;
    private readonly FilePosition headerAt;
    private readonly LengthListFormat format;
    private readonly LengthListBuilder builder;
    private readonly ProblemList problems;
    private readonly LayerCells layers;
    private readonly EndNames ends;
    private readonly CellReader cells;
    private readonly short fileIndex;
    private readonly double[] defaults = new double[LengthColumns.Names.Length];
    private readonly bool[] missingReported = new bool[LengthColumns.Names.Length];
    private bool viaLengthNoted;
    private string lastName = "";
    private int lastNet = -1;
    private SegmentDetails lastHole = SegmentDetails.None;

    public LengthRows(
        HeaderRow header, FilePosition headerAt, LengthListFormat format, LengthListBuilder builder, short fileIndex, LayerCells layers,
        ProblemList problems)
    {
        (this.header, this.headerAt, this.format, this.builder, this.fileIndex, this.layers, this.problems) =
            (header, headerAt, format, builder, fileIndex, layers, problems);
        ends = new EndNames(format.PinSeparator);
        cells = new CellReader(header, headerAt.File, format, problems);
        foreach (var (column, metres) in format.Defaults)
            defaults[(int)column] = metres;
    }

    /// <summary>Reads a row; a wrong one is reported and left out.</summary>
    /// <param name="row">The row.</param>
    /// <param name="line">Line at which it starts, from 1.</param>
    public void Add(SepReader.Row row, int line)
    {
        cells.Line = line;
        if (row.ColCount > header.CellCount && row[header.CellCount].Span is var extra && !extra.IsWhiteSpace())
        {
            problems.Error(
                cells.PositionOf(row, extra), $"the row has {row.ColCount} cells, the header {header.CellCount}", "quote cells that hold the separator");
            return;
        }
        // Spreadsheets end their exports with rows of separators.
        var name = cells.TextOf(row, LengthColumn.Net);
        if (name.Length == 0 && IsBlank(row))
            return;
        var before = problems.ErrorCount;
        var net = NetOf(row, name);
        var from = EndOf(row, LengthColumn.From);
        var to = EndOf(row, LengthColumn.To);
        var layer = LayerOf(row);
        var kind = KindOf(row, layer);
        var segment = kind == SegmentKind.Via ? ViaOf(row, from, to, layer) : TraceOf(row, from, to, layer);
        if (net >= 0 && problems.ErrorCount == before)
            builder.Add(net, segment);
    }

    private static bool IsBlank(SepReader.Row row)
    {
        for (var i = 0; i < row.ColCount; i++)
        {
            if (!row[i].Span.IsWhiteSpace())
                return false;
        }
        return true;
    }

    private Segment TraceOf(SepReader.Row row, string from, string to, LayerCell layer)
    {
        if (layer.First.Length > 0 && layers.IsPlane(layer.First))
            layers.CheckTrace(layer.First, cells.PositionOf(row, LengthColumn.Layer));
        var segment = new Segment
        {
            Kind = SegmentKind.Trace,
            From = from,
            To = to,
            Layer = layer.First,
            ToLayer = "",
            LengthMetres = Needed(row, LengthColumn.Length),
            WidthMetres = Needed(row, LengthColumn.Width),
            GapMetres = Optional(row, LengthColumn.Gap),
            Details = DetailsOf(row),
            Line = cells.Line,
            FileIndex = fileIndex,
        };
        CheckDetails(row, segment);
        return segment;
    }

    private Segment ViaOf(SepReader.Row row, string from, string to, LayerCell layer)
    {
        if (layer is { First.Length: > 0, Second.Length: 0 })
        {
            problems.Error(
                cells.PositionOf(row, LengthColumn.Layer), $"a via joins two layers, but 'layer' says only '{Suggestion.Shorten(layer.First)}'",
                "write both, such as L1>L3");
        }
        if (!viaLengthNoted && Optional(row, LengthColumn.Length) > 0)
        {
            viaLengthNoted = true;
            problems.Note(
                cells.PositionOf(row, LengthColumn.Length), "the length of a via follows from the stack-up; what its rows say is not used");
        }
        var barrel = BarrelOf(row);
        var hole = new SegmentDetails
        {
            BarrelFirst = barrel.First,
            BarrelSecond = barrel.Second,
            DrillMetres = Optional(row, LengthColumn.Drill),
            PadMetres = Optional(row, LengthColumn.Pad),
            AntipadMetres = Optional(row, LengthColumn.Antipad),
        };
        if (hole != lastHole)
        {
            lastHole = hole;
            CheckLarger(row, hole.PadMetres, LengthColumn.Pad, hole.DrillMetres, LengthColumn.Drill);
            CheckLarger(row, hole.AntipadMetres, LengthColumn.Antipad, Math.Max(hole.PadMetres, hole.DrillMetres), LengthColumn.Pad);
        }
        return new Segment
        {
            Kind = SegmentKind.Via,
            From = from,
            To = to,
            Layer = layer.First,
            ToLayer = layer.Second,
            Details = lastHole,
            Line = cells.Line,
            FileIndex = fileIndex,
        };
    }

    private SegmentDetails DetailsOf(SepReader.Row row)
    {
        var meanderGap = Optional(row, LengthColumn.MeanderGap);
        var meanderLeg = Optional(row, LengthColumn.MeanderLeg);
        var neighbour = NeighbourOf(row);
        if (meanderGap is 0 && meanderLeg is 0 && neighbour.Length == 0)
            return SegmentDetails.None;
        return new SegmentDetails
        {
            MeanderGapMetres = meanderGap,
            MeanderLegMetres = meanderLeg,
            Neighbour = neighbour,
            NeighbourGapMetres = Optional(row, LengthColumn.NeighbourGap),
            NeighbourLengthMetres = Optional(row, LengthColumn.NeighbourLength),
        };
    }

    private void CheckDetails(SepReader.Row row, in Segment segment)
    {
        var details = segment.Details;
        if (details.MeanderGapMetres is 0 != details.MeanderLegMetres is 0)
        {
            var absent = details.MeanderGapMetres > 0 ? LengthColumn.MeanderLeg : LengthColumn.MeanderGap;
            problems.Error(
                cells.PositionOf(row, absent), $"a meander needs both 'meander-gap' and 'meander-leg'; '{LengthColumns.NameOf(absent)}' is empty",
                "fill both or neither");
        }
        if (details.NeighbourLengthMetres > segment.LengthMetres)
        {
            problems.Error(
                cells.PositionOf(row, LengthColumn.NeighbourLength), "'neighbour-length' is longer than the trace itself",
                "write the length over which the two run side by side");
        }
    }

    private void CheckLarger(SepReader.Row row, double outer, LengthColumn outerColumn, double inner, LengthColumn innerColumn)
    {
        if (outer > 0 && inner > 0 && outer <= inner)
        {
            problems.Error(
                cells.PositionOf(row, outerColumn),
                $"'{LengthColumns.NameOf(outerColumn)}' must be larger than '{LengthColumns.NameOf(innerColumn)}'", "check both diameters");
        }
    }

    private int NetOf(SepReader.Row row, ReadOnlySpan<char> text)
    {
        if (text.Length == 0)
        {
            if (header.PlaceOf(LengthColumn.Net) >= 0)
                problems.Error(cells.PositionOf(row, LengthColumn.Net), "'net' is empty", "write the net's name in every row");
            return -1;
        }
        if (text.SequenceEqual(lastName))
            return lastNet;
        var net = builder.Find(text);
        if (net < 0)
        {
            if (EndNames.ObjectionTo(text) is { } objection)
            {
                problems.Error(cells.PositionOf(row, LengthColumn.Net), $"'net' {objection}", "check the separators and quotes of the row");
                return -1;
            }
            net = builder.AddNet(text.ToString());
        }
        (lastName, lastNet) = (builder.NameOf(net), net);
        return net;
    }

    private string EndOf(SepReader.Row row, LengthColumn column)
    {
        var text = cells.TextOf(row, column);
        if (text.Length == 0)
            return "";
        var name = ends.EndOf(text, out var objection);
        if (objection is not null)
        {
            problems.Error(
                cells.PositionOf(row, column), $"'{LengthColumns.NameOf(column)}' {objection}",
                $"write a pin such as U1{format.PinSeparator}A3 or a branch label such as *1");
        }
        return name;
    }

    private string NeighbourOf(SepReader.Row row)
    {
        var text = cells.TextOf(row, LengthColumn.Neighbour);
        if (text.Length == 0)
            return "";
        // Most neighbours are nets of the list: share their strings.
        if (builder.Find(text) is >= 0 and var net)
            return builder.NameOf(net);
        var name = EndNames.NetOf(text, out var objection);
        if (objection is not null)
            problems.Error(cells.PositionOf(row, LengthColumn.Neighbour), $"'neighbour' {objection}", "write the name of a net");
        return name;
    }

    private LayerCell LayerOf(SepReader.Row row)
    {
        var text = cells.TextOf(row, LengthColumn.Layer);
        if (text.Length == 0 && format.DefaultLayer is { } standard)
            text = standard;
        if (text.Length > 0)
            return LayersIn(text, row, LengthColumn.Layer);
        if (header.PlaceOf(LengthColumn.Layer) >= 0)
            problems.Error(cells.PositionOf(row, LengthColumn.Layer), "'layer' is empty", "write a layer such as L1, or L1>L3 for a via");
        return new LayerCell("", "");
    }

    private LayerCell BarrelOf(SepReader.Row row)
    {
        var text = cells.TextOf(row, LengthColumn.Barrel);
        if (text.Length == 0)
            return new LayerCell("", "");
        var barrel = LayersIn(text, row, LengthColumn.Barrel);
        if (barrel is { First.Length: > 0, Second.Length: 0 })
            problems.Error(cells.PositionOf(row, LengthColumn.Barrel), "'barrel' needs the two layers between which the hole is drilled", "write both, such as L1>L3");
        return barrel;
    }

    private LayerCell LayersIn(ReadOnlySpan<char> text, SepReader.Row row, LengthColumn column)
    {
        if (layers.TryGet(text, out var cell))
            return cell;
        var at = cells.PositionOf(row, column);
        if (EndNames.ObjectionTo(text) is not { } objection)
            return layers.Add(text.ToString(), at);
        problems.Error(at, $"'{LengthColumns.NameOf(column)}' {objection}", "check the separators and quotes of the row");
        return new LayerCell("", "");
    }

    private SegmentKind KindOf(SepReader.Row row, LayerCell layer)
    {
        var text = cells.TextOf(row, LengthColumn.Kind);
        // Two layers say it as clearly as the word does.
        if (text.Length == 0)
            return layer.Second.Length > 0 ? SegmentKind.Via : SegmentKind.Trace;
        if (text.Equals("via", StringComparison.OrdinalIgnoreCase))
            return SegmentKind.Via;
        if (!text.Equals("trace", StringComparison.OrdinalIgnoreCase))
        {
            problems.Error(
                cells.PositionOf(row, LengthColumn.Kind), $"'kind' cannot be '{Suggestion.Shorten(text.ToString())}'",
                Suggestion.For(text.ToString(), ["trace", "via"]));
            return layer.Second.Length > 0 ? SegmentKind.Via : SegmentKind.Trace;
        }
        if (layer.Second.Length > 0)
            problems.Error(cells.PositionOf(row, LengthColumn.Kind), "a trace lies on one layer, but 'layer' names two", "write via in 'kind', or one layer");
        return SegmentKind.Trace;
    }

    private double Needed(SepReader.Row row, LengthColumn column)
    {
        var value = cells.MetresOf(row, column);
        if (value is not 0)
            return value;
        if (defaults[(int)column] is > 0 and var standard)
            return standard;
        if (header.PlaceOf(column) >= 0)
        {
            problems.Error(
                cells.PositionOf(row, column), $"'{LengthColumns.NameOf(column)}' is empty", $"every trace needs its {LengthColumns.NameOf(column)}");
        }
        else if (!missingReported[(int)column])
        {
            missingReported[(int)column] = true;
            HeaderRow.ReportMissing(column, format, headerAt, problems);
        }
        return 0;
    }

    private double Optional(SepReader.Row row, LengthColumn column)
    {
        var value = cells.MetresOf(row, column);
        return value is 0 ? defaults[(int)column] : value;
    }
}
