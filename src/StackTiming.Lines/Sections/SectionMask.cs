namespace StackTiming.Lines.Sections;

/// <summary>
/// Conformal solder mask: a layer on the bare laminate, together with every trace outline moved out by
/// <paramref name="OverCopperMetres"/> to each side and away from the laminate; overlaps merge.
/// </summary>
/// <param name="Dielectric">The mask material.</param>
/// <param name="OverLaminateMetres">Thickness on bare laminate, in metres.</param>
/// <param name="OverCopperMetres">Thickness beside and over a trace, in metres.</param>
public sealed record SectionMask(SectionDielectric Dielectric, double OverLaminateMetres, double OverCopperMetres);
