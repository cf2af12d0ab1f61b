using StackTiming.Stackups.Reading;

namespace StackTiming.Stackups.Copper;

/// <summary>Gathers what a stack-up leaves unsaid of its trace copper, to say once which values are taken instead.</summary>
internal sealed class CopperSilences
{
    private readonly List<string> smooth = [];
    private readonly List<string> vertical = [];

    /// <summary>Looks at one layer.</summary>
    /// <param name="layer">Its name.</param>
    /// <param name="stated">What is said of its copper.</param>
    public void Add(string layer, CopperDefaults stated)
    {
        if (stated.LacksShape)
            vertical.Add(layer);
        if (stated.LacksRoughness)
            smooth.Add(layer);
    }

    /// <summary>Notes the values taken.</summary>
    /// <param name="at">Where the stack-up speaks of copper.</param>
    /// <param name="problems">Where the notes go.</param>
    public void Note(FilePosition at, ProblemList problems)
    {
        if (vertical.Count > 0)
            problems.Note(at, $"no etch-factor or undercut is stated for {Names(vertical)}: traces count as rectangles", "write copper: { etch-factor: 2.5 }, with your fabricator's figure");
        if (smooth.Count > 0)
            problems.Note(at, $"no roughness is stated for {Names(smooth)}: copper counts as smooth, and losses come out low", "write copper: { roughness: 0.5 um }, with your fabricator's figure");
    }

    private static string Names(List<string> layers)
    {
        const int most = 8;
        return string.Join(", ", layers.Take(most).Select(Suggestion.Shorten)) + (layers.Count > most ? ", …" : "");
    }
}
