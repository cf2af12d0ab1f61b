using CsCheck;
using StackTiming.Stackups.Quantities;
using Xunit;

namespace StackTiming.Stackups.Tests.Quantities;

public sealed class QuantityParserTests
{
    // The factors of SI prefixes, the inch (25.4 mm, exact since 1959) and the mil are definitions; 34.8 µm an ounce is common practice.
    [Theory]
    [InlineData("75 um", Dimension.Length, 75e-6)]
    [InlineData("75um", Dimension.Length, 75e-6)]
    [InlineData("75 µm", Dimension.Length, 75e-6)]
    [InlineData("75 μm", Dimension.Length, 75e-6)]
    [InlineData("5 mil", Dimension.Length, 127e-6)]
    [InlineData("1 in", Dimension.Length, 25.4e-3)]
    [InlineData("0.5 oz", Dimension.Length, 17.4e-6)]
    [InlineData("250 nm", Dimension.Length, 250e-9)]
    [InlineData("1.2 V", Dimension.Voltage, 1.2)]
    [InlineData("-50 mV", Dimension.Voltage, -0.05)]
    [InlineData("34 Ω", Dimension.Resistance, 34)]
    [InlineData("34 \u2126", Dimension.Resistance, 34)]
    [InlineData("12 kohm", Dimension.Resistance, 12e3)]
    [InlineData("1GHz", Dimension.Frequency, 1e9)]
    [InlineData("1e-9 s", Dimension.Time, 1e-9)]
    [InlineData("400 fs", Dimension.Time, 400e-15)]
    [InlineData("1.4 pF", Dimension.Capacitance, 1.4e-12)]
    [InlineData("2.2 nH", Dimension.Inductance, 2.2e-9)]
    [InlineData("3 %", Dimension.Ratio, 0.03)]
    [InlineData("3.9", Dimension.None, 3.9)]
    [InlineData("2.4e-8 ohm m", Dimension.Resistivity, 2.4e-8)]
    [InlineData("350 nH/m", Dimension.InductancePerLength, 350e-9)]
    [InlineData("0.00035 mH/m", Dimension.InductancePerLength, 350e-9)]
    [InlineData("3.5 pF/in", Dimension.CapacitancePerLength, 3.5e-12 / 25.4e-3)]
    [InlineData("7 ps/mm", Dimension.TimePerLength, 7e-9)]
    [InlineData("1 dB/in", Dimension.DecibelPerLength, 1 / 25.4e-3)]
    [InlineData("5 ohm/m", Dimension.ResistancePerLength, 5)]
    [InlineData("1.2e-4 ohm/m/sqrtHz", Dimension.SkinResistancePerLength, 1.2e-4)]
    [InlineData("1.2 mohm/m/sqrtHz", Dimension.SkinResistancePerLength, 1.2e-3)]
    [InlineData("-6 dB", Dimension.Decibel, -6)]
    [InlineData("25 degC", Dimension.Temperature, 25)]
    [InlineData("350000 pH/m", Dimension.InductancePerLength, 350e-9)]
    [InlineData("123456789012e-12 s", Dimension.Time, 0.123456789012)]
    [InlineData("85%", Dimension.Ratio, 0.85)]
    [InlineData("1 oz/ft2", Dimension.Length, 34.8e-6)]
    [InlineData("3 %", Dimension.None, 0.03)]
    [InlineData("\u22122.5 V", Dimension.Voltage, -2.5)]
    [InlineData("2.4e-8 ohm-m", Dimension.Resistivity, 2.4e-8)]
    [InlineData("1.72 µΩ·cm", Dimension.Resistivity, 1.72e-8)]
    [InlineData("1.2e-4 ohm/m/sqrt(Hz)", Dimension.SkinResistancePerLength, 1.2e-4)]
    [InlineData("170 ps/in", Dimension.TimePerLength, 170e-12 / 25.4e-3)]
    [InlineData("5 mA", Dimension.Current, 5e-3)]
    [InlineData("2 MV", Dimension.Voltage, 2e6)]
    [InlineData("34 Mohm", Dimension.Resistance, 34e6)]
    [InlineData("34 mohm", Dimension.Resistance, 34e-3)]
    public void Reads_every_unit(string text, Dimension dimension, double expected)
    {
        Assert.True(QuantityParser.TryParse(text, dimension, DefaultUnits.None, out var quantity, out var problem, out _), problem);
        Assert.Equal(expected, quantity.Value, Math.Abs(expected) * 1e-12);
        Assert.Equal(Tolerance.None, quantity.Tolerance);
    }

