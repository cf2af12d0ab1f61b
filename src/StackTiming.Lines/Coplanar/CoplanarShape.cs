using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Coplanar;

/// <summary>A trace between two grounded pours on its layer, lengths in metres; trapezoids count by their mean widths.</summary>
/// <param name="Name">Name of the signal.</param>
/// <param name="Width">Width of the trace.</param>
/// <param name="Gap">Mean gap to the pours.</param>
/// <param name="Thickness">Thickness.</param>
/// <param name="PourWidth">Width of the narrower pour.</param>
/// <param name="IsSymmetric">True where both gaps are alike.</param>
internal readonly record struct CoplanarShape(string Name, double Width, double Gap, double Thickness, double PourWidth, bool IsSymmetric)
{
    /// <summary>The shape of a section, or null where it is another one.</summary>
    /// <param name="section">The section.</param>
    public static CoplanarShape? Of(CrossSection section)
    {
        if (section.Conductors.Length != 3 || section.Conductors.Any(c => c.BottomMetres != section.Conductors[0].BottomMetres))
            return null;
        var fromLeft = section.Conductors.OrderBy(c => c.CentreMetres).ToArray();
        var (left, trace, right) = (fromLeft[0], fromLeft[1], fromLeft[2]);
        if (!left.Grounded || trace.Grounded || !right.Grounded)
            return null;
        double before = trace.CentreMetres - left.CentreMetres - 0.5 * (Mean(trace) + Mean(left));
        double after = right.CentreMetres - trace.CentreMetres - 0.5 * (Mean(trace) + Mean(right));
        return new CoplanarShape(
            trace.Name, Mean(trace), 0.5 * (before + after), trace.ThicknessMetres, Math.Min(left.WideMetres, right.WideMetres),
            Math.Abs(before - after) <= 1e-6 * (before + after));
    }

    private static double Mean(SectionConductor c) => 0.5 * (c.WideMetres + c.NarrowMetres);
}
