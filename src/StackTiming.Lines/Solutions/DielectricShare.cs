namespace StackTiming.Lines.Solutions;

/// <summary>The share of the electric field energy that lies in one dielectric.</summary>
/// <param name="Dielectric">Material name, or <c>air</c>.</param>
/// <param name="Share">Share of the energy, 0 to 1; the shares of a section sum to 1.</param>
public readonly record struct DielectricShare(string Dielectric, double Share);
