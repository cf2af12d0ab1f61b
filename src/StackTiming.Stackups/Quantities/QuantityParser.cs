using System.Globalization;

namespace StackTiming.Stackups.Quantities;

/// <summary>
/// Turns the text of a quantity into SI units: a number, a unit, and a tolerance. <c>75 um</c>, <c>75 um ±10 %</c>,
/// <c>75 um +/- 8 um</c>, <c>75 um +8/-5 um</c>, <c>3.9 ±3 % uniform</c>. A tolerance without unit has the unit of the value; one in
/// percent is a share of the value, also where the value itself is a percentage.
/// </summary>
public static class QuantityParser
{
    private const int LongestText = 120;

    /// <summary>Reads a quantity of a given dimension.</summary>
    /// <param name="text">Text such as <c>75 um +8/-5 um</c>.</param>
    /// <param name="dimension">What it must measure.</param>
    /// <param name="defaults">Units for bare numbers.</param>
    /// <param name="quantity">The quantity in SI units.</param>
    /// <param name="problem">What is wrong, where the text is refused; empty otherwise.</param>
    /// <param name="advice">What to write instead, where the text is refused; empty otherwise.</param>
    public static bool TryParse(
        ReadOnlySpan<char> text, Dimension dimension, DefaultUnits defaults, out Quantity quantity, out string problem, out string advice)
    {
        quantity = default;
        var parse = new Parse(dimension, defaults);
        var ok = parse.Run(Typed(text), out quantity);
        problem = parse.Problem;
        advice = parse.Advice;
        return ok;
    }

    /// <summary>Reads a tolerance that stands alone: <c>20 um</c>, <c>±20 um</c>, <c>+10/-20 um</c>, <c>20 um limits</c>.</summary>
    /// <param name="text">The text.</param>
    /// <param name="dimension">What it must measure.</param>
    /// <param name="defaults">Units for bare numbers.</param>
    /// <param name="tolerance">The tolerance in SI units.</param>
    /// <param name="problem">What is wrong, where the text is refused; empty otherwise.</param>
    /// <param name="advice">What to write instead, where the text is refused; empty otherwise.</param>
    public static bool TryParseTolerance(
        ReadOnlySpan<char> text, Dimension dimension, DefaultUnits defaults, out Tolerance tolerance, out string problem, out string advice)
    {
        var parse = new Parse(dimension, defaults);
        var ok = parse.RunTolerance(Typed(text), out tolerance);
        problem = parse.Problem;
        advice = parse.Advice;
        return ok;
    }

    // Text from documents has a minus sign and blanks of its own: they mean what the keyboard's mean.
    private static ReadOnlySpan<char> Typed(ReadOnlySpan<char> text)
    {
        text = text.Trim();
        return text.Length > LongestText || text.IndexOfAny('\u2212', '\u00a0', '\u202f') < 0
            ? text
            : text.ToString().Replace('\u2212', '-').Replace('\u00a0', ' ').Replace('\u202f', ' ');
    }

