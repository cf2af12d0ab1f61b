using System.Collections.Immutable;
using StackTiming.Lines.Layered;
using StackTiming.Lines.Microstrip;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Lines.Stripline;

namespace StackTiming.Lines.Methods;

/// <summary>Picks the closed form for the geometry of a cross-section.</summary>
public static class ClosedForms
{
    /// <summary>The closed forms, the preferred ones of a geometry first.</summary>
    public static ImmutableArray<IClosedForm> InOrderOfPreference { get; } = [new HammerstadJensen1980(), new Cohn1954(), new Yamashita1968()];

    /// <summary>The closed forms as a calculator, for callers that take either them or the field solver.</summary>
    public static ILineCalculator Calculator { get; } = new ClosedFormCalculator();

    /// <summary>The result of the preferred closed form for a section, or null where none describes its geometry.</summary>
    /// <param name="section">The section.</param>
    public static LineSolution? Calculate(CrossSection section)
    {
        foreach (var form in InOrderOfPreference)
        {
            if (!form.Method.IsSecondOpinion && form.Objection(section) is null)
                return form.Calculate(section);
        }
        return null;
    }

    /// <summary>The results of every closed form that describes a section, the preferred one first: second opinions for reports.</summary>
    /// <param name="section">The section.</param>
    public static ImmutableArray<LineSolution> Opinions(CrossSection section) =>
        [.. InOrderOfPreference.OrderBy(f => f.Method.IsSecondOpinion).Where(f => f.Objection(section) is null).Select(f => f.Calculate(section))];

    private sealed class ClosedFormCalculator : ILineCalculator
    {
        public string Name => "closed form";

        public LineSolution? Calculate(CrossSection section) => ClosedForms.Calculate(section);

        public string? Objection(CrossSection section) =>
            InOrderOfPreference.Any(f => !f.Method.IsSecondOpinion && f.Objection(section) is null)
                ? null
                : "no closed form describes this geometry; the field solver does";
    }
}
