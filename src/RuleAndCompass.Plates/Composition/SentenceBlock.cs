using System.Collections.Immutable;
using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>One act's sentence, or a note, broken into lines for the column.</summary>
/// <param name="Number">The act's; null for a note.</param>
internal sealed record SentenceBlock(int? Number, ImmutableArray<SentenceLine> Lines)
{
    private const double SpaceAfter = 1.6;

    public double Height => Lines.Sum(line => line.Leading) + SpaceAfter;

    public static SentenceBlock OfAct(Act act, IEnumerable<string> cautions, PlateFormat format)
    {
        double leading = PlateFormat.Leading * format.TextSize / PlateFormat.A4.TextSize;
        List<SentenceLine> lines =
        [
            .. Typesetting.Break(act.Says, Typeface.Text, format.TextSize, format.Measure)
                .Select(line => new SentenceLine(line, null, format.TextSize, leading)),
        ];
        if (act is Cross cross)
        {
            string tail = CrossesAt(CrossingAngle.Degrees((Curve)cross.First.Figure, (Curve)cross.Second.Figure, cross.Point.Point));
            double room = format.Measure - Typesetting.Width(lines.Count == 0 ? "" : lines[^1].Text + "  ", Typeface.Text, format.TextSize);
            if (lines.Count > 0 && Typesetting.Width(tail, Typeface.Text, PlateFormat.NoteSize) <= room)
            {
                lines[^1] = lines[^1] with { Tail = tail };
            }
            else
            {
                lines.Add(new SentenceLine("", tail, format.TextSize, PlateFormat.NoteLeading));
            }
        }

        foreach (string caution in cautions)
        {
            lines.AddRange(Notes("△ " + caution, format));
        }

        return new(act.Number, [.. lines]);
    }

    public static SentenceBlock OfNote(string text, PlateFormat format) => new(null, [.. Notes(text, format)]);

    private static IEnumerable<SentenceLine> Notes(string text, PlateFormat format) => Typesetting
        .Break(text, Typeface.Text, PlateFormat.NoteSize, format.Measure)
        .Select(line => new SentenceLine(line, null, PlateFormat.NoteSize, PlateFormat.NoteLeading));

    private static string CrossesAt(double degrees) => "at " + degrees.ToString(degrees < 9.95 ? "0.0" : "0", CultureInfo.InvariantCulture) + "°";
}

/// <summary>A line of the column.</summary>
/// <param name="Tail">A remark at its end, smaller.</param>
internal sealed record SentenceLine(string Text, string? Tail, double Size, double Leading);
