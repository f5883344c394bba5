using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making.Wants;

/// <content>Points.</content>
internal sealed partial class WantMaker
{
    private void Make(PrickAt want)
    {
        PointValue? from = want.Place.From is null ? null : evaluator.Point(want.Place.From);
        Real x = evaluator.Length(want.Place.X).Amount, y = evaluator.Length(want.Place.Y).Amount;
        Point at = from is null ? new(x, y) : from.Point.Plus(new(x, y));
        Bind(want.Point, constructions.At(at, from?.Mark, evaluator.NameOf(want.Point)));
    }

    private void Make(PrickFoot want)
    {
        PointValue from = evaluator.Point(want.From);
        Bind(want.Point, constructions.Foot(from.Mark, Directed(evaluator.Line(want.On)), evaluator.NameOf(want.Point), want.By));
    }

    private void Make(PrickCentre want) => Bind(want.Point, CentreOf(evaluator.Circle(want.Circle)));

    private void Make(PrickMidway want)
    {
        PointValue from = evaluator.Point(want.From), to = evaluator.Point(want.To);
        Bind(want.Point, IsSame(from, to) ? from.Mark : constructions.Midway(from.Mark, to.Mark, evaluator.NameOf(want.Point)));
    }

    private void Make(PrickAcross want) =>
        Bind(want.Point, constructions.Mirror(evaluator.Point(want.Of).Mark, Directed(evaluator.Line(want.Across)), evaluator.NameOf(want.Point), want.By));

    private void Make(PrickAbout want)
    {
        PointValue of = evaluator.Point(want.Of), about = evaluator.Point(want.About);
        Bind(want.Point, IsSame(of, about) ? of.Mark : constructions.Opposite(of.Mark, about.Mark, evaluator.NameOf(want.Point)));
    }

    private void Make(PrickOnToward want)
    {
        LineValue line = evaluator.Line(want.Line);
        PointValue from = evaluator.Point(want.From);
        On(from, want.From, line.Directed.Mark.Line, want.Line);
        AlongLine(want.Point, line, from, want.Length, IsAhead(line, want.Toward, from, want.From));
    }

    private void Make(PrickOnAhead want)
    {
        LineValue line = evaluator.Line(want.Line);
        PointValue from = evaluator.Point(want.Of);
        On(from, want.Of, line.Directed.Mark.Line, want.Line);
        AlongLine(want.Point, line, from, want.Length, want.Ahead);
    }

    private void AlongLine(Bound bound, LineValue line, PointValue from, Expression length, bool ahead)
    {
        QuantityValue size = evaluator.Length(length);
        int sign = Decider.Sign(size.Amount);
        if (sign == 0)
        {
            Bind(bound, from.Mark);
            return;
        }

        QuantityValue positive = sign > 0 ? size : new QuantityValue(-size.Amount, 1);
        Bind(bound, constructions.AlongLine(Directed(line), from.Mark, constructions.OpeningFor(positive), ahead == (sign > 0), evaluator.NameOf(bound)));
    }

    private void Make(PrickOnCircle want)
    {
        CircleValue circle = evaluator.Circle(want.Circle);
        PointMark centre = CentreOf(circle);
        Angle direction = AngleOf(want.Toward, new PointValue(centre), want.Circle);
        DirectedLine spoke = constructions.Toward(centre, direction, null, want.By);
        Bind(want.Point, constructions.OnSpoke(spoke, centre, circle.Mark, evaluator.NameOf(want.Point)));
    }

    private void Make(PrickTurned want)
    {
        CircleValue circle = evaluator.Circle(want.Circle);
        PointValue from = evaluator.Point(want.From);
        On(from, want.From, circle.Mark.Circle, want.Circle);
        Angle by = Signed(evaluator.AngleOf(want.Angle), want.Way);
        Bind(want.Point, constructions.TurnedOn(circle.Mark, CentreOf(circle), from.Mark, by, evaluator.NameOf(want.Point), want.By));
    }

    private void Make(PrickDividing want)
    {
        PointValue from = evaluator.Point(want.From), to = evaluator.Point(want.To);
        Apart(from, want.From, to, want.To);
        List<IndexKey> keys = Keys(want.Points, 2);
        IReadOnlyList<PointMark> marks = constructions.Dividing(from.Mark, to.Mark, keys.Count - 1, place => MemberName(want.Points, keys[place]));
        BindMany(want.Points, keys, marks);
    }

