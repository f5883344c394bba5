using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>Sets what the construction made beside what the formula says.</summary>
internal sealed class ComparisonMaker(Evaluator evaluator, Decider decider)
{
    public Comparison Compare(CompareSentence sentence, SourceSpan? followed, Action<Diagnostic> add)
    {
        string label = sentence.Label is null ? evaluator.Labelled(sentence.Constructed).ToString()! : evaluator.Text(sentence.Label);
        Comparison comparison = sentence.ComputedPlace is { } place ? Place(sentence, place, label) : Quantity(sentence, label);
        comparison = comparison with { Span = followed ?? sentence.Span };
        if (sentence.TimedBy is { } timedBy)
            comparison = Timed(comparison, sentence, timedBy);
        if (sentence.Within is { } within)
            comparison = Within(comparison, sentence, within);
        if (!comparison.InTolerance)
        {
            string asked = sentence.WithinMinutes ? $"within {sentence.Within} minutes of time" : $"within {sentence.Within}";
            add(MakingFindings.OutOfTolerance(label, DifferenceText(comparison), asked, sentence.Span));
        }

        return comparison;
    }

    private Comparison Quantity(CompareSentence sentence, string label)
    {
        Value constructed = evaluator.Evaluate(sentence.Constructed);
        Value computed = evaluator.Evaluate(sentence.Computed!); // the grammar gives an expression where there is no place
        switch (constructed, computed)
        {
            case (AngleValue or QuantityValue { IsNothing: true }, AngleValue) or (AngleValue, QuantityValue { IsNothing: true }):
                Angle a = constructed is AngleValue x ? x.Angle : Angle.Zero, b = computed is AngleValue y ? y.Angle : Angle.Zero;
                Decision decision = decider.CompareDirections(a, b);
                return Of(sentence, label, QuantityKind.Angle, a.Degrees, b.Degrees, decision.IsZero ? Real.Zero : ShortWay(a, b), decision, Evaluator.TraceOf(constructed));
            case (QuantityValue a2, QuantityValue b2) when a2.Dimension == b2.Dimension || a2.IsNothing || b2.IsNothing:
                int dimension = a2.IsNothing ? b2.Dimension : a2.Dimension;
                if (dimension > 1)
                    throw new FaultException(MakingFindings.BadComparison($"`compare` sets lengths, numbers, angles or places side by side, and this is {a2.KindWithArticle}", sentence.Span));
                Real difference = a2.Amount - b2.Amount;
                Decision sign = decider.Decide(difference);
                return Of(sentence, label, dimension == 0 ? QuantityKind.Number : QuantityKind.Length, a2.Amount, b2.Amount, sign.IsZero ? Real.Zero : difference, sign, Evaluator.TraceOf(constructed));
            case (PointValue, PointValue):
                throw new FaultException(MakingFindings.BadComparison("a point is compared with a place", sentence.Computed!.Span, "write it `(X, Y) from O`, or claim that the points are one: `claim A = B`"));
            default:
                throw new FaultException(MakingFindings.KindsDoNotFit(constructed.KindWithArticle, "compared with", computed.KindWithArticle, sentence.Span));
        }
    }

    private Comparison Place(CompareSentence sentence, Place place, string label)
    {
        Value value = evaluator.Evaluate(sentence.Constructed);
        if (value is not PointValue point)
            throw new FaultException(MakingFindings.WrongKind(sentence.Constructed.ToString()!, value.KindWithArticle, "a point", sentence.Constructed.Span, "a place `(X, Y)` stands beside a point"));
        QuantityValue x = evaluator.Length(place.X), y = evaluator.Length(place.Y);
        PointValue? from = place.From is null ? null : evaluator.Point(place.From);
        Vector constructed = from is null ? new(point.Point.X, point.Point.Y) : point.Point.From(from.Point);
        Vector apart = constructed - new Vector(x.Amount, y.Amount);
        Decision across = decider.Decide(apart.X), up = decider.Decide(apart.Y);
        Decision decision = across.Sign != 0 ? new(1, across.Verdict) : up.Sign != 0 ? new(1, up.Verdict) : new(0, Conditions.Weaker(across.Verdict, up.Verdict));
        Comparison comparison = Of(sentence, label, QuantityKind.Point, constructed.X, x.Amount, decision.IsZero ? Real.Zero : apart.Length, decision, new PointCoordinate(point.Mark, true, from?.Mark));
        return comparison with { ConstructedY = constructed.Y, ComputedY = y.Amount, MeasureY = new PointCoordinate(point.Mark, false, from?.Mark) };
    }

    private static Comparison Of(CompareSentence sentence, string label, QuantityKind kind, Real constructed, Real computed, Real difference, Decision decision, Measure? measure) =>
        new(label, kind, constructed, computed, null, null, difference, decision, null, false, true, null, null, null, measure, null, null, sentence.Span, null);

    private static Real ShortWay(Angle a, Angle b)
    {
        if (a.HasExactDirection && b.HasExactDirection)
        {
            (Real ax, Real ay) = a.Vector;
            (Real bx, Real by) = b.Vector;
            return Angle.OfVector((bx * ax) + (by * ay), (bx * ay) - (by * ax)).Degrees;
        }

        double turns = Math.Round((a - b).ToDegreesDouble() / 360);
        return (a - b - Angle.FromDegrees(360 * Rational.FromDouble(turns))).Degrees;
    }

