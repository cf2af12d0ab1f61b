namespace StackTiming.Lines.Sections;

/// <summary>A horizontal dielectric layer of unlimited width between two heights.</summary>
/// <param name="Dielectric">What fills it.</param>
/// <param name="BottomMetres">Height of its lower face, in metres.</param>
/// <param name="TopMetres">Height of its upper face, in metres; above <paramref name="BottomMetres"/>.</param>
public sealed record DielectricSlab(SectionDielectric Dielectric, double BottomMetres, double TopMetres)
{
    /// <summary>Thickness in metres.</summary>
    public double ThicknessMetres => TopMetres - BottomMetres;
}
