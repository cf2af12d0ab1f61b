namespace StackTiming.Reports.Results;

/// <summary>The program that made a result.</summary>
/// <param name="Name">Its name.</param>
/// <param name="Version">Its version.</param>
public sealed record ToolIdentity(string Name, string Version)
{
    /// <inheritdoc/>
    public override string ToString() => $"{Name} {Version}";
}
