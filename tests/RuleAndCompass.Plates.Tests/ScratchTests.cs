using RuleAndCompass.Plates.Scene;
using RuleAndCompass.Plates.Writing;
namespace RuleAndCompass.Plates.Tests;
public sealed class ScratchTests
{
    [Fact]
    public void Scratch()
    {
        Page a = new(210, 297, "t", [new Stroke(Role.Frame, Outline.Line(new(10, 10), new(110, 10)), new Pen(Ink.Black, 0.35)), new Stroke(Role.Frame, Outline.Circle(new(100, 100), 50), new Pen(Ink.Accent, 0.5, [3,1])), new Words(Role.Text, "Hallo Θ漢 43°18′", new(20, 40), Typeface.Text, 5, Anchor.Left, 0, Ink.Black)]);
        Page b = a with { WidthMillimetres = 300 };
        byte[] pdf = PdfWriter.Write([a, b, a], "Title");
        File.WriteAllBytes("/tmp/plates-scratch.pdf", pdf);
        File.WriteAllBytes("/tmp/plates-scratch.png", PngWriter.Write(a));
        File.WriteAllBytes("/tmp/plates-scratch.svg", SvgWriter.Write(a, "a b.setout"));
    }
}
