using RuleAndCompass.Bench;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Making;

/// <summary>Every want, with every kit: the figure is the same whatever the tools, the claims about it are proved, and other arithmetic lands on the same points.</summary>
public sealed class WantTests
{
    private static readonly string[] Kits =
    [
        "",
        "kit straightedge 2 m, dividers 1 mm to 500 mm, scale 1/2 mm",
        "kit straightedge 2 m, dividers 1 mm to 500 mm, scale 1/2 mm, square",
        "kit straightedge 2 m, dividers 1 mm to 500 mm, scale 1/2 mm, protractor",
        "kit straightedge 2 m, beam 1 mm to 900 mm, square, protractor",
    ];

    private const string Figures = """
        prick O at (0, 0)
        prick A at (40 mm, 10 mm)
        prick B at (-30 mm, 50 mm)
        prick C at (20 mm, -60 mm)
        rule l through O, A
        rule back through A, O
        rule m through B, C
        strike c about O opening 30 mm
        strike d about B opening 20 mm
        strike e about C opening 30 mm

        """;

    public static TheoryData<string, string> Wants
    {
        get
        {
            (string Want, string Claim)[] wants =
            [
                ("prick P at (10 mm, 20 mm)", "x of P = 10 mm and y of P = 20 mm"),
                ("prick P at (10 mm, -20 mm) from A", "x of P = 50 mm and y of P = -10 mm"),
                ("prick P at foot of B on l\nrule t through B, P", "P on l and t square to l"),
                ("prick P at foot of A on l", "P = A"),
                ("prick P at centre of c", "P = O"),
                ("prick P midway A to B", "distance A to P = distance P to B and A, P, B on one line"),
                ("prick P opposite B across l", "distance O to P = distance O to B and distance A to P = distance A to B and not P = B"),
                ("prick P opposite A across l", "P = A"),
                ("prick P opposite B about A", "distance A to P = distance A to B and B, A, P on one line and not P = B"),
                ("prick P where l meets m", "P on l and P on m"),
                ("prick P, Q where l meets c", "P on c and Q on c and P on l and Q on l and not P = Q"),
                ("prick P on l, 25 mm from O toward A", "P on l and distance O to P = 25 mm and distance A to P < distance A to O"),
                ("prick P on l, -25 mm from O toward A", "P on l and distance O to P = 25 mm and distance A to P > distance A to O"),
                ("prick P on l, 25 mm ahead of O", "P on l and distance O to P = 25 mm and x of P > 0"),
                ("prick P on back, 25 mm ahead of O", "P on l and distance O to P = 25 mm and x of P < 0"),
                ("prick P on l, 25 mm behind O", "P on l and distance O to P = 25 mm and x of P < 0"),
                ("prick P on l, -25 mm behind O", "P on l and distance O to P = 25 mm and x of P > 0"),
                ("prick P on l, 0 ahead of A", "P = A"),
                ("prick P on l, distance O to B ahead of O", "P on l and distance O to P = distance O to B"),
                ("prick P on c toward up", "x of P = 0 and y of P = 30 mm"),
                ("prick P on c toward 30°", "y of P = 15 mm and P on c"),
                ("prick P on c toward A", "P on c and P on l and x of P > 0"),
                ("prick P on c toward left\nprick Q on c turned 60° from P anticlockwise", "x of Q = -15 mm and y of Q < 0"),
                ("prick P on c toward left\nprick Q on c turned -60° from P anticlockwise", "x of Q = -15 mm and y of Q > 0"),
                ("prick P on c toward left\nprick Q on c turned 75° from P clockwise", "angle P O Q = 75° and y of Q > 0"),
                ("prick P[0 to 7] dividing A to B", "P[0] = A and P[7] = B and distance P[2] to P[3] = distance A to B / 7 and A, P[4], B on one line"),
                ("prick P[0 to 4] dividing A to B", "distance P[2] to P[3] = distance A to B / 4"),
                ("prick P[1 to 3] round O from A anticlockwise", "P[1] = A and distance P[1] to P[2] = distance P[2] to P[3] and distance P[3] to P[1] = distance P[2] to P[3]"),
                ("prick P[1 to 4] round O from A clockwise", "distance P[1] to P[2] = distance P[2] to P[3] and distance P[4] to P[1] = distance P[2] to P[3] and angle P[1] O P[2] = 90°"),
                ("prick P[1 to 5] round O from A anticlockwise", "distance P[1] to P[2] = distance P[4] to P[5] and distance P[5] to P[1] = distance P[2] to P[3]"),
                ("prick P[1 to 6] round O from A clockwise", "distance P[1] to P[2] = distance O to A and distance P[6] to P[1] = distance O to A"),
                ("prick P[1 to 8] round O from A clockwise", "distance P[1] to P[2] = distance P[8] to P[1]"),
                ("prick P[0 to 3] stepping 12 mm along l from A toward O", "P[0] = A and distance A to P[3] = 36 mm and P[3] on l and distance P[3] to O < distance A to O"),
                ("prick P[0 to 3] stepping O to A along back from A toward O", "P[1] = O and distance A to P[3] = 3 * distance A to O"),
                ("prick P[0] on c toward right\nprick Q[0 to 3] stepping 20 mm round c from P[0] clockwise", "distance Q[2] to Q[3] = 20 mm and Q[3] on c and y of Q[1] < 0"),
                ("rule t through B, A", "B on t and A on t"),
                ("rule t through B toward left", "B on t and angle from t to l anticlockwise < -90°"),
                ("rule t through B toward 45°\nrule u through O toward right", "angle from u to t anticlockwise = 45°"),
                ("rule t through B toward C", "t = m"),
                ("rule t through B square to l", "t square to l and B on t and angle from l to t anticlockwise = 90°"),
                ("rule t through A square to l", "t square to l and A on t and angle from l to t anticlockwise = 90°"),
                ("rule t through B square to back", "angle from back to t anticlockwise = 90°"),
                ("rule t through B parallel to l", "t parallel to l and B on t and angle from l to t anticlockwise = 0°"),
                ("rule t through O parallel to back", "t = l and angle from back to t anticlockwise = 0°"),
                ("rule t through B back along l", "t parallel to l and B on t and angle from l to t anticlockwise = 180°"),
                ("rule t through O turned 60° from l clockwise", "O on t and angle from l to t clockwise = 60°"),
                ("rule t through O turned 22 1/2° from l anticlockwise", "O on t and angle from l to t anticlockwise = 22 1/2°"),
                ("rule t through O turned -30° from back clockwise", "angle from back to t anticlockwise = 30°"),
                ("rule t through B turned 120° from l anticlockwise", "B on t and angle from l to t anticlockwise = 120°"),
                ("rule t through O turned 180° from l anticlockwise", "t = l and angle from l to t anticlockwise = 180°"),
                ("rule t through O turned 36° from l clockwise", "angle from l to t clockwise = 36°"),
                ("rule t halving A to B\nrule u through A, B", "t square to u and angle from u to t anticlockwise = 90° and distance A to t = distance B to t"),
                ("rule t halving angle A O B", "O on t and distance A to t / distance O to A = distance B to t / distance O to B"),
                ("prick P on c toward down\nrule t touching c at P", "t touches c and P on t and angle from t to l anticlockwise < 90°"),
                ("rule t touching c from A, above O", "t touches c and A on t"),
                ("rule t touching c, d open, left along l", "t touches c and t touches d"),
                ("rule t touching c, d crossed, nearest A", "t touches c and t touches d"),
                ("rule t touching c, e open, right of O", "t touches c and t touches e"),
                ("strike k about A through B", "B on k and radius of k = distance A to B"),
                ("strike k about A opening 17 mm", "radius of k = 17 mm"),
                ("strike k about A opening O to B", "radius of k = distance O to B"),
                ("strike k about A opening distance O to B / 2", "radius of k = distance O to B / 2"),
                ("strike k through A, B, C", "A on k and B on k and C on k"),
                ("strike k about B touching l", "l touches k"),
            ];
            TheoryData<string, string> data = [];
            foreach ((string want, string claim) in wants)
                data.Add(want, claim);
            return data;
        }
    }

