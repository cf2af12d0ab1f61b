using System.Collections.Immutable;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Lines.Methods;

/// <summary>
/// The share of the field energy in each dielectric, from how the effective permittivity answers to each: share_i = (ε_i/ε_eff)·∂ε_eff/∂ε_i,
/// which is exact because the energy is stationary under small changes of the field.
/// </summary>
internal static class EnergyShares
{
    private const double RelativeStep = 1e-4;

    /// <summary>Shares by central differences, normalised to a sum of 1.</summary>
    /// <param name="dielectrics">The dielectrics.</param>
    /// <param name="epsEff">Effective permittivity, or anything proportional to it, as a function of the permittivities in the same order.</param>
    public static ImmutableArray<DielectricShare> FromPermittivity(ReadOnlySpan<SectionDielectric> dielectrics, Func<double[], double> epsEff)
    {
        var dks = new double[dielectrics.Length];
        for (var i = 0; i < dks.Length; i++)
            dks[i] = dielectrics[i].Dk;
        var shares = new double[dks.Length];
        var sum = 0.0;
        for (var i = 0; i < dks.Length; i++)
        {
            var stated = dks[i];
            dks[i] = stated * (1 + RelativeStep);
            var above = epsEff(dks);
            dks[i] = stated * (1 - RelativeStep);
            var below = epsEff(dks);
            dks[i] = stated;
            sum += shares[i] = Math.Max(0, (above - below) / (RelativeStep * (above + below)));
        }
        var result = ImmutableArray.CreateBuilder<DielectricShare>(dks.Length);
        for (var i = 0; i < dks.Length; i++)
            result.Add(new DielectricShare(dielectrics[i].Name, shares[i] / sum));
        return result.MoveToImmutable();
    }
}
