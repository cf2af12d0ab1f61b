using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.Results;
using StackTiming.Rules.RuleFiles;

namespace StackTiming.Rules.Judging;

/// <summary>Collects what one rule found. Not shared between threads: each rule has its own.</summary>
/// <param name="rule">The rule.</param>
public sealed class Judgement(RuleHeader rule)
{
    // A value at its limit passes; rounding on the way to it must not decide.
    private const double Rounding = 1e-9;

    // Trying fixes on the net costs waveforms; a rule that fails for thousands of nets has one cause, not thousands of fixes.
    private const int MostTrials = 40;

    private readonly List<Finding> findings = [];
    private int trials;
    private readonly List<GroupDelays> groups = [];
    private readonly List<JudgedWave> waves = [];

    /// <summary>The findings so far.</summary>
    public IReadOnlyList<Finding> Findings => findings;

    /// <summary>The delay tables so far.</summary>
    public IReadOnlyList<GroupDelays> Groups => groups;

    /// <summary>Which waveforms the findings were judged from.</summary>
    public IReadOnlyList<JudgedWave> Waves => waves;

    /// <summary>Whether a value is inside a window; a value at its limit is.</summary>
    /// <param name="value">The value, SI.</param>
    /// <param name="window">The window, SI.</param>
    public static bool Holds(double value, Window window) => window.Margin(value) >= -Rounding * window.Scale(0);

    /// <summary>Whether one more fix may be tried on its net; the first failures of a rule may.</summary>
    public bool MayTry() => trials++ < MostTrials;

    /// <summary>Adds the finding of a value that was measured.</summary>
    /// <param name="subject">What was judged.</param>
    /// <param name="nets">The nets concerned.</param>
    /// <param name="value">The value in SI units; finite.</param>
    /// <param name="window">What the rule allows, SI.</param>
    /// <param name="unit">Unit of the figures.</param>
    /// <param name="method">How the value was computed.</param>
    /// <param name="explanation">The finding in plain words.</param>
    /// <param name="fix">What would mend it; used where the rule fails.</param>
    /// <param name="leastScale">What a margin is measured against at least when findings are ranked, SI; for limits at or near zero.</param>
    /// <param name="relativeMargin">Rank of the margin, where it does not follow from the window.</param>
    public Finding Measured(
        string subject, ImmutableArray<string> nets, double value, Window window, DisplayUnit unit, string method, string explanation, Fix? fix,
        double leastScale = 0, double? relativeMargin = null)
    {
        var margin = window.Margin(value);
        var holds = Holds(value, window);
        var finding = new Finding
        {
            Rule = rule.Id,
            Kind = rule.Kind,
            Subject = subject,
            Status = holds ? FindingStatus.Pass : FindingStatus.Fail,
            Value = unit.FromSi(value),
            LowerLimit = window.Lower is { } low ? unit.FromSi(low) : null,
            UpperLimit = window.Upper is { } high ? unit.FromSi(high) : null,
            Margin = unit.FromSi(margin),
            RelativeMargin = relativeMargin ?? margin / window.Scale(Math.Max(leastScale, unit.SiPerUnit)),
            Unit = unit,
            Method = method,
            Explanation = explanation,
            Fix = holds ? null : fix,
            Severity = rule.Severity,
            RuleReason = rule.Reason,
            RuleSource = rule.Source,
            RuleAt = rule.At,
            Nets = nets,
        };
        findings.Add(finding);
        return finding;
    }

    /// <summary>Adds the finding of something that could not be judged.</summary>
    /// <param name="subject">What should have been judged.</param>
    /// <param name="nets">The nets concerned.</param>
    /// <param name="reason">Why it could not be, in a sentence without a full stop.</param>
    public void Unchecked(string subject, ImmutableArray<string> nets, string reason) => findings.Add(new Finding
    {
        Rule = rule.Id,
        Kind = rule.Kind,
        Subject = subject,
        Status = FindingStatus.Unchecked,
        UncheckedReason = reason,
        Explanation = $"{subject} was not judged: {reason}.",
        Severity = rule.Severity,
        RuleReason = rule.Reason,
        RuleSource = rule.Source,
        RuleAt = rule.At,
        Nets = nets,
    });

    /// <summary>Adds a table of the delays that were compared.</summary>
    /// <param name="table">The table.</param>
    public void Compared(GroupDelays table) => groups.Add(table);

    /// <summary>Notes which waveform a finding was judged from, so that it can be drawn.</summary>
    /// <param name="wave">The waveform.</param>
    public void Drawn(JudgedWave wave) => waves.Add(wave);
}
