namespace StackTiming.Reports.Pdf;

/// <summary>
/// Lets pieces flow over pages. A piece that must stay with the next one moves with it, so that no heading stands alone at the foot of a
/// page; where a table goes on, its head is repeated.
/// </summary>
internal sealed class Paginator
{
    private readonly PageFormat format;
    private List<PlacedChunk> page = [];
    private float y;

    private Paginator(PageFormat format)
    {
        this.format = format;
        y = format.Top;
        Pages.Add(page);
    }

    /// <summary>The pages with what stands on them.</summary>
    public List<List<PlacedChunk>> Pages { get; } = [];

    /// <summary>Page of each anchor, from 1.</summary>
    public Dictionary<string, int> PageOfAnchor { get; } = [];

    /// <summary>The outline in the order of the pages.</summary>
    public List<OutlineEntry> Outline { get; } = [];

    /// <summary>Places the pieces.</summary>
    /// <param name="chunks">The pieces in the order of reading.</param>
    /// <param name="format">The paper.</param>
    public static Paginator Flow(IEnumerable<Chunk> chunks, PageFormat format)
    {
        var paginator = new Paginator(format);
        var group = new List<Chunk>();
        foreach (var chunk in chunks)
        {
            group.Add(chunk);
            if (chunk.KeepWithNext)
                continue;
            paginator.Place(group);
            group.Clear();
        }
        paginator.Place(group);
        return paginator;
    }

    private float Bottom => format.Height - format.Bottom;

    private void Place(List<Chunk> group)
    {
        if (group.Count == 0)
            return;
        var height = 0f;
        foreach (var chunk in group)
            height += chunk.Height + chunk.SpaceBefore;
        var first = group[0];
        var startsPage = page.Count == 0;
        if (!startsPage && (first.BeginsPage || (y + height > Bottom && height <= format.ContentHeight)))
            NewPage();
        foreach (var chunk in group)
            Place(chunk);
    }

    private void Place(Chunk chunk)
    {
        if (page.Count > 0 && y + chunk.SpaceBefore + chunk.Height > Bottom)
            NewPage();
        if (page.Count == 0 && chunk.HeadOnNewPage is { } head && Pages.Count > 1)
        {
            page.Add(new PlacedChunk(head, y));
            y += head.Height;
        }
        else if (page.Count > 0)
        {
            y += chunk.SpaceBefore;
        }
        page.Add(new PlacedChunk(chunk, y));
        if (chunk.Anchor is not null)
            PageOfAnchor.TryAdd(chunk.Anchor, Pages.Count);
        if (chunk.Outline is var (level, text))
            Outline.Add(new OutlineEntry(level, text, Pages.Count, y));
        y += chunk.Height;
    }

    private void NewPage()
    {
        page = [];
        Pages.Add(page);
        y = format.Top;
    }
}
