using StackTiming.Stackups.Reading;

namespace StackTiming.Lines.Sections;

/// <summary>A conductor placed on a copper layer by hand: a trace, a pour, or a plane that ends.</summary>
/// <param name="At">Where the file states it.</param>
/// <param name="Name">Its name, unique in the section.</param>
/// <param name="Layer">Its copper layer.</param>
/// <param name="LeftMetres">x of the left edge of its wide face, in metres.</param>
/// <param name="RightMetres">x of the right edge of its wide face, in metres.</param>
/// <param name="Grounded">True for pours and planes, which stay at zero volts.</param>
public sealed record PlacedConductor(FilePosition At, string Name, string Layer, double LeftMetres, double RightMetres, bool Grounded);