    [Theory]
    [InlineData("75 um ±10 %", 7.5e-6, 7.5e-6, Spread.ThreeSigma)]
    [InlineData("75 um +/- 8 um", 8e-6, 8e-6, Spread.ThreeSigma)]
    [InlineData("75 um +8/-5 um", 5e-6, 8e-6, Spread.ThreeSigma)]
    [InlineData("75 um -5/+8 um", 5e-6, 8e-6, Spread.ThreeSigma)]
    [InlineData("75 um +10/-5 %", 3.75e-6, 7.5e-6, Spread.ThreeSigma)]
    [InlineData("75 um ±8", 8e-6, 8e-6, Spread.ThreeSigma)]
    [InlineData("75 um ±10 % uniform", 7.5e-6, 7.5e-6, Spread.Uniform)]
    [InlineData("75 um ±1 mil limits", 25.4e-6, 25.4e-6, Spread.Limits)]
    [InlineData("75 um +10 %/-5 um", 5e-6, 7.5e-6, Spread.ThreeSigma)]
    [InlineData("75 um +8 um / -5 um", 5e-6, 8e-6, Spread.ThreeSigma)]
    [InlineData("75um±10%", 7.5e-6, 7.5e-6, Spread.ThreeSigma)]
    [InlineData("75 um +8/\u22125 um", 5e-6, 8e-6, Spread.ThreeSigma)]
    [InlineData("75\u00a0um\u202f±10\u00a0%", 7.5e-6, 7.5e-6, Spread.ThreeSigma)]
    public void Reads_tolerances(string text, double minus, double plus, Spread spread)
    {
        Assert.True(QuantityParser.TryParse(text, Dimension.Length, DefaultUnits.None, out var quantity, out var problem, out _), problem);
        Assert.Equal(75e-6, quantity.Value, 1e-15);
        Assert.Equal(minus, quantity.Tolerance.Minus, 1e-15);
        Assert.Equal(plus, quantity.Tolerance.Plus, 1e-15);
        Assert.Equal(spread, quantity.Tolerance.Spread);
    }

    [Fact]
    public void Bare_numbers_take_the_declared_unit()
    {
        var units = new DefaultUnits(DefaultUnits.None.Factors.Add(Dimension.Length, 1e-6));
        Assert.True(QuantityParser.TryParse("45 ±8", Dimension.Length, units, out var quantity, out _, out _));
        Assert.Equal(45e-6, quantity.Value, 1e-15);
        Assert.Equal(8e-6, quantity.Tolerance.Plus, 1e-15);
    }

