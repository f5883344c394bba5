using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;

namespace RuleAndCompass.Making;

/// <summary>How far from its start a compared line is kept: where an error of its angle is felt most.</summary>
internal static class FarEnd
{
    /// <summary>Millimetres; null where the comparison is no line's angle, or nothing of the line is kept.</summary>
    public static double? Of(Comparison comparison, IReadOnlyList<Kept> kept)
    {
        if (comparison.Measure is not LineTurn turn)
            return null;
        double farthest = 0;
        foreach (Kept part in kept)
            if (ReferenceEquals(part.Mark, turn.To))
                foreach (Piece piece in part.Pieces)
                    if (piece is SegmentPiece segment)
                        farthest = Math.Max(farthest, Math.Max(FromStart(segment.From), FromStart(segment.To)));
        return farthest > 0 ? farthest : null;

        double FromStart(Point end) => turn.To.Line.Start.DistanceTo(end).ToDouble();
    }
}
