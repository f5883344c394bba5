using System.Diagnostics;

namespace RuleAndCompass.CommandLine.Tests;

/// <summary>The built program as a process, as a shell sees it.</summary>
public sealed class ProcessTests
{
    [Fact]
    public void A_making_goes_by_default_to_a_folder_named_after_the_script()
    {
        using Workshop workshop = new();
        workshop.Script("gable.setout", Workshop.Triangle);

        Ran ran = workshop.RunProcess("make", "gable.setout");

        ran.Status.ShouldBe(0, ran.Error);
        ran.Output.ShouldContain("  gable/gable-steps.pdf\n");
        workshop.Files().ShouldContain("gable/gable-report.json");
    }

    [Fact]
    public void Results_go_to_standard_output_and_findings_to_standard_error()
    {
        using Workshop workshop = new();
        workshop.Script("wrong.setout", "prick A at (0, 0)\nrule l through A, B\n");

        Ran ran = workshop.RunProcess("steps", "wrong.setout");

        ran.Status.ShouldBe(1);
        ran.Output.ShouldBe("");
        ran.Error.ShouldContain("    rule l through A, B\n                      ‾\n");
        ran.Error.ShouldNotContain("\u001b[");
    }

    [Fact]
    public void A_wrong_command_line_ends_with_2_and_a_missing_file_with_3()
    {
        using Workshop workshop = new();

        workshop.RunProcess().Status.ShouldBe(2);
        workshop.RunProcess("make", "nowhere.setout").Status.ShouldBe(3);
    }

    [Fact]
    public async Task A_process_that_waits_for_its_input_ends_with_130_when_interrupted()
    {
        using Workshop workshop = new();
        using Process process = workshop.Start(closesInput: false, "make", "-");
        Task<string> error = process.StandardError.ReadToEndAsync();
        await Task.Delay(TimeSpan.FromSeconds(2));

        using Process kill = Process.Start("/bin/sh", ["-c", $"kill -INT {process.Id}"]);
        await kill.WaitForExitAsync();

        using CancellationTokenSource patience = new(TimeSpan.FromSeconds(60));
        await process.WaitForExitAsync(patience.Token);
        process.ExitCode.ShouldBe(130, await error);
        workshop.Files().ShouldBeEmpty();
    }
}
