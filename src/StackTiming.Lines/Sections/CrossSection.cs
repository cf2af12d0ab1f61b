using System.Collections.Immutable;

namespace StackTiming.Lines.Sections;

/// <summary>
/// What a cut through the board shows of one set of coupled conductors: everything that a closed form or the field solver
/// needs, in metres, with the dielectric constants of one frequency. x to the right, y upwards. Whatever is neither slab, mask, plane nor
/// conductor is air.
/// </summary>
/// <param name="Slabs">Dielectric layers from the lowest to the highest, without gaps or overlaps.</param>
/// <param name="BottomPlaneMetres">y of an infinite grounded plane that bounds the section from below, or null for open space.</param>
/// <param name="TopPlaneMetres">y of an infinite grounded plane that bounds it from above, or null. A section with one plane has it at the bottom.</param>
/// <param name="Conductors">Signals and grounded conductors in file order.</param>
/// <param name="TopMask">Mask on the highest slab and the conductors standing on it, or null.</param>
/// <param name="BottomMask">Mask under the lowest slab and the conductors hanging from it (only without a bottom plane), or null.</param>
/// <param name="Metal">The copper.</param>
public sealed record CrossSection(
    ImmutableArray<DielectricSlab> Slabs,
    double? BottomPlaneMetres,
    double? TopPlaneMetres,
    ImmutableArray<SectionConductor> Conductors,
    SectionMask? TopMask,
    SectionMask? BottomMask,
    SectionMetal Metal)
{
    /// <summary>The conductors that carry signals, in file order: the rows and columns of C and L.</summary>
    public IEnumerable<SectionConductor> Signals => Conductors.Where(c => !c.Grounded);
}
