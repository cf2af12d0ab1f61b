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

    /// <summary>The calculator of a choice.</summary>
    /// <param name="choice">The choice; not both.</param>
    public static ILineCalculator Calculator(string choice) => choice == Field ? FieldSolver.Default : ClosedForms.Calculator;
}
