using System.Numerics;
using StackTiming.Lines.Constants;

namespace StackTiming.Lines.Layered;

/// <summary>
/// Capacitance of strips in a layered medium by a variational principle: the charge of each strip is a short series of Chebyshev polynomials with the
/// edge singularity 1/√(1−u²), whose Fourier transforms are Bessel functions, and the coefficients are those that make the energy stationary.
/// E. Yamashita, "Variational method for the analysis of microstrip-like transmission lines", IEEE Trans. MTT-16, 1968, pp. 529–535.
/// The Fourier transforms depend on the geometry only and serve every set of permittivities.
/// </summary>
internal sealed class StripCharges
{
    private const int PointsPerPanel = 8;
    private static readonly double[] GaussNodes = [0.1834346424956498, 0.5255324099163290, 0.7966664774136267, 0.9602898564975363];
    private static readonly double[] GaussWeights = [0.3626837833783620, 0.3137066458778873, 0.2223810344533745, 0.1012285362903763];

    private readonly LayeredMedium medium;
    private readonly ThinStrip[] strips;
    private readonly bool even;
    private readonly int conductors;
    private readonly int[] nodes;
    private readonly int[] owner;
    private readonly int[] order;
    private readonly int[] nodeOf;
    private readonly int[] firstOfNode;
    private readonly double[] waveNumbers;
    private readonly double[] weights;
    private readonly double[] real;
    private readonly double[] imaginary;
    private readonly double end;

    /// <summary>Transforms the charges of strips.</summary>
    /// <param name="medium">The layers.</param>
    /// <param name="strips">The strips.</param>
    /// <param name="even">True where all strips are centred at x = 0, so that only even terms are needed.</param>
    /// <param name="conductors">Number of conductors.</param>
    /// <param name="heightMetres">Distance over which the medium changes: that to the planes.</param>
    /// <param name="endWaveNumber">Wave number, 1/m, up to which the integral is summed; the rest is added from its asymptote.</param>
    public StripCharges(LayeredMedium medium, ThinStrip[] strips, bool even, int conductors, double endWaveNumber, double heightMetres)
    {
        this.medium = medium;
        this.strips = strips = [.. strips.OrderBy(s => s.Node)];
        this.even = even;
        this.conductors = conductors;
        nodes = [.. strips.Select(s => s.Node).Distinct().Order()];
        var unknowns = strips.Sum(s => s.Terms);
        owner = new int[unknowns];
        order = new int[unknowns];
        nodeOf = new int[unknowns];
        for (int s = 0, p = 0; s < strips.Length; s++)
        {
            for (var m = 0; m < strips[s].Terms; m++, p++)
                (owner[p], order[p], nodeOf[p]) = (s, even ? 2 * m : m, Array.IndexOf(nodes, strips[s].Node));
        }
        firstOfNode = new int[nodes.Length + 1];
        foreach (var node in nodeOf)
            firstOfNode[node + 1]++;
        for (var i = 0; i < nodes.Length; i++)
            firstOfNode[i + 1] += firstOfNode[i];
        var span = strips.Max(s => s.CentreMetres + s.HalfWidthMetres) - strips.Min(s => s.CentreMetres - s.HalfWidthMetres);
        var panels = Math.Max(3, (int)Math.Ceiling(endWaveNumber * Math.Max(span / 8, heightMetres / 4)));
        end = endWaveNumber;
        waveNumbers = new double[panels * PointsPerPanel];
        weights = new double[waveNumbers.Length];
        FillQuadrature(panels);
        real = new double[waveNumbers.Length * unknowns];
        imaginary = even ? [] : new double[real.Length];
        FillTransforms();
    }

