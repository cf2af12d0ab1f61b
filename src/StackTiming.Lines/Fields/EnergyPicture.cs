using System.Collections.Immutable;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Fields;

/// <summary>
/// Where the electric energy of a section lies. The energy in a dielectric is half its permittivity times the derivative of V'CV with
/// respect to that permittivity at fixed voltages (the change of the field does no work to first order), which the adjoint of the
/// equations gives exactly.
/// </summary>
internal static class EnergyPicture
{
    /// <summary>
    /// The drive that shares are stated for: one volt on a single signal, ±1/2 V on a pair, and one volt on the first of three or more
    /// with the others at zero.
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
        SolvedMesh mesh, IReadOnlyList<SectionDielectric> media, ReadOnlySpan<double> signalVolts)
    {
        var shares = new double[media.Count];
        var total = Form(mesh.FilledCapacitance, signalVolts);
        for (var m = 0; m < shares.Length; m++)
            shares[m] = media[m].Dk * Form(mesh.CapacitanceSlope(m), signalVolts) / total;
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
                .Select(g => new DielectricShare(g.Key, g.Sum(m => shares[m])))
        ];
    }

    private static double Form(double[,] matrix, ReadOnlySpan<double> volts)
    {
        var sum = 0.0;
        for (var i = 0; i < volts.Length; i++)
        {
            for (var j = 0; j < volts.Length; j++)
                sum += volts[i] * matrix[i, j] * volts[j];
        }

        return sum;
    }
}
