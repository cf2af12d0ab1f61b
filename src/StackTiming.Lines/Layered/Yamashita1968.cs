using System.Collections.Immutable;
using StackTiming.Lines.Constants;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Layered;

/// <summary>
/// Traces in flat dielectric layers over a plane or between two, by the variational method in the Fourier domain: E. Yamashita, R. Mittra, "Variational method
/// for the analysis of microstrip lines", IEEE Trans. MTT-16, 1968, pp. 251–256, and E. Yamashita, "Variational method for the analysis of
/// microstrip-like transmission lines", same volume, pp. 529–535; with the edge-singular charge functions that later spectral-domain work uses, so that
/// several traces side by side or above each other are described too.
/// A trapezoid is three strips: its faces at their true widths and heights, and a waist that stands for the side walls (<see cref="StripModel"/>). The conformal mask
/// becomes flat layers (<see cref="MaskCoating"/>). Lengths in metres. Errors measured against the references: see <see cref="MethodCatalogue"/>.
/// Planes are infinite; a plane with an edge above or below a trace is a case for the field solver.
/// </summary>
public sealed class Yamashita1968 : IClosedForm
{
    private const int MostConductors = 16;

    /// <inheritdoc/>
    public LineMethod Method => MethodCatalogue.Yamashita1968;

    /// <inheritdoc/>
    public string? Objection(CrossSection section)
    {
        if (section.BottomPlaneMetres is not { } bottom)
            return "it needs an infinite plane below the traces";
        if (section.Slabs.IsEmpty && section.TopMask is not null)
            return "it needs a dielectric under the mask";
        if (section.Conductors.Length > MostConductors)
            return $"it describes at most {MostConductors} conductors";
        foreach (var c in section.Conductors)
        {
            if (c.BottomMetres <= bottom || c.TopMetres >= section.TopPlaneMetres)
                return $"conductor '{c.Name}' touches a plane";
            if (c.Grounded && section.Signals.Any(s => Math.Abs(s.CentreMetres - c.CentreMetres) < 0.5 * (s.WideMetres + c.WideMetres)))
                return $"grounded conductor '{c.Name}' lies above or below a trace, like a plane with an edge";
        }
        return section.Signals.Any() ? null : "it needs a signal";
    }

    /// <inheritdoc/>
    public bool Suits(CrossSection section) => true;

    /// <inheritdoc/>
    public LineSolution Calculate(CrossSection section)
    {
        var layered = new LayeredSection(section);
        var (c, l) = Matrices(section, layered);
        var signals = section.Signals.Count();
        ImmutableArray<DielectricShare> shares = signals <= 2 ? SharesOf(section, layered, signals == 2) : [];
        return new LineSolution(
            [.. section.Signals.Select(s => s.Name)], Method.Id, c, l, shares, ErrorOf(section), Warnings(section));
    }

    /// <summary>Capacitance and inductance matrices of the signals without the energy shares: the fast path of tolerance sampling.</summary>
    /// <param name="section">A section to which <see cref="Objection"/> has none.</param>
    /// <returns>C in F/m and L in H/m.</returns>
    public static (double[,] Capacitance, double[,] Inductance) Matrices(CrossSection section) => Matrices(section, new LayeredSection(section));

    private static (double[,] C, double[,] L) Matrices(CrossSection section, LayeredSection layered)
    {
        var filled = Array.ConvertAll(layered.Dielectrics, d => d.Dk);
        var air = new double[filled.Length];
        Array.Fill(air, 1);
        var c = OfSignals(layered.Capacitance(filled), section);
        var inAir = OfSignals(layered.Capacitance(air), section);
        return (c, InverseOf(inAir, Vacuum.Mu0 * Vacuum.Epsilon0));
    }

    private static double[,] OfSignals(double[,] all, CrossSection section)
    {
        var index = Enumerable.Range(0, section.Conductors.Length).Where(i => !section.Conductors[i].Grounded).ToArray();
        var result = new double[index.Length, index.Length];
        for (var i = 0; i < index.Length; i++)
        {
            // The two triangles differ by rounding only.
            for (var j = 0; j < index.Length; j++)
                result[i, j] = 0.5 * (all[index[i], index[j]] + all[index[j], index[i]]);
        }
        return result;
    }

    private static double[,] InverseOf(double[,] matrix, double scale)
    {
        var n = matrix.GetLength(0);
        var factor = new double[n * n];
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
                factor[i * n + j] = matrix[i, j];
        }
        Cholesky.Factor(factor, n);
        var inverse = new double[n, n];
        var column = new double[n];
        for (var j = 0; j < n; j++)
        {
            Array.Clear(column);
            column[j] = scale;
            Cholesky.Solve(factor, column);
            for (var i = 0; i < n; i++)
                inverse[i, j] = column[i];
        }
        return inverse;
    }

    private static ImmutableArray<DielectricShare> SharesOf(CrossSection section, LayeredSection layered, bool pair)
    {
        var voltages = new double[section.Conductors.Length];
        var next = pair ? 0.5 : 1;
        for (var i = 0; i < voltages.Length; i++)
        {
            if (section.Conductors[i].Grounded)
                continue;
            voltages[i] = next;
            next = -0.5;
        }
        return EnergyShares.ByName(layered.Dielectrics, layered.EnergyShares(voltages, pair));
    }

    /// <summary>
    /// Largest relative error of an impedance or permittivity that was seen for such a section: 100 random lines of each reference family against the field solver.
    /// </summary>
    private static double ErrorOf(CrossSection section)
    {
        var alone = section.Conductors.Length == 1;
        if (MaskCoating.Of(section).Coats)
            return alone ? 0.012 : 0.025;
        return alone || section.Conductors.All(c => c.CentreMetres == section.Conductors[0].CentreMetres) ? 0.004 : 0.011;
    }

    private ImmutableArray<string> Warnings(CrossSection section)
    {
        var validity = new Validity(Method);
        foreach (var c in section.Conductors)
        {
            if (c.Grounded)
                continue;
            validity.AtMost($"thickness / width of '{c.Name}'", c.ThicknessMetres / c.NarrowMetres, 1.5);
            var gap = StripModel.GapBeside(c, section);
            validity.AtMost($"thickness / gap beside '{c.Name}'", c.ThicknessMetres / gap, 0.67)
                .AtMost($"width / gap beside '{c.Name}'", c.WideMetres / gap, 20);
        }
        if (section.TopMask is { } mask && MaskCoating.Of(section) is { Coats: true } coating)
        {
            var height = section.Slabs[^1].TopMetres - section.BottomPlaneMetres!.Value;
            var gap = section.Conductors.Min(c => StripModel.GapBeside(c, section));
            validity.AtMost("mask coats of two walls / gap between them", 2 * mask.OverCopperMetres / gap, 0.6)
                .Within("mask over copper / trace thickness", mask.OverCopperMetres / coating.TraceMetres, 0.1, 1.5)
                .Within("height / trace thickness of a masked trace", height / coating.TraceMetres, 1, 12);
        }
        return validity.Warnings;
    }
}
