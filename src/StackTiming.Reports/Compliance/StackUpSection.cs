using System.Collections.Immutable;
using System.Globalization;
using StackTiming.Reports.Documents;
using StackTiming.Reports.Figures;
using StackTiming.Rules.Results;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Quantities;

namespace StackTiming.Reports.Compliance;

/// <summary>The stack-up, drawn, and what the lines on its layers do.</summary>
internal static class StackUpSection
{
    private const int LabelsOfALayer = 4;
    private const int LinesShown = 120;

    /// <summary>The section.</summary>
    /// <param name="result">The results of the check.</param>
    /// <param name="showFields">Whether the fields of the most routed lines are drawn.</param>
    public static Section Build(CheckResult result, bool showFields)
    {
        var drawing = new StackUpDrawing(result.StackUp, Labels(result));
        var name = result.StackUp.Name.Length > 0 ? result.StackUp.Name : "Stack-up";
        ImmutableArray<Block> blocks =
        [
            new Figure(drawing, $"{name}{(result.StackUp.Revision.Length > 0 ? ", revision " + result.StackUp.Revision : "")}, from the top face to the bottom face, with the widths that the board uses and their impedances.",
                "The layers from the top face to the bottom face: " + string.Join(", ", result.StackUp.CopperLayers.Select(c => c.Name))),
        ];
        return new Section(Anchors.StackUp, "Stack-up and lines", blocks,
        [
            new Section("layers", "Layers with their tolerances", [Layers(result.StackUp)], []),
            new Section("lines", "Lines", Lines(result), []),
            .. showFields ? FieldsSection.Build(result) : [],
        ])
        { BeginsPage = true };
    }

    private static ImmutableArray<LineLabel> Labels(CheckResult result)
    {
        var labels = ImmutableArray.CreateBuilder<LineLabel>();
        foreach (var layer in result.Lines.GroupBy(l => l.Layer))
        {
            // The lines that carry most copper are named, in the order of the table.
            var named = layer.OrderByDescending(l => l.TotalLengthMetres).Take(LabelsOfALayer).ToHashSet();
            labels.AddRange(layer.Where(named.Contains).Select(l => new LineLabel(l.Layer, Label(l))));
            if (layer.Count() > named.Count)
                labels.Add(new LineLabel(layer.Key, $"… {layer.Count() - named.Count} more"));
        }
        return labels.ToImmutable();
    }

    private static string Label(LineUse line) => line is { GapMetres: { } gap, ZDiffOhms: { } differential }
        ? string.Create(CultureInfo.InvariantCulture, $"{line.WidthMetres * 1e3:0.000} mm, gap {gap * 1e3:0.000}: {differential:0.0} Ω diff.")
        : string.Create(CultureInfo.InvariantCulture, $"{line.WidthMetres * 1e3:0.000} mm: {line.Z0Ohms:0.0} Ω");

    private static Table Layers(StackUp stackUp) => new(
        [
            new Column("Layer"), new Column("Kind"), new Column("Material", Grows: true), new Column("Thickness, µm", Alignment.Right), new Column("Dk", Alignment.Right),
            new Column("Df", Alignment.Right), new Column("Dk and Df at", Alignment.Right), new Column("Undercut, µm", Alignment.Right), new Column("Roughness, µm", Alignment.Right),
        ],
        [.. stackUp.Layers.Select(LayerRow)],
        "Tolerances are three standard deviations unless the stack-up file says otherwise.");

    private static Row LayerRow(Layer layer) => layer switch
    {
        CopperLayer copper => Row.Of(
            RichText.In(copper.Name, Emphasis.Strong), copper.Use switch { CopperUse.Plane => "plane", CopperUse.Mixed => "mixed copper", _ => "signal copper" }, "copper",
            Toleranced(copper.Thickness, 1e6, "0.##"), "", "", "", Wording.Micrometres(copper.Copper.UndercutMetres.Value), Wording.Micrometres(copper.Copper.RoughnessRms.Value)),
        DielectricLayer dielectric => Row.Of(
            "", dielectric.Kind == DielectricKind.Core ? "core" : "prepreg", dielectric.Material.Name, Toleranced(dielectric.Thickness, 1e6, "0.##"),
            Toleranced(dielectric.Material.Dk, 1, "0.00##"), Toleranced(dielectric.Material.Df, 1, "0.000##"), Hertz(dielectric.Material.AtHertz), "", ""),
        MaskLayer mask => Row.Of(
            "", "solder mask", mask.Material.Name, $"{Toleranced(mask.OverLaminate, 1e6, "0.##")}, on copper {Toleranced(mask.OverCopper, 1e6, "0.##")}",
            Toleranced(mask.Material.Dk, 1, "0.00##"), Toleranced(mask.Material.Df, 1, "0.000##"), Hertz(mask.Material.AtHertz), "", ""),
        _ => Row.Of("", "", "", "", "", "", "", "", ""),
    };

