using System.Collections.Immutable;
using StackTiming.Lines.Solutions;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;
using StackTiming.Stackups.Copper;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Materials;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;

namespace StackTiming.Reports.Tests.Compliance;

/// <summary>Invented results of a check: an eight-layer board with failures of every kind, long names, waivers and waveforms.</summary>
internal static class SampleCheck
{
    public const string LongName = "SENSOR_ARRAY_7_CALIBRATION_REFERENCE_CLOCK_DISTRIBUTION_BRANCH_NORTH_EAST_QUADRANT_BUFFERED_COPY_0001_TO_CONVERTER_BANK_3_SAMPLE_AND_HOLD_STROBE_DELAYED_BY_HALF_A_PERIOD_FOR_THE_SECOND_CHANNEL_OF_EVERY_PAIR_ON_CARD_2";

    public static CheckResult Create(int passingNets = 24)
    {
        ImmutableArray<Finding> findings = [.. Findings(passingNets).Order(WorstFirst.Instance)];
        return new CheckResult
        {
            Board = "Harbour buoy recorder",
            Revision = "B",
            CheckedOn = new DateOnly(2026, 12, 1),
            Counts = FindingCounts.Of(findings),
            Inputs =
            [
                new InputDigest("board", "stackups/harbour-buoy/rev-b/board.yaml", Digest('a')),
                new InputDigest("stackup", "stackups/harbour-buoy/buoy.stackup.yaml", Digest('b')),
                new InputDigest("lengths", "stackups/harbour-buoy/rev-b/buoy.lengths.csv", Digest('c')),
                new InputDigest("parts", "stackups/harbour-buoy/buoy.parts.yaml", Digest('d')),
                new InputDigest("rules", "stackups/harbour-buoy/buoy.rules.yaml", Digest('e')),
                new InputDigest("rules", "rules/byte-lane.rules.yaml", Digest('f')),
                new InputDigest("waivers", "stackups/harbour-buoy/rev-b/waivers.yaml", Digest('0')),
            ],
            StackUp = StackUp(),
            Rules = Rules(),
            Findings = findings,
            Groups = Groups(),
            Waves = [Wave("CLK_ADC", 1.0), Wave("CLK_MEM", 0.45)],
            Lines = Lines(),
            Methods =
            [
                new MethodUse("hammerstad-jensen-1980", "12 sections", 0.011),
                new MethodUse("cohn-1954", "7 sections", 0.004),
                new MethodUse("method-of-characteristics", "14 nets", 0),
            ],
            Assumptions =
            [
                "Traces without a stated etch factor are trapezoids with an etch factor of 2.5.",
                "Receivers without a capacitance are taken as 2 pF.",
                "Nets without a driver model are judged by their delays only.",
            ],
            Notes = [new Problem(FilePosition.WholeFile("board.yaml"), "the parts file lies outside the board's folder", null, IsError: false)],
            Phases = [new PhaseTime("read", TimeSpan.FromMilliseconds(80), "7 files")],
            NetCount = 164,
            SegmentCount = 1220,
        };
    }

    public static CheckResult Empty() => Create() with
    {
        Board = "Empty board",
        Revision = "",
        Rules = [],
        Findings = [],
        Counts = default,
        Groups = [],
        Waves = [],
        Lines = [],
        Methods = [],
        Assumptions = [],
        Notes = [],
        NetCount = 0,
        SegmentCount = 0,
    };

