using System.Globalization;
using StackTiming.Rules.Findings;

namespace StackTiming.Reports.Compliance;

/// <summary>How the report writes figures: with their unit, a true minus sign and the signs of the trade.</summary>
internal static class Wording
{
    /// <summary>A figure with its unit.</summary>
    /// <param name="value">The figure in the unit, or null.</param>
    /// <param name="unit">The unit.</param>
    /// <returns>The text; a dash where there is no figure.</returns>
    public static string Figure(double? value, DisplayUnit unit)
    {
        if (value is not { } number || !double.IsFinite(number))
            return "–";
        return WithUnit(Number(number, unit), unit);
    }

    /// <summary>The limits of a finding.</summary>
    /// <param name="finding">The finding.</param>
    public static string Limit(Finding finding) => (finding.LowerLimit, finding.UpperLimit) switch
    {
        ({ } lower, { } upper) => $"{Number(lower, finding.Unit)} to {WithUnit(Number(upper, finding.Unit), finding.Unit)}",
        ({ } lower, null) => "≥ " + WithUnit(Number(lower, finding.Unit), finding.Unit),
        (null, { } upper) => "≤ " + WithUnit(Number(upper, finding.Unit), finding.Unit),
        _ => "–",
    };

    /// <summary>A number of things with its noun.</summary>
    /// <param name="count">How many.</param>
    /// <param name="one">The noun for one.</param>
    /// <param name="many">The noun for several.</param>
    public static string Count(int count, string one, string many) =>
        count == 1 ? "1 " + one : count.ToString("#,0", CultureInfo.InvariantCulture).Replace(',', ' ') + " " + many;

    /// <summary>Text of a rule file with the sign for ohm.</summary>
    /// <param name="text">The text.</param>
    public static string Signs(string text)
    {
        var shown = text.Replace(" ohm", " Ω", StringComparison.Ordinal);
        shown = shown.Replace(" -", " −", StringComparison.Ordinal);
        return shown.Length > 1 && shown[0] == '-' && char.IsAsciiDigit(shown[1]) ? "−" + shown[1..] : shown;
    }

    /// <summary>A length in millimetres.</summary>
    /// <param name="metres">The length, metres.</param>
    public static string Millimetres(double metres) => (metres * 1e3).ToString("0.000", CultureInfo.InvariantCulture);

    /// <summary>A length in micrometres, without trailing zeros.</summary>
    /// <param name="metres">The length, metres.</param>
    public static string Micrometres(double metres) => (metres * 1e6).ToString("0.##", CultureInfo.InvariantCulture);

    /// <summary>A share in percent.</summary>
    /// <param name="share">The share.</param>
    /// <param name="decimals">Digits after the point.</param>
    public static string Percent(double share, int decimals) =>
        double.IsFinite(share) ? (share * 100).ToString("F" + decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture) + " %" : "–";

    private static string Number(double value, DisplayUnit unit)
    {
        var number = value.ToString("F" + unit.Decimals.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture);
        if (number.AsSpan().TrimStart('-').TrimStart("0.").IsEmpty)
            number = number.TrimStart('-');
        return number.Replace('-', '−');
    }

    private static string WithUnit(string number, DisplayUnit unit) => unit.Symbol switch
    {
        null or "" => number,
        "ohm" => number + " Ω",
        _ => number + " " + unit.Symbol,
    };
}
