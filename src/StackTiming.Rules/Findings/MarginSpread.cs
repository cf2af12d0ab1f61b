namespace StackTiming.Rules.Findings;

/// <summary>How a margin scatters under the tolerances of fabrication.</summary>
/// <param name="StandardDeviation">Standard deviation of the margin, in the unit of its finding.</param>
/// <param name="Probability">Probability that the rule holds, 0 to 1.</param>
public readonly record struct MarginSpread(double StandardDeviation, double Probability);