    private Comparison Timed(Comparison comparison, CompareSentence sentence, Name timedBy)
    {
        Value hour = evaluator.Resolve(new Reference([new Bound(timedBy, [], timedBy.Span)], timedBy.Span));
        if (hour is not QuantityValue { Dimension: 0 } number)
            throw new FaultException(MakingFindings.WrongKind(timedBy.Text, hour.KindWithArticle, "a number of hours", timedBy.Span));
        Measure? by = number.Trace;
        if (sentence.ComputedPlace is { } place)
        {
            QuantityValue x = evaluator.Length(place.X), y = evaluator.Length(place.Y);
            (double X, double Y) rate = (Rate(x.Trace, by, sentence), Rate(y.Trace, by, sentence));
            Comparison timed = WithRate(comparison, timedBy, PathRate(comparison, rate.X, rate.Y));
            return timed.RatePerHour is null ? timed : timed with { PathRate = rate };
        }

        return WithRate(comparison, timedBy, Rate(Evaluator.TraceOf(evaluator.Evaluate(sentence.Computed!)), by, sentence));
    }

    // For a place the difference counts by its part along the path; what is given back makes difference / rate that part over the speed.
    private static double PathRate(Comparison comparison, double rateX, double rateY)
    {
        double speed = Math.Sqrt((rateX * rateX) + (rateY * rateY));
        if (speed == 0 || comparison.Decision.IsZero)
            return speed;
        double dx = (comparison.Constructed - comparison.Computed).ToDouble(), dy = (comparison.ConstructedY! - comparison.ComputedY!).ToDouble();
        double along = ((dx * rateX) + (dy * rateY)) / speed;
        return along == 0 ? speed : comparison.Difference.ToDouble() / along * speed;
    }

    private static Comparison WithRate(Comparison comparison, Name timedBy, double rate)
    {
        bool still = rate == 0 || !double.IsFinite(rate);
        return comparison with
        {
            TimedBy = timedBy.Text,
            RatePerHour = still ? null : rate,
            TimeLeftOut = still ? $"the formula does not change with `{timedBy.Text}` here" : null,
        };
    }

    private static double Rate(Measure? formula, Measure? by, CompareSentence sentence)
    {
        if (MeasureRate.HoldsMeasure(formula))
            throw new FaultException(MakingFindings.BadComparison("the formula of a timed comparison holds a measure of what is drawn", sentence.Computed?.Span ?? sentence.Span, "write it with given values, so that it can be differentiated"));
        return formula is null || by is null ? 0 : MeasureRate.Of(formula, by);
    }

    private Comparison Within(Comparison comparison, CompareSentence sentence, Expression within)
    {
        Value tolerance = evaluator.Evaluate(within);
        if (sentence.WithinMinutes)
        {
            if (tolerance is not QuantityValue { Dimension: 0 } minutes)
                throw new FaultException(MakingFindings.WrongKind(within.ToString()!, tolerance.KindWithArticle, "a number of minutes", within.Span));
            if (decider.Sign(minutes.Amount) < 0)
                throw new FaultException(MakingFindings.BadComparison("the tolerance is less than nothing", within.Span, "write how far the two may differ either way"));
            if (comparison.TimedBy is null)
                throw new FaultException(MakingFindings.BadComparison("minutes of time need `timed by`", within.Span, "name the variable that counts hours: `timed by h`"));
            bool inTime = comparison.Decision.IsZero || comparison.MinutesOfTime is not { } size || Math.Abs(size) <= minutes.Amount.ToDouble();
            return comparison with { Within = minutes.Amount, WithinMinutes = true, InTolerance = inTime };
        }

        Real allowed = (comparison.Kind, tolerance) switch
        {
            (QuantityKind.Angle, AngleValue angle) => angle.Angle.Degrees,
            (QuantityKind.Length or QuantityKind.Point, QuantityValue { Dimension: 1 } length) => length.Amount,
            (QuantityKind.Number, QuantityValue { Dimension: 0 } number) => number.Amount,
            (_, QuantityValue { IsNothing: true }) => Real.Zero,
            _ => throw new FaultException(MakingFindings.BadComparison($"the tolerance is {tolerance.KindWithArticle}, and the comparison is of {KindWord(comparison.Kind)}", within.Span)),
        };
        if (decider.Sign(allowed) < 0)
            throw new FaultException(MakingFindings.BadComparison("the tolerance is less than nothing", within.Span, "write how far the two may differ either way"));
        bool within1 = comparison.Decision.IsZero || (decider.Sign(comparison.Difference - allowed) <= 0 && decider.Sign(comparison.Difference + allowed) >= 0);
        return comparison with { Within = allowed, InTolerance = within1 };
    }

    private static string DifferenceText(Comparison comparison) => comparison.Kind switch
    {
        QuantityKind.Angle => $"{ValueText.Decimals(comparison.Difference.ToDouble(), 6)}°",
        QuantityKind.Number => ValueText.Decimals(comparison.Difference.ToDouble(), 9),
        _ => $"{ValueText.Decimals(comparison.Difference.ToDouble(), 6)} mm",
    } + (comparison.WithinMinutes && comparison.MinutesOfTime is { } minutes ? $", {ValueText.Decimals(minutes, 3)} minutes of time" : "");

    private static string KindWord(QuantityKind kind) => kind switch
    {
        QuantityKind.Angle => "angles",
        QuantityKind.Length => "lengths",
        QuantityKind.Point => "places",
        _ => "numbers",
    };
}
