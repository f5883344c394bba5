using System.Globalization;
using System.Text;
using System.Xml.Linq;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Composition;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.Plates;

/// <summary>
/// What is kept and nothing else, as SVG for a cutter, a laser or a mill: millimetres, true arcs, one group a layer, no text. The origin is the sheet's
/// top left corner.
/// </summary>
public static class CutFile
{
    // An arc near half a turn, or near a whole one, tells its centre badly by its ends and radius: it leaves as two or three.
    private const double LargestArcRadians = 170 * Math.PI / 180;

    // A point to be drilled that was given no width is marked so wide.
    private const double PointRadiusMillimetres = 0.25;

    /// <summary>The file.</summary>
    /// <param name="scriptName">The script it came from; null leaves the mark out.</param>
    /// <param name="cancellation">Ends the work with an <see cref="OperationCanceledException"/>.</param>
    public static byte[] Write(Layout layout, string? scriptName = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(layout);
        double width = layout.Sheet.Width.ToDouble(), height = layout.Sheet.Height.ToDouble();
        XElement root = SvgWriter.Root(width, height, layout.Title);
        foreach (Layer layer in new[] { Layer.Engraved, Layer.Cut, Layer.Drilled })
        {
            List<Kept> kept = [.. layout.Kept.Where(each => each.Layer == layer)];
            if (kept.Count > 0)
            {
                root.Add(Group(layer, kept, layout, width / 2, height / 2, cancellation));
            }
        }

        return SvgWriter.ToBytes(root, scriptName);
    }

    private static XElement Group(Layer layer, List<Kept> kept, Layout layout, double middleX, double middleY, CancellationToken cancellation)
    {
        (string id, string colour) = layer switch
        {
            Layer.Cut => ("cut", "#c00000"),
            Layer.Drilled => ("drilled", "#0000c0"),
            _ => ("engraved", "#000000"),
        };
        XElement group = SvgWriter.Group(id, new XAttribute("fill", "none"), new XAttribute("stroke", colour));
        foreach (IGrouping<(Weight, Dash), Kept> alike in kept.GroupBy(each => (each.Weight, each.Dash)))
        {
            Scene.Pen pen = Pens.Kept(alike.Key.Item1, alike.Key.Item2);
            XAttribute[] stroke = pen.Dashes.IsEmpty
                ? [new XAttribute("stroke-width", SvgWriter.Figure(pen.WidthMillimetres))]
                :
                [
                    new XAttribute("stroke-width", SvgWriter.Figure(pen.WidthMillimetres)),
                    new XAttribute("stroke-dasharray", string.Join(' ', pen.Dashes.Select(SvgWriter.Figure))),
                ];
            foreach ((Point at, double radius) in Circles(alike))
            {
                group.Add(SvgWriter.Circle(middleX + at.XMillimetres, middleY - at.YMillimetres, radius, stroke));
            }

            foreach (List<Run> joined in JoinedPieces.Of(alike, layout.Decider, cancellation))
            {
                StringBuilder data = new();
                foreach (Run run in joined)
                {
                    Append(data, run, middleX, middleY);
                }

                group.Add(SvgWriter.Path(data.ToString(), stroke));
            }
        }

        return group;
    }

    private static IEnumerable<(Point At, double Radius)> Circles(IEnumerable<Kept> kept)
    {
        foreach (Kept each in kept)
        {
            foreach (Piece piece in each.Pieces)
            {
                if (piece is CirclePiece circle)
                {
                    yield return (circle.Centre, circle.Radius.ToDouble());
                }
                else if (piece is PointPiece point)
                {
                    yield return (point.At, each.DrillMillimetres / 2 ?? PointRadiusMillimetres);
                }
            }
        }
    }

    private static void Append(StringBuilder data, Run run, double middleX, double middleY)
    {
        string X(double x) => SvgWriter.Figure(middleX + x);
        string Y(double y) => SvgWriter.Figure(middleY - y);
        data.Append(CultureInfo.InvariantCulture, $"M{X(run.Start.XMillimetres)} {Y(run.Start.YMillimetres)}");
        for (int i = 0; i < run.Steps.Count; i++)
        {
            RunStep step = run.Steps[i];
            if (step.Arc is not { } arc)
            {
                // The last straight side of a closed run is drawn by closing it.
                if (!run.IsClosed || i < run.Steps.Count - 1)
                {
                    data.Append(CultureInfo.InvariantCulture, $"L{X(step.To.XMillimetres)} {Y(step.To.YMillimetres)}");
                }

                continue;
            }

            Point from = i == 0 ? run.Start : run.Steps[i - 1].To;
            double centreX = arc.Centre.XMillimetres, centreY = arc.Centre.YMillimetres, radius = arc.Radius.ToDouble();
            double start = Math.Atan2(from.YMillimetres - centreY, from.XMillimetres - centreX);
            double end = Math.Atan2(step.To.YMillimetres - centreY, step.To.XMillimetres - centreX);
            double sweep = step.Clockwise ? start - end : end - start;
            sweep = sweep <= 0 ? sweep + (2 * Math.PI) : sweep;
            int parts = Math.Max(1, (int)Math.Ceiling(sweep / LargestArcRadians));
            for (int part = 1; part <= parts; part++)
            {
                double angle = start + ((step.Clockwise ? -sweep : sweep) * part / parts);
                (double x, double y) = part == parts
                    ? (step.To.XMillimetres, step.To.YMillimetres)
                    : (centreX + (radius * Math.Cos(angle)), centreY + (radius * Math.Sin(angle)));
                data.Append(CultureInfo.InvariantCulture, $"A{SvgWriter.Figure(radius)} {SvgWriter.Figure(radius)} 0 0 {(step.Clockwise ? 1 : 0)} {X(x)} {Y(y)}");
            }
        }

        if (run.IsClosed)
        {
            data.Append('Z');
        }
    }
}
