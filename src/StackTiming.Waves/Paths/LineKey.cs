using StackTiming.Nets.Lengths;

namespace StackTiming.Waves.Paths;

/// <summary>What the constants per metre of a trace depend on; a board has few different ones.</summary>
/// <param name="Layer">Copper layer.</param>
/// <param name="WidthMetres">Width on the drawing, metres.</param>
/// <param name="GapMetres">Spacing to the other member of the pair, metres; 0 where the trace runs alone.</param>
public readonly record struct LineKey(string Layer, double WidthMetres, double GapMetres)
{
    /// <summary>The key of a trace.</summary>
    /// <param name="trace">A trace of a length list.</param>
    public static LineKey Of(in Segment trace) => new(trace.Layer, trace.WidthMetres, trace.GapMetres);
}
