using StackTiming.Lines.Fields;
using StackTiming.Lines.Fields.Currents;
using StackTiming.Lines.Materials;
using StackTiming.Lines.Roughness;

namespace StackTiming.Lines.Loss;

/// <summary>
/// Losses of a solved cross-section from its own fields: resistance and internal inductance from direct current to skin effect by <see cref="ConductorLoss"/>, planes
/// included; conductance from the energy in each dielectric. Roughness adds (K − 1)·Z_s·spread with K of <see cref="HammerstadGroisse1999"/> and the surface
/// impedance Z_s, which is nothing where the current still fills the copper. Planes count as thick: below about 15 MHz, where the skin depth exceeds a plane of 17 µm, their
/// resistance is understated and their internal inductance overstated.
/// </summary>
public static class FieldLoss
{
    /// <summary>The line at a frequency.</summary>
    /// <param name="solution">The solved section, its Dk and Df those of the frequency.</param>
    /// <param name="copper">
    /// The loss of its copper, which depends on the geometry alone and so serves every frequency; null for traces without thickness.
    /// </param>
    /// <param name="hertz">Frequency, Hz, above 0.</param>
    public static LineAtFrequency At(FieldSolution solution, ConductorLoss? copper, double hertz)
    {
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(hertz);
        var line = solution.Line;
        var n = line.Signals.Length;
        var omega = 2 * Math.PI * hertz;
        var lossCapacitance = solution.LossCapacitance();
        double[,] smooth = new double[n, n], rough = new double[n, n], g = new double[n, n];
        var l = (double[,])line.InductanceHenryPerMetre.Clone();
        var warnings = line.Warnings;
        if (copper is null)
            warnings = warnings.Add("traces without thickness have no resistance: state the copper's thickness for its loss");
        else
            AddCopper(solution, copper, hertz, smooth, rough, l);
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
                g[i, j] = omega * lossCapacitance[i, j];
        }
        var c = line.CapacitanceFaradPerMetre;
        return new LineAtFrequency(line.Signals, hertz, rough, l, g, c, WaveOfLine.Modes(hertz, smooth, rough, l, g, c), warnings);
    }

    /// <summary>The copper loss of a solved section, or null where a conductor has no thickness.</summary>
    /// <param name="solution">The solved section.</param>
    public static ConductorLoss? Copper(FieldSolution solution) =>
        solution.Section.Conductors.All(c => c.ThicknessMetres > 0) ? ConductorLoss.Of(solution) : null;

    private static void AddCopper(FieldSolution solution, ConductorLoss copper, double hertz, double[,] smooth, double[,] rough, double[,] l)
    {
        var metal = solution.Section.Metal;
        var (resistance, inner) = copper.At(hertz);
        var spread = copper.SkinSpreadPerMetre();
        var factor = HammerstadGroisse1999.Factor(metal.RoughnessRmsMetres, SkinEffect.DepthMetres(metal.ResistivityOhmMetres, hertz));
        var added = (factor - 1) * SkinEffect.SurfaceResistanceOhms(metal.ResistivityOhmMetres, hertz);
        var omega = 2 * Math.PI * hertz;
        for (var i = 0; i < copper.Signals; i++)
        {
            for (var j = 0; j < copper.Signals; j++)
            {
                smooth[i, j] = resistance[i, j];
                rough[i, j] = resistance[i, j] + added * spread[i, j];
                l[i, j] += inner[i, j] + added * spread[i, j] / omega;
            }
        }
    }
}
