using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>How the stock is shown on step plates: the paper, the scale and what of the stock is seen. The same on all of them.</summary>
internal sealed record StockView(PlateFormat Format, PlateScale Scale, View View)
{
    private const double SmallestFactorOnA4 = 0.1;
    private const double OverEdge = 3;
    private const double RoomRoundUsed = 0.06;

    /// <param name="paper">Null to choose.</param>
    public static StockView Of(Tracing tracing, PlatePaper? paper, bool hasThumbnails)
    {
        Box whole = NeededStock(tracing);
        Box used = UsedStock(tracing, whole);
        PlateFormat format = paper == PlatePaper.A3 ? PlateFormat.A3 : PlateFormat.A4;
        if (paper is null && ScaleOn(format, whole, hasThumbnails).Factor < SmallestFactorOnA4)
        {
            format = PlateFormat.A3;
        }

        // The whole sheet, unless the part with work on it can be shown larger; never larger than life for that.
        PlateScale scale = ScaleOn(format, whole, hasThumbnails);
        PlateScale larger = ScaleOn(format, used, hasThumbnails);
        larger = larger.Factor > 1 ? new PlateScale(1, 1) : larger;
        Box needed = whole;
        if (larger.Factor > scale.Factor)
        {
            scale = larger;
            needed = used;
        }

        // The used part in the middle, but as much of the sheet round it as there is room for.
        Box area = format.DrawingArea(hasThumbnails);
        double centreX = whole.Width * scale.Factor <= area.Width ? whole.Middle.X : needed.Middle.X;
        double centreY = whole.Height * scale.Factor <= area.Height ? whole.Middle.Y : needed.Middle.Y;
        View view = new(area.Middle.Moved(-centreX * scale.Factor, -centreY * scale.Factor), scale.Factor, area);
        return new(format, scale, view with { Window = view.OnPage(whole).Grown(OverEdge).Within(area) });
    }

    private static PlateScale ScaleOn(PlateFormat format, Box needed, bool hasThumbnails)
    {
        Box area = format.DrawingArea(hasThumbnails);
        return PlateScale.Fitting(needed.Width, needed.Height, area.Width, area.Height);
    }

    // The sheet and every point, but not beyond the board; without a board not far beyond the sheet, so that a stray point does not shrink all the rest.
    private static Box NeededStock(Tracing tracing)
    {
        Box needed = tracing.Sheet;
        Box near = needed.Grown(Math.Max(needed.Width, needed.Height) / 4);
        Box limit = tracing.Board ?? near;
        foreach (Trace trace in tracing.Traces)
        {
            // A generated point far off is only aimed at.
            if (trace is PointTrace point && (!point.Point.IsAuxiliary || near.Holds(point.At)))
            {
                needed = needed.With(new Spot(Math.Clamp(point.At.X, limit.Left, limit.Right), Math.Clamp(point.At.Y, limit.Top, limit.Bottom)));
            }
        }

        return needed;
    }

    // The part of the needed stock that has work on it, with some room.
    private static Box UsedStock(Tracing tracing, Box needed)
    {
        Box? used = null;
        foreach (Trace trace in tracing.Traces)
        {
            foreach (Spot spot in trace is PointTrace point ? [point.At] : ExtremesOf(trace))
            {
                Spot inside = new(Math.Clamp(spot.X, needed.Left, needed.Right), Math.Clamp(spot.Y, needed.Top, needed.Bottom));
                used = used?.With(inside) ?? new Box(inside.X, inside.Y, inside.X, inside.Y);
            }
        }

        if (used is not { } box)
        {
            return needed;
        }

        box = box.Grown(RoomRoundUsed * Math.Max(box.Width, box.Height));
        return box.Width <= 0 ? needed : box.Within(needed);
    }

    private static IEnumerable<Spot> ExtremesOf(Trace trace)
    {
        switch (trace)
        {
            case LineTrace line:
                yield return line.From;
                yield return line.To;
                break;
            case CircleTrace circle:
                foreach (ArcSpan arc in circle.Arcs)
                {
                    int steps = 1 + (int)(arc.Sweep / 0.2);
                    for (int i = 0; i <= steps; i++)
                    {
                        double angle = arc.Start + (arc.Sweep * i / steps);
                        yield return circle.Centre.Moved(circle.Radius * Math.Cos(angle), -circle.Radius * Math.Sin(angle));
                    }
                }

                break;
        }
    }
}
