using System.Collections.Immutable;
using System.Globalization;
using StackTiming.Lines.FieldMaps;
using StackTiming.Lines.Fields;
using StackTiming.Lines.Fields.Currents;
using StackTiming.Lines.Sections;
using StackTiming.Lines.Solutions;

namespace StackTiming.Reports.Figures;

/// <summary>The picture of a solved section under its usual drive: 1 V on a single signal, ±1/2 V on a pair, 1 V on the first of more.</summary>
public static class SectionPictures
{
    /// <summary>Columns of the maps in a picture that has a page or a screen to itself.</summary>
    public const int FineColumns = 300;

    /// <summary>The picture.</summary>
    /// <param name="name">What the section is called.</param>
    /// <param name="solution">The solved section.</param>
    /// <param name="columns">Columns of the maps; the time that they take grows with the square.</param>
    public static SectionPicture Of(string name, FieldSolution solution, int columns = FineColumns)
    {
        var section = solution.Section;
        var names = solution.Line.Signals;
        double[] volts = names.Length == 2 ? [0.5, -0.5] : [1, .. Enumerable.Repeat(0.0, names.Length - 1)];
        double[] amperes = names.Length == 2 ? [1, -1] : [1, .. Enumerable.Repeat(0.0, names.Length - 1)];
        var window = Window(section);
        var rows = Math.Clamp((int)Math.Round(columns * (window.Top - window.Bottom) / (window.Right - window.Left)), 40, 400);
        var map = FieldMap.Of(solution, volts, window, columns, rows);
        FieldGrid Grid(double[] values) => new(map.Columns, map.Rows, values);
        return new SectionPicture(
            $"{name}: {Impedance(solution.Line)}",
            "Drive " + string.Join(", ", names.Select((n, i) => $"{n} {Volts(volts[i])}")) + "; planes and grounded conductors 0 V; forward wave; field solver, a prediction",
            Outline(section, window, volts),
            Grid(map.PotentialVolts), Grid(map.EnergyJoulePerCubicMetre), Grid(map.PowerWattPerSquareMetre),
            Charges(solution, volts), Returns(solution, amperes),
            string.Join(", ", names.Select((n, i) => (Name: n, Current: amperes[i])).Where(s => s.Current != 0).Select(s => $"{s.Name} {Signed(s.Current)} A")));
    }

    // The signals with two and a half times their height over the nearest plane on each side, and the air over an open face.
    private static MapWindow Window(CrossSection section)
    {
        var signals = section.Signals.ToArray();
        double left = signals.Min(s => s.CentreMetres - s.WideMetres / 2), right = signals.Max(s => s.CentreMetres + s.WideMetres / 2);
        double low = section.Conductors.Min(c => c.BottomMetres), high = section.Conductors.Max(c => c.TopMetres);
        var widest = signals.Max(s => s.WideMetres);
        var distance = Math.Max(
            widest / 2, Math.Min(low - section.BottomPlaneMetres ?? double.PositiveInfinity, section.TopPlaneMetres - high ?? double.PositiveInfinity) is var d && double.IsFinite(d) ? d : widest);
        var side = 2.5 * distance;
        (left, right) = (left - side, right + side);
        var slabs = section.Slabs;
        var bottom = section.BottomPlaneMetres ?? Math.Max(slabs.IsEmpty ? low : Math.Min(low, slabs[0].BottomMetres), low - distance) - 1.2 * distance;
        var top = section.TopPlaneMetres ?? high + 1.6 * distance;
        // A window much flatter than it is wide has no room for lines; one much taller leaves none on the page.
        var metal = 0.04 * (top - bottom);
        (bottom, top) = (bottom - (section.BottomPlaneMetres is null ? 0 : metal), top + (section.TopPlaneMetres is null ? 0 : metal));
        var least = (top - bottom) / 0.9;
        if (right - left < least)
            (left, right) = ((left + right - least) / 2, (left + right + least) / 2);
        return new MapWindow(left, bottom, right, top);
    }

    private static SectionOutline Outline(CrossSection section, MapWindow window, double[] volts)
    {
        var areas = ImmutableArray.CreateBuilder<DielectricArea>();
        foreach (var slab in section.Slabs)
            areas.Add(Area(slab.Dielectric, Box(window, slab.BottomMetres, slab.TopMetres)));
        if (section.TopMask is { } topMask && !section.Slabs.IsEmpty)
            AddMask(areas, topMask, section, window, section.Slabs[^1].TopMetres, 1);
        if (section.BottomMask is { } bottomMask && !section.Slabs.IsEmpty)
            AddMask(areas, bottomMask, section, window, section.Slabs[0].BottomMetres, -1);
        var conductors = ImmutableArray.CreateBuilder<ConductorShape>();
        var signal = 0;
        foreach (var c in section.Conductors)
        {
            conductors.Add(new ConductorShape(
                c.Name, Volts(c.Grounded ? 0 : volts[signal]),
                Corners(c.CentreMetres, c.BottomMetres, c.LowerWidthMetres / 2, c.TopMetres, c.UpperWidthMetres / 2)));
            signal += c.Grounded ? 0 : 1;
        }
        var planes = ImmutableArray.CreateBuilder<(double, bool)>();
        if (section.BottomPlaneMetres is { } below)
            planes.Add((below, false));
        if (section.TopPlaneMetres is { } above)
            planes.Add((above, true));
        return new SectionOutline(window.Left, window.Bottom, window.Right, window.Top, areas.ToImmutable(), conductors.ToImmutable(), planes.ToImmutable());
    }

