using System.Collections.Immutable;
using System.Globalization;
using System.Text.Json;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Loss;
using StackTiming.Lines.Scattering;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Lines.Sweeps;
using StackTiming.Reports.Figures;
using StackTiming.Reports.Results;
using StackTiming.Stackups.Reading;
using StackTiming.Terminal;

namespace StackTiming.Commands;

/// <summary>A cross-section of one or two signals against frequency, and how it is shown.</summary>
/// <param name="File">Name of the section file, without folder.</param>
/// <param name="Method">Name of the calculator.</param>
/// <param name="Lines">The line at each frequency.</param>
internal sealed record SectionSweep(string File, string Method, ImmutableArray<LineAtFrequency> Lines)
{
    /// <summary>Computes the sweep, or null with problems.</summary>
    public static SectionSweep? Of(string path, SectionFile placed, FrequencyRange range, ILineCalculator calculator, ProblemList problems)
    {
        var at = FilePosition.WholeFile(path);
        var signals = placed.Conductors.Count(c => !c.Grounded);
        if (signals > 2)
        {
            problems.Error(at, $"a sweep shows one signal or a pair, and the section has {signals} signals", "write 'grounded: true' for the others");
            return null;
        }
        ImmutableArray<LineAtFrequency>? lines = null;
        string? objection = null;
        try
        {
            lines = LineSweep.Of(
                f => placed.At(f, problems) ?? throw new InvalidOperationException("The section was checked when it was read."), range.Hertz(), calculator);
        }
        catch (SectionNotSolvableException e)
        {
            objection = e.Message.TrimEnd('.');
        }
        if (lines is { } computed)
            return new SectionSweep(Path.GetFileName(path), calculator.Name, computed);
        problems.Error(at, objection ?? $"the {calculator.Name} has no result for this section", objection is null ? "try --method field" : null);
        return null;
    }

    /// <summary>Prints the table.</summary>
    public void Print(TextWriter output)
    {
        var pair = Lines[0].Modes.Length > 1;
        for (var mode = 0; mode < Lines[0].Modes.Length; mode++)
        {
            if (pair)
                output.WriteLine(Lines[0].Modes[mode].Name + " wave");
            var table = Tables.Of(
                ">Frequency", ">Z0 ohm", ">jX ohm", ">Delay ps/mm", ">Loss dB/m", ">copper", ">roughness", ">dielectric", ">R ohm/m", ">L nH/m", ">G mS/m", ">C pF/m");
            foreach (var line in Lines)
            {
                var (wave, of) = (line.Modes[mode], ModeConstants.Of(line, mode));
                table.Add(
                    Frequency(line.FrequencyHertz), Shown(wave.Z0Ohms, "0.000"), Shown(wave.Z0ReactanceOhms, "0.000"), Shown(wave.DelaySecondsPerMetre * 1e9, "0.0000"),
                    Shown(wave.AttenuationDecibelPerMetre), Shown(wave.ConductorDecibelPerMetre), Shown(wave.RoughnessDecibelPerMetre), Shown(wave.DielectricDecibelPerMetre),
                    Shown(of.ResistanceOhmPerMetre), Shown(of.InductanceHenryPerMetre * 1e9, "0.00"), Shown(of.ConductanceSiemensPerMetre * 1e3), Shown(of.CapacitanceFaradPerMetre * 1e12, "0.000"));
            }
            Tables.On(output).Write(table);
        }
        foreach (var warning in Lines.SelectMany(l => l.Warnings).Distinct())
            output.WriteLine(ProblemPrinter.Printable(warning));
    }

    /// <summary>Writes the table as CSV.</summary>
    public void WriteCsv(Stream stream) => CsvTable.Write(
        [
            "frequency[Hz]", "wave", "z0[ohm]", "x0[ohm]", "delay[s/m]", "attenuation[dB/m]", "conductor[dB/m]", "roughness[dB/m]", "dielectric[dB/m]",
            "r[ohm/m]", "l[H/m]", "g[S/m]", "c[F/m]",
        ],
        Lines.SelectMany(line => line.Modes.Select((_, mode) => (IReadOnlyList<string>)
            [Exact(line.FrequencyHertz), line.Modes[mode].Name, .. Values(line, mode).Select(v => Exact(v.Value))])),
        stream);

    /// <summary>The sweep as JSON, SI units.</summary>
    public string Json() => JsonText.Of(writer =>
    {
        writer.WriteStartObject();
        writer.WriteStartArray("conductors");
        foreach (var name in Lines[0].Signals)
            writer.WriteStringValue(name);
        writer.WriteEndArray();
        writer.WriteString("method", Method);
        writer.WriteStartArray("sweep");
        foreach (var line in Lines)
            WriteLine(writer, line);
        writer.WriteEndArray();
        writer.WriteStartArray("warnings");
        foreach (var warning in Lines.SelectMany(l => l.Warnings).Distinct())
            writer.WriteStringValue(warning);
        writer.WriteEndArray();
        writer.WriteEndObject();
    });

