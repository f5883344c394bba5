using RuleAndCompass.CommandLine.Display;

namespace RuleAndCompass.CommandLine.Tests;

/// <summary>What someone at a terminal sees, and what stays plain in a pipe.</summary>
public sealed class TerminalTests
{
    [Fact]
    public void Tables_are_drawn_on_a_terminal_alone()
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", Workshop.Triangle);

        foreach (string[] args in (string[][])[["recipes"], ["report", script]])
        {
            OnTerminal(args, usesColour: true).Output.ShouldContain("─");
            Workshop.Run(args).Output.ShouldNotContain("─");
            Workshop.Run(args).Output.ShouldNotContain("\u001b");
        }
    }

    [Fact]
    public void No_colour_is_no_colour() => OnTerminal(["recipes"], usesColour: false).Output.ShouldNotMatch("\u001b\\[[0-9;]*3[0-9]");

    [Fact]
    public void Long_work_shows_how_far_it_is_on_a_terminal_and_clears_the_line()
    {
        using StringWriter error = new();
        Terminal terminal = new(() => Stream.Null, TextWriter.Null, error) { ErrorIsTerminal = true };
        using (ProgressLine progress = new(terminal, "making gable.setout", quiet: false))
        {
            progress.Report(0.1);
            error.ToString().ShouldBe("", "short work is not worth a line");
            Thread.Sleep(TimeSpan.FromSeconds(1));
            progress.Report(0.5);
        }

        error.ToString().ShouldContain("making gable.setout 50 %");
        error.ToString().ShouldEndWith("\r\u001b[K");
    }

    [Fact]
    public void Nothing_is_shown_where_nobody_waits_or_quiet_is_asked()
    {
        using StringWriter error = new();
        foreach ((bool isTerminal, bool quiet) in ((bool, bool)[])[(false, false), (true, true)])
        {
            using ProgressLine progress = new(new(() => Stream.Null, TextWriter.Null, error) { ErrorIsTerminal = isTerminal }, "making", quiet);
            Thread.Sleep(TimeSpan.FromSeconds(0.8));
            progress.Report(0.5);
        }

        error.ToString().ShouldBe("");
    }

    private static Ran OnTerminal(string[] args, bool usesColour)
    {
        using StringWriter output = new(), error = new();
        int status = Program.Run(args, new(() => Stream.Null, output, error) { OutputIsTerminal = true, UsesColour = usesColour });
        return new(status, output.ToString(), error.ToString());
    }
}
