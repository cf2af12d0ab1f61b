using System.CommandLine;
using System.Globalization;
using System.Text.Json;
using System.Text.Json.Serialization;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Results;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Sweeps;
using StackTiming.Reports.Figures;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using StackTiming.Terminal;

namespace StackTiming.Commands;

/// <summary><c>stacktiming section FILE</c>: the constants per metre of conductors placed by hand in a stack-up.</summary>
internal static class SectionCommand
{
    private const double UsualHertz = 1e9;

    /// <summary>The command.</summary>
    public static Command Create()
    {
        var file = new Argument<string>("file") { Description = "A section file (*.section.yaml)." };
        var frequency = new Option<string?>("--frequency") { Description = "Frequency of Dk, Df and losses (default 1 GHz).", HelpName = "frequency" };
        var lossless = new Option<bool>("--lossless") { Description = "External inductance and Dk as stated, without losses." };
        var json = new Option<bool>("--json") { Description = "Print JSON instead of a table." };
        var figure = new Option<string?>("--figure") { Description = "Draw the section with its fields, or, with --sweep, attenuation and delay.", HelpName = "file.svg|png|pdf" };
        var method = MethodOption.Create(MethodOption.Field, withBoth: true);
        var command = new Command("section", "Impedance, matrices, delay, loss and field energy of one cross-section.") { file, method, frequency, lossless, json, figure };
        var sweeps = new SectionSweepOptions();
        sweeps.AddTo(command);
        command.SetAction(result =>
        {
            var (output, error) = (result.InvocationConfiguration.Output, result.InvocationConfiguration.Error);
            var problems = new ProblemList();
            double? hertz = null;
            if (!result.GetValue(lossless))
                hertz = Frequency(result.GetValue(frequency), problems);
            else if (result.GetValue(frequency) is not null)
                problems.Error(FilePosition.WholeFile("--frequency"), "--lossless takes Dk as stated, so there is no frequency to choose", "leave one of the two away");
            var request = sweeps.Read(result, problems);
            if (request is not null && (result.GetValue(lossless) || result.GetValue(frequency) is not null))
                problems.Error(FilePosition.WholeFile("--sweep"), "a sweep has losses and its own frequencies", "leave --frequency and --lossless away");
            if (request is not null && result.GetRequiredValue(method) == MethodOption.Both)
                problems.Error(FilePosition.WholeFile("--sweep"), "a sweep is by one method", "write --method field or --method closed-form");
            if (result.GetValue(figure) is { } drawn && !FigureOutput.IsKnown(drawn))
                problems.Error(FilePosition.WholeFile("--figure"), "the figure's kind is told by its name, and this one ends in none of .svg, .png, .pdf", "name it section.svg");
            if (problems.HasErrors)
            {
                ProblemPrinter.Print(problems, error);
                return ExitCode.WrongInput;
            }
            if (request is not null)
                return SectionSweepRun.Run(result, request, result.GetRequiredValue(file), result.GetRequiredValue(method), result.GetValue(json), result.GetValue(figure), problems);
            var results = Results(result.GetRequiredValue(file), hertz, result.GetRequiredValue(method), problems);
            ProblemPrinter.Print(problems, error);
            if (results is null || !Draw(result.GetRequiredValue(file), hertz, result.GetValue(figure), error))
                return ExitCode.WrongInput;
            if (result.GetValue(json))
                output.WriteLine(results.Count == 1 ? Json(results[0]) : "[\n" + string.Join(",\n", results.Select(Json)) + "\n]");
            else
                Print(results, output);
            return ExitCode.Holds;
        });
        HelpWithExamples.AddTo(command, () => """
            Examples:
              stacktiming section pair.section.yaml
              stacktiming section pair.section.yaml --method both --frequency 5GHz
              stacktiming section pair.section.yaml --lossless --json
              stacktiming section pair.section.yaml --figure fields.svg
              stacktiming section pair.section.yaml --sweep 1MHz..20GHz --csv pair.csv --figure loss.pdf
              stacktiming section pair.section.yaml --sweep 1MHz..20GHz --per-decade 50 --touchstone pair.s4p --length 50mm
            """);
        return command;
    }

    private static double Frequency(string? text, ProblemList problems)
    {
        if (text is null)
            return UsualHertz;
        if (!QuantityParser.TryParse(text, Dimension.Frequency, DefaultUnits.None, out var quantity, out var problem, out var advice))
            problems.Error(FilePosition.WholeFile("--frequency"), problem, advice);
        else if (quantity.Value <= 0)
            problems.Error(FilePosition.WholeFile("--frequency"), "the frequency must be above zero");
        return quantity.Value;
    }

