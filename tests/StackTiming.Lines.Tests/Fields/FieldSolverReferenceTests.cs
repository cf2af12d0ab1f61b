using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Solutions;
using Xunit;

namespace StackTiming.Lines.Tests.Fields;

/// <summary>The solver against results that others produced: tests/references/sections and published tables.</summary>
public sealed class FieldSolverReferenceTests
{
    // The promise is 0.1 %; the independent finite-element results are good to 0.02 % (the open box of three lines the least).
    private const double FiniteElementBound = 3e-4;

    // The promise is 0.05 %.
    private const double ExactBound = 5e-5;

    public static TheoryData<string> FiniteElementNames => [.. ReferenceSections.FiniteElement.Select(r => r.Name)];

    public static TheoryData<string> ExactNames => [.. ReferenceSections.Exact.Select(r => r.Name)];

    [Theory]
    [MemberData(nameof(FiniteElementNames))]
    public void Agrees_with_independent_finite_elements(string name) => Check(ReferenceSections.Named(name), FiniteElementBound);

    [Theory]
    [MemberData(nameof(ExactNames))]
    public void Agrees_with_exact_solutions(string name) => Check(ReferenceSections.Named(name), ExactBound);

    [Theory]
    [MemberData(nameof(ExactNames))]
    public void Error_against_exact_solutions_is_below_the_estimate(string name)
    {
        var reference = ReferenceSections.Named(name);
        foreach (var tolerance in new[] { 1e-2, 1e-3, 1e-4, 1e-5, 3e-7 })
        {
            var line = new FieldSolver(new FieldSolverOptions(tolerance)).Solve(reference.Section).Line;
            // 3e-8: the wide grounds that stand for infinite ones in the coplanar cases end somewhere.
            Assert.True(MatrixErrors.Largest(line.CapacitanceFaradPerMetre, reference.Capacitance) <= line.RelativeError + 3e-8);
            Assert.True(MatrixErrors.Largest(line.InductanceHenryPerMetre, reference.Inductance) <= line.RelativeError + 3e-8);
            Assert.True(line.RelativeError <= tolerance);
            Assert.Empty(line.Warnings);
        }
    }

    [Fact]
    public void Error_of_loaded_lines_is_below_the_estimate()
    {
        foreach (var reference in ReferenceSections.FiniteElement)
        {
            var line = FieldSolver.Default.Solve(reference.Section).Line;
            var converged = new FieldSolver(new FieldSolverOptions(2e-5)).Solve(reference.Section).Line;
            Assert.True(MatrixErrors.Largest(line.CapacitanceFaradPerMetre, converged.CapacitanceFaradPerMetre) <= line.RelativeError,
                reference.Name);
            Assert.True(MatrixErrors.Largest(line.InductanceHenryPerMetre, converged.InductanceHenryPerMetre) <= line.RelativeError,
                reference.Name);
        }
    }

    private static void Check(ReferenceSection reference, double bound)
    {
        var line = FieldSolver.Default.Solve(reference.Section).Line;
        Assert.True(MatrixErrors.Largest(line.CapacitanceFaradPerMetre, reference.Capacitance) <= bound);
        Assert.True(MatrixErrors.Largest(line.InductanceHenryPerMetre, reference.Inductance) <= bound);
        foreach (var (name, value) in reference.Impedances)
            Assert.Equal(value, Impedance(line, name), value * bound);
        foreach (var (name, value) in reference.EpsEff)
            Assert.Equal(value, EpsEff(line, name), value * bound);
        foreach (var (name, share) in reference.EnergyShares)
            Assert.Equal(share, line.EnergyShares.Where(s => s.Dielectric == name).Sum(s => s.Share), 2e-4);
        Assert.Equal(1, line.EnergyShares.Sum(s => s.Share), 1e-9);
    }

    private static double Impedance(LineSolution line, string name) => name switch
    {
        "z0" => line.Z0Ohms,
        "z_odd" => Mode(line, -1).Z,
        "z_even" => Mode(line, 1).Z,
        "z_diff" => 2 * Mode(line, -1).Z,
        "z_common" => Mode(line, 1).Z / 2,
        _ => throw new ArgumentException(name),
    };

    private static double EpsEff(LineSolution line, string name) =>
        name == "eps_eff" ? line.EpsEff : Mode(line, name == "eps_eff_odd" ? -1 : 1).EpsEff;

    /// <summary>Odd (-1) or even (+1) mode of a symmetric pair.</summary>
    private static (double Z, double EpsEff) Mode(LineSolution line, int sign)
    {
        var capacitance = line.CapacitanceFaradPerMetre[0, 0] + sign * line.CapacitanceFaradPerMetre[0, 1];
        var inductance = line.InductanceHenryPerMetre[0, 0] + sign * line.InductanceHenryPerMetre[0, 1];
        return (Math.Sqrt(inductance / capacitance), inductance * capacitance * Vacuum.SpeedOfLight * Vacuum.SpeedOfLight);
    }
}
