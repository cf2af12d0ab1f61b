using System.Collections.Immutable;
using System.Numerics;

namespace StackTiming.Reports.Results;

/// <summary>Scattering parameters against frequency, as a Touchstone file holds them.</summary>
/// <param name="ReferenceOhms">Reference resistance of every port, ohm.</param>
/// <param name="Hertz">Frequencies in strictly rising order, Hz.</param>
/// <param name="Scattering">A square matrix for each frequency: the response of port <c>row</c> to a wave into port <c>column</c>.</param>
/// <param name="Comments">Lines of comment: source, method, ports.</param>
public sealed record TouchstoneNetwork(
    double ReferenceOhms, ImmutableArray<double> Hertz, ImmutableArray<Complex[,]> Scattering, ImmutableArray<string> Comments)
{
    /// <summary>Number of ports.</summary>
    public int Ports => Scattering[0].GetLength(0);
}
