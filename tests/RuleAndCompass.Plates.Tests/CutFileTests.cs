using System.Globalization;
using System.Text.RegularExpressions;
using System.Xml.Linq;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.Plates.Tests;

public sealed partial class CutFileTests
{
    private static readonly XNamespace svg = "http://www.w3.org/2000/svg";

    private const string Heptagon = """
        sheet A4
        kit straightedge 300 mm, dividers 2 mm to 150 mm, scale 1/2 mm
        prick O at (0, 0)
        strike ring about O opening 70 mm
        prick top on ring toward up
        prick V[1 to 5] round O from top anticlockwise
        for i = 1 to 4
          rule side[i] through V[i], V[i + 1]
          keep side[i] from V[i] to V[i + 1] cut
        end
        rule last through V[1], V[5]
        keep last from V[1] to V[5] cut
        keep ring
        keep O drilled 3 mm
        """;

    [Fact]
    public void The_file_measures_in_millimetres_from_the_sheet_s_corner()
    {
        XElement root = Parse(Layouts.Of(Heptagon));

        root.Attribute("width")!.Value.ShouldBe("210mm");
        root.Attribute("height")!.Value.ShouldBe("297mm");
        root.Attribute("viewBox")!.Value.ShouldBe("0 0 210 297");
        root.Descendants(svg + "text").ShouldBeEmpty();
    }

    [Fact]
    public void Each_layer_is_a_group()
    {
        XElement root = Parse(Layouts.Of(Heptagon));

        root.Elements(svg + "g").Select(group => group.Attribute("id")!.Value).ShouldBe(["engraved", "cut", "drilled"]);
        XElement hole = root.Elements(svg + "g").Last().Elements().ShouldHaveSingleItem();
        hole.Attribute("r")!.Value.ShouldBe("1.5");
        hole.Attribute("cx")!.Value.ShouldBe("105");
        hole.Attribute("cy")!.Value.ShouldBe("148.5");
        XElement ring = root.Elements(svg + "g").First().Elements().ShouldHaveSingleItem();
        ring.Name.LocalName.ShouldBe("circle");
        ring.Attribute("r")!.Value.ShouldBe("70");
    }

    [Fact]
    public void Sides_that_share_ends_are_one_closed_path_in_whatever_order_and_direction_they_were_kept()
    {
        string data = Group(Layouts.Of(Heptagon), "cut").Elements(svg + "path").ShouldHaveSingleItem().Attribute("d")!.Value;

        data.Count(sign => sign == 'M').ShouldBe(1);
        data.Count(sign => sign == 'L').ShouldBe(4);
        data.ShouldEndWith("Z");
    }

    [Fact]
    public void A_run_of_arcs_and_lines_is_one_path_with_true_arcs()
    {
        Layout layout = Layouts.Of("""
            sheet A5 sideways
            prick A at (-40 mm, 0)
            prick B at (40 mm, 0)
            prick M at (0, 0)
            rule base through A, B
            strike bow about M through A
            keep from A along base to B, along bow anticlockwise to A cut
            """);

        string data = Group(layout, "cut").Elements(svg + "path").ShouldHaveSingleItem().Attribute("d")!.Value;

        // The half circle leaves as two quarter arcs: by its ends alone an arc of half a turn would not tell its centre well.
        data.ShouldBe("M65 74L145 74A40 40 0 0 0 105 34A40 40 0 0 0 65 74Z");
    }

    [Fact]
    public void Pieces_that_meet_in_a_star_are_one_path_with_ends_equal_to_the_last_digit()
    {
        Layout layout = Layouts.Of(Layouts.Dial);

        string data = Group(layout, "engraved").Elements(svg + "path").ShouldHaveSingleItem().Attribute("d")!.Value;

        data.Count(sign => sign == 'M').ShouldBe(5);
        NumberPairs().Matches(data).Count(pair => pair.Value == "45 188.5").ShouldBe(5);
    }

    [Fact]
    public void Ends_that_only_seem_to_meet_stay_apart()
    {
        Layout layout = Layouts.Of("""
            sheet A5 sideways
            prick A at (0, 0)
            prick B at (10 mm, 0)
            prick C at (10.0000001 mm, 0)
            prick D at (10 mm, 10 mm)
            rule l through A, B
            rule m through C, D
            keep l from A to B cut
            keep m from C to D cut
            """);

        Group(layout, "cut").Elements(svg + "path").Count().ShouldBe(2);
    }

    [Fact]
    public void Every_figure_is_a_plain_decimal()
    {
        foreach (string attribute in Parse(Layouts.Of(Layouts.Dial)).Descendants(svg + "path").Select(path => path.Attribute("d")!.Value))
        {
            foreach (Match figure in Figures().Matches(attribute))
            {
                double.TryParse(figure.Value, NumberStyles.AllowLeadingSign | NumberStyles.AllowDecimalPoint, CultureInfo.InvariantCulture, out _).ShouldBeTrue(figure.Value);
                figure.Value.ShouldNotBe("-0");
            }
        }
    }

    [Fact]
    public void The_file_is_the_approved_one()
    {
        Approved.ShouldMatch("one-of-each-cut.svg", System.Text.Encoding.UTF8.GetString(CutFile.Write(ByHand.OneOfEach(), "each.setout")));
    }

    [Fact]
    public void Nothing_kept_leaves_no_group()
    {
        Parse(Layouts.Of(Layouts.OnePoint)).Elements(svg + "g").ShouldBeEmpty();
    }

    [Fact]
    public void The_file_tells_its_script_and_is_the_same_twice()
    {
        Layout layout = Layouts.Of(Heptagon);

        byte[] file = CutFile.Write(layout, "ring--five.setout");

        Origin.IsIn(file, "ring--five.setout").ShouldBeTrue();
        CutFile.Write(Layouts.Of(Heptagon), "ring--five.setout").ShouldBe(file);
    }

    private static XElement Parse(Layout layout) => XDocument.Load(new MemoryStream(CutFile.Write(layout, "test.setout"))).Root!;

    private static XElement Group(Layout layout, string id) => Parse(layout).Elements(svg + "g").Single(group => group.Attribute("id")!.Value == id);

    [GeneratedRegex(@"-?\d+(\.\d+)? -?\d+(\.\d+)?")]
    private static partial Regex NumberPairs();

    [GeneratedRegex(@"[^MLAZ\s]+")]
    private static partial Regex Figures();
}
