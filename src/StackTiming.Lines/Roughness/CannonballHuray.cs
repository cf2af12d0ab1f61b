namespace StackTiming.Lines.Roughness;

/// <summary>
/// Roughness as spheres of copper on a flat face: K = A_matte/A_flat + (3/2)·Σ N·4πa²/A_flat / (1 + δ/a + δ²/(2a²)) (P. G. Huray, The Foundations of Signal
/// Integrity, Wiley, 2009), with the spheres stacked like cannonballs in a pyramid of 14 (L. Simonovich, "Practical method for modeling conductor
/// surface roughness using close packing of equal spheres", DesignCon 2015). Lengths in metres, areas in square metres.
/// </summary>
public static class CannonballHuray
{
    private const int BallsInPyramid = 14;

    /// <summary>Factor on the surface resistance, at least 1, of equal spheres.</summary>
    /// <param name="radiusMetres">Radius a of a sphere.</param>
    /// <param name="balls">Number N of spheres on the flat area.</param>
    /// <param name="flatSquareMetres">Flat area A_flat that carries them.</param>
    /// <param name="skinDepthMetres">Skin depth δ.</param>
    /// <param name="matteOverFlat">A_matte/A_flat: area of the face under the spheres against the flat area.</param>
    public static double Factor(double radiusMetres, int balls, double flatSquareMetres, double skinDepthMetres, double matteOverFlat = 1)
    {
        var depth = skinDepthMetres / radiusMetres;
        var area = balls * 4 * Math.PI * radiusMetres * radiusMetres / flatSquareMetres;
        return matteOverFlat + 1.5 * area / (1 + depth + 0.5 * depth * depth);
    }

    /// <summary>Factor of a foil of which only the ten-point roughness is known: 14 spheres of radius 0.06·Rz on a square of side 9.4 radii.</summary>
    /// <param name="rzMetres">Ten-point mean roughness R_z, metres; 0 is smooth.</param>
    /// <param name="skinDepthMetres">Skin depth, metres.</param>
    public static double FactorOfFoil(double rzMetres, double skinDepthMetres)
    {
        if (rzMetres <= 0)
            return 1;
        var radius = 0.06 * rzMetres;
        var side = 9.4 * radius;
        return Factor(radius, BallsInPyramid, side * side, skinDepthMetres);
    }
}
