namespace StackTiming.Nets.Electrical;

/// <summary>Which pin drives an electrical net.</summary>
/// <param name="Node">Index of the driving node; −1 where there is none or the choice is open.</param>
/// <param name="Objection">Why there is none, in a sentence without a final full stop; empty where there is one.</param>
/// <param name="Advice">What to write; empty where there is one.</param>
public readonly record struct DriverChoice(int Node, string Objection, string Advice)
{
    /// <summary>True where one pin drives.</summary>
    public bool IsFound => Node >= 0;

    /// <summary>Finds the driver.</summary>
    /// <param name="net">The net.</param>
    /// <param name="drive">A part (<c>U1</c>) or pin (<c>U1.A3</c>) that is to drive, or null to take the only one that can.</param>
    public static DriverChoice Of(ElectricalNet net, string? drive)
    {
        var candidates = net.DriverNodes.ToArray();
        var name = string.Join(" + ", net.NetNames.Take(3));
        if (candidates.Length == 0)
            return new DriverChoice(-1, $"no pin of '{name}' can drive it", "give one of its pins a model with a driver in the parts file");
        var asked = drive is null ? candidates : Array.FindAll(candidates, i => net.Nodes[i].Name == drive || net.Nodes[i].Part!.Name == drive);
        var named = string.Join(", ", (asked.Length > 0 ? asked : candidates).Take(6).Select(i => net.Nodes[i].Name));
        return asked.Length switch
        {
            1 => new DriverChoice(asked[0], "", ""),
            0 => new DriverChoice(-1, $"'{drive}' has no pin that can drive '{name}'", $"its drivers are {named}"),
            _ => new DriverChoice(
                -1, $"several pins can drive '{name}': {named}", $"say which one, such as drive: {net.Nodes[asked[0]].Part!.Name}{(drive is null ? "" : "." + net.Nodes[asked[0]].Pin!.Name)}"),
        };
    }
}
