using System.Collections.Immutable;
using System.Globalization;
using StackTiming.Lines.Methods;

namespace StackTiming.Reports.Compliance;

/// <summary>What a report says of a method.</summary>
/// <param name="Id">Id that results carry.</param>
/// <param name="Name">Its name.</param>
/// <param name="Source">Full reference.</param>
/// <param name="Validity">Where it holds.</param>
/// <param name="MeasuredError">What was measured against independent references, in words; empty where there is none.</param>
public sealed record MethodDescription(string Id, string Name, string Source, string Validity, string MeasuredError)
{
    /// <summary>The published methods for lines, with the errors that this project's tests measure.</summary>
    public static ImmutableArray<MethodDescription> OfLineMethods() => [.. MethodCatalogue.All.Select(Of)];

    private static MethodDescription Of(LineMethod method)
    {
        var error = "";
        if (method.Measured.Count > 0)
        {
            var impedance = method.Measured.Max(m => Math.Abs(m.ImpedanceError));
            var permittivity = method.Measured.Max(m => Math.Abs(m.EpsEffError));
            error = string.Create(CultureInfo.InvariantCulture, $"impedance {impedance * 100:0.00} %, effective permittivity {permittivity * 100:0.00} %");
        }
        return new MethodDescription(method.Id, method.Name, method.Source, $"{method.Geometry}; {method.Validity}", error);
    }
}
