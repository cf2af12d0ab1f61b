using StackTiming.Rules.Findings;

namespace StackTiming.Rules.Judging;

/// <summary>
/// The resistor that ends reflections at the driver: what is missing between the driver's resistance and the impedance of the line that it
/// drives, Z0 − Rs, so that a wave that returns from an open end meets its own impedance.
/// </summary>
public static class SeriesTermination
{
    private const double LeastOhms = 2;

    /// <summary>The fix for a net that rings; the longest trace is what the driver has to match, a short breakout before it hardly counts.</summary>
    /// <param name="driven">The net from its driver.</param>
    /// <param name="path">The way to the receiver that rings.</param>
    public static Fix? Of(DrivenNet driven, ReceiverPath path)
    {
        if (driven.Model is not { } model || PathLength.LongestTrace(path) is not { } line)
            return null;
        var source = model.Resistance.Value;
        var missing = line.Z0Ohms - source - driven.SeriesOhms;
        var figures = $"{Show(line.Z0Ohms)} line less {Show(source)} driver";
        if (missing < LeastOhms)
        {
            return new Fix(
                FixKind.EndResistor,
                $"end the net at {path.Receiver} with {Show(line.Z0Ohms)} to the middle of the swing: the source is matched already ({figures}), so a resistor there does not help",
                driven.Net, line.Layer, line.Z0Ohms);
        }
        if (driven.SeriesOhms > 0)
        {
            var total = driven.SeriesOhms + missing;
            return new Fix(
                FixKind.SeriesResistor, $"raise the series resistor from {Show(driven.SeriesOhms)} to {Show(total)} ({figures})", driven.Net, line.Layer, total);
        }
        return new Fix(
            FixKind.SeriesResistor, $"put {Show(missing)} in series at {driven.Driver} ({figures})", driven.Net, line.Layer, missing);
    }

    /// <summary>Impedance of the longest trace of a way, ohm; NaN where it has none.</summary>
    /// <param name="path">The way.</param>
    public static double LineOhms(ReceiverPath path) => PathLength.LongestTrace(path)?.Z0Ohms ?? double.NaN;

    /// <summary>A resistance as text.</summary>
    /// <param name="ohms">Resistance, ohm.</param>
    public static string Show(double ohms) => ohms.ToString("F1", System.Globalization.CultureInfo.InvariantCulture) + " ohm";
}
