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
        solutions = new double[drives.Length][];
        var fields = new double[drives.Length][];
        for (var i = 0; i < drives.Length; i++)
        {
            var potentials = new double[pairs.Conductors];
            potentials[drives[i]] = 1;
            solutions[i] = system.Solve(potentials);
            fields[i] = permittivities.Length > 0 ? system.Fields(solutions[i]) : [];
        }

        freeCharges = new double[pairs.RightSignals.Length, drives.Length];
        slopes = new double[pairs.RightSignals.Length, drives.Length][];
        foreach (var (row, signal) in pairs.RightSignals.Index())
        {
            var weights = system.FreeCharge(signal);
            var adjoint = permittivities.Length > 0 ? system.SolveAdjoint(weights) : [];
            for (var i = 0; i < drives.Length; i++)
            {
                freeCharges[row, i] = LaneSpans.Dot(weights, solutions[i]);
                slopes[row, i] = new double[permittivities.Length];
                if (permittivities.Length > 0)
                    system.AddFreeChargeSlopes(signal, adjoint, solutions[i], fields[i], slopes[row, i]);
            }
        }
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
