using System.Collections.Immutable;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Lines.Sections;

/// <summary>The infinite planes that bound a section, as indices into the layers of the stack-up; −1 and the number of layers stand for open space.</summary>
/// <param name="Above">Index of the plane above the traces, or −1.</param>
/// <param name="Below">Index of the plane below, or the number of layers.</param>
internal readonly record struct BoundingPlanes(int Above, int Below)
{
    /// <summary>The planes around conductors, or null with a problem where a plane lies between them.</summary>
    /// <param name="stackUp">The stack-up.</param>
    /// <param name="placed">The conductors; a plane with edges is one of them and does not bound.</param>
    /// <param name="problems">Where problems go.</param>
    public static BoundingPlanes? Around(StackUp stackUp, ImmutableArray<PlacedConductor> placed, ProblemList problems)
    {
        var layers = stackUp.Layers;
        var own = placed.Select(c => c.Layer).ToHashSet(StringComparer.Ordinal);
        int highest = layers.Length, lowest = -1;
        for (var i = 0; i < layers.Length; i++)
        {
            if (layers[i] is CopperLayer copper && own.Contains(copper.Name))
            {
                highest = Math.Min(highest, i);
                lowest = i;
            }
        }
        for (var i = highest; i <= lowest; i++)
        {
            if (IsWholePlane(layers[i], own, out var name))
            {
                problems.Error(
                    placed[0].At, $"plane {name} lies between the conductors of this section, so they do not couple",
                    $"make one section for each side of it, or give {name} edges with 'from' and 'to'");
                return null;
            }
        }
        int above = highest - 1, below = lowest + 1;
        while (above >= 0 && !IsWholePlane(layers[above], own, out _))
            above--;
        while (below < layers.Length && !IsWholePlane(layers[below], own, out _))
            below++;
        return new BoundingPlanes(above, below);
    }

    private static bool IsWholePlane(Layer layer, HashSet<string> placed, out string name)
    {
        name = (layer as CopperLayer)?.Name ?? "";
        return layer is CopperLayer { Use: CopperUse.Plane } && !placed.Contains(name);
    }
}
