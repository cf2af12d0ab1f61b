using MathNet.Numerics.LinearAlgebra;
using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Characteristics;

/// <summary>
/// The direct-current state of a circuit. Lines and inductances conduct without loss; so that the currents in a loop of them are defined, each gets a
/// resistance in proportion to its inductance, small enough (a millionth of an ohm) to change no voltage that is judged.
/// </summary>
internal sealed class SteadyState
{
    private const double SmallOhms = 1e-6;
    private const double LeakSiemens = 1e-12;

    private readonly Circuit circuit;
    private readonly double inductanceScale;
    private readonly MathNet.Numerics.LinearAlgebra.Factorization.LU<double> factors;

    public SteadyState(Circuit circuit)
    {
        this.circuit = circuit;
        inductanceScale = Math.Max(double.Epsilon, LargestInductance(circuit));
        var matrix = Matrix<double>.Build.Dense(circuit.NodeCount, circuit.NodeCount);
        for (var i = 0; i < circuit.NodeCount; i++)
            matrix[i, i] = LeakSiemens;
        matrix[circuit.SourceNode, circuit.SourceNode] += circuit.SourceSiemens;
        foreach (var line in circuit.Lines)
            Join(matrix, line.From, line.To, 1 / Resistance(line.Z0Ohms * line.DelaySeconds));
        foreach (var line in circuit.LossyLines)
            Join(matrix, line.From, line.To, 1 / Math.Max(SmallOhms, line.LengthMetres * line.Constants.DcResistanceOhmPerMetre));
        foreach (var group in circuit.Groups)
        {
            for (var k = 0; k < group.From.Length; k++)
                Join(matrix, group.From[k], group.To[k], 1 / Resistance(ConductorInductance(group)));
        }
        foreach (var branch in circuit.Branches)
        {
            if (branch.CapacitanceFarads is null)
                Join(matrix, branch.From, branch.To, 1 / BranchOhms(branch));
        }
        foreach (var shunt in circuit.Shunts)
        {
            if (shunt.ResistanceOhms is { } ohms)
                matrix[shunt.Node, shunt.Node] += 1 / ohms;
            if (shunt.InductanceHenries is not null)
                matrix[shunt.Node, shunt.Node] += 1 / SmallOhms;
        }
        factors = matrix.LU();
    }

    /// <summary>Node voltages for a constant open-circuit voltage of the source.</summary>
    public double[] Solve(double sourceVolts)
    {
        var currents = Vector<double>.Build.Dense(circuit.NodeCount);
        currents[circuit.SourceNode] += sourceVolts * circuit.SourceSiemens;
        foreach (var shunt in circuit.Shunts)
        {
            if (shunt.ResistanceOhms is { } ohms)
                currents[shunt.Node] += shunt.ToVolts / ohms;
        }
        return factors.Solve(currents).AsArray();
    }

    /// <summary>Current from one end of a line to the other, amperes.</summary>
    public double LineCurrent(in LosslessLine line, double[] volts) =>
        (volts[line.From] - volts[line.To]) / Resistance(line.Z0Ohms * line.DelaySeconds);

    /// <summary>Current in conductor k of a coupled group, amperes.</summary>
    public double ConductorCurrent(CoupledLines group, int k, double[] volts) =>
        (volts[group.From[k]] - volts[group.To[k]]) / Resistance(ConductorInductance(group));

    /// <summary>Current in a branch, amperes; none through a capacitance.</summary>
    public double BranchCurrent(in SeriesBranch branch, double[] volts) =>
        branch.CapacitanceFarads is null ? (volts[branch.From] - volts[branch.To]) / BranchOhms(branch) : 0;

    /// <summary>Current in an inductance to ground, amperes.</summary>
    public static double ShuntCurrent(in Shunt shunt, double[] volts) => volts[shunt.Node] / SmallOhms;

    private double BranchOhms(in SeriesBranch branch) =>
        branch.ResistanceOhms > SmallOhms ? branch.ResistanceOhms
        : branch.InductanceHenries > 0 ? Resistance(branch.InductanceHenries) : SmallOhms;

    private double Resistance(double henries) => SmallOhms * Math.Max(1e-3, henries / inductanceScale);

    private static double ConductorInductance(CoupledLines group) => group.Modes[0].ImpedanceOhms * group.Modes[0].DelaySeconds;

    private static double LargestInductance(Circuit circuit)
    {
        var largest = 0.0;
        foreach (var line in circuit.Lines)
            largest = Math.Max(largest, line.Z0Ohms * line.DelaySeconds);
        foreach (var group in circuit.Groups)
            largest = Math.Max(largest, ConductorInductance(group));
        foreach (var branch in circuit.Branches)
            largest = Math.Max(largest, branch.InductanceHenries);
        return largest;
    }

    private static void Join(Matrix<double> matrix, int a, int b, double siemens)
    {
        matrix[a, a] += siemens;
        matrix[b, b] += siemens;
        matrix[a, b] -= siemens;
        matrix[b, a] -= siemens;
    }
}
