using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Stackups.Reading;

namespace StackTiming.Nets.Electrical;

/// <summary>Which net every pin lies on, from the rows and from what the parts file says of nets whose rows name no pins.</summary>
internal sealed class PinPlaces
{
    private readonly Dictionary<string, int> netOfPin = new(StringComparer.Ordinal);
    private readonly Dictionary<int, List<(string Name, Part Part, PartPin Pin)>> statedByParts = [];
    private readonly LengthList lengths;
    private readonly PartList parts;
    private readonly ProblemList problems;

    /// <summary>Finds the places of all pins.</summary>
    public PinPlaces(LengthList lengths, PartList parts, ProblemList problems)
    {
        (this.lengths, this.parts, this.problems) = (lengths, parts, problems);
        var unstated = new UnstatedPins(parts, problems);
        foreach (var net in lengths.Nets)
        {
            foreach (ref readonly var segment in lengths.SegmentsOf(net))
            {
                AddFromRow(segment.From, net, segment, unstated);
                AddFromRow(segment.To, net, segment, unstated);
            }
        }
        foreach (var part in parts.Parts.Values.OrderBy(p => p.At.Line).ThenBy(p => p.At.Column))
        {
            foreach (var pin in part.Pins.Values.Where(p => p.Net is not null).OrderBy(p => p.At.Line).ThenBy(p => p.At.Column).ThenBy(p => p.Name, StringComparer.Ordinal))
                AddFromPart(part, pin);
        }
        unstated.Report();
    }

    /// <summary>The net of a pin, or −1.</summary>
    public int NetOf(string pin) => netOfPin.GetValueOrDefault(pin, -1);

    /// <summary>The pins that the parts file puts on a net whose rows do not name them.</summary>
    public IReadOnlyList<(string Name, Part Part, PartPin Pin)> StatedByParts(int net) => statedByParts.TryGetValue(net, out var pins) ? pins : [];

    /// <summary>What the parts file says of a pin.</summary>
    public (Part? Part, PartPin? Pin) Find(ReadOnlySpan<char> name)
    {
        var dot = name.LastIndexOf(NetEnd.PinSeparator);
        if (dot <= 0 || !parts.Parts.GetAlternateLookup<ReadOnlySpan<char>>().TryGetValue(name[..dot], out var part))
            return (null, null);
        return (part, part.Pins.GetAlternateLookup<ReadOnlySpan<char>>().TryGetValue(name[(dot + 1)..], out var pin) ? pin : null);
    }

    private void AddFromRow(string name, Net net, in Segment segment, UnstatedPins unstated)
    {
        if (name.Length == 0 || NetEnd.IsLabel(name))
            return;
        if (!netOfPin.TryAdd(name, net.Index))
        {
            if (netOfPin[name] is var other && other != net.Index)
            {
                problems.Error(
                    lengths.PositionOf(segment), $"the pin '{name}' lies on two nets, '{lengths.Nets[other].Name}' and '{net.Name}'", "a pin lies on one net");
            }
            return;
        }
        var (part, pin) = Find(name);
        if (pin is null)
            unstated.Add(name, part, lengths.PositionOf(segment));
    }

    private void AddFromPart(Part part, PartPin pin)
    {
        var name = $"{part.Name}{NetEnd.PinSeparator}{pin.Name}";
        if (lengths.Find(pin.Net!) is not { } net)
        {
            problems.Error(
                pin.At, $"the length list has no net '{Suggestion.Shorten(pin.Net!)}'",
                lengths.Nets.Length <= 10_000 ? Suggestion.For(pin.Net!, lengths.Nets.Select(n => n.Name)) : "check the name");
        }
        else if (netOfPin.TryGetValue(name, out var other))
        {
            if (other != net.Index)
                problems.Error(pin.At, $"the pin '{name}' is said to lie on '{net.Name}', but the length list has it on '{lengths.Nets[other].Name}'", "remove 'net'");
        }
        else
        {
            netOfPin.Add(name, net.Index);
            if (!statedByParts.TryGetValue(net.Index, out var pins))
                statedByParts.Add(net.Index, pins = []);
            pins.Add((name, part, pin));
        }
    }
}
