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
    public void Refuses_with_reason_and_advice(string text, Dimension dimension, string problem, string advice)
    {
        Assert.False(QuantityParser.TryParse(text, dimension, DefaultUnits.None, out _, out var said, out var proposed));
        Assert.Contains(problem, said);
        Assert.Contains(advice, proposed);
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
    public void Formats_in_the_units_of_the_trade(double value, string unit, int digits, string expected) =>
        Assert.Equal(expected, QuantityFormat.Engineering(value, unit, digits));
}
