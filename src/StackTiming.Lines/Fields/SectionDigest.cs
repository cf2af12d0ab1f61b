using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields;

/// <summary>The digest of everything that a solution of a cross-section depends on: two sections with one digest have one solution.</summary>
public static class SectionDigest
{
    /// <summary>SHA-256 of the section in lower-case hexadecimal.</summary>
    /// <param name="section">The section.</param>
    /// <param name="solver">What solves it, with its version and tolerance.</param>
    public static string Of(CrossSection section, string solver)
    {
        var text = new StringBuilder(solver).Append('\n');
        foreach (var slab in section.Slabs)
            Add(text.Append("slab "), slab.Dielectric).Append(Exact(slab.BottomMetres)).Append(Exact(slab.TopMetres)).Append('\n');
        text.Append("planes ").Append(Exact(section.BottomPlaneMetres)).Append(Exact(section.TopPlaneMetres)).Append('\n');
        foreach (var c in section.Conductors)
        {
            text.Append(c.Grounded ? "ground " : "signal ").Append(Quoted(c.Name)).Append(Exact(c.CentreMetres)).Append(Exact(c.WideMetres)).Append(Exact(c.NarrowMetres))
                .Append(Exact(c.ThicknessMetres)).Append(Exact(c.BottomMetres)).Append(c.WideFaceDown ? "down\n" : "up\n");
        }
        foreach (var mask in new[] { section.TopMask, section.BottomMask })
        {
            text.Append("mask ");
            if (mask is not null)
                Add(text, mask.Dielectric).Append(Exact(mask.OverLaminateMetres)).Append(Exact(mask.OverCopperMetres));
            text.Append('\n');
        }
        return Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(text.ToString())));
    }

    private static StringBuilder Add(StringBuilder text, SectionDielectric dielectric) =>
        text.Append(Quoted(dielectric.Name)).Append(Exact(dielectric.Dk)).Append(Exact(dielectric.Df));

    // The bits, so that no rounding joins different sections.
    private static string Exact(double? value) =>
        value is { } v ? BitConverter.DoubleToInt64Bits(v).ToString("x16", CultureInfo.InvariantCulture) + " " : "none ";

    private static string Quoted(string name) => name.Length.ToString(CultureInfo.InvariantCulture) + ":" + name + " ";
}
