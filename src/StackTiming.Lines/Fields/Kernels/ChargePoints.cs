using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Kernels;

/// <summary>
/// Points at which potentials or normal fields are wanted, as columns of coordinates that are filled up to whole groups of lanes by
/// repeating the last point.
/// </summary>
internal sealed class ChargePoints
{
    private ChargePoints(int count)
    {
        Count = count;
        var padded = Lanes.Padded(count);
        X = new double[padded];
        Y = new double[padded];
        NormalX = new double[padded];
        NormalY = new double[padded];
    }

    /// <summary>Number of points.</summary>
    public int Count { get; }

    /// <summary>Number of places in the columns.</summary>
    public int Padded => X.Length;

    /// <summary>x in metres.</summary>
    public double[] X { get; }

    /// <summary>y in metres.</summary>
    public double[] Y { get; }

    /// <summary>x of the unit normal.</summary>
    public double[] NormalX { get; }

    /// <summary>y of the unit normal.</summary>
    public double[] NormalY { get; }

    /// <summary>The Gauss nodes of the panels, in order, with the normal to the left of each surface.</summary>
    public static ChargePoints NodesOf(ReadOnlySpan<Panel> panels)
    {
        var count = 0;
        foreach (var panel in panels)
            count += panel.Terms;
        var points = new ChargePoints(count);
        var at = 0;
        foreach (var panel in panels)
        {
            var direction = panel.Piece.Direction;
            foreach (var u in LegendreRule.Of(panel.Terms).Nodes)
            {
                var point = panel.At(u);
                points.Set(at++, point.Real, point.Imaginary, -direction.Imaginary, direction.Real);
            }
        }

        points.FillUp();
        return points;
    }

    /// <summary>Points with one direction for all.</summary>
    public static ChargePoints Of(ReadOnlySpan<double> x, ReadOnlySpan<double> y, double normalX, double normalY)
    {
        var points = new ChargePoints(x.Length);
        for (var i = 0; i < x.Length; i++)
            points.Set(i, x[i], y[i], normalX, normalY);
        points.FillUp();
        return points;
    }

    private void Set(int index, double x, double y, double normalX, double normalY)
    {
        X[index] = x;
        Y[index] = y;
        NormalX[index] = normalX;
        NormalY[index] = normalY;
    }

    private void FillUp()
    {
        for (var i = Count; i < Padded && Count > 0; i++)
            Set(i, X[Count - 1], Y[Count - 1], NormalX[Count - 1], NormalY[Count - 1]);
    }
}
