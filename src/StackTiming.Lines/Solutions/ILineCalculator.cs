using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Solutions;

/// <summary>Anything that computes a cross-section: the closed forms or the field solver. Implementations are stateless and safe on several threads.</summary>
public interface ILineCalculator
{
    /// <summary>Name for tables and messages, such as <c>closed form</c>.</summary>
    string Name { get; }

    /// <summary>The constants per metre of a cross-section, or null where this calculator has no method for the geometry.</summary>
    /// <param name="section">The cross-section.</param>
    LineSolution? Calculate(CrossSection section);

    /// <summary>Why <see cref="Calculate"/> has no method for a cross-section, in a sentence without a full stop; null where it has one.</summary>
    /// <param name="section">The cross-section.</param>
    string? Objection(CrossSection section);
}