    public static StackUp StackUp()
    {
        var at = FilePosition.WholeFile("buoy.stackup.yaml");
        var core = new Dielectric("core-a", Quantity.Exact(3.95), Quantity.Exact(0.016), 1e9, null);
        var filler = core with { Name = "core-b", Dk = Quantity.Exact(4.35) };
        var prepreg = core with { Name = "prepreg-a", Dk = Quantity.Exact(3.7), Df = Quantity.Exact(0.018) };
        var mask = core with { Name = "mask-a", Dk = Quantity.Exact(3.5), Df = Quantity.Exact(0.025) };
        var copper = new CopperProperties(Quantity.Exact(1.72e-8), Quantity.Exact(1.2e-6), Quantity.Exact(6e-6));
        CopperLayer Copper(string name, double micrometres, CopperUse use) =>
            new(at, name, Quantity.Exact(micrometres * 1e-6), use, copper, WideFace.Down, Tolerance.None);
        DielectricLayer Laminate(DielectricKind kind, Dielectric material, double micrometres) =>
            new(at, kind, material, Quantity.Exact(micrometres * 1e-6));
        var over = new MaskLayer(at, mask, Quantity.Exact(25e-6), Quantity.Exact(15e-6));
        return new StackUp("Harbour buoy recorder, 8 layers, 1.6 mm", "2",
        [
            over,
            Copper("L1", 45, CopperUse.Signal), Laminate(DielectricKind.Prepreg, prepreg, 75),
            Copper("L2", 15.2, CopperUse.Plane), Laminate(DielectricKind.Core, core, 100),
            Copper("L3", 15.2, CopperUse.Signal), Laminate(DielectricKind.Prepreg, prepreg, 100),
            Copper("L4", 15.2, CopperUse.Plane), Laminate(DielectricKind.Core, filler, 870),
            Copper("L5", 15.2, CopperUse.Plane), Laminate(DielectricKind.Prepreg, prepreg, 100),
            Copper("L6", 15.2, CopperUse.Mixed), Laminate(DielectricKind.Core, core, 100),
            Copper("L7", 15.2, CopperUse.Plane), Laminate(DielectricKind.Prepreg, prepreg, 75),
            Copper("L8", 45, CopperUse.Signal),
            over,
        ]);
    }

    public static ReceiverWave Wave(string net, double ringing)
    {
        var time = Enumerable.Range(0, 2400).Select(i => i * 5e-12).ToArray();
        var volts = time.Select(t => t < 1e-9 ? 0 : 1.8 * (1 - Math.Exp(-(t - 1e-9) / 0.7e-9) * Math.Cos((t - 1e-9) * 3.1e9 * ringing + 0.1) * (1 - 0.004 * ringing))).ToArray();
        var driver = time.Select(t => t < 0.4e-9 ? 1.2 * t / 0.4e-9 : t < 2e-9 ? 1.2 : 1.8).ToArray();
        return new ReceiverWave(net, "U1.C4", "U9.K2", "rise", time, volts, driver, 0.63, 1.17, 0.9,
            [
                new WaveMark("first crossing of vih", 1.14e-9, 1.17),
                new WaveMark("ringback", 2.6e-9, 1.31),
                new WaveMark("settled to 5 %", 4.02e-9, 1.71),
                new WaveMark("overshoot", double.NaN, 2.42),
            ],
            ["CLK-RING", "CLK-SETTLE"], -0.4);
    }

    private static string Digest(char start) => start + string.Concat(Enumerable.Repeat("0f1e2d3c4b5a697", 5))[..63];

    private static FilePosition At(int line) => new("stackups/harbour-buoy/buoy.rules.yaml", line, 5);

    private static ImmutableArray<RuleSummary> Rules() =>
    [
        new RuleSummary("LANE0-Z", "impedance", "lane0", "36.00 to 44.00 ohm", Severity.Must, "driver and termination are 40 ohm", "common practice", At(8)),
        new RuleSummary("LANE0-MATCH", "match", "lane0", "within 10.00 ps", Severity.Must, "the byte is sampled by one strobe", "common practice", At(9)),
        new RuleSummary("LANE0-DQS", "offset", "lane0 to MEM_DQS0", "−10.00 to 10.00 ps", Severity.Must, "", "", At(10)),
        new RuleSummary("ADDR-TIME", "flight-time", "MEM_A*", "at most 900.00 ps", Severity.Must, "", "", At(11)),
        new RuleSummary("USB-SKEW", "pair-skew", "usb", "at most 5.00 ps", Severity.Should, "", "", At(12)),
        new RuleSummary("CLK-RING", "ringback", "CLK_*", "margin 50.0 mV", Severity.Must, "a second crossing clocks twice", "JESD8 thresholds", At(13)),
        new RuleSummary("SLOW-STUB", "stub", "SLOW_*", "below a third of the rise", Severity.Should, "", "common practice", At(14)),
        new RuleSummary("ADC-LOSS", "loss", "ADC_*", "at most 1.2 dB at 1 GHz", Severity.Must, "", "", At(15)),
    ];

