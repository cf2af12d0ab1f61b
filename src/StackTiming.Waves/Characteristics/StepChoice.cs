using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Characteristics;

/// <summary>Chooses the time step: a whole fraction of the shortest ramp, so that its corners fall on steps.</summary>
internal static class StepChoice
{
    /// <summary>The step in seconds.</summary>
    public static double Of(Network network, TransientOptions options)
    {
        var ramp = network.Stimulus.ShortestRampSeconds;
        var wanted = ramp / options.StepsPerRamp;
        // A quarter of the shortest delay keeps interpolation inside the line, but a via need not slow the whole net down: below an
        // eighth of the wanted step a line is as good as its inductance and capacitance.
        foreach (var line in network.Lines)
        {
            if (line.DelaySeconds >= wanted / 8)
                wanted = Math.Min(wanted, Math.Max(line.DelaySeconds / 4, wanted / 4));
        }
        foreach (var group in network.CoupledLines)
        {
            foreach (var mode in group.Modes)
                wanted = Math.Min(wanted, mode.DelaySeconds);
        }
        wanted = Math.Max(wanted, network.DurationSeconds / TransientOptions.MostSteps);
        return ramp / Math.Max(1, Math.Ceiling(ramp / wanted));
    }
}