    private static string Toleranced(Quantity quantity, double perUnit, string format)
    {
        string Show(double value) => (value * perUnit).ToString(format, CultureInfo.InvariantCulture);
        var (minus, plus) = (quantity.Tolerance.Minus, quantity.Tolerance.Plus);
        if (minus == 0 && plus == 0)
            return Show(quantity.Value);
        return Math.Abs(plus - minus) <= 1e-9 * Math.Abs(plus)
            ? $"{Show(quantity.Value)} ±{Show(plus)}"
            : $"{Show(quantity.Value)} +{Show(plus)} −{Show(minus)}";
    }

    private static string Hertz(double hertz) => hertz >= 1e9
        ? (hertz / 1e9).ToString("0.###", CultureInfo.InvariantCulture) + " GHz"
        : (hertz / 1e6).ToString("0.###", CultureInfo.InvariantCulture) + " MHz";

    private static ImmutableArray<Block> Lines(CheckResult result)
    {
        if (result.Lines.IsEmpty)
            return [new Paragraph("The board uses no lines.")];
        var blocks = ImmutableArray.CreateBuilder<Block>();
        blocks.Add(new Table(
            [
                new Column("Layer"), new Column("Width, mm", Alignment.Right), new Column("Gap, mm", Alignment.Right), new Column("Z0, Ω", Alignment.Right),
                new Column("Zdiff, Ω", Alignment.Right), new Column("ε eff", Alignment.Right), new Column("Delay, ps/mm", Alignment.Right),
                new Column("Field energy in", Grows: true), new Column("Method") { Wraps = false }, new Column("Error", Alignment.Right), new Column("Routed, mm", Alignment.Right),
            ],
            [.. result.Lines.Take(LinesShown).Select(LineRow)],
            result.Lines.Length > LinesShown ? $"… and {result.Lines.Length - LinesShown} more, see the attached results" : "Z0 of a pair is that of one trace with the other quiet; ε eff and delay of a pair are those of its odd mode."));
        if (result.Lines.Any(l => l.CrossCheck is not null))
        {
            blocks.Add(new Table(
                [
                    new Column("Layer"), new Column("Width, mm", Alignment.Right), new Column("Gap, mm", Alignment.Right), new Column("Judged by"), new Column("Z, Ω", Alignment.Right),
                    new Column("Compared with", Grows: true), new Column("Z, Ω", Alignment.Right), new Column("Difference", Alignment.Right), new Column("Explained", Alignment.Right),
                    new Column("Comparison"),
                ],
                [.. result.Lines.Where(l => l.CrossCheck is not null).Take(LinesShown).Select(CrossCheckRow)],
                "Each section by a second method. The difference is part of the uncertainty of the impedance; explained is what the two methods say of their own errors."));
        }
        var warnings = result.Lines.SelectMany(l => l.Warnings.Select(w => (w, l))).GroupBy(p => p.w).Take(20)
            .Select(g => (RichText)$"{string.Join(", ", g.Select(p => $"{p.l.Layer} {Wording.Millimetres(p.l.WidthMetres)} mm").Distinct().Take(6))}: {g.Key}.").ToImmutableArray();
        if (!warnings.IsEmpty)
        {
            blocks.Add(new Caption("Beyond the range of a method"));
            blocks.Add(new Bullets(warnings));
        }
        return blocks.ToImmutable();
    }

    private static Row LineRow(LineUse line)
    {
        static string F(double? value, string format) => value is { } v && double.IsFinite(v) ? v.ToString(format, CultureInfo.InvariantCulture) : "";
        return Row.Of(
            RichText.In(line.Layer, Emphasis.Strong), Wording.Millimetres(line.WidthMetres), line.GapMetres is { } gap ? Wording.Millimetres(gap) : "", F(line.Z0Ohms, "0.00"), F(line.ZDiffOhms, "0.00"),
            F(line.EpsEff, "0.000"), F(line.DelaySecondsPerMetre * 1e9, "0.000"),
            string.Join(", ", line.Shares.OrderByDescending(s => s.Share).Take(3).Select(s => $"{s.Dielectric} {Wording.Percent(s.Share, 0)}")),
            line.MethodId, Wording.Percent(line.RelativeError, 2), F(line.TotalLengthMetres * 1e3, "0"));
    }

    private static Row CrossCheckRow(LineUse line)
    {
        var check = line.CrossCheck!;
        return Row.Of(
            RichText.In(line.Layer, Emphasis.Strong), Wording.Millimetres(line.WidthMetres), line.GapMetres is { } gap ? Wording.Millimetres(gap) : "", line.MethodId,
            (line.ZDiffOhms ?? line.Z0Ohms).ToString("0.00", CultureInfo.InvariantCulture), check.MethodId, check.Ohms.ToString("0.00", CultureInfo.InvariantCulture),
            (100 * check.Difference).ToString("+0.00;−0.00", CultureInfo.InvariantCulture) + " %", Wording.Percent(check.Allowed, 2),
            check.OutsideValidity ? "outside its range" : check.Disagrees ? "differs by more" : "agrees");
    }
}
