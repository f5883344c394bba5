using System.Diagnostics;
using System.Globalization;
using System.Text;
using System.Xml.Linq;
using RuleAndCompass.Plates.Fonts;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Writing;

/// <summary>Writes a page as SVG: the unit is the millimetre, arcs stay arcs, text stays text.</summary>
public static class SvgWriter
{
    private static readonly XNamespace svg = "http://www.w3.org/2000/svg";

    /// <summary>The file.</summary>
    /// <param name="scriptName">The script the page came from; null leaves the mark out.</param>
    public static byte[] Write(Page page, string? scriptName = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(page);
        XElement root = Root(page.WidthMillimetres, page.HeightMillimetres, page.Title);
        foreach (Item item in page.Items)
        {
            cancellation.ThrowIfCancellationRequested();
            root.Add(Element(item));
        }

        return ToBytes(root, scriptName);
    }

    internal static XElement Root(double widthMillimetres, double heightMillimetres, string title) => new(
        svg + "svg",
        new XAttribute("width", Figure(widthMillimetres) + "mm"),
        new XAttribute("height", Figure(heightMillimetres) + "mm"),
        new XAttribute("viewBox", $"0 0 {Figure(widthMillimetres)} {Figure(heightMillimetres)}"),
        new XElement(svg + "title", Xml(title)));

    internal static XElement Group(string id, params object[] content) => new(svg + "g", new XAttribute("id", id), content);

    internal static XElement Path(string data, params object[] content) => new(svg + "path", new XAttribute("d", data), content);

    internal static XElement Circle(double x, double y, double radius, params object[] content) => new(
        svg + "circle", new XAttribute("cx", Figure(x)), new XAttribute("cy", Figure(y)), new XAttribute("r", Figure(radius)), content);

    internal static byte[] ToBytes(XElement root, string? scriptName)
    {
        XDocument document = new(new XDeclaration("1.0", "utf-8", null));
        if (scriptName is not null)
        {
            document.Add(new XComment($" {Origin.Line(scriptName)} "));
        }

        document.Add(root);
        using MemoryStream stream = new();
        using (System.Xml.XmlWriter writer = System.Xml.XmlWriter.Create(
            stream, new() { Encoding = new UTF8Encoding(false), Indent = true, IndentChars = "  ", NewLineChars = "\n" }))
        {
            document.Save(writer);
        }

        stream.WriteByte((byte)'\n');
        return stream.ToArray();
    }

    /// <summary>Six decimals, a nanometre, without trailing noughts and never −0.</summary>
    internal static string Figure(double value)
    {
        double rounded = Math.Round(value, 6);
        return (rounded == 0 ? 0 : rounded).ToString("0.######", CultureInfo.InvariantCulture);
    }

    private static XElement Element(Item item) => item switch
    {
        Stroke stroke => Path(
            Data(stroke.Outline),
            new XAttribute("fill", "none"),
            new XAttribute("stroke", Colour(stroke.Pen.Ink)),
            new XAttribute("stroke-width", Figure(stroke.Pen.WidthMillimetres)),
            stroke.Pen.Dashes.IsEmpty ? null! : new XAttribute("stroke-dasharray", string.Join(' ', stroke.Pen.Dashes.Select(Figure)))), // No content for null.
        Fill fill => Path(Data(fill.Outline), new XAttribute("fill", Colour(fill.Ink))),
        Words words => Text(words),
        _ => throw new UnreachableException($"No element for {item.GetType().Name}."),
    };

    private static XElement Text(Words words)
    {
        Face face = Face.Of(words.Typeface);
        string shown = Xml(face.Shown(words.Text));
        XElement text = new(
            svg + "text",
            new XAttribute("x", Figure(words.At.X)),
            new XAttribute("y", Figure(words.At.Y)),
            new XAttribute("font-family", words.Typeface == Typeface.Lettering ? "DejaVu Sans, sans-serif" : "DejaVu Sans Condensed, sans-serif"),
            new XAttribute("font-size", Figure(words.SizeMillimetres)),
            new XAttribute("textLength", Figure(face.Width(shown, words.SizeMillimetres))),
            new XAttribute("fill", Colour(words.Ink)),
            shown);
        if (words.Typeface == Typeface.Strong)
        {
            text.Add(new XAttribute("font-weight", "bold"));
        }

        if (words.Anchor != Anchor.Left)
        {
            text.Add(new XAttribute("text-anchor", words.Anchor == Anchor.Middle ? "middle" : "end"));
        }

        if (words.TurnDegrees != 0)
        {
            text.Add(new XAttribute("transform", $"rotate({Figure(-words.TurnDegrees)} {Figure(words.At.X)} {Figure(words.At.Y)})"));
        }

        return text;
    }

    private static string Data(Outline outline)
    {
        StringBuilder data = new();
        data.Append(CultureInfo.InvariantCulture, $"M{Figure(outline.Start.X)} {Figure(outline.Start.Y)}");
        foreach (Leg leg in outline.Legs)
        {
            string to = $"{Figure(leg.To.X)} {Figure(leg.To.Y)}";
            data.Append(leg is ArcLeg arc ? $"A{Figure(arc.RadiusMillimetres)} {Figure(arc.RadiusMillimetres)} 0 0 {(arc.Clockwise ? 1 : 0)} {to}" : $"L{to}");
        }

        return outline.Closed ? data.Append('Z').ToString() : data.ToString();
    }

    // Signs that XML forbids become the substitute.
    private static string Xml(string text)
    {
        char[] signs = text.ToCharArray();
        for (int i = 0; i < signs.Length; i++)
        {
            bool pair = i + 1 < signs.Length && System.Xml.XmlConvert.IsXmlSurrogatePair(signs[i + 1], signs[i]);
            if (pair)
            {
                i++;
            }
            else if (!System.Xml.XmlConvert.IsXmlChar(signs[i]))
            {
                signs[i] = Face.Substitute;
            }
        }

        return new string(signs);
    }

    private static string Colour(Ink ink)
    {
        SkiaSharp.SKColor colour = SkiaPainter.Colour(ink);
        return $"#{colour.Red:x2}{colour.Green:x2}{colour.Blue:x2}";
    }
}