    [Theory]
    [InlineData("", Dimension.Length, "is empty", "75 um")]
    [InlineData("75", Dimension.Length, "no unit", "um")]
    [InlineData("75 ps", Dimension.Length, "is a time, not a length", "um")]
    [InlineData("75 UM", Dimension.Length, "not a unit", "did you mean 'um'")]
    [InlineData("75 parsec", Dimension.Length, "not a unit", "um")]
    [InlineData("1 Ghz", Dimension.Frequency, "not a unit", "did you mean 'GHz'")]
    [InlineData("3,9", Dimension.None, "comma", "decimal point")]
    [InlineData("NaN um", Dimension.Length, "finite number", "um")]
    [InlineData("inf", Dimension.None, "finite number", "3.9")]
    [InlineData("1e999 um", Dimension.Length, "finite number", "um")]
    [InlineData("0x10 um", Dimension.Length, "not a unit", "um")]
    [InlineData("75 um +8/+5", Dimension.Length, "one + and one -", "+8/-5")]
    [InlineData("75 um ±-8", Dimension.Length, "negative", "without a sign")]
    [InlineData("75 um uniform", Dimension.Length, "no tolerance", "±10 %")]
    [InlineData("75 um ±8 ps", Dimension.Length, "is a time", "um")]
    [InlineData("75 KM/S", Dimension.Length, "not a unit", "um")]
    [InlineData("5 UH/m", Dimension.InductancePerLength, "not a unit", "did you mean 'uH/m'")]
    [InlineData("5 KOHM", Dimension.Resistance, "not a unit", "did you mean 'kohm'")]
    [InlineData("1,234.5 um", Dimension.Length, "comma", "thousands")]
    [InlineData("1_000 um", Dimension.Length, "not a unit", "um")]
    [InlineData("1 000 um", Dimension.Length, "not a unit", "um")]
    [InlineData("1.2.3 um", Dimension.Length, "finite number", "um")]
    [InlineData("-inf um", Dimension.Length, "finite number", "um")]
    [InlineData("1e308 Tohm", Dimension.Resistance, "too large", "ohm")]
    [InlineData("٧٥ um", Dimension.Length, "finite number", "um")]
    [InlineData("±8 um", Dimension.Length, "a tolerance without a value", "write the value before it")]
    [InlineData("75 um ±", Dimension.Length, "a number is missing", "um")]
    [InlineData("75 um +8", Dimension.Length, "'+8' is not understood", "+8/-5 um")]
    [InlineData("75 um ±1,5 %", Dimension.Length, "comma", "decimal point")]
    [InlineData("75 um ±NaN", Dimension.Length, "finite number", "um")]
    [InlineData("uniform", Dimension.Length, "a number is missing", "um")]
    [InlineData("5 ps/kg", Dimension.TimePerLength, "not a unit", "ps/mm")]
    [InlineData("5 ps/s", Dimension.TimePerLength, "not a unit", "ps/mm")]
    [InlineData("5 nH", Dimension.InductancePerLength, "is an inductance, not an inductance per length", "nH/m")]
    public void Refuses_with_reason_and_advice(string text, Dimension dimension, string problem, string advice)
    {
        Assert.False(QuantityParser.TryParse(text, dimension, DefaultUnits.None, out _, out var said, out var proposed));
        Assert.Contains(problem, said);
        Assert.Contains(advice, proposed);
    }

    [Fact]
    public void A_tolerance_of_parts_per_million_is_a_share_of_the_value()
    {
        Assert.True(QuantityParser.TryParse("25 MHz ±50 ppm", Dimension.Frequency, DefaultUnits.None, out var quantity, out _, out _));
        Assert.Equal(1250, quantity.Tolerance.Plus, 1e-9);
    }

    [Fact]
    public void The_solidus_of_a_unit_does_not_part_the_bounds()
    {
        Assert.True(QuantityParser.TryParse("6 ps/mm +1 ps/mm/-2 ps/mm", Dimension.TimePerLength, DefaultUnits.None, out var quantity, out _, out _));
        Assert.Equal(2e-9, quantity.Tolerance.Minus, 1e-20);
        Assert.Equal(1e-9, quantity.Tolerance.Plus, 1e-20);
    }

    [Fact]
    public void A_unit_that_stands_behind_the_tolerance_only_is_refused_where_the_default_differs()
    {
        var millimetres = new DefaultUnits(DefaultUnits.None.Factors.Add(Dimension.Length, 1e-3));
        Assert.False(QuantityParser.TryParse("75 ±8 um", Dimension.Length, millimetres, out _, out var problem, out var advice));
        Assert.Equal("'75 ±8 um' gives its unit to the tolerance only", problem);
        Assert.Equal("write the unit after the value too, such as 75 um ±8 um", advice);
        Assert.True(QuantityParser.TryParse("0.75 ±0.1 mm", Dimension.Length, millimetres, out _, out _, out _));
    }

    [Theory]
    [InlineData("20 um", 20e-6, 20e-6, Spread.ThreeSigma)]
    [InlineData("±20 um", 20e-6, 20e-6, Spread.ThreeSigma)]
    [InlineData("+/- 20 um uniform", 20e-6, 20e-6, Spread.Uniform)]
    [InlineData("+5/-20 um limits", 20e-6, 5e-6, Spread.Limits)]
    [InlineData("-20/+5 um", 20e-6, 5e-6, Spread.ThreeSigma)]
    public void Reads_tolerances_that_stand_alone(string text, double minus, double plus, Spread spread)
    {
        Assert.True(QuantityParser.TryParseTolerance(text, Dimension.Length, DefaultUnits.None, out var tolerance, out var problem, out _), problem);
        Assert.Equal(minus, tolerance.Minus, 1e-15);
        Assert.Equal(plus, tolerance.Plus, 1e-15);
        Assert.Equal(spread, tolerance.Spread);
    }

