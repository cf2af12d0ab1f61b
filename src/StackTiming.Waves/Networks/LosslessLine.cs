namespace StackTiming.Waves.Networks;

/// <summary>A line without loss between two nodes, its return conductor being ground.</summary>
/// <param name="From">Node of its near end.</param>
/// <param name="To">Node of its far end.</param>
/// <param name="Z0Ohms">Characteristic impedance in ohms; above 0.</param>
/// <param name="DelaySeconds">Delay from end to end, in seconds; above 0.</param>
public readonly record struct LosslessLine(int From, int To, double Z0Ohms, double DelaySeconds);
