using System.CommandLine;
using System.Globalization;
using StackTiming.Lines.Loss;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Lines.Synthesis;
using StackTiming.Reports.Results;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using StackTiming.Terminal;

namespace StackTiming.Commands;

/// <summary><c>stacktiming lines board.stackup.yaml</c>: what traces do on each layer, and the width for a target impedance.</summary>
internal static class LinesCommand
{
    private static readonly MakeableRange Makeable = new(50e-6, 5e-3);

    private sealed record Row(
        string Layer, double WidthMetres, double? GapMetres, double ImpedanceOhms, double EpsEff, double DelaySecondsPerMetre,
        double? ConductorDbPerMetre, double? RoughnessDbPerMetre, double? DielectricDbPerMetre, string Shares, string Method, double Error, string Note);

    private sealed record Wanted(
        IReadOnlyList<double> Widths, IReadOnlyList<double> Gaps, IReadOnlyList<double> Targets, IReadOnlySet<string> Layers, double Hertz);

    /// <summary>The command.</summary>
    /// <param name="cancellation">Cancelled when the user wants to stop.</param>
    public static Command Create(CancellationToken cancellation)
    {
        var stackUp = new Argument<string>("stack-up") { Description = "The stack-up file (*.stackup.yaml)." };
        var width = new Option<string[]>("--width") { Description = "Trace width on the drawing; may be given several times (default 100 um, 150 um, 200 um).", HelpName = "length" };
        var gap = new Option<string[]>("--gap") { Description = "Gap inside a pair; adds a row for the pair at each width.", HelpName = "length" };
        var target = new Option<string[]>("--target") { Description = "Wanted impedance: adds the width that has it, single or (with --gap) differential.", HelpName = "ohms" };
        var layer = new Option<string[]>("--layer") { Description = "Only these layers.", HelpName = "name" };
        var frequency = new Option<string>("--frequency") { Description = "Frequency of Dk, Df and losses.", DefaultValueFactory = _ => "1 GHz", HelpName = "frequency" };
        var csv = new Option<string?>("--csv") { Description = "Write the table as CSV.", HelpName = "file.csv" };
        var json = new Option<bool>("--json") { Description = "Print JSON instead of a table." };
        var method = MethodOption.Create(MethodOption.Field, withBoth: false);
        var command = new Command("lines", "Impedance, delay, loss and permittivity of traces on each layer, and the width for a target impedance.")
        {
            stackUp, width, gap, target, layer, frequency, csv, json, method,
        };
        command.SetAction(result =>
        {
            var (output, error) = (result.InvocationConfiguration.Output, result.InvocationConfiguration.Error);
            var problems = new ProblemList();
            var hertz = Number(problems, "--frequency", result.GetRequiredValue(frequency), Dimension.Frequency);
            var widths = Numbers(problems, "--width", result.GetValue(width), Dimension.Length);
            var gaps = Numbers(problems, "--gap", result.GetValue(gap), Dimension.Length);
            var targets = Numbers(problems, "--target", result.GetValue(target), Dimension.Resistance);
            var file = InputFileLoader.Load(result.GetRequiredValue(stackUp), default, problems);
            var stack = file is null ? null : StackUpReader.Read(file, problems);
            var layers = (result.GetValue(layer) ?? []).ToHashSet(StringComparer.Ordinal);
            if (stack is not null)
                CheckLayers(stack, layers, problems);
            ProblemPrinter.Print(problems, error);
            if (stack is null || problems.HasErrors)
                return ExitCode.WrongInput;
            if (widths.Count == 0 && targets.Count == 0)
                widths = [100e-6, 150e-6, 200e-6];
            var wanted = new Wanted(widths, gaps, targets, layers, hertz);
            var rows = Rows(stack, wanted, MethodOption.Calculator(result.GetRequiredValue(method)), cancellation);
            if (!Outputs.Write(error, cancellation, (result.GetValue(csv), s => WriteCsv(rows, s))))
                return ExitCode.WrongInput;
            if (result.GetValue(json))
                output.WriteLine(LinesJson(rows));
            else
                Print(rows, stack, output);
            return ExitCode.Holds;
        });
        HelpWithExamples.AddTo(command, () => """
            Examples:
              stacktiming lines board.stackup.yaml --width 0.1mm --width 5mil
              stacktiming lines board.stackup.yaml --target 50ohm
              stacktiming lines board.stackup.yaml --layer L3 --gap 0.15mm --target 100ohm --csv lines.csv
            """);
        return command;
    }