    private void Make(PrickRound want)
    {
        PointValue centre = evaluator.Point(want.Centre), from = evaluator.Point(want.From);
        Apart(centre, want.Centre, from, want.From);
        List<IndexKey> keys = Keys(want.Points, 3);
        IReadOnlyList<PointMark> marks = constructions.Round(centre.Mark, from.Mark, keys.Count, want.Way == Way.Anticlockwise, place => MemberName(want.Points, keys[place]), want.By);
        BindMany(want.Points, keys, marks);
    }

    private void Make(PrickSteppingAlong want)
    {
        LineValue line = evaluator.Line(want.Line);
        PointValue from = evaluator.Point(want.From);
        On(from, want.From, line.Directed.Mark.Line, want.Line);
        bool ahead = IsAhead(line, want.Toward, from, want.From);
        Opening opening = OpeningOf(want.Opening);
        List<IndexKey> keys = Keys(want.Points, 1);
        List<PointMark> marks = [from.Mark];
        for (int step = 1; step < keys.Count; step++)
            marks.Add(constructions.AlongLine(Directed(line), marks[^1], opening, ahead, MemberName(want.Points, keys[step])));
        BindMany(want.Points, keys, marks);
    }

    private void Make(PrickSteppingRound want)
    {
        CircleValue circle = evaluator.Circle(want.Circle);
        PointValue from = evaluator.Point(want.From);
        On(from, want.From, circle.Mark.Circle, want.Circle);
        Opening opening = OpeningOf(want.Opening);
        if (Decider.Sign(opening.Squared - (4 * circle.Mark.Circle.RadiusSquared)) >= 0)
            throw new FaultException(MakingFindings.Degenerate($"the opening is no shorter than the way across `{want.Circle}`, so it cannot be stepped round it", want.Opening.Span));
        List<IndexKey> keys = Keys(want.Points, 1);
        List<PointMark> marks = [from.Mark];
        for (int step = 1; step < keys.Count; step++)
            marks.Add(constructions.StepRound(circle.Mark, CentreOf(circle), marks[^1], opening, want.Way == Way.Anticlockwise, MemberName(want.Points, keys[step])));
        BindMany(want.Points, keys, marks);
    }

    private List<IndexKey> Keys(Many many, int least)
    {
        IndexKey from = evaluator.Index(many.From), to = evaluator.Index(many.To);
        IndexKey step = many.Step is null ? new(QuantityKind.Number, Rational.One) : evaluator.Index(many.Step);
        QuantityKind kind = from.Value.IsZero ? to.Kind : from.Kind;
        if (to.Kind != kind && !to.Value.IsZero)
            throw new FaultException(MakingFindings.BadLoop("both ends of a family's indices are of one kind", many.Span));
        if (many.Step is null && kind != QuantityKind.Number)
            throw new FaultException(MakingFindings.BadLoop("a family counted by lengths or angles needs a `step`", many.Span, "such as `step 10 mm` or `step 5°`"));
        if (step.Kind != kind)
            throw new FaultException(MakingFindings.BadLoop("a family's step is of the same kind as its ends", many.Step!.Span)); // without a step the kind is a number
        if (step.Value.Sign <= 0)
            throw new FaultException(MakingFindings.BadLoop("a family's step is more than nothing", many.Step?.Span ?? many.Span));
        List<IndexKey> keys = [];
        for (Rational at = from.Value; at <= to.Value; at += step.Value)
        {
            keys.Add(new(kind, at));
            if (keys.Count > 20_000)
                throw new FaultException(MakingFindings.Limit("the family has too many points", "20000", many.Span));
        }

        return keys.Count >= least
            ? keys
            : throw new FaultException(MakingFindings.BadLoop($"`{many}` is {keys.Count} points, and at least {least} are needed", many.Span, "write the smaller index first"));
    }

    private string MemberName(Many many, IndexKey key) => $"{evaluator.Scope.Prefix}{many.Name.Text}[{key}]";

    private void BindMany(Many many, IReadOnlyList<IndexKey> keys, IReadOnlyList<PointMark> marks) =>
        bindMany(many, [.. keys.Select((key, place) => (key, (Value)new PointValue(marks[place])))]);
}
