using System.Collections.Immutable;
using RuleAndCompass.Geometry;

namespace RuleAndCompass.Bench;

/// <summary>An end of a kept piece of a mark.</summary>
internal readonly record struct KeptEnd(Mark Mark, Point At);

/// <summary>How far a drawn line is needed: from one point on it to another.</summary>
/// <param name="First">The first of the points needed on it, in its direction.</param>
/// <param name="Last">The last.</param>
/// <param name="FromMillimetres">Where <paramref name="First"/> lies along the line, from its start.</param>
/// <param name="ToMillimetres">Where <paramref name="Last"/> lies.</param>
internal readonly record struct LineUse(Point First, Point Last, double FromMillimetres, double ToMillimetres)
{
    /// <summary>From the first point to the last.</summary>
    public double Length => ToMillimetres - FromMillimetres;

    /// <summary>
    /// How far each line of a sequence is needed: over the points it is drawn through, the points pricked on it, the points at which a protractor is laid to it,
    /// and the ends of its kept pieces.
    /// </summary>
    public static ImmutableDictionary<LineMark, LineUse> Of(IEnumerable<Act> acts, IEnumerable<KeptEnd> keptEnds)
    {
        Dictionary<LineMark, LineUse> uses = [];
        foreach (Act act in acts)
        {
            switch (act)
            {
                case Lay lay:
                    Include(lay.Line, lay.First.Point);
                    Include(lay.Line, lay.Second.Point);
                    break;
                case Protract protract:
                    Include(protract.Line, protract.At.Point);
                    Include(protract.Base, protract.At.Point);
                    break;
                case Slide slide:
                    Include(slide.Line, slide.Through.Point);
                    break;
                case Cross cross:
                    if (cross.First is LineMark first)
                        Include(first, cross.Point.Point);
                    if (cross.Second is LineMark second)
                        Include(second, cross.Point.Point);
                    break;
                default:
                    break;
            }
        }

        foreach (KeptEnd end in keptEnds)
        {
            if (end.Mark is LineMark line)
                Include(line, end.At);
        }

        return uses.ToImmutableDictionary();

        void Include(LineMark line, Point point)
        {
            double along = Along(line.Line, point);
            if (!uses.TryGetValue(line, out LineUse use))
                use = new LineUse(point, point, along, along);
            else if (along < use.FromMillimetres)
                use = use with { First = point, FromMillimetres = along };
            else if (along > use.ToMillimetres)
                use = use with { Last = point, ToMillimetres = along };
            uses[line] = use;
        }
    }

    /// <summary>How far along a line, from its start, a point lies; millimetres.</summary>
    public static double Along(Line line, Point point)
    {
        double dx = line.Direction.X.ToDouble();
        double dy = line.Direction.Y.ToDouble();
        return ((point.XMillimetres - line.Start.XMillimetres) * dx + (point.YMillimetres - line.Start.YMillimetres) * dy) / double.Hypot(dx, dy);
    }
}
