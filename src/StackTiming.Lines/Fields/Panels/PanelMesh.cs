using System.Numerics;
using StackTiming.Lines.Fields.Geometry;

namespace StackTiming.Lines.Fields.Panels;

/// <summary>
/// Divides surfaces into panels that end at corners and are short beside the corners of other surfaces, so that the charge on each
/// is a polynomial of low degree (after the map that takes care of its own corner).
/// </summary>
internal sealed class PanelMesh
{
    private const int MostPanels = 1500;

    private readonly List<Complex> corners = [];
    private readonly List<Panel> panels = [];
    private readonly PanelDegrees degrees;
    private readonly bool half;

    private PanelMesh(SectionSurfaces surfaces, double? topPlane, bool plane, bool half, PanelDegrees degrees)
    {
        this.degrees = degrees;
        this.half = half;
        foreach (var piece in surfaces.Pieces)
        {
            AddCorner(piece.Start, piece.StartKind, plane, topPlane);
            if (!piece.Infinite)
                AddCorner(piece.End, piece.EndKind, plane, topPlane);
        }

        foreach (var piece in surfaces.Pieces)
            Divide(piece);
        Panels = [.. panels.Where(p => p.Piece.Conductor >= 0), .. panels.Where(p => p.Piece.Conductor < 0)];
    }

    /// <summary>The panels, those on conductors first.</summary>
    public Panel[] Panels { get; }

    /// <summary>Number of polynomials on all panels.</summary>
    public int Unknowns => Panels.Sum(p => p.Terms);

    /// <summary>Divides the surfaces of a section in the solver's frame.</summary>
    public static PanelMesh Of(SectionSurfaces surfaces, double? bottomPlane, double? topPlane, bool half, PanelDegrees degrees) =>
        new(surfaces, topPlane, bottomPlane is not null, half, degrees);

    private void AddCorner(Complex point, PieceEnd kind, bool plane, double? topPlane)
    {
        if (kind == PieceEnd.Smooth || corners.Contains(point))
            return;
        corners.Add(point);
        if (plane)
            corners.Add(Complex.Conjugate(point));
        if (topPlane is { } top)
            corners.Add(new Complex(point.Real, 2 * top - point.Imaginary));
        if (half && point.Real > 0)
        {
            corners.Add(new Complex(-point.Real, point.Imaginary));
            if (plane)
                corners.Add(-point);
        }
    }

    private void Divide(SurfacePiece piece)
    {
        if (piece.Infinite)
        {
            // The tail is measured from the vertical axis, where the section's charges are centred.
            Refine(new Panel(piece, PanelMap.Infinite, new Complex(0, piece.Start.Imaginary), piece.Direction, Math.Abs(piece.Start.Real),
                0));
            return;
        }

        var (length, direction) = (piece.Length, piece.Direction);
        var (start, end) = (Map(piece.StartKind), Map(piece.EndKind));
        if (start == PanelMap.Straight && end == PanelMap.Straight)
        {
            Refine(new Panel(piece, PanelMap.Straight, piece.Start, direction, length, 0));
        }
        else if (end == PanelMap.Straight)
        {
            Refine(new Panel(piece, start, piece.Start, direction, length, 0));
        }
        else if (start == PanelMap.Straight)
        {
            Refine(new Panel(piece, end, piece.End, -direction, length, 0));
        }
        else
        {
            Refine(new Panel(piece, start, piece.Start, direction, length / 2, 0));
            Refine(new Panel(piece, end, piece.End, -direction, length / 2, 0));
        }
    }

    private static PanelMap Map(PieceEnd kind) => kind switch
    {
        PieceEnd.Smooth => PanelMap.Straight,
        PieceEnd.StripEdge => PanelMap.Square,
        _ => PanelMap.Cube,
    };

    private void Refine(Panel panel)
    {
        var ellipse = NearestEllipse(panel);
        if (ellipse >= degrees.SmallestEllipse(panel))
        {
            panels.Add(panel with { Terms = degrees.Terms(panel, ellipse) });
            if (panels.Count > MostPanels)
                throw new SectionNotSolvableException(
                    $"The cross-section needs more than {MostPanels} panels; "
                        + "it has too many conductors or gaps too narrow beside its widths.");
            return;
        }

        if (panel.Map == PanelMap.Infinite)
        {
            Refine(panel with { Map = PanelMap.Straight, Origin = panel.At(1) });
            Refine(panel with { Length = 2 * panel.Length });
            return;
        }

        var halfway = panel.Length / 2;
        Refine(panel with { Length = halfway });
        Refine(panel with { Map = PanelMap.Straight, Origin = panel.Origin + halfway * panel.Direction, Length = halfway });
    }

    private double NearestEllipse(Panel panel)
    {
        var nearest = double.PositiveInfinity;
        var own = panel.Map is PanelMap.Square or PanelMap.Cube ? panel.Origin : new Complex(double.NaN, 0);
        var reach = panel.Map == PanelMap.Infinite ? double.PositiveInfinity : 2 * panel.Length;
        foreach (var corner in corners)
        {
            var away = corner - panel.Origin;
            if (Math.Abs(away.Real) > reach || Math.Abs(away.Imaginary) > reach || IsOwn(away, panel, own))
                continue;
            nearest = Math.Min(nearest, panel.Ellipse(corner));
        }

        return nearest;
    }

    /// <summary>The corner that the panel's map takes care of.</summary>
    private static bool IsOwn(Complex away, Panel panel, Complex own) =>
        !double.IsNaN(own.Real) && away.Magnitude < 1e-6 * panel.Length;
}
