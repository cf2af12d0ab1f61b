using System.Text.Json.Serialization;
using StackTiming.Lines.Loss;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Results;

/// <summary>What <c>stacktiming section --json</c> prints: SI units, matrices by rows; values that do not apply are left out.</summary>
public sealed record SectionResult
{
    /// <summary>Names of the signals in file order: the rows of the matrices.</summary>
    [JsonPropertyName("conductors")]
    public required IReadOnlyList<string> Conductors { get; init; }

    /// <summary>Id of the method.</summary>
    [JsonPropertyName("method")]
    public required string Method { get; init; }

    /// <summary>Documented error of a closed form, or estimated error of the solver; relative.</summary>
    [JsonPropertyName("relative_error")]
    public required double RelativeError { get; init; }

    /// <summary>Frequency, Hz, where lossy.</summary>
    [JsonPropertyName("frequency_hz"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? FrequencyHertz { get; init; }

    /// <summary>Maxwell capacitance matrix, F/m.</summary>
    [JsonPropertyName("c_matrix_f_per_m")]
    public required double[][] CapacitanceMatrix { get; init; }

    /// <summary>Inductance matrix, H/m: external where lossless, with the internal part where lossy.</summary>
    [JsonPropertyName("l_matrix_h_per_m")]
    public required double[][] InductanceMatrix { get; init; }

    /// <summary>Resistance matrix, ohm/m, where lossy.</summary>
    [JsonPropertyName("r_matrix_ohm_per_m"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double[][]? ResistanceMatrix { get; init; }

    /// <summary>Conductance matrix, S/m, where lossy.</summary>
    [JsonPropertyName("g_matrix_s_per_m"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double[][]? ConductanceMatrix { get; init; }

    /// <summary>Characteristic impedance of a single signal, ohm.</summary>
    [JsonPropertyName("z0_ohm"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? Z0 { get; init; }

    /// <summary>Effective permittivity of a single signal.</summary>
    [JsonPropertyName("eps_eff"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? EpsEff { get; init; }

    /// <summary>Delay of a single signal, or of the differential wave of a pair, s/m.</summary>
    [JsonPropertyName("delay_s_per_m"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? Delay { get; init; }

    /// <summary>Odd-mode impedance of a symmetric pair, ohm.</summary>
    [JsonPropertyName("z_odd_ohm"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? ZOdd { get; init; }

    /// <summary>Even-mode impedance of a symmetric pair, ohm.</summary>
    [JsonPropertyName("z_even_ohm"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? ZEven { get; init; }

    /// <summary>Differential impedance of a pair, ohm.</summary>
    [JsonPropertyName("z_diff_ohm"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? ZDiff { get; init; }

    /// <summary>Common-mode impedance of a pair, ohm.</summary>
    [JsonPropertyName("z_common_ohm"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? ZCommon { get; init; }

    /// <summary>Effective permittivity of the odd mode of a symmetric pair.</summary>
    [JsonPropertyName("eps_eff_odd"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? EpsEffOdd { get; init; }

    /// <summary>Effective permittivity of the even mode of a symmetric pair.</summary>
    [JsonPropertyName("eps_eff_even"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? EpsEffEven { get; init; }

    /// <summary>Share of the field energy by dielectric: unit drive of a single signal, differential drive of a pair.</summary>
    [JsonPropertyName("energy_fraction"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public IReadOnlyDictionary<string, double>? EnergyFraction { get; init; }

    /// <summary>Attenuation of a single signal, or of the differential wave of a pair, dB/m, where lossy.</summary>
    [JsonPropertyName("attenuation_db_per_m"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? Attenuation { get; init; }

    /// <summary>Its part from smooth metal, dB/m.</summary>
    [JsonPropertyName("attenuation_conductor_db_per_m"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? AttenuationByConductor { get; init; }

    /// <summary>Its part from roughness, dB/m.</summary>
    [JsonPropertyName("attenuation_roughness_db_per_m"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? AttenuationByRoughness { get; init; }

    /// <summary>Its part from the dielectrics, dB/m.</summary>
    [JsonPropertyName("attenuation_dielectric_db_per_m"), JsonIgnore(Condition = JsonIgnoreCondition.WhenWritingNull)]
    public double? AttenuationByDielectric { get; init; }

    /// <summary>What the reader must know.</summary>
    [JsonPropertyName("warnings")]
    public required IReadOnlyList<string> Warnings { get; init; }

    /// <summary>The values of a solution, lossless or at a frequency.</summary>
    /// <param name="solution">The solution.</param>
    /// <param name="lossy">The same line at a frequency, or null for lossless values.</param>
    public static SectionResult Of(LineSolution solution, LineAtFrequency? lossy)
    {
        var modes = solution.Signals.Length == 2 ? PairModes.Of(solution) : null;
        var single = solution.Signals.Length == 1;
        var wave = lossy is { Modes: [var first, ..] } ? first : null;
        return new SectionResult
        {
            Conductors = solution.Signals,
            Method = solution.MethodId,
            RelativeError = solution.RelativeError,
            FrequencyHertz = lossy?.FrequencyHertz,
            CapacitanceMatrix = Rows(solution.CapacitanceFaradPerMetre),
            InductanceMatrix = Rows(lossy?.InductanceHenryPerMetre ?? solution.InductanceHenryPerMetre),
            ResistanceMatrix = lossy is null ? null : Rows(lossy.ResistanceOhmPerMetre),
            ConductanceMatrix = lossy is null ? null : Rows(lossy.ConductanceSiemensPerMetre),
            Z0 = single ? wave?.Z0Ohms ?? solution.Z0Ohms : null,
            EpsEff = single ? solution.EpsEff : null,
            Delay = wave?.DelaySecondsPerMetre ?? (single ? solution.DelaySecondsPerMetre : modes?.DiffDelaySecondsPerMetre),
            ZOdd = modes?.ZOddOhms,
            ZEven = modes?.ZEvenOhms,
            ZDiff = modes?.ZDiffOhms,
            ZCommon = modes?.ZCommonOhms,
            EpsEffOdd = modes?.EpsEffOdd,
            EpsEffEven = modes?.EpsEffEven,
            EnergyFraction = solution.EnergyShares.IsEmpty ? null : solution.EnergyShares.ToDictionary(s => s.Dielectric, s => s.Share),
            Attenuation = wave?.AttenuationDecibelPerMetre,
            AttenuationByConductor = wave?.ConductorDecibelPerMetre,
            AttenuationByRoughness = wave?.RoughnessDecibelPerMetre,
            AttenuationByDielectric = wave?.DielectricDecibelPerMetre,
            Warnings = lossy?.Warnings ?? solution.Warnings,
        };
    }

    private static double[][] Rows(double[,] matrix)
    {
        var rows = new double[matrix.GetLength(0)][];
        for (var i = 0; i < rows.Length; i++)
        {
            rows[i] = new double[matrix.GetLength(1)];
            for (var j = 0; j < rows[i].Length; j++)
                rows[i][j] = matrix[i, j];
        }
        return rows;
    }
}
