using StackTiming.Stackups.Quantities;

namespace StackTiming.Stackups.Materials;

/// <summary>A laminate, prepreg or mask material.</summary>
/// <param name="Name">Name in the stack-up file.</param>
/// <param name="Dk">Relative permittivity at <paramref name="AtHertz"/>.</param>
/// <param name="Df">Loss tangent at <paramref name="AtHertz"/>.</param>
/// <param name="AtHertz">Frequency at which Dk and Df are stated, Hz.</param>
/// <param name="ResinContent">Resin content by weight as a fraction, or null where not stated.</param>
public sealed record Dielectric(string Name, Quantity Dk, Quantity Df, double AtHertz, Quantity? ResinContent);
