using System.Buffers;
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

    private static readonly SearchValues<char> ControlCharacters =
        SearchValues.Create([.. Enumerable.Range(0, 0xA0).Select(c => (char)c).Where(c => char.IsControl(c) && c is not ('\t' or '\n' or '\r'))]);

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
            {
                // Names end up on terminals and in reports; escapes such as "\e" have no use there.
                if (scalar.Value.AsSpan().IndexOfAny(ControlCharacters) >= 0)
                    Object(scalar, "the text has a control character in it", "write the text without it");
                return new DataScalar(At(scalar), scalar.Value, scalar.Style is not (ScalarStyle.Plain or ScalarStyle.Any));
            }
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
                if (Node(depth + 1) is not { } item)
                    continue;
                if (IsNull(item))
                    Object(item.At, "the list has an item without a value", "write the value after the -, or remove the item");
                else
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
                        Object(key.At, "a key must be a single word", "put a text that begins with a bracket in quotes");
                    continue;
                }
                if (value is null)
                    continue;
                if (!name.Quoted && (name.Text.Contains(":{", StringComparison.Ordinal) || name.Text.Contains(":[", StringComparison.Ordinal)))
                    Object(name.At, $"no blank follows the colon in '{Suggestion.Shorten(name.Text)}'", "write key: { … }, with a blank after the colon");
                else if (name.Text.Length == 0)
                    Object(name.At, "a key is empty", "write the key before the colon");
                else if (IsNull(value))
                    Object(name.At, $"'{Suggestion.Shorten(name.Text)}' has no value", AdviceForNoValue(name));
                else if (!first.TryAdd(name.Text, name.At))
                    Object(name.At, $"'{Suggestion.Shorten(name.Text)}' stands twice", $"keep one; the first is in line {first[name.Text].Line}");
                else
                    entries.Add(new DataEntry(name.At, name.Text, value));
            }
            return new DataMap(At(start), entries.ToImmutable());
        }

        private static bool IsNull(DataNode node) => node is DataScalar { Quoted: false, Text: "" or "~" or "null" };

        // Inside braces, dk:3.9 is a key of that name to YAML.
        private static string AdviceForNoValue(DataScalar key) => !key.Quoted && key.Text.IndexOf(':', StringComparison.Ordinal) is var colon and > 0
            ? $"put a blank after the colon: {Suggestion.Shorten(key.Text[..colon])}: {Suggestion.Shorten(key.Text[(colon + 1)..])}"
            : "write one after the colon, or remove the key";

        private FilePosition At(ParsingEvent node) => new(file.Path, (int)node.Start.Line, (int)node.Start.Column);

        private void Object(ParsingEvent node, string message, string? advice) => Object(At(node), message, advice);

        private void Object(FilePosition at, string message, string? advice)
        {
            whole = false;
            problems.Error(at, message, advice);
        }
    }
}
