using System.Collections.Immutable;
using StackTiming.Nets.Lengths;
using StackTiming.Stackups.Layers;
using StackTiming.Waves.Paths;

namespace StackTiming.Rules.Judging;

/// <summary>
/// What rules ask of a board: its traces, what they do per metre, its delays and its waveforms. Every answer is computed once however many rules
/// ask for it, and does not depend on who asks first. Safe on several threads. Where there is no answer, <c>objection</c> says why, in a sentence
/// without a full stop.
/// </summary>
public interface IBoardPhysics
{
    /// <summary>The stack-up.</summary>
    StackUp StackUp { get; }

    /// <summary>What the board file says of signals where parts and rules do not.</summary>
    SignalAssumptions Assumed { get; }

    /// <summary>Name of the calculator of the lines, such as <c>closed form</c>.</summary>
    string CalculatorName { get; }

    /// <summary>The segments of a net in file order; empty where it has none.</summary>
    /// <param name="net">The net.</param>
    ReadOnlySpan<Segment> SegmentsOf(string net);

    /// <summary>What a trace does per metre.</summary>
    /// <param name="trace">A trace segment.</param>
    /// <param name="objection">Why there is no answer.</param>
    BoardLine? LineOf(in Segment trace, out string objection);

    /// <summary>The width at which a trace on a layer has an impedance.</summary>
    /// <param name="layer">Layer.</param>
    /// <param name="gapMetres">Gap inside the pair, metres; 0 for a single trace.</param>
    /// <param name="targetOhms">Wanted impedance: differential where there is a gap and <paramref name="differential"/>, of the single trace otherwise.</param>
    /// <param name="differential">Whether the differential impedance is meant.</param>
    /// <returns>The width in metres, or null where no width has it.</returns>
    double? WidthFor(string layer, double gapMetres, double targetOhms, bool differential);

    /// <summary>Attenuation of a trace at a frequency.</summary>
    /// <param name="trace">A trace piece of a way.</param>
    /// <param name="hertz">Frequency, Hz.</param>
    /// <param name="objection">Why there is no answer.</param>
    /// <returns>dB per metre, or null.</returns>
    double? AttenuationDbPerMetre(in PathPiece trace, double hertz, out string objection);

    /// <summary>A net as its drivers see it.</summary>
    /// <param name="net">The net.</param>
    /// <param name="drive">Which drivers.</param>
    /// <param name="objection">Why there is no answer.</param>
    /// <returns>One entry for every driver meant; empty where there is none.</returns>
    ImmutableArray<DrivenNet> Drives(string net, DriveChoice drive, out string objection);

    /// <summary>Flight time of an edge from a driver to a receiver, against the reference load.</summary>
    /// <param name="driven">The net from its driver.</param>
    /// <param name="receiver">Receiver pin.</param>
    /// <param name="edge">The edge.</param>
    /// <param name="objection">Why there is no answer.</param>
    /// <returns>Flight time, s, or null.</returns>
    double? FlightTime(DrivenNet driven, string receiver, Edge edge, out string objection);

    /// <summary>What a receiver sees when its driver sends an edge.</summary>
    /// <param name="driven">The net from its driver.</param>
    /// <param name="receiver">Receiver pin.</param>
    /// <param name="edge">The edge.</param>
    /// <param name="objection">Why there is no answer.</param>
    ReceiverResponse? Response(DrivenNet driven, string receiver, Edge edge, out string objection);

    /// <summary>What a receiver would see with another resistance in series with the driver.</summary>
    /// <param name="driven">The net from its driver.</param>
    /// <param name="receiver">Receiver pin.</param>
    /// <param name="edge">The edge.</param>
    /// <param name="addedOhms">Resistance to add, ohm; negative to take away.</param>
    /// <returns>The response, or null where there is none.</returns>
    ReceiverResponse? ResponseWithAddedSeries(DrivenNet driven, string receiver, Edge edge, double addedOhms);
}
