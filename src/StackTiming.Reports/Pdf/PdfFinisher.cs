using System.Globalization;
using System.Security.Cryptography;
using System.Text;
using PdfSharp.Pdf;
using PdfSharp.Pdf.IO;
using StackTiming.Reports.Documents;

namespace StackTiming.Reports.Pdf;

/// <summary>
/// Adds to the drawn pages what the drawing library cannot: the outline, attached files, the language, and dates and identifiers that
/// depend on the content alone.
/// </summary>
internal static class PdfFinisher
{
    /// <summary>Finishes the file.</summary>
    /// <param name="pages">The drawn pages.</param>
    /// <param name="output">Where to.</param>
    /// <param name="document">The report.</param>
    /// <param name="outline">The entries of the outline in reading order.</param>
    /// <param name="format">The paper.</param>
    public static void Finish(MemoryStream pages, Stream output, ReportDocument document, IReadOnlyList<OutlineEntry> outline, PageFormat format)
    {
        var digest = SHA256.HashData(pages.GetBuffer().AsSpan(0, (int)pages.Length));
        using var pdf = PdfReader.Open(pages, PdfDocumentOpenMode.Modify);
        AddOutline(pdf, outline, format);
        AddAttachments(pdf, document);
        pdf.Language = "en";
        pdf.PageMode = PdfPageMode.UseOutlines;

        var date = string.Create(CultureInfo.InvariantCulture, $"D:{document.Date:yyyyMMdd}000000Z");
        pdf.Info.Elements.SetString("/CreationDate", date);
        pdf.Info.Elements.SetString("/ModDate", date);
        pdf.Internals.FirstDocumentID = Latin1(digest.AsSpan(0, 16));
        pdf.Internals.SecondDocumentID = Latin1(digest.AsSpan(0, 16));

        using var saved = new MemoryStream((int)pages.Length + 65536);
        pdf.Save(saved, closeStream: false);
        var bytes = saved.GetBuffer().AsSpan(0, (int)saved.Length);
        FixIdentifiers(bytes, digest);
        output.Write(bytes);
    }

    private static void AddOutline(PdfDocument pdf, IReadOnlyList<OutlineEntry> outline, PageFormat format)
    {
        var parents = new PdfOutlineCollection?[8];
        parents[0] = pdf.Outlines;
        foreach (var entry in outline)
        {
            var level = Math.Min(entry.Level, parents.Length - 1);
            var siblings = parents[level - 1] ?? pdf.Outlines;
            var item = new PdfOutline(entry.Text, pdf.Pages[entry.Page - 1], opened: false)
            {
                PageDestinationType = PdfPageDestinationType.Xyz,
                Left = 0,
                Top = format.Height - Math.Max(0, entry.Y - 10),
            };
            siblings.Add(item);
            parents[level] = item.Outlines;
            parents.AsSpan(level + 1).Clear();
        }
    }

    private static void AddAttachments(PdfDocument pdf, ReportDocument document)
    {
        if (document.Attachments.IsEmpty)
            return;
        var names = new PdfArray(pdf);
        var associated = new PdfArray(pdf);
        var date = string.Create(CultureInfo.InvariantCulture, $"D:{document.Date:yyyyMMdd}000000Z");
        foreach (var attachment in document.Attachments.OrderBy(a => a.FileName, StringComparer.Ordinal))
        {
            var content = attachment.Content.ToArray();
            var file = new PdfDictionary(pdf);
            file.CreateStream(content);
            file.Stream.Zip();
            file.Elements.SetName("/Type", "/EmbeddedFile");
            file.Elements.SetName("/Subtype", "/" + attachment.MediaType);
            var parameters = new PdfDictionary(pdf);
            parameters.Elements.SetInteger("/Size", content.Length);
            parameters.Elements.SetString("/ModDate", date);
            file.Elements["/Params"] = parameters;
            pdf.Internals.AddObject(file);

            var versions = new PdfDictionary(pdf);
            versions.Elements.SetReference("/F", file);
            versions.Elements.SetReference("/UF", file);
            var specification = new PdfDictionary(pdf);
            specification.Elements.SetName("/Type", "/Filespec");
            specification.Elements.SetString("/F", attachment.FileName);
            specification.Elements["/UF"] = new PdfString(attachment.FileName, PdfStringEncoding.Unicode);
            specification.Elements["/Desc"] = new PdfString(attachment.Description, PdfStringEncoding.Unicode);
            specification.Elements.SetName("/AFRelationship", "/Data");
            specification.Elements["/EF"] = versions;
            pdf.Internals.AddObject(specification);
            names.Elements.Add(new PdfString(attachment.FileName));
            names.Elements.Add(specification.ReferenceNotNull);
            associated.Elements.Add(specification.ReferenceNotNull);
        }
        var tree = new PdfDictionary(pdf);
        tree.Elements["/Names"] = names;
        var catalog = pdf.Internals.Catalog;
        var directory = catalog.Elements.GetDictionary("/Names") ?? new PdfDictionary(pdf);
        directory.Elements["/EmbeddedFiles"] = tree;
        catalog.Elements["/Names"] = directory;
        catalog.Elements["/AF"] = associated;
    }

    // The library stamps random identifiers into the metadata packet as it saves. They are replaced, in place and at equal length, by
    // ones that follow from the content.
    private static void FixIdentifiers(Span<byte> file, ReadOnlySpan<byte> digest)
    {
        var identifier = Encoding.ASCII.GetBytes(new Guid(digest[..16]).ToString("D"));
        var mark = "uuid:"u8;
        var packet = file.LastIndexOf("<?xpacket begin"u8);
        if (packet < 0)
            return;
        var rest = file[packet..];
        var end = rest.IndexOf("<?xpacket end"u8);
        rest = rest[..Math.Max(0, end)];
        int at;
        while ((at = rest.IndexOf(mark)) >= 0 && at + mark.Length + identifier.Length <= rest.Length)
        {
            identifier.CopyTo(rest[(at + mark.Length)..]);
            rest = rest[(at + mark.Length + identifier.Length)..];
        }
    }

    private static string Latin1(ReadOnlySpan<byte> bytes) => Encoding.Latin1.GetString(bytes);
}
