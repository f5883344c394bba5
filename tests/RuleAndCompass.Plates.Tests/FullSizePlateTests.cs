using System.Collections.Immutable;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Scene;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.Plates.Tests;

public sealed class FullSizePlateTests
{
    [Fact]
    public void The_page_is_the_sheet_where_bars_find_room()
    {
        UglyToad.PdfPig.Content.Page page = Read(Layouts.Of(Layouts.Dial));

        (page.Width / PdfReading.PointsPerMillimetre).ShouldBe(210, 0.001);
        (page.Height / PdfReading.PointsPerMillimetre).ShouldBe(297, 0.001);
    }

    [Fact]
    public void A_small_sheet_gets_a_page_with_room_for_bars()
    {
        Layout layout = Layouts.Of("sheet 60 mm by 40 mm\nprick A at (0, 0)\n");

        Page page = FullSizePlate.Compose(layout).ShouldHaveSingleItem();

        page.WidthMillimetres.ShouldBeGreaterThan(200);
        page.Items.OfType<Stroke>().ShouldContain(stroke => stroke.Role == Role.Frame && stroke.Outline.Closed && IsBox(stroke.Outline, 60, 40));
        Bars(Read(layout)).Count.ShouldBe(2);
    }

    [Theory]
    [InlineData(Layouts.Dial)]
    [InlineData(Layouts.Gate)]
    [InlineData(Layouts.OnePoint)]
    [InlineData(Layouts.Empty)]
    public void Both_bars_are_100_mm(string script)
    {
        List<(double X1, double Y1, double X2, double Y2, double Width)> bars = Bars(Read(Layouts.Of(script)));

        bars.Count.ShouldBe(2);
        bars.ShouldContain(bar => Math.Abs(bar.X2 - bar.X1 - 100) < 0.0001 && Math.Abs(bar.Y2 - bar.Y1) < 1e-6);
        bars.ShouldContain(bar => Math.Abs(Math.Abs(bar.Y2 - bar.Y1) - 100) < 0.0001 && Math.Abs(bar.X2 - bar.X1) < 1e-6);
    }

    [Fact]
    public void Kept_work_stands_where_the_script_has_it()
    {
        UglyToad.PdfPig.Content.Page page = Read(Layouts.Of(Layouts.Gate));
        List<(double X1, double Y1, double X2, double Y2, double Width)> lines = PdfReading.Lines(page);

        // Base: y = −40 from x = −60 to 60 on a sheet of 240 by 180, heavy. C stands at the top of the equilateral triangle: y = −40 + 60·√3.
        lines.ShouldContain(line => Near(line.X1, 60) && Near(line.Y1, 130) && Near(line.X2, 180) && Near(line.Y2, 130) && Math.Abs(line.Width - 0.5) < 0.01);
        lines.ShouldContain(line => Near(line.X1, 120) && Near(line.Y1, 130 - (60 * Math.Sqrt(3))) && Near(line.X2, 120) && Near(line.Y2, 130) && Math.Abs(line.Width - 0.35) < 0.01);
    }

    [Fact]
    public void Hour_lines_read_off_the_printed_plate_agree_with_a_published_table()
    {
        UglyToad.PdfPig.Content.Page page = Read(Layouts.Of(Layouts.Dial));

        // hor-eb1842-50: Encyclopaedia Britannica, 7th ed., vol. 7 (1842), "Dialling", art. 24, latitude 50°: 11°36′, 23°51′, 37°27′, 53°0′, 70°43′.
        double[] printed = [11.6, 23.85, 37.45, 53.0, 70.7166667];
        const double centreX = 105 - 60, centreY = 148.5 + 40;
        double[] angles =
        [
            .. PdfReading.Lines(page)
                .Where(line => Near(line.X1, centreX) && Near(line.Y1, centreY))
                .Select(line => Math.Atan2(line.X2 - line.X1, line.Y1 - line.Y2) * 180 / Math.PI)
                .Order(),
        ];
        angles.Length.ShouldBe(5);
        for (int i = 0; i < 5; i++)
        {
            angles[i].ShouldBe(printed[i], 0.0109);
        }
    }

