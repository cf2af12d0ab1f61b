using System.Globalization;
using MathNet.Numerics.RootFinding;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Lines.Synthesis;

/// <summary>The smallest and largest value that a fabricator makes of a width or a gap.</summary>
/// <param name="LeastMetres">Smallest, metres, above 0.</param>
/// <param name="MostMetres">Largest, metres.</param>
public readonly record struct MakeableRange(double LeastMetres, double MostMetres);

/// <summary>A width or gap for a target impedance.</summary>
/// <param name="Metres">The value, metres; null where none in the range reaches the target.</param>
/// <param name="ReachedOhms">Impedance at <paramref name="Metres"/>, or the nearest that the range allows; NaN where nothing could be computed.</param>
/// <param name="Obstacle">What stands in the way, in a sentence without a full stop; null where the target is reached.</param>
public sealed record DimensionOutcome(double? Metres, double ReachedOhms, string? Obstacle);

/// <summary>
/// Finds the width, or the gap of a pair, that has a target impedance: a single trace's Z₀, a pair's differential impedance. Brent's method on any
/// calculator; impedance falls as the width grows and rises with the gap, so there is at most one answer.
/// </summary>
/// <param name="stackUp">The stack-up.</param>
/// <param name="calculator">Closed forms or field solver.</param>
public sealed class DimensionSearch(StackUp stackUp, ILineCalculator calculator)
{
    private const double Accuracy = 1e-9;

    /// <summary>The width of a trace, or of both traces of a pair whose gap stays.</summary>
    /// <param name="line">The line; its width is ignored.</param>
    /// <param name="targetOhms">Target impedance, ohm: Z₀, or Z_diff of a pair.</param>
    /// <param name="range">Widths that can be made.</param>
    public DimensionOutcome Width(SectionRequest line, double targetOhms, MakeableRange range) =>
        Search("width", w => line with { WidthMetres = w }, targetOhms, range);

    /// <summary>The gap of a pair whose widths stay.</summary>
    /// <param name="line">The pair; its gap is ignored.</param>
    /// <param name="targetOhms">Target differential impedance, ohm.</param>
    /// <param name="range">Gaps that can be made.</param>
    public DimensionOutcome Gap(SectionRequest line, double targetOhms, MakeableRange range) =>
        Search("gap", g => line with { PairGapMetres = g }, targetOhms, range);

    private DimensionOutcome Search(string what, Func<double, SectionRequest> at, double targetOhms, MakeableRange range)
    {
        if (!(targetOhms > 0) || !double.IsFinite(targetOhms))
            return new DimensionOutcome(null, double.NaN, "the target impedance must be above zero");
        if (!(range.LeastMetres > 0 && range.MostMetres > range.LeastMetres))
            return new DimensionOutcome(null, double.NaN, $"the range of the {what} must rise from above zero");
        var (least, obstacle) = SmallestBuildable(at, range);
        if (least is not { } from)
            return new DimensionOutcome(null, double.NaN, obstacle);
        double atLeast = Impedance(at(from)), atMost = Impedance(at(range.MostMetres));
        if (double.IsNaN(atLeast) || double.IsNaN(atMost))
            return new DimensionOutcome(null, double.NaN, ObjectionTo(at(from)) ?? ObjectionTo(at(range.MostMetres)) ?? "the calculator has no answer for this line");
        if ((atLeast - targetOhms) * (atMost - targetOhms) > 0)
        {
            var nearLeast = Math.Abs(atLeast - targetOhms) < Math.Abs(atMost - targetOhms);
            var (end, reached, side) = nearLeast ? (from, atLeast, "smallest") : (range.MostMetres, atMost, "largest");
            return new DimensionOutcome(null, reached, string.Create(
                CultureInfo.InvariantCulture,
                $"even the {side} {what}, {end * 1e3:0.###} mm, gives {reached:0.0} ohm instead of {targetOhms:0.0} ohm"));
        }
        var metres = Brent.FindRoot(x => Impedance(at(x)) - targetOhms, from, range.MostMetres, Accuracy, 100);
        return new DimensionOutcome(metres, Impedance(at(metres)), null);
    }

    /// <summary>The lower end of the range, raised where etching would eat the narrow face below it.</summary>
    private (double?, string?) SmallestBuildable(Func<double, SectionRequest> at, MakeableRange range)
    {
        var problems = new ProblemList();
        if (SectionBuilder.Build(stackUp, at(range.LeastMetres), problems) is not null)
            return (range.LeastMetres, null);
        if (SectionBuilder.Build(stackUp, at(range.MostMetres), new ProblemList()) is null)
            return (null, problems.Items[0].Message);
        double bad = range.LeastMetres, good = range.MostMetres;
        while (good - bad > 1e-3 * good)
        {
            var middle = 0.5 * (bad + good);
            if (SectionBuilder.Build(stackUp, at(middle), new ProblemList()) is null)
                bad = middle;
            else
                good = middle;
        }
        // A trace etched to a knife edge is no answer either; a little above it the closed forms hold.
        return (Math.Min(range.MostMetres, 1.02 * good), null);
    }

    private double Impedance(SectionRequest line)
    {
        if (SectionBuilder.Build(stackUp, line, new ProblemList()) is not { } section || calculator.Calculate(section) is not { } solution)
            return double.NaN;
        return solution.Signals.Length == 2 ? PairModes.Of(solution).ZDiffOhms : solution.Z0Ohms;
    }

    private string? ObjectionTo(SectionRequest line) =>
        SectionBuilder.Build(stackUp, line, new ProblemList()) is { } section ? calculator.Objection(section) : null;
}
