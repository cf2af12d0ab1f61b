using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Layered;

/// <summary>A cross-section over a plane as thin strips in flat layers.</summary>
internal sealed class LayeredSection
{
    private readonly double[] boundaries;
    private readonly (int Material, bool IsDiluted)[] fill;
    private readonly MaskCoating mask;
    private readonly (int First, int Second, double GapMetres)[] neighbours;
    private readonly StripCharges charges;

    /// <summary>The dielectrics that the capacitance depends on; air is the last.</summary>
    public SectionDielectric[] Dielectrics { get; }

    /// <summary>Flattens a section.</summary>
    /// <param name="section">A section with a bottom plane.</param>
    public LayeredSection(CrossSection section)
    {
        var bottom = section.BottomPlaneMetres!.Value;
        var conductors = section.Conductors;
        mask = MaskCoating.Of(section);
        boundaries = Boundaries(section, mask, bottom);
        neighbours = mask.Coats ? Neighbours(section) : [];
        Dielectrics = [.. section.Slabs.Select(s => s.Dielectric).Append(mask.Material).OfType<SectionDielectric>().Where(d => d != SectionDielectric.Air).Distinct(), SectionDielectric.Air];
        fill = new (int, bool)[boundaries.Length];
        var thickness = new double[boundaries.Length];
        for (var i = 0; i < boundaries.Length; i++)
        {
            var lower = i == 0 ? 0 : boundaries[i - 1];
            thickness[i] = boundaries[i] - lower;
            fill[i] = FillAt(section, bottom + 0.5 * (lower + boundaries[i]));
        }
        var even = conductors.All(c => c.CentreMetres == 0);
        var strips = StripModel.Strips(section, y => NodeAt(y - bottom), even);
        var highest = conductors.Max(c => c.BottomMetres) - bottom;
        charges = new StripCharges(
            new LayeredMedium(thickness, section.TopPlaneMetres is not null), strips, even, conductors.Length, EndWaveNumber(strips, section), highest);
    }

    /// <summary>Maxwell capacitance matrix of all conductors, F/m.</summary>
    /// <param name="dks">Relative permittivity of each of <see cref="Dielectrics"/>.</param>
    public double[,] Capacitance(ReadOnlySpan<double> dks)
    {
        var lone = charges.Capacitance(LayerDks(dks, mask.Share));
        if (neighbours.Length == 0)
            return lone;
        // Between neighbours more of the field runs through the coats of their walls than outside: the difference is a capacitance from one to the other.
        var result = (double[,])lone.Clone();
        double[,]? filled = null;
        var gapOfFilled = double.NaN;
        foreach (var (i, j, gap) in neighbours)
        {
            if (filled is null || Math.Abs(gap - gapOfFilled) > 1e-3 * gap)
                (filled, gapOfFilled) = (charges.Capacitance(LayerDks(dks, mask.GapShare(gap))), gap);
            var more = 0.25 * (Odd(filled, i, j) - Odd(lone, i, j));
            result[i, i] += more;
            result[j, j] += more;
            result[i, j] -= more;
            result[j, i] -= more;
        }
        return result;
    }

    /// <summary>Share of the field energy in each of <see cref="Dielectrics"/> when the conductors are at given voltages; they sum to 1.</summary>
    /// <param name="voltages">Voltage of each conductor.</param>
    /// <param name="differential">True where neighbours are driven against each other.</param>
    public double[] EnergyShares(double[] voltages, bool differential)
    {
        var dks = Array.ConvertAll(Dielectrics, d => d.Dk);
        var coating = differential && neighbours.Length > 0 ? mask.GapShare(neighbours[0].GapMetres) : mask.Share;
        var q = charges.ChargesAt(LayerDks(dks, coating), voltages);
        var shares = new double[dks.Length];
        var sum = 0.0;
        const double step = 1e-3;
        for (var i = 0; i < dks.Length; i++)
        {
            var stated = dks[i];
            dks[i] = stated * (1 - step);
            var below = LayerDks(dks, coating);
            dks[i] = stated * (1 + step);
            var above = LayerDks(dks, coating);
            dks[i] = stated;
            // The energy is stationary in the charges, so they may stay while one permittivity moves.
            sum += shares[i] = Math.Max(0, charges.Energy(below, q) - charges.Energy(above, q));
        }
        for (var i = 0; i < shares.Length; i++)
            shares[i] /= sum;
        return shares;
    }

