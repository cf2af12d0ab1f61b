using System.Numerics;
using StackTiming.Lines.Constants;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Currents;

/// <summary>
/// Series impedance of the copper of a solved section from direct current to skin effect, without roughness: resistance and internal
/// inductance are the real and imaginary part of one function, so that they are causal together.
/// <para>
/// A signal's own conductor: <see cref="PlateImpedance"/>, exact at direct current and in the skin-effect limit of the solved current
/// distribution. Currents that a signal induces in other conductors: Z_s·spread·tanh(q), q = (1+j)·t/2δ of that conductor, which dies
/// with the square of the frequency. Planes are thick against the skin depth: Z_s·spread.
/// </para>
/// </summary>
public sealed class ConductorLoss
{
    private readonly CrossSection section;
    private readonly CurrentSpread spread;
    private readonly int[] rows;

    private ConductorLoss(CrossSection section, CurrentSpread spread, int[] rows) =>
        (this.section, this.spread, this.rows) = (section, spread, rows);

    /// <summary>Number of signals.</summary>
    public int Signals => spread.Planes.GetLength(0);

    /// <summary>The loss of a solved section.</summary>
    /// <exception cref="SectionNotSolvableException">A conductor has no thickness.</exception>
    public static ConductorLoss Of(FieldSolution solution) => new(
        solution.Section,
        CurrentSpread.Of(solution),
        [.. Enumerable.Range(0, solution.Section.Conductors.Length).Select(solution.Pairs.SignalRow)]);

    /// <summary>Resistance of each signal's own conductor to direct current, ohm per metre.</summary>
    public double[] DirectResistanceOhmPerMetre =>
        [.. section.Signals.Select(c => section.Metal.ResistivityOhmMetres / c.AreaSquareMetres)];

    /// <summary>
    /// The resistance matrix under pure skin effect over the surface resistance, in 1/m, planes and grounded conductors included: what a
    /// roughness factor or another metal scales.
    /// </summary>
    public double[,] SkinSpreadPerMetre()
    {
        var sum = (double[,])spread.Planes.Clone();
        foreach (var part in spread.Conductors)
            AddScaled(sum, part, 1);
        return sum;
    }

    /// <summary>Share of the skin-effect loss of a current in one signal that falls on the planes, 0 to 1.</summary>
    public double PlaneShare(int signal) => spread.Planes[signal, signal] / SkinSpreadPerMetre()[signal, signal];

    /// <summary>Resistance and internal inductance per metre at a frequency.</summary>
    /// <param name="frequencyHertz">Frequency in hertz, at least 0.</param>
    /// <returns>Resistance in ohm per metre and internal inductance in henry per metre, as matrices of the signals.</returns>
    public (double[,] ResistanceOhmPerMetre, double[,] InternalInductanceHenryPerMetre) At(double frequencyHertz)
    {
        ArgumentOutOfRangeException.ThrowIfNegative(frequencyHertz);
        // At d.c. the ratio of the imaginary part to the frequency tends to the inductance of even current; a millihertz is there.
        var omega = 2 * Math.PI * Math.Max(frequencyHertz, 1e-3);
        var impedance = Impedance(omega);
        var (resistance, inductance) = (new double[Signals, Signals], new double[Signals, Signals]);
        for (var i = 0; i < Signals; i++)
        {
            for (var j = 0; j < Signals; j++)
            {
                resistance[i, j] = impedance[i, j].Real;
                inductance[i, j] = impedance[i, j].Imaginary / omega;
            }
        }

        return (resistance, inductance);
    }

    private Complex[,] Impedance(double omega)
    {
        var resistivity = section.Metal.ResistivityOhmMetres;
        var surface = Complex.Sqrt(Complex.ImaginaryOne * omega * Vacuum.Mu0 * resistivity);
        var sum = new Complex[Signals, Signals];
        AddScaled(sum, spread.Planes, surface);
        for (var c = 0; c < rows.Length; c++)
        {
            var conductor = section.Conductors[c];
            var q = surface / resistivity * conductor.ThicknessMetres / 2;
            AddScaled(sum, spread.Conductors[c], surface * Complex.Tanh(q));
            if (rows[c] < 0)
                continue;
            var own = spread.Conductors[c][rows[c], rows[c]];
            var plate = new PlateImpedance(
                resistivity / conductor.AreaSquareMetres, spread.InternalInductance[rows[c]], own * Math.Sqrt(Vacuum.Mu0 * resistivity));
            sum[rows[c], rows[c]] += plate.At(omega) - surface * Complex.Tanh(q) * own;
        }

        return sum;
    }

    private static void AddScaled(double[,] sum, double[,] part, double scale)
    {
        for (var i = 0; i < sum.GetLength(0); i++)
        {
            for (var j = 0; j < sum.GetLength(1); j++)
                sum[i, j] += scale * part[i, j];
        }
    }

    private static void AddScaled(Complex[,] sum, double[,] part, Complex scale)
    {
        for (var i = 0; i < sum.GetLength(0); i++)
        {
            for (var j = 0; j < sum.GetLength(1); j++)
                sum[i, j] += scale * part[i, j];
        }
    }
}
