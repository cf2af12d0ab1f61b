using StackTiming.Lines.Fields.Kernels;
using StackTiming.Lines.Fields.Panels;

namespace StackTiming.Lines.Fields.Systems;

/// <summary>
/// The equations for the total charge (free and bound) on the surfaces of a section: each conductor has its potential, and the electric
/// flux density passes every dielectric boundary unbroken (C. Wei, R. F. Harrington, J. R. Mautz and T. K. Sarkar, IEEE Trans. MTT-32,
/// 1984, pp. 439-450), both held at the Gauss nodes of every panel. Charge is counted in units of 2πε0.
/// </summary>
internal sealed class BoundarySystem
{
    private readonly InfluenceMatrix influence;
    private readonly double[] permittivities;
    private readonly int parity;
    private readonly bool floating;
    private readonly int size;
    private readonly DenseLu lu;

    /// <summary>Sets up and factors the equations.</summary>
    /// <param name="influence">Influence of the charges on each other.</param>
    /// <param name="permittivities">Relative permittivity of each medium; empty for air everywhere.</param>
    /// <param name="parity">+1 or -1 for drives even or odd about the axis of a symmetric section, 0 for any other section.</param>
    /// <param name="openSpace">True without planes, where the potential far away is an unknown and the charges sum to zero.</param>
    public BoundarySystem(InfluenceMatrix influence, double[] permittivities, int parity, bool openSpace)
    {
        (this.influence, this.permittivities, this.parity) = (influence, permittivities, parity);
        floating = openSpace && parity >= 0;
        Unknowns = permittivities.Length == 0 ? influence.ConductorUnknowns : influence.Unknowns;
        size = Unknowns + (floating ? 1 : 0);
        var stride = Lanes.Padded(size);
        var matrix = new double[size * stride];
        for (var j = 0; j < Unknowns; j++)
            influence.CopyPotentials(j, parity, matrix.AsSpan(j * stride, influence.ConductorUnknowns));
        if (permittivities.Length > 0)
            FillBoundaries(matrix, stride);
        if (floating)
            FillFloating(matrix, stride);
        lu = new DenseLu(matrix, size, stride);
        if (lu.IsSingular)
            throw new SectionNotSolvableException("The equations of the cross-section have no unique solution; conductors may touch.");
    }

    /// <summary>Number of charge coefficients.</summary>
    public int Unknowns { get; }

    /// <summary>
    /// Charge coefficients for the given potentials of the conductors, in volts by index; in open space followed by the potential of the conductors
    /// over that of the charges alone.
    /// </summary>
    public double[] Solve(ReadOnlySpan<double> potentials)
    {
        var x = new double[size];
        for (var i = 0; i < influence.ConductorPanels; i++)
            x.AsSpan(influence.FirstUnknown[i], influence.Panels[i].Terms).Fill(potentials[influence.Panels[i].Piece.Conductor]);
        lu.Solve(x);
        return x;
    }

    /// <summary>The adjoint: λ with Aᵀλ = weights.</summary>
    private double[] SolveAdjoint(ReadOnlySpan<double> weights)
    {
        var x = new double[size];
        weights.CopyTo(x);
        lu.SolveTransposed(x);
        return x[..Unknowns];
    }

    /// <summary>
    /// Weights of the coefficients in Σ weight·(free charge of conductor), in units of 2πε0, on the surfaces present: on a face the charge outside is permittivity
    /// times total charge; on a strip between unlike dielectrics the field through it counts too.
    /// </summary>
    public double[] FreeCharge(ReadOnlySpan<double> conductorWeights) => FreeCharge(conductorWeights, permittivities, 1);

    /// <summary>
    /// The derivative of Σ weight·(free charge) with respect to the permittivity of each medium, by the adjoint of the equations
    /// (D. G. Cacuci, Sensitivity theory for nonlinear systems, J. Math. Phys. 22, 1981).
    /// </summary>
    /// <param name="conductorWeights">Weight of each conductor.</param>
    /// <param name="coefficients">The solution whose charges are meant.</param>
    public double[] FreeChargeSlopes(ReadOnlySpan<double> conductorWeights, ReadOnlySpan<double> coefficients)
    {
        var slopes = new double[permittivities.Length];
        var unit = new double[permittivities.Length];
        for (var m = 0; m < slopes.Length; m++)
        {
            unit[m] = 1;
            slopes[m] = Dot(FreeCharge(conductorWeights, unit, 0), coefficients);
            unit[m] = 0;
        }

        var adjoint = SolveAdjoint(FreeCharge(conductorWeights));
        var fields = Fields(coefficients);
        for (var i = influence.ConductorPanels; i < influence.Panels.Length; i++)
        {
            var panel = influence.Panels[i];
            var rule = LegendreRule.Of(panel.Terms);
            var sum = 0.0;
            for (var k = 0; k < panel.Terms; k++)
                sum += adjoint[influence.FirstUnknown[i] + k] * panel.Stretch(rule.Nodes[k]) * fields[influence.FieldRow[i] + k];
            // The contrast (a - b)/(a + b) of a boundary between permittivities a and b.
            var (a, b) = (permittivities[panel.Piece.Left], permittivities[panel.Piece.Right]);
            slopes[panel.Piece.Left] -= sum * 2 * b / ((a + b) * (a + b));
            slopes[panel.Piece.Right] += sum * 2 * a / ((a + b) * (a + b));
        }

        return slopes;
    }

