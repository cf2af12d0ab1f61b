using StackTiming.Lines.Fields.Kernels;

namespace StackTiming.Lines.Fields.Systems;

/// <summary>
/// The charges for a unit voltage on each signal in turn: of a symmetric section on it and, with the sign of the parity, on its mirror
/// image. With them the free charges that they make, and how those change with each permittivity.
/// </summary>
internal sealed class ParityCharges
{
    private readonly ConductorPairs pairs;
    private readonly int[] drives;
    private readonly double[][] solutions;

    // By right signal and drive: the free charge and, by medium, its slope.
    private readonly double[,] freeCharges;
    private readonly double[,][] slopes;

    /// <summary>Solves for every drive of one parity.</summary>
    public ParityCharges(InfluenceMatrix influence, ConductorPairs pairs, double[] permittivities, int parity, bool openSpace)
    {
        (Parity, this.pairs) = (parity, pairs);
        drives = pairs.Drives(parity);
        using var system = new BoundarySystem(influence, permittivities, parity, openSpace);
        solutions = system.Solve(drives);
        double[][] weights = [.. pairs.RightSignals.Select(system.FreeCharge)];
        freeCharges = new double[weights.Length, drives.Length];
        slopes = new double[weights.Length, drives.Length][];
        for (var row = 0; row < weights.Length; row++)
        {
            for (var i = 0; i < drives.Length; i++)
                freeCharges[row, i] = LaneSpans.Dot(weights[row], solutions[i]);
        }

        if (permittivities.Length > 0)
            FindSlopes(system, weights, permittivities.Length);
    }

    /// <summary>+1 even, -1 odd, 0 no symmetry.</summary>
    public int Parity { get; }

    /// <summary>Adds the share of this parity to the Maxwell capacitance matrix of the signals, in units of 2πε0.</summary>
    public void AddCapacitance(double[,] matrix) => Add(matrix, (row, drive) => freeCharges[row, drive]);

    /// <summary>Adds the share of this parity to the derivative of that matrix with respect to the permittivity of a medium.</summary>
    public void AddCapacitanceSlope(double[,] matrix, int medium) => Add(matrix, (row, drive) => slopes[row, drive][medium]);

    /// <summary>The part of this parity of the charge coefficients for a voltage on each conductor.</summary>
    public double[] Superpose(ReadOnlySpan<double> volts)
    {
        var sum = new double[solutions.Length == 0 ? 0 : solutions[0].Length];
        for (var i = 0; i < drives.Length; i++)
            LaneSpans.AddScaled(sum, solutions[i], Part(volts, drives[i]));
        return sum;
    }

    private void FindSlopes(BoundarySystem system, double[][] weights, int media)
    {
        var (fields, adjoints) = (system.Fields(solutions), system.SolveAdjoint(weights));
        for (var row = 0; row < weights.Length; row++)
        {
            for (var i = 0; i < drives.Length; i++)
            {
                slopes[row, i] = new double[media];
                system.AddFreeChargeSlopes(pairs.RightSignals[row], adjoints[row], solutions[i], fields[i], slopes[row, i]);
            }
        }
    }

    private double Part(ReadOnlySpan<double> volts, int conductor)
    {
        var twin = pairs.Twin(conductor);
        return Parity == 0 || twin == conductor ? volts[conductor] : (volts[conductor] + Parity * volts[twin]) / 2;
    }

    /// <summary>
    /// A unit voltage on one of a pair is half the even and half the odd drive; a conductor on the axis has its other half on the other
    /// side.
    /// </summary>
    private void Add(double[,] matrix, Func<int, int, double> charge)
    {
        foreach (var (index, signal) in pairs.RightSignals.Index())
        {
            for (var i = 0; i < drives.Length; i++)
            {
                var (row, column) = (pairs.SignalRow(signal), pairs.SignalRow(drives[i]));
                if (Parity == 0)
                {
                    matrix[row, column] += charge(index, i);
                    continue;
                }

                var (rowTwin, columnTwin) = (pairs.SignalRow(pairs.Twin(signal)), pairs.SignalRow(pairs.Twin(drives[i])));
                var share = column == columnTwin ? charge(index, i) : charge(index, i) / 2;
                matrix[row, column] += share;
                matrix[rowTwin, column] += Parity * share;
                if (column == columnTwin)
                    continue;
                matrix[row, columnTwin] += Parity * share;
                matrix[rowTwin, columnTwin] += share;
            }
        }
    }
}
