namespace StackTiming.Rules.Findings;

/// <summary>What a fix changes.</summary>
public enum FixKind
{
    /// <summary>Make the net longer by <see cref="Fix.Value"/> metres on <see cref="Fix.Layer"/>.</summary>
    AddLength,
    /// <summary>Make the net shorter by <see cref="Fix.Value"/> metres on <see cref="Fix.Layer"/>.</summary>
    RemoveLength,
    /// <summary>Route at a width of <see cref="Fix.Value"/> metres on <see cref="Fix.Layer"/>.</summary>
    SetWidth,
    /// <summary>Route a pair at a gap of <see cref="Fix.Value"/> metres on <see cref="Fix.Layer"/>.</summary>
    SetGap,
    /// <summary>Put a resistor of <see cref="Fix.Value"/> ohms in series at the driver.</summary>
    SeriesResistor,
    /// <summary>Drive with <see cref="Fix.Value"/> ohms in all, driver and series resistor together.</summary>
    SourceResistance,
    /// <summary>Put a resistor of <see cref="Fix.Value"/> ohms at the receiver end.</summary>
    EndResistor,
    /// <summary>Let the receiver sample <see cref="Fix.Value"/> seconds later.</summary>
    Later,
    /// <summary>Something that has no single figure, such as moving a net to another layer.</summary>
    Other,
}

/// <summary>What would mend a failed finding, computed by inverting the model that judged it.</summary>
/// <param name="Kind">What it changes.</param>
/// <param name="Text">The advice in words, with its figure.</param>
/// <param name="Net">The net to change, or empty.</param>
/// <param name="Layer">The layer of the change, or empty.</param>
/// <param name="Value">The figure in SI units as <see cref="FixKind"/> says; NaN for <see cref="FixKind.Other"/>.</param>
public sealed record Fix(FixKind Kind, string Text, string Net, string Layer, double Value);
