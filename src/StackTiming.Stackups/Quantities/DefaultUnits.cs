using System.Collections.Immutable;

namespace StackTiming.Stackups.Quantities;

/// <summary>The units that a file declares for bare numbers (<c>units: { length: um }</c>), as factors to SI.</summary>
/// <param name="Factors">Dimension to the factor that turns a bare number into the SI unit.</param>
public sealed record DefaultUnits(ImmutableDictionary<Dimension, double> Factors)
{
    /// <summary>No defaults: every quantity with a dimension needs its unit.</summary>
    public static DefaultUnits None { get; } = new(ImmutableDictionary<Dimension, double>.Empty);
}
