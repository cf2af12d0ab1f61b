using SkiaSharp;
using StackTiming.Reports.Appearance;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Figures;
using StackTiming.Rules.Results;
using StackTiming.Waves.Metrics;
using StackTiming.Waves.Responses;

namespace StackTiming.Commands;

/// <summary>The waveforms of a net, one receiver below the other.</summary>
internal sealed class NetFigure : IDrawing
{
    private const int Points = 1500;
    private const float TitleHeight = 16;

    private readonly (string Name, WaveformFigure Figure)[] figures;

    private NetFigure((string, WaveformFigure)[] figures) => this.figures = figures;

    /// <summary>The figure of a solved net.</summary>
    public static NetFigure Of(NetSubject subject, NetResponse response) =>
        new([.. subject.Receivers.Select((name, i) => (name, new WaveformFigure(Wave(subject, response, i))))]);

    /// <inheritdoc/>
    public float HeightFor(float width) => figures.Sum(f => TitleHeight + f.Figure.HeightFor(width));

    /// <inheritdoc/>
    public void Draw(SKCanvas canvas, float width, float height)
    {
        var y = 0f;
        using var pen = new Pen(canvas);
        foreach (var (name, figure) in figures)
        {
            pen.Text(Pen.Fit(name, TextStyle.Label, width), TextStyle.Label, 0, y + TitleHeight - 5);
            y += TitleHeight;
            var own = figure.HeightFor(width);
            canvas.Save();
            canvas.Translate(0, y);
            figure.Draw(canvas, width, own);
            canvas.Restore();
            y += own;
        }
    }

    private static ReceiverWave Wave(NetSubject subject, NetResponse response, int receiver)
    {
        var metrics = response.Metrics[receiver];
        var levels = response.Network.Receivers[receiver].Thresholds;
        var end = Math.Min(response.Network.DurationSeconds, 1.3 * (metrics.SettleSeconds ?? response.Network.DurationSeconds));
        var times = new double[Points];
        for (var k = 0; k < Points; k++)
            times[k] = end * k / (Points - 1);
        var step = response.Response.StepSeconds;
        double[] Sampled(NodeVoltage voltage) => Array.ConvertAll(times, t => voltage.At(t, step));
        var marks = new List<WaveMark>();
        if (metrics.FirstMidSeconds is { } mid && levels is { } l)
            marks.Add(new WaveMark("first crossing of the threshold", mid, l.MidVolts));
        if (metrics.RingbackVolts is { } ringback)
            marks.Add(new WaveMark("ringback", double.NaN, ringback));
        if (metrics.SettleSeconds is { } settled)
            marks.Add(new WaveMark("settled within 5 %", settled, metrics.FinalVolts));
        return new ReceiverWave(
            subject.Name, "", subject.Receivers[receiver], response.Network.Stimulus.EndsHigh ? "rise" : "fall", times,
            Sampled(response.Response.Receivers[receiver]), Sampled(response.Response.Pin), levels?.VilVolts, levels?.VihVolts, levels?.MidVolts,
            [.. marks], [], null);
    }
}
