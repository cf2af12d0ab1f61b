using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Sensitivities;

/// <summary>
/// Derivatives of C and L with respect to every parameter of a section. Permittivities exactly, by the adjoint of the field equations; dimensions by central differences with two
/// steps and Richardson's extrapolation (L. F. Richardson, Phil. Trans. R. Soc. A 226, 1927), whose last correction is the estimated error.
/// </summary>
public static class SectionSensitivities
{
    // One half and one per cent of the scale: the truncation of the extrapolated difference is below 1e-7 and the solver's own error some 1e-4.
    private const double Step = 5e-3;

    /// <summary>The derivatives with respect to every parameter.</summary>
    /// <exception cref="SectionNotSolvableException">The section, or one a small step beside it, cannot be solved.</exception>
    public static IReadOnlyList<SectionSensitivity> Of(CrossSection section)
    {
        var solver = new FieldSolver(new FieldSolverOptions(1e-5));
        var solution = solver.Solve(section);
        return [.. SectionParameters.Of(section).Select(p => p.Kind == ParameterKind.DielectricConstant ? Material(solution, p) : ByDifferences(solver, solution, p))];
    }

    /// <summary>The derivative with respect to one parameter by differences.</summary>
    public static SectionSensitivity ByDifferences(FieldSolver solver, FieldSolution solution, SectionParameter parameter)
    {
        var step = Step * parameter.Scale;
        var (near, far) = (Difference(solver, parameter, step), Difference(solver, parameter, 2 * step));
        var (capacitance, capacitanceError) = Extrapolate(near.C, far.C, solution.Line.CapacitanceFaradPerMetre, parameter.Scale);
        var (inductance, inductanceError) = Extrapolate(near.L, far.L, solution.Line.InductanceHenryPerMetre, parameter.Scale);
        return new SectionSensitivity(parameter, capacitance, inductance, Math.Max(capacitanceError, inductanceError));
    }

    private static SectionSensitivity Material(FieldSolution solution, SectionParameter parameter) =>
        new(parameter, solution.CapacitanceSlope(parameter.Subject), new double[solution.Pairs.Signals, solution.Pairs.Signals], 0);

    private static (double[,] C, double[,] L) Difference(FieldSolver solver, SectionParameter parameter, double step)
    {
        var up = solver.Solve(parameter.With(parameter.Value + step)).Line;
        var down = solver.Solve(parameter.With(parameter.Value - step)).Line;
        return (
            Combine(up.CapacitanceFaradPerMetre, down.CapacitanceFaradPerMetre, 0.5 / step, -0.5 / step),
            Combine(up.InductanceHenryPerMetre, down.InductanceHenryPerMetre, 0.5 / step, -0.5 / step));
    }

    private static (double[,] Slope, double Error) Extrapolate(double[,] near, double[,] far, double[,] value, double scale)
    {
        var slope = Combine(near, far, 4.0 / 3, -1.0 / 3);
        var (largest, change) = (0.0, 0.0);
        for (var i = 0; i < slope.GetLength(0); i++)
        {
            for (var j = 0; j < slope.GetLength(1); j++)
            {
                largest = Math.Max(largest, Math.Abs(value[i, j]));
                change = Math.Max(change, Math.Abs(slope[i, j] - near[i, j]));
            }
        }

        return (slope, change * scale / largest);
    }

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
}
