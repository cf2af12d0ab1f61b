using System.Collections.Immutable;
using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields.Systems;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Fields;

/// <summary>
/// Where the electric energy of a section lies. The energy in a dielectric is half its permittivity times the derivative of V²C with respect to that permittivity
/// at fixed voltages (the derivative of the charges does no work to first order), which the adjoint of the equations gives exactly.
/// </summary>
internal static class EnergyPicture
{
    /// <summary>
    /// The drive that shares are stated for: one volt on a single signal, ±1/2 V on a pair, and one volt on the first of three or more with the others at zero.
    /// </summary>
    public static double[] StandardDrive(int signals)
    {
        if (signals == 2)
            return [0.5, -0.5];
        var volts = new double[signals];
        volts[0] = 1;
        return volts;
    }

    /// <summary>Share of the energy in each dielectric that the section has; materials of one name are one.</summary>
    public static ImmutableArray<DielectricShare> Shares(
        SolvedMesh mesh, ConductorPairs pairs, IReadOnlyList<SectionDielectric> media, ReadOnlySpan<double> signalVolts)
    {
        var volts = pairs.Volts(signalVolts);
        var slopes = new double[media.Count];
        var energy = 0.0;
        foreach (var part in mesh.Filled)
            energy += part.AddEnergy(volts, slopes);
        var present = new bool[media.Count];
        foreach (var panel in mesh.Panels)
        {
            present[panel.Piece.Left] = true;
            if (panel.Piece.Right >= 0)
                present[panel.Piece.Right] = true;
        }

        return
        [
            .. Enumerable.Range(0, media.Count)
                .Where(m => present[m])
                .GroupBy(m => media[m].Name)
                .Select(g => new DielectricShare(g.Key, g.Sum(m => media[m].Dk * slopes[m] / energy)))
        ];
    }

    /// <summary>
    /// The derivative of the capacitance matrix (F/m) with respect to the permittivity of the materials of one name, from the energies of single and paired drives.
    /// </summary>
    public static double[,] CapacitanceSlope(SolvedMesh mesh, ConductorPairs pairs, IReadOnlyList<SectionDielectric> media, string name)
    {
        var slope = new double[pairs.Signals, pairs.Signals];
        var volts = new double[pairs.Signals];
        for (var i = 0; i < pairs.Signals; i++)
        {
            volts[i] = 1;
            slope[i, i] = EnergySlope(mesh, pairs, media, name, volts);
            volts[i] = 0;
        }

        for (var i = 0; i < pairs.Signals; i++)
        {
            for (var j = 0; j < i; j++)
            {
                (volts[i], volts[j]) = (1, 1);
                slope[i, j] = slope[j, i] = (EnergySlope(mesh, pairs, media, name, volts) - slope[i, i] - slope[j, j]) / 2;
                (volts[i], volts[j]) = (0, 0);
            }
        }

        return slope;
    }

    private static double EnergySlope(
        SolvedMesh mesh, ConductorPairs pairs, IReadOnlyList<SectionDielectric> media, string name, ReadOnlySpan<double> signalVolts)
    {
        var slopes = new double[media.Count];
        var halves = mesh.Filled[0].Parity == 0 ? 1 : 2;
        var volts = pairs.Volts(signalVolts);
        foreach (var part in mesh.Filled)
            part.AddEnergy(volts, slopes);
        return Enumerable.Range(0, media.Count).Where(m => media[m].Name == name).Sum(m => slopes[m]) * halves * 2 * Math.PI * Vacuum.Epsilon0;
    }
}
