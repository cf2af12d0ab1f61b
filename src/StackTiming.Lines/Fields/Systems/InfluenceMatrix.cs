using System.Buffers;
using StackTiming.Lines.Fields.Kernels;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Systems;

/// <summary>
/// What the charge of every polynomial of every panel does at the panels' Gauss nodes: its potential at the nodes of conductors and its
/// normal field at the nodes of dielectric boundaries (and of strips between unlike dielectrics). Column-major. Of a symmetric section
/// the panels' mirror images are kept apart, so that even and odd drives share the work. The store is lent and must be given back.
/// </summary>
internal sealed class InfluenceMatrix : IDisposable
{
    private readonly double[] direct;
    private readonly double[] mirror;
    private readonly int fieldRows;
    private readonly int stride;

    public InfluenceMatrix(Panel[] panels, PlaneImages images, bool symmetric)
    {
        Panels = panels;
        FirstUnknown = new int[panels.Length + 1];
        for (var i = 0; i < panels.Length; i++)
            FirstUnknown[i + 1] = FirstUnknown[i] + panels[i].Terms;
        ConductorPanels = panels.Count(p => p.Piece.Conductor >= 0);
        FieldRow = new int[panels.Length];
        var fieldPanels = new List<Panel>();
        foreach (var i in Enumerable.Range(ConductorPanels, panels.Length - ConductorPanels).Concat(Enumerable.Range(0, ConductorPanels)))
        {
            var isField = i >= ConductorPanels || (panels[i].Piece.IsStrip && panels[i].Piece.Left != panels[i].Piece.Right);
            FieldRow[i] = isField ? FieldCount : -1;
            if (!isField)
                continue;
            FieldCount += panels[i].Terms;
            fieldPanels.Add(panels[i]);
        }

        var conductorPoints = ChargePoints.NodesOf(panels.AsSpan(0, ConductorPanels));
        var fieldPoints = ChargePoints.NodesOf([.. fieldPanels]);
        fieldRows = conductorPoints.Padded;
        stride = fieldRows + fieldPoints.Padded;
        direct = Empty();
        mirror = symmetric ? Empty() : [];
        for (var i = 0; i < panels.Length; i++)
        {
            Fill(direct, i, images, conductorPoints, fieldPoints, false);
            if (symmetric)
                Fill(mirror, i, images, conductorPoints, fieldPoints, true);
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

    /// <summary>Number of field nodes: those of the boundaries, in the order of the panels, and then those of strips.</summary>
    public int FieldCount { get; }

    /// <summary>Number of coefficients.</summary>
    public int Unknowns => FirstUnknown[^1];

    /// <summary>Number of coefficients on conductors.</summary>
    public int ConductorUnknowns => FirstUnknown[ConductorPanels];

    /// <summary>
    /// Copies the potentials at the conductor nodes from one coefficient, with its image's charge equal (+1), opposite (-1) or left out
    /// (0).
    /// </summary>
    public void CopyPotentials(int unknown, int parity, Span<double> target) => Copy(unknown, parity, 0, target);

    /// <summary>Copies the normal fields at the first field nodes likewise.</summary>
    public void CopyFields(int unknown, int parity, Span<double> target) => Copy(unknown, parity, fieldRows, target);

    /// <summary>Gives the store back; the matrix must not be used any more.</summary>
    public void Dispose()
    {
        ArrayPool<double>.Shared.Return(direct);
        if (mirror.Length > 0)
            ArrayPool<double>.Shared.Return(mirror);
    }

    private double[] Empty()
    {
        var store = ArrayPool<double>.Shared.Rent(Unknowns * stride);
        store.AsSpan(0, Unknowns * stride).Clear();
        return store;
    }

    private void Copy(int unknown, int parity, int row, Span<double> target)
    {
        direct.AsSpan(unknown * stride + row, target.Length).CopyTo(target);
        if (parity != 0)
            LaneSpans.AddScaled(target, mirror.AsSpan(unknown * stride + row, target.Length), parity);
    }

    private void Fill(double[] matrix, int index, PlaneImages images, ChargePoints conductorPoints, ChargePoints fieldPoints, bool mirrored)
    {
        var columns = matrix.AsSpan(FirstUnknown[index] * stride, Panels[index].Terms * stride);
        images.AddPotential(Panels[index], conductorPoints, mirrored, columns, stride);
        var isOwn = !mirrored && FieldRow[index] >= 0;
        images.AddNormalField(
            Panels[index], fieldPoints, mirrored, isOwn ? FieldRow[index] : 0, isOwn ? Panels[index].Terms : 0, columns[fieldRows..],
                stride);
    }
}
