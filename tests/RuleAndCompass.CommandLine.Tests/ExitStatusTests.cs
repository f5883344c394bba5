namespace RuleAndCompass.CommandLine.Tests;

public sealed class ExitStatusTests
{
    [Fact]
    public void A_script_in_which_all_is_well_ends_with_0()
    {
        using Workshop workshop = new();

        Ran ran = Workshop.Run("check", workshop.Script("gable.setout", Workshop.Triangle));

        ran.ShouldBe(new Ran(0, "gable.setout: 8 acts; 2 comparisons, 2 with difference 0; 1 claim, it holds\n", ""));
    }

    [Fact]
    public void Warnings_leave_it_0()
    {
        using Workshop workshop = new();
        string offTheSheet = workshop.Script("far.setout", "sheet A4\nprick A at (900 mm, 0)\n");

        Ran ran = Workshop.Run("check", offTheSheet);

        ran.Status.ShouldBe(0);
        ran.Error.ShouldContain("warning");
        Workshop.Run("check", "--quiet", offTheSheet).ShouldBe(new Ran(0, "", ""));
    }

    [Fact]
    public void A_wrong_script_ends_with_1_and_writes_nothing()
    {
        using Workshop workshop = new();
        string wrong = workshop.Script("wrong.setout", "prick A at (0, 0)\nrule l through A, B\n");

        Ran ran = Workshop.Run("make", wrong, "-o", workshop.At("out"));

        ran.Status.ShouldBe(1);
        ran.Output.ShouldBe("");
        ran.Error.ShouldContain("wrong.setout, line 2: nothing is called `B`  (RC2001)");
        workshop.Files().ShouldBe(["wrong.setout"]);
    }

    [Theory]
    [InlineData("claim distance A to C = base / 2", "refuted", "REFUTED")]
    [InlineData("compare distance A to B with base + 1 mm within 0.5 mm", "out of tolerance", "OUT OF TOLERANCE")]
    public void A_fault_in_what_is_claimed_or_compared_ends_with_1_and_is_written_and_marked(string sentence, string told, string marked)
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", $"{Workshop.Triangle}{sentence}\n");

        Ran ran = Workshop.Run("make", script, "-o", workshop.At("out"));

