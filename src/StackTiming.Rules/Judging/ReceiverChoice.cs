namespace StackTiming.Rules.Judging;

/// <summary>At which receivers a rule judges.</summary>
/// <param name="Text">A part (<c>U2</c>), a pin (<c>U2.A3</c>), or empty for all.</param>
public readonly record struct ReceiverChoice(string Text)
{
    /// <summary>Whether a receiver pin is meant.</summary>
    /// <param name="pin">The pin.</param>
    public bool Includes(string pin) => Text.Length == 0 || pin == Text || PinName.PartOf(pin) == Text;
}
