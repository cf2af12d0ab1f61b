namespace StackTiming.Lines.Sections;

/// <summary>The copper of a cross-section, for its losses.</summary>
/// <param name="ResistivityOhmMetres">Resistivity in ohm metres.</param>
/// <param name="RoughnessRmsMetres">Root-mean-square roughness of the faces in metres; 0 is smooth.</param>
public sealed record SectionMetal(double ResistivityOhmMetres, double RoughnessRmsMetres);
