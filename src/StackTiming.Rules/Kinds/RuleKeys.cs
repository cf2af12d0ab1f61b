using StackTiming.Rules.RuleFiles;

namespace StackTiming.Rules.Kinds;

/// <summary>Keys that several kinds share, described once.</summary>
internal static class RuleKeys
{
    public static RuleKeyDoc Nets { get; } = new(
        "nets", "\"MEM_D[0..7]\"", true, "a group, net, wildcard (*, ?), range, or a list of these");

    public static RuleKeyDoc Pair { get; } = new(
        "pair", "usb", true, "a pair stated under 'pairs', a wildcard over pair names, a list of these, or [ NET_P, NET_N ]");

    public static RuleKeyDoc Drive { get; } = new(
        "drive", "U1", false, "part or pin that drives, or both for each driver in turn; otherwise that of the group, or the net's only driver");

    public static RuleKeyDoc At { get; } = new("at", "U2", false, "judge only at this part or pin; otherwise at every receiver");

    public static RuleKeyDoc Delay { get; } = new(
        "delay", "time-of-flight", false,
        "flight-time (with loads and reflections) or time-of-flight (lines, vias, packages); otherwise flight time where every receiver has a threshold and every driver a model");

    public static RuleKeyDoc Edge { get; } = new("edge", "rise", false, "rise, fall or both (default)");
}
