using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Characteristics;

/// <summary>The modes of a coupled group under way, with what arrives at its near and far ends.</summary>
internal sealed class CoupledEnds
{
    private readonly CoupledLines group;
    private readonly WaveHistory[] near, far;
    private readonly double[] arrivingNear, arrivingFar;

    public CoupledEnds(CoupledLines group, double stepSeconds, double[] initialCurrents, double[] initialVolts)
    {
        this.group = group;
        var modes = group.Modes.Length;
        near = new WaveHistory[modes];
        far = new WaveHistory[modes];
        arrivingNear = new double[modes];
        arrivingFar = new double[modes];
        for (var m = 0; m < modes; m++)
        {
            var mode = group.Modes[m];
            // Conductor currents are weight·(mode current); the pattern, which is the inverse, gives the mode current back.
            double nearVolts = 0, farVolts = 0, amperes = 0;
            for (var k = 0; k < group.From.Length; k++)
            {
                nearVolts += mode.Weights[k] * initialVolts[group.From[k]];
                farVolts += mode.Weights[k] * initialVolts[group.To[k]];
                amperes += mode.Pattern[k] * initialCurrents[k];
            }
            var delay = mode.DelaySeconds / stepSeconds;
            near[m] = new WaveHistory(delay, nearVolts + (mode.ImpedanceOhms * amperes));
            far[m] = new WaveHistory(delay, farVolts - (mode.ImpedanceOhms * amperes));
        }
    }

    /// <summary>Adds the group's conductances and ties the nodes of each of its ends together.</summary>
    public void AddTo(double[,] conductance, NodeSets sets)
    {
        foreach (var ends in new[] { group.From, group.To })
        {
            for (var k = 0; k < ends.Length; k++)
            {
                sets.Join(ends[0], ends[k]);
                for (var l = 0; l < ends.Length; l++)
                {
                    foreach (var mode in group.Modes)
                        conductance[ends[k], ends[l]] += mode.Weights[k] * mode.Weights[l] / mode.ImpedanceOhms;
                }
            }
        }
    }

    /// <summary>Adds the currents of the arriving waves.</summary>
    public void Prepare(int step, double[] currents)
    {
        for (var m = 0; m < near.Length; m++)
        {
            var mode = group.Modes[m];
            arrivingNear[m] = far[m].Arriving(step);
            arrivingFar[m] = near[m].Arriving(step);
            for (var k = 0; k < group.From.Length; k++)
            {
                currents[group.From[k]] += mode.Weights[k] * arrivingNear[m] / mode.ImpedanceOhms;
                currents[group.To[k]] += mode.Weights[k] * arrivingFar[m] / mode.ImpedanceOhms;
            }
        }
    }

    /// <summary>Sends on what the new voltages make of the arriving waves.</summary>
    public void Advance(int step, double[] volts)
    {
        for (var m = 0; m < near.Length; m++)
        {
            double nearVolts = 0, farVolts = 0;
            for (var k = 0; k < group.From.Length; k++)
            {
                nearVolts += group.Modes[m].Weights[k] * volts[group.From[k]];
                farVolts += group.Modes[m].Weights[k] * volts[group.To[k]];
            }
            near[m].Send(step, (2 * nearVolts) - arrivingNear[m]);
            far[m].Send(step, (2 * farVolts) - arrivingFar[m]);
        }
    }
}
