namespace StackTiming.Nets.Lengths;

/// <summary>What the ends of segments are called: pins <c>U1.A3</c>, branch labels <c>*1</c>, or nothing.</summary>
public static class NetEnd
{
    /// <summary>The character between part and pin.</summary>
    public const char PinSeparator = '.';

    /// <summary>True for a branch label, which is local to its net.</summary>
    /// <param name="name">Name of an end.</param>
    public static bool IsLabel(string name) => name.Length > 0 && name[0] == '*';

    /// <summary>Splits a pin's name; the part is what stands before the last point.</summary>
    /// <param name="name">Name of an end, such as <c>U1.A3</c>.</param>
    /// <param name="part">Reference designator.</param>
    /// <param name="pin">Pin of that part.</param>
    /// <returns>False for labels and empty ends.</returns>
    public static bool TrySplit(string name, out string part, out string pin)
    {
        var dot = IsLabel(name) ? -1 : name.LastIndexOf(PinSeparator);
        part = dot < 0 ? "" : name[..dot];
        pin = dot < 0 ? "" : name[(dot + 1)..];
        return dot > 0;
    }
}