    [Fact]
    public void Words_names_and_cautions_can_be_found()
    {
        string dial = PdfReading.Text(Read(Layouts.Of(Layouts.Dial)));
        string gate = PdfReading.Text(Read(Layouts.Of(Layouts.Gate)));

        dial.ShouldTell("Dial for the wash-house at Carrow Holm");
        dial.ShouldTell("Measure both bars before use: each is 100 mm.");
        dial.ShouldTell("From test.setout.");
        dial.ShouldTell("T[4]");
        dial.ShouldTell("Scribers and dividers are sharp: carry them capped.");
        dial.ShouldTell("Never look at the sun.");
        gate.ShouldNotContain("Neverlookatthesun.");
    }

    [Fact]
    public void A_prick_mark_leaves_the_point_clear()
    {
        Page page = FullSizePlate.Compose(Layouts.Of(Layouts.Gate))[0];
        Spot c = new(120, 130 - (60 * Math.Sqrt(3)));

        List<Stroke> arms = [.. page.Items.OfType<Stroke>().Where(stroke => stroke.Role == Role.Prick && stroke.Outline.Start.DistanceTo(c) < 3)];

        arms.Count.ShouldBe(4);
        arms.ShouldAllBe(arm => Math.Min(arm.Outline.Start.DistanceTo(c), arm.Outline.Legs[0].To.DistanceTo(c)) > 0.5);
    }

    [Fact]
    public void Names_lie_on_no_line_and_on_no_other_name()
    {
        Page page = FullSizePlate.Compose(Layouts.Of(Layouts.Dial))[0];
        List<Box> names = [.. page.Items.OfType<Words>().Where(words => words.Role == Role.Name).Select(Measuring.BoxOf)];

        names.Count.ShouldBe(5); // O and T[1] to T[4]; T[5] lies off the sheet
        foreach (Box name in names)
        {
            page.Items.OfType<Stroke>().ShouldNotContain(stroke => Measuring.Touches(stroke.Outline, name));
            names.Count(name.Overlaps).ShouldBe(1);
        }
    }

    [Fact]
    public void Construction_is_shown_on_request_and_where_nothing_is_kept()
    {
        Layout gate = Layouts.Of(Layouts.Gate);

        FullSizePlate.Compose(gate)[0].Items.ShouldNotContain(item => item.Role == Role.Earlier);
        FullSizePlate.Compose(gate, new() { ShowConstruction = true })[0].Items.ShouldContain(item => item.Role == Role.Earlier);
        FullSizePlate.Compose(Layouts.Of("prick A at (0, 0)\nprick B at (20 mm, 0)\nrule l through A, B\n"))[0].Items.ShouldContain(item => item.Role == Role.Earlier);
    }

    [Fact]
    public void Spans_that_no_scale_can_measure_stand_beside_the_sheet()
    {
        Layout layout = Layouts.Of("sheet A5\nkit straightedge 300 mm, dividers 2 mm to 150 mm\nprick A at (0, 0)\nstrike c about A opening 37 mm\nkeep c\n");

        UglyToad.PdfPig.Content.Page page = Read(layout);

        PdfReading.Lines(page).ShouldContain(line => Math.Abs(line.X2 - line.X1 - 37) < 0.001 && Math.Abs(line.Y1 - line.Y2) < 1e-6);
        PdfReading.Text(page).ShouldTell("37.00 mm");
    }

