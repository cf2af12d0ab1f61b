using SkiaSharp;

namespace StackTiming.Reports.Figures;

/// <summary>
/// Lines of one value on a grid, cell by cell (marching squares: W. E. Lorensen and H. E. Cline, "Marching cubes", Computer Graphics 21, 1987, in two dimensions). Cells with a
/// corner that has no value are left out.
/// </summary>
public static class ContourLines
{
    /// <summary>The lines as runs of points, in cells: x from the left edge and y from the top edge of the grid.</summary>
    /// <param name="grid">The values.</param>
    /// <param name="level">The value of the lines.</param>
    public static List<SKPoint[]> Of(FieldGrid grid, double level)
    {
        var pieces = Pieces(grid, level);
        // Neighbouring cells compute their common crossing from the same two values; rounding hides the last digit.
        var at = new Dictionary<(int, int), List<int>>();
        static (int, int) Key(SKPoint p) => ((int)MathF.Round(p.X * 1000), (int)MathF.Round(p.Y * 1000));
        for (var i = 0; i < pieces.Count; i++)
        {
            foreach (var end in new[] { pieces[i].From, pieces[i].To })
            {
                if (!at.TryGetValue(Key(end), out var there))
                    at[Key(end)] = there = [];
                there.Add(i);
            }
        }
        var used = new bool[pieces.Count];
        var lines = new List<SKPoint[]>();
        for (var start = 0; start < pieces.Count; start++)
        {
            if (used[start])
                continue;
            used[start] = true;
            var line = new LinkedList<SKPoint>([pieces[start].From, pieces[start].To]);
            while (Next(line.Last!.Value) is { } point)
                line.AddLast(point);
            while (Next(line.First!.Value) is { } point)
                line.AddFirst(point);
            lines.Add([.. line]);
        }
        return lines;

        SKPoint? Next(SKPoint end)
        {
            foreach (var i in at[Key(end)])
            {
                if (used[i])
                    continue;
                used[i] = true;
                return Key(pieces[i].From) == Key(end) ? pieces[i].To : pieces[i].From;
            }
            return null;
        }
    }

    private static List<(SKPoint From, SKPoint To)> Pieces(FieldGrid grid, double level)
    {
        var pieces = new List<(SKPoint, SKPoint)>();
        Span<SKPoint> crossings = stackalloc SKPoint[4];
        for (var row = 0; row + 1 < grid.Rows; row++)
        {
            for (var column = 0; column + 1 < grid.Columns; column++)
            {
                var first = row * grid.Columns + column;
                double a = grid.Values[first] - level, b = grid.Values[first + 1] - level;
                double c = grid.Values[first + grid.Columns + 1] - level, d = grid.Values[first + grid.Columns] - level;
                if (!double.IsFinite(a + b + c + d))
                    continue;
                var (x, y) = (column + 0.5f, row + 0.5f);
                var count = 0;
                if (a > 0 != b > 0)
                    crossings[count++] = new SKPoint(x + (float)(a / (a - b)), y);
                if (b > 0 != c > 0)
                    crossings[count++] = new SKPoint(x + 1, y + (float)(b / (b - c)));
                if (c > 0 != d > 0)
                    crossings[count++] = new SKPoint(x + (float)(d / (d - c)), y + 1);
                if (d > 0 != a > 0)
                    crossings[count++] = new SKPoint(x, y + (float)(a / (a - d)));
                for (var i = 0; i + 1 < count; i += 2)
                    pieces.Add((crossings[i], crossings[i + 1]));
            }
        }
        return pieces;
    }
}
