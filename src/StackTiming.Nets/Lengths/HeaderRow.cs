using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Lengths;

/// <summary>Where the columns of one length list stand, and their units.</summary>
internal sealed class HeaderRow
{
    private readonly int[] places;
    private readonly double[] unitMetres;
    private readonly FilePosition[] positions;

    private HeaderRow(int cellCount)
    {
        CellCount = cellCount;
        places = new int[LengthColumns.Names.Length];
        Array.Fill(places, -1);
        unitMetres = new double[places.Length];
        Array.Fill(unitMetres, double.NaN);
        positions = new FilePosition[places.Length];
    }

    /// <summary>Number of cells in the header.</summary>
    public int CellCount { get; }

    /// <summary>Which cell of a row holds the column, or −1.</summary>
    public int PlaceOf(LengthColumn column) => places[(int)column];

    /// <summary>The column's unit in metres; NaN where the header states none, so that every cell has to.</summary>
    public double UnitMetres(LengthColumn column) => unitMetres[(int)column];

    /// <summary>Where the column's header stands.</summary>
    public FilePosition PositionOf(LengthColumn column) => positions[(int)column];

    /// <summary>Finds the columns.</summary>
    /// <param name="cells">The header's cells with their places.</param>
    /// <param name="format">Foreign headers and default units.</param>
    /// <param name="rowAt">Where the header row stands.</param>
    /// <param name="problems">Where problems go.</param>
    public static HeaderRow Read(
        IReadOnlyList<(HeaderText Text, FilePosition At)> cells, LengthListFormat format, FilePosition rowAt, ProblemList problems)
    {
        var header = new HeaderRow(cells.Count);
        var taken = new bool[cells.Count];
        foreach (var (column, foreign) in format.Columns.OrderBy(c => c.Key))
        {
            var found = -1;
            for (var i = 0; i < cells.Count; i++)
            {
                if (!cells[i].Text.Matches(foreign.Header))
                    continue;
                if (found >= 0)
                    problems.Error(cells[i].At, $"two columns have the header '{Suggestion.Shorten(foreign.Header)}'", "rename one of them");
                else
                    found = i;
                taken[i] = true;
            }
            if (found >= 0)
                header.Place(column, found, cells[found], foreign.UnitMetres, format.Units, problems);
            else
            {
                problems.Error(
                    foreign.At,
                    $"no column of {rowAt.File} has the header '{Suggestion.Shorten(foreign.Header)}'",
                    Suggestion.For(foreign.Header, cells.Select(c => c.Text.Full).Where(t => t.Length > 0)));
            }
        }
        for (var i = 0; i < cells.Count; i++)
        {
            if (taken[i] || cells[i].Text.Full.Length == 0)
                continue;
            var (text, at) = cells[i];
            if (LengthColumns.Find(text.Name) is not { } column)
            {
                if (format.Columns.IsEmpty)
                    problems.Error(at, $"unknown column '{Suggestion.Shorten(text.Full)}'", Suggestion.For(text.Name, LengthColumns.Names));
            }
            else if (header.PlaceOf(column) < 0)
                header.Place(column, i, cells[i], null, format.Units, problems);
            else if (format.Columns.IsEmpty)
                problems.Error(at, $"two columns have the header '{text.Name}'", "remove one of them");
        }
        if (header.PlaceOf(LengthColumn.Net) < 0)
            ReportMissing(LengthColumn.Net, format, rowAt, problems);
        if (header.PlaceOf(LengthColumn.Layer) < 0 && format.DefaultLayer is null)
            ReportMissing(LengthColumn.Layer, format, rowAt, problems);
        return header;
    }

    private void Place(
        LengthColumn column, int place, (HeaderText Text, FilePosition At) cell, double? statedUnit, DefaultUnits units, ProblemList problems)
    {
        places[(int)column] = place;
        positions[(int)column] = cell.At;
        var name = LengthColumns.NameOf(column);
        if (!LengthColumns.IsLength(column))
        {
            if (cell.Text.Unit is { } needless && LengthUnit.FactorOf(needless) is not null)
                problems.Error(cell.At, $"'{name}' has no unit", $"write {name} without [{needless}]");
            return;
        }
        double? own = cell.Text.Unit is { } unit ? LengthUnit.FactorOf(unit) : null;
        if (statedUnit is null && cell.Text.Unit is { } unknown && own is null)
        {
            problems.Error(
                cell.At, $"'{Suggestion.Shorten(unknown)}' is not a unit of length", $"write {name}[mm]; units are {LengthUnit.Accepted}");
            // The cells are read all the same, so that their other problems show in the same run.
            own = 1e-3;
        }
        if (statedUnit is { } stated && own is { } contrary && stated != contrary)
        {
            problems.Error(
                cell.At, $"the board file gives '{name}' another unit than the header '{Suggestion.Shorten(cell.Text.Full)}'", "remove one of the two");
        }
        if ((statedUnit ?? own) is { } factor)
            unitMetres[(int)column] = factor;
        else if (units.Factors.TryGetValue(Dimension.Length, out var standard))
            unitMetres[(int)column] = standard;
    }

    /// <summary>Reports a column that the file lacks although its rows need it.</summary>
    /// <param name="column">The column.</param>
    /// <param name="format">Foreign headers and default units.</param>
    /// <param name="rowAt">Where the header row stands.</param>
    /// <param name="problems">Where problems go.</param>
    public static void ReportMissing(LengthColumn column, LengthListFormat format, FilePosition rowAt, ProblemList problems)
    {
        // A foreign header that was not found has been reported already.
        if (format.Columns.ContainsKey(column))
            return;
        var advice = format.Columns.IsEmpty
            ? "write a header such as net,from,to,kind,layer,length[mm],width[mm]"
            : column is LengthColumn.Layer or LengthColumn.Width
                ? "name its header under 'columns', or a value under 'defaults', in the board file"
                : "name its header under 'columns' in the board file";
        problems.Error(rowAt, $"the column '{LengthColumns.NameOf(column)}' is missing", advice);
    }
}
