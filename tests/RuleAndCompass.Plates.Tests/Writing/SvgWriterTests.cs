using System.Xml.Linq;
using RuleAndCompass.Plates.Scene;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.Plates.Tests.Writing;

public sealed class SvgWriterTests
{
    private static readonly XNamespace svg = "http://www.w3.org/2000/svg";

    [Fact]
    public void The_unit_is_the_millimetre_and_arcs_stay_arcs()
    {
        Page page = new(120.5, 80, "A & B", [new Stroke(Role.Kept, Outline.Circle(new(50, 40), 30), new Pen(Ink.Black, 0.35))]);

        XElement root = Parse(page);

        root.Attribute("width")!.Value.ShouldBe("120.5mm");
        root.Attribute("viewBox")!.Value.ShouldBe("0 0 120.5 80");
        root.Element(svg + "title")!.Value.ShouldBe("A & B");
        string data = root.Element(svg + "path")!.Attribute("d")!.Value;
        data.ShouldBe("M80 40A30 30 0 0 0 35 14.019238A30 30 0 0 0 35 65.980762A30 30 0 0 0 80 40Z");
    }

    [Fact]
    public void Text_stays_text_and_what_cannot_be_written_is_replaced()
    {
        Page page = new(100, 100, "t", [new Words(Role.Text, "5 < 6 漢 \u0001\ud800x", new(10, 20), Typeface.Strong, 4, Anchor.Right, 90, Ink.Accent)]);

        XElement text = Parse(page).Element(svg + "text")!;

        text.Value.ShouldBe("5 < 6 \uFFFD  \uFFFDx");
        text.Attribute("transform")!.Value.ShouldBe("rotate(-90 10 20)");
        text.Attribute("text-anchor")!.Value.ShouldBe("end");
    }

    private static XElement Parse(Page page) => XDocument.Load(new MemoryStream(SvgWriter.Write(page, "a.setout"))).Root!;
}
