using System.Text;
using RuleAndCompass.Plates.Scene;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.Plates.Tests.Writing;

public sealed class PdfWriterTests
{
    [Theory]
    [InlineData(210, 297)]
    [InlineData(420, 297)]
    [InlineData(215.9, 279.4)]
    [InlineData(123.4567, 89.0123)]
    [InlineData(5080, 5000)]
    public void A_page_has_exactly_its_size(double width, double height)
    {
        byte[] file = PdfWriter.Write([Blank(width, height)], "Blank");

        UglyToad.PdfPig.Content.Page page = PdfReading.Pages(file).ShouldHaveSingleItem();
        (page.Width / PdfReading.PointsPerMillimetre).ShouldBe(width, 0.001);
        (page.Height / PdfReading.PointsPerMillimetre).ShouldBe(height, 0.001);
    }

    [Fact]
    public void A_page_of_twenty_metres_has_larger_units()
    {
        byte[] file = PdfWriter.Write([Blank(20_000, 12_000)], "Floor");

        Encoding.Latin1.GetString(file).ShouldContain("/UserUnit 4");
        UglyToad.PdfPig.Content.Page page = PdfReading.Pages(file).ShouldHaveSingleItem();
        // The reader may or may not count the unit in.
        double unit = page.Width < 15_000 ? 4 : 1;
        (page.Width * unit / PdfReading.PointsPerMillimetre).ShouldBe(20_000, 0.001);
        (page.Height * unit / PdfReading.PointsPerMillimetre).ShouldBe(12_000, 0.001);
    }

    [Fact]
    public void Every_page_of_many_has_its_own_size()
    {
        Page[] pages = [.. Enumerable.Range(1, 70).Select(i => Blank(100 + (i * 1.3), 200 + (i * 0.7)))];

        List<UglyToad.PdfPig.Content.Page> read = PdfReading.Pages(PdfWriter.Write(pages, "Many"));

        read.Count.ShouldBe(70);
        for (int i = 0; i < pages.Length; i++)
        {
            (read[i].Width / PdfReading.PointsPerMillimetre).ShouldBe(pages[i].WidthMillimetres, 0.001);
            (read[i].Height / PdfReading.PointsPerMillimetre).ShouldBe(pages[i].HeightMillimetres, 0.001);
        }
    }

    [Fact]
    public void A_line_stands_where_the_scene_has_it()
    {
        Page page = Blank(210, 297, new Stroke(Role.CheckBar, Outline.Line(new(10.25, 20.5), new(110.25, 20.5)), new Pen(Ink.Black, 0.35)));

        (double x1, double y1, double x2, double y2, double width) = PdfReading.Lines(PdfReading.Pages(PdfWriter.Write([page], "Line"))[0]).ShouldHaveSingleItem();

        x1.ShouldBe(10.25, 0.001);
        y1.ShouldBe(20.5, 0.001);
        (x2 - x1).ShouldBe(100, 0.0001);
        y2.ShouldBe(y1, 1e-6);
        width.ShouldBe(0.35, 0.001);
    }

    [Theory]
    [InlineData(0.4)]
    [InlineData(50)]
    [InlineData(1500)]
    public void A_circle_is_round_to_a_tenth_of_a_micrometre_and_the_reader_s_own_rounding(double radius)
    {
        double side = (radius * 2) + 20, middle = radius + 10;
        Page page = Blank(side, side, new Stroke(Role.Kept, Outline.Circle(new(middle, middle), radius), new Pen(Ink.Black, 0.35)));

        List<(double X, double Y)> spots = [.. PdfReading.CurveSpots(PdfReading.Pages(PdfWriter.Write([page], "Circle"))[0])];

        // Single-precision figures in the file: seven digits of the page's size.
        double tolerance = 0.0001 + (side * 2e-7);
        spots.Count.ShouldBeGreaterThan(60);
        foreach ((double x, double y) in spots)
        {
            double distance = Math.Sqrt(((x - middle) * (x - middle)) + ((y - middle) * (y - middle)));
            distance.ShouldBe(radius, tolerance);
        }
    }

    [Fact]
    public void Text_can_be_found()
    {
        Page page = Blank(210, 297, new Words(Role.Text, "Angle 43°18′ → Ωδος × ½ √2", new(20, 40), Typeface.Text, 4, Anchor.Left, 0, Ink.Black));

        PdfReading.Text(PdfReading.Pages(PdfWriter.Write([page], "Words"))[0]).ShouldTell("Angle 43°18′ → Ωδος × ½ √2");
    }

    [Fact]
    public void The_same_pages_give_the_same_bytes()
    {
        Page page = Blank(210, 297, new Words(Role.Text, "Twice", new(20, 40), Typeface.Strong, 4, Anchor.Middle, 30, Ink.Accent));

        byte[] first = PdfWriter.Write([page], "Twice", "twice.setout");
        byte[] second = PdfWriter.Write([page], "Twice", "twice.setout");

        second.ShouldBe(first);
        string text = Encoding.Latin1.GetString(first);
        text.ShouldNotContain("CreationDate");
        text.ShouldNotContain("ModDate");
        text.ShouldNotContain("/ID", Case.Sensitive);
    }

    [Fact]
    public void A_file_tells_its_script()
    {
        byte[] file = PdfWriter.Write([Blank(100, 100)], "Blank", "ferry slip é.setout");

        Origin.IsIn(file, "ferry slip é.setout").ShouldBeTrue();
        Origin.IsIn(file, "ferry slip.setout").ShouldBeFalse();
    }

    [Fact]
    public void Work_can_be_ended_and_progress_is_told()
    {
        List<double> told = [];

        PdfWriter.Write([Blank(100, 100), Blank(100, 100)], "Blank", progress: new Telling(told));

        told.ShouldBe([0.5, 1]);
        Should.Throw<OperationCanceledException>(() => PdfWriter.Write([Blank(100, 100)], "Blank", cancellation: new CancellationToken(true)));
        Should.Throw<ArgumentException>(() => PdfWriter.Write([], "None"));
    }

    private static Page Blank(double width, double height, params Item[] items) => new(width, height, "Blank", [.. items]);
}
