using System.Collections.Immutable;

namespace StackTiming.Stackups.Layers;

/// <summary>The layers of a board from the top face to the bottom face.</summary>
/// <param name="Name">Name of the stack-up.</param>
/// <param name="Revision">Its revision, empty where not stated.</param>
/// <param name="Layers">From the top face to the bottom face: mask or none, then copper and dielectrics, then mask or none.</param>
public sealed record StackUp(string Name, string Revision, ImmutableArray<Layer> Layers)
{
    /// <summary>The copper layers from the top face to the bottom face.</summary>
    public IEnumerable<CopperLayer> CopperLayers => Layers.OfType<CopperLayer>();

    /// <summary>The copper layer of that name, or null.</summary>
    /// <param name="name">Layer name, such as <c>L3</c>.</param>
    public CopperLayer? FindCopper(string name) => CopperLayers.FirstOrDefault(l => l.Name == name);
}
