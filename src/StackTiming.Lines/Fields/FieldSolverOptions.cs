namespace StackTiming.Lines.Fields;

/// <summary>How far the field solver goes.</summary>
/// <param name="RelativeTolerance">
/// The solver refines until the estimated relative error of every entry of C and L above a hundredth of the largest is below this.
/// </param>
/// <param name="MostUnknowns">
/// The solver does not go on to a mesh with more unknowns than this; n unknowns take up to 24 n² bytes. A result that stays above the
/// tolerance for that reason says so in a warning.
/// </param>
public sealed record FieldSolverOptions(double RelativeTolerance, int MostUnknowns = 2500)
{
    /// <summary>Three parts in ten thousand: a third of what a signed report needs.</summary>
    public static FieldSolverOptions Default { get; } = new(3e-4);
}
