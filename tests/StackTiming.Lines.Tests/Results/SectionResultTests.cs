using System.Text.Json;
using StackTiming.Lines.Loss;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Results;
using Xunit;

namespace StackTiming.Lines.Tests.Results;

public sealed class SectionResultTests
{
    [Fact]
    public void Single_line_prints_the_values_of_the_format_and_no_others()
    {
        var solution = ClosedForms.Calculate(ReferenceSections.Named("F2_microstrip_mask").Section)!;

        var json = JsonDocument.Parse(JsonSerializer.Serialize(SectionResult.Of(solution, null))).RootElement;

        Assert.Equal(
            ["c_matrix_f_per_m", "conductors", "delay_s_per_m", "energy_fraction", "eps_eff", "l_matrix_h_per_m", "method", "relative_error", "warnings", "z0_ohm"],
            json.EnumerateObject().Select(p => p.Name).Order(StringComparer.Ordinal));
        Assert.Equal(solution.Z0Ohms, json.GetProperty("z0_ohm").GetDouble());
        Assert.Equal(["prepreg", "mask", "air"], json.GetProperty("energy_fraction").EnumerateObject().Select(p => p.Name));
        Assert.Equal(solution.CapacitanceFaradPerMetre[0, 0], json.GetProperty("c_matrix_f_per_m")[0][0].GetDouble());
    }

    [Fact]
    public void Lossy_pair_prints_its_modes_matrices_and_attenuation()
    {
        var section = ReferenceSections.Named("F8_pair_stripline_2d").Section;
        var solution = ClosedForms.Calculate(section)!;
        var lossy = IncrementalInductance.At(section, 1e9, ClosedForms.Calculator)!;

        var result = SectionResult.Of(solution, lossy);

        Assert.Equal(2 * result.ZOdd!.Value, result.ZDiff!.Value, 9);
        Assert.Equal(0.5 * result.ZEven!.Value, result.ZCommon!.Value, 9);
        Assert.Equal(lossy.ResistanceOhmPerMetre[0, 1], result.ResistanceMatrix![0][1]);
        Assert.Equal(lossy.Modes[0].AttenuationDecibelPerMetre, result.Attenuation);
        Assert.Null(result.Z0);
        Assert.Equal(1e9, result.FrequencyHertz);
    }

    [Fact]
    public void Three_traces_print_matrices_only()
    {
        var result = SectionResult.Of(ClosedForms.Calculate(ReferenceSections.Named("F12_three_mask").Section)!, null);

        Assert.Equal(3, result.CapacitanceMatrix.Length);
        Assert.Null(result.ZDiff);
        Assert.Null(result.EnergyFraction);
    }
}