    private static List<double> Numbers(ProblemList problems, string option, string[]? texts, Dimension dimension) =>
        [.. (texts ?? []).Select(t => Number(problems, option, t, dimension))];

    private static double Number(ProblemList problems, string option, string text, Dimension dimension)
    {
        if (!QuantityParser.TryParse(text, dimension, DefaultUnits.None, out var quantity, out var problem, out var advice))
            problems.Error(FilePosition.WholeFile(option), problem, advice);
        else if (quantity.Value <= 0)
            problems.Error(FilePosition.WholeFile(option), $"'{Suggestion.Shorten(text)}' is not above zero");
        return quantity.Value;
    }

    private static void CheckLayers(StackUp stack, HashSet<string> layers, ProblemList problems)
    {
        foreach (var name in layers)
        {
            if (stack.FindCopper(name) is not { } copper)
                problems.Error(FilePosition.WholeFile("--layer"), $"the stack-up has no copper layer '{Suggestion.Shorten(name)}'", Suggestion.For(name, stack.CopperLayers.Select(l => l.Name)));
            else if (copper.Use == CopperUse.Plane)
                problems.Error(FilePosition.WholeFile("--layer"), $"'{name}' is a plane", "name a signal or mixed layer");
        }
    }

    private static Row[] Rows(StackUp stack, Wanted wanted, ILineCalculator calculator, CancellationToken cancellation)
    {
        var layers = stack.CopperLayers.Where(l => l.Use != CopperUse.Plane && (wanted.Layers.Count == 0 || wanted.Layers.Contains(l.Name))).ToArray();
        var gaps = wanted.Gaps.Count == 0 ? [(double?)null] : wanted.Targets.Count > 0 ? wanted.Gaps.Select(g => (double?)g) : wanted.Gaps.Select(g => (double?)g).Prepend(null);
        var requests = layers.SelectMany(l => gaps.SelectMany(g =>
            wanted.Widths.Select(w => (Layer: l.Name, Gap: g, Width: w, Target: 0.0)).Concat(wanted.Targets.Select(t => (Layer: l.Name, Gap: g, Width: 0.0, Target: t))))).ToArray();
        return [.. requests.AsParallel().AsOrdered().WithCancellation(cancellation).Select(r => One(stack, calculator, wanted.Hertz, r.Layer, r.Gap, r.Width, r.Target))];
    }

    private static Row One(StackUp stack, ILineCalculator calculator, double hertz, string layer, double? gap, double width, double target)
    {
        var request = new SectionRequest(FilePosition.WholeFile("--width"), layer, target > 0 ? Makeable.LeastMetres : width) { PairGapMetres = gap, FrequencyHertz = hertz };
        if (target > 0)
        {
            var found = new DimensionSearch(stack, calculator).Width(request, target, Makeable);
            if (found.Metres is not { } metres)
                return new Row(layer, double.NaN, gap, target, double.NaN, double.NaN, null, null, null, "", "", double.NaN, found.Obstacle ?? "");
            request = request with { WidthMetres = metres };
        }
        var problems = new ProblemList();
        var section = SectionBuilder.Build(stack, request, problems);
        if (section is null || calculator.Calculate(section) is not { } solution)
        {
            var why = section is null ? problems.Items.First(p => p.IsError).Message : calculator.Objection(section) ?? "no method for this section";
            return new Row(layer, request.WidthMetres, gap, double.NaN, double.NaN, double.NaN, null, null, null, "", "", double.NaN, why);
        }
        var pair = gap is null ? null : PairModes.Of(solution);
        var wave = IncrementalInductance.At(section, hertz, calculator)?.Modes[0];
        return new Row(
            layer, request.WidthMetres, gap, pair?.ZDiffOhms ?? solution.Z0Ohms, pair?.EpsEffDiff ?? solution.EpsEff,
            wave?.DelaySecondsPerMetre ?? pair?.DiffDelaySecondsPerMetre ?? solution.DelaySecondsPerMetre,
            wave?.ConductorDecibelPerMetre, wave?.RoughnessDecibelPerMetre, wave?.DielectricDecibelPerMetre,
            string.Join(", ", solution.EnergyShares.Select(s => string.Create(CultureInfo.InvariantCulture, $"{s.Dielectric} {100 * s.Share:0} %"))),
            solution.MethodId, solution.RelativeError, string.Join("; ", solution.Warnings));
    }

