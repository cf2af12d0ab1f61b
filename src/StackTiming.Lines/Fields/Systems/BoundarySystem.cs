using System.Buffers;
using StackTiming.Lines.Fields.Kernels;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Systems;

/// <summary>
/// The equations for the total charge (free and bound) on the surfaces of a section: each conductor has its potential, and the electric
/// flux density passes every dielectric boundary unbroken (C. Wei, R. F. Harrington, J. R. Mautz and T. K. Sarkar, IEEE Trans. MTT-32,
/// 1984, pp. 439-450), both held at the Gauss nodes of every panel. Charge is counted in units of 2πε0. The store is lent and must be
/// given back.
/// </summary>
internal sealed class BoundarySystem : IDisposable
{
    private readonly InfluenceMatrix influence;
    private readonly double[] permittivities;
    private readonly int parity;
    private readonly int size;
    private readonly double[] matrix;
    private readonly DenseLu lu;

    /// <summary>Sets up and factors the equations.</summary>
    /// <param name="influence">Influence of the charges on each other.</param>
    /// <param name="permittivities">Relative permittivity of each medium; empty for air everywhere.</param>
    /// <param name="parity">+1 or -1 for drives even or odd about the axis of a symmetric section, 0 for any other section.</param>
    /// <param name="openSpace">True without planes, where the potential far away is an unknown and the charges sum to zero.</param>
    public BoundarySystem(InfluenceMatrix influence, double[] permittivities, int parity, bool openSpace)
    {
        (this.influence, this.permittivities, this.parity) = (influence, permittivities, parity);
        var floating = openSpace && parity >= 0;
        Unknowns = permittivities.Length == 0 ? influence.ConductorUnknowns : influence.Unknowns;
        size = Unknowns + (floating ? 1 : 0);
        var stride = Lanes.Padded(size);
        matrix = ArrayPool<double>.Shared.Rent(size * stride);
        FillColumns(stride);
        if (floating)
            FillFloating(stride);
        lu = new DenseLu(matrix, size, stride);
        if (lu.IsSingular)
            throw new SectionNotSolvableException("The equations of the cross-section have no unique solution; conductors may touch.");
    }

    /// <summary>Number of charge coefficients.</summary>
    public int Unknowns { get; }

    /// <summary>
    /// Charge coefficients for one volt on each of the conductors in turn; in open space followed by the potential of the conductors over
    /// that of the charges alone.
    /// </summary>
    public double[][] Solve(ReadOnlySpan<int> conductors)
    {
        var rights = new double[conductors.Length][];
        for (var r = 0; r < rights.Length; r++)
        {
            rights[r] = new double[size];
            for (var i = 0; i < influence.ConductorPanels; i++)
            {
                if (influence.Panels[i].Piece.Conductor == conductors[r])
                    rights[r].AsSpan(influence.FirstUnknown[i], influence.Panels[i].Terms).Fill(1);
            }
        }

        lu.Solve(rights);
        return rights;
    }

    /// <summary>The adjoint: λ with Aᵀλ = weights, for each of the weights.</summary>
    public double[][] SolveAdjoint(double[][] weights)
    {
        var rights = new double[weights.Length][];
        for (var r = 0; r < rights.Length; r++)
        {
            rights[r] = new double[size];
            weights[r].CopyTo(rights[r], 0);
        }

        lu.SolveTransposed(rights);
        return rights;
    }

    /// <summary>
    /// Weights of the coefficients in the free charge of one conductor, in units of 2πε0, on the surfaces present: on a face the charge
    /// outside is permittivity times total charge; on a strip between unlike dielectrics the field through it counts too.
    /// </summary>
    public double[] FreeCharge(int conductor)
    {
        var weights = new double[Unknowns];
        for (var i = 0; i < influence.ConductorPanels; i++)
        {
            if (influence.Panels[i].Piece.Conductor != conductor)
                continue;
            var (left, right) = Sides(influence.Panels[i]);
            weights[influence.FirstUnknown[i]] += (left + right) / 2;
            if (left != right)
                AddStripField(weights, i, (left - right) / (2 * Math.PI));
        }

        return weights;
    }

