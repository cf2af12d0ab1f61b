using System.Collections.Immutable;

namespace StackTiming.Rules.Judging;

/// <summary>A net of a rule with the drivers that it is judged from.</summary>
/// <param name="Net">The net.</param>
/// <param name="Drives">The net from each driver meant; empty where there is none.</param>
/// <param name="Objection">Why there is none.</param>
public readonly record struct JudgedNet(string Net, ImmutableArray<DrivenNet> Drives, string Objection)
{
    /// <summary>
    /// The nets of a rule from their drivers. Where a series part joins two of them, their driver is the same and both would be judged alike;
    /// the first stands for both.
    /// </summary>
    /// <param name="board">The board.</param>
    /// <param name="nets">The nets.</param>
    /// <param name="drive">Who drives.</param>
    public static IEnumerable<JudgedNet> Of(IBoardPhysics board, ImmutableArray<string> nets, Drivers drive)
    {
        var seen = new HashSet<string>(StringComparer.Ordinal);
        foreach (var net in nets)
        {
            var drives = board.Drives(net, drive.Of(net), out var objection);
            var fresh = drives.RemoveAll(d => seen.Contains(d.Driver));
            foreach (var driven in fresh)
                seen.Add(driven.Driver);
            if (drives.IsEmpty || !fresh.IsEmpty)
                yield return new JudgedNet(net, fresh, objection);
        }
    }

    /// <summary>Names the net as one of its drivers sees it: with the driver, where there are several.</summary>
    /// <param name="driven">One of the drives.</param>
    public string SubjectOf(DrivenNet driven) => Drives.Length > 1 ? $"{Net} from {driven.Driver}" : Net;

    /// <summary>Names one of its receivers: with driver and receiver, where there are several.</summary>
    /// <param name="driven">One of the drives.</param>
    /// <param name="receiver">One of its receivers.</param>
    public string SubjectOf(DrivenNet driven, string receiver) =>
        driven.Receivers.Length > 1 ? $"{SubjectOf(driven)} at {receiver}" : SubjectOf(driven);
}
