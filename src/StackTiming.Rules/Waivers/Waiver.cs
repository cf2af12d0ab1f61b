using StackTiming.Rules.RuleFiles;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Waivers;

/// <summary>A signed decision to accept that a rule does not hold for some nets.</summary>
/// <param name="At">Where it is written.</param>
/// <param name="Rule">Id of the rule.</param>
/// <param name="Nets">The nets as the file names them.</param>
/// <param name="Reason">Why it is accepted.</param>
/// <param name="ApprovedBy">Role or initials of whoever accepted it.</param>
/// <param name="Until">Last day of its validity, or null where it is not limited.</param>
public sealed record Waiver(FilePosition At, string Rule, NetSelector Nets, string Reason, string ApprovedBy, DateOnly? Until)
{
    /// <summary>Reads a waiver.</summary>
    /// <param name="map">Its mapping.</param>
    /// <returns>The waiver, or null with problems.</returns>
    public static Waiver? Read(MapReader map)
    {
        var errors = map.Problems.ErrorCount;
        var rule = map.NeedText("rule", "rule: LANE0-MATCH, the id of the rule that is waived");
        var nets = map.Need("nets", "nets: [ MEM_D3 ]") is { } node ? NetSelector.Read(node, "nets", map.Problems) : null;
        var reason = NotEmpty(map, "reason", "reason: why the board is fit for use all the same");
        var approved = NotEmpty(map, "approved-by", "approved-by: hardware lead");
        DateOnly? until = null;
        if (map.Text("until") is { } text)
        {
            if (DateOnly.TryParseExact(text, "yyyy-MM-dd", System.Globalization.CultureInfo.InvariantCulture, System.Globalization.DateTimeStyles.None, out var date))
                until = date;
            else
                map.Problems.Error(map.PositionOf("until"), $"'{Suggestion.Shorten(text)}' is not a date", "write until: 2027-06-30");
        }
        else if (!map.Has("until"))
        {
            map.Problems.Note(map.At, "the waiver has no end", "write until: and the day on which it should be looked at again");
        }
        map.Finish();
        return map.Problems.ErrorCount > errors || rule is null || nets is null ? null : new Waiver(map.At, rule, nets, reason!, approved!, until);
    }

    private static string? NotEmpty(MapReader map, string key, string example)
    {
        var text = map.NeedText(key, example);
        if (text is not null && string.IsNullOrWhiteSpace(text))
            map.Problems.Error(map.PositionOf(key), $"'{key}' is empty", $"write {example}");
        return text;
    }
}
