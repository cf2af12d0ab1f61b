using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Judging;
using StackTiming.Rules.Results;

namespace StackTiming.Rules.Checking;

/// <summary>Chooses the waveforms that a report draws: those behind findings that fail or are close, the worst first.</summary>
internal static class KeptWaves
{
    /// <summary>The waveforms, solved again, because a check keeps none.</summary>
    /// <param name="judged">What the rules judged.</param>
    /// <param name="physics">The board.</param>
    /// <param name="options">How many and how close.</param>
    public static ImmutableArray<ReceiverWave> Of(IEnumerable<JudgedWave> judged, BoardPhysics physics, CheckOptions options)
    {
        var chosen = judged.GroupBy(w => (w.Driver, w.Receiver, w.Edge))
            .Select(g => g.OrderBy(w => w.RelativeMargin).ThenBy(w => w.Rule, NaturalOrder.Instance).ToArray())
            .Where(g => g[0].RelativeMargin < options.CloseMargin)
            .OrderBy(g => g[0].RelativeMargin)
            .ThenBy(g => g[0].Net, NaturalOrder.Instance).ThenBy(g => g[0].Receiver, NaturalOrder.Instance).ThenBy(g => g[0].Edge)
            .Take(options.MostWaves);
        var waves = ImmutableArray.CreateBuilder<ReceiverWave>();
        foreach (var group in chosen)
        {
            options.Cancellation.ThrowIfCancellationRequested();
            if (physics.Waveform(group[0]) is { } wave)
                waves.Add(wave with { Rules = [.. group.Select(w => w.Rule).Distinct()], WorstRelativeMargin = group[0].RelativeMargin });
        }
        return waves.ToImmutable();
    }

    /// <summary>The judged instants and levels of a waveform.</summary>
    /// <param name="response">The response.</param>
    /// <param name="edge">The edge.</param>
    public static ImmutableArray<WaveMark> Marks(ReceiverResponse response, Edge edge)
    {
        var rises = edge == Edge.Rise;
        var (threshold, name) = rises ? (response.VihVolts, "vih") : (response.VilVolts, "vil");
        var marks = ImmutableArray.CreateBuilder<WaveMark>();
        if (threshold is { } level)
        {
            if (response.FirstLevelSeconds is { } first)
                marks.Add(new WaveMark($"first crossing of {name}", first, level));
            if (response.FinalLevelSeconds is { } last && last != response.FirstLevelSeconds)
                marks.Add(new WaveMark($"last crossing of {name}", last, level));
            if (response.FirstLevelSeconds is not null && response.RingbackVolts is { } back && back != response.FinalVolts)
                marks.Add(new WaveMark("ringback", double.NaN, back));
            if (response.FirstWaveVolts is { } wave)
                marks.Add(new WaveMark("first wave", double.NaN, wave));
        }
        if (response.OvershootVolts > 0)
            marks.Add(new WaveMark(rises ? "overshoot" : "undershoot", double.NaN, response.FinalVolts + (rises ? response.OvershootVolts : -response.OvershootVolts)));
        marks.Add(new WaveMark("settled within 5 %", response.SettledSeconds, double.NaN));
        return marks.ToImmutable();
    }
}
