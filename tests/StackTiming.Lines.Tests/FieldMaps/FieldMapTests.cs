using StackTiming.Lines.FieldMaps;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Sections;
using Xunit;

namespace StackTiming.Lines.Tests.FieldMaps;

public sealed class FieldMapTests
{
    /// <summary>Between two planes the window holds all of the field: the energy is CV²/2 and the power V·I, up to the cells at the corners.</summary>
    [Fact]
    public void Energy_and_power_of_the_map_are_those_of_the_line()
    {
        var solution = FieldSolver.Default.Solve(Stripline(2));
        double[] volts = [0.6, -0.2];

        var map = FieldMap.Of(solution, volts, new MapWindow(-1.2e-3, 0, 1.2e-3, 0.4e-3), 600, 100);

        var c = solution.Line.CapacitanceFaradPerMetre;
        var energy = 0.5 * (volts[0] * volts[0] * c[0, 0] + volts[1] * volts[1] * c[1, 1] + 2 * volts[0] * volts[1] * c[0, 1]);
        var amperes = CharacteristicAdmittance.Amperes(solution.Line, volts);
        var power = volts[0] * amperes[0] + volts[1] * amperes[1];
        Assert.Equal(energy, Sum(map.EnergyJoulePerCubicMetre) * map.CellSquareMetres, 0.02 * energy);
        Assert.Equal(power, Sum(map.PowerWattPerSquareMetre) * map.CellSquareMetres, 0.02 * power);
    }

    [Fact]
    public void Metal_has_the_potential_of_its_drive_and_no_density()
    {
        var solution = FieldSolver.Default.Solve(Stripline(1));

        var map = FieldMap.Of(solution, [1], new MapWindow(-50e-6, 195e-6, 50e-6, 205e-6), 9, 3);

        Assert.All(map.PotentialVolts, v => Assert.Equal(1, v));
        Assert.All(map.EnergyJoulePerCubicMetre, v => Assert.True(double.IsNaN(v)));
    }

    [Fact]
    public void Current_of_a_single_wave_is_its_voltage_over_the_impedance()
    {
        var line = FieldSolver.Default.Solve(Stripline(1)).Line;

        Assert.Equal(2 / line.Z0Ohms, CharacteristicAdmittance.Amperes(line, [2])[0], 1e-9);
    }

    private static CrossSection Stripline(int signals) => new(
        [new DielectricSlab(new SectionDielectric("lower", 4, 0), 0, 191e-6), new DielectricSlab(new SectionDielectric("upper", 3.5, 0), 191e-6, 400e-6)], 0, 400e-6,
        [
            new SectionConductor("a", false, signals == 1 ? 0 : -130e-6, 150e-6, 140e-6, 18e-6, 191e-6, true),
            .. signals == 1 ? [] : new[] { new SectionConductor("b", false, 130e-6, 120e-6, 110e-6, 18e-6, 191e-6, true) },
        ],
        null, null, new SectionMetal(1.72e-8, 0));

    private static double Sum(double[] values) => values.Where(double.IsFinite).Sum();
}
