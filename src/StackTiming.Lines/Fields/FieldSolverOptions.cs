namespace StackTiming.Lines.Fields;

/// <summary>How far the field solver goes.</summary>
/// <param name="RelativeTolerance">
/// The solver refines until the estimated relative error of every entry of C and L above a hundredth of the largest is below this.
/// </param>
public sealed record FieldSolverOptions(double RelativeTolerance)
{
    /// <summary>Three parts in ten thousand: a third of what a signed report needs.</summary>
    public static FieldSolverOptions Default { get; } = new(3e-4);
}
