using StackTiming.Lines.Sections;
using StackTiming.Lines.Stripline;
using Xunit;

namespace StackTiming.Lines.Tests.Stripline;

public sealed class Wheeler1978Tests
{
    [Fact]
    public void Thin_strips_agree_with_Cohn_1954_within_the_stated_error()
    {
        foreach (var row in ReferenceSections.AnalyticRows("stripline_thin"))
            Assert.Equal(1, Wheeler1978.Z0Ohms(row["w_over_b"], 1, 0, 1) / row["z0_sqrt_er"], 0.005);
    }

    [Fact]
    public void Partition_of_a_centred_line_is_the_line_itself()
    {
        var section = ReferenceSections.Named("F4_stripline_sym").Section;
        var trace = section.Conductors[0];

        var solution = new Wheeler1978().Calculate(section);

        Assert.Equal(Wheeler1978.Z0Ohms(trace.WideMetres, section.TopPlaneMetres!.Value, trace.ThicknessMetres, 3.9), solution.Z0Ohms, 9);
        Assert.Equal(3.9, solution.EpsEff, 9);
    }

    [Fact]
    public void Line_far_off_the_middle_is_flagged()
    {
        var section = ReferenceSections.Named("F4_stripline_sym").Section;
        var low = section with { Conductors = [section.Conductors[0] with { BottomMetres = 0.03e-3 }] };

        Assert.Contains(new Wheeler1978().Calculate(low).Warnings, w => w.Contains("farther plane", StringComparison.Ordinal));
        Assert.False(new Wheeler1978().Suits(low));
    }
}
