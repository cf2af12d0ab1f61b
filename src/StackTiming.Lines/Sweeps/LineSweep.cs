using System.Collections.Immutable;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Fields.Currents;
using StackTiming.Lines.Loss;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Sweeps;

/// <summary>
/// A cross-section against frequency. With the field solver every frequency is solved anew, because the dielectrics change with it, and the copper comes from
/// the solved current distribution (<see cref="FieldLoss"/>); with closed forms it comes from <see cref="IncrementalInductance"/>.
/// </summary>
public static class LineSweep
{
    /// <summary>The line at each frequency, or null where the calculator has no method for the geometry.</summary>
    /// <param name="sectionAt">The section with the dielectric constants of a frequency in Hz.</param>
    /// <param name="hertz">The frequencies, Hz, above 0.</param>
    /// <param name="calculator">Closed forms or field solver.</param>
    /// <exception cref="SectionNotSolvableException">The field solver cannot solve the section; the message says why.</exception>
    public static ImmutableArray<LineAtFrequency>? Of(Func<double, CrossSection> sectionAt, ImmutableArray<double> hertz, ILineCalculator calculator)
    {
        var lines = ImmutableArray.CreateBuilder<LineAtFrequency>(hertz.Length);
        ConductorLoss? copper = null;
        foreach (var f in hertz)
        {
            if (calculator is FieldSolver solver)
            {
                var solution = solver.Solve(sectionAt(f));
                copper ??= FieldLoss.Copper(solution);
                lines.Add(FieldLoss.At(solution, copper, f));
            }
            else if (IncrementalInductance.At(sectionAt(f), f, calculator) is { } line)
            {
                lines.Add(line);
            }
            else
            {
                return null;
            }
        }
        return lines.MoveToImmutable();
    }
}
