using StackTiming.Lines.Methods;
using StackTiming.Lines.Solutions;
using Xunit;

namespace StackTiming.Lines.Tests.Methods;

/// <summary>The preferred closed form of every geometry against the independent references, to the limits of the design: 1 % for bare microstrip and thin stripline, 2 % otherwise.</summary>
public sealed class ClosedFormsTests
{
    public static TheoryData<string> Cases() => [.. ReferenceSections.All.Select(r => r.Name)];

    [Theory]
    [MemberData(nameof(Cases))]
    public void Impedance_and_permittivity_agree_with_the_references(string name)
    {
        var reference = ReferenceSections.Named(name);
        var solution = ClosedForms.Calculate(reference.Section);
        Assert.NotNull(solution);
        var thinOrBare = name[1] == '_' || name is "F1_microstrip_bare" or "F4_stripline_sym";
        var limit = thinOrBare ? 0.01 : 0.02;
        foreach (var (what, expected, actual) in ReferenceComparison.Values(reference, solution))
            Assert.True(Math.Abs(actual / expected - 1) <= limit, $"{what}: {actual} instead of {expected}");
    }

    [Theory]
    [InlineData("F3_embedded", 0.002)]
    [InlineData("F5_stripline_offset_2d", 0.002)]
    [InlineData("F6_stripline_3d", 0.002)]
    [InlineData("F8_pair_stripline_2d", 0.002)]
    [InlineData("F9_broadside", 0.002)]
    [InlineData("F11_pair_coplanar", 0.002)]
    [InlineData("F1_microstrip_bare", 0.005)]
    [InlineData("F2_microstrip_mask", 0.02)]
    [InlineData("F7_pair_microstrip_mask", 0.04)]
    [InlineData("F10_coplanar_mask", 0.02)]
    public void Energy_shares_agree_with_the_references(string name, double limit)
    {
        var reference = ReferenceSections.Named(name);
        var solution = ClosedForms.Calculate(reference.Section)!;

        Assert.Equal(1, solution.EnergyShares.Sum(s => s.Share), 12);
        foreach (var (dielectric, share) in reference.EnergyShares)
            Assert.Equal(share, solution.EnergyShares.SingleOrDefault(s => s.Dielectric == dielectric).Share, limit);
    }

    [Fact]
    public void Section_without_a_plane_is_declined_with_its_reason()
    {
        var section = ReferenceSections.Named("F1_microstrip_bare").Section with { BottomPlaneMetres = null };

        Assert.Null(ClosedForms.Calculate(section));
        Assert.NotNull(ClosedForms.Calculator.Objection(section));
    }
}