    /// <summary>
    /// Adds to <paramref name="slopes"/>, by medium, the derivative of one conductor's free charge with respect to the permittivity of
    /// the medium, by the adjoint of the equations (D. G. Cacuci, J. Math. Phys. 22, 1981): that of the weights, and that of the
    /// boundaries' contrasts.
    /// </summary>
    /// <param name="conductor">The conductor.</param>
    /// <param name="adjoint">Solution of the adjoint for its weights.</param>
    /// <param name="coefficients">The charges.</param>
    /// <param name="fields">The charges' <see cref="Fields"/>.</param>
    /// <param name="slopes">One number for each medium.</param>
    public void AddFreeChargeSlopes(
        int conductor, ReadOnlySpan<double> adjoint, ReadOnlySpan<double> coefficients, ReadOnlySpan<double> fields, Span<double> slopes)
    {
        for (var i = 0; i < influence.Panels.Length; i++)
        {
            var panel = influence.Panels[i];
            var piece = panel.Piece;
            if (piece.Conductor < 0)
            {
                var (a, b) = Sides(panel);
                var sum = WeightedField(panel, influence.FieldRow[i], fields, adjoint.Slice(influence.FirstUnknown[i], panel.Terms));
                // The contrast (a - b)/(a + b) of a boundary between permittivities a and b.
                slopes[piece.Left] -= sum * 2 * b / ((a + b) * (a + b));
                slopes[piece.Right] += sum * 2 * a / ((a + b) * (a + b));
            }
            else if (piece.Conductor == conductor)
            {
                var charge = coefficients[influence.FirstUnknown[i]];
                slopes[piece.Left] += piece.IsStrip ? charge / 2 : charge;
                if (!piece.IsStrip)
                    continue;
                slopes[piece.Right] += charge / 2;
                if (influence.FieldRow[i] < 0)
                    continue;
                var through = WeightedField(panel, influence.FieldRow[i], fields, LegendreRule.Of(panel.Terms).Weights) / (2 * Math.PI);
                slopes[piece.Left] += through;
                slopes[piece.Right] -= through;
            }
        }
    }

    /// <summary>The normal field of each set of charges (units of charge per metre) at the field nodes.</summary>
    public double[][] Fields(double[][] charges)
    {
        var fields = new double[charges.Length][];
        for (var i = 0; i < fields.Length; i++)
            fields[i] = new double[influence.FieldCount];
        var column = new double[influence.FieldCount];
        for (var j = 0; j < Unknowns; j++)
        {
            influence.CopyFields(j, parity, column);
            for (var i = 0; i < fields.Length; i++)
                LaneSpans.AddScaled(fields[i], column, charges[i][j]);
        }

        return fields;
    }

    /// <summary>Gives the store back; nothing can be solved any more.</summary>
    public void Dispose() => ArrayPool<double>.Shared.Return(matrix);

    private (double Left, double Right) Sides(Panel panel)
    {
        if (permittivities.Length == 0)
            return (1, 1);
        var left = permittivities[panel.Piece.Left];
        return (left, panel.Piece.Right >= 0 ? permittivities[panel.Piece.Right] : left);
    }

    private static double WeightedField(Panel panel, int row, ReadOnlySpan<double> fields, ReadOnlySpan<double> weights)
    {
        var nodes = LegendreRule.Of(panel.Terms).Nodes;
        var sum = 0.0;
        for (var k = 0; k < panel.Terms; k++)
            sum += weights[k] * panel.Stretch(nodes[k]) * fields[row + k];
        return sum;
    }

    private void AddStripField(double[] weights, int index, double weight)
    {
        var panel = influence.Panels[index];
        var column = new double[influence.FieldCount];
        for (var j = 0; j < Unknowns; j++)
        {
            influence.CopyFields(j, parity, column);
            weights[j] += weight * WeightedField(panel, influence.FieldRow[index], column, LegendreRule.Of(panel.Terms).Weights);
        }
    }

    private void FillColumns(int stride)
    {
        var conductors = influence.ConductorUnknowns;
        var boundaries = Unknowns - conductors;
        var scales = new double[boundaries];
        for (var i = influence.ConductorPanels; i < influence.Panels.Length && boundaries > 0; i++)
        {
            var panel = influence.Panels[i];
            var (left, right) = Sides(panel);
            var nodes = LegendreRule.Of(panel.Terms).Nodes;
            for (var k = 0; k < panel.Terms; k++)
                scales[influence.FirstUnknown[i] - conductors + k] = (left - right) / (left + right) * panel.Stretch(nodes[k]);
        }

        for (var j = 0; j < Unknowns; j++)
        {
            var column = matrix.AsSpan(j * stride, stride);
            influence.CopyPotentials(j, parity, column[..conductors]);
            influence.CopyFields(j, parity, column.Slice(conductors, boundaries));
            LaneSpans.Scale(column.Slice(conductors, boundaries), scales);
            column[Unknowns..].Clear();
        }

        for (var i = influence.ConductorPanels; i < influence.Panels.Length && boundaries > 0; i++)
            AddOwnCharge(stride, influence.FirstUnknown[i], influence.Panels[i].Terms);
    }

    private void AddOwnCharge(int stride, int start, int terms)
    {
        var rule = LegendreRule.Of(terms);
        for (var n = 0; n < terms; n++)
        {
            for (var k = 0; k < terms; k++)
                matrix[(start + n) * stride + start + k] += Math.PI * rule.Polynomials[k, n];
        }
    }

    private void FillFloating(int stride)
    {
        var column = matrix.AsSpan(Unknowns * stride, stride);
        column.Clear();
        column[..influence.ConductorUnknowns].Fill(1);
        for (var i = 0; i < influence.Panels.Length && influence.FirstUnknown[i] < Unknowns; i++)
            matrix[influence.FirstUnknown[i] * stride + Unknowns] = 1;
    }
}
