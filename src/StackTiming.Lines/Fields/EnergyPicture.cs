using System.Collections.Immutable;
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
}
