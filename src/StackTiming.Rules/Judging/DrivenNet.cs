using System.Collections.Immutable;
using StackTiming.Nets.Parts;

namespace StackTiming.Rules.Judging;

/// <summary>A net as one of its drivers sees it: the way to each receiver, and what branches off on the way.</summary>
/// <param name="Net">The net as it was asked for.</param>
/// <param name="Driver">Driver pin, such as <c>U1.A3</c>.</param>
/// <param name="Model">Its driver, or null where the pin only ends the route.</param>
/// <param name="Receivers">The ways, in natural order of the receiver pins.</param>
/// <param name="Stubs">The branches that leave the longest way.</param>
/// <param name="SeriesOhms">Resistance of the series parts on the longest way, ohm.</param>
public sealed record DrivenNet(
    string Net, string Driver, DriverModel? Model, ImmutableArray<ReceiverPath> Receivers, ImmutableArray<StubBranch> Stubs, double SeriesOhms);

/// <summary>The way from a driver to one receiver.</summary>
/// <param name="Receiver">Receiver pin.</param>
/// <param name="Model">Its receiver, or null where the pin has none.</param>
/// <param name="Pieces">What the signal runs through, from the driver's die to the receiver's.</param>
public sealed record ReceiverPath(string Receiver, ReceiverModel? Model, ImmutableArray<PathPiece> Pieces)
{
    /// <summary>Part of the receiver pin.</summary>
    public string Part => PinName.PartOf(Receiver);

    /// <summary>Time of flight along the way: lines, vias and packages without the loads at the ends, s.</summary>
    public double DelaySeconds { get; } = Sum(Pieces);

    /// <summary>Length of the traces along the way, metres.</summary>
    public double LengthMetres { get; } = SumLength(Pieces);

    private static double Sum(ImmutableArray<PathPiece> pieces)
    {
        var sum = 0.0;
        foreach (var piece in pieces)
            sum += piece.DelaySeconds;
        return sum;
    }

    private static double SumLength(ImmutableArray<PathPiece> pieces)
    {
        var sum = 0.0;
        foreach (var piece in pieces)
            sum += piece.Kind == PieceKind.Trace ? piece.LengthMetres : 0;
        return sum;
    }
}

/// <summary>What a piece of a way is.</summary>
public enum PieceKind : byte
{
    /// <summary>A trace.</summary>
    Trace,
    /// <summary>A via.</summary>
    Via,
    /// <summary>A package between die and pin.</summary>
    Package,
    /// <summary>A part in series.</summary>
    SeriesPart,
}

/// <summary>A piece of a way.</summary>
/// <param name="Kind">What it is.</param>
/// <param name="Net">The net of the length list that it belongs to; empty for parts.</param>
/// <param name="Layer">Layer of a trace.</param>
/// <param name="LengthMetres">Length of a trace, height of a via, metres.</param>
/// <param name="WidthMetres">Width of a trace, metres.</param>
/// <param name="GapMetres">Gap to the other member of the pair, metres; 0 where it runs alone.</param>
/// <param name="DelaySeconds">Its delay, s.</param>
/// <param name="Z0Ohms">Impedance that an edge meets, ohm; NaN where it is no line.</param>
public readonly record struct PathPiece(
    PieceKind Kind, string Net, string Layer, double LengthMetres, double WidthMetres, double GapMetres, double DelaySeconds, double Z0Ohms);

/// <summary>A branch that leaves the longest way of a net.</summary>
/// <param name="At">Where it leaves.</param>
/// <param name="End">Its farthest end: a pin or a branch label.</param>
/// <param name="DelaySeconds">Delay from where it leaves to that end, s.</param>
/// <param name="LengthMetres">Trace length to that end, metres.</param>
/// <param name="Layer">Layer of its longest trace.</param>
/// <param name="DelayPerMetre">Delay of that trace, s/m.</param>
public readonly record struct StubBranch(
    string At, string End, double DelaySeconds, double LengthMetres, string Layer, double DelayPerMetre);

/// <summary>Takes pin names apart.</summary>
public static class PinName
{
    /// <summary>The part of a pin: <c>U1</c> of <c>U1.A3</c>.</summary>
    /// <param name="pin">The pin.</param>
    public static string PartOf(string pin)
    {
        var dot = pin.IndexOf('.', StringComparison.Ordinal);
        return dot < 0 ? pin : pin[..dot];
    }
}
