using System.Numerics;
using StackTiming.Waves.Networks;

namespace StackTiming.Waves.FrequencyDomain;

/// <summary>A line as a two-port at a complex frequency: what flows into each end for a voltage at the same and at the other end.</summary>
/// <param name="Own">Admittance of an end with the other one shorted: Yc·coth(γl), siemens.</param>
/// <param name="Transfer">Current into an end for one volt at the other: −Yc/sinh(γl), siemens.</param>
internal readonly record struct LineAdmittance(Complex Own, Complex Transfer)
{
    /// <summary>The two-port of a line of characteristic admittance Yc and propagation γl.</summary>
    /// <param name="characteristicSiemens">Yc.</param>
    /// <param name="propagation">γ times the length; its real part is positive.</param>
    public static LineAdmittance Of(Complex characteristicSiemens, Complex propagation)
    {
        // In terms of e^(−γl) nothing overflows on long lines.
        var e = Complex.Exp(-propagation);
        var denominator = 1 - (e * e);
        return new LineAdmittance(characteristicSiemens * (1 + (e * e)) / denominator, -2 * characteristicSiemens * e / denominator);
    }

    /// <summary>The two-port of a line without loss, or of a mode.</summary>
    /// <param name="s">Complex frequency, 1/s.</param>
    /// <param name="z0Ohms">Impedance.</param>
    /// <param name="delaySeconds">Delay.</param>
    public static LineAdmittance Lossless(Complex s, double z0Ohms, double delaySeconds) => Of(1 / z0Ohms, s * delaySeconds);
}

/// <summary>
/// A lossy line: Z'(s) = r_dc + r_skin·√(s/π) + s·l, Y'(s) = s·c·ε(s), with the wideband Debye dielectric of A. R. Djordjević, R. M. Biljić, V. D. Likar-Smiljanić
/// and T. K. Sarkar, "Wideband frequency-domain characterization of FR-4 and time-domain causality", IEEE Trans. EMC 43, 2001, between 1 kHz and 1 THz.
/// </summary>
internal sealed class LossyLineAdmittance
{
    private const double LowerRadians = 2 * Math.PI * 1e3;
    private const double UpperRadians = 2 * Math.PI * 1e12;
    private static readonly double LogSpan = Math.Log(UpperRadians / LowerRadians);

    private readonly LossyLineConstants line;
    private readonly double length, epsInfinity, epsStep;

    public LossyLineAdmittance(LossyLine line)
    {
        this.line = line.Constants;
        length = line.LengthMetres;
        // ε = 1 − j·df at the stated frequency: two equations for the two constants.
        var shape = Shape(new Complex(0, 2 * Math.PI * this.line.AtHertz));
        epsStep = this.line.Df == 0 ? 0 : this.line.Df / -shape.Imaginary;
        epsInfinity = 1 - (epsStep * shape.Real);
    }

    /// <summary>The two-port at a complex frequency.</summary>
    public LineAdmittance At(Complex s)
    {
        var series = line.DcResistanceOhmPerMetre + (line.SkinResistance * Complex.Sqrt(s / Math.PI)) + (s * line.InductanceHenryPerMetre);
        var shunt = s * line.CapacitanceFaradPerMetre * (epsStep == 0 ? 1 : epsInfinity + (epsStep * Shape(s)));
        var gamma = Complex.Sqrt(series * shunt);
        return LineAdmittance.Of(gamma / series, gamma * length);
    }

    private static Complex Shape(Complex s) => Complex.Log((UpperRadians + s) / (LowerRadians + s)) / LogSpan;
}
