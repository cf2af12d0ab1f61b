using StackTiming.Waves.Networks;

namespace StackTiming.Waves.Characteristics;

/// <summary>
/// Lumped elements under the trapezoidal rule: each is a conductance and a current source that remembers the step before. A series branch obeys
/// v = R·i + L·di/dt + v_C.
/// </summary>
internal struct BranchState
{
    private readonly int from, to;
    private readonly double siemens, keep, capacitorOhms;
    private readonly bool plain;
    private double current, capacitorVolts, source;

    public BranchState(in SeriesBranch branch, double stepSeconds, double initialCurrent, double[] volts)
    {
        from = branch.From;
        to = branch.To;
        plain = branch.InductanceHenries == 0 && branch.CapacitanceFarads is null;
        capacitorOhms = branch.CapacitanceFarads is { } farads ? stepSeconds / (2 * farads) : 0;
        var inductorOhms = 2 * branch.InductanceHenries / stepSeconds;
        siemens = 1 / Math.Max(1e-6, branch.ResistanceOhms + inductorOhms + capacitorOhms);
        keep = branch.ResistanceOhms - inductorOhms + capacitorOhms;
        current = initialCurrent;
        capacitorVolts = branch.CapacitanceFarads is null ? 0 : volts[from] - volts[to];
    }

    public readonly double Siemens => siemens;

    public readonly int From => from;

    public readonly int To => to;

    /// <summary>Adds what the branch remembers to the currents into its nodes.</summary>
    public void Prepare(double[] volts, double[] currents)
    {
        if (plain)
            return;
        source = siemens * (volts[from] - volts[to] - (keep * current) - (2 * capacitorVolts));
        currents[from] -= source;
        currents[to] += source;
    }

    /// <summary>Takes over the new node voltages.</summary>
    public void Advance(double[] volts)
    {
        var next = (siemens * (volts[from] - volts[to])) + (plain ? 0 : source);
        capacitorVolts += capacitorOhms * (next + current);
        current = next;
    }
}

/// <summary>A capacitance to ground under the trapezoidal rule.</summary>
internal struct CapacitorState(int node, double farads, double stepSeconds)
{
    private readonly int node = node;
    private readonly double siemens = 2 * farads / stepSeconds;
    private double current;

    public readonly double Siemens => siemens;

    public readonly int Node => node;

    public double Prepare(double volts) => (siemens * volts) + current;

    public void Advance(double before, double after) => current = (siemens * (after - before)) - current;
}

/// <summary>An inductance to ground under the trapezoidal rule.</summary>
internal struct InductorState(int node, double henries, double stepSeconds, double initialCurrent)
{
    private readonly int node = node;
    private readonly double siemens = stepSeconds / (2 * henries);
    private double current = initialCurrent;

    public readonly double Siemens => siemens;

    public readonly int Node => node;

    /// <summary>The current that it takes out of its node beyond its conductance.</summary>
    public readonly double Prepare(double volts) => current + (siemens * volts);

    public void Advance(double before, double after) => current += siemens * (before + after);
}
