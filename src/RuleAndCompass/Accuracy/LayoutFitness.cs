using System.Collections.Immutable;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;

namespace RuleAndCompass.Accuracy;

/// <summary>Whether a layout fits its sheet, board and kit.</summary>
public static class LayoutFitness
{
    /// <summary>Warnings RC31…, each with its act's number, the figure and what would mend it; in the order of the acts, then of what is kept.</summary>
    public static ImmutableArray<Diagnostic> Inspect(Layout layout, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(layout);
        BenchArea? board = layout.Board is { } size ? new BenchArea(size.Width, size.Height) : null;
        BenchWork work = new(
            layout.Acts, layout.Kit, new BenchArea(layout.Sheet.Width, layout.Sheet.Height), board, [.. layout.Kept.Select(Shape)]);
        return Fitness.Inspect(work, layout.Decider, cancellation);
    }

    private static KeptShape Shape(Kept kept)
    {
        List<Point> ends = [];
        List<KeptArc> arcs = [];
        foreach (Piece piece in kept.Pieces)
        {
            switch (piece)
            {
                case SegmentPiece segment:
                    ends.AddRange([segment.From, segment.To]);
                    break;
                case ArcPiece arc:
                    ends.AddRange([arc.From, arc.To]);
                    arcs.Add(new KeptArc(arc.Centre, arc.Radius, arc.From, arc.To, arc.Clockwise));
                    break;
                case CirclePiece circle:
                    arcs.Add(new KeptArc(circle.Centre, circle.Radius, null, null, false));
                    break;
                case PointPiece point:
                    ends.Add(point.At);
                    break;
                default:
                    throw new System.Diagnostics.UnreachableException($"No room for {piece.GetType().Name}.");
            }
        }

        return new KeptShape(kept.Name, kept.Mark, [.. ends], [.. arcs], kept.Span, kept.File);
    }
}
