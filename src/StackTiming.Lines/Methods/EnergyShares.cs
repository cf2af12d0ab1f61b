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
    private const double Negligible = 1e-6;

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
        return ByName(dielectrics, Array.ConvertAll(shares, s => s / sum));
    }

    /// <summary>Shares by name: materials of the same name add up, and those without any energy are left out.</summary>
    /// <param name="dielectrics">The dielectrics.</param>
    /// <param name="shares">Their shares.</param>
    public static ImmutableArray<DielectricShare> ByName(ReadOnlySpan<SectionDielectric> dielectrics, ReadOnlySpan<double> shares)
    {
        var result = ImmutableArray.CreateBuilder<DielectricShare>(dielectrics.Length);
        for (var i = 0; i < dielectrics.Length; i++)
        {
            if (shares[i] < Negligible)
                continue;
            var name = dielectrics[i].Name;
            var known = IndexOf(result, name);
            if (known < 0)
                result.Add(new DielectricShare(name, shares[i]));
            else
                result[known] = result[known] with { Share = result[known].Share + shares[i] };
        }
        return result.ToImmutable();
    }

    private static int IndexOf(ImmutableArray<DielectricShare>.Builder shares, string name)
    {
        for (var i = 0; i < shares.Count; i++)
        {
            if (shares[i].Dielectric == name)
                return i;
        }
        return -1;
    }
}
