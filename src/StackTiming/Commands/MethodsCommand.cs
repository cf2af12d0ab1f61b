using System.CommandLine;
using System.Globalization;
using StackTiming.Lines.Methods;
using StackTiming.Terminal;
using StackTiming.Waves.Methods;

namespace StackTiming.Commands;

/// <summary><c>stacktiming methods</c>: the published methods with their sources, validity and measured errors.</summary>
internal static class MethodsCommand
{
    /// <summary>The command.</summary>
    public static Command Create()
    {
        var json = new Option<bool>("--json") { Description = "Print JSON." };
        var command = new Command("methods", "List the methods with source, validity range and the error measured against independent references.") { json };
        command.SetAction(result =>
        {
            var output = result.InvocationConfiguration.Output;
            if (result.GetValue(json))
                output.WriteLine(Json());
            else
                Print(output);
            return ExitCode.Holds;
        });
        HelpWithExamples.AddTo(command, () => """
            Examples:
              stacktiming methods
              stacktiming methods --json
            """);
        return command;
    }

    private static void Print(TextWriter output)
    {
        foreach (var method in MethodCatalogue.All)
        {
            output.WriteLine($"{method.Id}{(method.IsSecondOpinion ? "  (second opinion)" : "")}");
            output.WriteLine($"  {method.Geometry}");
            output.WriteLine($"  source:   {method.Source}");
            output.WriteLine($"  validity: {method.Validity}");
            output.WriteLine($"  stated:   {method.StatedError}");
            foreach (var error in method.Measured)
                output.WriteLine($"  measured: {Percent(error.ImpedanceError)} in impedance, {Percent(error.EpsEffError)} in effective permittivity ({error.CaseSet})");
            output.WriteLine();
        }
        foreach (var method in SupportingMethod.All)
        {
            output.WriteLine($"{method.Id}  ({method.Name})");
            output.WriteLine($"  {method.Purpose}");
            output.WriteLine($"  source:   {method.Source}");
            output.WriteLine($"  validity: {method.Validity}");
            output.WriteLine($"  proof:    {method.Proof}");
            output.WriteLine();
        }
    }

    private static string Json() => JsonText.Of(writer =>
    {
        writer.WriteStartArray();
        foreach (var method in MethodCatalogue.All)
        {
            writer.WriteStartObject();
            writer.WriteString("id", method.Id);
            writer.WriteString("name", method.Name);
            writer.WriteString("geometry", method.Geometry);
            writer.WriteString("source", method.Source);
            writer.WriteString("validity", method.Validity);
            writer.WriteString("stated_error", method.StatedError);
            writer.WriteBoolean("second_opinion", method.IsSecondOpinion);
            writer.WriteStartArray("measured");
            foreach (var error in method.Measured)
            {
                writer.WriteStartObject();
                writer.WriteString("cases", error.CaseSet);
                JsonText.Number(writer, "impedance_error", error.ImpedanceError);
                JsonText.Number(writer, "eps_eff_error", error.EpsEffError);
                writer.WriteEndObject();
            }
            writer.WriteEndArray();
            writer.WriteEndObject();
        }
        foreach (var method in SupportingMethod.All)
        {
            writer.WriteStartObject();
            writer.WriteString("id", method.Id);
            writer.WriteString("name", method.Name);
            writer.WriteString("purpose", method.Purpose);
            writer.WriteString("source", method.Source);
            writer.WriteString("validity", method.Validity);
            writer.WriteString("proof", method.Proof);
            writer.WriteEndObject();
        }
        writer.WriteEndArray();
    });

    private static string Percent(double error) => (100 * error).ToString("0.00", CultureInfo.InvariantCulture) + " %";
}
