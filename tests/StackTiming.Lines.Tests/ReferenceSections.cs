using System.Collections.Immutable;
using System.Text.Json;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Tests;

/// <summary>A cross-section with results that this project did not produce (tests/references/sections).</summary>
/// <param name="Name">Name of the case.</param>
/// <param name="Family">Family of geometries that it belongs to.</param>
/// <param name="Section">The geometry in metres; dielectrics without loss.</param>
/// <param name="Capacitance">Maxwell capacitance matrix, F/m.</param>
/// <param name="Inductance">Inductance matrix, H/m.</param>
/// <param name="Impedances">
/// By the names of the file: z0, or z_odd, z_even, z_diff, z_common; ohm. Empty for three signals and more.
/// </param>
/// <param name="EpsEff">By the names of the file: eps_eff, or eps_eff_odd and eps_eff_even.</param>
/// <param name="EnergyShares">Share of the energy by dielectric name; empty where the file gives none.</param>
/// <param name="RelativeError">
/// Largest error estimate of the file (the mesh figure is of a coarser mesh than the results and is left out).
/// </param>
public sealed record ReferenceSection(
    string Name,
    string Family,
    CrossSection Section,
    double[,] Capacitance,
    double[,] Inductance,
    ImmutableSortedDictionary<string, double> Impedances,
    ImmutableSortedDictionary<string, double> EpsEff,
    ImmutableSortedDictionary<string, double> EnergyShares,
    double RelativeError)
{
    public override string ToString() => Name;
}

/// <summary>
/// Reads the reference cross-sections. Sections with round conductors (coaxial, wires) are not cross-sections of a board and are left
/// out.
/// </summary>
public static class ReferenceSections
{
    private const double Millimetre = 1e-3;

    /// <summary>The folder that holds the copies of the reference files.</summary>
    public static string Folder { get; } = Path.Combine(RepositoryRoot(), "tests", "references", "sections");

    /// <summary>Board-like sections solved by an independent finite-element code.</summary>
    public static IReadOnlyList<ReferenceSection> FiniteElement { get; } = ReadFolder("visible");

    /// <summary>Sections with an exact solution.</summary>
    public static IReadOnlyList<ReferenceSection> Exact { get; } = ReadFolder("exact");

    /// <summary>Every reference section, exact ones last.</summary>
    public static IReadOnlyList<ReferenceSection> All { get; } = [.. FiniteElement, .. Exact];

    /// <summary>The case of this name.</summary>
    public static ReferenceSection Named(string name) => All.Single(r => r.Name == name);

    /// <summary>The rows of a table of exact/analytic.json: column name to value.</summary>
    public static IReadOnlyList<ImmutableSortedDictionary<string, double>> AnalyticRows(string table)
    {
        using var document = JsonDocument.Parse(File.ReadAllText(Path.Combine(Folder, "exact", "analytic.json")));
        return [.. document.RootElement.GetProperty(table).GetProperty("rows").EnumerateArray().Select(Numbers)];
    }

    private static ReferenceSection[] ReadFolder(string folder) =>
    [
        .. Directory.GetFiles(Path.Combine(Folder, folder), "*.json")
            .Where(f => Path.GetFileName(f) != "analytic.json")
            .OrderBy(f => f, StringComparer.Ordinal)
            .Select(Read)
            .OfType<ReferenceSection>()
    ];

    private static ReferenceSection? Read(string file)
    {
        using var document = JsonDocument.Parse(File.ReadAllText(file));
        var root = document.RootElement;
        if (Section(root) is not { } section)
            return null;
        var results = root.GetProperty("results");
        var shares = results.TryGetProperty("energy_fraction", out var fractions)
            ? Numbers(fractions)
            : ImmutableSortedDictionary<string, double>.Empty;
        return new ReferenceSection(
            root.GetProperty("name").GetString()!,
            root.GetProperty("family").GetString()!,
            section,
            Matrix(results.GetProperty("C")),
            Matrix(results.GetProperty("L")),
            Starting(results, "z"),
            Starting(results, "eps_eff"),
            shares,
            RelativeError(root.GetProperty("error_estimate_rel")));
    }

