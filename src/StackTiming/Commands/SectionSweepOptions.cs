using System.CommandLine;
using StackTiming.Lines.Sweeps;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Commands;

/// <summary>The options of <c>stacktiming section</c> that need a range of frequencies.</summary>
internal sealed class SectionSweepOptions
{
    private const int MostPerDecade = 1000;

    private readonly Option<string?> sweep = new("--sweep") { Description = "Compute against frequency, evenly spaced on a logarithmic scale.", HelpName = "from..to" };
    private readonly Option<int> perDecade = new("--per-decade") { Description = "With --sweep: frequencies in a decade.", HelpName = "count", DefaultValueFactory = _ => 10 };
    private readonly Option<string?> csv = new("--csv") { Description = "With --sweep: write the table as CSV.", HelpName = "file" };
    private readonly Option<string?> touchstone = new("--touchstone")
    {
        Description = "With --sweep: write the scattering parameters of a line (.s2p or .s4p: version 1; .ts: version 2.0).",
        HelpName = "file.s2p|s4p|ts",
    };
    private readonly Option<string?> length = new("--length") { Description = "With --touchstone: length of the line.", HelpName = "length" };
    private readonly Option<string?> reference = new("--reference") { Description = "With --touchstone: reference resistance of the ports (default 50 ohm).", HelpName = "ohms" };

    /// <summary>Adds the options to a command.</summary>
    public void AddTo(Command command)
    {
        foreach (var option in new Option[] { sweep, perDecade, csv, touchstone, length, reference })
            command.Options.Add(option);
    }

    /// <summary>What was asked for, or null without a sweep or with problems.</summary>
    public SectionSweepRequest? Read(ParseResult result, ProblemList problems)
    {
        var paths = (Csv: result.GetValue(csv), Touchstone: result.GetValue(touchstone));
        if (result.GetValue(sweep) is not { } range)
        {
            foreach (var option in new Option[] { perDecade, csv, touchstone, length, reference })
            {
                if (result.GetResult(option) is { Implicit: false })
                    problems.Error(FilePosition.WholeFile(option.Name), "there is no range of frequencies", "add --sweep, such as --sweep 1MHz..20GHz");
            }
            return null;
        }
        var frequencies = Range(range, result.GetValue(perDecade), problems);
        var metres = Quantity(length, result, Dimension.Length, null, problems);
        var ohms = Quantity(reference, result, Dimension.Resistance, 50, problems);
        if (paths.Touchstone is not null && result.GetValue(length) is null)
            problems.Error(FilePosition.WholeFile("--touchstone"), "the line has no length", "add --length, such as --length 50mm");
        if (paths.Touchstone is null && (result.GetValue(length) ?? result.GetValue(reference)) is not null)
            problems.Error(FilePosition.WholeFile("--touchstone"), "length and reference are of a line whose scattering parameters are written", "add --touchstone line.s2p");
        return problems.HasErrors ? null : new SectionSweepRequest(frequencies, paths.Csv, paths.Touchstone, metres, ohms);
    }

    private static FrequencyRange Range(string text, int perDecade, ProblemList problems)
    {
        var at = FilePosition.WholeFile("--sweep");
        if (perDecade is < 1 or > MostPerDecade)
            problems.Error(FilePosition.WholeFile("--per-decade"), $"a decade has 1 to {MostPerDecade} frequencies");
        var ends = text.Split("..");
        if (ends.Length != 2)
        {
            problems.Error(at, "the range needs a lowest and a highest frequency", "write --sweep 1MHz..20GHz");
            return default;
        }
        var hertz = new double[2];
        for (var i = 0; i < 2; i++)
        {
            if (!QuantityParser.TryParse(ends[i].Trim(), Dimension.Frequency, DefaultUnits.None, out var quantity, out var problem, out var advice))
                problems.Error(at, problem, advice);
            hertz[i] = quantity.Value;
        }
        if (!problems.HasErrors && !(hertz[0] >= 1 && hertz[1] <= 1e12))
            problems.Error(at, "frequencies must lie between 1 Hz and 1 THz");
        else if (!problems.HasErrors && !(hertz[0] < hertz[1]))
            problems.Error(at, "the first frequency must lie below the second", "exchange them");
        return new FrequencyRange(hertz[0], hertz[1], perDecade);
    }

    private static double Quantity(Option<string?> option, ParseResult result, Dimension dimension, double? usual, ProblemList problems)
    {
        if (result.GetValue(option) is not { } text)
            return usual ?? 0;
        if (!QuantityParser.TryParse(text, dimension, DefaultUnits.None, out var quantity, out var problem, out var advice))
            problems.Error(FilePosition.WholeFile(option.Name), problem, advice);
        else if (!(quantity.Value > 0) || quantity.Value > 1e6)
            problems.Error(FilePosition.WholeFile(option.Name), "the value must be above zero and at most 1e6 in its SI unit");
        return quantity.Value;
    }
}

/// <summary>A sweep that was asked for.</summary>
/// <param name="Range">The frequencies.</param>
/// <param name="CsvPath">Where the table goes, or null.</param>
/// <param name="TouchstonePath">Where the scattering parameters go, or null.</param>
/// <param name="LengthMetres">Length of the line whose scattering parameters are written, m.</param>
/// <param name="ReferenceOhms">Their reference, ohm.</param>
internal sealed record SectionSweepRequest(FrequencyRange Range, string? CsvPath, string? TouchstonePath, double LengthMetres, double ReferenceOhms);
