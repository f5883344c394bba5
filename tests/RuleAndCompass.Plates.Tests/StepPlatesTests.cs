using System.Collections.Immutable;
using System.Globalization;
using System.Text;
using RuleAndCompass.Bench;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Composition;
using RuleAndCompass.Plates.Scene;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.Plates.Tests;

public sealed class StepPlatesTests
{
    [Fact]
    public void Every_stage_has_a_plate_and_every_act_its_sentence()
    {
        Layout layout = Layouts.Of(Layouts.Dial);

        ImmutableArray<Page> pages = StepPlates.Compose(layout, new() { ScriptName = "test.setout" });
        List<UglyToad.PdfPig.Content.Page> read = PdfReading.Pages(PdfWriter.Write(pages, layout.Title));

        pages.Length.ShouldBeGreaterThanOrEqualTo(3);
        read.Count.ShouldBe(pages.Length);
        string all = string.Join(' ', read.Select(PdfReading.Text));
        foreach (Stage stage in layout.Stages)
        {
            all.ShouldTell(stage.Title);
        }

        foreach (Act act in layout.Acts)
        {
            string number = act.Number.ToString(CultureInfo.InvariantCulture);
            List<Words> sentences = [.. pages.SelectMany(page => page.Items.OfType<Words>()).Where(words => words.Role == Role.Text && words.Ink == Ink.Accent && words.Text == number)];
            sentences.Count.ShouldBe(1, $"act {number}");
        }

        string joined = Joined(pages);
        foreach (Act act in layout.Acts)
        {
            joined.ShouldContain(act.Says);
        }
    }

    [Fact]
    public void A_plate_tells_title_stage_scale_sheet_hand_and_bar()
    {
        Layout layout = Layouts.Of(Layouts.Dial);

        UglyToad.PdfPig.Content.Page page = PdfReading.Pages(PdfWriter.Write(StepPlates.Compose(layout, new() { ScriptName = "test.setout" }), layout.Title))[0];
        string text = PdfReading.Text(page);

        (page.Width / PdfReading.PointsPerMillimetre).ShouldBe(297, 0.001);
        (page.Height / PdfReading.PointsPerMillimetre).ShouldBe(210, 0.001);
        text.ShouldTell("Dial for the wash-house at Carrow Holm");
        text.ShouldTell("Stage 1: The noon line");
        text.ShouldTell("Plate 1 of ");
        text.ShouldTell("210 × 297 mm");
        text.ShouldTell("ordinary");
        text.ShouldTell("test.setout");
        text.ShouldTell("latitude = 50°");
        text.ShouldTell("seat the needle here");
        text.ShouldTell("Never look at the sun.");
        PdfReading.Lines(page).ShouldContain(line => Math.Abs(line.X2 - line.X1 - 50) < 0.0001 && Math.Abs(line.Y1 - line.Y2) < 1e-6);
    }

    [Fact]
    public void A_drawing_is_true_to_the_scale_it_tells()
    {
        Layout layout = Layouts.Of(Layouts.Gate);
        Page last = StepPlates.Compose(layout)[^1];

        string told = last.Items.OfType<Words>().Select(words => words.Text).Single(text => text.StartsWith("1 : ", StringComparison.Ordinal));
        double scale = 1 / double.Parse(told[4..], CultureInfo.InvariantCulture);
        Stroke keptBase = last.Items.OfType<Stroke>().First(stroke => stroke.Role == Role.Kept);

        keptBase.Outline.Start.DistanceTo(keptBase.Outline.Legs[0].To).ShouldBe(120 * scale, 1e-9);
        keptBase.Pen.WidthMillimetres.ShouldBe(0.5);
    }