    [Theory]
    [MemberData(nameof(Wants))]
    public void A_want_is_made_whatever_the_kit(string want, string claim)
    {
        foreach (string kit in Kits)
        {
            Outcome<Layout> outcome = Maker.Make("want", $"sheet 400 mm by 400 mm\n{kit}\n{Figures}{want}\nclaim {claim}\n");

            outcome.Diagnostics.Where(finding => !(finding.Code == "RC2024")).Select(finding => finding.Message).ShouldBeEmpty(kit);
            ClaimResult result = outcome.Value.ShouldNotBeNull().Claims.ShouldHaveSingleItem();
            result.Holds.ShouldBe(true, $"{kit}: {result.By}");
            result.Verdict.Certainty.ShouldBeOneOf(Certainty.Proved, Certainty.Certain);
            (double off, string name) = Replay.Worst(outcome.Value);
            off.ShouldBeLessThan(1e-9, $"{kit}: {name}");
            outcome.Value.Acts.Select(act => act.Number).ShouldBe(Enumerable.Range(1, outcome.Value.Acts.Length));
        }
    }

    [Fact]
    public void Tools_not_in_the_kit_are_not_used()
    {
        foreach (string want in Wants.Select(row => (string)row[0]))
        {
            Layout bare = Layouts.Make($"kit straightedge 2 m, dividers 1 mm to 500 mm, scale 1/2 mm\n{Figures}{want}");
            bare.Acts.ShouldNotContain(act => act is Slide || act is Protract, want);
            Layout square = Layouts.Make($"kit straightedge 2 m, dividers 1 mm to 500 mm, scale 1/2 mm, square\n{Figures}{want}");
            square.Acts.ShouldNotContain(act => act is Protract, want);
        }
    }

