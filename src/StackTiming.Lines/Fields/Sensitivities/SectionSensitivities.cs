using StackTiming.Lines.Fields.Currents;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Sensitivities;

/// <summary>
/// Derivatives of a section's matrices with respect to every parameter. Of C with respect to permittivities exactly, by the adjoint of
/// the field equations; everything else by central differences between solutions on meshes of one fineness, whose errors all but cancel.
/// </summary>
public static class SectionSensitivities
{
    // The truncation of a central difference over a hundredth of the scale is below 1e-4 of the slope.
    private const double Step = 0.01;

    // What differences of this step are off by, relative to C and L over the scale; a test compares them with two steps.
    private const double DifferenceError = 1e-3;

    /// <summary>The derivatives with respect to every parameter.</summary>
    /// <exception cref="SectionNotSolvableException">The section, or one a small step beside it, cannot be solved.</exception>
    public static IReadOnlyList<SectionSensitivity> Of(CrossSection section)
    {
        var solution = new FieldSolver(new FieldSolverOptions(1e-4)).Solve(section);
        return [.. SectionParameters.Of(section).Select(p => p.Kind == ParameterKind.DielectricConstant ? Material(solution, p)
            : Of(solution, p))];
    }

    /// <summary>The derivative with respect to one parameter by differences, also where an exact one exists.</summary>
    public static SectionSensitivity Of(FieldSolution solution, SectionParameter parameter)
    {
        var difference = new Difference(solution.Level, parameter, Step * parameter.Scale);
        return new SectionSensitivity(
            parameter, difference.Capacitance, difference.Inductance, difference.Spread, difference.Loss, DifferenceError);
    }

    /// <summary>
    /// The same with two steps and Richardson's extrapolation (L. F. Richardson, Phil. Trans. R. Soc. A 226, 1927), whose last correction
    /// is the estimated error: twice the work.
    /// </summary>
    public static SectionSensitivity Extrapolated(FieldSolution solution, SectionParameter parameter)
    {
        var near = new Difference(solution.Level, parameter, Step / 2 * parameter.Scale);
        var far = new Difference(solution.Level, parameter, Step * parameter.Scale);
        var capacitance = Extrapolate(near.Capacitance, far.Capacitance);
        var inductance = Extrapolate(near.Inductance, far.Inductance);
        var error = Math.Max(
            Change(capacitance, near.Capacitance, solution.Line.CapacitanceFaradPerMetre),
            Change(inductance, near.Inductance, solution.Line.InductanceHenryPerMetre));
        return new SectionSensitivity(
            parameter,
            capacitance,
            inductance,
            near.Spread is null || far.Spread is null ? null : Extrapolate(near.Spread, far.Spread),
            Extrapolate(near.Loss, far.Loss),
            error * parameter.Scale);
    }

    private static SectionSensitivity Material(FieldSolution solution, SectionParameter parameter)
    {
        // Magnetic fields and currents do not notice dielectrics.
        var nothing = new double[solution.Pairs.Signals, solution.Pairs.Signals];
        var hasThickness = solution.Section.Conductors.All(c => c.ThicknessMetres > 0);
        var difference = new Difference(solution.Level, parameter, Step * parameter.Scale);
        return new SectionSensitivity(
            parameter, solution.CapacitanceSlope(parameter.Subject), nothing, hasThickness ? nothing : null, difference.Loss, 0);
    }

    private static double[,] Extrapolate(double[,] near, double[,] far) => Combine(near, far, 4.0 / 3, -1.0 / 3);

    /// <summary>Largest change of the slopes over the largest entry of the matrix.</summary>
    private static double Change(double[,] slope, double[,] near, double[,] value) =>
        slope.Cast<double>().Zip(near.Cast<double>(), (a, b) => Math.Abs(a - b)).Max() / value.Cast<double>().Max(Math.Abs);

    private static double[,] Combine(double[,] a, double[,] b, double factorA, double factorB)
    {
        var sum = new double[a.GetLength(0), a.GetLength(1)];
        for (var i = 0; i < sum.GetLength(0); i++)
        {
            for (var j = 0; j < sum.GetLength(1); j++)
                sum[i, j] = factorA * a[i, j] + factorB * b[i, j];
        }

        return sum;
    }

    /// <summary>Central differences over one step.</summary>
    private sealed class Difference
    {
        public Difference(int level, SectionParameter parameter, double step)
        {
            var up = FieldSolver.SolveAt(parameter.With(parameter.Value + step), level);
            var down = FieldSolver.SolveAt(parameter.With(parameter.Value - step), level);
            double[,] Slope(double[,] above, double[,] below) => Combine(above, below, 0.5 / step, -0.5 / step);
            Capacitance = Slope(up.Line.CapacitanceFaradPerMetre, down.Line.CapacitanceFaradPerMetre);
            Inductance = Slope(up.Line.InductanceHenryPerMetre, down.Line.InductanceHenryPerMetre);
            Loss = Slope(up.LossCapacitance(), down.LossCapacitance());
            if (up.Section.Conductors.All(c => c.ThicknessMetres > 0))
                Spread = Slope(ConductorLoss.Of(up).SkinSpreadPerMetre(), ConductorLoss.Of(down).SkinSpreadPerMetre());
        }

        public double[,] Capacitance { get; }

        public double[,] Inductance { get; }

        public double[,] Loss { get; }

        public double[,]? Spread { get; }
    }
}
