using UglyToad.PdfPig;
using UglyToad.PdfPig.Content;
using UglyToad.PdfPig.Core;

namespace RuleAndCompass.Plates.Tests;

/// <summary>What an independent reader finds in a PDF, in millimetres from the page's top left corner.</summary>
internal static class PdfReading
{
    public const double PointsPerMillimetre = 72 / 25.4;

    public static List<Page> Pages(byte[] file)
    {
        using PdfDocument document = PdfDocument.Open(file);
        return [.. document.GetPages()];
    }

    /// <summary>The straight pieces that are stroked, by their ends. The reader gives widths in the page's own drawing unit, which is the millimetre.</summary>
    public static List<(double X1, double Y1, double X2, double Y2, double Width)> Lines(Page page)
    {
        List<(double, double, double, double, double)> lines = [];
        foreach (UglyToad.PdfPig.Graphics.PdfPath path in page.Paths.Where(path => path.IsStroked))
        {
            foreach (PdfSubpath subpath in path)
            {
                foreach (PdfSubpath.IPathCommand command in subpath.Commands)
                {
                    if (command is PdfSubpath.Line line)
                    {
                        lines.Add((X(line.From), Y(page, line.From), X(line.To), Y(page, line.To), path.LineWidth));
                    }
                }
            }
        }

        return lines;
    }

    /// <summary>Spots along the curves that are stroked, sixteen to a piece.</summary>
    public static IEnumerable<(double X, double Y)> CurveSpots(Page page)
    {
        foreach (PdfSubpath.CubicBezierCurve curve in page.Paths.Where(path => path.IsStroked).SelectMany(path => path).SelectMany(subpath => subpath.Commands).OfType<PdfSubpath.CubicBezierCurve>())
        {
            for (int i = 0; i <= 16; i++)
            {
                double t = i / 16.0, s = 1 - t;
                double x = (s * s * s * curve.StartPoint.X) + (3 * s * s * t * curve.FirstControlPoint.X) + (3 * s * t * t * curve.SecondControlPoint.X) + (t * t * t * curve.EndPoint.X);
                double y = (s * s * s * curve.StartPoint.Y) + (3 * s * s * t * curve.FirstControlPoint.Y) + (3 * s * t * t * curve.SecondControlPoint.Y) + (t * t * t * curve.EndPoint.Y);
                yield return (x / PointsPerMillimetre, (page.Height - y) / PointsPerMillimetre);
            }
        }
    }

    /// <summary>All letters in the order in which they were set, without blanks: lines that follow on read through.</summary>
    public static string Text(Page page) => Closed(page.Text);

    /// <summary>A text without its blanks.</summary>
    public static string Closed(string text) => string.Concat(text.Where(sign => !char.IsWhiteSpace(sign)));

    /// <summary>Says that a text stands on a page, wherever its lines break.</summary>
    public static void ShouldTell(this string pageText, string text) => pageText.ShouldContain(Closed(text), Case.Sensitive);

    private static double X(PdfPoint point) => point.X / PointsPerMillimetre;

    private static double Y(Page page, PdfPoint point) => (page.Height - point.Y) / PointsPerMillimetre;
}
