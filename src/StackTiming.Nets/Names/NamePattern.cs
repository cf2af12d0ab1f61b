using System.Collections.Immutable;
using System.Globalization;

namespace StackTiming.Nets.Names;

/// <summary>
/// A pattern over names of nets or pins: <c>*</c> stands for any run of characters, <c>?</c> for one, <c>[0..7]</c> or <c>[1,3,5..8]</c> for
/// numbers (with leading zeros where the first has them), and <c>B1..B8</c> for a run of numbered names.
/// </summary>
public sealed class NamePattern
{
    /// <summary>Most names that ranges may stand for.</summary>
    public const int MostAlternatives = 1_000_000;

    private NamePattern(string text, ImmutableArray<string> alternatives)
    {
        Text = text;
        Alternatives = alternatives;
    }

    /// <summary>The pattern as written.</summary>
    public string Text { get; }

    /// <summary>What its ranges stand for: plain names, or names with <c>*</c> and <c>?</c> in them.</summary>
    public ImmutableArray<string> Alternatives { get; }

    /// <summary>Whether it is a plain name.</summary>
    public bool IsPlain => Alternatives.Length == 1 && Alternatives[0] == Text && !HasWildcard(Text);

    /// <summary>Whether a text has <c>*</c> or <c>?</c> in it.</summary>
    /// <param name="text">The text.</param>
    public static bool HasWildcard(ReadOnlySpan<char> text) => text.ContainsAny('*', '?');

    /// <summary>Reads a pattern.</summary>
    /// <param name="text">The text.</param>
    /// <param name="problem">What is wrong with it; empty where nothing is.</param>
    /// <returns>The pattern, or null where it is wrong.</returns>
    public static NamePattern? TryParse(string text, out string problem)
    {
        problem = "";
        var alternatives = new List<string> { "" };
        if (TryNumberedRun(text, out var prefix, out var from, out var to, out var digits))
        {
            if (!TryAppendNumbers(alternatives, [(prefix, from, to, digits)], ref problem))
                return null;
            return new NamePattern(text, [.. alternatives]);
        }
        var at = 0;
        while (at < text.Length)
        {
            var open = text.IndexOf('[', at);
            var close = open < 0 ? -1 : text.IndexOf(']', open);
            if (close < 0 || !TryRanges(text.AsSpan(open + 1, close - open - 1), out var ranges))
            {
                // A bracket without a range in it is part of the name, as in a net called D[0].
                var end = close < 0 ? text.Length : close + 1;
                AppendText(alternatives, text[at..end]);
                at = end;
                continue;
            }
            AppendText(alternatives, text[at..open]);
            if (!TryAppendNumbers(alternatives, ranges, ref problem))
                return null;
            at = close + 1;
        }
        return new NamePattern(text, [.. alternatives]);
    }

    /// <summary>Whether a name fits.</summary>
    /// <param name="name">The name.</param>
    public bool Matches(string name)
    {
        foreach (var alternative in Alternatives)
        {
            if (Fits(name, alternative))
                return true;
        }
        return false;
    }

    /// <summary>Whether a name fits a text with <c>*</c> and <c>?</c>.</summary>
    /// <param name="name">The name.</param>
    /// <param name="wildcard">The text.</param>
    public static bool Fits(ReadOnlySpan<char> name, ReadOnlySpan<char> wildcard)
    {
        int n = 0, w = 0, star = -1, resume = 0;
        while (n < name.Length)
        {
            if (w < wildcard.Length && wildcard[w] == '*')
            {
                star = w++;
                resume = n;
            }
            else if (w < wildcard.Length && (wildcard[w] == '?' || wildcard[w] == name[n]))
            {
                w++;
                n++;
            }
            else if (star >= 0)
            {
                w = star + 1;
                n = ++resume;
            }
            else
            {
                return false;
            }
        }
        while (w < wildcard.Length && wildcard[w] == '*')
            w++;
        return w == wildcard.Length;
    }

    private static void AppendText(List<string> alternatives, string text)
    {
        for (var i = 0; i < alternatives.Count; i++)
            alternatives[i] += text;
    }

    private static bool TryAppendNumbers(
        List<string> alternatives, List<(string Prefix, int From, int To, int Digits)> ranges, ref string problem)
    {
        long count = 0;
        foreach (var (_, from, to, _) in ranges)
        {
            if (to < from)
            {
                problem = $"the range {from}..{to} runs backwards; write {to}..{from}";
                return false;
            }
            count += (long)to - from + 1;
        }
        if (count * alternatives.Count > MostAlternatives)
        {
            problem = $"the ranges stand for more than {MostAlternatives} names; use * instead";
            return false;
        }
        var before = alternatives.ToArray();
        alternatives.Clear();
        foreach (var text in before)
        {
            foreach (var (prefix, from, to, digits) in ranges)
            {
                for (var number = from; number <= to; number++)
                    alternatives.Add(text + prefix + number.ToString("D" + digits.ToString(CultureInfo.InvariantCulture), CultureInfo.InvariantCulture));
            }
        }
        return true;
    }

    /// <summary><c>0..7</c>, <c>1,3,5..8</c>: something with at least one range or comma, so that a lone number stays part of a name.</summary>
    private static bool TryRanges(ReadOnlySpan<char> inside, out List<(string Prefix, int From, int To, int Digits)> ranges)
    {
        ranges = [];
        if (!inside.Contains("..", StringComparison.Ordinal) && !inside.Contains(','))
            return false;
        foreach (var part in inside.Split(','))
        {
            var item = inside[part].Trim();
            var dots = item.IndexOf("..", StringComparison.Ordinal);
            var first = dots < 0 ? item : item[..dots].Trim();
            var last = dots < 0 ? item : item[(dots + 2)..].Trim();
            if (!TryNumber(first, out var from) || !TryNumber(last, out var to))
                return false;
            ranges.Add(("", from, to, first.Length > 1 && first[0] == '0' ? first.Length : 1));
        }
        return ranges.Count > 0;
    }

    /// <summary><c>B1..B8</c> or <c>B1..8</c>.</summary>
    private static bool TryNumberedRun(string text, out string prefix, out int from, out int to, out int digits)
    {
        prefix = "";
        from = to = 0;
        digits = 1;
        var dots = text.IndexOf("..", StringComparison.Ordinal);
        if (dots <= 0 || text.Contains('[') || HasWildcard(text))
            return false;
        var first = text.AsSpan(0, dots);
        var last = text.AsSpan(dots + 2);
        var letters = first.Length;
        while (letters > 0 && char.IsAsciiDigit(first[letters - 1]))
            letters--;
        prefix = first[..letters].ToString();
        var number = first[letters..];
        if (last.StartsWith(prefix, StringComparison.Ordinal))
            last = last[letters..];
        digits = number.Length > 1 && number[0] == '0' ? number.Length : 1;
        return TryNumber(number, out from) && TryNumber(last, out to);
    }

    private static bool TryNumber(ReadOnlySpan<char> text, out int number)
    {
        number = 0;
        return text.Length is > 0 and <= 9 && !text.ContainsAnyExceptInRange('0', '9')
            && int.TryParse(text, NumberStyles.None, CultureInfo.InvariantCulture, out number);
    }
}
