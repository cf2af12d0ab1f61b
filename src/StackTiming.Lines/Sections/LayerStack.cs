using System.Collections.Immutable;
using StackTiming.Lines.Materials;
using StackTiming.Stackups.Copper;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Materials;

namespace StackTiming.Lines.Sections;

/// <summary>The layers between the bounding planes, laid out from the lowest upwards.</summary>
/// <param name="stackUp">The stack-up.</param>
/// <param name="bounds">The planes.</param>
/// <param name="frequencyHertz">Frequency of Dk and Df, or null for the values as stated.</param>
internal sealed class LayerStack(StackUp stackUp, BoundingPlanes bounds, double? frequencyHertz)
{
    /// <summary>The section with conductors in it.</summary>
    /// <param name="placed">Conductors whose shape has been checked.</param>
    public CrossSection Cut(ImmutableArray<PlacedConductor> placed)
    {
        var slabs = ImmutableArray.CreateBuilder<DielectricSlab>();
        var bottomOf = new Dictionary<string, double>(StringComparer.Ordinal);
        var y = 0.0;
        for (var i = bounds.Below - 1; i > bounds.Above; i--)
        {
            switch (stackUp.Layers[i])
            {
                case DielectricLayer dielectric:
                    y = Fill(slabs, dielectric.Material, y, dielectric.Thickness.Value);
                    break;
                case CopperLayer copper:
                    bottomOf[copper.Name] = y;
                    if (FillOf(i, copper) is { } fill)
                        y = Fill(slabs, fill, y, copper.Thickness.Value);
                    else if (slabs.Count == 0)
                        // Copper hanging from the lowest face: the traces reach below y = 0.
                        bottomOf[copper.Name] = -copper.Thickness.Value;
                    break;
            }
        }
        var planeAbove = bounds.Above >= 0;
        var planeBelow = bounds.Below < stackUp.Layers.Length;
        return new CrossSection(
            slabs.ToImmutable(),
            planeBelow ? 0 : null,
            planeAbove ? y : null,
            [.. placed.Select(c => Shape(c, bottomOf[c.Layer]))],
            planeAbove ? null : Mask(stackUp.Layers[0]),
            planeBelow ? null : Mask(stackUp.Layers[^1]),
            MetalOf(placed.First(c => !c.Grounded)));
    }

    private double Fill(ImmutableArray<DielectricSlab>.Builder slabs, Dielectric material, double bottom, double thickness)
    {
        if (thickness <= 0)
            return bottom;
        var top = bottom + thickness;
        var dielectric = At(material);
        if (slabs.Count > 0 && slabs[^1].Dielectric == dielectric)
            slabs[^1] = slabs[^1] with { TopMetres = top };
        else
            slabs.Add(new DielectricSlab(dielectric, bottom, top));
        return top;
    }

    /// <summary>What fills the space between the traces of a copper layer: the dielectric on their narrow face, or null for air or mask.</summary>
    private Dielectric? FillOf(int index, CopperLayer copper)
    {
        var step = copper.WideFace == WideFace.Down ? -1 : 1;
        var neighbour = index + step;
        return neighbour >= 0 && neighbour < stackUp.Layers.Length ? (stackUp.Layers[neighbour] as DielectricLayer)?.Material : null;
    }

    private SectionConductor Shape(PlacedConductor conductor, double bottom)
    {
        var layer = stackUp.FindCopper(conductor.Layer)!;
        var wide = conductor.RightMetres - conductor.LeftMetres;
        return new SectionConductor(
            conductor.Name, conductor.Grounded, 0.5 * (conductor.LeftMetres + conductor.RightMetres), wide,
            PlacementCheck.NarrowWidth(wide, layer), layer.Thickness.Value, bottom, layer.WideFace == WideFace.Down);
    }

    private SectionMask? Mask(Layer outermost) => outermost is MaskLayer mask
        ? new SectionMask(At(mask.Material), mask.OverLaminate.Value, mask.OverCopper.Value)
        : null;

    private SectionMetal MetalOf(PlacedConductor conductor)
    {
        var copper = stackUp.FindCopper(conductor.Layer)!.Copper;
        return new SectionMetal(copper.ResistivityOhmMetres.Value, copper.RoughnessRms.Value);
    }

    private SectionDielectric At(Dielectric material)
    {
        var (dk, df) = (material.Dk.Value, material.Df.Value);
        if (frequencyHertz is not { } f || df == 0 || f == material.AtHertz)
            return new SectionDielectric(material.Name, dk, df);
        var model = WidebandDebye.Through(dk, df, material.AtHertz);
        return new SectionDielectric(material.Name, model.Dk(f), model.Df(f));
    }
}
