using System.Collections.Immutable;
using StackTiming.Lines.Coplanar;
using StackTiming.Lines.Coupled;
using StackTiming.Lines.Handbook;
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
    public static ImmutableArray<IClosedForm> InOrderOfPreference { get; } =
    [
        new HammerstadJensen1980(), new Cohn1954(), new Wheeler1978(), new Cohn1955(), new Cohn1960(), new Wen1969(), new Yamashita1968(),
        new Wheeler1977(), new KirschningJansen1984(), new GhioneNaldi1983(), new Ipc2141(),
    ];

    /// <summary>The closed forms as a calculator, for callers that take either them or the field solver.</summary>
    public static ILineCalculator Calculator { get; } = new ClosedFormCalculator();

    /// <summary>The result of the preferred closed form for a section, or null where none describes its geometry.</summary>
    /// <param name="section">The section.</param>
    public static LineSolution? Calculate(CrossSection section)
    {
        foreach (var form in InOrderOfPreference)
        {
            if (form.Objection(section) is null && form.Suits(section))
                return form.Calculate(section);
        }
        return null;
    }

    /// <summary>The results of every closed form that describes a section, the preferred one first: second opinions for reports.</summary>
    /// <param name="section">The section.</param>
    public static ImmutableArray<LineSolution> Opinions(CrossSection section) =>
        [.. InOrderOfPreference.Where(f => f.Objection(section) is null).OrderBy(f => f.Suits(section) ? 0 : 1).Select(f => f.Calculate(section))];

    private sealed class ClosedFormCalculator : ILineCalculator
    {
        public string Name => "closed form";

        public LineSolution? Calculate(CrossSection section) => ClosedForms.Calculate(section);

        public string? Objection(CrossSection section) =>
            InOrderOfPreference.Any(f => f.Objection(section) is null && f.Suits(section))
                ? null
                : "no closed form describes this geometry; the field solver does";
    }
}
