using System.Globalization;
using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Accuracy;

/// <summary>What the hand error finds wrong, one factory each.</summary>
internal static class AccuracyFindings
{
    public static Diagnostic NotAnError(string name, double size, SourceSpan span) => new(
        "RC4001",
        Severity.Error,
        string.Create(CultureInfo.InvariantCulture, $"the hand's error `{name}` is {size}, and an error is a size from 0 up"),
        span,
        "give one standard deviation, as in `hand ordinary, but prick 0.15 mm`");

    public static Diagnostic AbsurdError(string name, string size, string most, SourceSpan span) => new(
        "RC4002",
        Severity.Error,
        $"the hand's error `{name}` is {size}, more than a hand can be out on this sheet",
        span,
        $"give one standard deviation under {most}; an ordinary hand is out by a tenth of a millimetre or a quarter of a degree");

    public static Diagnostic TrialsOutsideLimits(int trials) => new(
        "RC4003",
        Severity.Error,
        string.Create(CultureInfo.InvariantCulture, $"{trials} trials were asked for; there can be from 0 to {HandErrorOptions.MaximumTrials}"),
        default,
        "a hundred thousand put the 95 % figures within about half a per cent; a million within a sixth of one");

    public static Diagnostic AlwaysLost(string label, int trials, int act, string why, SourceSpan span, string? file) => new(
        "RC4004",
        Severity.Warning,
        string.Create(CultureInfo.InvariantCulture, $"in each of {trials} trials a crossing that `{label}` needs was lost, so no hand error can be told"),
        span,
        act == 0 ? "cross the curves it rests on more squarely" : string.Create(CultureInfo.InvariantCulture, $"look at act {act}: {why}"),
        file);

    public static Diagnostic NothingToMeasure() => new(
        "RC4005",
        Severity.Warning,
        "nothing is compared and nothing is kept, so there is no hand error to tell",
        default,
        "`compare` a quantity with its formula, or `keep` what the finished piece shows");

    public static Diagnostic TooManyForTrials(int asked, int most) => new(
        "RC4006",
        Severity.Warning,
        string.Create(CultureInfo.InvariantCulture, $"the layout has {asked} quantities to try; trials were run for the first {most}, the rest are by first order"),
        default,
        "keep or compare fewer things to have trials for all");
}
