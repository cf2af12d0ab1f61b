using Spectre.Console;
using StackTiming.Rules.Checking;

namespace StackTiming.Terminal;

/// <summary>Shows how far a check has come: bars on a terminal, nothing on a pipe.</summary>
internal static class CheckProgressBar
{
    /// <summary>Runs a check under the bars.</summary>
    /// <param name="work">The check; it reports its progress through the action that it is given, or not at all where that is null.</param>
    public static T Run<T>(Func<Action<CheckProgress>?, T> work)
    {
        if (Console.IsErrorRedirected)
            return work(null);
        var console = Tables.On(Console.Error);
        return console.Progress().AutoClear(true).Columns(new TaskDescriptionColumn(), new ProgressBarColumn(), new PercentageColumn()).Start(context =>
        {
            var bars = new Dictionary<string, ProgressTask>(StringComparer.Ordinal);
            return work(progress =>
            {
                lock (bars)
                {
                    if (!bars.TryGetValue(progress.Phase, out var bar))
                        bars[progress.Phase] = bar = context.AddTask(progress.Phase, maxValue: Math.Max(1, progress.Total));
                    bar.Value = progress.Done;
                }
            });
        });
    }
}
