using System.Collections.Immutable;
using RuleAndCompass.Bench;
using RuleAndCompass.Making;

namespace RuleAndCompass.Accuracy;

/// <summary>What a hand error is of.</summary>
public enum HandSubject
{
    /// <summary>A compared quantity.</summary>
    Comparison,

    /// <summary>The way a kept line runs on the sheet, and how far it passes from its kept ends.</summary>
    Line,

    /// <summary>The radius of a kept circle or arc.</summary>
    Radius,

    /// <summary>The place of the centre of a kept circle or arc.</summary>
    Centre,

    /// <summary>The place of a kept point, or of the worst corner of a kept run.</summary>
    Point,
}

/// <summary>The share of one act in a hand error.</summary>
/// <param name="Act">Its number; 0 for the printed plate as a whole.</param>
/// <param name="Share">Its part of the variance by first order, from 0 to 1.</param>
/// <param name="Why">The reason in plain words.</param>
public sealed record Blame(int Act, double Share, string Why);

/// <summary>How far the hand throws one quantity out. Lengths are millimetres, angles degrees.</summary>
/// <param name="Label">As the report calls it.</param>
/// <param name="Subject">What it is of.</param>
/// <param name="Index">Which of the layout's comparisons, or of its kept things.</param>
/// <param name="Kind">Angle, length, number, or point, where the error is the distance from where the point should be.</param>
/// <param name="Bias">What the rounding of printed settings alone does: a known amount. For a point a distance.</param>
/// <param name="Sigma">
/// Standard deviation by trials, or by first order where there were none; for a point the root of the mean square distance. The bias is not in it.
/// </param>
/// <param name="FirstOrderSigma">The same by first order; null where curves that only touch leave none.</param>
/// <param name="Low95">The error that 2.5 % of the trials stay under; signed, bias and all. For a point, of the distance.</param>
/// <param name="Median">That 50 % stay under.</param>
/// <param name="High95">That 97.5 % stay under.</param>
/// <param name="Size95">The hand error at 95 %: the size that 95 layouts in 100 stay within; by trials, or by first order where there were none.</param>
/// <param name="Size99">The size that 99 in 100 stay within.</param>
/// <param name="Far95">
/// Millimetres that 95 in 100 stay within at the far end: of a kept line, at the worse of its kept ends; of a compared angle, at the far end of what is kept of
/// its line. Null where there is none.
/// </param>
/// <param name="MinutesOfTime95"><paramref name="Size95"/> in minutes of time, where timed; for a place its part along the path.</param>
/// <param name="Lost">Trials in which a crossing it needs was lost; the other figures are of the rest.</param>
/// <param name="Disagreement">Where first order and trials differ by more than 10 %, what each says; the trials are trusted.</param>
/// <param name="Blame">The acts that cause most of the variance, largest share first.</param>
/// <param name="Rest">The share of all other acts.</param>
public sealed record HandResult(
    string Label,
    HandSubject Subject,
    int Index,
    QuantityKind Kind,
    double Bias,
    double? Sigma,
    double? FirstOrderSigma,
    double? Low95,
    double? Median,
    double? High95,
    double? Size95,
    double? Size99,
    double? Far95,
    double? MinutesOfTime95,
    long Lost,
    string? Disagreement,
    ImmutableArray<Blame> Blame,
    double Rest);

/// <summary>The hand errors of the compared quantities of one kind together.</summary>
/// <param name="Kind">Of what.</param>
/// <param name="Count">How many.</param>
/// <param name="RootMeanSquare">Of their sizes at 95 %.</param>
/// <param name="Worst">The greatest size at 95 %.</param>
/// <param name="WorstLabel">Of which quantity.</param>
public sealed record HandSummary(QuantityKind Kind, int Count, double RootMeanSquare, double Worst, string WorstLabel);

/// <summary>How far a whole layout can be trusted.</summary>
/// <param name="Results">Comparisons in their order, then what is kept in its.</param>
/// <param name="Summary">Of the kind most compared: the one figure for a layout. Null where nothing is compared.</param>
/// <param name="Summaries">One for each kind compared.</param>
/// <param name="Blame">Over all comparisons: the mean of the acts' shares.</param>
/// <param name="Hand">The hand assumed.</param>
/// <param name="PaperFraction">The printed plate's scale error assumed, where anything is taken off it.</param>
/// <param name="Trials">How many were run.</param>
/// <param name="Seed">With which seed.</param>
public sealed record HandErrorReport(
    ImmutableArray<HandResult> Results,
    HandSummary? Summary,
    ImmutableArray<HandSummary> Summaries,
    ImmutableArray<Blame> Blame,
    Hand Hand,
    double? PaperFraction,
    int Trials,
    ulong Seed);
