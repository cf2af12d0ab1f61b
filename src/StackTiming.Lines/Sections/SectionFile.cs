using System.Collections.Immutable;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Lines.Sections;

/// <summary>Conductors placed by hand in a stack-up: a section file whose shapes have been checked.</summary>
/// <param name="StackUp">The stack-up.</param>
/// <param name="Conductors">The conductors in file order, at least one of them a signal.</param>
public sealed record SectionFile(StackUp StackUp, ImmutableArray<PlacedConductor> Conductors)
{
    /// <summary>The cross-section, or null with located problems.</summary>
    /// <param name="frequencyHertz">Frequency at which Dk and Df are wanted, or null for the values as stated.</param>
    /// <param name="problems">Where problems go.</param>
    public CrossSection? At(double? frequencyHertz, ProblemList problems) => SectionBuilder.Build(StackUp, Conductors, frequencyHertz, problems);
}
