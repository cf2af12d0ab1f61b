using StackTiming.Lines.Fields.Panels;
using StackTiming.Lines.Fields.Systems;

namespace StackTiming.Lines.Fields;

/// <summary>The charge coefficients of one drive, on the panels that were solved and on their mirror images.</summary>
internal sealed class SolvedDrive
{
    private readonly (int Parity, double[] Coefficients)[] parts;

    /// <summary>Superposes the unit drives.</summary>
    /// <param name="panels">The panels of the mesh.</param>
    /// <param name="charges">The unit drives, by parity.</param>
    /// <param name="volts">Voltage of each conductor.</param>
    public SolvedDrive(Panel[] panels, ParityCharges[] charges, ReadOnlySpan<double> volts)
    {
        var all = new (int, double[])[charges.Length];
        for (var i = 0; i < charges.Length; i++)
            all[i] = (charges[i].Parity, charges[i].Superpose(volts));
        parts = all;
        var unknowns = 0;
        var count = 0;
        // In air only conductors carry charge; in open space the last number is the potential far away.
        while (count < panels.Length && unknowns + panels[count].Terms <= parts[0].Coefficients.Length)
            unknowns += panels[count++].Terms;
        Panels = panels[..count];
        foreach (var (parity, coefficients) in parts)
            Offset += parity >= 0 && coefficients.Length > unknowns ? coefficients[unknowns] : 0;
    }

    /// <summary>The panels that carry charge.</summary>
    public Panel[] Panels { get; }

    /// <summary>True where the panels have mirror images that carry charge too.</summary>
    public bool Mirrored => parts[0].Parity != 0;

    /// <summary>Potential in volts to add to that of the charges.</summary>
    public double Offset { get; }

    /// <summary>A coefficient in units of 2πε0, of the panel that was solved or of its mirror image.</summary>
    public double Coefficient(int index, bool mirrored)
    {
        var sum = 0.0;
        foreach (var (parity, coefficients) in parts)
            sum += mirrored ? parity * coefficients[index] : coefficients[index];
        return sum;
    }

    /// <summary>Charge per u of a panel whose first coefficient has this index, in units of 2πε0.</summary>
    public double ChargeAt(Panel panel, int first, bool mirrored, double u)
    {
        var sum = 0.0;
        for (var n = 0; n < panel.Terms; n++)
            sum += Coefficient(first + n, mirrored) * LegendreRule.Polynomial(n, u);
        return sum;
    }
}
