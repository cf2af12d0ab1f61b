using System.Collections.Immutable;
using StackTiming.Lines.Fields.Geometry;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Systems;

/// <summary>Which conductors are signals and, in a symmetric section, which are mirror images of each other.</summary>
internal sealed class ConductorPairs
{
    private readonly int[] twins;
    private readonly int[] rows;
    private readonly ImmutableArray<SectionConductor> conductors;
    private readonly bool symmetric;

    public ConductorPairs(ImmutableArray<SectionConductor> conductors, bool symmetric, double tolerance)
    {
        (this.conductors, this.symmetric) = (conductors, symmetric);
        twins = [.. conductors.Select((_, i) => symmetric ? SectionFrame.TwinOf(conductors, i, tolerance) : i)];
        rows = new int[conductors.Length];
        for (var i = 0; i < rows.Length; i++)
            rows[i] = conductors[i].Grounded ? -1 : Signals++;
        RightSignals = [.. Enumerable.Range(0, rows.Length).Where(i => rows[i] >= 0
            && (!symmetric || twins[i] == i || conductors[i].CentreMetres > 0))];
    }

    /// <summary>Number of conductors.</summary>
    public int Conductors => conductors.Length;

    /// <summary>Number of signals.</summary>
    public int Signals { get; }

    /// <summary>Signals of the half that is solved, those on the axis among them; all signals of a section without symmetry.</summary>
    public int[] RightSignals { get; }

    /// <summary>The parities to solve.</summary>
    public int[] Parities => !symmetric ? [0] : Drives(-1).Length == 0 ? [1] : [1, -1];

    /// <summary>Index of the mirror image.</summary>
    public int Twin(int conductor) => twins[conductor];

    /// <summary>Row of a signal in the matrices, or -1.</summary>
    public int SignalRow(int conductor) => rows[conductor];

    /// <summary>Signals that have a drive of this parity: one of each pair, and for the even ones those on the axis.</summary>
    public int[] Drives(int parity) => [.. RightSignals.Where(i => parity >= 0 || twins[i] != i)];

    /// <summary>A voltage for each conductor from one for each signal.</summary>
    public double[] Volts(ReadOnlySpan<double> signalVolts)
    {
        var volts = new double[Conductors];
        for (var i = 0; i < volts.Length; i++)
            volts[i] = rows[i] < 0 ? 0 : signalVolts[rows[i]];
        return volts;
    }
}
