using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Characteristics;

/// <summary>
/// Chooses the time step: a whole fraction of the shortest ramp, so that its corners fall on steps. Lines shorter than a step do not shorten it: to an
/// edge a hundred times as long they are as good as their inductance and capacitance. Coupled lines, which cannot be lumped, do; so does a small inductance between
/// two capacitances that ring against each other.
/// </summary>
internal static class StepChoice
{
    /// <summary>Lines below this share of the ramp act as inductances.</summary>
    private const double ShortLine = 1.0 / 32;

    /// <summary>A resonance of lower impedance than lines have is not damped by them, ohms.</summary>
    private const double UndampedBelowOhms = 25;

    /// <summary>
    /// The trapezoidal rule turns a resonance by (step/s)²/12 of its phase, s = √(LC), and a ramp excites it by s/ramp: with this share of s·ramp for the square of the
    /// step, a resonance that lives for a few radians stays below 0.02 % of the swing.
    /// </summary>
    private const double ResonanceShare = 8e-4;

    /// <summary>A resonance shortens the step no further than to this share of the ramp; faster ones are hardly excited.</summary>
    private const double FinestForResonance = 1.0 / 512;

    /// <summary>The step in seconds.</summary>
    public static double Of(Network network, TransientOptions options)
    {
        var ramp = network.Stimulus.ShortestRampSeconds;
        var wanted = Math.Min(ramp / options.StepsPerRamp, Math.Max(ForResonances(network, ramp), ramp * FinestForResonance));
        foreach (var group in network.CoupledLines)
        {
            foreach (var mode in group.Modes)
                wanted = Math.Min(wanted, mode.DelaySeconds);
        }
        wanted = Math.Max(wanted, network.DurationSeconds / TransientOptions.MostSteps);
        return ramp / Math.Max(1, Math.Ceiling(ramp / wanted));
    }

    private static double ForResonances(Network network, double ramp)
    {
        var farads = new double[network.NodeNames.Length];
        foreach (var shunt in network.Shunts)
            farads[shunt.Node] += shunt.CapacitanceFarads;
        foreach (var receiver in network.Receivers)
            farads[receiver.Node] += receiver.CapacitanceFarads;
        var step = double.PositiveInfinity;
        void Consider(double henries, double a, double b)
        {
            var both = a * b / (a + b);
            if (henries > 0 && both > 0 && henries < both * UndampedBelowOhms * UndampedBelowOhms)
                step = Math.Min(step, Math.Sqrt(ResonanceShare * ramp * Math.Sqrt(henries * both)));
        }
        foreach (var line in network.Lines)
        {
            if (line.DelaySeconds < ShortLine * ramp)
                Consider(line.Z0Ohms * line.DelaySeconds, farads[line.From], farads[line.To]);
        }
        foreach (var branch in network.Series)
        {
            if (branch.CapacitanceFarads is null && branch.ResistanceOhms < UndampedBelowOhms)
                Consider(branch.InductanceHenries, farads[branch.From], farads[branch.To]);
        }
        if (network.Driver.Package is { } package)
            Consider(package.InductanceHenries, package.CapacitanceFarads, farads[network.Driver.Node]);
        return step;
    }
}
