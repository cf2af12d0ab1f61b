using System.Collections.Frozen;

namespace StackTiming.Nets.Parts;

/// <summary>The parts of a board and the buffer models that their pins use.</summary>
/// <param name="Models">Buffer models by name.</param>
/// <param name="Parts">Parts by reference designator.</param>
public sealed record PartList(FrozenDictionary<string, BufferModel> Models, FrozenDictionary<string, Part> Parts)
{
    /// <summary>No parts.</summary>
    public static PartList Empty { get; } = new(FrozenDictionary<string, BufferModel>.Empty, FrozenDictionary<string, Part>.Empty);

    /// <summary>The part of that name, or null.</summary>
    /// <param name="name">Reference designator.</param>
    public Part? Find(string name) => Parts.GetValueOrDefault(name);
}
