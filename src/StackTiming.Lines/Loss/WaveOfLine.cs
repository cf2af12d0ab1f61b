using System.Collections.Immutable;
using System.Numerics;

namespace StackTiming.Lines.Loss;

/// <summary>The wave of one mode from its constants per metre.</summary>
internal static class WaveOfLine
{
    private static readonly double DecibelPerNeper = 20 / Math.Log(10);

    /// <summary>Propagation and impedance from γ² = (R + jωL)(G + jωC); the attenuation is split in proportion to the three causes' low-loss shares.</summary>
    /// <param name="name">Name of the mode.</param>
    /// <param name="hertz">Frequency, Hz.</param>
    /// <param name="smooth">Series resistance of smooth metal, ohm/m.</param>
    /// <param name="rough">Series resistance with roughness, ohm/m.</param>
    /// <param name="l">Inductance, H/m.</param>
    /// <param name="g">Conductance, S/m.</param>
    /// <param name="c">Capacitance, F/m.</param>
    public static WaveAtFrequency Of(string name, double hertz, double smooth, double rough, double l, double g, double c)
    {
        var omega = 2 * Math.PI * hertz;
        var series = new Complex(rough, omega * l);
        var shunt = new Complex(g, omega * c);
        var gamma = Complex.Sqrt(series * shunt);
        if (gamma.Real < 0)
            gamma = -gamma;
        var z = series / gamma;
        var lossless = Math.Sqrt(l / c);
        double bySmooth = smooth / lossless, byRough = (rough - smooth) / lossless, byDielectric = g * lossless;
        var sum = bySmooth + byRough + byDielectric;
        var scale = sum > 0 ? DecibelPerNeper * gamma.Real / sum : 0;
        return new WaveAtFrequency(
            name, z.Real, z.Imaginary, gamma.Imaginary / omega, scale * bySmooth, scale * byRough, scale * byDielectric);
    }

    /// <summary>The wave of a single signal; the differential and the common wave of a pair; none for more signals.</summary>
    /// <param name="hertz">Frequency, Hz.</param>
    /// <param name="smooth">R matrix of smooth metal, ohm/m.</param>
    /// <param name="rough">R matrix with roughness, ohm/m.</param>
    /// <param name="l">L matrix, H/m.</param>
    /// <param name="g">G matrix, S/m.</param>
    /// <param name="c">C matrix, F/m.</param>
    public static ImmutableArray<WaveAtFrequency> Modes(double hertz, double[,] smooth, double[,] rough, double[,] l, double[,] g, double[,] c)
    {
        var waves = ImmutableArray.CreateBuilder<WaveAtFrequency>();
        for (var mode = 0; mode < ModeConstants.Count(l.GetLength(0)); mode++)
        {
            var of = ModeConstants.Of(mode, rough, l, g, c);
            var resistance = ModeConstants.Of(mode, smooth, l, g, c).ResistanceOhmPerMetre;
            waves.Add(Of(
                ModeConstants.Name(l.GetLength(0), mode), hertz, resistance, of.ResistanceOhmPerMetre,
                of.InductanceHenryPerMetre, of.ConductanceSiemensPerMetre, of.CapacitanceFaradPerMetre));
        }
        return waves.ToImmutable();
    }
}
