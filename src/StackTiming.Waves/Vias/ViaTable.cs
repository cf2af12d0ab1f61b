using StackTiming.Nets.Lengths;
using StackTiming.Stackups.Layers;

namespace StackTiming.Waves.Vias;

/// <summary>The vias of a board, each kind of hole modelled once.</summary>
public sealed class ViaTable
{
    private readonly Dictionary<ViaHole, (ViaModel? Via, string Objection)> vias = [];

    /// <summary>Models the vias of a list.</summary>
    /// <param name="stackUp">The stack-up.</param>
    /// <param name="lengths">The list.</param>
    /// <param name="frequencyHertz">Frequency at which the permittivities are taken, Hz; null for the values as stated.</param>
    public ViaTable(StackUp stackUp, LengthList lengths, double? frequencyHertz)
    {
        var builder = new ViaBuilder(stackUp, frequencyHertz);
        var last = default(ViaHole);
        foreach (ref readonly var segment in lengths.Segments)
        {
            if (segment.Kind != SegmentKind.Via || ViaHole.Of(segment) is var hole && hole == last)
                continue;
            last = ViaHole.Of(segment);
            if (!vias.ContainsKey(last))
                vias.Add(last, (builder.Build(last, out var objection), objection));
        }
    }

    /// <summary>The kinds of hole that could be modelled.</summary>
    public IEnumerable<(ViaHole Hole, ViaModel Model)> Models => vias.Where(v => v.Value.Via is not null).Select(v => (v.Key, v.Value.Via!));

    /// <summary>The model of a via.</summary>
    /// <param name="hole">What its row says.</param>
    /// <param name="objection">Why there is none, in a sentence without a full stop; empty where there is one.</param>
    public ViaModel? Find(ViaHole hole, out string objection)
    {
        var known = vias.TryGetValue(hole, out var found);
        objection = known ? found.Objection : $"no via from {hole.Layer} to {hole.ToLayer} has been modelled";
        return found.Via;
    }
}
