using StackTiming.Stackups.Copper;
using StackTiming.Stackups.Materials;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Stackups.Layers;

/// <summary>One entry of a stack-up, from the top face to the bottom face.</summary>
/// <param name="At">Where the file states it.</param>
public abstract record Layer(FilePosition At);

/// <summary>What a copper layer is used for.</summary>
public enum CopperUse
{
    /// <summary>Traces.</summary>
    Signal,
    /// <summary>A reference plane.</summary>
    Plane,
    /// <summary>Traces and pours.</summary>
    Mixed,
}

/// <summary>A copper layer.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="Name">Name, such as <c>L3</c>.</param>
/// <param name="Thickness">Finished thickness, metres.</param>
/// <param name="Use">Signal, plane or mixed.</param>
/// <param name="Copper">Resistivity, roughness and etching.</param>
/// <param name="WideFace">Which face the width on the drawing belongs to.</param>
/// <param name="WidthToleranceMetres">Tolerance of trace widths on this layer, metres.</param>
public sealed record CopperLayer(
    FilePosition At, string Name, Quantity Thickness, CopperUse Use, CopperProperties Copper, WideFace WideFace, Tolerance WidthToleranceMetres) : Layer(At)
{
    /// <summary>True where the file states the wide face (<c>base:</c>), false where it follows from the layers around.</summary>
    public bool WideFaceStated { get; init; }
}

/// <summary>Whether a dielectric was cured before pressing.</summary>
public enum DielectricKind
{
    /// <summary>A cured laminate that carries etched copper.</summary>
    Core,
    /// <summary>A bonding sheet.</summary>
    Prepreg,
}

/// <summary>A dielectric layer.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="Kind">Core or prepreg.</param>
/// <param name="Material">What it is made of.</param>
/// <param name="Thickness">Distance between the facing copper faces as pressed, metres.</param>
public sealed record DielectricLayer(FilePosition At, DielectricKind Kind, Dielectric Material, Quantity Thickness) : Layer(At);

/// <summary>Solder mask on an outer face.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="Material">What it is made of.</param>
/// <param name="OverLaminate">Thickness on bare laminate, metres.</param>
/// <param name="OverCopper">Thickness beside and over a trace, metres.</param>
public sealed record MaskLayer(FilePosition At, Dielectric Material, Quantity OverLaminate, Quantity OverCopper) : Layer(At);