    /// <summary>The normal field (units of the charge per metre) at the field nodes.</summary>
    private double[] Fields(ReadOnlySpan<double> coefficients)
    {
        var fields = new double[influence.FieldCount];
        var column = new double[influence.FieldCount];
        for (var j = 0; j < Unknowns; j++)
        {
            influence.CopyFields(j, parity, column);
            for (var i = 0; i < fields.Length; i++)
                fields[i] += coefficients[j] * column[i];
        }

        return fields;
    }

    private double[] FreeCharge(ReadOnlySpan<double> conductorWeights, double[] values, double airValue)
    {
        var weights = new double[Unknowns];
        for (var i = 0; i < influence.ConductorPanels; i++)
        {
            var panel = influence.Panels[i];
            var weight = conductorWeights[panel.Piece.Conductor];
            var (left, right) = values.Length == 0
                ? (airValue, airValue)
                : (values[panel.Piece.Left], panel.Piece.IsStrip ? values[panel.Piece.Right] : values[panel.Piece.Left]);
            weights[influence.FirstUnknown[i]] += weight * (left + right) / 2;
            if (left != right && weight != 0)
                AddStripField(weights, i, weight * (left - right) / (2 * Math.PI));
        }

        return weights;
    }

    private void AddStripField(double[] weights, int index, double weight)
    {
        var panel = influence.Panels[index];
        var rule = LegendreRule.Of(panel.Terms);
        var column = new double[influence.FieldCount];
        for (var j = 0; j < Unknowns; j++)
        {
            influence.CopyFields(j, parity, column);
            for (var k = 0; k < panel.Terms; k++)
                weights[j] += weight * rule.Weights[k] * panel.Stretch(rule.Nodes[k]) * column[influence.FieldRow[index] + k];
        }
    }

    private static double Dot(ReadOnlySpan<double> a, ReadOnlySpan<double> b)
    {
        var sum = 0.0;
        for (var i = 0; i < a.Length; i++)
            sum += a[i] * b[i];
        return sum;
    }

    private void FillBoundaries(double[] matrix, int stride)
    {
        var (first, rows) = (influence.ConductorUnknowns, Unknowns - influence.ConductorUnknowns);
        var scales = new double[rows];
        for (var i = influence.ConductorPanels; i < influence.Panels.Length; i++)
        {
            var panel = influence.Panels[i];
            var contrast = Contrast(panel);
            var rule = LegendreRule.Of(panel.Terms);
            for (var k = 0; k < panel.Terms; k++)
                scales[influence.FirstUnknown[i] - first + k] = contrast * panel.Stretch(rule.Nodes[k]);
        }

        for (var j = 0; j < Unknowns; j++)
        {
            var column = matrix.AsSpan(j * stride + first, rows);
            influence.CopyFields(j, parity, column);
            for (var i = 0; i < rows; i++)
                column[i] *= scales[i];
        }

        for (var i = influence.ConductorPanels; i < influence.Panels.Length; i++)
            AddOwnCharge(matrix, stride, influence.FirstUnknown[i], influence.Panels[i].Terms);
    }

    private double Contrast(Panel panel)
    {
        var (left, right) = (permittivities[panel.Piece.Left], permittivities[panel.Piece.Right]);
        return (left - right) / (left + right);
    }

    private static void AddOwnCharge(double[] matrix, int stride, int start, int terms)
    {
        var rule = LegendreRule.Of(terms);
        for (var n = 0; n < terms; n++)
        {
            for (var k = 0; k < terms; k++)
                matrix[(start + n) * stride + start + k] += Math.PI * rule.Polynomials[k, n];
        }
    }

    private void FillFloating(double[] matrix, int stride)
    {
        matrix.AsSpan(Unknowns * stride, influence.ConductorUnknowns).Fill(1);
        for (var i = 0; i < influence.Panels.Length && influence.FirstUnknown[i] < Unknowns; i++)
            matrix[influence.FirstUnknown[i] * stride + Unknowns] = 1;
    }
}
