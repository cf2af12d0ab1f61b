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
    double TotalLengthMetres)
{
    /// <summary>What a second method says of the same section, or null where none was asked or none describes it.</summary>
    public CrossCheck? CrossCheck { get; init; }
}

/// <summary>A second method's impedance of a section.</summary>
/// <param name="MethodId">The second method.</param>
/// <param name="Ohms">Its impedance, ohm: differential for a pair.</param>
/// <param name="Difference">Its impedance against that of the first, relative: part of the uncertainty of both.</param>
/// <param name="Allowed">Sum of what both methods say of their errors, relative.</param>
/// <param name="OutsideValidity">True where the second method is used outside its validity range.</param>
public sealed record CrossCheck(string MethodId, double Ohms, double Difference, double Allowed, bool OutsideValidity)
{
    /// <summary>True where the two differ by more than their errors explain.</summary>
    public bool Disagrees => Math.Abs(Difference) > Allowed;
}
