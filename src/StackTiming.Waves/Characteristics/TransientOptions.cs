namespace StackTiming.Waves.Characteristics;

/// <summary>How finely the transient solver steps.</summary>
/// <param name="StepsPerRamp">Steps in the shortest ramp of the stimulus, at least 8.</param>
public sealed record TransientOptions(int StepsPerRamp)
{
    /// <summary>Fine enough for 0.1 ps and 0.1 % of the swing on the reference responses.</summary>
    public static TransientOptions Default { get; } = new(128);

    /// <summary>Change of voltage, as a share of the swing, below which a net counts as settled and the rest of the window is constant.</summary>
    public const double Settled = 1e-5;

    /// <summary>Most steps of one run; a window that needs more is stepped more coarsely.</summary>
    public const int MostSteps = 4_000_000;
}
