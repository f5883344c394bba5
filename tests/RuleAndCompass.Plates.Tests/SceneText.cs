using System.Globalization;
using System.Text;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Tests;

/// <summary>A page as text, in millimetres to two decimals, for approval.</summary>
internal static class SceneText
{
    public static string Of(Page page)
    {
        StringBuilder text = new();
        text.Append(CultureInfo.InvariantCulture, $"page {page.WidthMillimetres} x {page.HeightMillimetres}: {page.Title}\n");
        foreach (Item item in page.Items)
        {
            text.Append(item switch
            {
                Stroke stroke => $"{stroke.Role} stroke {stroke.Pen.Ink} {Figure(stroke.Pen.WidthMillimetres)}{string.Concat(stroke.Pen.Dashes.Select(dash => " -" + Figure(dash)))}: {Of(stroke.Outline)}",
                Fill fill => $"{fill.Role} fill {fill.Ink}: {Of(fill.Outline)}",
                Words words => $"{words.Role} {words.Typeface} {Figure(words.SizeMillimetres)} {words.Ink} {words.Anchor} {Of(words.At)}{(words.TurnDegrees == 0 ? "" : " turned " + Figure(words.TurnDegrees))}: {words.Text}",
                _ => throw new System.Diagnostics.UnreachableException(),
            });
            text.Append('\n');
        }

        return text.ToString();
    }

    private static string Of(Outline outline) => Of(outline.Start)
        + string.Concat(outline.Legs.Select(leg => leg is ArcLeg arc ? $" {(arc.Clockwise ? "cw" : "acw")} about {Of(arc.Centre)} to {Of(arc.To)}" : $" to {Of(leg.To)}"))
        + (outline.Closed ? " closed" : "");

    private static string Of(Spot spot) => $"({Figure(spot.X)}, {Figure(spot.Y)})";

    private static string Figure(double value) => Math.Round(value, 2) is var rounded && rounded == 0 ? "0" : rounded.ToString("0.##", CultureInfo.InvariantCulture);
}
