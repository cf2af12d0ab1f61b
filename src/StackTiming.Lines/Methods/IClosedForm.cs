using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Methods;

/// <summary>A closed form: one published method applied to whole cross-sections.</summary>
public interface IClosedForm
{
    /// <summary>What the method is.</summary>
    LineMethod Method { get; }

    /// <summary>Why the method does not describe a geometry, in a sentence without a full stop; null where it does.</summary>
    /// <param name="section">The cross-section.</param>
    string? Objection(CrossSection section);

    /// <summary>True where the method is the one to rely on for a section; false where it is only a second opinion beside a better one.</summary>
    /// <param name="section">A section to which <see cref="Objection"/> has none.</param>
    bool Suits(CrossSection section);

    /// <summary>The result; outside the validity range it carries a warning.</summary>
    /// <param name="section">A cross-section to which <see cref="Objection"/> has none.</param>
    LineSolution Calculate(CrossSection section);
}
