using System.Collections.Immutable;

namespace StackTiming.Waves.Networks;

/// <summary>
/// An electrical net as circuit: lines between nodes, lumped elements at the nodes, one driver and its stimulus. Nodes are numbers from 0,
/// so that solvers need no names; <see cref="NetworkBuilder"/> makes one from names, <see cref="NetworkCheck"/> says what is wrong with one.
/// </summary>
/// <param name="NodeNames">The name of every node.</param>
/// <param name="Lines">Lines without loss.</param>
/// <param name="LossyLines">Lines with conductor and dielectric loss.</param>
/// <param name="CoupledLines">Groups of coupled lines without loss.</param>
/// <param name="Series">Elements between two nodes.</param>
/// <param name="Shunts">Elements from a node to ground or to a supply.</param>
/// <param name="Driver">The driver.</param>
/// <param name="Receivers">The receivers, at which the response is judged.</param>
/// <param name="Stimulus">What the driver sends.</param>
/// <param name="ReferenceLoad">The load against which flight time is measured, or null.</param>
/// <param name="DurationSeconds">Length of the observed window, in seconds, from the start of the first ramp.</param>
public sealed record Network(
    ImmutableArray<string> NodeNames,
    ImmutableArray<LosslessLine> Lines,
    ImmutableArray<LossyLine> LossyLines,
    ImmutableArray<CoupledLines> CoupledLines,
    ImmutableArray<SeriesBranch> Series,
    ImmutableArray<Shunt> Shunts,
    Driver Driver,
    ImmutableArray<Receiver> Receivers,
    Stimulus Stimulus,
    ReferenceLoad? ReferenceLoad,
    double DurationSeconds)
{
    /// <summary>The open-circuit voltage of the driver's source over time.</summary>
    public SourceWaveform Source => Stimulus.Source(Driver.LowVolts, Driver.HighVolts);

    /// <summary>The driver with nothing but the reference load on its pin, under the same stimulus: the zero of flight time. Null without one.</summary>
    public Network? WithReferenceLoadAlone()
    {
        if (ReferenceLoad is not { } load)
            return null;
        return new Network(
            [NodeNames[Driver.Node]], [], [], [], [],
            [new Shunt(0, load.CapacitanceFarads, load.ResistanceOhms, load.ToVolts, InductanceHenries: null)],
            Driver with { Node = 0 },
            [new Receiver(0, CapacitanceFarads: 0, ResistanceOhms: null, ToVolts: 0, Thresholds: null)],
            Stimulus, ReferenceLoad: null, DurationSeconds);
    }
}
