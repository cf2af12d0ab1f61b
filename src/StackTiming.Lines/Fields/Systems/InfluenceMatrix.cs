using StackTiming.Lines.Fields.Kernels;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Systems;

/// <summary>
/// What the charge of every polynomial of every panel does at the panels' Gauss nodes: its potential at the nodes of conductors and its normal field at
/// the nodes of dielectric boundaries (and of strips between unlike dielectrics). Column-major. Of a symmetric section the panels'
/// mirror images are kept apart, so that even and odd drives share the work.
/// </summary>
internal sealed class InfluenceMatrix
{
    private readonly double[] direct;
    private readonly double[] mirror;
    private readonly int fieldRows;

    public InfluenceMatrix(Panel[] panels, PlaneImages images, bool symmetric)
    {
        Panels = panels;
        FirstUnknown = new int[panels.Length + 1];
        for (var i = 0; i < panels.Length; i++)
            FirstUnknown[i + 1] = FirstUnknown[i] + panels[i].Terms;
        ConductorPanels = panels.Count(p => p.Piece.Conductor >= 0);
        var conductorPoints = ChargePoints.NodesOf(panels.AsSpan(0, ConductorPanels));
        Panel[] fieldPanels = [.. panels.Skip(ConductorPanels), .. panels.Where(p => p.Piece.IsStrip && p.Piece.Left != p.Piece.Right)];
        var fieldPoints = ChargePoints.NodesOf(fieldPanels);
        fieldRows = conductorPoints.Padded;
        Stride = fieldRows + fieldPoints.Padded;
        direct = new double[Unknowns * Stride];
        mirror = symmetric ? new double[Unknowns * Stride] : [];
        FieldRow = new int[panels.Length];
        Array.Fill(FieldRow, -1);
        foreach (var panel in fieldPanels)
        {
            FieldRow[Array.IndexOf(panels, panel)] = FieldCount;
            FieldCount += panel.Terms;
        }

        for (var i = 0; i < panels.Length; i++)
        {
            Fill(direct, i, images, conductorPoints, fieldPoints, false, Math.Max(FieldRow[i], 0), FieldRow[i] < 0 ? 0 : panels[i].Terms);
            if (symmetric)
                Fill(mirror, i, images, conductorPoints, fieldPoints, true, 0, 0);
        }
    }

    /// <summary>The panels, those of conductors first.</summary>
    public Panel[] Panels { get; }

    /// <summary>Number of panels on conductors.</summary>
    public int ConductorPanels { get; }

    /// <summary>Index of the first coefficient of each panel, and after the last panel the number of all.</summary>
    public int[] FirstUnknown { get; }

    /// <summary>Row of each panel's first node among the field nodes, or -1 where its field is not kept.</summary>
    public int[] FieldRow { get; }

    /// <summary>Number of field nodes.</summary>
    public int FieldCount { get; }

    /// <summary>Number of coefficients.</summary>
    public int Unknowns => FirstUnknown[^1];

    /// <summary>Number of coefficients on conductors.</summary>
    public int ConductorUnknowns => FirstUnknown[ConductorPanels];

    /// <summary>True where the mirror images are kept.</summary>
    public bool Symmetric => mirror.Length > 0;

    private int Stride { get; }

    /// <summary>Potentials at the conductor nodes from one coefficient, with the image's charge equal (+1), opposite (-1) or left out (0).</summary>
    public void CopyPotentials(int unknown, int parity, Span<double> target) => Copy(unknown, parity, 0, target);

    /// <summary>Normal fields at the field nodes, those of the boundaries before those of the strips.</summary>
    public void CopyFields(int unknown, int parity, Span<double> target) => Copy(unknown, parity, fieldRows, target);

    private void Copy(int unknown, int parity, int row, Span<double> target)
    {
        var from = direct.AsSpan(unknown * Stride + row, target.Length);
        from.CopyTo(target);
        if (parity == 0 || !Symmetric)
            return;
        var image = mirror.AsSpan(unknown * Stride + row, target.Length);
        for (var i = 0; i < target.Length; i++)
            target[i] += parity * image[i];
    }

    private void Fill(
        double[] matrix, int index, PlaneImages images, ChargePoints conductorPoints, ChargePoints fieldPoints, bool mirrored, int ownStart, int ownCount)
    {
        var columns = matrix.AsSpan(FirstUnknown[index] * Stride, Panels[index].Terms * Stride);
        images.AddPotential(Panels[index], conductorPoints, mirrored, columns, Stride);
        images.AddNormalField(Panels[index], fieldPoints, mirrored, ownStart, ownCount, columns[fieldRows..], Stride);
    }
}
