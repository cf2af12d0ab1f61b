namespace StackTiming.Rules.Judging;

/// <summary>Who drives each net of a rule: as the rule says, or its group, or any group that the net belongs to, or its only driver.</summary>
/// <param name="Stated">What the rule or its one group says, or null.</param>
/// <param name="ByNet">What groups say of their nets and strobes.</param>
/// <param name="Otherwise">For nets that nothing is said of.</param>
public sealed record Drivers(DriveChoice? Stated, IReadOnlyDictionary<string, DriveChoice> ByNet, DriveChoice Otherwise)
{
    /// <summary>The only driver of every net.</summary>
    public static Drivers OnlyDriver { get; } = new(null, new Dictionary<string, DriveChoice>(), DriveChoice.OnlyDriver);

    /// <summary>Who drives a net.</summary>
    /// <param name="net">The net.</param>
    public DriveChoice Of(string net) => Stated ?? (ByNet.TryGetValue(net, out var choice) ? choice : Otherwise);

    /// <summary>The same for nets that are compared with those of the rule: where nothing is said of them, they are driven as these are.</summary>
    /// <param name="net">A net of the rule.</param>
    public Drivers ForReferencesOf(string net) => this with { Otherwise = Of(net) };
}
