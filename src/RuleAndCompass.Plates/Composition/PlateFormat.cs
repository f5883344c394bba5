using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>The measures of a step plate: the drawing left, the sentences right, the title block under them. Millimetres on a grid of 4.</summary>
internal sealed record PlateFormat(double Width, double Height, double ColumnWidth, double TextSize)
{
    public const double Margin = 12;
    public const double Leading = 4;
    public const double NoteLeading = 3.2;
    public const double NoteSize = 2.45;
    public const double TitleSize = 4.8;
    public const double TitleLeading = 6;
    public const double NameSize = 2.8;
    public const double NumberSize = 2.6;
    public const double NumberWidth = 8;
    public const double TitleBlockHeight = 32;
    public const double KeyHeight = 38;
    public const double ThumbnailRowHeight = 24;
    public const double FootHeight = 8;

    private const double Gutter = 8;

    public double ColumnLeft => Width - Margin - ColumnWidth;

    public double ColumnRight => Width - Margin;

    public double SentenceLeft => ColumnLeft + NumberWidth;

    public double Measure => ColumnWidth - NumberWidth;

    public double TitleBlockTop => Height - Margin - TitleBlockHeight;

    public static PlateFormat A4 { get; } = new(297, 210, 88, 3.1);

    // A wider column with larger type holds the same count of letters to the line.
    public static PlateFormat A3 { get; } = new(420, 297, 112, 3.9);

    public Box DrawingArea(bool hasThumbnails) => new(
        Margin, Margin, ColumnLeft - Gutter, Height - Margin - FootHeight - (hasThumbnails ? ThumbnailRowHeight : 0));
}
