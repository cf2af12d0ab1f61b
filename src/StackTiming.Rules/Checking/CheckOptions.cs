using StackTiming.Lines.Solutions;
using StackTiming.Rules.Results;

namespace StackTiming.Rules.Checking;

/// <summary>How a board is checked.</summary>
/// <param name="Calculator">Computes the lines: closed forms or the field solver.</param>
/// <param name="Today">The day of the check, against which waivers are held.</param>
public sealed record CheckOptions(ILineCalculator Calculator, DateOnly Today)
{
    /// <summary>A second method that each section of the board is compared with, or null.</summary>
    public ILineCalculator? SecondOpinion { get; init; }

    /// <summary>How many waveforms are kept for figures, the worst ones.</summary>
    public int MostWaves { get; init; } = 24;

    /// <summary>Relative margin below which a waveform that passes is kept for a figure: close to its limit.</summary>
    public double CloseMargin { get; init; } = 0.25;

    /// <summary>Threads to use; all cores by default.</summary>
    public int Threads { get; init; } = Environment.ProcessorCount;

    /// <summary>Is told of progress, from any thread; null for none.</summary>
    public Action<CheckProgress>? Progress { get; init; }

    /// <summary>Stops the check.</summary>
    public CancellationToken Cancellation { get; init; }

    /// <summary>Phases that came before, such as reading; they head the list of phases.</summary>
    public IReadOnlyList<PhaseTime> Before { get; init; } = [];
}

/// <summary>How far a check has come.</summary>
/// <param name="Phase">Phase: <c>lines</c>, <c>delays</c>, <c>waves</c>, <c>rules</c>.</param>
/// <param name="Done">Units of work done.</param>
/// <param name="Total">Units of work in this phase.</param>
public readonly record struct CheckProgress(string Phase, int Done, int Total);
