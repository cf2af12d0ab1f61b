using MathNet.Numerics.LinearAlgebra;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.FieldMaps;

/// <summary>
/// The currents of forward waves: I = Y_c·V with Y_c = L⁻¹·√(LC), computed through the Cholesky factor L = KKᵀ as K⁻ᵀ·√(KᵀCK)·K⁻¹, which keeps it symmetric
/// (C. R. Paul, Analysis of Multiconductor Transmission Lines, 2nd ed. 2008, ch. 7).
/// </summary>
public static class CharacteristicAdmittance
{
    /// <summary>The signal currents of a lossless forward wave, ampere.</summary>
    /// <param name="line">The line.</param>
    /// <param name="volts">The signal voltages.</param>
    public static double[] Amperes(LineSolution line, double[] volts)
    {
        var k = Matrix<double>.Build.DenseOfArray(line.InductanceHenryPerMetre).Cholesky().Factor;
        var c = Matrix<double>.Build.DenseOfArray(line.CapacitanceFaradPerMetre);
        var modes = (k.Transpose() * c * k).Evd(Symmetricity.Symmetric);
        var root = modes.EigenVectors * Matrix<double>.Build.DenseOfDiagonalVector(modes.EigenValues.Map(v => Math.Sqrt(v.Real), Zeros.AllowSkip)) * modes.EigenVectors.Transpose();
        var inverse = k.Inverse();
        return (inverse.Transpose() * (root * (inverse * Vector<double>.Build.DenseOfArray(volts)))).ToArray();
    }
}
