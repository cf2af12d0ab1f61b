using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Characteristics;

/// <summary>
/// The direct-current state of a circuit, as a straight line over the source's voltage. Lines and inductances conduct without loss, which conductances cannot
/// say without losing digits, so their currents are unknowns beside the node voltages. In a loop of them currents divide as the inductances would have it:
/// each gets a resistance in proportion, of a nano-ohm at most.
/// </summary>
internal sealed class SteadyState
{
    private const double SmallOhms = 1e-9;
    private const double LeakSiemens = 1e-12;

    private readonly Circuit circuit;
    private readonly double inductanceScale;
    private readonly int unknowns, firstLine, firstGroup, firstBranch, firstLossy, firstShunt;
    private readonly double[] solution;

    public SteadyState(Circuit circuit)
    {
        this.circuit = circuit;
        inductanceScale = Math.Max(double.Epsilon, LargestInductance(circuit));
        firstLine = circuit.NodeCount;
        firstGroup = firstLine + circuit.Lines.Length;
        firstBranch = firstGroup + circuit.Groups.Sum(g => g.From.Length);
        firstLossy = firstBranch + circuit.Branches.Length;
        firstShunt = firstLossy + circuit.LossyLines.Length;
        unknowns = firstShunt + circuit.Shunts.Length;
        var matrix = new double[unknowns * unknowns];
        solution = new double[2 * unknowns];
        for (var i = 0; i < circuit.NodeCount; i++)
            matrix[(i * unknowns) + i] = LeakSiemens;
        matrix[(circuit.SourceNode * unknowns) + circuit.SourceNode] += circuit.SourceSiemens;
        solution[(2 * circuit.SourceNode) + 1] = circuit.SourceSiemens;
        AddLines(matrix);
        AddLumped(matrix);
        LinearSystem.Solve(matrix, solution, unknowns, 2);
    }

    /// <summary>Node voltages for a constant open-circuit voltage of the source.</summary>
    public double[] Solve(double sourceVolts)
    {
        var volts = new double[circuit.NodeCount];
        for (var i = 0; i < volts.Length; i++)
            volts[i] = At(i, sourceVolts);
        return volts;
    }

    /// <summary>Current from one end of a line to the other, amperes.</summary>
    public double LineCurrent(int line, double sourceVolts) => At(firstLine + line, sourceVolts);

    /// <summary>Currents in the conductors of a coupled group, amperes.</summary>
    public double[] GroupCurrents(int group, double sourceVolts)
    {
        var first = firstGroup;
        for (var i = 0; i < group; i++)
            first += circuit.Groups[i].From.Length;
        var currents = new double[circuit.Groups[group].From.Length];
        for (var k = 0; k < currents.Length; k++)
            currents[k] = At(first + k, sourceVolts);
        return currents;
    }

    /// <summary>Current in a branch, amperes; none through a capacitance.</summary>
    public double BranchCurrent(int branch, double sourceVolts) => At(firstBranch + branch, sourceVolts);

    /// <summary>Current in the inductance to ground of a shunt, amperes; none where it has none.</summary>
    public double ShuntCurrent(int shunt, double sourceVolts) => At(firstShunt + shunt, sourceVolts);

    private void AddLines(double[] matrix)
    {
        for (var i = 0; i < circuit.Lines.Length; i++)
        {
            var line = circuit.Lines[i];
            Join(matrix, firstLine + i, line.From, line.To, Resistance(line.Z0Ohms * line.DelaySeconds));
        }
        var conductor = firstGroup;
        foreach (var group in circuit.Groups)
        {
            for (var k = 0; k < group.From.Length; k++)
                Join(matrix, conductor++, group.From[k], group.To[k], Resistance(ConductorInductance(group)));
        }
        for (var i = 0; i < circuit.LossyLines.Length; i++)
        {
            var line = circuit.LossyLines[i];
            Join(matrix, firstLossy + i, line.From, line.To, Math.Max(SmallOhms, line.LengthMetres * line.Constants.DcResistanceOhmPerMetre));
        }
    }

    private void AddLumped(double[] matrix)
    {
        for (var i = 0; i < circuit.Branches.Length; i++)
        {
            var branch = circuit.Branches[i];
            if (branch.CapacitanceFarads is not null)
                matrix[((firstBranch + i) * unknowns) + firstBranch + i] = 1;
            else
                Join(matrix, firstBranch + i, branch.From, branch.To, Math.Max(branch.ResistanceOhms, Resistance(branch.InductanceHenries)));
        }
        for (var i = 0; i < circuit.Shunts.Length; i++)
        {
            var shunt = circuit.Shunts[i];
            var current = firstShunt + i;
            if (shunt.ResistanceOhms is { } ohms)
            {
                matrix[(shunt.Node * unknowns) + shunt.Node] += 1 / ohms;
                solution[2 * shunt.Node] += shunt.ToVolts / ohms;
            }
            if (shunt.InductanceHenries is not null)
            {
                matrix[(shunt.Node * unknowns) + current] = 1;
                matrix[(current * unknowns) + shunt.Node] = 1;
            }
            matrix[(current * unknowns) + current] = shunt.InductanceHenries is null ? 1 : -SmallOhms;
        }
    }

    /// <summary>A current from a to b with v(a) − v(b) = ohms·current.</summary>
    private void Join(double[] matrix, int current, int a, int b, double ohms)
    {
        matrix[(a * unknowns) + current] += 1;
        matrix[(b * unknowns) + current] -= 1;
        matrix[(current * unknowns) + a] += 1;
        matrix[(current * unknowns) + b] -= 1;
        matrix[(current * unknowns) + current] = -ohms;
    }

    private double At(int unknown, double sourceVolts) => solution[2 * unknown] + (solution[(2 * unknown) + 1] * sourceVolts);

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
}