        ran.Status.ShouldBe(1);
        ran.Error.ShouldContain(told);
        workshop.Read("out/gable-report.txt").ShouldContain(marked);
        workshop.Files().Length.ShouldBe(6);
    }

    [Theory]
    [InlineData("")]
    [InlineData("mak gable.setout")]
    [InlineData("make")]
    [InlineData("make gable.setout more.setout")]
    [InlineData("make gable.setout --gven base=80mm")]
    [InlineData("make gable.setout --given")]
    [InlineData("check gable.setout --digits none")]
    [InlineData("check gable.setout --digits 0")]
    [InlineData("check gable.setout --time-limit -1")]
    [InlineData("check gable.setout --sheet A9")]
    [InlineData("check gable.setout --kit hammer")]
    [InlineData("check gable.setout --hand shaky")]
    [InlineData("check gable.setout --sheet A4 --sheet A3")]
    [InlineData("check gable.setout --given base")]
    [InlineData("check gable.setout --given base=")]
    [InlineData("check gable.setout --given base=40°")]
    [InlineData("check gable.setout --given base=(4")]
    [InlineData("check gable.setout --given base=foot")]
    [InlineData("check gable.setout --given height=4mm")]
    [InlineData("check gable.setout --given base=40mm --given base=41mm")]
    [InlineData("plates gable.setout -o gable.pdf")]
    [InlineData("plates gable.setout --only doors -o gable.pdf")]
    [InlineData("plates gable.setout --only cut -o gable.pdf")]
    [InlineData("plates gable.setout --only steps")]
    [InlineData("hand gable.setout --trials -5")]
    [InlineData("hand gable.setout --seed x")]
    [InlineData("recipes no-such-recipe")]
    [InlineData("begin no-such-recipe")]
    [InlineData("explain RC0000")]
    [InlineData("completion tcl")]
    public void A_wrong_command_line_ends_with_2_and_a_sentence(string line)
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", Workshop.Triangle);
        string[] args = [.. line.Split(' ', StringSplitOptions.RemoveEmptyEntries).Select(arg => arg == "gable.setout" ? script : arg)];

        Ran ran = Workshop.Run(args);

        ran.Status.ShouldBe(2, ran.Error);
        ran.Output.ShouldBe("");
        ran.Error.ShouldMatch(@"^[^\n]+  \(RC\d{4}\)\n");
        ran.Error.ShouldNotContain("   at ");
        workshop.Files().ShouldBe(["gable.setout"]);
    }

    [Fact]
    public void A_mistyped_word_is_answered_with_the_near_one()
    {
        Workshop.Run("mke", "x").Error.ShouldContain("is `make` meant?");
        Workshop.Run("make", "x", "--gven").Error.ShouldContain("is `--given` meant?");
        Workshop.Run("recipes", "hours-by-the-sin-circle").Error.ShouldContain("is `hours by the sine circle` meant?");
        Workshop.Run("explain", "prik").Error.ShouldContain("is `prick` meant?");
    }

    [Fact]
    public void A_missing_file_ends_with_3()
    {
        using Workshop workshop = new();

        foreach (string command in (string[])["make", "check", "steps", "report", "hand", "tidy"])
        {
            Ran ran = Workshop.Run(command, workshop.At("nowhere.setout"));
            ran.Status.ShouldBe(3, command);
            ran.Error.ShouldStartWith($"setout: there is no file `{workshop.At("nowhere.setout")}`  (RC6001)");
        }
    }

    [Fact]
    public void A_file_that_cannot_be_read_ends_with_3()
    {
        using Workshop workshop = new();
        File.WriteAllBytes(workshop.At("latin.setout"), [.. "title \"Gr"u8, 0xFC, .. "n\"\n"u8]);

        Workshop.Run("check", workshop.Folder).ShouldSatisfyAllConditions(
            ran => ran.Status.ShouldBe(3),
            ran => ran.Error.ShouldContain("it is a folder  (RC6002)"));
        Workshop.Run("check", workshop.At("latin.setout")).ShouldSatisfyAllConditions(
            ran => ran.Status.ShouldBe(3),
            ran => ran.Error.ShouldContain("is not text in UTF-8: byte 10 cannot be read  (RC6003)"));
    }

    [Fact]
    public void A_folder_that_cannot_be_written_ends_with_3_and_leaves_nothing()
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", Workshop.Triangle);
        File.WriteAllText(workshop.At("taken"), "a file stands where the folder should be");

        Ran ran = Workshop.Run("make", script, "-o", workshop.At("taken"));

        ran.Status.ShouldBe(3);
        ran.Error.ShouldContain("(RC6005)");
        workshop.Files().ShouldBe(["gable.setout", "taken"]);
        // A file system that takes no files, whoever asks.
        if (Directory.Exists("/proc"))
            Workshop.Run("make", script, "-o", "/proc/gable").Status.ShouldBe(3);
    }

    [Fact]
    public void Of_several_the_highest_counts()
    {
        using Workshop workshop = new();
        string well = workshop.Script("well.setout", Workshop.Triangle), wrong = workshop.Script("wrong.setout", "prick\n");

        Workshop.Run("check", well, wrong).Status.ShouldBe(1);
        Workshop.Run("check", workshop.At("nowhere.setout"), wrong, well).Status.ShouldBe(3);
        Workshop.Run("check", wrong, workshop.At("nowhere.setout"), well).Output.ShouldContain("well.setout: ");
    }

    [Fact]
    public void An_interruption_ends_with_130_and_leaves_nothing()
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", Workshop.Triangle);

        Ran ran = Workshop.RunWith("", new CancellationToken(canceled: true), "make", script, "-o", workshop.At("out"));

        ran.Status.ShouldBe(130);
        workshop.Files().ShouldBe(["gable.setout"]);
    }

    [Fact]
    public void An_interruption_in_the_middle_of_a_making_ends_with_130()
    {
        using Workshop workshop = new();
        string script = workshop.Script("long.setout", "for i = 1 to 900000\n  let x = i * i\nend\n");
        using CancellationTokenSource interrupt = new(TimeSpan.FromMilliseconds(30));

        Ran ran = Workshop.RunWith("", interrupt.Token, "make", script, "-o", workshop.At("out"));

        ran.Status.ShouldBe(130);
        ran.Error.ShouldBe("setout: interrupted; nothing was left half written\n");
        workshop.Files().ShouldBe(["long.setout"]);
    }

    [Fact]
    public void A_fault_of_the_program_is_one_sentence_without_a_trace()
    {
        using StringWriter error = new();
        Display.Terminal broken = new(() => throw new InvalidOperationException("the input is out of order"), TextWriter.Null, error);

        int status = Program.Run(["check", "-"], broken);

        status.ShouldBe(70);
        error.ToString().ShouldBe(
            "setout: a fault of the program, which its developers would like to hear of with the script that shows it: InvalidOperationException, the input is out of order\n");
    }

    [Fact]
    public void Help_and_version_end_with_0()
    {
        Workshop.Run("--help").Status.ShouldBe(0);
        Workshop.Run("make", "--help").Output.ShouldContain("--given <NAME=VALUE>");
        Workshop.Run("--version").Output.ShouldMatch(@"^\d+\.\d+\.\d+\S*\n$");
    }
}
