namespace StackTiming.Waves.Characteristics;

/// <summary>
/// The waves that one end of a line (or of a mode) has sent, and what of them arrives at the other end one delay later. Between samples the
/// wave is a cubic through the four nearest; for delays of less than two steps, whose fourth sample lies in the future, a parabola or a straight line.
/// </summary>
internal struct WaveHistory
{
    private readonly double[] ring;
    private readonly int mask;
    private readonly int back;
    private readonly int taps;
    private readonly double w0, w1, w2, w3;

    public WaveHistory(double delaySteps, double initial)
    {
        // t − τ lies between the samples `back` and `back − 1` steps ago, a fraction f towards the newer one.
        back = (int)Math.Ceiling(delaySteps - 1e-9);
        var f = Math.Max(0, back - delaySteps);
        var size = 8;
        while (size < back + 4)
            size *= 2;
        ring = new double[size];
        Array.Fill(ring, initial);
        mask = size - 1;
        // Lagrange weights of the samples at −1, 0, 1 and 2 steps from the older neighbour.
        if (f < 1e-9)
        {
            taps = 1;
            w1 = 1;
        }
        else if (back >= 3)
        {
            taps = 4;
            w0 = -f * (f - 1) * (f - 2) / 6;
            w1 = (f + 1) * (f - 1) * (f - 2) / 2;
            w2 = -(f + 1) * f * (f - 2) / 2;
            w3 = (f + 1) * f * (f - 1) / 6;
        }
        else
        {
            taps = 3;
            w0 = f * (f - 1) / 2;
            w1 = (1 - f) * (1 + f);
            w2 = f * (f + 1) / 2;
        }
    }

    /// <summary>What arrives at a step, from what was sent before it.</summary>
    public readonly double Arriving(int step)
    {
        var older = step - back;
        if (taps == 1)
            return ring[older & mask];
        var sum = (w0 * ring[(older - 1) & mask]) + (w1 * ring[older & mask]) + (w2 * ring[(older + 1) & mask]);
        return taps == 4 ? sum + (w3 * ring[(older + 2) & mask]) : sum;
    }

    /// <summary>Records what is sent at a step.</summary>
    public readonly void Send(int step, double wave) => ring[step & mask] = wave;
}