    [Fact]
    public void Earlier_work_is_light_and_the_plate_s_own_is_dark()
    {
        ImmutableArray<Page> pages = StepPlates.Compose(Layouts.Of(Layouts.Gate));

        pages[0].Items.ShouldNotContain(item => item.Role == Role.Earlier);
        pages[^1].Items.OfType<Stroke>().Where(stroke => stroke.Role == Role.Earlier).ShouldAllBe(stroke => stroke.Pen.Ink == Ink.Grey && stroke.Pen.WidthMillimetres == 0.18);
        pages[^1].Items.OfType<Stroke>().Where(stroke => stroke.Role == Role.Present).ShouldAllBe(stroke => stroke.Pen.Ink == Ink.Black && stroke.Pen.WidthMillimetres == 0.35);
        pages[^1].Items.ShouldContain(item => item.Role == Role.Earlier);
    }

    [Fact]
    public void A_name_has_the_same_place_on_every_plate()
    {
        ImmutableArray<Page> pages = StepPlates.Compose(Layouts.Of(Layouts.Dial));

        List<IGrouping<string, (string Name, Spot At)>> names =
            [.. pages.SelectMany(page => page.Items.OfType<Words>()).Where(words => words.Role == Role.Name).Select(words => (words.Text, words.At)).GroupBy(name => name.Text)];

        names.Count(name => name.Count() > 1).ShouldBeGreaterThan(3);
        names.ShouldAllBe(name => name.Select(each => each.At).Distinct().Count() == 1);
    }

    [Fact]
    public void Where_there_is_room_names_lie_on_no_line_and_on_no_other_name()
    {
        foreach (Page page in StepPlates.Compose(Layouts.Of(Layouts.Gate)))
        {
            List<Box> labels = [.. page.Items.OfType<Words>().Where(words => words.Role is Role.Name || (words.Role is Role.Now && words.At.X < 190)).Select(Measuring.BoxOf)];
            labels.ShouldNotBeEmpty();
            foreach (Box label in labels)
            {
                labels.Count(label.Overlaps).ShouldBe(1);
                page.Items.OfType<Stroke>()
                    .Where(stroke => stroke.Role is Role.Earlier or Role.Present or Role.Kept)
                    .ShouldNotContain(stroke => Measuring.Touches(stroke.Outline, label));
            }
        }
    }

    [Fact]
    public void Cautions_stand_under_their_act()
    {
        Layout layout = Layouts.Of(Layouts.Gate);
        StepPlateOptions options = new() { Cautions = ImmutableDictionary<int, ImmutableArray<string>>.Empty.Add(layout.Acts[^1].Number, ["laid to points that stand close together"]) };

        StepPlates.Compose(layout, options)[^1].Items.OfType<Words>().ShouldContain(words => words.Text == "△ laid to points that stand close together");
    }

    [Fact]
    public void A_crossing_tells_its_angle()
    {
        string all = string.Join(' ', PdfReading.Pages(PdfWriter.Write(StepPlates.Compose(Layouts.Of(Layouts.Gate)), "Gate")).Select(PdfReading.Text));

        // Two circles of one radius, each through the other's centre, cross at 60°: 120° between their radii.
        all.ShouldTell("at 60°");
        all.ShouldTell("at 90°");
    }

    [Theory]
    [InlineData(Layouts.Empty)]
    [InlineData(Layouts.OnePoint)]
    [InlineData("sheet 20 m by 12 m\nkit straightedge 30 m, beam 50 mm to 30 m, scale 1 mm\nprick A at (-9 m, -5 m)\nprick B at (9 m, 5 m)\nrule l through A, B\n")]
    [InlineData("sheet 20 mm by 12 mm\nprick A at (-9 mm, -5 mm)\n")]
    public void The_smallest_and_the_largest_have_one_plate(string script)
    {
        ImmutableArray<Page> pages = StepPlates.Compose(Layouts.Of(script));

        pages.Length.ShouldBe(1);
        PdfReading.Pages(PdfWriter.Write(pages, "One")).Count.ShouldBe(1);
    }