    private static IEnumerable<Finding> Findings(int passingNets)
    {
        yield return Make("CLK-RING", "ringback", "CLK_ADC, rise at U9.K2", FindingStatus.Fail, DisplayUnit.Millivolts, -38.2, 50, null, Severity.Must,
            "After the first crossing of vih the voltage falls back to 1.132 V, 38.2 mV below vih: the input may see a second edge. The line is driven by 18 ohm and ends open.",
            new Fix(FixKind.SeriesResistor, "put 33 ohm in series at U1.C4; the ringback then stays 212 mV above vih", "CLK_ADC", "", 33)) with
        { Method = "method of characteristics on 7 lines; Hammerstad and Jensen 1980", RelativeMargin = -1.764, Margin = -88.2 };
        for (var i = 0; i < 8; i++)
        {
            var value = i is 3 or 5 ? 48.21 + i : 41.02 + 0.1 * i;
            yield return Make("LANE0-Z", "impedance", $"MEM_D{i} on L3, 0.100 mm", i is 3 or 5 ? FindingStatus.Fail : FindingStatus.Pass, DisplayUnit.Ohms, value, 36, 44, Severity.Must,
                i is 3 or 5 ? $"The trace is {value:0.00} ohm where 40 ohm ±10 % is asked for: it is too narrow for the 100 µm of core beneath it." : "The impedance lies inside its limits.",
                i is 3 or 5 ? new Fix(FixKind.SetWidth, "route at 0.142 mm on L3", $"MEM_D{i}", "L3", 0.142e-3) : null);
        }
        yield return Make("LANE0-MATCH", "match", "lane0", FindingStatus.Fail, DisplayUnit.Picoseconds, 23.4, null, 10, Severity.Must,
            "MEM_D5 arrives 23.4 ps after MEM_D1, the first of the group.", new Fix(FixKind.RemoveLength, "shorten MEM_D5 by 2.02 mm on L3", "MEM_D5", "L3", 2.02e-3));
        yield return Make("LANE0-DQS", "offset", "MEM_D5 to MEM_DQS0", FindingStatus.Fail, DisplayUnit.Picoseconds, 14.2, -10, 10, Severity.Must,
            "MEM_D5 arrives 14.2 ps after its strobe.", new Fix(FixKind.RemoveLength, "shorten MEM_D5 by 0.64 mm on L3", "MEM_D5", "L3", 0.64e-3));
        yield return Make("CLK-RING", "ringback", LongName, FindingStatus.Unchecked, DisplayUnit.Millivolts, null, 50, null, Severity.Must,
            "The rule could not be judged.", null) with
        { UncheckedReason = "no part on the net has a driver model; give one in the parts file" };
        yield return Make("SLOW-STUB", "stub", "SLOW_RESET", FindingStatus.Fail, DisplayUnit.Picoseconds, 412, null, 330, Severity.Should,
            "The stub to TP4 is 412 ps long there and back, more than a third of the rise of 1 ns.", new Fix(FixKind.RemoveLength, "shorten the stub by 6.1 mm on L8", "SLOW_RESET", "L8", 6.1e-3));
        yield return Make("USB-SKEW", "pair-skew", "usb", FindingStatus.Waived, DisplayUnit.Picoseconds, 6.1, null, 5, Severity.Should,
            "USB_P arrives 6.1 ps after USB_N.", new Fix(FixKind.AddLength, "lengthen USB_N by 0.18 mm on L1 beside the connector", "USB_N", "L1", 0.18e-3)) with
        { Waiver = new WaiverNote("full speed only in this product; 6 ps of 83 ns do not matter", "SI lead", new DateOnly(2027, 6, 30), At(40)) };
        yield return Make("EXPIRED", "waiver", "waiver of LANE0-MATCH", FindingStatus.Fail, DisplayUnit.None, null, null, null, Severity.Must,
            "The waiver of LANE0-MATCH ended on 2026-10-31.", new Fix(FixKind.Other, "mend the finding, or have the waiver approved again", "", "", double.NaN));
        for (var i = 0; i < passingNets; i++)
        {
            yield return Make("ADDR-TIME", "flight-time", $"MEM_A{i} at U3.{(char)('A' + i % 20)}{i}", FindingStatus.Pass, DisplayUnit.Picoseconds, 742 + 3.1 * i % 140, null, 900, Severity.Must,
                "The flight time lies inside its limit.", null);
        }
        yield return Make("ADC-LOSS", "loss", "ADC_CLK", FindingStatus.Pass, DisplayUnit.Decibels, 0.812, null, 1.2, Severity.Must, "The loss lies inside its limit.", null);
        yield return Make("ADC-LOSS", "loss", "ADC_" + new string('Q', 100_000), FindingStatus.Pass, DisplayUnit.Decibels, 0.9, null, 1.2, Severity.Must, "The loss lies inside its limit.", null);
    }