    [Fact]
    public void Lettering_has_the_height_asked_for()
    {
        Words letter = FullSizePlate.Compose(Layouts.Of(Layouts.Gate))[0].Items.OfType<Words>().Single(words => words.Role == Role.Lettering);

        letter.Text.ShouldBe("I");
        (letter.SizeMillimetres * Plates.Fonts.Face.CapitalHeight).ShouldBe(5, 1e-9);
        // The middle of the capital stands at D, (0, −40).
        letter.At.X.ShouldBe(120, 1e-9);
        letter.At.Y.ShouldBe(130 + 2.5, 1e-9);
    }

    [Fact]
    public void A_floor_of_twenty_metres_is_one_page()
    {
        Layout layout = Layouts.Of("sheet 20 m by 12 m\nkit straightedge 30 m, beam 50 mm to 30 m, scale 1 mm\nprick A at (-9 m, -5 m)\nprick B at (9 m, 5 m)\nrule l through A, B\nkeep l from A to B\n");

        ImmutableArray<Page> pages = FullSizePlate.Compose(layout);
        byte[] file = PdfWriter.Write(pages, "Floor");

        pages.ShouldHaveSingleItem().WidthMillimetres.ShouldBe(20_000);
        PdfReading.Pages(file).ShouldHaveSingleItem();
    }

    [Fact]
    public void The_scene_is_the_approved_one()
    {
        Approved.ShouldMatch("one-of-each-full.txt", SceneText.Of(FullSizePlate.Compose(ByHand.OneOfEach(), new() { ScriptName = "each.setout" })[0]));
    }

    [Fact]
    public void Lettering_bent_round_a_circle_stands_with_its_middle_on_it()
    {
        // About D, at (100, 120) on the page, with radius 20; capitals 3.5 high. Feet to the centre above, head to the centre below.
        List<Words> letters = [.. FullSizePlate.Compose(ByHand.OneOfEach())[0].Items.OfType<Words>().Where(words => words.Role == Role.Lettering && words.Text.Length == 1)];

        letters.Select(letter => letter.Text).ShouldBe(["R", "O", "U", "N", "D", "U", "N", "D", "E", "R"]);
        letters[..5].ShouldAllBe(letter => Math.Abs(letter.At.DistanceTo(new Spot(100, 120)) - 18.25) < 1e-9);
        letters[5..].ShouldAllBe(letter => Math.Abs(letter.At.DistanceTo(new Spot(100, 120)) - 21.75) < 1e-9);
        letters[..5].Select(letter => letter.At.X).ShouldBeInOrder();
        letters[5..].Select(letter => letter.At.X).ShouldBeInOrder();
        letters[2].TurnDegrees.ShouldBe(0, 10);
        letters[0].TurnDegrees.ShouldBeGreaterThan(0);
        letters[4].TurnDegrees.ShouldBeLessThan(0);
    }

    [Fact]
    public void The_same_layout_gives_the_same_bytes()
    {
        Layout layout = Layouts.Of(Layouts.Dial);

        Write(layout).ShouldBe(Write(layout));
        Write(Layouts.Of(Layouts.Dial)).ShouldBe(Write(layout));
    }

    private static byte[] Write(Layout layout) => PdfWriter.Write(FullSizePlate.Compose(layout, new() { ScriptName = "test.setout" }), layout.Title, "test.setout");

    private static UglyToad.PdfPig.Content.Page Read(Layout layout) => PdfReading.Pages(Write(layout)).ShouldHaveSingleItem();

    private static List<(double X1, double Y1, double X2, double Y2, double Width)> Bars(UglyToad.PdfPig.Content.Page page) =>
        [.. PdfReading.Lines(page).Where(line => Math.Abs(Math.Abs(line.X2 - line.X1) + Math.Abs(line.Y2 - line.Y1) - 100) < 0.01)];

    private static bool Near(double value, double expected) => Math.Abs(value - expected) < 0.01;

    private static bool IsBox(Outline outline, double width, double height) =>
        Math.Abs(outline.Legs[1].To.X - outline.Start.X - width) < 1e-9 && Math.Abs(outline.Legs[1].To.Y - outline.Start.Y - height) < 1e-9;
}
