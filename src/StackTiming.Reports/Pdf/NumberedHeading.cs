using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Pdf;

/// <summary>A heading with its number.</summary>
/// <param name="Section">The section.</param>
/// <param name="Level">Level, from 1.</param>
/// <param name="Number">Number, such as <c>2.1</c> or <c>Appendix A</c>; empty where it has none.</param>
internal sealed record NumberedHeading(Section Section, int Level, string Number)
{
    /// <summary>The headings of a document in reading order.</summary>
    /// <param name="document">The document.</param>
    public static List<NumberedHeading> Of(ReportDocument document)
    {
        var headings = new List<NumberedHeading>();
        Collect(document.Sections, "", 1, headings);
        return headings;
    }

    private static void Collect(IEnumerable<Section> sections, string prefix, int level, List<NumberedHeading> headings)
    {
        var number = 0;
        var letter = 'A';
        foreach (var section in sections)
        {
            var own = section.Numbering switch
            {
                Numbering.Number => prefix + (++number).ToString(System.Globalization.CultureInfo.InvariantCulture),
                Numbering.Appendix => "Appendix " + letter++,
                _ => "",
            };
            headings.Add(new NumberedHeading(section, level, own));
            Collect(section.Sections, own.Length == 0 ? "" : own + ".", level + 1, headings);
        }
    }
}
