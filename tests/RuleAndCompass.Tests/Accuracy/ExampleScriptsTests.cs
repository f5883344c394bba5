using System.Runtime.Intrinsics;
using RuleAndCompass.Accuracy;
using RuleAndCompass.Bench;
using RuleAndCompass.Bench.Errors;
using RuleAndCompass.Making;

namespace RuleAndCompass.Tests.Accuracy;

public sealed class ExampleScriptsTests
{
    public static TheoryData<string> Scripts => [.. Directory.EnumerateFiles(Folder, "*.setout", SearchOption.AllDirectories)
        .Select(file => Path.GetRelativePath(Folder, file)).Order(StringComparer.Ordinal)];

    private static string Folder
    {
        get
        {
            DirectoryInfo? at = new(AppContext.BaseDirectory);
            while (at is not null && !File.Exists(Path.Combine(at.FullName, "RuleAndCompass.sln")))
                at = at.Parent;
            return Path.Combine(at.ShouldNotBeNull().FullName, "scripts");
        }
    }

    // The replayed acts know nothing of the exact marks but where the first points lie and which crossing is meant.
    [Theory]
    [MemberData(nameof(Scripts))]
    public void Acts_replayed_without_errors_make_the_exact_marks(string script)
    {
        Layout layout = Make(script);
        ActProgram program = new(layout.Hand);
        program.Append(layout.Acts);
        Vector256<double>[] slots = new Vector256<double>[program.SlotCount];
        Vector256<double>[] noise = new Vector256<double>[program.Variables.Count];
        double rounding = layout.Acts.OfType<SetOpening>().Select(Rounding).DefaultIfEmpty(0).Max();

        foreach (Step step in program.Steps)
            step.Replay(slots, noise);

        // A setting that is rounded moves what rests on it, by no more than some times the rounding in these scripts.
        for (int slot = 0; slot < slots.Length; slot++)
            slots[slot][0].ShouldBe(program.Nominal[slot], 1e-9 + 10 * rounding, $"slot {slot} of act {program.Steps[program.StepOfSlot(slot)].Act}");
    }

    [Theory]
    [MemberData(nameof(Scripts))]
    public void First_order_and_trials_agree(string script)
    {
        HandErrorReport report = HandError.Assess(Make(script), new HandErrorOptions { Trials = 4000 }).Value.ShouldNotBeNull();

        report.Results.ShouldNotBeEmpty();
        foreach (HandResult result in report.Results)
            result.Disagreement.ShouldBeNull(result.Label);
    }

    private static double Rounding(SetOpening set) => set.Opening is ScaleOpening { Setting: { } setting, Wanted: { } wanted }
        ? Math.Abs(setting.ToDouble() - wanted.ToDouble())
        : 0;

    private static Layout Make(string script) =>
        Maker.Make(script, File.ReadAllText(Path.Combine(Folder, script))).Value.ShouldNotBeNull();
}
