using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Characteristics;

/// <summary>
/// Chooses the time step: a whole fraction of the shortest ramp, so that its corners fall on steps. Lines shorter than a step do not shorten it: to an
/// edge a hundred times as long they are as good as their inductance and capacitance. Coupled lines, which cannot be lumped, do.
/// </summary>
internal static class StepChoice
{
    /// <summary>The step in seconds.</summary>
    public static double Of(Network network, TransientOptions options)
    {
        var ramp = network.Stimulus.ShortestRampSeconds;
        var wanted = ramp / options.StepsPerRamp;
        foreach (var group in network.CoupledLines)
        {
            foreach (var mode in group.Modes)
                wanted = Math.Min(wanted, mode.DelaySeconds);
        }
        wanted = Math.Max(wanted, network.DurationSeconds / TransientOptions.MostSteps);
        return ramp / Math.Max(1, Math.Ceiling(ramp / wanted));
    }
}
