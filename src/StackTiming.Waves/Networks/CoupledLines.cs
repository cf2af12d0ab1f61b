using System.Collections.Immutable;

namespace StackTiming.Waves.Networks;

/// <summary>Conductors that run side by side and couple, without loss. Conductor k leads from node From[k] to node To[k].</summary>
/// <param name="From">Nodes of the near ends.</param>
/// <param name="To">Nodes of the far ends, in the same order.</param>
/// <param name="Modes">The modes that travel on the group without coupling to each other.</param>
public sealed record CoupledLines(ImmutableArray<int> From, ImmutableArray<int> To, ImmutableArray<LineMode> Modes)
{
    /// <summary>A symmetric pair given by its even and odd mode. Both impedances are those of one conductor against ground.</summary>
    /// <param name="from">Nodes of the two near ends.</param>
    /// <param name="to">Nodes of the two far ends.</param>
    /// <param name="zEvenOhms">Impedance of one conductor while both carry the same voltage, in ohms.</param>
    /// <param name="zOddOhms">Impedance of one conductor while they carry opposite voltages, in ohms.</param>
    /// <param name="delayEvenSeconds">Delay of the even mode, in seconds.</param>
    /// <param name="delayOddSeconds">Delay of the odd mode, in seconds.</param>
    public static CoupledLines SymmetricPair(
        (int A, int B) from, (int A, int B) to, double zEvenOhms, double zOddOhms, double delayEvenSeconds, double delayOddSeconds) =>
        new(
            [from.A, from.B], [to.A, to.B],
            [
                new LineMode([0.5, 0.5], [1, 1], zEvenOhms / 2, delayEvenSeconds),
                new LineMode([0.5, -0.5], [1, -1], zOddOhms / 2, delayOddSeconds),
            ]);
}

/// <summary>
/// A mode of coupled lines. Its voltage is Σ weight·v over the conductors; conversely the mode alone puts pattern·(mode voltage) on them. The current that
/// it drives into conductor k is weight[k]·(mode current), so that the power of the conductors is the sum of the powers of the modes.
/// </summary>
/// <param name="Weights">Row of the inverse of the voltage mode matrix: conductor voltages to mode voltage.</param>
/// <param name="Pattern">Column of the voltage mode matrix: the voltages of the conductors when only this mode is there, for one volt of it.</param>
/// <param name="ImpedanceOhms">Mode voltage over mode current of a wave, in ohms.</param>
/// <param name="DelaySeconds">Delay from end to end, in seconds.</param>
public sealed record LineMode(ImmutableArray<double> Weights, ImmutableArray<double> Pattern, double ImpedanceOhms, double DelaySeconds);