    private static Finding Make(
        string rule, string kind, string subject, FindingStatus status, DisplayUnit unit, double? value, double? lower, double? upper, Severity severity, string explanation, Fix? fix)
    {
        double? margin = value is { } v ? Math.Min(v - (lower ?? double.NegativeInfinity), (upper ?? double.PositiveInfinity) - v) : null;
        if (margin is { } m && double.IsInfinity(m))
            margin = null;
        var allowed = lower is { } l && upper is { } u ? (u - l) / 2 : Math.Abs(upper ?? lower ?? 1);
        return new Finding
        {
            Rule = rule,
            Kind = kind,
            Subject = subject,
            Status = status,
            Unit = unit,
            Value = value,
            LowerLimit = lower,
            UpperLimit = upper,
            Margin = margin,
            RelativeMargin = margin / allowed,
            Severity = severity,
            Explanation = explanation,
            Fix = fix,
            Method = "Cohn 1954",
            RuleAt = At(8),
            RuleReason = rule == "CLK-RING" ? "a second crossing clocks twice" : "",
            RuleSource = "common practice",
            Nets = [subject.Split(' ', ',')[0]],
        };
    }

    private static ImmutableArray<GroupDelays> Groups()
    {
        NetDelay Delay(string net, double picoseconds, bool holds) => new(net, "U1.A1", "U2.B2", picoseconds * 1e-12, picoseconds * 0.146e-3, holds);
        double[] lane = [412.1, 408.7, 415.3, 414.4, 409.9, 432.1, 411.0, 413.6];
        return
        [
            new GroupDelays("LANE0-MATCH", "match", "lane0", "", null, 408.7e-12, 418.7e-12, [.. lane.Select((d, i) => Delay($"MEM_D{i}", d, i != 5)), Delay("MEM_DM0", 410.4, true)]),
            new GroupDelays("LANE0-DQS", "offset", "lane0", "MEM_DQS0", 414e-12, 404e-12, 424e-12, [.. lane.Select((d, i) => Delay($"MEM_D{i}", d, i != 5))]),
            new GroupDelays("ADDR-TIME", "flight-time", "MEM_A*", "", null, null, 900e-12, [.. Enumerable.Range(0, 60).Select(i => Delay($"MEM_A{i}", 742 + 3.1 * i % 140, true))]),
            new GroupDelays("USB-SKEW", "pair-skew", "usb", "USB_N", 301.2e-12, 296.2e-12, 306.2e-12, [Delay("USB_N", 301.2, true), Delay(LongName, 307.3, false)]),
        ];
    }

    private static ImmutableArray<LineUse> Lines()
    {
        LineUse Line(string layer, double width, double? gap, double z0, double? zdiff, string method) => new(
            layer, width * 1e-3, gap * 1e-3, z0, zdiff, 3.1, 5.9e-9, [new DielectricShare("prepreg-a", 0.61), new DielectricShare("air", 0.27), new DielectricShare("mask-a", 0.12)],
            method, 0.011, method == "cohn-1954" ? ["t/b is 0.07, above the 0 of Cohn 1954"] : [], 120, 1.84);
        return
        [
            Line("L1", 0.11, null, 50.4, null, "hammerstad-jensen-1980"), Line("L1", 0.1, 0.13, 54.1, 90.3, "hammerstad-jensen-1980"), Line("L1", 0.2, null, 34.0, null, "hammerstad-jensen-1980"),
            Line("L3", 0.1, null, 48.2, null, "cohn-1954"), Line("L3", 0.142, null, 40.1, null, "cohn-1954"), Line("L3", 0.09, 0.15, 51.7, 99.2, "cohn-1954"),
            Line("L6", 0.1, null, 48.9, null, "cohn-1954"),
            Line("L8", 0.11, null, 50.4, null, "hammerstad-jensen-1980"), Line("L8", 0.15, null, 43.1, null, "hammerstad-jensen-1980"),
        ];
    }
}
