namespace RuleAndCompass.CommandLine.Tests;

/// <summary>Every malformed script gets findings and exit status 1, never a trace of the stack.</summary>
public sealed class BadInputTests
{
    public static TheoryData<string, string, string> Scripts => new()
    {
        { "wrong kinds", "prick A at (0, 0)\nrule l through A toward up\nstrike c about l opening 10 mm\n", "RC2002" },
        { "an angle plus a length", "let x = 30° + 4 mm\n", "RC2002" },
        { "an unknown name", "prick A at (0, 0)\nrule l through A, B\n", "RC2001" },
        { "circles apart", "prick A at (0, 0)\nprick B at (50 mm, 0)\nstrike a about A opening 10 mm\nstrike b about B opening 10 mm\nprick C where a meets b, above A\n", "RC2004" },
        { "a line that misses", "prick A at (0, 0)\nprick B at (0, 50 mm)\nstrike a about A opening 10 mm\nrule l through B toward right\nprick C where l meets a, nearest A\n", "RC2005" },
        { "parallels", "prick A at (0, 0)\nprick B at (0, 50 mm)\nrule l through A toward right\nrule m through B parallel to l\nprick C where l meets m\n", "RC2006" },
        { "no choice", "prick A at (0, 0)\nstrike a about A opening 10 mm\nrule l through A toward right\nprick C where l meets a\n", "RC2008" },
        { "a choice that picks both", "prick A at (0, 0)\nstrike a about A opening 10 mm\nrule l through A toward right\nprick C where l meets a, nearest A\n", "RC2009" },
        { "a radius of nothing", "prick A at (0, 0)\nstrike a about A opening 0\n", "RC2012" },
        { "a negative radius", "prick A at (0, 0)\nstrike a about A opening -3 mm\n", "RC2012" },
        { "one point twice", "prick A at (0, 0)\nrule l through A, A\n", "RC2011" },
        { "division by nothing", "let x = 1 / (2 - 2)\n", "RC2013" },
        { "a recipe unknown", "follow \"hours by the moon\" as dial\n", "RC2020" },
        { "a recipe that follows itself", "recipe \"a\"\n  needs p point\n  gives p\n  follow \"a\" as again with p = p\nend\nprick P at (0, 0)\nfollow \"a\" as x with p = P\n", "RC2022" },
        { "an endless loop", "for i = 1 to 1000000000\n  let x = i\nend\n", "RC2032" },
        { "too many acts", "for i = 1 to 200000\n  prick P[i] at (i * 1 mm, 0)\nend\n", "RC2032" },
        { "a block not ended", "for i = 1 to 3\n  prick P[i] at (i * 1 mm, 0)\n", "RC1" },
        { "an end too many", "end\n", "RC1" },
        { "brackets a thousand deep", $"let x = {new string('(', 1000)}1{new string(')', 1000)}\n", "RC1092" },
        { "blocks a thousand deep", $"{string.Concat(Enumerable.Repeat("when 1 = 1\n", 1000))}{string.Concat(Enumerable.Repeat("end\n", 1000))}", "RC1092" },
        { "a number of a million digits", $"let x = 0.{new string('3', 1_000_000)}\n", "RC1093" },
        { "no language at all", "%PDF-1.7 \u0001\u0002\n<<>>\n", "RC1" },
        { "text not closed", "title \"Dial\n", "RC1" },
        { "a used script that is not there", "use \"nowhere.setout\"\n", "RC2034" },
    };

    [Theory]
    [MemberData(nameof(Scripts))]
    public void A_malformed_script_gets_findings(string what, string text, string code)
    {
        using Workshop workshop = new();

        Ran ran = Workshop.Run("make", workshop.Script("bad.setout", text), "-o", workshop.At("out"));

        ran.Status.ShouldBe(1, $"{what}: {ran.Error}");
        ran.Error.ShouldContain($"({code}", customMessage: what);
        ran.Error.ShouldNotContain("   at ");
        ran.Error.ShouldNotContain("Exception");
        ran.Output.ShouldBe("");
        workshop.Files().ShouldBe(["bad.setout"]);
    }

    [Theory]
    [InlineData("hours by the sine circle")]
    [InlineData("hours by the projected sphere")]
    [InlineData("hours by scales")]
    [InlineData("hours by two circles")]
    public void A_dial_on_the_equator_or_at_a_pole_is_refused(string recipe)
    {
        using Workshop workshop = new();
        string script = workshop.Script("edge.setout", $"""
            given latitude = 52°
            prick O at (0, 0)
            rule noon through O toward up
            follow "{recipe}" as dial with centre = O, noon = noon, latitude = latitude, radius = 60 mm

            """);

        Workshop.Run("check", script).Status.ShouldBe(0);
        foreach (string latitude in (string[])["0°", "90°", "-90°"])
        {
            Ran ran = Workshop.Run("check", script, "--given", $"latitude={latitude}");
            ran.Status.ShouldBe(1, latitude);
            ran.Error.ShouldContain("(RC2023)");
        }
    }

    [Fact]
    public void Circles_that_do_not_meet_are_told_how_far_apart_they_are()
    {
        using Workshop workshop = new();
        string script = workshop.Script(
            "apart.setout",
            "prick A at (0, 0)\nprick B at (50 mm, 0)\nstrike a about A opening 10 mm\nstrike b about B opening 12 mm\nprick C where a meets b, above A\n");

        Ran ran = Workshop.Run("check", script);

        ran.Error.ShouldContain("circles `a` and `b` do not meet");
        ran.Error.ShouldContain("50 mm apart");
        ran.Error.ShouldContain("22 mm");
    }

    [Fact]
    public void Time_that_runs_out_is_told()
    {
        using Workshop workshop = new();
        string script = workshop.Script("long.setout", "for i = 1 to 900000\n  let x = i\nend\n");

        Ran ran = Workshop.Run("check", script, "--time-limit", "0.05");

        ran.Status.ShouldBe(1);
        ran.Error.ShouldContain("(RC2032)");
    }

    [Fact]
    public void An_empty_script_is_no_fault()
    {
        using Workshop workshop = new();

        Workshop.Run("check", workshop.Script("empty.setout", "")).Status.ShouldBe(0);
        Workshop.Run("make", workshop.Script("empty.setout", ""), "-o", workshop.At("out")).Status.ShouldBe(0);
    }
}
