using StackTiming.Lines.Handbook;
using Xunit;

namespace StackTiming.Lines.Tests.Handbook;

public sealed class Ipc2141Tests
{
    /// <summary>Handbook examples: w 8, h 5, t 1.4 mil, Dk 4.3 gives 48.92 ohm; w 5, b 12, t 0.7 mil, Dk 4.3 gives 45.69 ohm (design/standards.md 6.5).</summary>
    [Fact]
    public void Examples_of_the_handbook_are_met()
    {
        Assert.Equal(48.92, Ipc2141.Microstrip(8, 5, 1.4, 4.3).Z0Ohms, 2);
        Assert.Equal(45.69, Ipc2141.StriplineOhms(5, 12, 0.7, 4.3), 2);
    }

    [Fact]
    public void Wide_stripline_is_flagged()
    {
        var section = ReferenceSections.Named("h_stripline_thick_1").Section;

        Assert.Contains(new Ipc2141().Calculate(section).Warnings, w => w.Contains("above the 0.35", StringComparison.Ordinal));
        Assert.False(new Ipc2141().Suits(section));
    }
}
