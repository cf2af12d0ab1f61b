using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Fields.Sensitivities;

/// <summary>The derivative of a section's matrices with respect to one parameter.</summary>
/// <param name="Parameter">The parameter.</param>
/// <param name="CapacitanceSlope">dC/dp, farad per metre and unit of the parameter.</param>
/// <param name="InductanceSlope">dL/dp, henry per metre and unit of the parameter.</param>
/// <param name="SkinSpreadSlope">
/// Derivative of the skin-effect resistance matrix over the surface resistance, 1/m and unit; null where a conductor has no thickness.
/// </param>
/// <param name="LossCapacitanceSlope">Derivative of the conductance matrix over the angular frequency, farad per metre and unit.</param>
/// <param name="RelativeError">
/// Estimated error of the slopes relative to C and L over the parameter's scale, from two steps; 0 where the slope is exact.
/// </param>
public sealed record SectionSensitivity(
    SectionParameter Parameter,
    double[,] CapacitanceSlope,
    double[,] InductanceSlope,
    double[,]? SkinSpreadSlope,
    double[,] LossCapacitanceSlope,
    double RelativeError)
{
    /// <summary>
    /// Derivatives of the characteristic impedance (ohm per unit) and the delay (seconds per metre and unit) of a drive: signal currents
    /// and voltages in the proportions of
    /// <paramref name="drive"/>, such as 1 for a single line or +1/2, -1/2 for a pair, with Z² = (1/C₀)/(c²C) of the capacitances V'CV
    /// that the drive sees.
    /// </summary>
    /// <param name="line">The solution at the parameter's value.</param>
    /// <param name="drive">Voltage of each signal.</param>
    public (double ImpedanceOhms, double DelaySecondsPerMetre) Of(LineSolution line, ReadOnlySpan<double> drive)
    {
        // With C0 = L⁻¹/c², V'C0V changes by -V'C0 (dL) C0 V c²; u = c² C0 V solves L u = V.
        var u = Solve(line.InductanceHenryPerMetre, drive);
        var capacitance = Form(line.CapacitanceFaradPerMetre, drive, drive);
        var capacitanceSlope = Form(CapacitanceSlope, drive, drive);
        var stiffness = 0.0;
        for (var i = 0; i < drive.Length; i++)
            stiffness += drive[i] * u[i];
        var stiffnessSlope = -Form(InductanceSlope, u, u);
        var z = 1 / Math.Sqrt(stiffness * capacitance);
        var delay = Math.Sqrt(capacitance / stiffness);
        var (relativeC, relativeS) = (capacitanceSlope / capacitance, stiffnessSlope / stiffness);
        return (-0.5 * z * (relativeC + relativeS), 0.5 * delay * (relativeC - relativeS));
    }

    private static double[] Solve(double[,] matrix, ReadOnlySpan<double> right) =>
        [.. MathNet.Numerics.LinearAlgebra.Matrix<double>.Build.DenseOfArray(matrix)
            .Solve(MathNet.Numerics.LinearAlgebra.Vector<double>.Build.DenseOfArray(right.ToArray()))];

    private static double Form(double[,] matrix, ReadOnlySpan<double> left, ReadOnlySpan<double> right)
    {
        var sum = 0.0;
        for (var i = 0; i < left.Length; i++)
        {
            for (var j = 0; j < right.Length; j++)
                sum += left[i] * matrix[i, j] * right[j];
        }

        return sum;
    }
}
