using System.Collections.Immutable;

namespace StackTiming.Waves.Responses;

/// <summary>
/// Voltages over time at the receivers of a network, at equal steps from t = 0, the start of the first ramp. Where a net has settled before the
/// window ends the samples stop early; from then on the voltage is the final one.
/// </summary>
/// <param name="StepSeconds">Time between samples, seconds.</param>
/// <param name="DurationSeconds">Length of the window, seconds.</param>
/// <param name="Receivers">The receivers in the order of the network.</param>
/// <param name="Pin">Voltage at the driver's pin.</param>
/// <param name="Engine">Which engine computed it.</param>
public sealed record Response(
    double StepSeconds, double DurationSeconds, ImmutableArray<NodeVoltage> Receivers, NodeVoltage Pin, string Engine);

/// <summary>The voltage of a node over time.</summary>
/// <param name="Volts">Samples from t = 0.</param>
/// <param name="InitialVolts">Direct-current level before t = 0.</param>
/// <param name="FinalVolts">Direct-current level of the last source level.</param>
public sealed record NodeVoltage(double[] Volts, double InitialVolts, double FinalVolts)
{
    /// <summary>The voltage at an instant, straight between samples.</summary>
    /// <param name="seconds">Time from the start of the first ramp.</param>
    /// <param name="stepSeconds">Time between samples.</param>
    public double At(double seconds, double stepSeconds)
    {
        var position = seconds / stepSeconds;
        if (position <= 0)
            return InitialVolts;
        var i = (int)position;
        if (i >= Volts.Length - 1)
            return Volts.Length > 0 && i == Volts.Length - 1 && position - i < 1e-9 ? Volts[i] : FinalVolts;
        return Volts[i] + ((position - i) * (Volts[i + 1] - Volts[i]));
    }
}
