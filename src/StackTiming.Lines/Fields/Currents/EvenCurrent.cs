using System.Numerics;
using StackTiming.Lines.Constants;
using StackTiming.Lines.Fields.Panels;
using StackTiming.Lines.Sections;

namespace StackTiming.Lines.Fields.Currents;

/// <summary>
/// What a conductor's inductance gains when its current spreads from the surface evenly over the metal, as direct current does. With the
/// vector potential A of the even current, that is the mean of A over the area less its mean over the surface current (reciprocity of the
/// two distributions).
/// </summary>
internal static class EvenCurrent
{
    private const int Nodes = 8;

    /// <summary>Inductance of even current beyond that of skin current, per metre.</summary>
    /// <param name="solution">The solved section.</param>
    /// <param name="conductor">Index of a signal.</param>
    /// <param name="drive">The charges for a unit current in that signal.</param>
    public static double InternalInductance(FieldSolution solution, int conductor, SolvedDrive drive)
    {
        var section = solution.Section;
        var c = section.Conductors[conductor];
        var images = Images(section, Corners(c));
        var mean = -SurfaceMean(solution, conductor, drive, images);
        var rule = LegendreRule.Of(Nodes);
        var area = 0.0;
        for (var i = 0; i < Nodes; i++)
        {
            var height = rule.Nodes[i];
            var width = c.LowerWidthMetres + height * (c.UpperWidthMetres - c.LowerWidthMetres);
            for (var k = 0; k < Nodes; k++)
            {
                var weight = rule.Weights[i] * rule.Weights[k] * width;
                area += weight;
                mean += weight * Potential(images,
                    new Complex(c.CentreMetres + (rule.Nodes[k] - 0.5) * width, c.BottomMetres + height * c.ThicknessMetres))
                    / (0.5 * (c.WideMetres + c.NarrowMetres));
            }
        }

        return Vacuum.Mu0 / (2 * Math.PI * c.AreaSquareMetres) * mean;
    }

    /// <summary>The mean over the surface current of one ampere.</summary>
    private static double SurfaceMean(
        FieldSolution solution, int conductor, SolvedDrive drive, List<(double Sign, Complex[] Corners)> images)
    {
        var (sum, total) = (0.0, 0.0);
        var first = 0;
        foreach (var panel in drive.Panels)
        {
            var rule = LegendreRule.Of(panel.Terms);
            for (var side = 0; side < (drive.Mirrored ? 2 : 1); side++)
            {
                if ((side == 1 ? solution.Pairs.Twin(panel.Piece.Conductor) : panel.Piece.Conductor) != conductor)
                    continue;
                for (var k = 0; k < panel.Terms; k++)
                {
                    var point = panel.At(rule.Nodes[k]);
                    var place = solution.Frame.Back(side == 1 ? new Complex(-point.Real, point.Imaginary) : point);
                    var charge = rule.Weights[k] * drive.ChargeAt(panel, first, side == 1, rule.Nodes[k]);
                    sum += charge * Potential(images, place);
                    total += charge;
                }
            }

            first += panel.Terms;
        }

        return sum / total;
    }

    private static Complex[] Corners(SectionConductor c)
    {
        var (x, lower, upper) = (c.CentreMetres, c.LowerWidthMetres / 2, c.UpperWidthMetres / 2);
        return [new(x - lower, c.BottomMetres), new(x + lower, c.BottomMetres), new(x + upper, c.TopMetres), new(x - upper, c.TopMetres)];
    }

    /// <summary>The conductor and its nearest images; those farther away hardly tell the area from the surface.</summary>
    private static List<(double Sign, Complex[] Corners)> Images(CrossSection section, Complex[] corners)
    {
        var images = new List<(double, Complex[])> { (1, corners) };
        foreach (var plane in new[] { section.BottomPlaneMetres, section.TopPlaneMetres })
        {
            if (plane is { } height)
                images.Add((-1, [.. corners.Reverse().Select(p => new Complex(p.Real, 2 * height - p.Imaginary))]));
        }

        if (section.TopPlaneMetres - section.BottomPlaneMetres is { } gap)
        {
            foreach (var shift in new[] { -2 * gap, 2 * gap })
                images.Add((1, [.. corners.Select(p => p + new Complex(0, shift))]));
        }

        return images;
    }

    private static double Potential(List<(double Sign, Complex[] Corners)> images, Complex point)
    {
        var sum = 0.0;
        foreach (var (sign, corners) in images)
            sum -= sign * LogarithmOver(corners, point);
        return sum;
    }

    /// <summary>
    /// ∫ ln r dA over a polygon, counter-clockwise: the divergence of r (ln r - 1/2)/2 is ln r, so that it is half the sum over the edges
    /// of the distance to the edge's line times ∫ (ln r - 1/2) ds.
    /// </summary>
    private static double LogarithmOver(Complex[] corners, Complex point)
    {
        var sum = 0.0;
        for (var i = 0; i < corners.Length; i++)
        {
            var along = corners[(i + 1) % corners.Length] - corners[i];
            var length = along.Magnitude;
            var local = (corners[i] - point) * Complex.Conjugate(along) / length;
            // Outward is to the right of the edge: the distance of its line from the point along that normal.
            var distance = -local.Imaginary;
            sum += 0.5 * distance * (Primitive(local.Real + length, distance) - Primitive(local.Real, distance) - 0.5 * length);
        }

        return sum;
    }

    /// <summary>∫ ln √(s² + d²) ds.</summary>
    private static double Primitive(double s, double distance)
    {
        var square = s * s + distance * distance;
        return square == 0 ? 0 : 0.5 * s * Math.Log(square) - s + distance * Math.Atan2(s, Math.Abs(distance)) * Math.Sign(distance);
    }
}