    // Mask over laminate, then mask round each conductor that stands on it, one over the other: they merge as they are of one colour.
    private static void AddMask(
        ImmutableArray<DielectricArea>.Builder areas, SectionMask mask, CrossSection section, MapWindow window, double face, int side)
    {
        foreach (var c in section.Conductors)
        {
            var far = side > 0 ? c.TopMetres : c.BottomMetres;
            if (side * (far - face) < 0)
                continue;
            var (near, head) = side > 0 ? (c.LowerWidthMetres, c.UpperWidthMetres) : (c.UpperWidthMetres, c.LowerWidthMetres);
            var corners = Corners(c.CentreMetres, face, near / 2 + mask.OverCopperMetres, far + side * mask.OverCopperMetres, head / 2 + mask.OverCopperMetres);
            areas.Add(Area(mask.Dielectric, corners) with { Name = "" });
        }
        var over = face + side * mask.OverLaminateMetres;
        areas.Add(Area(mask.Dielectric, Box(window, Math.Min(face, over), Math.Max(face, over))));
    }

    private static DielectricArea Area(SectionDielectric dielectric, ImmutableArray<(double, double)> corners) => new(
        string.Create(CultureInfo.InvariantCulture, $"{dielectric.Name}, Dk {dielectric.Dk:0.00}"), dielectric.Dk, corners);

    private static ImmutableArray<(double, double)> Box(MapWindow window, double bottom, double top)
    {
        // A little beyond the window, so that no edge shows at its sides.
        var beyond = 0.1 * (window.Right - window.Left);
        return [(window.Left - beyond, bottom), (window.Right + beyond, bottom), (window.Right + beyond, top), (window.Left - beyond, top)];
    }

    private static ImmutableArray<(double, double)> Corners(double centre, double foot, double footHalf, double head, double headHalf) =>
        [(centre - footHalf, foot), (centre + footHalf, foot), (centre + headHalf, head), (centre - headHalf, head)];

    private static ImmutableArray<ChargedFace> Charges(FieldSolution solution, double[] volts)
    {
        var faces = ImmutableArray.CreateBuilder<ChargedFace>();
        var conductors = solution.Section.Conductors.ToDictionary(c => c.Name);
        foreach (var charge in solution.SurfaceCharges(volts))
        {
            if (charge.Conductor is null)
                continue;
            var of = conductors[charge.Conductor];
            double dx = charge.XMetres[^1] - charge.XMetres[0], dy = charge.YMetres[^1] - charge.YMetres[0];
            var length = Math.Sqrt(dx * dx + dy * dy);
            var (nx, ny) = (dy / length, -dx / length);
            var (ox, oy) = (charge.XMetres[0] - of.CentreMetres, charge.YMetres[0] - (of.BottomMetres + of.TopMetres) / 2);
            // A strip without thickness has one face for both of its sides: its charge stands upwards.
            var outward = of.ThicknessMetres == 0 ? Math.Sign(ny) : nx * ox + ny * oy >= 0 ? 1 : -1;
            faces.Add(new ChargedFace(charge.XMetres, charge.YMetres, outward * nx, outward * ny, charge.TotalCoulombPerSquareMetre));
        }
        return faces.ToImmutable();
    }

    private static ImmutableArray<PlaneCurrent> Returns(FieldSolution solution, double[] amperes)
    {
        var planes = ImmutableArray.CreateBuilder<PlaneCurrent>();
        foreach (var (name, height) in new[] { ("plane below", solution.Section.BottomPlaneMetres), ("plane above", solution.Section.TopPlaneMetres) })
        {
            if (height is not { } plane)
                continue;
            var current = ReturnCurrent.InPlane(solution, plane, amperes);
            planes.Add(new PlaneCurrent(name, current.XMetres, current.DensityAmperePerMetre, current.LowMetres, current.HighMetres, current.TotalAmperes));
        }
        return planes.ToImmutable();
    }

    private static string Impedance(LineSolution line) => line.Signals.Length switch
    {
        1 => string.Create(CultureInfo.InvariantCulture, $"Z0 {line.Z0Ohms:0.0} Ω"),
        2 => string.Create(CultureInfo.InvariantCulture, $"Zdiff {PairModes.Of(line).ZDiffOhms:0.0} Ω"),
        _ => $"{line.Signals.Length} signals",
    };

    private static string Volts(double volts) => Signed(volts) + " V";

    private static string Signed(double value) => value.ToString("+0.##;−0.##;0", CultureInfo.InvariantCulture);
}
