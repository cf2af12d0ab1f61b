using System.Numerics;
using MathNet.Numerics.IntegralTransforms;
using StackTiming.Waves.Characteristics;
using StackTiming.Waves.Networks;
using StackTiming.Waves.Responses;

namespace StackTiming.Waves.FrequencyDomain;

/// <summary>
/// Transient response of a linear network with lossy lines: the nodal solution along Re s = c of the complex-frequency plane, inverted by the fast Fourier
/// transform (Bromwich integral; see H. Dubner and J. Abate, "Numerical inversion of Laplace transforms by relating them to the finite Fourier cosine
/// transform", J. ACM 15, 1968). The period is twice the window, so that what wraps around is damped below 1e-6 of the response; the upper half of the band
/// is faded out, which confines what the end of the band does to the corners of a waveform. Causal, because every line is taken exactly.
/// </summary>
public static class FrequencySolver
{
    /// <summary>Name of the engine in results.</summary>
    public const string EngineName = "nodal solution in the complex-frequency plane (Dubner and Abate 1968)";

    /// <summary>Steps in the shortest ramp, at least.</summary>
    private const int StepsPerRamp = 64;

    private const int MostSamples = 1 << 20;
    private const double DampingAtPeriod = 16; // e^-16 wraps around
    private const double FadeBegins = 0.5;

    /// <summary>The response of a network.</summary>
    /// <param name="network">A network in which <see cref="NetworkCheck"/> finds no problem.</param>
    public static Response Solve(Network network)
    {
        var circuit = Circuit.Of(network, stepSeconds: 0);
        var steady = new SteadyState(circuit);
        var source = network.Source;
        var initial = steady.Solve(source.InitialVolts);
        var final = steady.Solve(source.FinalVolts);
        var period = 2 * network.DurationSeconds;
        var samples = 1024;
        while (samples < MostSamples && period / samples > network.Stimulus.ShortestRampSeconds / StepsPerRamp)
            samples *= 2;
        var step = period / samples;
        int[] nodes = [.. network.Receivers.Select(r => r.Node), network.Driver.Node];
        var spectra = Spectra(circuit, source, nodes, samples, period);
        var kept = Math.Min(samples, (int)Math.Ceiling(network.DurationSeconds / step) + 1);
        NodeVoltage Voltage(int i)
        {
            Fourier.Inverse(spectra[i], FourierOptions.NoScaling);
            var volts = new double[kept];
            for (var n = 0; n < kept; n++)
                volts[n] = initial[nodes[i]] + (Math.Exp(DampingAtPeriod * n / samples) / period * spectra[i][n].Real);
            return new NodeVoltage(volts, initial[nodes[i]], final[nodes[i]]);
        }
        return new Response(
            step, network.DurationSeconds, [.. Enumerable.Range(0, network.Receivers.Length).Select(Voltage)], Voltage(network.Receivers.Length), EngineName);
    }

    private static Complex[][] Spectra(Circuit circuit, SourceWaveform source, int[] nodes, int samples, double period)
    {
        var spectra = Array.ConvertAll(nodes, _ => new Complex[samples]);
        var nodal = new NodalSolution(circuit);
        for (var k = 0; k < samples / 2; k++)
        {
            var fade = Fade(k / (0.5 * samples));
            if (fade == 0)
                break;
            var s = new Complex(DampingAtPeriod / period, 2 * Math.PI * k / period);
            var drive = fade * SourceSpectrum(source, s);
            var volts = nodal.At(s);
            for (var i = 0; i < nodes.Length; i++)
            {
                var value = drive * volts[nodes[i]];
                spectra[i][k] = value;
                if (k > 0)
                    spectra[i][samples - k] = Complex.Conjugate(value);
            }
        }
        return spectra;
    }

    private static double Fade(double share)
    {
        if (share <= FadeBegins)
            return 1;
        var cosine = Math.Cos(0.5 * Math.PI * (share - FadeBegins) / (1 - FadeBegins));
        return cosine * cosine;
    }

    /// <summary>Laplace transform of the source's departure from its first level: each change of slope at t adds slope·e^(−st)/s².</summary>
    private static Complex SourceSpectrum(SourceWaveform source, Complex s)
    {
        var sum = Complex.Zero;
        var before = 0.0;
        for (var i = 0; i < source.TimesSeconds.Length; i++)
        {
            var after = i + 1 < source.TimesSeconds.Length
                ? (source.Volts[i + 1] - source.Volts[i]) / (source.TimesSeconds[i + 1] - source.TimesSeconds[i]) : 0;
            sum += (after - before) * Complex.Exp(-s * source.TimesSeconds[i]);
            before = after;
        }
        return sum / (s * s);
    }
}
