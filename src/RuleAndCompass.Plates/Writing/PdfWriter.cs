using RuleAndCompass.Plates.Scene;
using SkiaSharp;

namespace RuleAndCompass.Plates.Writing;

/// <summary>Writes pages as a PDF of exactly their size: vectors, searchable text, no date, no id, the same bytes for the same pages.</summary>
public static class PdfWriter
{
    private const double PointsPerMillimetre = 72 / 25.4;

    // ISO 32000-1, annex C: a reader need not show a page of more units; a larger one gets larger units.
    private const double LargestSidePoints = 14400;

    /// <summary>The file.</summary>
    /// <param name="title">What a reader of the file calls it.</param>
    /// <param name="scriptName">The script the pages came from; null leaves the mark out.</param>
    /// <param name="progress">Told the part of the pages written, 0 to 1.</param>
    /// <exception cref="ArgumentException">There is no page.</exception>
    public static byte[] Write(
        IReadOnlyList<Page> pages, string title, string? scriptName = null, IProgress<double>? progress = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(pages);
        if (pages.Count == 0)
        {
            throw new ArgumentException("A PDF has at least one page.", nameof(pages));
        }

        using MemoryStream stream = new();
        List<PdfPageSize> sizes = new(pages.Count);
        SKDocumentPdfMetadata about = new()
        {
            Title = title,
            Creator = "Rule and Compass",
            Subject = scriptName is null ? null : Origin.Line(scriptName),
            RasterDpi = 72,
            EncodingQuality = 101,
        };
        using (SKDocument document = SKDocument.CreatePdf(stream, about))
        {
            foreach (Page page in pages)
            {
                cancellation.ThrowIfCancellationRequested();
                PdfPageSize size = SizeOf(page);
                SKCanvas canvas = document.BeginPage((float)Math.Ceiling(size.Width), (float)size.Top);
                canvas.Scale((float)(PointsPerMillimetre / size.Unit));
                SkiaPainter.Paint(canvas, page, cancellation);
                document.EndPage();
                sizes.Add(size);
                progress?.Report((double)sizes.Count / pages.Count);
            }

            document.Close();
        }

        return PdfPageSizes.Append(stream.GetBuffer().AsSpan(0, (int)stream.Length), sizes, scriptName);
    }

    private static PdfPageSize SizeOf(Page page)
    {
        double width = page.WidthMillimetres * PointsPerMillimetre;
        double height = page.HeightMillimetres * PointsPerMillimetre;
        int unit = Math.Max(1, (int)Math.Ceiling((Math.Max(width, height) / LargestSidePoints) - 1e-9));
        return new PdfPageSize(width / unit, height / unit, Math.Ceiling(height / unit), unit);
    }
}
