using System.Collections.Frozen;
using System.Collections.Immutable;
using StackTiming.Nets.Electrical;
using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Stackups.Quantities;
using StackTiming.Stackups.Reading;
using Xunit;

namespace StackTiming.Nets.Tests.Electrical;

/// <summary>Small boards for tests of electrical nets: <c>out</c> pins drive, <c>in</c> pins receive, <c>io</c> pins do both.</summary>
internal static class BoardParts
{
    private static readonly DriverModel Driver = new(
        Quantity.Exact(0), Quantity.Exact(1.2), Quantity.Exact(34), Quantity.Exact(150e-12), Quantity.Exact(150e-12), Quantity.Exact(0), null);

    private static readonly ReceiverModel Receiver = new(Quantity.Exact(2e-12), null, null, null, [], null);

    public static BufferModel Model(string kind) => new(
        kind, default, kind is "out" or "io" ? Driver : null, kind is "in" or "io" ? Receiver : null);

    /// <summary>Parts from texts such as <c>U1.A3 out</c>, <c>U2.B4 in D0</c> (on net D0) and <c>R1 1-2</c> (series part).</summary>
    public static PartList PartsOf(params string[] texts)
    {
        var parts = new Dictionary<string, Part>();
        for (var i = 0; i < texts.Length; i++)
        {
            var words = texts[i].Split(' ');
            var at = new FilePosition("p.yaml", i + 1, 1);
            var names = words[0].Split('.');
            var part = parts.GetValueOrDefault(names[0]) ?? new Part(names[0], at, FrozenDictionary<string, PartPin>.Empty, []);
            if (names.Length == 1)
            {
                var pins = words[1].Split('-');
                part = part with { Joins = part.Joins.Add(new SeriesJoin(pins[0], pins[1], Quantity.Exact(22), Quantity.Exact(0), null)) };
            }
            if (names.Length == 2 || words.Length == 4)
            {
                var stated = part.Pins.ToDictionary();
                foreach (var (name, net) in names.Length == 2
                    ? [(names[1], words.Length > 2 ? words[2] : null)]
                    : new (string, string?)[] { (part.Joins[^1].FirstPin, words[2]), (part.Joins[^1].SecondPin, words[3]) })
                {
                    stated[name] = new PartPin(name, at, names.Length == 2 ? Model(words[1]) : null, 0, [], net);
                }
                part = part with { Pins = stated.ToFrozenDictionary() };
            }
            parts[names[0]] = part;
        }
        return new PartList(FrozenDictionary<string, BufferModel>.Empty, parts.ToFrozenDictionary());
    }

    /// <summary>A list from rows such as <c>D0 U1.A3 *1 12</c>: net, from, to, millimetres; <c>-</c> is an empty cell.</summary>
    public static LengthList Rows(params string[] rows)
    {
        var problems = new ProblemList();
        var text = "net,from,to,length[mm],layer,width[mm]\n"
            + string.Concat(rows.Select(r => r.Replace("-", "", StringComparison.Ordinal).Replace(' ', ',') + ",L1,0.1\n"));
        var list = LengthListReader.Read(new InputFile("a.csv", text, ""), LengthListFormat.Own, null, problems);
        Assert.Empty(problems.Items);
        return list!;
    }

    public static (ElectricalNets? Nets, string[] Problems) Build(LengthList lengths, PartList parts)
    {
        var problems = new ProblemList();
        var nets = ElectricalNets.Build(lengths, parts, problems);
        Assert.Equal(problems.HasErrors, nets is null);
        return (nets, [.. problems.Items.Select(p => p.ToString())]);
    }

    public static ElectricalNets BuildWhole(LengthList lengths, PartList parts)
    {
        var (nets, problems) = Build(lengths, parts);
        Assert.Empty(problems);
        return nets!;
    }

    /// <summary>The path between two pins as text: <c>U1.A3 12 *1 8 U2.B4</c>, lengths in millimetres, series parts by name.</summary>
    public static string Show(NetPath path)
    {
        var words = new List<string> { path.Start.Name };
        for (var i = 0; i < path.Branches.Length; i++)
        {
            var branch = path.Net.Branches[path.Branches[i]];
            words.Add(branch.IsSeriesPart
                ? branch.Part!.Name
                : Math.Round(1e3 * path.Net.SegmentOf(branch).LengthMetres, 6).ToString(System.Globalization.CultureInfo.InvariantCulture));
            words.Add(path.Net.Nodes[path.Nodes[i + 1]].Name is { Length: > 0 } name ? name : "-");
        }
        return string.Join(' ', words);
    }

    public static NetPath Path(ElectricalNet net, string from, string to) => new NetTree(net, net.FindPin(from)).PathTo(net.FindPin(to));
}