    [Fact]
    public void A_want_for_what_is_there_makes_no_act_and_has_its_own_start_and_way()
    {
        const string Script = Figures + """
            rule again through A, O
            rule onward through A toward O
            prick P where l meets m
            prick Q where m meets l
            strike again_c about O opening 30 mm
            prick R at (0, 0)
            rule halved through O parallel to l

            """;

        Layout layout = Layouts.Make(Script + "keep again inside c\nkeep onward from A to O\nclaim angle from again to l clockwise = 180°\nclaim Q = P and R = O and again_c = c");

        layout.Acts.Length.ShouldBe(Layouts.Make(Figures + "prick P where l meets m").Acts.Length);
        layout.Claims.ShouldAllBe(claim => claim.Holds == true);
    }

    [Fact]
    public void The_same_script_and_kit_give_the_same_acts()
    {
        string script = $"{Figures}prick P[0 to 7] dividing A to B\nrule t through O turned 36° from l clockwise";

        Layouts.Make(script).Acts.Select(act => act.Says).ShouldBe(Layouts.Make(script).Acts.Select(act => act.Says));
    }

    [Theory]
    [InlineData("rule t through A, B by square")]
    [InlineData("rule t halving A to B by scale")]
    [InlineData("strike k about A opening 17 mm by protractor")]
    [InlineData("rule t through B parallel to l by protractor")]
    public void A_tool_that_is_no_way_to_make_it_is_an_error(string want)
    {
        Diagnostic finding = Layouts.Finding(Figures + want);

        finding.Code.ShouldBe("RC2039");
        finding.Message.ShouldEndWith("is no way to make this");
    }

    [Theory]
    [InlineData("rule t through B square to l by square", typeof(Slide))]
    [InlineData("rule t through A square to l by protractor", typeof(Protract))]
    [InlineData("rule t through O turned 60° from l clockwise by protractor", typeof(Protract))]
    public void A_tool_that_is_asked_for_is_used(string want, Type act)
    {
        Layouts.Make(Figures + want).Acts.ShouldContain(done => done.GetType() == act);
    }

    [Theory]
    [InlineData("prick P opposite B across l by dividers")]
    [InlineData("rule t through B square to l by dividers")]
    [InlineData("rule t through O turned 60° from l clockwise by dividers")]
    [InlineData("rule t through O turned 43°18' from l clockwise by scale")]
    public void Dividers_that_are_asked_for_are_used(string want)
    {
        Layouts.Make(Figures + want).Acts.ShouldNotContain(act => act is Slide || act is Protract);
    }
}
