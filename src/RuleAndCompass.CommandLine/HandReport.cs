using RuleAndCompass.Accuracy;
using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.CommandLine;

/// <summary>The hand error that goes into reports.</summary>
internal static class HandReport
{
    // Puts the 95 % figures within about one per cent, finer than the two digits a report prints; `setout hand` runs more.
    private const int Trials = 20_000;

    /// <summary>Works it out where something is compared or kept; null where there is nothing to tell.</summary>
    public static HandErrorReport? Of(ScriptRun run, Surroundings surroundings)
    {
        if (run.Layout is not { } layout || (layout.Comparisons.IsEmpty && layout.Kept.IsEmpty))
            return null;
        Outcome<HandErrorReport> assessed = HandError.Assess(layout, new() { Trials = Trials }, cancellation: surroundings.Cancellation);
        if (!assessed.Diagnostics.IsEmpty)
            Findings.Show(surroundings.Terminal, run.Script.Name, run.Script.Text, assessed.Diagnostics);
        return assessed.Value;
    }
}
