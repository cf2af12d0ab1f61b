using System.Globalization;
using SkiaSharp;
using StackTiming.Reports.Appearance;

namespace StackTiming.Reports.Figures;

/// <summary>Charge on conductors as areas that stand on their faces: positive filled, negative outlined with hairs. Close to corners it is cut.</summary>
internal static class ChargeHairs
{
    /// <summary>Draws the charge; a density of <paramref name="high"/> stands as far as <see cref="Tall"/> says.</summary>
    public static void Draw(Pen pen, SectionView view, IReadOnlyList<ChargedFace> faces, double high)
    {
        var tall = Tall(view);
        foreach (var face in faces)
        {
            for (var sign = 1; sign >= -1; sign -= 2)
                DrawSign(pen, view, face, sign, high, tall);
        }
    }

    /// <summary>The round density (1, 2 or 5) that stands as high as the drawing allows: above the density of 85 % of the faces' length.</summary>
    public static double High(IReadOnlyList<ChargedFace> faces)
    {
        var pieces = new List<(double Density, double Length)>();
        foreach (var face in faces)
        {
            for (var i = 1; i < face.X.Length; i++)
            {
                pieces.Add((
                    Math.Abs(face.CoulombPerSquareMetre[i] + face.CoulombPerSquareMetre[i - 1]) / 2,
                    Math.Sqrt(Math.Pow(face.X[i] - face.X[i - 1], 2) + Math.Pow(face.Y[i] - face.Y[i - 1], 2))));
            }
        }
        if (pieces.Count == 0)
            return 1;
        pieces.Sort();
        var rest = 0.85 * pieces.Sum(p => p.Length);
        var k = 0;
        while (k + 1 < pieces.Count && (rest -= pieces[k].Length) > 0)
            k++;
        var value = pieces[k].Density;
        if (!(value > 0))
            return 1;
        var power = Math.Pow(10, Math.Floor(Math.Log10(value)));
        return power * ((value / power) switch { <= 1 => 1, <= 2 => 2, <= 5 => 5, _ => 10 });
    }

    /// <summary>The key: how far a density stands.</summary>
    public static void DrawKey(Pen pen, SectionView view, double high, bool negative, SKPoint at)
    {
        var style = TextStyle.Small with { Size = 6.6f };
        var tall = Tall(view);
        var text = (high * 1e9).ToString("0.###", CultureInfo.InvariantCulture) + " nC/m²; ends blunt where more";
        pen.Fill(new SKRect(at.X, at.Y - tall, at.X + 10, at.Y), Palette.Accent);
        pen.Text("positive, this high: " + text, style, at.X + 14, at.Y - 1);
        if (!negative)
            return;
        var x = at.X + 14 + style.Face.Width("positive, this high: " + text, style.Size) + 16;
        pen.Outline(new SKRect(x, at.Y - tall, x + 10, at.Y), Palette.Alarm, 0.7f);
        pen.Text("negative", style, x + 14, at.Y - 1);
    }

    /// <summary>How far the round density stands: a ninth of the window, at most what the key has room for.</summary>
    public static float Tall(SectionView view) => Math.Min(17, view.Area.Height / 9);

    private static void DrawSign(Pen pen, SectionView view, ChargedFace face, int sign, double high, float tall)
    {
        if (!Array.Exists(face.CoulombPerSquareMetre, c => c * sign > 0))
            return;
        var (feet, heads) = (new List<SKPoint>(), new List<SKPoint>());
        for (var i = 0; i < face.X.Length; i++)
        {
            var foot = view.At(face.X[i], face.Y[i]);
            var height = tall * (float)Math.Min(1.5, Math.Max(0, face.CoulombPerSquareMetre[i] * sign / high));
            // The stations end a quarter of their distance short of the end of the stretch.
            if (face.X.Length > 1 && (i == 0 || i == face.X.Length - 1))
            {
                var next = view.At(face.X[i == 0 ? 1 : i - 1], face.Y[i == 0 ? 1 : i - 1]);
                foot = new SKPoint(foot.X + 0.25f * (foot.X - next.X), foot.Y + 0.25f * (foot.Y - next.Y));
            }
            feet.Add(foot);
            heads.Add(new SKPoint(foot.X + (float)face.NormalX * height, foot.Y - (float)face.NormalY * height));
        }
        using var path = new SKPath();
        path.AddPoly([.. feet, .. Enumerable.Reverse(heads)], true);
        if (sign > 0)
        {
            pen.Path(path, Palette.Accent, null, 0);
            return;
        }
        pen.Path(path, Palette.Paper.WithAlpha(0xB0), Palette.Alarm, 0.7f);
        for (var i = 0; i < feet.Count; i++)
            pen.Segment(feet[i], heads[i], Palette.Alarm, 0.4f);
    }
}
