using CsCheck;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using Xunit;

namespace StackTiming.Lines.Tests.Methods;

/// <summary>
/// Closed forms over the whole range of a board's lines, judged by the field solver, which the references hold to 0.1 %: inside its validity range no closed
/// form is further off than it says.
/// </summary>
public sealed class ClosedFormsAgainstFieldSolverTests
{
    private const double SolverError = 1e-3;

    public enum Family
    {
        Bare,
        Masked,
        Embedded,
        Centred,
        Offset,
        MaskedPair,
        OffsetPair,
        Broadside,
        MaskedBetweenPours,
    }

    public static TheoryData<Family> Families() => [.. Enum.GetValues<Family>()];

    [Theory]
    [MemberData(nameof(Families))]
    public void Random_lines_are_as_accurate_as_stated(Family family) =>
        Dimensions.Sample(
            d =>
            {
                var section = Build(family, d);
                var closed = ClosedForms.Calculate(section)!;
                if (!closed.Warnings.IsEmpty)
                    return;
                var judged = FieldSolver.Default.Calculate(section)!;
                foreach (var (actual, expected) in Values(closed).Zip(Values(judged)))
                    Assert.True(
                        Math.Abs(actual / expected - 1) <= closed.RelativeError + SolverError,
                        $"{closed.MethodId}: {actual} instead of {expected} for {d}");
            },
            iter: 6, threads: 1);

    private sealed record Dims(double Width, double Height, double Above, double Thickness, double Undercut, double Gap, double Dk, double CoverDk, double Coat);

    private static Gen<Dims> Dimensions { get; } =
        from width in Gen.Double[75e-6, 300e-6]
        from height in Gen.Double[65e-6, 250e-6]
        from above in Gen.Double[65e-6, 400e-6]
        from thickness in Gen.Double[12e-6, 55e-6]
        from undercut in Gen.Double[0, 0.4]
        from gap in Gen.Double[0.7, 3]
        from dk in Gen.Double[3, 4.6]
        from coverDk in Gen.Double[3, 4.6]
        from coat in Gen.Double[8e-6, 28e-6]
        select new Dims(width, height, above, thickness, Math.Min(undercut * thickness, 0.2 * width), Math.Max(gap * width, 2 * thickness), dk, coverDk, coat);

    private static CrossSection Build(Family family, Dims d)
    {
        var top = d.Height + d.Thickness + d.Above;
        var lower = new DielectricSlab(new SectionDielectric("lower", d.Dk, 0.02), 0, d.Height);
        var upper = new DielectricSlab(new SectionDielectric("upper", d.CoverDk, 0.02), d.Height, top);
        var mask = new SectionMask(new SectionDielectric("mask", 3.5, 0.02), 1.3 * d.Coat, d.Coat);
        var a = new SectionConductor("a", false, 0, d.Width, d.Width - 2 * d.Undercut, d.Thickness, d.Height, true);
        SectionConductor[] pair = [a with { CentreMetres = -0.5 * (d.Width + d.Gap) }, a with { Name = "b", CentreMetres = 0.5 * (d.Width + d.Gap) }];
        var bare = new CrossSection([lower], 0, null, [a], null, null, new SectionMetal(1.72e-8, 0));
        var between = bare with { Slabs = [lower, upper], TopPlaneMetres = top };
        var pour = new SectionConductor("left", true, -(0.5 * d.Width + d.Gap + 1.5e-3), 3e-3, 3e-3 - 2 * d.Undercut, d.Thickness, d.Height, true);
        return family switch
        {
            Family.Bare => bare,
            Family.Masked => bare with { TopMask = mask },
            Family.Embedded => bare with { Slabs = [lower, upper] },
            Family.Centred => between with
            {
                Slabs = [lower with { TopMetres = 2 * d.Height + d.Thickness }],
                TopPlaneMetres = 2 * d.Height + d.Thickness,
                Conductors = [a with { NarrowMetres = a.WideMetres }],
            },
            Family.Offset => between,
            Family.MaskedPair => bare with { TopMask = mask, Conductors = [.. pair] },
            Family.OffsetPair => between with { Conductors = [.. pair] },
            Family.Broadside => between with
            {
                Slabs = [lower, upper with { TopMetres = top + d.Thickness + d.Height }],
                TopPlaneMetres = top + d.Thickness + d.Height,
                Conductors = [a, a with { Name = "b", BottomMetres = top, WideFaceDown = false }],
            },
            _ => bare with { TopMask = mask, Conductors = [a, pour, pour with { Name = "right", CentreMetres = -pour.CentreMetres }] },
        };
    }

    private static double[] Values(LineSolution solution)
    {
        if (solution.Signals.Length == 1)
            return [solution.Z0Ohms, solution.EpsEff];
        var modes = PairModes.Of(solution);
        return [modes.ZDiffOhms, modes.ZCommonOhms, modes.EpsEffDiff, modes.EpsEffCommon];
    }
}
