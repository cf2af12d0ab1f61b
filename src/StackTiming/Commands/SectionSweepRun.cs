using System.CommandLine;
using StackTiming.Lines.Sections;
using StackTiming.Reports.Figures;
using StackTiming.Reports.Results;
using StackTiming.Stackups.Reading;
using StackTiming.Terminal;

namespace StackTiming.Commands;

/// <summary><c>stacktiming section FILE --sweep</c>: what is done once the command line is understood.</summary>
internal static class SectionSweepRun
{
    /// <summary>Computes, writes and prints.</summary>
    public static int Run(ParseResult result, SectionSweepRequest request, string path, string method, bool json, string? figure, ProblemList problems)
    {
        var (output, error) = (result.InvocationConfiguration.Output, result.InvocationConfiguration.Error);
        SectionSweep? sweep = null;
        if (InputFileLoader.Load(path, default, problems) is { } text && SectionFileReader.Read(text, problems) is { } placed && !problems.HasErrors)
            sweep = SectionSweep.Of(path, placed, request.Range, MethodOption.Calculator(method), problems);
        if (sweep is not null && request.TouchstonePath is { } named)
            CheckExtension(named, sweep.Lines[0].Signals.Length, problems);
        ProblemPrinter.Print(problems, error);
        if (sweep is null || problems.HasErrors)
            return ExitCode.WrongInput;
        var written = Outputs.Write(
            error, CancellationToken.None,
            (figure, s => FigureOutput.Write(new SweepFigure(sweep.Curves()), sweep.File, figure!, s)),
            (request.CsvPath, sweep.WriteCsv),
            (request.TouchstonePath, s => TouchstoneWriter.Write(
                sweep.Touchstone(request.LengthMetres, request.ReferenceOhms), HasExtension(request.TouchstonePath!, ".ts"), s)));
        if (!written)
            return ExitCode.WrongInput;
        if (json)
            output.WriteLine(sweep.Json());
        else
            sweep.Print(output);
        return ExitCode.Holds;
    }

    // The number of ports of a version 1 file stands in its name alone.
    private static void CheckExtension(string path, int signals, ProblemList problems)
    {
        var extension = signals == 1 ? ".s2p" : ".s4p";
        if (!HasExtension(path, extension) && !HasExtension(path, ".ts"))
            problems.Error(
                FilePosition.WholeFile(path), $"a line of {(signals == 1 ? "one signal has 2" : "two signals has 4")} ports, which the name of the file must say",
                $"name it {Path.GetFileNameWithoutExtension(path)}{extension}, or {Path.GetFileNameWithoutExtension(path)}.ts for version 2.0");
    }

    private static bool HasExtension(string path, string extension) => path.EndsWith(extension, StringComparison.OrdinalIgnoreCase);
}
