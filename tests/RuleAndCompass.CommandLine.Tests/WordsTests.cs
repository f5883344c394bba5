using RuleAndCompass.CommandLine.Files;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine.Tests;

/// <summary>The commands that print or change texts: recipes, begin, tidy, explain, steps, completion.</summary>
public sealed class WordsTests
{
    public static TheoryData<string> Recipes => [.. RecipeBook.Names];

    [Fact]
    public void Recipes_are_listed_under_their_trades_and_printed_by_either_name()
    {
        string list = Workshop.Run("recipes").Output;

        list.ShouldStartWith("dials\n  hours by ");
        list.ShouldContain("scales\n");
        Workshop.Run("recipes", "hours-by-scales").Output.ShouldBe(RecipeBook.FindText("hours by scales"));
        Workshop.Run("recipes", "hours by scales").Output.ShouldBe(RecipeBook.FindText("hours by scales"));
    }

    [Theory]
    [MemberData(nameof(Recipes))]
    public void A_script_begun_from_a_recipe_passes_its_check(string recipe)
    {
        using Workshop workshop = new();

        Ran begun = Workshop.Run("begin", recipe, "-o", workshop.At("mine.setout"));

        begun.ShouldBe(new Ran(0, $"{workshop.At("mine.setout")}\n", ""));
        Workshop.Run("begin", recipe).Output.ShouldBe(workshop.Read("mine.setout"));
        Ran ran = Workshop.Run("check", workshop.At("mine.setout"));
        bool takesFamilies = RecipeBook.Find(recipe)!.Needs.Any(need => need.Kind.Text.EndsWith('s'));
        // A family is stood in for by three figures, and a recipe may look for others in it.
        if (takesFamilies)
            ran.Error.ShouldNotContain("(RC1");
        else
            ran.Status.ShouldBe(0, $"{ran.Error}\n{workshop.Read("mine.setout")}");
    }

    [Fact]
    public void Beginning_does_not_replace_a_script()
    {
        using Workshop workshop = new();
        string script = workshop.Script("mine.setout", "note \"a week of work\"\n");

        Workshop.Run("begin", "hours-by-scales", "-o", script).Status.ShouldBe(3);
        workshop.Read("mine.setout").ShouldBe("note \"a week of work\"\n");

        Workshop.Run("begin", "hours-by-scales", "-o", script, "--force").Status.ShouldBe(0);
        workshop.Read("mine.setout").ShouldContain("follow \"hours by scales\"");
    }

    [Fact]
    public void Tidying_writes_in_place_and_a_second_time_changes_nothing()
    {
        using Workshop workshop = new();
        string script = workshop.Script("mine.setout", "  prick   A at (0,0)   # the middle\n\n\n\nrule l through A   toward up");

        Ran check = Workshop.Run("tidy", "--check", script);
        check.Status.ShouldBe(1);
        check.Error.ShouldContain("(RC6015)");

        Workshop.Run("tidy", script).ShouldBe(new Ran(0, $"{script}\n", ""));
        workshop.Read("mine.setout").ShouldBe("prick A at (0, 0)  # the middle\n\nrule l through A toward up\n");
        Workshop.Run("tidy", "--check", script).ShouldBe(new Ran(0, "", ""));
        Workshop.Run("tidy", script).ShouldBe(new Ran(0, "", ""));
    }

    [Fact]
    public void Tidying_leaves_a_script_that_cannot_be_read_as_it_was()
    {
        using Workshop workshop = new();
        string script = workshop.Script("wrong.setout", "prick A   at nowhere at all\n");

        Workshop.Run("tidy", script).Status.ShouldBe(1);

        workshop.Read("wrong.setout").ShouldBe("prick A   at nowhere at all\n");
    }

    [Fact]
    public void Standard_input_is_tidied_to_standard_output() =>
        Workshop.RunWith("prick   A at (0,0)\n", CancellationToken.None, "tidy", "-").ShouldBe(new Ran(0, "prick A at (0, 0)\n", ""));

    [Fact]
    public void Steps_are_numbered_under_their_stages()
    {
        using Workshop workshop = new();

        string steps = Workshop.Run("steps", workshop.Script("gable.setout", Workshop.Triangle)).Output;

        steps.ShouldStartWith("Gable of the net loft\nSheet: A4 sideways, 297 mm by 210 mm\n");
        steps.ShouldContain("\n1  The base\n\n1  ");
        steps.ShouldContain("\n2  The ridge\n\n");
        steps.ShouldContain("(90.0 mm)");
    }

    [Fact]
    public void Words_and_codes_are_explained()
    {
        Workshop.Run("explain").Output.ShouldStartWith("# The language");
        Workshop.Run("explain", "prick").Output.ShouldStartWith("### prick\n");
        Workshop.Run("explain", "RC1004").Output.ShouldStartWith("### RC1004\n");
        Workshop.Run("explain", "RC6006").Output.ShouldStartWith("### RC6006\n");
        Workshop.Run("explain", "cos").Output.ShouldContain("cos");
    }

    [Fact]
    public void Every_code_of_the_command_line_is_explained()
    {
        string[] factories = [.. typeof(CommandLineFindings).GetMethods(System.Reflection.BindingFlags.Static | System.Reflection.BindingFlags.Public).Select(method => method.Name)];
        factories.Length.ShouldBe(14);

        foreach (int number in (int[])[1, 2, 3, 4, 5, 6, 10, 11, 12, 13, 14, 15])
            Workshop.Run("explain", $"RC60{number:00}").Status.ShouldBe(0, $"RC60{number:00}");
    }

    [Theory]
    [InlineData("bash")]
    [InlineData("zsh")]
    [InlineData("fish")]
    [InlineData("powershell")]
    public void Completion_is_printed_for_the_usual_shells(string shell) =>
        Workshop.Run("completion", shell).Output.ShouldContain("[suggest:");

    [Fact]
    public void The_program_itself_completes_commands_options_and_recipes()
    {
        Workshop.Run("[suggest:8]", "setout m").Output.ShouldContain("make");
        Workshop.Run("[suggest:17]", "setout make x --g").Output.ShouldContain("--given");
        Workshop.Run("[suggest:16]", "setout begin hou").Output.ShouldContain("hours-by-scales");
    }

    [Fact]
    public void A_long_name_is_no_way_out_of_the_temporary_file()
    {
        using Workshop workshop = new();
        OutputFiles files = new("gable.setout", force: false);
        files.Add(workshop.At(new string('n', 300)), "too long a name");

        Should.Throw<StopException>(() => files.Write(CancellationToken.None)).Status.ShouldBe(3);
    }
}