    [Fact]
    public void Two_thousand_acts_are_all_told()
    {
        StringBuilder script = new("sheet 1 m by 1 m\n");
        for (int i = 0; i < 2000; i++)
        {
            script.Append(CultureInfo.InvariantCulture, $"prick P{i} at ({(i % 50 * 18) - 450} mm, {(i / 50 * 22) - 440} mm)\n");
        }

        Layout layout = Layouts.Of(script.ToString());
        ImmutableArray<Page> pages = StepPlates.Compose(layout);
        byte[] file = PdfWriter.Write(pages, "Many");

        layout.Acts.Length.ShouldBe(2000);
        pages.SelectMany(page => page.Items.OfType<Words>()).Count(words => words.Role == Role.Text && words.Ink == Ink.Accent).ShouldBe(2000);
        pages.SelectMany(page => page.Items.OfType<Words>()).Max(words => words.At.Y).ShouldBeLessThan(210 - 11);
        PdfReading.Pages(file).Count.ShouldBe(pages.Length);
    }

    [Fact]
    public void Long_names_and_foreign_signs_stay_inside_the_page()
    {
        string name = new('n', 300);
        Layout layout = Layouts.Of($"title \"{new string('T', 400)}\"\nprick {name} at (0, 0)\nprick 漢字 at (30 mm, 20 mm)\nrule Щ through {name}, 漢字\n");

        ImmutableArray<Page> pages = StepPlates.Compose(layout, new() { ScriptName = new string('s', 300) });

        foreach (Words words in pages.SelectMany(page => page.Items.OfType<Words>()))
        {
            Box box = Measuring.BoxOf(words);
            box.Left.ShouldBeGreaterThan(5);
            box.Right.ShouldBeLessThan(292);
        }

        PdfReading.Text(PdfReading.Pages(PdfWriter.Write(pages, layout.Title))[0]).ShouldContain("\uFFFD\uFFFD");
    }

    [Fact]
    public void A_large_floor_is_drawn_on_A3()
    {
        Layout layout = Layouts.Of("sheet 6 m by 4 m\nkit straightedge 4 m, beam 50 mm to 3 m, scale 1 mm\nprick A at (-2 m, -1 m)\nprick B at (2 m, 1 m)\nrule l through A, B\n");

        StepPlates.Compose(layout)[0].WidthMillimetres.ShouldBe(420);
        StepPlates.Compose(layout, new() { Paper = PlatePaper.A4 })[0].WidthMillimetres.ShouldBe(297);
    }

    [Fact]
    public void Work_can_be_ended_and_progress_is_told()
    {
        Layout layout = Layouts.Of(Layouts.Gate);
        List<double> told = [];

        StepPlates.Compose(layout, progress: new Telling(told));

        told[^1].ShouldBe(1);
        Should.Throw<OperationCanceledException>(() => StepPlates.Compose(layout, cancellation: new CancellationToken(true)));
    }

    [Fact]
    public void The_same_layout_gives_the_same_bytes()
    {
        byte[] first = PdfWriter.Write(StepPlates.Compose(Layouts.Of(Layouts.Dial)), "Dial");
        byte[] second = PdfWriter.Write(StepPlates.Compose(Layouts.Of(Layouts.Dial)), "Dial");

        second.ShouldBe(first);
    }

    [Fact]
    public void The_scene_is_the_approved_one()
    {
        Approved.ShouldMatch("one-of-each-steps.txt", string.Join("\n", StepPlates.Compose(ByHand.OneOfEach(), new() { ScriptName = "each.setout" }).Select(SceneText.Of)));
    }

    // The lines of the column, put together again to sentences.
    private static string Joined(ImmutableArray<Page> pages) => string.Join(
        ' ', pages.SelectMany(page => page.Items.OfType<Words>()).Where(words => words.Role == Role.Text && words.Typeface == Typeface.Text && words.SizeMillimetres == PlateFormat.A4.TextSize).Select(words => words.Text));
}
