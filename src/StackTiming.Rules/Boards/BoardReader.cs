using System.Collections.Immutable;
using StackTiming.Nets.Electrical;
using StackTiming.Nets.Lengths;
using StackTiming.Nets.Parts;
using StackTiming.Rules.Judging;
using StackTiming.Rules.RuleFiles;
using StackTiming.Rules.Waivers;
using StackTiming.Stackups.Layers;
using StackTiming.Stackups.Reading;

namespace StackTiming.Rules.Boards;

/// <summary>Reads a board file and all files that it names. All problems of all files are found in one run.</summary>
public sealed class BoardReader
{
    private readonly ProblemList problems;
    private readonly BoardFiles files;
    private readonly CancellationToken cancellation;

    private BoardReader(string path, ProblemList problems, CancellationToken cancellation)
    {
        this.problems = problems;
        this.cancellation = cancellation;
        files = new BoardFiles(path, problems);
    }

    /// <summary>Reads a board.</summary>
    /// <param name="path">Path of the board file.</param>
    /// <param name="problems">Where problems go.</param>
    /// <param name="cancellation">Stops the reading.</param>
    /// <returns>The board, or null where any of its files has an error.</returns>
    public static Board? Read(string path, ProblemList problems, CancellationToken cancellation)
    {
        var errors = problems.ErrorCount;
        if (string.IsNullOrWhiteSpace(path) || path.Contains('\0', StringComparison.Ordinal))
        {
            problems.Error(FilePosition.WholeFile("board"), "the path of the board file is empty", "name a board file, such as board.yaml");
            return null;
        }
        var board = new BoardReader(path, problems, cancellation).Read(path);
        return problems.ErrorCount > errors ? null : board;
    }

    private Board? Read(string path)
    {
        var from = FilePosition.WholeFile(path);
        if (files.Yaml(path, from, "board") is not { } map)
            return null;
        var reader = FileHeader.Open(map, problems);
        var name = reader.NeedText("name", "name: Harbour buoy recorder");
        var revision = reader.Text("revision") ?? "";
        var stackUp = ReadStackUp(reader);
        cancellation.ThrowIfCancellationRequested();
        var lengths = ReadLengths(reader, stackUp);
        cancellation.ThrowIfCancellationRequested();
        var parts = ReadParts(reader);
        var electrical = lengths is null || parts is null ? null : ElectricalNets.Build(lengths, parts, problems);
        var rules = new RuleFileReader(files, problems);
        var scope = ReadRules(reader, rules);
        var waivers = ReadWaivers(reader);
        var coupons = ReadCoupons(reader);
        var assumed = SignalAssumptions.Read(reader);
        reader.Finish();
        files.NoteOutside(from);
        cancellation.ThrowIfCancellationRequested();

        var index = lengths is null ? null : new NetIndex(lengths.Nets.Select(n => n.Name));
        var resolver = new NetResolver(index, problems);
        var layers = stackUp?.CopperLayers.Select(l => l.Name).ToHashSet(StringComparer.Ordinal);
        var built = RuleBuilder.Build(rules.Entries, rules.Scopes, resolver, layers, problems);
        if (problems.HasErrors || name is null || stackUp is null || lengths is null || parts is null || electrical is null || index is null)
            return null;
        DriverCheck.Run(built, electrical, problems);
        if (problems.HasErrors)
            return null;
        return new Board
        {
            Name = name,
            Revision = revision,
            StackUp = stackUp,
            Lengths = lengths,
            Electrical = electrical,
            Parts = parts,
            Rules = built,
            Waivers = [.. waivers.Select(w => ResolvedWaiver.Of(w, scope, index))],
            Coupons = coupons,
            Assumed = assumed,
            Inputs = files.Digests,
            Notes = [.. problems.Items.Where(p => !p.IsError)],
        };
    }

    private StackUp? ReadStackUp(MapReader reader)
    {
        if (reader.NeedText("stackup", "stackup: buoy.stackup.yaml") is not { } path)
            return null;
        var at = reader.PositionOf("stackup");
        return files.Resolve(path, at) is { } shown && files.Load(shown, at, "stackup") is { } file ? StackUpReader.Read(file, problems) : null;
    }

