using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Characteristics;

/// <summary>Sees when a net has settled: every node on its final level for longer than any wave can be under way.</summary>
internal sealed class QuietWatch
{
    private readonly double[] final;
    private readonly double limit;
    private readonly int stepsNeeded;
    private readonly int stepsOfSource;
    private int quiet;

    public QuietWatch(Network network, Circuit circuit, double stepSeconds, double[] final)
    {
        this.final = final;
        var longest = 0.0;
        foreach (var line in circuit.Lines)
            longest = Math.Max(longest, line.DelaySeconds);
        foreach (var group in circuit.Groups)
            longest = Math.Max(longest, group.Modes.Max(m => m.DelaySeconds));
        limit = TransientOptions.Settled * (network.Driver.HighVolts - network.Driver.LowVolts);
        stepsNeeded = (int)(2.5 * longest / stepSeconds) + 64;
        stepsOfSource = (int)(network.Source.LastCornerSeconds / stepSeconds) + 1;
    }

    public bool HasSettled(int step, double[] volts)
    {
        if (step < stepsOfSource)
            return false;
        for (var i = 0; i < volts.Length; i++)
        {
            if (Math.Abs(volts[i] - final[i]) > limit)
            {
                quiet = 0;
                return false;
            }
        }
        return ++quiet >= stepsNeeded;
    }
}
