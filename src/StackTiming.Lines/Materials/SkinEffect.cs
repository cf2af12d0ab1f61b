using StackTiming.Lines.Constants;

namespace StackTiming.Lines.Materials;

/// <summary>The depth to which current flows in a good conductor, and the resistance that follows (H. A. Wheeler, "Formulas for the skin effect", Proc. IRE 30, 1942, pp. 412–424).</summary>
public static class SkinEffect
{
    /// <summary>Skin depth √(ρ/(π·f·μ₀)), metres.</summary>
    /// <param name="resistivityOhmMetres">Resistivity, ohm metres.</param>
    /// <param name="hertz">Frequency, Hz, above 0.</param>
    public static double DepthMetres(double resistivityOhmMetres, double hertz) => Math.Sqrt(resistivityOhmMetres / (Math.PI * hertz * Vacuum.Mu0));

    /// <summary>Resistance of a square of thick, smooth metal, ohm.</summary>
    /// <param name="resistivityOhmMetres">Resistivity, ohm metres.</param>
    /// <param name="hertz">Frequency, Hz.</param>
    public static double SurfaceResistanceOhms(double resistivityOhmMetres, double hertz) => Math.Sqrt(Math.PI * hertz * Vacuum.Mu0 * resistivityOhmMetres);
}
