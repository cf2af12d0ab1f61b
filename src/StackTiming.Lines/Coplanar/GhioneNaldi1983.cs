using StackTiming.Lines.Constants;
using StackTiming.Lines.Methods;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;
using StackTiming.Lines.Stripline;

namespace StackTiming.Lines.Coplanar;

/// <summary>
/// Thin trace between wide pours on one dielectric over a plane. G. Ghione, C. Naldi, "Parameters of coplanar waveguides with lower ground plane", Electronics Letters 19,
/// 1983, pp. 734–735. Conformal maps of the dielectric and of the air half-space, their border taken as a magnetic wall. Thin traces, pours wide against
/// the height; thickness and mask are left out. Lengths in any one unit.
/// </summary>
public sealed class GhioneNaldi1983 : IClosedForm
{
    /// <inheritdoc/>
    public LineMethod Method => MethodCatalogue.GhioneNaldi1983;

    /// <inheritdoc/>
    public string? Objection(CrossSection section) =>
        SectionGeometry.Of(section).Kind == SectionKind.Coplanar && section.Slabs.Length == 1 && CoplanarShape.Of(section) is { IsSymmetric: true }
            ? null
            : "it describes a trace between two like pours on one dielectric over a plane";

    /// <inheritdoc/>
    public bool Suits(CrossSection section) => false;

    /// <inheritdoc/>
    public LineSolution Calculate(CrossSection section)
    {
        var shape = CoplanarShape.Of(section)!.Value;
        var dielectric = section.Slabs[0].Dielectric;
        var height = section.Slabs[0].ThicknessMetres;
        var (z0, epsEff) = Line(shape.Width, shape.Gap, height, dielectric.Dk);
        var shares = EnergyShares.FromPermittivity(
            [dielectric, SectionDielectric.Air], dks => Line(shape.Width, shape.Gap, height, dks[0] / dks[1]).EpsEff * dks[1]);
        var verdict = new Validity(Method)
            .AtMost("thickness / gap", shape.Thickness / shape.Gap, 0.02)
            .AtMost("mask thickness / gap", (section.TopMask?.OverLaminateMetres ?? 0) / shape.Gap, 0.001)
            .Within("pour width / height", shape.PourWidth / height, 2, double.PositiveInfinity);
        return Solved.Single(shape.Name, Method, z0, epsEff, shares, verdict.Warnings);
    }

    /// <summary>Characteristic impedance in ohm and effective permittivity.</summary>
    /// <param name="width">Width w of the trace.</param>
    /// <param name="gap">Gap to either pour.</param>
    /// <param name="height">Height h of the dielectric.</param>
    /// <param name="dk">Relative permittivity.</param>
    public static (double Z0Ohms, double EpsEff) Line(double width, double gap, double height, double dk)
    {
        var whole = width + 2 * gap;
        var k = width / whole;
        var above = 1 / CompleteEllipticIntegral.ComplementRatio(k, 2 * Math.Sqrt(gap * (width + gap)) / whole);
        var x = 0.25 * Math.PI / height;
        var k3 = Math.Tanh(x * width) / Math.Tanh(x * whole);
        var below = 1 / CompleteEllipticIntegral.ComplementRatio(k3, Math.Sqrt((1 - k3) * (1 + k3)));
        var epsEff = (above + dk * below) / (above + below);
        return (0.5 * Vacuum.Impedance / Math.Sqrt(epsEff) / (above + below), epsEff);
    }
}