    /// <summary>The scattering parameters of a length of the line.</summary>
    public TouchstoneNetwork Touchstone(double lengthMetres, double referenceOhms)
    {
        string Metres(double v) => (v * 1e3).ToString("0.######", CultureInfo.InvariantCulture);
        var names = Lines[0].Signals;
        return new TouchstoneNetwork(
            referenceOhms,
            [.. Lines.Select(l => l.FrequencyHertz)],
            [.. Lines.Select(l => LineScattering.Of(l, lengthMetres, referenceOhms))],
            [
                $"{ToolVersion.Identity}: {Metres(lengthMetres)} mm of the line in {File}",
                $"Prediction from the cross-section by the {Method}; nothing in this file was measured.",
                "Copper from d.c. through skin effect with roughness (Hammerstad), dielectrics by the wideband Debye model.",
                .. names.Select((n, i) => $"Port {i + 1}: near end of {n}; port {names.Length + i + 1}: its far end"),
                .. Lines.SelectMany(l => l.Warnings).Distinct(),
            ]);
    }

    /// <summary>The curves of the figure.</summary>
    public SweepCurves Curves() => new(
        $"{File}, {Method}, a prediction",
        [.. Lines.Select(l => l.FrequencyHertz)],
        [.. Lines[0].Modes.Select((m, mode) => new SweepWave(
            m.Name,
            [.. Lines.Select(l => l.Modes[mode].ConductorDecibelPerMetre)],
            [.. Lines.Select(l => l.Modes[mode].RoughnessDecibelPerMetre)],
            [.. Lines.Select(l => l.Modes[mode].DielectricDecibelPerMetre)],
            [.. Lines.Select(l => l.Modes[mode].DelaySecondsPerMetre)]))]);

    private static void WriteLine(Utf8JsonWriter writer, LineAtFrequency line)
    {
        writer.WriteStartObject();
        writer.WriteNumber("frequency_hz", line.FrequencyHertz);
        writer.WriteStartArray("waves");
        for (var mode = 0; mode < line.Modes.Length; mode++)
        {
            writer.WriteStartObject();
            writer.WriteString("wave", line.Modes[mode].Name);
            foreach (var (name, value) in Values(line, mode))
                JsonText.Number(writer, name, value);
            writer.WriteEndObject();
        }
        writer.WriteEndArray();
        Matrix(writer, "r_matrix_ohm_per_m", line.ResistanceOhmPerMetre);
        Matrix(writer, "l_matrix_h_per_m", line.InductanceHenryPerMetre);
        Matrix(writer, "g_matrix_s_per_m", line.ConductanceSiemensPerMetre);
        Matrix(writer, "c_matrix_f_per_m", line.CapacitanceFaradPerMetre);
        writer.WriteEndObject();
    }

    private static void Matrix(Utf8JsonWriter writer, string name, double[,] matrix)
    {
        writer.WriteStartArray(name);
        for (var i = 0; i < matrix.GetLength(0); i++)
        {
            writer.WriteStartArray();
            for (var j = 0; j < matrix.GetLength(1); j++)
                writer.WriteNumberValue(matrix[i, j]);
            writer.WriteEndArray();
        }
        writer.WriteEndArray();
    }

    // One list for CSV and JSON, so that the two cannot differ.
    private static (string Name, double Value)[] Values(LineAtFrequency line, int mode)
    {
        var (wave, of) = (line.Modes[mode], ModeConstants.Of(line, mode));
        return
        [
            ("z0_ohm", wave.Z0Ohms), ("x0_ohm", wave.Z0ReactanceOhms), ("delay_s_per_m", wave.DelaySecondsPerMetre),
            ("attenuation_db_per_m", wave.AttenuationDecibelPerMetre), ("attenuation_conductor_db_per_m", wave.ConductorDecibelPerMetre),
            ("attenuation_roughness_db_per_m", wave.RoughnessDecibelPerMetre), ("attenuation_dielectric_db_per_m", wave.DielectricDecibelPerMetre),
            ("r_ohm_per_m", of.ResistanceOhmPerMetre), ("l_h_per_m", of.InductanceHenryPerMetre), ("g_s_per_m", of.ConductanceSiemensPerMetre),
            ("c_f_per_m", of.CapacitanceFaradPerMetre),
        ];
    }

    private static string Frequency(double hertz)
    {
        var (scale, unit) = hertz switch { >= 1e9 => (1e-9, "GHz"), >= 1e6 => (1e-6, "MHz"), >= 1e3 => (1e-3, "kHz"), _ => (1, "Hz") };
        return (hertz * scale).ToString("0.###", CultureInfo.InvariantCulture) + " " + unit;
    }

    private static string Shown(double value, string? format = null) =>
        value.ToString(format ?? (Math.Abs(value) is >= 10 or 0 ? "0.00" : "0.0000"), CultureInfo.InvariantCulture);

    private static string Exact(double value) => value.ToString("R", CultureInfo.InvariantCulture);
}
