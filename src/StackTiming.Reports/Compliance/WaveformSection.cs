using System.Collections.Immutable;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Figures;
using StackTiming.Rules.Results;

namespace StackTiming.Reports.Compliance;

/// <summary>The waveforms of the nets whose reflection rules fail or are close.</summary>
internal static class WaveformSection
{
    private const int FiguresShown = 12;

    /// <summary>The section.</summary>
    /// <param name="result">The results of the check.</param>
    /// <param name="judgements">The findings by rule.</param>
    public static Section Build(CheckResult result, Judgements judgements)
    {
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(new Paragraph("Nets whose reflection rules fail or are close, worst first. Time counts from the start of the edge at the source; the numbered marks are the judged instants."));
        foreach (var wave in result.Waves.Take(FiguresShown))
        {
            var figure = new WaveformFigure(wave);
            var runs = ImmutableArray.CreateBuilder<Run>();
            runs.Add(new Run(wave.Net, Emphasis.Strong));
            runs.Add(new Run($"  {(wave.Edge == "fall" ? "falling" : wave.Edge == "rise" ? "rising" : wave.Edge)} edge, {wave.Driver} to {wave.Receiver}."));
            for (var i = 0; i < wave.Rules.Length; i++)
            {
                runs.Add(new Run(i == 0 ? " Judged by " : ", "));
                runs.Add(new Run(wave.Rules[i], Emphasis.Plain, judgements.AnchorOf(wave.Rules[i])));
            }
            if (!wave.Marks.IsEmpty)
                runs.Add(new Run((wave.Rules.IsEmpty ? " " : ". ") + figure.Legend() + "."));
            blocks.Add(new Figure(figure, new RichText(runs.ToImmutable()), $"Voltage over time at {wave.Receiver} and {wave.Driver} on {wave.Net}"));
        }
        if (result.Waves.Length > FiguresShown)
            blocks.Add(new Paragraph($"… and {result.Waves.Length - FiguresShown} more waveforms that are further from failing."));
        return new Section(Anchors.Waveforms, "Waveforms", blocks.ToImmutable(), []) { BeginsPage = true };
    }
}