    /// <summary>Maxwell capacitance matrix of all conductors, F/m.</summary>
    /// <param name="dk">Relative permittivity of each layer, then of the space above the last.</param>
    public double[,] Capacitance(ReadOnlySpan<double> dk)
    {
        var n = owner.Length;
        var matrix = FactoredMatrix(dk);
        var result = new double[conductors, conductors];
        var voltages = new double[conductors];
        for (var c = 0; c < conductors; c++)
        {
            voltages[c] = 1;
            var column = RightSide(voltages);
            voltages[c] = 0;
            Cholesky.Solve(matrix, column);
            for (var p = 0; p < n; p++)
            {
                if (order[p] == 0)
                    result[strips[owner[p]].Conductor, c] += Vacuum.Epsilon0 * column[p];
            }
        }
        return result;
    }

    /// <summary>The coefficients of all charges, divided by ε₀, when the conductors are at given voltages.</summary>
    /// <param name="dk">Relative permittivity of each layer, then of the space above the last.</param>
    /// <param name="voltages">Voltage of each conductor.</param>
    public double[] ChargesAt(ReadOnlySpan<double> dk, ReadOnlySpan<double> voltages)
    {
        var column = RightSide(voltages);
        Cholesky.Solve(FactoredMatrix(dk), column);
        return column;
    }

    /// <summary>Twice the field energy of given charges in another set of permittivities, in units of ε₀.</summary>
    /// <param name="dk">Relative permittivity of each layer, then of the space above the last.</param>
    /// <param name="charge">Coefficients from <see cref="ChargesAt"/>.</param>
    public double Energy(ReadOnlySpan<double> dk, ReadOnlySpan<double> charge)
    {
        var n = owner.Length;
        var sheets = nodes.Length;
        Span<double> potential = stackalloc double[sheets * sheets];
        Span<double> re = stackalloc double[sheets];
        Span<double> im = stackalloc double[sheets];
        var sum = 0.0;
        for (var i = 0; i < waveNumbers.Length; i++)
        {
            medium.Potentials(waveNumbers[i], dk, nodes, potential);
            re.Clear();
            im.Clear();
            for (var p = 0; p < n; p++)
            {
                re[nodeOf[p]] += charge[p] * real[i * n + p];
                if (!even)
                    im[nodeOf[p]] += charge[p] * imaginary[i * n + p];
            }
            for (var a = 0; a < sheets; a++)
            {
                for (var b = 0; b < sheets; b++)
                    sum += weights[i] * potential[a * sheets + b] * (re[a] * re[b] + im[a] * im[b]);
            }
        }
        var tails = new double[n * n];
        AddTails(dk, tails);
        for (var p = 0; p < n; p++)
        {
            for (var q = 0; q <= p; q++)
                sum += (p == q ? 1 : 2) * tails[p * n + q] * charge[p] * charge[q];
        }
        return sum;
    }

    private double[] FactoredMatrix(ReadOnlySpan<double> dk)
    {
        var matrix = new double[owner.Length * owner.Length];
        Sum(dk, matrix);
        AddTails(dk, matrix);
        Cholesky.Factor(matrix, owner.Length);
        return matrix;
    }

    private double[] RightSide(ReadOnlySpan<double> voltages)
    {
        var column = new double[owner.Length];
        for (var p = 0; p < column.Length; p++)
            column[p] = order[p] == 0 ? voltages[strips[owner[p]].Conductor] : 0;
        return column;
    }

    private void FillQuadrature(int panels)
    {
        var half = 0.5 * end / panels;
        for (int panel = 0, i = 0; panel < panels; panel++)
        {
            var middle = (2 * panel + 1) * half;
            for (var g = 0; g < GaussNodes.Length; g++)
            {
                waveNumbers[i] = middle - half * GaussNodes[g];
                weights[i++] = half * GaussWeights[g] / Math.PI;
                waveNumbers[i] = middle + half * GaussNodes[g];
                weights[i++] = half * GaussWeights[g] / Math.PI;
            }
        }
    }