    private LengthList? ReadLengths(MapReader reader, StackUp? stackUp)
    {
        reader.Need("lengths", "lengths: buoy.lengths.csv");
        var common = LengthListFormatReader.Read(reader);
        var sources = new List<(InputFile, LengthListFormat)>();
        var whole = true;
        var items = reader.List("lengths");
        foreach (var item in items)
        {
            var (path, at, format) = ReadLengthsItem(reader, item, common);
            if (path is not null && files.Resolve(path, at) is { } shown && files.Load(shown, at, "lengths") is { } file)
                sources.Add((file, format));
            else
                whole = false;
        }
        if (items.IsEmpty && reader.Has("lengths"))
            problems.Error(reader.PositionOf("lengths"), "'lengths' names no file", "write lengths: buoy.lengths.csv");
        var list = sources.Count > 0 ? LengthListReader.Read(sources, stackUp, problems) : null;
        return whole ? list : null;
    }

    /// <summary>A length list is a path, or a mapping with its path and how this one file is written.</summary>
    private (string? Path, FilePosition At, LengthListFormat Format) ReadLengthsItem(MapReader reader, DataNode item, LengthListFormat common)
    {
        if (item is not DataMap map)
            return (reader.TextOf(item, "lengths"), item.At, common);
        var inner = new MapReader(map, reader.Units, problems);
        var path = inner.NeedText("file", "file: buoy.lengths.csv");
        var own = map.Entries.Length > 1;
        var format = LengthListFormatReader.Read(inner);
        inner.Finish();
        return (path, inner.PositionOf("file"), own ? format : common);
    }

    private PartList? ReadParts(MapReader reader)
    {
        if (reader.Text("parts") is not { } path)
            return reader.Has("parts") ? null : PartList.Empty;
        var at = reader.PositionOf("parts");
        if (files.Resolve(path, at) is not { } shown || files.Yaml(shown, at, "parts") is not { } map)
            return null;
        return PartListReader.Read(FileHeader.Open(map, problems));
    }

    private RuleScope ReadRules(MapReader reader, RuleFileReader rules)
    {
        var scope = rules.NewScope();
        rules.ReadNames(reader, scope);
        reader.Need("rules", "rules: buoy.rules.yaml");
        foreach (var item in reader.List("rules"))
            rules.ReadItem(item, scope, "", reader.Units, allowPath: true);
        if (reader.Has("rules") && rules.Entries.Count == 0 && !problems.HasErrors)
            problems.Error(reader.PositionOf("rules"), "the board has no rule, so there is nothing to check", "write rules: [ { id: …, kind: …, nets: … } ]");
        return scope;
    }

    private List<Waiver> ReadWaivers(MapReader reader)
    {
        var waivers = new List<Waiver>();
        foreach (var item in reader.List("waivers"))
        {
            if (item is DataMap map)
                Add(map, reader);
            else if (reader.TextOf(item, "waivers") is { } path)
                ReadWaiverFile(path, item.At);
        }
        return waivers;

        void Add(DataMap map, MapReader owner)
        {
            if (Waiver.Read(new MapReader(map, owner.Units, problems)) is { } waiver)
                waivers.Add(waiver);
        }

        void ReadWaiverFile(string path, FilePosition at)
        {
            if (files.Resolve(path, at) is not { } shown || files.Yaml(shown, at, "waivers") is not { } map)
                return;
            var inner = FileHeader.Open(map, problems);
            inner.Need("waivers", "waivers: [ { rule: …, nets: …, reason: …, approved-by: …, until: … } ]");
            foreach (var item in inner.List("waivers"))
            {
                if (inner.MapOf(item, "waivers") is not null && item is DataMap waiver)
                    Add(waiver, inner);
            }
            inner.Finish();
        }
    }

    private ImmutableArray<string> ReadCoupons(MapReader reader)
    {
        var coupons = ImmutableArray.CreateBuilder<string>();
        foreach (var item in reader.List("coupons"))
        {
            if (reader.TextOf(item, "coupons") is { } path && files.Resolve(path, item.At) is { } shown && files.Load(shown, item.At, "coupons") is not null)
                coupons.Add(shown);
        }
        if (coupons.Count > 0)
            problems.Note(reader.PositionOf("coupons"), "coupon readings do not change the verdict of a check");
        return coupons.ToImmutable();
    }
}
