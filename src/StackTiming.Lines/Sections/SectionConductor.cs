namespace StackTiming.Lines.Sections;

/// <summary>
/// A trapezoidal conductor of a cross-section. It displaces the dielectric that it is drawn over.
/// </summary>
/// <param name="Name">Name in results; unique in its section.</param>
/// <param name="Grounded">True for pours and finite planes, which stay at zero volts and are not signals.</param>
/// <param name="CentreMetres">x of its axis of symmetry, in metres.</param>
/// <param name="WideMetres">Width of the wide face (the width on the drawing), in metres.</param>
/// <param name="NarrowMetres">Width of the narrow face, in metres; 0 &lt; narrow ≤ wide.</param>
/// <param name="ThicknessMetres">Height of the trapezoid in metres; 0 is a thin strip.</param>
/// <param name="BottomMetres">y of its lower face, in metres.</param>
/// <param name="WideFaceDown">True where the wide face is the lower one.</param>
public sealed record SectionConductor(
    string Name,
    bool Grounded,
    double CentreMetres,
    double WideMetres,
    double NarrowMetres,
    double ThicknessMetres,
    double BottomMetres,
    bool WideFaceDown)
{
    /// <summary>y of its upper face, in metres.</summary>
    public double TopMetres => BottomMetres + ThicknessMetres;

    /// <summary>Width of the lower face, in metres.</summary>
    public double LowerWidthMetres => WideFaceDown ? WideMetres : NarrowMetres;

    /// <summary>Width of the upper face, in metres.</summary>
    public double UpperWidthMetres => WideFaceDown ? NarrowMetres : WideMetres;

    /// <summary>Area of the trapezoid in square metres.</summary>
    public double AreaSquareMetres => 0.5 * (WideMetres + NarrowMetres) * ThicknessMetres;
}
