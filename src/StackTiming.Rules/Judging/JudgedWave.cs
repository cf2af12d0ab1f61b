namespace StackTiming.Rules.Judging;

/// <summary>A waveform that a finding was judged from.</summary>
/// <param name="Net">The net as the rule names it.</param>
/// <param name="Driver">Driver pin.</param>
/// <param name="Receiver">Receiver pin.</param>
/// <param name="Edge">Edge.</param>
/// <param name="Rule">Id of the rule.</param>
/// <param name="RelativeMargin">Relative margin of the finding.</param>
public readonly record struct JudgedWave(string Net, string Driver, string Receiver, Edge Edge, string Rule, double RelativeMargin);
