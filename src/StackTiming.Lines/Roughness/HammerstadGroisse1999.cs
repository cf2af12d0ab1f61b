namespace StackTiming.Lines.Roughness;

/// <summary>
/// How much a rough face raises the surface resistance: K = 1 + (2/π)·atan(1.4·(Δ/δ)²) with the rms roughness Δ and the skin depth δ: the fit of
/// Hammerstad and Jensen (1980, see <see cref="Microstrip.HammerstadJensen1980"/>) to the grooves computed by S. P. Morgan, "Effect of surface roughness on eddy current losses
/// at microwave frequencies", J. Appl. Phys. 20, 1949, pp. 352–362; the trade quotes it as Hammerstad and Groisse 1999.
/// It saturates at 2, too low for rough foils above a few gigahertz; <see cref="CannonballHuray"/> does not. Lengths in metres.
/// </summary>
public static class HammerstadGroisse1999
{
    /// <summary>Factor on the surface resistance, 1 to 2.</summary>
    /// <param name="rmsMetres">Root-mean-square roughness, metres; 0 is smooth.</param>
    /// <param name="skinDepthMetres">Skin depth, metres.</param>
    public static double Factor(double rmsMetres, double skinDepthMetres)
    {
        var ratio = rmsMetres / skinDepthMetres;
        return 1 + 2 / Math.PI * Math.Atan(1.4 * ratio * ratio);
    }
}
