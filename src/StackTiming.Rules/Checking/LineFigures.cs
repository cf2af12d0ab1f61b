using System.Collections.Concurrent;
using StackTiming.Lines.Loss;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Lines.Synthesis;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;
using StackTiming.Waves.Paths;

namespace StackTiming.Rules.Checking;

/// <summary>Widths for target impedances and attenuations, each computed once however many nets ask.</summary>
/// <param name="stackUp">The stack-up.</param>
/// <param name="calculator">Computes the lines.</param>
/// <param name="frequencyHertz">Frequency at which Dk and Df are taken, Hz, or null for the values as stated.</param>
internal sealed class LineFigures(StackUp stackUp, ILineCalculator calculator, double? frequencyHertz)
{
    // Common practice: 50 µm is what fine-line processes hold; wider than 3 mm is a pour, not a trace.
    private static readonly MakeableRange Widths = new(50e-6, 3e-3);

    private readonly ConcurrentDictionary<(string Layer, double Gap, double Ohms), Lazy<double?>> widths = [];
    private readonly ConcurrentDictionary<(LineKey Key, double Hertz), Lazy<(double? DbPerMetre, string Objection)>> attenuations = [];

    /// <summary>The width that has a target impedance, metres, or null.</summary>
    public double? WidthFor(string layer, double gapMetres, double targetOhms) =>
        widths.GetOrAdd((layer, gapMetres, targetOhms), key => new Lazy<double?>(() =>
        {
            var request = new SectionRequest(FilePosition.WholeFile(""), key.Layer, Widths.LeastMetres)
            {
                PairGapMetres = key.Gap > 0 ? key.Gap : null,
                FrequencyHertz = frequencyHertz,
            };
            return new DimensionSearch(stackUp, calculator).Width(request, key.Ohms, Widths).Metres;
        })).Value;

    /// <summary>Attenuation of a line, dB/m, or null with the reason.</summary>
    public (double? DbPerMetre, string Objection) Attenuation(LineKey key, double hertz) =>
        attenuations.GetOrAdd((key, hertz), asked => new Lazy<(double?, string)>(() => Compute(asked.Key, asked.Hertz))).Value;

    private (double?, string) Compute(LineKey key, double hertz)
    {
        var problems = new ProblemList();
        var request = new SectionRequest(FilePosition.WholeFile(""), key.Layer, key.WidthMetres)
        {
            PairGapMetres = key.GapMetres > 0 ? key.GapMetres : null,
            FrequencyHertz = hertz,
        };
        if (SectionBuilder.Build(stackUp, request, problems) is not { } section)
            return (null, problems.Items.First(p => p.IsError).Message);
        if (IncrementalInductance.At(section, hertz, calculator) is not { Modes: [var wave, ..] })
            return (null, calculator.Objection(section) ?? "there is no method for this cross-section");
        return (wave.AttenuationDecibelPerMetre, "");
    }
}