    private static void Print(Row[] rows, StackUp stack, TextWriter output)
    {
        var table = Tables.Of("Layer", ">Width mm", ">Gap mm", ">Z ohm", ">eps_eff", ">ps/mm", ">Copper dB/m", ">Rough dB/m", ">Diel. dB/m", "Field energy in", "Method", ">± %", "Note");
        foreach (var r in rows)
        {
            table.Add(
                r.Layer, Figure(r.WidthMetres * 1e3, "0.000"), Figure(r.GapMetres * 1e3, "0.000"), Figure(r.ImpedanceOhms, "0.00"), Figure(r.EpsEff, "0.000"),
                Figure(r.DelaySecondsPerMetre * 1e9, "0.000"), Figure(r.ConductorDbPerMetre, "0.00"), Figure(r.RoughnessDbPerMetre, "0.00"),
                Figure(r.DielectricDbPerMetre, "0.00"), r.Shares, r.Method, Figure(100 * r.Error, "0.00"), r.Note);
        }
        output.WriteLine(ProblemPrinter.Printable(stack.Name.Length > 0 ? stack.Name : "Stack-up"));
        Tables.On(output).Write(table);
    }

    private static void WriteCsv(Row[] rows, Stream stream) => CsvTable.Write(
        ["layer", "width[mm]", "gap[mm]", "impedance[ohm]", "eps_eff", "delay[ps/mm]", "conductor[dB/m]", "roughness[dB/m]", "dielectric[dB/m]", "energy", "method", "error[%]", "note"],
        rows.Select(r => (IReadOnlyList<string>)
        [
            r.Layer, Figure(r.WidthMetres * 1e3, "0.0000"), Figure(r.GapMetres * 1e3, "0.0000"), Figure(r.ImpedanceOhms, "0.000"), Figure(r.EpsEff, "0.0000"),
            Figure(r.DelaySecondsPerMetre * 1e9, "0.0000"), Figure(r.ConductorDbPerMetre, "0.000"), Figure(r.RoughnessDbPerMetre, "0.000"),
            Figure(r.DielectricDbPerMetre, "0.000"), r.Shares, r.Method, Figure(100 * r.Error, "0.00"), r.Note,
        ]), stream);

    private static string LinesJson(Row[] rows) => JsonText.Of(writer =>
    {
        writer.WriteStartArray();
        foreach (var r in rows)
        {
            writer.WriteStartObject();
            writer.WriteString("layer", r.Layer);
            JsonText.Number(writer, "width_m", r.WidthMetres);
            JsonText.Number(writer, "gap_m", r.GapMetres);
            JsonText.Number(writer, r.GapMetres is null ? "z0_ohm" : "z_diff_ohm", r.ImpedanceOhms);
            JsonText.Number(writer, "eps_eff", r.EpsEff);
            JsonText.Number(writer, "delay_s_per_m", r.DelaySecondsPerMetre);
            JsonText.Number(writer, "attenuation_conductor_db_per_m", r.ConductorDbPerMetre);
            JsonText.Number(writer, "attenuation_roughness_db_per_m", r.RoughnessDbPerMetre);
            JsonText.Number(writer, "attenuation_dielectric_db_per_m", r.DielectricDbPerMetre);
            writer.WriteString("method", r.Method);
            JsonText.Number(writer, "relative_error", r.Error);
            writer.WriteString("note", r.Note);
            writer.WriteEndObject();
        }
        writer.WriteEndArray();
    });

    private static string Figure(double? value, string format) =>
        value is { } v && double.IsFinite(v) ? v.ToString(format, CultureInfo.InvariantCulture) : "";
}
