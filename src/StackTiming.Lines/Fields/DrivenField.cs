using StackTiming.Lines.Fields.Geometry;
using StackTiming.Lines.Fields.Kernels;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields;

/// <summary>
/// The electric field of a solved section under given voltages: evaluated anywhere, in the section's own coordinates. Inside conductors
/// the potential is theirs and the field is zero up to the solver's error; a point on a surface gets the mean of both sides' fields.
/// </summary>
public sealed class DrivenField
{
    private const int Chunk = 256;

    private readonly SectionFrame frame;
    private readonly PlaneImages images;
    private readonly SolvedDrive drive;

    internal DrivenField(SectionFrame frame, PlaneImages images, SolvedDrive drive) =>
        (this.frame, this.images, this.drive) = (frame, images, drive);

    /// <summary>Potentials in volts at points given in metres.</summary>
    public double[] PotentialVolts(ReadOnlySpan<double> xMetres, ReadOnlySpan<double> yMetres)
    {
        var volts = new double[xMetres.Length];
        Array.Fill(volts, drive.Offset);
        for (var start = 0; start < volts.Length; start += Chunk)
        {
            var points = Points(xMetres, yMetres, start, 0, 0);
            AddTo(volts, start, points, (panel, mirrored, columns) => images.AddPotential(panel, points, mirrored, columns, points.Padded));
        }

        return volts;
    }

    /// <summary>Electric field in volts per metre at points given in metres.</summary>
    public (double[] X, double[] Y) FieldVoltsPerMetre(ReadOnlySpan<double> xMetres, ReadOnlySpan<double> yMetres)
    {
        var (ex, ey) = (new double[xMetres.Length], new double[xMetres.Length]);
        for (var start = 0; start < ex.Length; start += Chunk)
        {
            foreach (var (target, across) in new[] { (ex, 1.0), (ey, 0.0) })
            {
                var points = Points(xMetres, yMetres, start, across, (1 - across) * (frame.Upright ? 1 : -1));
                AddTo(target, start, points, (panel, mirrored, columns) =>
                    images.AddNormalField(panel, points, mirrored, 0, 0, columns, points.Padded));
            }
        }

        return (ex, ey);
    }

    private ChargePoints Points(ReadOnlySpan<double> xMetres, ReadOnlySpan<double> yMetres, int start, double normalX, double normalY)
    {
        var count = Math.Min(Chunk, xMetres.Length - start);
        Span<double> x = stackalloc double[Chunk];
        Span<double> y = stackalloc double[Chunk];
        for (var i = 0; i < count; i++)
        {
            var point = frame.Apply(xMetres[start + i], yMetres[start + i]);
            (x[i], y[i]) = (point.Real, point.Imaginary);
        }

        return ChargePoints.Of(x[..count], y[..count], normalX, normalY);
    }

    private void AddTo(double[] target, int start, ChargePoints points, AddColumns add)
    {
        var columns = new double[PanelIntegral.MaxTerms * points.Padded];
        var first = 0;
        foreach (var panel in drive.Panels)
        {
            var used = columns.AsSpan(0, panel.Terms * points.Padded);
            for (var side = 0; side < (drive.Mirrored ? 2 : 1); side++)
            {
                used.Clear();
                add(panel, side == 1, used);
                for (var n = 0; n < panel.Terms; n++)
                {
                    var charge = drive.Coefficient(first + n, side == 1);
                    for (var i = 0; i < points.Count; i++)
                        target[start + i] += charge * columns[n * points.Padded + i];
                }
            }

            first += panel.Terms;
        }
    }

    private delegate void AddColumns(Panel panel, bool mirrored, Span<double> columns);
}