    // One attempt; holds what is to be said of a refused text.
    private ref struct Parse(Dimension dimension, DefaultUnits defaults)
    {
        public string Problem { get; private set; } = "";

        public string Advice { get; private set; } = "";

        // True where the tolerance names a unit other than the value's.
        private bool toleranceHasOtherUnit;

        private readonly string Example => dimension switch
        {
            Dimension.None => "write a number such as 3.9",
            Dimension.Ratio => "write a percentage such as 10 %",
            _ => $"write a number and a unit ({string.Join(", ", DimensionWords.Units(dimension))}), such as 75 {DimensionWords.Units(dimension)[0]}",
        };

        public bool Run(ReadOnlySpan<char> text, out Quantity quantity)
        {
            quantity = default;
            if (text.IsEmpty)
                return Refuse("is empty", Example);
            if (text.Length > LongestText)
                return Refuse($"is {text.Length} characters long", Example);
            var spread = TakeSpread(ref text);
            var split = text.IsEmpty ? -1 : FindTolerance(text);
            if (split == 0)
                return Refuse($"'{Short(text)}' is a tolerance without a value", "write the value before it, such as 75 um ±10 %");
            var nominal = split < 0 ? text : text[..split].TrimEnd();
            if (!ReadNumber(nominal, out var number, out var unitText) || !ReadUnit(nominal, unitText, out var unit))
                return false;
            var value = number * unit;
            if (!double.IsFinite(value))
                return Refuse($"'{nominal}' is too large", Example);
            var tolerance = Tolerance.None;
            if (split >= 0 && !ReadTolerance(text[split..], value, unit, spread ?? Spread.ThreeSigma, out tolerance))
                return false;
            if (unitText.IsEmpty && toleranceHasOtherUnit && dimension != Dimension.None)
                return Refuse($"'{Short(text)}' gives its unit to the tolerance only", "write the unit after the value too, such as 75 um ±8 um");
            if (split < 0 && spread is not null)
                return Refuse($"'{text}' names a spread but no tolerance", "write the tolerance before it, such as 75 um ±10 % uniform");
            quantity = new Quantity(value, tolerance);
            return true;
        }

        public bool RunTolerance(ReadOnlySpan<char> text, out Tolerance tolerance)
        {
            tolerance = default;
            if (text.IsEmpty || text.Length > LongestText)
                return Refuse(text.IsEmpty ? "is empty" : $"is {text.Length} characters long", Example);
            var spread = TakeSpread(ref text) ?? Spread.ThreeSigma;
            if (text is ['±' or '+', ..] || (text is ['-', ..] && text.Contains('/')))
            {
                // Without a value to take the unit from, bare bounds need a declared one, and a percentage means nothing: NaN shows that it was needed.
                if (!ReadTolerance(text, double.NaN, defaults.Factors.TryGetValue(dimension, out var unit) ? unit : double.NaN, spread, out tolerance))
                    return false;
                return double.IsFinite(tolerance.Plus + tolerance.Minus) || Refuse($"'{Short(text)}' must be {DimensionWords.Name(dimension)} in absolute terms", Example);
            }
            if (!ReadNumber(text, out var number, out var unitText) || !ReadUnit(text, unitText, out var factor))
                return false;
            if (number < 0)
                return Refuse($"the tolerance '{Short(text)}' is negative", "write it without a sign");
            tolerance = new Tolerance(number * factor, number * factor, spread);
            return double.IsFinite(tolerance.Plus) || Refuse($"the tolerance '{Short(text)}' is too large", Example);
        }

        private static Spread? TakeSpread(ref ReadOnlySpan<char> text)
        {
            foreach (var (word, spread) in new[] { ("uniform", Spread.Uniform), ("limits", Spread.Limits) })
            {
                if (!text.EndsWith(word, StringComparison.Ordinal))
                    continue;
                text = text[..^word.Length].TrimEnd();
                return spread;
            }
            return null;
        }

        // The tolerance begins at ± or at a sign that is neither the number's own, nor its exponent's, nor the hyphen of ohm-m.
        private static int FindTolerance(ReadOnlySpan<char> text)
        {
            for (var i = 1; i < text.Length; i++)
            {
                if (text[i] == '±')
                    return i;
                if (text[i] is '+' or '-' && text[i - 1] is not ('e' or 'E') && !(i + 1 < text.Length && char.IsLetter(text[i - 1]) && char.IsLetter(text[i + 1])))
                    return i;
            }
            return text[0] == '±' ? 0 : -1;
        }

        private bool ReadNumber(ReadOnlySpan<char> text, out double number, out ReadOnlySpan<char> rest)
        {
            var end = 0;
            while (end < text.Length && (char.IsAsciiDigit(text[end]) || text[end] is '.' or '+' or '-' or 'e' or 'E'))
            {
                // An e that no digit or sign follows belongs to a word.
                if (text[end] is 'e' or 'E' && (end + 1 >= text.Length || !(char.IsAsciiDigit(text[end + 1]) || text[end + 1] is '+' or '-')))
                    break;
                end++;
            }
            rest = text[end..].Trim();
            if (!rest.IsEmpty && rest[0] == ',')
            {
                number = 0;
                return Refuse($"'{Short(text)}' has a comma in its number", "write a decimal point and no thousands separators, such as 1234.5");
            }
            if (double.TryParse(text[..end], NumberStyles.Float, CultureInfo.InvariantCulture, out number) && double.IsFinite(number))
                return true;
            if (text.IsEmpty)
                return Refuse("a number is missing", Example);
            return Refuse($"'{Short(text)}' does not begin with a finite number", Example);
        }

        private bool ReadUnit(ReadOnlySpan<char> whole, ReadOnlySpan<char> text, out double factor)
        {
            factor = 1;
            if (text.IsEmpty)
            {
                if (dimension == Dimension.None || defaults.Factors.TryGetValue(dimension, out factor))
                {
                    factor = dimension == Dimension.None ? 1 : factor;
                    return true;
                }
                return Refuse($"'{Short(whole)}' has no unit", Example);
            }
            if (!Unit.TryParse(text, out var unit))
                return Refuse($"'{Short(text)}' is not a unit", UnitAdvice(text));
            // A share may stand where a plain number is meant and the other way round: 3 % is 0.03.
            if (unit.Dimension != dimension && !(unit.Dimension == Dimension.Ratio && dimension == Dimension.None))
                return Refuse($"'{Short(whole)}' is {DimensionWords.Name(unit.Dimension)}, not {DimensionWords.Name(dimension)}", Example);
            factor = unit.Factor;
            return true;
        }

        private bool ReadTolerance(ReadOnlySpan<char> text, double value, double unit, Spread spread, out Tolerance tolerance)
        {
            tolerance = default;
            ReadOnlySpan<char> body;
            if (text.StartsWith("±", StringComparison.Ordinal))
                body = text[1..];
            else if (text.StartsWith("+/-", StringComparison.Ordinal) || text.StartsWith("+-", StringComparison.Ordinal))
                body = text[(text.IndexOf('-') + 1)..];
            else
                return ReadTwoSided(text, value, unit, spread, out tolerance);
            if (!ReadBound(body.Trim(), value, unit, out var distance, out _, null))
                return false;
            tolerance = new Tolerance(distance, distance, spread);
            return true;
        }

        // +8/-5 um, +10 %/-5 %, or -5/+8 um: a bound without unit takes the unit of the other one.
        private bool ReadTwoSided(ReadOnlySpan<char> text, double value, double unit, Spread spread, out Tolerance tolerance)
        {
            tolerance = default;
            var solidus = FindSecondBound(text);
            if (solidus < 2 || solidus + 2 >= text.Length)
                return Refuse($"the tolerance '{Short(text)}' is not understood", "write ±8 um, ±10 %, or +8/-5 um");
            var first = text[..solidus].Trim();
            var second = text[(solidus + 1)..].Trim();
            if (first[0] == second[0] || first[0] is not ('+' or '-') || second[0] is not ('+' or '-'))
                return Refuse($"the tolerance '{Short(text)}' needs one + and one -", "write it as +8/-5 um");
            if (!ReadBound(second[1..].Trim(), value, unit, out var b, out var secondUnit, null) ||
                !ReadBound(first[1..].Trim(), value, unit, out var a, out _, secondUnit))
                return false;
            tolerance = first[0] == '+' ? new Tolerance(b, a, spread) : new Tolerance(a, b, spread);
            return true;
        }

        // The solidus that a sign follows; the one in ps/mm has a letter behind it.
        private static int FindSecondBound(ReadOnlySpan<char> text)
        {
            for (var i = 0; i < text.Length; i++)
            {
                if (text[i] == '/' && text[(i + 1)..].TrimStart() is ['+' or '-', ..])
                    return i;
            }
            return -1;
        }

        private bool ReadBound(ReadOnlySpan<char> text, double value, double unit, out double distance, out string? unitOfText, string? inherited)
        {
            distance = 0;
            unitOfText = inherited;
            if (!ReadNumber(text, out var number, out var unitText))
                return false;
            if (number < 0)
                return Refuse($"the tolerance '{Short(text)}' is negative", "write it without a sign of its own");
            if (unitText.IsEmpty && inherited is not null)
                unitText = inherited;
            if (!unitText.IsEmpty)
                unitOfText = unitText.ToString();
            if (unitText is "%")
                distance = Math.Abs(value) * number / 100;
            else if (unitText is "ppm")
                distance = Math.Abs(value) * number / 1e6;
            else if (unitText.IsEmpty)
                distance = number * unit;
            else if (ReadUnit(text, unitText, out var factor))
            {
                distance = number * factor;
                toleranceHasOtherUnit |= factor != unit;
            }
            else
            {
                return false;
            }
            return double.IsFinite(distance) || double.IsNaN(distance) || Refuse($"the tolerance '{Short(text)}' is too large", "write a finite tolerance");
        }

        private readonly string UnitAdvice(ReadOnlySpan<char> text)
        {
            return UnitSpelling.WithOtherCapitals(text.ToString(), dimension) is { } unit
                ? $"did you mean '{unit}'? Capitals matter: m is milli, M is mega"
                : Example;
        }

        private bool Refuse(string problem, string advice)
        {
            Problem = problem;
            Advice = advice;
            return false;
        }

        private static string Short(ReadOnlySpan<char> text) => Reading.Suggestion.Shorten(text.ToString());
    }
}