    private void FillTransforms()
    {
        var n = owner.Length;
        Span<double> bessel = stackalloc double[12];
        for (var i = 0; i < waveNumbers.Length; i++)
        {
            var k = waveNumbers[i];
            double lastHalf = -1, lastCentre = double.NaN, cos = 1, sin = 0;
            for (var p = 0; p < n; p++)
            {
                var strip = strips[owner[p]];
                if (strip.HalfWidthMetres != lastHalf)
                    BesselJ.Fill(k * (lastHalf = strip.HalfWidthMetres), bessel[..(even ? 2 * strip.Terms - 1 : strip.Terms)]);
                var value = bessel[order[p]];
                if (even)
                {
                    real[i * n + p] = (order[p] & 2) == 0 ? value : -value;
                    continue;
                }
                if (strip.CentreMetres != lastCentre)
                    (sin, cos) = Math.SinCos(k * (lastCentre = strip.CentreMetres));
                // jᵐ·exp(jk·centre)
                var (re, im) = (order[p] & 3) switch { 0 => (cos, sin), 1 => (-sin, cos), 2 => (-cos, -sin), _ => (sin, -cos) };
                real[i * n + p] = value * re;
                imaginary[i * n + p] = value * im;
            }
        }
    }

    private void Sum(ReadOnlySpan<double> dk, double[] matrix)
    {
        var n = owner.Length;
        var sheets = nodes.Length;
        Span<double> potential = stackalloc double[sheets * sheets];
        for (var i = 0; i < waveNumbers.Length; i++)
        {
            medium.Potentials(waveNumbers[i], dk, nodes, potential);
            var re = real.AsSpan(i * n, n);
            var im = even ? [] : imaginary.AsSpan(i * n, n);
            for (var p = 0; p < n; p++)
            {
                var row = matrix.AsSpan(p * n, n);
                // Unknowns are sorted by node, so that one potential serves a whole run of them.
                for (int sheet = 0, from = 0; from <= p; sheet++)
                {
                    var to = Math.Min(firstOfNode[sheet + 1], p + 1);
                    var scale = weights[i] * potential[nodeOf[p] * sheets + sheet];
                    if (even)
                        AddScaled(row[from..to], scale * re[p], re[from..to]);
                    else
                        AddScaled(row[from..to], scale * re[p], re[from..to], scale * im[p], im[from..to]);
                    from = to;
                }
            }
        }
    }

    private static void AddScaled(Span<double> sum, double a, ReadOnlySpan<double> x)
    {
        for (var i = 0; i < sum.Length; i++)
            sum[i] += a * x[i];
    }

    private static void AddScaled(Span<double> sum, double a, ReadOnlySpan<double> x, double b, ReadOnlySpan<double> y)
    {
        var i = 0;
        for (; i <= sum.Length - Vector<double>.Count; i += Vector<double>.Count)
        {
            var v = new Vector<double>(sum[i..]) + a * new Vector<double>(x[i..]) + b * new Vector<double>(y[i..]);
            v.CopyTo(sum[i..]);
        }
        for (; i < sum.Length; i++)
            sum[i] += a * x[i] + b * y[i];
    }

    /// <summary>
    /// Beyond the end of the sum a strip sees only the two dielectrics at its faces, and J_m·J_n is 1/(πka)·(± 1 + an oscillation), whose integrals
    /// are known.
    /// </summary>
    private void AddTails(ReadOnlySpan<double> dk, double[] matrix)
    {
        var n = owner.Length;
        for (var p = 0; p < n; p++)
        {
            for (var q = 0; q <= p; q++)
            {
                if (owner[p] != owner[q] || ((order[p] - order[q]) & 1) != 0)
                    continue;
                var strip = strips[owner[p]];
                var a = strip.HalfWidthMetres;
                var sign = ((order[p] - order[q]) & 2) == 0 ? 1 : -1;
                var oscillation = Math.Sin(2 * end * a - 0.5 * Math.PI * (order[p] + order[q] + 1)) / (2 * a * end);
                matrix[p * n + q] += (1 - sign * oscillation) / (Math.PI * Math.PI * a * end * (dk[strip.Node] + dk[strip.Node + 1]));
            }
        }
    }
}
