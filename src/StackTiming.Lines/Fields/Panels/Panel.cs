using System.Numerics;
using StackTiming.Lines.Fields.Geometry;

namespace StackTiming.Lines.Fields.Panels;

/// <summary>A straight stretch of charged surface on which the charge is one polynomial of the panel's parameter.</summary>
/// <param name="Piece">The surface that it belongs to.</param>
/// <param name="Map">How the parameter runs along the line.</param>
/// <param name="Origin">Where the distance along the line is zero.</param>
/// <param name="Direction">Unit vector along the line.</param>
/// <param name="Length">Length in metres; of an infinite panel, the distance from the origin at which it begins.</param>
/// <param name="Terms">Number of Legendre polynomials, one more than the degree.</param>
internal sealed record Panel(SurfacePiece Piece, PanelMap Map, Complex Origin, Complex Direction, double Length, int Terms)
{
    /// <summary>Distance from the origin along the line at u.</summary>
    public double Distance(double u) => Map switch
    {
        PanelMap.Infinite => Length / u,
        PanelMap.Straight => Length * u,
        PanelMap.Square => Length * u * u,
        _ => Length * u * u * u,
    };

    /// <summary>Magnitude of the derivative of <see cref="Distance"/>: metres per u.</summary>
    public double Stretch(double u) => Map switch
    {
        PanelMap.Infinite => Length / (u * u),
        PanelMap.Straight => Length,
        PanelMap.Square => 2 * Length * u,
        _ => 3 * Length * u * u,
    };

    /// <summary>The point at u.</summary>
    public Complex At(double u) => Origin + Distance(u) * Direction;

    /// <summary>
    /// Sum of the half-axes of the ellipse about the parameter's range (mapped to -1…1) on which the point lies. Expansions in Legendre
    /// polynomials of a function that is singular there converge as this number to the power of minus the degree (S. N. Bernstein 1912;
    /// L. N. Trefethen, Approximation Theory and Approximation Practice, 2013, ch. 8).
    /// </summary>
    public double Ellipse(Complex point)
    {
        var local = (point - Origin) * Complex.Conjugate(Direction) / Length;
        var u = Map switch
        {
            PanelMap.Infinite => 1 / local,
            PanelMap.Straight => local,
            PanelMap.Square => Complex.Sqrt(local),
            _ => Complex.Pow(local, 1.0 / 3),
        };
        var z = 2 * u - 1;
        var semiAxis = ((z - 1).Magnitude + (z + 1).Magnitude) / 2;
        return semiAxis + Math.Sqrt(Math.Max(0, semiAxis * semiAxis - 1));
    }
}
