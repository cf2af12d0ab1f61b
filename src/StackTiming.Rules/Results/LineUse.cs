using System.Collections.Immutable;
using StackTiming.Lines.Solutions;

namespace StackTiming.Rules.Results;

/// <summary>One distinct cross-section of the board and what it does per metre.</summary>
/// <param name="Layer">Copper layer.</param>
/// <param name="WidthMetres">Trace width on the drawing, metres.</param>
/// <param name="GapMetres">Gap inside a pair, metres; null for a single trace.</param>
/// <param name="Z0Ohms">Impedance of a single trace (of one trace of a pair with the other quiet), ohm.</param>
/// <param name="ZDiffOhms">Differential impedance, ohm; null for a single trace.</param>
/// <param name="EpsEff">Effective permittivity: of the single trace, or of the odd mode of a pair.</param>
/// <param name="DelaySecondsPerMetre">Delay, s/m: of the single trace, or of the odd mode of a pair.</param>
/// <param name="Shares">Share of the field energy in each dielectric.</param>
/// <param name="MethodId">Method of the lines, as <c>stacktiming methods</c> lists it.</param>
/// <param name="RelativeError">Documented or estimated relative error of that method.</param>
/// <param name="Warnings">What must be known of the result.</param>
/// <param name="SegmentCount">Segments of the board that have this section.</param>
/// <param name="TotalLengthMetres">Their total length, metres.</param>
public sealed record LineUse(
    string Layer,
    double WidthMetres,
    double? GapMetres,
    double Z0Ohms,
    double? ZDiffOhms,
    double EpsEff,
    double DelaySecondsPerMetre,
    ImmutableArray<DielectricShare> Shares,
    string MethodId,
    double RelativeError,
    ImmutableArray<string> Warnings,
    int SegmentCount,
    double TotalLengthMetres);