    private static CrossSection? Section(JsonElement root)
    {
        var metal = new SectionMetal(1.7241e-8, 0);
        if (root.TryGetProperty("shape", out var shape))
            return shape.GetString() == "cpw" ? WideCoplanar(root, metal) : null;
        var slabs = root.GetProperty("layers").EnumerateArray().Where(l =>
            Optional(l, "y_top") is not null).Select(Slab).ToImmutableArray();
        var planes = root.GetProperty("planes");
        var (bottom, top) = planes.ValueKind == JsonValueKind.Array
            ? (Optional(planes[0]), Optional(planes[1]))
            : (Optional(planes.GetProperty("bottom")), Optional(planes.GetProperty("top")));
        var conductors = root.GetProperty("conductors").EnumerateArray().Select(Conductor).ToImmutableArray();
        return new CrossSection(slabs, bottom * Millimetre, top * Millimetre, conductors, Mask(root.GetProperty("mask")), null, metal);
    }

    private static DielectricSlab Slab(JsonElement layer) => new(
        new SectionDielectric(layer.GetProperty("name").GetString()!, layer.GetProperty("eps").GetDouble(), 0),
        Metres(layer, "y_bottom"),
        Metres(layer, "y_top"));

    private static SectionConductor Conductor(JsonElement c) => new(
        c.GetProperty("name").GetString()!,
        c.GetProperty("role").GetString() == "ground",
        Metres(c, "x_center"),
        Metres(c, "w_base"),
        Metres(c, "w_top"),
        Metres(c, "t"),
        Metres(c, "y0"),
        c.GetProperty("base_side").GetString() == "down");

    private static SectionMask? Mask(JsonElement mask) => mask.ValueKind == JsonValueKind.Null
        ? null
        : new SectionMask(new SectionDielectric("mask", mask.GetProperty("eps").GetDouble(), 0), Metres(mask, "m_lam"),
            Metres(mask, "m_cu"));

    /// <summary>
    /// A coplanar line as a section can hold it: the infinite grounds and the infinite substrate become 2000 times as large as the slot
    /// region. The ground's missing outer part changes the capacitance by about the square of that ratio.
    /// </summary>
    private static CrossSection WideCoplanar(JsonElement root, SectionMetal metal)
    {
        var (width, gap) = (Metres(root, "width"), Metres(root, "gap"));
        var (eps, span) = (root.GetProperty("eps").GetDouble(), 2000 * (width + 2 * gap));
        var ground = new SectionConductor("g1", true, -(width / 2 + gap + span / 2), span, span, 0, 0, true);
        return new CrossSection(
            [new DielectricSlab(new SectionDielectric("substrate", eps, 0), -span, 0)],
            null,
            null,
            [new SectionConductor("a", false, 0, width, width, 0, 0, true), ground,
                ground with { Name = "g2", CentreMetres = -ground.CentreMetres }],
            null,
            null,
            metal);
    }

    private static double Metres(JsonElement element, string name) => element.GetProperty(name).GetDouble() * Millimetre;

    private static double? Optional(JsonElement element, string name) => Optional(element.GetProperty(name));

    private static double? Optional(JsonElement element) => element.ValueKind == JsonValueKind.Null ? null : element.GetDouble();

    private static double[,] Matrix(JsonElement element)
    {
        if (element.ValueKind == JsonValueKind.Number)
            return new[,] { { element.GetDouble() } };
        var n = element.GetArrayLength();
        var matrix = new double[n, n];
        for (var i = 0; i < n; i++)
        {
            for (var j = 0; j < n; j++)
                matrix[i, j] = element[i][j].GetDouble();
        }

        return matrix;
    }

    private static ImmutableSortedDictionary<string, double> Numbers(JsonElement element) =>
        element.EnumerateObject().ToImmutableSortedDictionary(p => p.Name, p => p.Value.GetDouble());

    private static ImmutableSortedDictionary<string, double> Starting(JsonElement results, string prefix) => results.EnumerateObject()
        .Where(p => p.Name.StartsWith(prefix, StringComparison.Ordinal))
        .ToImmutableSortedDictionary(p => p.Name, p => p.Value.GetDouble());

    private static double RelativeError(JsonElement error) => error.ValueKind == JsonValueKind.Number
        ? error.GetDouble()
        : Math.Max(error.GetProperty("extrapolation").GetDouble(), error.GetProperty("box").GetDouble());

    private static string RepositoryRoot()
    {
        for (var folder = new DirectoryInfo(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "StackTiming.sln")))
                return folder.FullName;
        }

        throw new DirectoryNotFoundException("No folder above the tests holds StackTiming.sln.");
    }
}
