using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making.Wants;

/// <content>Circles.</content>
internal sealed partial class WantMaker
{
    private void Make(StrikeThrough want)
    {
        PointValue about = evaluator.Point(want.About), through = evaluator.Point(want.Through);
        if (IsSame(about, through))
            throw new FaultException(MakingFindings.NotPositive("the circle's opening", "nothing", want.About.Span.To(want.Through.Span)) with { Hint = $"`{want.About}` and `{want.Through}` are one point; name another that the circle passes through" });
        Bind(want.Circle, bench.Swing(about.Mark, new SpanOpening(about.Mark, through.Mark), evaluator.NameOf(want.Circle)));
    }

    private void Make(StrikeOpening want)
    {
        PointValue about = evaluator.Point(want.About);
        Bind(want.Circle, bench.Swing(about.Mark, OpeningOf(want.Opening), evaluator.NameOf(want.Circle)));
    }

    private void Make(StrikeTouching want)
    {
        PointValue about = evaluator.Point(want.About);
        LineValue line = evaluator.Line(want.Touching);
        if (Incidence.Holds(about.Point, line.Directed.Mark.Line, Decider))
            throw new FaultException(MakingFindings.NotPositive("the circle's opening", "nothing", want.About.Span.To(want.Touching.Span)) with { Hint = $"`{want.About}` lies on `{want.Touching}`; a circle about it crosses the line" });
        PointMark foot = constructions.Foot(about.Mark, Directed(line), null, want.By);
        Bind(want.Circle, bench.Swing(about.Mark, new SpanOpening(about.Mark, foot), evaluator.NameOf(want.Circle)));
    }

    private void Make(StrikeThroughThree want)
    {
        PointValue first = evaluator.Point(want.First), second = evaluator.Point(want.Second), third = evaluator.Point(want.Third);
        Apart(first, want.First, second, want.Second);
        Apart(second, want.Second, third, want.Third);
        Apart(first, want.First, third, want.Third);
        if (Decider.IsZero(Vector.Cross(second.Point.From(first.Point), third.Point.From(first.Point))))
            throw new FaultException(MakingFindings.Degenerate($"`{want.First}`, `{want.Second}` and `{want.Third}` lie on one line, so no circle passes through all three", want.First.Span.To(want.Third.Span), "a circle takes three points that bend"));
        DirectedLine a = constructions.Halving(first.Mark, second.Mark, null), b = constructions.Halving(second.Mark, third.Mark, null);
        PointMark centre = constructions.Crossed(a, b);
        // Equally far from all three (Euclid IV.5), so the arc through one passes through the others.
        Bind(want.Circle, bench.Swing(centre, new SpanOpening(centre, first.Mark), evaluator.NameOf(want.Circle), second.Mark, third.Mark));
    }

    private Opening OpeningOf(OpeningSpan span)
    {
        switch (span)
        {
            case PointsSpan points:
                PointValue from = evaluator.Point(points.From), to = evaluator.Point(points.To);
                if (IsSame(from, to))
                    throw new FaultException(MakingFindings.NotPositive("the opening", "nothing", span.Span) with { Hint = $"`{points.From}` and `{points.To}` are one point" });
                return new SpanOpening(from.Mark, to.Mark);
            case LengthSpan length:
                QuantityValue size = evaluator.Length(length.Length);
                if (Decider.Sign(size.Amount) <= 0)
                    throw new FaultException(MakingFindings.NotPositive("the opening", evaluator.Written(size), span.Span));
                return constructions.OpeningFor(size);
            default:
                throw new System.Diagnostics.UnreachableException($"No opening of {span.GetType().Name}.");
        }
    }
}
