using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Sensitivities;

/// <summary>What a parameter of a cross-section is.</summary>
public enum ParameterKind
{
    /// <summary>Thickness of a dielectric layer, in metres; everything above moves with it.</summary>
    SlabThickness,

    /// <summary>Relative permittivity of a dielectric, wherever it occurs.</summary>
    DielectricConstant,

    /// <summary>Width of a conductor, in metres; both faces widen alike.</summary>
    Width,

    /// <summary>Width of the narrow face at a fixed wide face, in metres: the undercut counted backwards.</summary>
    NarrowWidth,

    /// <summary>Thickness of a conductor, in metres; it grows away from its wide face.</summary>
    ConductorThickness,

    /// <summary>Place of a conductor along x, in metres: a gap grows on one side and shrinks on the other.</summary>
    Position,

    /// <summary>Thickness of the mask on bare laminate, in metres.</summary>
    MaskOverLaminate,

    /// <summary>Thickness of the mask beside and over copper, in metres.</summary>
    MaskOverCopper,
}

/// <summary>A parameter of a cross-section that its results depend on.</summary>
/// <param name="Kind">What it is.</param>
/// <param name="Subject">
/// Name of the dielectric or the conductor; <c>top mask</c> or <c>bottom mask</c> for the thicknesses of mask.
/// </param>
/// <param name="Value">Its value in the section, in metres or without unit.</param>
/// <param name="Scale">A change of it that matters, for the step of differences.</param>
/// <param name="With">The section with another value of it.</param>
public sealed record SectionParameter(ParameterKind Kind, string Subject, double Value, double Scale, Func<double, CrossSection> With);
