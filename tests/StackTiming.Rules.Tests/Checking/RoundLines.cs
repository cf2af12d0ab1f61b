using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Rules.Tests.Checking;

/// <summary>A calculator for figures in the head: every single trace has 50 ohm and 6 ps/mm; it has no method for pairs.</summary>
internal sealed class RoundLines : ILineCalculator
{
    private const double Ohms = 50;
    private const double SecondsPerMetre = 6e-9;
    private int calls;

    /// <summary>How many sections were asked for.</summary>
    public int Calls => calls;

    public string Name => "round figures";

    public LineSolution? Calculate(CrossSection section)
    {
        Interlocked.Increment(ref calls);
        return section.Signals.Count() == 1
            ? new LineSolution(["a"], "round", new[,] { { SecondsPerMetre / Ohms } }, new[,] { { SecondsPerMetre * Ohms } }, [], 0, [])
            : null;
    }

    public string? Objection(CrossSection section) => section.Signals.Count() == 1 ? null : "round figures describe single traces only";
}
