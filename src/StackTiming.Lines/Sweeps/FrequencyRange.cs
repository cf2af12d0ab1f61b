using System.Collections.Immutable;

namespace StackTiming.Lines.Sweeps;

/// <summary>Frequencies that are evenly spaced on a logarithmic scale, both ends included.</summary>
/// <param name="FromHertz">Lowest frequency, Hz, above 0.</param>
/// <param name="ToHertz">Highest frequency, Hz, not below <paramref name="FromHertz"/>.</param>
/// <param name="PointsPerDecade">Least number of points in a decade; the spacing is made a little closer where that fits both ends.</param>
public readonly record struct FrequencyRange(double FromHertz, double ToHertz, int PointsPerDecade)
{
    /// <summary>The frequencies in rising order, Hz.</summary>
    public ImmutableArray<double> Hertz()
    {
        var decades = Math.Log10(ToHertz / FromHertz);
        if (!(decades > 0))
            return [FromHertz];
        var steps = Math.Max(1, (int)Math.Ceiling(decades * PointsPerDecade - 1e-9));
        var hertz = ImmutableArray.CreateBuilder<double>(steps + 1);
        for (var i = 0; i < steps; i++)
            hertz.Add(FromHertz * Math.Pow(10, decades * i / steps));
        hertz.Add(ToHertz);
        return hertz.MoveToImmutable();
    }
}
