using System.Numerics;
using StackTiming.Waves.Characteristics;

namespace StackTiming.Waves.FrequencyDomain;

/// <summary>The exact nodal solution of a linear circuit at a complex frequency, for one volt of the driver's source.</summary>
internal sealed class NodalSolution
{
    private readonly Circuit circuit;
    private readonly LossyLineAdmittance[] lossy;
    private readonly Complex[] matrix;
    private readonly Complex[] right;

    public NodalSolution(Circuit circuit)
    {
        this.circuit = circuit;
        lossy = Array.ConvertAll(circuit.LossyLines, l => new LossyLineAdmittance(l));
        matrix = new Complex[circuit.NodeCount * circuit.NodeCount];
        right = new Complex[circuit.NodeCount];
    }

    /// <summary>Voltages of all nodes at a complex frequency; valid until the next call.</summary>
    public ReadOnlySpan<Complex> At(Complex s)
    {
        Array.Clear(matrix);
        Array.Clear(right);
        Add(circuit.SourceNode, circuit.SourceNode, circuit.SourceSiemens);
        right[circuit.SourceNode] = circuit.SourceSiemens;
        foreach (ref readonly var line in circuit.Lines.AsSpan())
            Add(line.From, line.To, LineAdmittance.Lossless(s, line.Z0Ohms, line.DelaySeconds));
        for (var i = 0; i < lossy.Length; i++)
            Add(circuit.LossyLines[i].From, circuit.LossyLines[i].To, lossy[i].At(s));
        foreach (var group in circuit.Groups)
        {
            foreach (var mode in group.Modes)
            {
                var two = LineAdmittance.Lossless(s, mode.ImpedanceOhms, mode.DelaySeconds);
                for (var k = 0; k < group.From.Length; k++)
                {
                    for (var l = 0; l < group.From.Length; l++)
                    {
                        var weight = mode.Weights[k] * mode.Weights[l];
                        Add(group.From[k], group.From[l], weight * two.Own);
                        Add(group.To[k], group.To[l], weight * two.Own);
                        Add(group.From[k], group.To[l], weight * two.Transfer);
                        Add(group.To[k], group.From[l], weight * two.Transfer);
                    }
                }
            }
        }
        foreach (ref readonly var branch in circuit.Branches.AsSpan())
        {
            var ohms = branch.ResistanceOhms + (s * branch.InductanceHenries) + (branch.CapacitanceFarads is { } farads ? 1 / (s * farads) : 0);
            var siemens = 1 / (ohms == 0 ? 1e-6 : ohms);
            Add(branch.From, branch.To, new LineAdmittance(siemens, -siemens));
        }
        foreach (ref readonly var shunt in circuit.Shunts.AsSpan())
        {
            var siemens = s * shunt.CapacitanceFarads;
            if (shunt.ResistanceOhms is { } r)
                siemens += 1 / r;
            if (shunt.InductanceHenries is { } henries)
                siemens += 1 / (s * henries);
            Add(shunt.Node, shunt.Node, siemens);
        }
        Eliminate();
        return right;
    }

    private void Add(int row, int column, Complex siemens) => matrix[(row * circuit.NodeCount) + column] += siemens;

    private void Add(int a, int b, LineAdmittance two)
    {
        Add(a, a, two.Own);
        Add(b, b, two.Own);
        Add(a, b, two.Transfer);
        Add(b, a, two.Transfer);
    }

    // Gauss without pivoting: the matrix is symmetric with a positive real part, for the networks are passive and Re s > 0.
    private void Eliminate()
    {
        var n = circuit.NodeCount;
        for (var k = 0; k < n; k++)
        {
            var inverse = 1 / matrix[(k * n) + k];
            for (var i = k + 1; i < n; i++)
            {
                var factor = matrix[(i * n) + k];
                if (factor == Complex.Zero)
                    continue;
                factor *= inverse;
                for (var j = k + 1; j < n; j++)
                    matrix[(i * n) + j] -= factor * matrix[(k * n) + j];
                right[i] -= factor * right[k];
            }
        }
        for (var i = n - 1; i >= 0; i--)
        {
            var sum = right[i];
            for (var j = i + 1; j < n; j++)
                sum -= matrix[(i * n) + j] * right[j];
            right[i] = sum / matrix[(i * n) + i];
        }
    }
}
