using StackTiming.Stackups.Quantities;

namespace StackTiming.Stackups.Copper;

/// <summary>Which face of a copper layer is the wide one.</summary>
public enum WideFace
{
    /// <summary>The upper face.</summary>
    Up,
    /// <summary>The lower face.</summary>
    Down,
}

/// <summary>Copper and etching of one layer.</summary>
/// <param name="ResistivityOhmMetres">Resistivity, ohm metres.</param>
/// <param name="RoughnessRms">Root-mean-square roughness, metres.</param>
/// <param name="UndercutMetres">How far each side of the narrow face lies inside the wide face, metres.</param>
public sealed record CopperProperties(Quantity ResistivityOhmMetres, Quantity RoughnessRms, Quantity UndercutMetres);
