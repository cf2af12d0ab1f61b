using System.Collections.Immutable;
using StackTiming.Rules.Findings;
using StackTiming.Rules.RuleFiles;

namespace StackTiming.Rules.Judging;

/// <summary>Equations of a transfer: what remains of setup and hold.</summary>
/// <param name="SetupSeconds">Setup time of the receiver, s.</param>
/// <param name="HoldSeconds">Hold time of the receiver, s.</param>
public abstract record TransferBudget(double SetupSeconds, double HoldSeconds)
{
    /// <summary>Name for findings.</summary>
    public abstract string Name { get; }

    /// <summary>The strobe's or clocks' nets.</summary>
    public abstract ImmutableArray<string> ReferenceNames { get; }

    /// <summary>Setup margin, s.</summary>
    /// <param name="data">Delay of the data net.</param>
    /// <param name="reference">Delay of the strobe; of a common clock, capture minus launch.</param>
    public abstract double SetupMargin(DelaySpan data, DelaySpan reference);

    /// <summary>Hold margin, s.</summary>
    /// <param name="data">Delay of the data net.</param>
    /// <param name="reference">Delay of the strobe; of a common clock, capture minus launch.</param>
    public abstract double HoldMargin(DelaySpan data, DelaySpan reference);

    /// <summary>The setup sum in words.</summary>
    /// <param name="data">Delay of the data net.</param>
    /// <param name="reference">Delay of the strobe or clock difference.</param>
    public abstract string SetupText(DelaySpan data, DelaySpan reference);

    /// <summary>The hold sum in words.</summary>
    /// <param name="data">Delay of the data net.</param>
    /// <param name="reference">Delay of the strobe or clock difference.</param>
    public abstract string HoldText(DelaySpan data, DelaySpan reference);

    /// <summary>A time in picoseconds, as text.</summary>
    /// <param name="seconds">The time.</param>
    protected static string Ps(double seconds) => DisplayUnit.Picoseconds.Show(seconds);
}

/// <summary>Data and strobe travel side by side.</summary>
/// <param name="Strobe">The strobe.</param>
/// <param name="ValidBeforeSeconds">Data valid before the strobe at the driver, s.</param>
/// <param name="ValidAfterSeconds">Data valid after the strobe at the driver, s.</param>
/// <param name="SetupSeconds">Setup time, s.</param>
/// <param name="HoldSeconds">Hold time, s.</param>
/// <param name="JitterSeconds">Jitter, s.</param>
public sealed record SourceSynchronousBudget(
    ReferenceNets Strobe, double ValidBeforeSeconds, double ValidAfterSeconds, double SetupSeconds, double HoldSeconds, double JitterSeconds)
    : TransferBudget(SetupSeconds, HoldSeconds)
{
    /// <inheritdoc/>
    public override string Name => "source-synchronous";

    /// <inheritdoc/>
    public override ImmutableArray<string> ReferenceNames => Strobe.Nets;

    /// <inheritdoc/>
    public override double SetupMargin(DelaySpan data, DelaySpan reference) =>
        ValidBeforeSeconds - (data.Latest - reference.Earliest) - SetupSeconds - JitterSeconds;

    /// <inheritdoc/>
    public override double HoldMargin(DelaySpan data, DelaySpan reference) =>
        ValidAfterSeconds + (data.Earliest - reference.Latest) - HoldSeconds - JitterSeconds;

    /// <inheritdoc/>
    public override string SetupText(DelaySpan data, DelaySpan reference) =>
        $"valid {Ps(ValidBeforeSeconds)} before the strobe, less data {Ps(data.Latest)} against strobe {Ps(reference.Earliest)}, less "
            + $"setup {Ps(SetupSeconds)} and jitter {Ps(JitterSeconds)}";

    /// <inheritdoc/>
    public override string HoldText(DelaySpan data, DelaySpan reference) =>
        $"valid {Ps(ValidAfterSeconds)} after the strobe, plus data {Ps(data.Earliest)} against strobe {Ps(reference.Latest)}, less hold "
            + $"{Ps(HoldSeconds)} and jitter {Ps(JitterSeconds)}";
}

/// <summary>One clock launches and captures the data.</summary>
/// <param name="PeriodSeconds">Period, s.</param>
/// <param name="TcoMinSeconds">Shortest clock-to-output, s.</param>
/// <param name="TcoMaxSeconds">Longest clock-to-output, s.</param>
/// <param name="LaunchClock">Clock net of the driver, or null.</param>
/// <param name="CaptureClock">Clock net of the receiver, or null.</param>
/// <param name="SetupSeconds">Setup time, s.</param>
/// <param name="HoldSeconds">Hold time, s.</param>
/// <param name="SkewSeconds">Skew of the clock buffer, s.</param>
/// <param name="JitterSeconds">Jitter from edge to edge, s; a hold check compares the same edge, so that it does not count there.</param>
public sealed record CommonClockBudget(
    double PeriodSeconds, double TcoMinSeconds, double TcoMaxSeconds, string? LaunchClock, string? CaptureClock,
    double SetupSeconds, double HoldSeconds, double SkewSeconds, double JitterSeconds) : TransferBudget(SetupSeconds, HoldSeconds)
{
    /// <inheritdoc/>
    public override string Name => "common-clock";

    /// <inheritdoc/>
    public override ImmutableArray<string> ReferenceNames => LaunchClock is null || CaptureClock is null ? [] : [LaunchClock, CaptureClock];

    /// <inheritdoc/>
    public override double SetupMargin(DelaySpan data, DelaySpan reference) =>
        PeriodSeconds + reference.Earliest - TcoMaxSeconds - data.Latest - SetupSeconds - SkewSeconds - JitterSeconds;

    /// <inheritdoc/>
    public override double HoldMargin(DelaySpan data, DelaySpan reference) =>
        TcoMinSeconds + data.Earliest - reference.Latest - HoldSeconds - SkewSeconds;

    /// <inheritdoc/>
    public override string SetupText(DelaySpan data, DelaySpan reference) =>
        $"period {Ps(PeriodSeconds)}, plus clock difference {Ps(reference.Earliest)}, less clock-to-output {Ps(TcoMaxSeconds)}, data "
            + $"{Ps(data.Latest)}, setup {Ps(SetupSeconds)}, skew {Ps(SkewSeconds)} and jitter {Ps(JitterSeconds)}";

    /// <inheritdoc/>
    public override string HoldText(DelaySpan data, DelaySpan reference) =>
        $"clock-to-output {Ps(TcoMinSeconds)}, plus data {Ps(data.Earliest)}, less clock difference {Ps(reference.Latest)}, hold "
            + $"{Ps(HoldSeconds)} and skew {Ps(SkewSeconds)}";
}