    private static double Odd(double[,] c, int i, int j) => c[i, i] + c[j, j] - 2 * c[i, j];

    private double[] LayerDks(ReadOnlySpan<double> dks, double coatingShare)
    {
        // The space above the last layer is the last value.
        var layers = new double[fill.Length + 1];
        for (var i = 0; i < fill.Length; i++)
        {
            var share = fill[i].IsDiluted ? coatingShare : 1;
            layers[i] = share * dks[fill[i].Material] + (1 - share) * dks[^1];
        }
        layers[^1] = dks[^1];
        return layers;
    }

    private static double[] Boundaries(CrossSection section, MaskCoating mask, double bottom)
    {
        var heights = new SortedSet<double>();
        foreach (var slab in section.Slabs)
            heights.Add(slab.TopMetres - bottom);
        foreach (var y in mask.Tops)
            heights.Add(y - bottom);
        foreach (var c in section.Conductors)
        {
            foreach (var y in StripModel.Heights(c, StripModel.HeightOf(c, section)))
                heights.Add(y - bottom);
        }
        // The space under a top plane ends there, also where no slab fills it.
        if (section.TopPlaneMetres is { } top)
            heights.Add(top - bottom);
        var highest = section.TopPlaneMetres - bottom ?? heights.Max;
        var least = 1e-7 * highest;
        var merged = new List<double>();
        foreach (var y in heights)
        {
            if (y > least && y <= highest * (1 + 1e-9) && (merged.Count == 0 || y - merged[^1] > least))
                merged.Add(y);
        }
        return [.. merged];
    }

    private (int, bool) FillAt(CrossSection section, double y)
    {
        foreach (var slab in section.Slabs)
        {
            if (y > slab.BottomMetres && y < slab.TopMetres)
                return (Array.IndexOf(Dielectrics, slab.Dielectric), false);
        }
        for (var i = 0; i < mask.Tops.Length; i++)
        {
            if (y > mask.BottomMetres && y < mask.Tops[i])
                return (Array.IndexOf(Dielectrics, mask.Material), mask.IsDiluted[i]);
        }
        return (Dielectrics.Length - 1, false);
    }

    private int NodeAt(double y)
    {
        var best = 0;
        for (var i = 1; i < boundaries.Length; i++)
        {
            if (Math.Abs(boundaries[i] - y) < Math.Abs(boundaries[best] - y))
                best = i;
        }
        return best;
    }

    private static (int, int, double)[] Neighbours(CrossSection section)
    {
        var fromLeft = Enumerable.Range(0, section.Conductors.Length).OrderBy(i => section.Conductors[i].CentreMetres).ToArray();
        var result = new List<(int, int, double)>();
        for (var k = 1; k < fromLeft.Length; k++)
        {
            var (left, right) = (section.Conductors[fromLeft[k - 1]], section.Conductors[fromLeft[k]]);
            var gap = right.CentreMetres - left.CentreMetres - 0.5 * (left.WideMetres + right.WideMetres);
            if (left.BottomMetres == right.BottomMetres && gap > 0)
                result.Add((fromLeft[k - 1], fromLeft[k], gap));
        }
        return [.. result];
    }

    /// <summary>
    /// Where the sum over wave numbers may end: there the charges of strips one above the other, and those of a strip and its image in the nearest
    /// interface, no longer see each other.
    /// </summary>
    private static double EndWaveNumber(ThinStrip[] strips, CrossSection section)
    {
        var end = (strips.All(s => s.CentreMetres == 0) ? 8 : 12) / strips.Min(s => s.HalfWidthMetres);
        foreach (var c in section.Conductors)
        {
            if (c.ThicknessMetres > 0)
                end = Math.Max(end, 4 / Math.Max(c.ThicknessMetres, 1e-3 * c.WideMetres));
            end = Math.Max(end, 2 / StripModel.HeightOf(c, section));
            foreach (var slab in section.Slabs)
            {
                var distance = Math.Min(Math.Abs(slab.TopMetres - c.BottomMetres), Math.Abs(slab.TopMetres - c.TopMetres));
                if (distance > 1e-3 * c.WideMetres)
                    end = Math.Max(end, 2 / distance);
            }
        }
        if (section.TopMask is { OverCopperMetres: > 0 } mask)
            end = Math.Max(end, 2 / mask.OverCopperMetres);
        return end;
    }
}
