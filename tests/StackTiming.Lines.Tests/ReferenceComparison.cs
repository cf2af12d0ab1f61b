using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Tests;

/// <summary>The impedances and effective permittivities of a reference section beside those of a solution.</summary>
public static class ReferenceComparison
{
    /// <summary>Name, expected and actual of each value; for three signals and more the own capacitances and inductances stand in for impedances.</summary>
    public static IEnumerable<(string What, double Expected, double Actual)> Values(ReferenceSection reference, LineSolution solution)
    {
        if (solution.Signals.Length == 1)
        {
            yield return ("z0", Math.Sqrt(reference.Inductance[0, 0] / reference.Capacitance[0, 0]), solution.Z0Ohms);
            yield return ("eps_eff", reference.EpsEff["eps_eff"], solution.EpsEff);
        }
        else if (solution.Signals.Length == 2)
        {
            var modes = PairModes.Of(solution);
            yield return ("z_odd", reference.Impedances["z_odd"], modes.ZOddOhms!.Value);
            yield return ("z_even", reference.Impedances["z_even"], modes.ZEvenOhms!.Value);
            yield return ("z_diff", reference.Impedances["z_diff"], modes.ZDiffOhms);
            yield return ("z_common", reference.Impedances["z_common"], modes.ZCommonOhms);
            yield return ("eps_eff_odd", reference.EpsEff["eps_eff_odd"], modes.EpsEffOdd!.Value);
            yield return ("eps_eff_even", reference.EpsEff["eps_eff_even"], modes.EpsEffEven!.Value);
        }
        else
        {
            for (var i = 0; i < solution.Signals.Length; i++)
            {
                yield return ($"C{i}{i}", reference.Capacitance[i, i], solution.CapacitanceFaradPerMetre[i, i]);
                yield return ($"L{i}{i}", reference.Inductance[i, i], solution.InductanceHenryPerMetre[i, i]);
            }
        }
    }
}
