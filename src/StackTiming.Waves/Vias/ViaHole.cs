using StackTiming.Nets.Lengths;

namespace StackTiming.Waves.Vias;

/// <summary>What a row of a length list says of a via; equal holes have equal models. Lengths of 0 are not stated.</summary>
/// <param name="Layer">Layer where the signal enters.</param>
/// <param name="ToLayer">Layer where it leaves.</param>
/// <param name="BarrelFirst">One end of the drilled barrel, or empty for the top layer.</param>
/// <param name="BarrelSecond">The other end, or empty for the bottom layer.</param>
/// <param name="DrillMetres">Hole diameter, metres.</param>
/// <param name="PadMetres">Pad diameter, metres.</param>
/// <param name="AntipadMetres">Clearance diameter, metres.</param>
public readonly record struct ViaHole(
    string Layer, string ToLayer, string BarrelFirst, string BarrelSecond, double DrillMetres, double PadMetres, double AntipadMetres)
{
    /// <summary>The hole of a row.</summary>
    /// <param name="via">A via of a length list.</param>
    public static ViaHole Of(in Segment via)
    {
        var details = via.Details;
        return new ViaHole(
            via.Layer, via.ToLayer, details.BarrelFirst, details.BarrelSecond, details.DrillMetres, details.PadMetres, details.AntipadMetres);
    }
}
