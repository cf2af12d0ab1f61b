using System.Diagnostics;
using StackTiming.Rules.Results;

namespace StackTiming.Rules.Checking;

/// <summary>Runs the phases of a check: all cores, progress, elapsed time, and a stop between any two units of work.</summary>
/// <param name="options">How the board is checked.</param>
internal sealed class PhaseClock(CheckOptions options)
{
    private readonly List<PhaseTime> phases = [.. options.Before];

    /// <summary>The phases so far.</summary>
    public IReadOnlyList<PhaseTime> Phases => phases;

    /// <summary>Times a phase that works on its own.</summary>
    /// <typeparam name="T">What it makes.</typeparam>
    /// <param name="name">Name of the phase.</param>
    /// <param name="units">Number of units.</param>
    /// <param name="what">What the units are.</param>
    /// <param name="work">The work.</param>
    public T Time<T>(string name, int units, string what, Func<T> work)
    {
        var watch = Stopwatch.StartNew();
        options.Progress?.Invoke(new CheckProgress(name, 0, units));
        options.Cancellation.ThrowIfCancellationRequested();
        var made = work();
        options.Progress?.Invoke(new CheckProgress(name, units, units));
        phases.Add(new PhaseTime(name, watch.Elapsed, Count(units, what)));
        return made;
    }

    private static string Count(int units, string what) => string.Create(System.Globalization.CultureInfo.InvariantCulture, $"{units} {what}");

    /// <summary>Works on every unit of a phase.</summary>
    /// <param name="name">Name of the phase.</param>
    /// <param name="units">Number of units.</param>
    /// <param name="what">What the units are, such as <c>sections</c>.</param>
    /// <param name="work">Works on one unit; safe for different units at once.</param>
    public void Run(string name, int units, string what, Action<int> work)
    {
        var watch = Stopwatch.StartNew();
        var done = 0;
        // Reporting each of a million units would cost more than the units.
        var step = Math.Max(1, units / 200);
        options.Progress?.Invoke(new CheckProgress(name, 0, units));
        options.Cancellation.ThrowIfCancellationRequested();
        var parallel = new ParallelOptions { MaxDegreeOfParallelism = Math.Max(1, options.Threads), CancellationToken = options.Cancellation };
        Parallel.For(0, units, parallel, unit =>
        {
            work(unit);
            var count = Interlocked.Increment(ref done);
            if (options.Progress is { } progress && (count % step == 0 || count == units))
                progress(new CheckProgress(name, count, units));
        });
        phases.Add(new PhaseTime(name, watch.Elapsed, Count(units, what)));
    }
}
