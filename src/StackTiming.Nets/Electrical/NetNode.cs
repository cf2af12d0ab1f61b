using StackTiming.Nets.Parts;

namespace StackTiming.Nets.Electrical;

/// <summary>A point of an electrical net where segments and pins meet.</summary>
/// <param name="Name">The pin (<c>U1.A3</c>), the branch label (<c>*1</c>), or empty for a point that the rows do not name.</param>
/// <param name="Net">Index of the net that it lies on.</param>
/// <param name="Part">The part of a pin, where the parts file states it; otherwise null.</param>
/// <param name="Pin">The pin, where the parts file states it; otherwise null.</param>
public readonly record struct NetNode(string Name, int Net, Part? Part, PartPin? Pin)
{
    /// <summary>True for a pin, whether or not the parts file states it.</summary>
    public bool IsPin => Name.Length > 0 && Name[0] != '*';
}