    private static List<SectionResult>? Results(string path, double? hertz, string method, ProblemList problems)
    {
        if (InputFileLoader.Load(path, default, problems) is not { } text || SectionFileReader.Read(text, problems) is not { } placed || problems.HasErrors
            || placed.At(hertz, problems) is not { } section)
            return null;
        var results = new List<SectionResult>();
        string[] methods = method == MethodOption.Both ? [MethodOption.ClosedForm, MethodOption.Field] : [method];
        foreach (var one in methods)
        {
            var calculator = MethodOption.Calculator(one);
            if (calculator.Calculate(section) is { } solution)
                results.Add(SectionResult.Of(solution, hertz is { } f ? LineSweep.Of(_ => section, [f], calculator)?[0] : null));
            else if (method == MethodOption.Both && one == MethodOption.ClosedForm)
                problems.Note(FilePosition.WholeFile(path), calculator.Objection(section) ?? "no closed form describes this section");
            else
                problems.Error(FilePosition.WholeFile(path), calculator.Objection(section) ?? $"the {calculator.Name} has no result for this section", "try --method field");
        }
        return problems.HasErrors ? null : results;
    }

    // Always by the field solver, as closed forms have no fields; the file has been read without problems by now.
    private static bool Draw(string path, double? hertz, string? figure, TextWriter error)
    {
        if (figure is null)
            return true;
        var problems = new ProblemList();
        try
        {
            var section = SectionFileReader.Read(InputFileLoader.Load(path, default, problems)!, problems)!.At(hertz, problems)!;
            var picture = SectionPictures.Of(Path.GetFileName(path), FieldSolver.Default.Solve(section));
            return Outputs.Write(error, CancellationToken.None, (figure, s => FigureOutput.Write(new SectionFigure(picture), picture.Title, figure, s)));
        }
        catch (SectionNotSolvableException e)
        {
            problems.Error(FilePosition.WholeFile(path), e.Message.TrimEnd('.'));
            ProblemPrinter.Print(problems, error);
            return false;
        }
    }

    private static string Json(SectionResult result) => JsonSerializer.Serialize(result, SectionJson.Default.SectionResult);

    private static void Print(List<SectionResult> results, TextWriter output)
    {
        var table = Tables.Of(["", .. results.Select(r => ">" + r.Method)]);
        void Row(string name, Func<SectionResult, double?> value, string format = "0.0000", double scale = 1)
        {
            if (results.Any(r => value(r) is not null))
                table.Add([name, .. results.Select(r => value(r) is { } v ? (v * scale).ToString(format, CultureInfo.InvariantCulture) : "")]);
        }
        Row("impedance, ohm", r => r.Z0);
        Row("differential impedance, ohm", r => r.ZDiff);
        Row("common-mode impedance, ohm", r => r.ZCommon);
        Row("odd-mode impedance, ohm", r => r.ZOdd);
        Row("even-mode impedance, ohm", r => r.ZEven);
        Row("effective permittivity", r => r.EpsEff);
        Row("effective permittivity, odd mode", r => r.EpsEffOdd);
        Row("effective permittivity, even mode", r => r.EpsEffEven);
        Row("delay, ps/mm", r => r.Delay, scale: 1e9);
        Row("attenuation, dB/m", r => r.Attenuation);
        Row("  by smooth copper, dB/m", r => r.AttenuationByConductor);
        Row("  by roughness, dB/m", r => r.AttenuationByRoughness);
        Row("  by dielectrics, dB/m", r => r.AttenuationByDielectric);
        foreach (var dielectric in results.SelectMany(r => r.EnergyFraction?.Keys ?? []).Distinct())
            Row($"field energy in {dielectric}, %", r => r.EnergyFraction?.TryGetValue(dielectric, out var share) == true ? share : null, "0.00", 100);
        Matrix(table, results, "C", "pF/m", r => r.CapacitanceMatrix, 1e12);
        Matrix(table, results, "L", "nH/m", r => r.InductanceMatrix, 1e9);
        Matrix(table, results, "R", "ohm/m", r => r.ResistanceMatrix, 1);
        Matrix(table, results, "G", "mS/m", r => r.ConductanceMatrix, 1e3);
        Row("error, documented or estimated, %", r => r.RelativeError, "0.000", 100);
        Tables.On(output).Write(table);
        foreach (var warning in results.SelectMany(r => r.Warnings.Select(w => $"{r.Method}: {w}")))
            output.WriteLine(ProblemPrinter.Printable(warning));
    }

    private static void Matrix(Spectre.Console.Table table, List<SectionResult> results, string name, string unit, Func<SectionResult, double[][]?> matrix, double scale)
    {
        var names = results[0].Conductors;
        if (results.All(r => matrix(r) is null))
            return;
        for (var i = 0; i < names.Count; i++)
        {
            for (var j = i; j < names.Count; j++)
            {
                table.Add([
                    $"{name}({names[i]},{names[j]}), {unit}",
                    .. results.Select(r => matrix(r) is { } m ? (m[i][j] * scale).ToString("0.0000", CultureInfo.InvariantCulture) : ""),
                ]);
            }
        }
    }
}

/// <summary>Serialisation of section results, generated at compile time.</summary>
[JsonSourceGenerationOptions(WriteIndented = true)]
[JsonSerializable(typeof(SectionResult))]
internal sealed partial class SectionJson : JsonSerializerContext;
