using System.Collections.Immutable;
using System.Globalization;

namespace RuleAndCompass.Bench;

/// <summary>The operations of a sequence of acts, counted in the classical way; <c>default</c> counts nothing.</summary>
/// <param name="R1">The edge laid to a point.</param>
/// <param name="R2">A line drawn.</param>
/// <param name="C1">The needle, or a point of the dividers, put to a given point.</param>
/// <param name="C2">The needle put to any point of a line. No act does so: a needle is always seated in a pricked point.</param>
/// <param name="C3">A circle drawn.</param>
/// <param name="Slides">Squares laid to a line, counted apart.</param>
/// <param name="Protractions">Protractors laid to a line, counted apart.</param>
/// <param name="ScaleReadings">Openings taken from a scale or the printed plate, counted apart.</param>
/// <param name="Locates">Points measured on the stock or pricked through the plate, counted apart.</param>
/// <remarks>
/// É. Lemoine, Géométrographie (1902). A given span is taken with 2 C1; a free opening costs nothing, nor does pricking a crossing.
/// </remarks>
public readonly record struct OperationCount(
    int R1, int R2, int C1, int C2, int C3, int Slides, int Protractions, int ScaleReadings, int Locates)
{
    /// <summary>The count of all operations with edge and compass.</summary>
    public int Simplicity => R1 + R2 + C1 + C2 + C3;

    /// <summary>The count of those on whose care the figure depends.</summary>
    public int Exactitude => R1 + C1 + C2;

    /// <summary>Adds two counts.</summary>
    public static OperationCount operator +(OperationCount a, OperationCount b) => new(
        a.R1 + b.R1, a.R2 + b.R2, a.C1 + b.C1, a.C2 + b.C2, a.C3 + b.C3,
        a.Slides + b.Slides, a.Protractions + b.Protractions, a.ScaleReadings + b.ScaleReadings, a.Locates + b.Locates);

    /// <summary>The symbol, as <c>2R1 + R2 + 3C1 + 3C3</c>; <c>0</c> for nothing.</summary>
    public override string ToString()
    {
        (int Count, string Sign)[] parts = [(R1, "R1"), (R2, "R2"), (C1, "C1"), (C2, "C2"), (C3, "C3")];
        string symbol = string.Join(" + ", parts.Where(part => part.Count > 0).Select(part =>
            part.Count == 1 ? part.Sign : part.Count.ToString(CultureInfo.InvariantCulture) + part.Sign));
        return symbol.Length == 0 ? "0" : symbol;
    }
}

/// <summary>The operations of a whole script, and of its parts.</summary>
/// <param name="Total">Of all acts.</param>
/// <param name="Stages">By the acts' <see cref="Act.Stage"/>; a stage without acts counts nothing.</param>
/// <param name="Wants">By the acts' <see cref="Act.Want"/>, those with acts only.</param>
public sealed record Geometrography(
    OperationCount Total, ImmutableSortedDictionary<int, OperationCount> Stages, ImmutableSortedDictionary<int, OperationCount> Wants)
{
    /// <summary>Counts a sequence of acts.</summary>
    /// <param name="acts">Whole and in order: what an act costs depends on where the needle stands.</param>
    public static Geometrography Of(ImmutableArray<Act> acts)
    {
        OperationCount total = default;
        Dictionary<int, OperationCount> stages = [];
        Dictionary<int, OperationCount> wants = [];
        SetOpening? justSet = null;
        foreach (Act act in acts)
        {
            OperationCount count = Of(act, justSet);
            total += count;
            stages[act.Stage] = stages.GetValueOrDefault(act.Stage) + count;
            wants[act.Want] = wants.GetValueOrDefault(act.Want) + count;
            justSet = act switch
            {
                SetOpening set => set,
                Swing => null,
                _ => justSet,
            };
        }

        return new Geometrography(total, stages.ToImmutableSortedDictionary(), wants.ToImmutableSortedDictionary());
    }

    // After a span is set one point of the dividers stands at each of its ends: the first circle about one of them needs no new seat.
    private static OperationCount Of(Act act, SetOpening? justSet) => act switch
    {
        Locate => new OperationCount { Locates = 1 },
        Cross => default,
        Lay => new OperationCount { R1 = 2, R2 = 1 },
        SetOpening { Opening: SpanOpening } => new OperationCount { C1 = 2 },
        SetOpening { Opening: ScaleOpening } => new OperationCount { ScaleReadings = 1 },
        SetOpening => default,
        Swing swing when ReferenceEquals(swing.Setting, justSet) && justSet.Opening is SpanOpening span
            && (ReferenceEquals(span.First, swing.Centre) || ReferenceEquals(span.Second, swing.Centre)) => new OperationCount { C3 = 1 },
        Swing => new OperationCount { C1 = 1, C3 = 1 },
        Protract => new OperationCount { Protractions = 1 },
        Slide => new OperationCount { Slides = 1 },
        _ => throw new System.Diagnostics.UnreachableException($"No count for {act.GetType().Name}."),
    };
}
