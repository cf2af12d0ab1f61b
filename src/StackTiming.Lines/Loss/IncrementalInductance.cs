using System.Numerics;
using StackTiming.Lines.Materials;
using StackTiming.Lines.Roughness;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Loss;

/// <summary>
/// Losses of a cross-section from any calculator of C and L.
/// Metal at high frequencies by the incremental-inductance rule: R = (R_s/μ₀)·∂L/∂n, n into the metal of traces and planes (H. A. Wheeler, "Formulas
/// for the skin effect", Proc. IRE 30, 1942, pp. 412–424). At d.c. the trapezoids' own area. In between the internal impedance √(R_dc² + 2j·R_hf²), which has both
/// limits, and a constant internal inductance below the transition (a causal interpolation, common practice; up to 10 % off in the transition itself).
/// Roughness multiplies R_hf by <see cref="HammerstadGroisse1999"/>. Dielectrics: G = ω·Σ ε_i·tanδ_i·∂C/∂ε_i.
/// Planes count as thick; their resistance at d.c. is left out.
/// </summary>
public static class IncrementalInductance
{
    private const double RelativeStep = 0.02;
    private const double LossStep = 0.5;

    /// <summary>The line at a frequency, or null where the calculator has no method for the geometry.</summary>
    /// <param name="section">The section, its Dk and Df those of the frequency.</param>
    /// <param name="hertz">Frequency, Hz, above 0.</param>
    /// <param name="calculator">Closed forms or field solver.</param>
    public static LineAtFrequency? At(CrossSection section, double hertz, ILineCalculator calculator)
    {
        if (calculator.Calculate(section) is not { } solution)
            return null;
        var n = solution.Signals.Length;
        var omega = 2 * Math.PI * hertz;
        var warnings = solution.Warnings;
        var highFrequency = new double[n, n];
        if (section.Signals.All(s => s.ThicknessMetres > 0))
            highFrequency = HighFrequencyResistance(section, hertz, calculator, n);
        else
            warnings = warnings.Add("traces without thickness have no resistance: state the copper's thickness for its loss");
        var depth = SkinEffect.DepthMetres(section.Metal.ResistivityOhmMetres, hertz);
        var roughness = HammerstadGroisse1999.Factor(section.Metal.RoughnessRmsMetres, depth);
        var direct = section.Signals.Select(s => DirectResistance(s, section.Metal)).ToArray();
        var smooth = Internal(direct, highFrequency, 1);
        var rough = Internal(direct, highFrequency, roughness);
        var conductance = Conductance(section, calculator, omega, n);
        var r = new double[n, n];
        var l = new double[n, n];
        var rSmooth = new double[n, n];
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
            {
                rSmooth[i, j] = smooth[i, j].Real;
                r[i, j] = rough[i, j].Real;
                l[i, j] = solution.InductanceHenryPerMetre[i, j] + smooth[i, j].Imaginary / omega;
            }
        }
        var c = solution.CapacitanceFaradPerMetre;
        return new LineAtFrequency(solution.Signals, hertz, r, l, conductance, c, WaveOfLine.Modes(hertz, rSmooth, r, l, conductance, c), warnings);
    }

    /// <summary>Direct-current resistance of a trace, ohm/m; 0 for a trace without thickness.</summary>
    /// <param name="trace">The trace.</param>
    /// <param name="metal">Its metal.</param>
    public static double DirectResistance(SectionConductor trace, SectionMetal metal) =>
        trace.AreaSquareMetres > 0 ? metal.ResistivityOhmMetres / trace.AreaSquareMetres : 0;

    /// <summary>R matrix of smooth, thick metal, ohm/m: R_s/μ₀ times the slope of L as all walls recede.</summary>
    private static double[,] HighFrequencyResistance(CrossSection section, double hertz, ILineCalculator calculator, int n)
    {
        var step = RelativeStep * RecededWalls.Scale(section);
        var back = calculator.Calculate(RecededWalls.InAir(section, step))!.InductanceHenryPerMetre;
        var forth = calculator.Calculate(RecededWalls.InAir(section, -step))!.InductanceHenryPerMetre;
        var scale = SkinEffect.SurfaceResistanceOhms(section.Metal.ResistivityOhmMetres, hertz) / Constants.Vacuum.Mu0 / (2 * step);
        var r = new double[n, n];
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
                r[i, j] = scale * (back[i, j] - forth[i, j]);
        }
        return r;
    }

    /// <summary>Internal impedance matrix, ohm/m. Off the diagonal is the common plane, which has no resistance of its own at d.c.</summary>
    private static Complex[,] Internal(double[] direct, double[,] highFrequency, double roughness)
    {
        var n = direct.Length;
        var z = new Complex[n, n];
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
            {
                var r = roughness * highFrequency[i, j];
                z[i, j] = i == j ? Complex.Sqrt(new Complex(direct[i] * direct[i], 2 * r * r)) : new Complex(r, r);
            }
        }
        return z;
    }

    /// <summary>G from how C answers when every permittivity grows in proportion to its loss tangent.</summary>
    private static double[,] Conductance(CrossSection section, ILineCalculator calculator, double omega, int n)
    {
        var g = new double[n, n];
        var largest = section.Slabs.Select(s => s.Dielectric.Df).Append(section.TopMask?.Dielectric.Df ?? 0).Append(section.BottomMask?.Dielectric.Df ?? 0).Max();
        if (largest <= 0)
            return g;
        var step = LossStep * 0.02 / largest;
        var more = calculator.Calculate(Scaled(section, step))!.CapacitanceFaradPerMetre;
        var less = calculator.Calculate(Scaled(section, -step))!.CapacitanceFaradPerMetre;
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
                g[i, j] = omega * (more[i, j] - less[i, j]) / (2 * step);
        }
        return g;
    }

    private static CrossSection Scaled(CrossSection section, double step)
    {
        SectionDielectric Grow(SectionDielectric d) => d with { Dk = d.Dk * (1 + step * d.Df) };
        return section with
        {
            Slabs = [.. section.Slabs.Select(s => s with { Dielectric = Grow(s.Dielectric) })],
            TopMask = section.TopMask is { } top ? top with { Dielectric = Grow(top.Dielectric) } : null,
            BottomMask = section.BottomMask is { } bottom ? bottom with { Dielectric = Grow(bottom.Dielectric) } : null,
        };
    }
}
