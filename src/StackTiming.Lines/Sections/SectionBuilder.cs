using System.Collections.Immutable;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Lines.Sections;

/// <summary>
/// Cuts the cross-section of a line out of a stack-up. The nearest infinite planes above and below the traces bound it; copper layers in
/// between are empty, their height filled by the dielectric that lies on the narrow face of that layer's traces (air on an outer layer).
/// y = 0 is the bottom plane; a section whose only plane lies above is turned upside down; without any plane y = 0 is the lowest face.
/// </summary>
public static class SectionBuilder
{
    /// <summary>The cross-section of a line, or null with located problems.</summary>
    /// <param name="stackUp">The stack-up.</param>
    /// <param name="request">The line.</param>
    /// <param name="problems">Where problems go.</param>
    public static CrossSection? Build(StackUp stackUp, SectionRequest request, ProblemList problems)
    {
        if (!Accept(request, stackUp, problems))
            return null;
        return Build(stackUp, Place(stackUp, request), request.FrequencyHertz, problems);
    }

    /// <summary>The cross-section of conductors placed by hand, or null with located problems.</summary>
    /// <param name="stackUp">The stack-up.</param>
    /// <param name="placed">The conductors, at least one of them a signal.</param>
    /// <param name="frequencyHertz">Frequency at which Dk and Df are wanted, or null for the values as stated.</param>
    /// <param name="problems">Where problems go.</param>
    public static CrossSection? Build(StackUp stackUp, ImmutableArray<PlacedConductor> placed, double? frequencyHertz, ProblemList problems)
    {
        var before = problems.ErrorCount;
        if (placed.IsEmpty)
            throw new ArgumentException("a section needs at least one conductor", nameof(placed));
        PlacementCheck.Run(stackUp, placed, problems);
        if (problems.ErrorCount > before)
            return null;
        var bounds = BoundingPlanes.Around(stackUp, placed, problems);
        if (bounds is not { } planes)
            return null;
        var section = new LayerStack(stackUp, planes, frequencyHertz).Cut(placed);
        return section.BottomPlaneMetres is null && section.TopPlaneMetres is not null ? Mirror.UpsideDown(section) : section;
    }

    private static bool Accept(SectionRequest request, StackUp stackUp, ProblemList problems)
    {
        var before = problems.ErrorCount;
        if (!(request.WidthMetres > 0) || !double.IsFinite(request.WidthMetres))
            problems.Error(request.At, $"the width of a trace on {request.Layer} must be above zero", "write its width on the drawing, such as 0.12 mm");
        if (request.PairGapMetres is { } gap && !(gap > 0 && double.IsFinite(gap)))
            problems.Error(request.At, $"the gap of a pair on {request.Layer} must be above zero", "write the distance between the wide faces, such as 0.15 mm");
        if (request.PourGapMetres is { } pour && !(pour > 0 && double.IsFinite(pour)))
            problems.Error(request.At, $"the gap to the pour on {request.Layer} must be above zero", "write the distance between the wide faces, such as 0.2 mm");
        if (request.BroadsideLayer is { } partner)
        {
            if (partner == request.Layer)
                problems.Error(request.At, $"a broadside pair needs two layers, but both traces are on {partner}", "name the layer above or below, or give a gap");
            if (request.PairGapMetres is not null)
                problems.Error(request.At, "a pair has either a gap (side by side) or a second layer (broadside), not both");
        }
        foreach (var layer in new[] { request.Layer, request.BroadsideLayer })
        {
            if (layer is not null && stackUp.FindCopper(layer)?.Use == CopperUse.Plane)
                problems.Error(request.At, $"{layer} is a plane in stack-up '{stackUp.Name}', so it carries no traces", "name a layer with use: signal or mixed");
        }
        return problems.ErrorCount == before;
    }

    private static ImmutableArray<PlacedConductor> Place(StackUp stackUp, SectionRequest request)
    {
        var placed = ImmutableArray.CreateBuilder<PlacedConductor>();
        var w = request.WidthMetres;
        var outer = 0.5 * w;
        if (request.BroadsideLayer is { } partner)
        {
            placed.Add(new PlacedConductor(request.At, "a", request.Layer, -0.5 * w, 0.5 * w, Grounded: false));
            placed.Add(new PlacedConductor(request.At, "b", partner, -0.5 * w, 0.5 * w, Grounded: false));
        }
        else if (request.PairGapMetres is { } gap)
        {
            outer = 0.5 * gap + w;
            placed.Add(new PlacedConductor(request.At, "a", request.Layer, -outer, -0.5 * gap, Grounded: false));
            placed.Add(new PlacedConductor(request.At, "b", request.Layer, 0.5 * gap, outer, Grounded: false));
        }
        else
        {
            placed.Add(new PlacedConductor(request.At, "a", request.Layer, -outer, outer, Grounded: false));
        }
        if (request.PourGapMetres is { } pour)
        {
            var inner = outer + pour;
            var far = inner + PourWidth(stackUp, inner);
            placed.Add(new PlacedConductor(request.At, "pour left", request.Layer, -far, -inner, Grounded: true));
            placed.Add(new PlacedConductor(request.At, "pour right", request.Layer, inner, far, Grounded: true));
        }
        return placed.ToImmutable();
    }

    /// <summary>Wide enough that its far edge changes nothing: the field beside a line falls by e⁻π per height to the plane.</summary>
    private static double PourWidth(StackUp stackUp, double innerEdge)
    {
        var board = stackUp.Layers.OfType<DielectricLayer>().Sum(l => l.Thickness.Value);
        return Math.Max(3 * board, 5 * innerEdge);
    }
}
