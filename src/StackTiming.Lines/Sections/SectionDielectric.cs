namespace StackTiming.Lines.Sections;

/// <summary>A dielectric as a cross-section sees it: constants at one frequency.</summary>
/// <param name="Name">Material name from the stack-up; <c>air</c> for the open space.</param>
/// <param name="Dk">Relative permittivity, at least 1.</param>
/// <param name="Df">Loss tangent, at least 0.</param>
public sealed record SectionDielectric(string Name, double Dk, double Df)
{
    /// <summary>The space around the board: relative permittivity 1, no loss.</summary>
    public static SectionDielectric Air { get; } = new("air", 1, 0);
}