    [Theory]
    [InlineData("", "is empty")]
    [InlineData("±20", "in absolute terms")]
    [InlineData("±20 %", "in absolute terms")]
    [InlineData("20", "no unit")]
    [InlineData("20 ps", "is a time")]
    [InlineData("-20 um", "negative")]
    [InlineData("+20 um", "not understood")]
    public void Refuses_tolerances_that_say_too_little(string text, string expected)
    {
        Assert.False(QuantityParser.TryParseTolerance(text, Dimension.Length, DefaultUnits.None, out _, out var problem, out var advice));
        Assert.Contains(expected, problem);
        Assert.NotEmpty(advice);
    }

    [Fact]
    public void Every_unit_that_advice_proposes_is_read()
    {
        foreach (var dimension in Enum.GetValues<Dimension>())
        {
            foreach (var unit in DimensionWords.Units(dimension))
                Assert.True(QuantityParser.TryParse("75 " + unit, dimension, DefaultUnits.None, out _, out var problem, out _), problem);
        }
    }

    [Fact]
    public void A_percentage_and_its_distance_are_the_same_tolerance()
    {
        Gen.Select(Gen.Int[-5000, 5000], Gen.Int[0, 90]).Sample((tenths, percent) =>
        {
            var text = System.FormattableString.Invariant($"{tenths / 10.0} mm");
            Assert.True(QuantityParser.TryParse($"{text} ±{percent} %", Dimension.Length, DefaultUnits.None, out var relative, out _, out _));
            var distance = System.FormattableString.Invariant($"{Math.Abs(tenths) / 10.0 * percent / 100}");
            Assert.True(QuantityParser.TryParse($"{text} +/- {distance} mm", Dimension.Length, DefaultUnits.None, out var absolute, out var problem, out _), problem);
            Assert.Equal(absolute.Tolerance.Plus, relative.Tolerance.Plus, 1e-12);
            Assert.True(relative.Lowest <= relative.Value && relative.Value <= relative.Highest);
        });
    }

    [Fact]
    public void Written_quantities_read_back_to_the_digits_written()
    {
        Gen.Double[1e-14, 1e11].Sample(value =>
        {
            var text = QuantityFormat.Engineering(value, "s", 9);
            Assert.True(QuantityParser.TryParse(text, Dimension.Time, DefaultUnits.None, out var back, out var problem, out _), text + problem);
            Assert.Equal(value, back.Value, value * 1e-8);
        });
    }

    [Fact]
    public void Never_throws_on_any_text()
    {
        Gen.String[Gen.Char["0123456789.eE+-±/% umsVohm\u00b5ΩNaif,x"], 0, 40].Sample(text =>
        {
            foreach (var dimension in Enum.GetValues<Dimension>())
            {
                var read = QuantityParser.TryParse(text, dimension, DefaultUnits.None, out var quantity, out var problem, out _);
                Assert.True(read ? double.IsFinite(quantity.Value) : problem.Length > 0);
            }
        }, iter: 2000);
    }

    [Theory]
    [InlineData(41.23e-12, "s", 3, "41.2 ps")]
    [InlineData(999.96e-12, "s", 4, "1.000 ns")]
    [InlineData(50, "Ω", 4, "50.00 Ω")]
    [InlineData(0, "V", 3, "0 V")]
    [InlineData(-0.05, "V", 2, "-50 mV")]
    [InlineData(-0.0, "V", 2, "0 V")]
    [InlineData(1e-4, "m", 4, "100.0 µm")]
    [InlineData(1.6e-3, "m", 2, "1.6 mm")]
    [InlineData(2.5e9, "Hz", 2, "2.5 GHz")]
    [InlineData(1e18, "Hz", 3, "1000000 THz")]
    [InlineData(3e-18, "F", 2, "0.0030 fF")]
    public void Formats_in_the_units_of_the_trade(double value, string unit, int digits, string expected) =>
        Assert.Equal(expected, QuantityFormat.Engineering(value, unit, digits));
}
