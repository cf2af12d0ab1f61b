using System.Collections.Immutable;
using StackTiming.Lines.Materials;
using StackTiming.Stackups.Layers;

namespace StackTiming.Waves.Vias;

/// <summary>
/// Takes the heights and permittivities of vias from a stack-up. Lengths run from mid-copper to mid-copper. Where a length list
/// states no diameters, common practice is assumed: a hole of 0.25 mm, a pad 0.25 mm wider than the hole, a clearance 0.25 mm wider than the pad;
/// where it states no barrel, the hole goes through the whole board.
/// </summary>
/// <param name="stackUp">The stack-up.</param>
/// <param name="frequencyHertz">Frequency at which the permittivities are taken, Hz; null for the values as stated.</param>
public sealed class ViaBuilder(StackUp stackUp, double? frequencyHertz)
{
    /// <summary>Hole diameter where none is stated, metres (common practice).</summary>
    public const double AssumedDrillMetres = 0.25e-3;

    /// <summary>How much wider a pad is than its hole, and a clearance than its pad, where not stated, metres (common practice).</summary>
    public const double AssumedRingMetres = 0.25e-3;

    private readonly ViaSpan span = new(stackUp, frequencyHertz);

    /// <summary>The model of a via.</summary>
    /// <param name="hole">What the length list says of it.</param>
    /// <param name="objection">Why there is none, in a sentence without a full stop; empty where there is one.</param>
    public ViaModel? Build(ViaHole hole, out string objection)
    {
        var copper = span.Copper;
        var (a, b) = (span.Find(hole.Layer), span.Find(hole.ToLayer));
        var first = hole.BarrelFirst.Length == 0 ? 0 : span.Find(hole.BarrelFirst);
        var last = hole.BarrelSecond.Length == 0 ? copper.Length - 1 : span.Find(hole.BarrelSecond);
        foreach (var (index, name) in (ReadOnlySpan<(int, string)>)[(a, hole.Layer), (b, hole.ToLayer), (first, hole.BarrelFirst), (last, hole.BarrelSecond)])
        {
            if (index >= 0)
                continue;
            objection = $"the stack-up has no copper layer '{name}'";
            return null;
        }
        var (upper, lower) = (Math.Min(a, b), Math.Max(a, b));
        var (top, bottom) = (Math.Min(first, last), Math.Max(first, last));
        if (upper < top || lower > bottom)
        {
            objection = $"the barrel from {copper[top].Name} to {copper[bottom].Name} does not reach from {hole.Layer} to {hole.ToLayer}";
            return null;
        }
        var assumptions = ImmutableArray.CreateBuilder<string>();
        var drill = Stated(hole.DrillMetres, AssumedDrillMetres, "hole", assumptions);
        var pad = Stated(hole.PadMetres, drill + AssumedRingMetres, "pad", assumptions);
        var antipad = Stated(hole.AntipadMetres, Math.Max(pad, drill) + AssumedRingMetres, "clearance", assumptions);
        if (hole.BarrelFirst.Length == 0 && hole.BarrelSecond.Length == 0 && lower - upper < bottom - top)
            assumptions.Add("the hole is taken to go through the whole board");
        if (!(drill < pad && pad < antipad))
        {
            objection = FormattableString.Invariant(
                $"the diameters of the via do not grow from hole ({1e3 * drill:G4} mm) to pad ({1e3 * pad:G4} mm) to clearance ({1e3 * antipad:G4} mm)");
            return null;
        }
        objection = "";
        var (through, dkThrough) = span.Between(upper, lower);
        var (above, dkAbove) = span.Between(top, upper);
        var (below, dkBelow) = span.Between(lower, bottom);
        var stubs = above + below;
        var geometry = new ViaGeometry(
            through, above, below, drill, pad, antipad, copper[a].Thickness.Value + copper[b].Thickness.Value, dkThrough,
            stubs > 0 ? (above * dkAbove + below * dkBelow) / stubs : dkThrough);
        return new ViaModel(geometry, assumptions.DrainToImmutable());
    }

    private static double Stated(double metres, double assumed, string what, ImmutableArray<string>.Builder assumptions)
    {
        if (metres > 0)
            return metres;
        assumptions.Add(FormattableString.Invariant($"the {what} is taken to be {1e3 * assumed:0.###} mm wide"));
        return assumed;
    }
}

/// <summary>Distances between copper layers, and the mean permittivity of what lies between.</summary>
internal sealed class ViaSpan
{
    private readonly double[] middles;
    private readonly double[] dkIntegrals;

    public ViaSpan(StackUp stackUp, double? frequencyHertz)
    {
        Copper = [.. stackUp.CopperLayers];
        middles = new double[Copper.Length];
        dkIntegrals = new double[Copper.Length];
        double depth = 0, integral = 0;
        var next = 0;
        // Clearances in copper are filled with resin: they count as part of the dielectric above, the topmost as part of that below.
        var dk = stackUp.Layers.OfType<DielectricLayer>().Select(l => DkOf(l, frequencyHertz)).FirstOrDefault(1);
        foreach (var layer in stackUp.Layers)
        {
            if (layer is DielectricLayer dielectric)
            {
                dk = DkOf(dielectric, frequencyHertz);
                depth += dielectric.Thickness.Value;
                integral += dk * dielectric.Thickness.Value;
            }
            else if (layer is CopperLayer copper)
            {
                var half = 0.5 * copper.Thickness.Value;
                middles[next] = depth + half;
                dkIntegrals[next] = integral + dk * half;
                next++;
                depth += 2 * half;
                integral += 2 * half * dk;
            }
        }
    }

    /// <summary>The copper layers from the top face to the bottom face.</summary>
    public ImmutableArray<CopperLayer> Copper { get; }

    /// <summary>The place of a copper layer, or −1.</summary>
    public int Find(string name)
    {
        for (var i = 0; i < Copper.Length; i++)
        {
            if (Copper[i].Name == name)
                return i;
        }
        return -1;
    }

    /// <summary>Distance between the middles of two copper layers in metres, and the mean permittivity between them.</summary>
    public (double Metres, double Dk) Between(int upper, int lower)
    {
        var metres = middles[lower] - middles[upper];
        return (metres, metres > 0 ? (dkIntegrals[lower] - dkIntegrals[upper]) / metres : 1);
    }

    private static double DkOf(DielectricLayer layer, double? frequencyHertz)
    {
        var material = layer.Material;
        var (dk, df) = (material.Dk.Value, material.Df.Value);
        return frequencyHertz is { } hertz && df > 0 ? WidebandDebye.Through(dk, df, material.AtHertz).Dk(hertz) : dk;
    }
}
