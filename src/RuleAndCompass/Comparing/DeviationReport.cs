using System.Collections.Immutable;
using System.Globalization;
using RuleAndCompass.Accuracy;
using RuleAndCompass.Bench;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Comparing;

/// <summary>What the construction gives beside what the formula says: the whole report as words, ready to be set out on any page.</summary>
/// <param name="Title">The script's title, or its name where it has none.</param>
/// <param name="Script">The file it comes from.</param>
/// <param name="Head">What was assumed, name and words: givens, sheet, board, kit, hand.</param>
/// <param name="Notes">The script's own.</param>
/// <param name="Comparisons">In the script's order.</param>
/// <param name="Claims">In the script's order.</param>
/// <param name="HandSummary">The whole layout's hand error in a sentence or two, where it was worked out.</param>
/// <param name="Blame">The acts that spoil most, worst first; empty where no hand error was worked out.</param>
/// <param name="Ranges">Over which values of the givens the decisions hold.</param>
/// <param name="Warnings">What the bench makes difficult.</param>
/// <param name="Counts">Acts, and operations by geometrography.</param>
/// <param name="Cautions">What a maker should take care of.</param>
public sealed record DeviationReport(
    string Title,
    string Script,
    ImmutableArray<HeadRow> Head,
    ImmutableArray<string> Notes,
    ImmutableArray<ComparisonRow> Comparisons,
    ImmutableArray<ClaimRow> Claims,
    ImmutableArray<string> Ranges,
    ImmutableArray<string> HandSummary,
    ImmutableArray<string> Blame,
    ImmutableArray<string> Warnings,
    ImmutableArray<string> Counts,
    ImmutableArray<string> Cautions)
{
    private const string DialCaution = "Never look at the sun. Keep the tip of a style blunt, or guard it where people pass.";
    private const string ScriberCaution = "Scribers and dividers are sharp: carry them capped.";
    private const string EtchingCaution = "Etching what is cut or engraved: follow the supplier's safety sheet and local rules for the etchant.";

    /// <summary>Sets out a layout's report.</summary>
    /// <param name="layout">What was made.</param>
    /// <param name="options">What the caller adds.</param>
    public static DeviationReport Of(Layout layout, DeviationReportOptions? options = null)
    {
        ArgumentNullException.ThrowIfNull(layout);
        options ??= new();
        return new(
            layout.Title.Length > 0 ? layout.Title : layout.Script.Name,
            layout.Script.Name,
            [.. HeadOf(layout)],
            layout.Notes,
            [.. layout.Comparisons.Select((comparison, index) => ComparisonRow.Of(comparison, layout.Decider, options, HandOf(options.Hand, index)))],
            [.. layout.Claims.Select(ClaimRow.Of)],
            [.. RangeSentences(layout)],
            [.. HandSentences(options.Hand)],
            [.. BlameSentences(options.Hand)],
            [.. options.Warnings.Select(Sentence)],
            [.. CountSentences(layout)],
            [.. CautionsOf(layout)]);
    }

    private static IEnumerable<HeadRow> HeadOf(Layout layout)
    {
        foreach (GivenValue given in layout.Givens)
            yield return new("Given", $"{given.Name} = {given.Text}{(given.FromCommandLine ? " (in place of the script's own)" : "")}");
        yield return new("Sheet", BenchText.Of(layout.Sheet));
        if (layout.Board is { } board)
            yield return new("Board", BenchText.Of(board));
        yield return new("Kit", BenchText.Of(layout.Kit));
        yield return new("Hand", BenchText.Of(layout.Hand));
    }

    // What "for every latitude" reaches, once for the whole script.
    private static IEnumerable<string> RangeSentences(Layout layout)
    {
        if (layout.Comparisons.All(row => row.Decision.Verdict.Givens.IsEmpty) && layout.Claims.All(row => row.Verdict.Givens.IsEmpty))
            yield break;
        foreach (ValidFor range in layout.ValidRanges)
        {
            string unit = range.IsAngle ? "°" : " mm";
            yield return range is { From: { } from, To: { } to }
                ? string.Create(CultureInfo.InvariantCulture, $"\"For every {range.Given}\" is shown from {from:0.####}{unit} to {to:0.####}{unit}: over these every choice stays as it is.")
                : $"\"For every {range.Given}\" is shown for values near the one used; a range in its `given` (from … to …) asks how far it reaches.";
        }
    }

    private static HandResult? HandOf(HandErrorReport? hand, int comparison) =>
        hand?.Results.FirstOrDefault(result => result.Subject == HandSubject.Comparison && result.Index == comparison);

    internal static IEnumerable<string> HandSentences(HandErrorReport? hand)
    {
        if (hand is null)
            yield break;
        foreach (HandSummary summary in hand.Summaries)
            yield return $"Of the {KindWord(summary.Kind)} compared, 95 layouts in 100 stay within {WithUnit(summary.RootMeanSquare, summary.Kind)} (root mean square); "
                + $"the worst, {summary.WorstLabel}, within {WithUnit(summary.Worst, summary.Kind)}.";
        if (hand.PaperFraction is { } paper)
            yield return string.Create(CultureInfo.InvariantCulture, $"Measures are taken off the printed plate, whose scale is trusted to {paper * 100:0.##} %.");
        foreach (HandResult result in hand.Results.Where(result => result.Disagreement is not null))
            yield return $"{result.Label}: {result.Disagreement}.";
    }

    private static IEnumerable<string> BlameSentences(HandErrorReport? hand) =>
        hand?.Blame.Select(BlameSentence) ?? [];

    internal static string BlameSentence(Blame blame) =>
        string.Create(CultureInfo.InvariantCulture, $"{blame.Share * 100,5:0.0} %  {(blame.Act == 0 ? "the plate" : $"act {blame.Act}")}: {blame.Why}");

    private static IEnumerable<string> CountSentences(Layout layout)
    {
        yield return $"{ActCount.Of(layout)}.";
        OperationCount operations = Geometrography.Of(layout.Acts).Total;
        yield return string.Create(CultureInfo.InvariantCulture, $"By geometrography {operations}: simplicity {operations.Simplicity}, exactitude {operations.Exactitude}.");
    }

    private static IEnumerable<string> CautionsOf(Layout layout)
    {
        yield return ScriberCaution;
        if (layout.IsDial)
            yield return DialCaution;
        if (layout.Kept.Any(kept => kept.Layer == Layer.Engraved))
            yield return EtchingCaution;
    }

    private static string Sentence(Diagnostic finding) => finding.Hint is null ? $"{Capital(finding.Message)}." : $"{Capital(finding.Message)}. Try: {finding.Hint}.";

    private static string Capital(string text) => text.Length == 0 ? text : char.ToUpperInvariant(text[0]) + text[1..];

    private static string KindWord(QuantityKind kind) => kind switch
    {
        QuantityKind.Angle => "angles",
        QuantityKind.Length => "lengths",
        QuantityKind.Point => "places",
        _ => "numbers",
    };

    internal static string WithUnit(double value, QuantityKind kind) => kind switch
    {
        QuantityKind.Angle => $"{QuantityText.Estimate(value * 60)}′",
        QuantityKind.Number => QuantityText.Estimate(value),
        _ => $"{QuantityText.Estimate(value)} mm",
    };
}

/// <summary>What a caller adds to a report.</summary>
public sealed record DeviationReportOptions
{
    /// <summary>Significant digits of constructed and computed; null for as many as a bench needs.</summary>
    public int? Digits { get; init; }

    /// <summary>The hand error, where it was worked out.</summary>
    public HandErrorReport? Hand { get; init; }

    /// <summary>What the bench makes difficult.</summary>
    public ImmutableArray<Diagnostic> Warnings { get; init; } = [];
}

/// <summary>One thing assumed.</summary>
public sealed record HeadRow(string Name, string Says);

/// <summary>One comparison, in words.</summary>
/// <param name="Label">What it is called.</param>
/// <param name="Constructed">What the acts give.</param>
/// <param name="Computed">What the formula gives.</param>
/// <param name="Difference">Constructed less computed; <c>0</c> only where decided.</param>
/// <param name="Verdict">How that is known.</param>
/// <param name="Time">The difference in minutes of time, where timed; else why not, or empty.</param>
/// <param name="Hand95">What 95 layouts in 100 stay within by hand; empty where not worked out.</param>
/// <param name="Within">The tolerance; empty without one.</param>
/// <param name="IsInTolerance">True without a tolerance.</param>
public sealed record ComparisonRow(
    string Label, string Constructed, string Computed, string Difference, string Verdict, string Time, string Hand95, string Within, bool IsInTolerance)
{
    internal static ComparisonRow Of(Comparison comparison, Decider decider, DeviationReportOptions options, HandResult? hand)
    {
        string Side(Real x, Real? y) => comparison.Kind == QuantityKind.Point
            ? QuantityText.OfPlace(x, y!, decider, options.Digits) // a point has both
            : QuantityText.Of(x, comparison.Kind, decider, options.Digits);
        return new(
            comparison.Label,
            Side(comparison.Constructed, comparison.ConstructedY),
            Side(comparison.Computed, comparison.ComputedY),
            DifferenceOf(comparison, decider),
            comparison.Decision.Verdict.ToString(),
            TimeOf(comparison),
            HandText(hand, comparison.Kind),
            WithinOf(comparison, decider),
            comparison.InTolerance);
    }

    private static string DifferenceOf(Comparison comparison, Decider decider) => comparison.Decision switch
    {
        { IsZero: true } => "0",
        { Verdict.IsDecided: false } decision => string.Create(CultureInfo.InvariantCulture, $"under 10^-{decision.Verdict.Size}"),
        _ => QuantityText.OfDifference(comparison.Difference, comparison.Kind, decider),
    };

    private static string TimeOf(Comparison comparison)
    {
        if (comparison.TimedBy is null)
            return "";
        if (comparison.TimeLeftOut is { } why)
            return why;
        if (comparison.Decision.IsZero)
            return "0 min";
        return comparison.MinutesOfTime is { } minutes ? $"{(minutes < 0 ? "" : "+")}{QuantityText.Estimate(minutes)} min" : "";
    }

    private static string HandText(HandResult? hand, QuantityKind kind)
    {
        if (hand is null)
            return "";
        if (hand.Size95 is not { } size)
            return "always lost";
        string far = hand.Far95 is { } millimetres && kind == QuantityKind.Angle ? $", {QuantityText.Estimate(millimetres)} mm" : "";
        string time = hand.MinutesOfTime95 is { } minutes ? $", {QuantityText.Estimate(minutes)} min" : "";
        return DeviationReport.WithUnit(size, kind) + far + time;
    }

    private static string WithinOf(Comparison comparison, Decider decider)
    {
        if (comparison.Within is not { } within)
            return "";
        string size = decider.ToDecimal(within, comparison.WithinMinutes || comparison.Kind != QuantityKind.Angle ? 4 : 6);
        if (comparison.WithinMinutes)
            return $"{size} min";
        return comparison.Kind switch
        {
            QuantityKind.Angle => $"{decider.ToDecimal(within * (Rational)60, 4)}′",
            QuantityKind.Number => size,
            _ => $"{size} mm",
        };
    }
}

/// <summary>One claim, in words.</summary>
/// <param name="Says">As written, indices worked out.</param>
/// <param name="Holds">Null where it is not decided.</param>
/// <param name="Verdict"><c>proved</c>, <c>refuted</c> and the like.</param>
/// <param name="By">Where refuted, by how much; else null.</param>
public sealed record ClaimRow(string Says, bool? Holds, string Verdict, string? By)
{
    /// <summary>A claim's verdict in a word or two: one that fails is <c>refuted</c>, with how that is known where it is not by proof.</summary>
    public static string VerdictOf(ClaimResult claim)
    {
        ArgumentNullException.ThrowIfNull(claim);
        return claim.Holds switch
        {
            true => claim.Verdict.ToString(),
            null => $"not decided: {claim.Verdict}",
            false when claim.Verdict.Certainty == Certainty.Proved => "refuted",
            false => $"refuted, {claim.Verdict}",
        };
    }

    internal static ClaimRow Of(ClaimResult claim) => new(claim.Says, claim.Holds, VerdictOf(claim), claim.By);
}
