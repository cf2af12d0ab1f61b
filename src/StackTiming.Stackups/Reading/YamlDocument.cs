using System.Collections.Immutable;
using YamlDotNet.Core;
using YamlDotNet.Core.Events;

namespace StackTiming.Stackups.Reading;

/// <summary>
/// Turns a YAML file into nodes with their places. Only the plain part of YAML is accepted: one document, no anchors, aliases or tags, so
/// that what a file says is what it shows, and no small file can grow large in memory.
/// </summary>
public static class YamlDocument
{
    /// <summary>Deepest nesting accepted.</summary>
    public const int DeepestNesting = 40;

    /// <summary>Most nodes accepted.</summary>
    public const int MostNodes = 2_000_000;

    /// <summary>Reads a file whose outermost value is a mapping.</summary>
    /// <param name="file">The file.</param>
    /// <param name="problems">Where problems go.</param>
    public static DataMap? ReadMap(InputFile file, ProblemList problems)
    {
        var reading = new Reader(file, problems);
        try
        {
            return reading.Document();
        }
        catch (Exception failure) when (failure is YamlException or InvalidOperationException or ArgumentException)
        {
            var (at, message, advice) = YamlWording.Explain(file, failure);
            problems.Error(at, message, advice);
            return null;
        }
    }

    private sealed class Reader(InputFile file, ProblemList problems)
    {
        private readonly Parser parser = new(new StringReader(file.Text));
        private int nodes;
        private bool whole = true;

        public DataMap? Document()
        {
            parser.Consume<StreamStart>();
            if (!parser.TryConsume<DocumentStart>(out _))
            {
                problems.Error(FilePosition.WholeFile(file.Path), "the file has no content");
                return null;
            }
            var root = Node(0);
            parser.Consume<DocumentEnd>();
            if (parser.TryConsume<DocumentStart>(out var second))
                Object(second, "a second document begins here", "keep one document a file; remove the line ---");
            if (!whole || root is null)
                return null;
            if (root is DataMap map)
                return map;
            problems.Error(root.At, "the file must be a mapping", "begin with lines such as name: my board");
            return null;
        }

        private DataNode? Node(int depth)
        {
            if (parser.Accept<AnchorAlias>(out var alias))
            {
                parser.MoveNext();
                Object(alias, $"the alias '*{Suggestion.Shorten(alias.Value.Value)}' is not accepted", "write the value out, or put a text that begins with * in quotes");
                return null;
            }
            if (parser.Current is NodeEvent node && ++nodes <= MostNodes)
            {
                if (!node.Anchor.IsEmpty)
                    Object(node, $"the anchor '&{Suggestion.Shorten(node.Anchor.Value)}' is not accepted", "write the value out where it is needed");
                if (!node.Tag.IsEmpty && !node.Tag.IsNonSpecific)
                    Object(node, "tags (words that begin with !) are not accepted", "remove the tag, or put the text in quotes");
            }
            if (nodes > MostNodes || depth > DeepestNesting)
                throw new YamlException(parser.Current!.Start, parser.Current.End, depth > DeepestNesting ? YamlWording.TooDeep : YamlWording.TooLarge);
            if (parser.TryConsume<Scalar>(out var scalar))
                return new DataScalar(At(scalar), scalar.Value, scalar.Style is not (ScalarStyle.Plain or ScalarStyle.Any));
            if (parser.TryConsume<SequenceStart>(out var sequence))
                return List(sequence, depth);
            var start = parser.Consume<MappingStart>();
            return Map(start, depth);
        }

        private DataList List(SequenceStart start, int depth)
        {
            var items = ImmutableArray.CreateBuilder<DataNode>();
            while (!parser.TryConsume<SequenceEnd>(out _))
            {
                if (Node(depth + 1) is { } item)
                    items.Add(item);
            }
            return new DataList(At(start), items.ToImmutable());
        }

        private DataMap Map(MappingStart start, int depth)
        {
            var entries = ImmutableArray.CreateBuilder<DataEntry>();
            var first = new Dictionary<string, FilePosition>(StringComparer.Ordinal);
            while (!parser.TryConsume<MappingEnd>(out _))
            {
                var key = Node(depth + 1);
                var value = Node(depth + 1);
                if (key is not DataScalar name)
                {
                    if (key is not null)
                        Object(start, "a key must be a single word", null);
                    continue;
                }
                if (value is null)
                    continue;
                if (value is DataScalar { Quoted: false, Text: "" or "~" or "null" })
                    Object(name.At, $"'{Suggestion.Shorten(name.Text)}' has no value", "write one after the colon, or remove the key");
                else if (!first.TryAdd(name.Text, name.At))
                    Object(name.At, $"'{Suggestion.Shorten(name.Text)}' stands twice", $"keep one; the first is in line {first[name.Text].Line}");
                else
                    entries.Add(new DataEntry(name.At, name.Text, value));
            }
            return new DataMap(At(start), entries.ToImmutable());
        }

        private FilePosition At(ParsingEvent node) => new(file.Path, (int)node.Start.Line, (int)node.Start.Column);

        private void Object(ParsingEvent node, string message, string? advice) => Object(At(node), message, advice);

        private void Object(FilePosition at, string message, string? advice)
        {
            whole = false;
            problems.Error(at, message, advice);
        }
    }
}
