using System.CommandLine;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Solutions;

namespace StackTiming.Terminal;

/// <summary>The option that chooses between the closed forms and the field solver.</summary>
internal static class MethodOption
{
    public const string ClosedForm = "closed-form";
    public const string Field = "field";
    public const string Both = "both";

    /// <summary>The option.</summary>
    /// <param name="initial">The choice where the user makes none.</param>
    /// <param name="withBoth">Whether both can be asked for.</param>
    public static Option<string> Create(string initial, bool withBoth)
    {
        var option = new Option<string>("--method")
        {
            Description = $"How lines are computed: {ClosedForm} (fast) or {Field} (the solver that judges the closed forms){(withBoth ? ", or both" : "")}.",
            DefaultValueFactory = _ => initial,
            HelpName = "method",
        };
        option.AcceptOnlyFromAmong(withBoth ? [ClosedForm, Field, Both] : [ClosedForm, Field]);
        return option;
    }

    /// <summary>The calculator of a choice; what the solver has solved is remembered in the user's cache folder.</summary>
    /// <param name="choice">The choice; not both.</param>
    public static ILineCalculator Calculator(string choice) =>
        choice == Field ? new SolutionCache(FieldSolver.Default, CacheFolder(), $"{FieldSolver.MethodId} {ToolVersion.Identity.Version} {FieldSolverOptions.Default.RelativeTolerance:R}") : ClosedForms.Calculator;

    /// <summary>What a choice is compared with: the solver with the closed forms. A closed form alone is the fast way, without comparison.</summary>
    /// <param name="choice">The choice; not both.</param>
    public static ILineCalculator? SecondOpinion(string choice) => choice == Field ? ClosedForms.Calculator : null;

    // STACKTIMING_CACHE, else the cache folder of the operating system's user.
    private static string CacheFolder()
    {
        if (Environment.GetEnvironmentVariable("STACKTIMING_CACHE") is { Length: > 0 } stated)
            return stated;
        var cache = Environment.GetEnvironmentVariable("XDG_CACHE_HOME") is { Length: > 0 } xdg && Path.IsPathRooted(xdg) ? xdg
            : OperatingSystem.IsWindows() ? Environment.GetFolderPath(Environment.SpecialFolder.LocalApplicationData)
            : Path.Combine(Environment.GetFolderPath(Environment.SpecialFolder.UserProfile), ".cache");
        return Path.Combine(cache, "stacktiming", "lines");
    }
}
