namespace StackTiming.Lines.Fields.Systems;

/// <summary>
/// The charges for a unit voltage on each signal in turn: of a symmetric section on it and, with the sign of the parity, on its mirror image.
/// </summary>
internal sealed class ParityCharges
{
    private readonly BoundarySystem system;
    private readonly ConductorPairs pairs;
    private readonly int[] drives;
    private readonly double[][] solutions;

    /// <summary>Solves for every drive of one parity.</summary>
    public ParityCharges(InfluenceMatrix influence, ConductorPairs pairs, double[] permittivities, int parity, bool openSpace)
    {
        (Parity, this.pairs) = (parity, pairs);
        drives = pairs.Drives(parity);
        system = new BoundarySystem(influence, permittivities, parity, openSpace);
        solutions = new double[drives.Length][];
        for (var i = 0; i < drives.Length; i++)
        {
            var potentials = new double[pairs.Conductors];
            potentials[drives[i]] = 1;
            solutions[i] = system.Solve(potentials);
        }
    }

    /// <summary>+1 even, -1 odd, 0 no symmetry.</summary>
    public int Parity { get; }

    /// <summary>
    /// Adds the share of this parity to the Maxwell capacitance matrix of the signals, in units of 2πε0. A unit voltage on one of a pair is half the even and
    /// half the odd drive; a conductor on the axis has its other half on the other side.
    /// </summary>
    public void AddCapacitance(double[,] matrix)
    {
        var weights = new double[pairs.Conductors];
        foreach (var signal in pairs.RightSignals)
        {
            Array.Clear(weights);
            weights[signal] = 1;
            var functional = system.FreeCharge(weights);
            for (var i = 0; i < drives.Length; i++)
                Spread(matrix, signal, drives[i], Dot(functional, solutions[i]));
        }
    }

    /// <summary>The part of this parity of the charge coefficients for a voltage on each conductor.</summary>
    public double[] Superpose(ReadOnlySpan<double> volts)
    {
        var sum = new double[solutions.Length == 0 ? system.Unknowns : solutions[0].Length];
        for (var i = 0; i < drives.Length; i++)
        {
            var amplitude = Part(volts, drives[i]);
            for (var k = 0; k < sum.Length; k++)
                sum[k] += amplitude * solutions[i][k];
        }

        return sum;
    }

    /// <summary>
    /// Adds this parity's part of Σ V·Q on the surfaces present, and of its derivatives with respect to each permittivity, in units of 2πε0.
    /// </summary>
    public double AddEnergy(ReadOnlySpan<double> volts, double[] slopes)
    {
        var weights = new double[pairs.Conductors];
        foreach (var signal in pairs.RightSignals)
            weights[signal] = Part(volts, signal);
        var charges = Superpose(volts);
        var energy = Dot(system.FreeCharge(weights), charges);
        if (energy == 0)
            return 0;
        var parts = system.FreeChargeSlopes(weights, charges.AsSpan(0, system.Unknowns));
        for (var m = 0; m < slopes.Length; m++)
            slopes[m] += parts[m];
        return energy;
    }

    private double Part(ReadOnlySpan<double> volts, int conductor)
    {
        var twin = pairs.Twin(conductor);
        return Parity == 0 ? volts[conductor]
            : twin == conductor ? (Parity > 0 ? volts[conductor] : 0)
            : (volts[conductor] + Parity * volts[twin]) / 2;
    }

    private void Spread(double[,] matrix, int signal, int drive, double charge)
    {
        var (row, column) = (pairs.SignalRow(signal), pairs.SignalRow(drive));
        if (Parity == 0)
        {
            matrix[row, column] += charge;
            return;
        }

        var (rowTwin, columnTwin) = (pairs.SignalRow(pairs.Twin(signal)), pairs.SignalRow(pairs.Twin(drive)));
        var share = column == columnTwin ? charge : charge / 2;
        matrix[row, column] += share;
        matrix[rowTwin, column] += Parity * share;
        if (column == columnTwin)
            return;
        matrix[row, columnTwin] += Parity * share;
        matrix[rowTwin, columnTwin] += share;
    }

    private static double Dot(double[] functional, double[] solution)
    {
        var sum = 0.0;
        for (var i = 0; i < functional.Length; i++)
            sum += functional[i] * solution[i];
        return sum;
    }
}
