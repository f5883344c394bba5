using System.Diagnostics;
using System.Numerics;
using System.Text;
using RuleAndCompass.Bench;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;
using Vector = RuleAndCompass.Geometry.Vector;

namespace RuleAndCompass.Making;

/// <summary>Works out expressions: exact values with their kinds, and how they follow from marks and loop variables.</summary>
internal sealed class Evaluator(Decider decider)
{
    /// <summary>What names stand for, just now.</summary>
    public Scope Scope { get; set; } = new(null, "");

    public Value Evaluate(Expression expression) => expression switch
    {
        NumberLiteral number => new QuantityValue(number.Value, 0),
        LengthLiteral length => new QuantityValue(length.Millimetres, 1),
        AngleLiteral angle => new AngleValue(Angle.FromDegrees(angle.Degrees)),
        TextLiteral text => new TextValue(Text(text)),
        Reference reference => Resolve(reference),
        Negation negation => Negate(negation),
        Arithmetic arithmetic => Combine(arithmetic),
        Call call => Apply(call),
        DistanceMeasure distance => Distance(distance),
        TurnMeasure turn => Turn(turn),
        AngleMeasure corner => Corner(corner),
        RadiusMeasure radius => Radius(radius),
        CoordinateMeasure coordinate => Coordinate(coordinate),
        _ => throw new UnreachableException($"No value of {expression.GetType().Name}."),
    };

    public PointValue Point(Reference reference) => Expect<PointValue>(reference, "a point");

    public LineValue Line(Reference reference) => Expect<LineValue>(reference, "a line");

    public CircleValue Circle(Reference reference) => Expect<CircleValue>(reference, "a circle");

    public QuantityValue Length(Expression expression)
    {
        Value value = Evaluate(expression);
        if (value is QuantityValue quantity && (quantity.Dimension == 1 || quantity.IsNothing))
            return quantity;
        string? hint = value is QuantityValue { Dimension: 0 } ? "write its unit, as in `30 mm`; a bare number is never a length" : null;
        throw new FaultException(MakingFindings.WrongKind(expression.ToString()!, value.KindWithArticle, "a length", expression.Span, hint));
    }

    public Angle AngleOf(Expression expression) => AngleValueOf(expression).Angle;

    public AngleValue AngleValueOf(Expression expression)
    {
        Value value = Evaluate(expression);
        if (value is AngleValue angle)
            return angle;
        if (value is QuantityValue { IsNothing: true })
            return new AngleValue(Angle.Zero);
        string? hint = value is QuantityValue { Dimension: 0 } ? "write its unit, as in `15°`; a bare number is never an angle" : null;
        throw new FaultException(MakingFindings.WrongKind(expression.ToString()!, value.KindWithArticle, "an angle", expression.Span, hint));
    }

    /// <summary>An exact whole number within the bounds of an int.</summary>
    public int Whole(Expression expression)
    {
        Value value = Evaluate(expression);
        if (value is QuantityValue { Dimension: 0 } quantity && quantity.Amount.TryGetRational(out Rational exact) && exact.IsInteger
            && BigInteger.Abs(exact.Numerator) < int.MaxValue)
            return (int)exact.Numerator;
        throw new FaultException(MakingFindings.WrongKind(expression.ToString()!, value.KindWithArticle, "a whole number", expression.Span));
    }

    /// <summary>An index worked out: exactly a rational number, angle or length.</summary>
    public IndexKey Index(Expression expression) => Index(Evaluate(expression), expression);

    public static IndexKey Index(Value value, Expression expression)
    {
        switch (value)
        {
            case QuantityValue { Dimension: 0 or 1 } quantity when quantity.Amount.TryGetRational(out Rational exact):
                return new(quantity.Dimension == 0 ? QuantityKind.Number : QuantityKind.Length, exact);
            case AngleValue angle when angle.Angle.TryGetDegrees(out Rational degrees):
                return new(QuantityKind.Angle, degrees);
            case QuantityValue { Dimension: 0 or 1 } or AngleValue:
                throw new FaultException(MakingFindings.BadIndex($"`{expression}` is not exactly a fraction, so it cannot tell which", expression.Span, "count with whole numbers or fractions"));
            default:
                throw new FaultException(MakingFindings.BadIndex($"`{expression}` is {value.KindWithArticle}; an index is a number, an angle or a length", expression.Span));
        }
    }

    /// <summary>The name of what a sentence binds, its indices worked out, as it stands on the stock.</summary>
    public string NameOf(Bound bound) => Scope.Prefix + LocalName(bound);

    /// <summary>A text with its values worked out.</summary>
    public string Text(TextLiteral literal)
    {
        StringBuilder text = new();
        foreach (TextPiece piece in literal.Pieces)
            text.Append(piece switch
            {
                PlainPiece plain => plain.Text,
                ValuePiece value => Formed(value),
                _ => throw new UnreachableException(),
            });
        return text.ToString();
    }

    /// <summary>An expression with every index in it worked out, for labels: <c>hour[h]</c> becomes <c>hour[3]</c>.</summary>
    public Expression Labelled(Expression expression) => expression switch
    {
        Reference reference => Labelled(reference),
        Negation negation => negation with { Operand = Labelled(negation.Operand) },
        Arithmetic arithmetic => arithmetic with { Left = Labelled(arithmetic.Left), Right = Labelled(arithmetic.Right) },
        Call call => call with { Arguments = [.. call.Arguments.Select(Labelled)] },
        DistanceMeasure distance => distance with { From = Labelled(distance.From), To = Labelled(distance.To) },
        TurnMeasure turn => turn with { From = Labelled(turn.From), To = Labelled(turn.To) },
        AngleMeasure corner => corner with { First = Labelled(corner.First), Corner = Labelled(corner.Corner), Second = Labelled(corner.Second) },
        RadiusMeasure radius => radius with { Circle = Labelled(radius.Circle) },
        CoordinateMeasure coordinate => coordinate with { Point = Labelled(coordinate.Point) },
        _ => expression,
    };

    public Reference Labelled(Reference reference) => reference with
    {
        Steps = [.. reference.Steps.Select(step => step.Indices.IsEmpty ? step : step with { Indices = [.. step.Indices.Select(LabelledIndex)] })],
    };

    public Value Resolve(Reference reference)
    {
        Bound first = reference.Steps[0];
        Value? value = Scope.Find(first.Name.Text);
        if (value is null && first.Name.Text == "pi" && first.Indices.IsEmpty && reference.Steps.Length == 1)
            return new QuantityValue(Real.Pi, 0);
        if (value is null)
            throw new FaultException(MakingFindings.UnknownName(first.Name.Text, NearName.Find(first.Name.Text, Scope.Names), first.Name.Span));
        value = Member(value, first);
        for (int next = 1; next < reference.Steps.Length && value is not UnboundValue; next++)
        {
            Bound step = reference.Steps[next];
            if (value is not GivenByRecipe gave)
                throw new FaultException(MakingFindings.WrongKind(reference.Steps[next - 1].ToString()!, value.KindWithArticle, "what a recipe gave", reference.Steps[next - 1].Span));
            if (!gave.Gifts.TryGetValue(step.Name.Text, out Value? gift))
            {
                string? near = NearName.Find(step.Name.Text, gave.Gifts.Keys);
                throw new FaultException(MakingFindings.UnknownName(step.Name.Text, near, step.Name.Span) with
                {
                    Message = $"recipe \"{gave.Recipe}\" gives nothing called `{step.Name.Text}`",
                    Hint = near is null ? $"it gives {string.Join(", ", gave.Gifts.Keys.Select(name => $"`{name}`"))}" : $"is `{near}` meant?",
                });
            }

            value = Member(gift, step);
        }

        if (value is UnboundValue unbound)
            throw new FaultException(unbound.Why is null ? null : MakingFindings.OnlyOtherBranch(unbound.Why, reference.Span));
        return value;
    }

    private string LocalName(Bound bound) =>
        bound.Indices.IsEmpty ? bound.Name.Text : $"{bound.Name.Text}[{string.Join(", ", bound.Indices.Select(index => Index(index).ToString()))}]";

    private TValue Expect<TValue>(Reference reference, string needed)
        where TValue : Value
    {
        Value value = Resolve(reference);
        if (value is TValue fits)
            return fits;
        string? hint = value is FamilyValue
            ? "say which one: `" + reference + "[…]`"
            : needed switch
            {
                "a point" => "points are made by `prick`",
                "a line" => "lines are made by `rule`",
                "a circle" => "circles are made by `strike`",
                _ => null,
            };
        throw new FaultException(MakingFindings.WrongKind(reference.ToString()!, value.KindWithArticle, needed, reference.Span, hint));
    }

    private Value Member(Value value, Bound step)
    {
        foreach (Expression index in step.Indices)
        {
            if (value is UnboundValue)
                break;
            if (value is not FamilyValue family)
                throw new FaultException(MakingFindings.WrongKind(step.Name.Text, value.KindWithArticle, "a family", step.Span, "only one of a family takes an index"));
            IndexKey key = Index(index);
            if (family.Find(key) is not { } member)
            {
                if ((family.Missing.TryGetValue(key, out UnboundValue? missing) ? missing : family.Rest) is { } unbound)
                    return unbound;
                if (family.Members.Count == 0)
                    throw new FaultException(null);
                IndexKey least = family.Members.Keys.First(), greatest = family.Members.Keys.Last();
                string known = least.Kind != key.Kind
                    ? $"its indices are like `{least}`"
                    : family.Members.Count == 1 ? $"there is only `{step.Name.Text}[{least}]`" : $"there are {family.Members.Count}, from `{step.Name.Text}[{least}]` to `{step.Name.Text}[{greatest}]`";
                throw new FaultException(MakingFindings.NoSuchMember(step.Name.Text, key.ToString(), known, step.Span));
            }

            value = member;
        }

        return value;
    }

    private Expression LabelledIndex(Expression index)
    {
        IndexKey key = Index(index);
        return key.Kind switch
        {
            QuantityKind.Angle => new AngleLiteral(key.Value, key.ToString(), index.Span),
            QuantityKind.Length => new LengthLiteral(key.Value, key.ToString(), index.Span),
            _ => new NumberLiteral(key.Value, key.ToString(), index.Span),
        };
    }

    private Value Negate(Negation negation) => Evaluate(negation.Operand) switch
    {
        QuantityValue quantity => new QuantityValue(-quantity.Amount, quantity.Dimension, Traced("-", quantity.Trace)),
        AngleValue angle => new AngleValue(-angle.Angle, Traced("-", angle.Trace)),
        Value other => throw new FaultException(MakingFindings.WrongKind(negation.Operand.ToString()!, other.KindWithArticle, "a number, a length or an angle", negation.Operand.Span)),
    };

    private Value Combine(Arithmetic arithmetic)
    {
        Value left = Evaluate(arithmetic.Left), right = Evaluate(arithmetic.Right);
        (string sign, string word) = arithmetic.Operator switch
        {
            ArithmeticOperator.Plus => ("+", "plus"),
            ArithmeticOperator.Minus => ("-", "less"),
            ArithmeticOperator.Times => ("*", "times"),
            _ => ("/", "by"),
        };
        bool sum = arithmetic.Operator is ArithmeticOperator.Plus or ArithmeticOperator.Minus;
        if (sum)
        {
            if (left is QuantityValue { IsNothing: true } && right is AngleValue)
                left = new AngleValue(Angle.Zero);
            if (right is QuantityValue { IsNothing: true } && left is AngleValue)
                right = new AngleValue(Angle.Zero);
        }

        Measure? trace = Traced(sign, left, right);
        switch (left, arithmetic.Operator, right)
        {
            case (QuantityValue a, ArithmeticOperator.Plus or ArithmeticOperator.Minus, QuantityValue b) when a.Dimension == b.Dimension || a.IsNothing || b.IsNothing:
                int dimension = a.IsNothing ? b.Dimension : a.Dimension;
                return new QuantityValue(arithmetic.Operator == ArithmeticOperator.Plus ? a.Amount + b.Amount : a.Amount - b.Amount, dimension, trace);
            case (AngleValue a, ArithmeticOperator.Plus, AngleValue b):
                return new AngleValue(a.Angle + b.Angle, trace);
            case (AngleValue a, ArithmeticOperator.Minus, AngleValue b):
                return new AngleValue(a.Angle - b.Angle, trace);
            case (QuantityValue a, ArithmeticOperator.Times, QuantityValue b):
                return new QuantityValue(a.Amount * b.Amount, a.Dimension + b.Dimension, trace);
            case (AngleValue a, ArithmeticOperator.Times, QuantityValue { Dimension: 0 } b):
                return new AngleValue(Multiple(b.Amount, a.Angle), trace);
            case (QuantityValue { Dimension: 0 } a, ArithmeticOperator.Times, AngleValue b):
                return new AngleValue(Multiple(a.Amount, b.Angle), trace);
            case (QuantityValue a, ArithmeticOperator.Over, QuantityValue b):
                NotZero(b.Amount, arithmetic.Right.Span);
                return new QuantityValue(a.Amount / b.Amount, a.Dimension - b.Dimension, trace);
            case (AngleValue a, ArithmeticOperator.Over, QuantityValue { Dimension: 0 } b):
                NotZero(b.Amount, arithmetic.Right.Span);
                return new AngleValue(Multiple(1 / b.Amount, a.Angle), trace);
            case (AngleValue a, ArithmeticOperator.Over, AngleValue b):
                NotZero(b.Angle.Degrees, arithmetic.Right.Span);
                return new QuantityValue(a.Angle.Degrees / b.Angle.Degrees, 0, trace);
            default:
                string? hint = (left, right) switch
                {
                    (QuantityValue { Dimension: 1 }, QuantityValue { Dimension: 0 }) or (QuantityValue { Dimension: 0 }, QuantityValue { Dimension: 1 }) => "write the number's unit, as in `30 mm`",
                    (AngleValue, QuantityValue { Dimension: 0 }) or (QuantityValue { Dimension: 0 }, AngleValue) => "write the number's unit, as in `15°`",
                    _ when sum => "only things of one kind are added or taken away",
                    (PointValue or LineValue or CircleValue, _) or (_, PointValue or LineValue or CircleValue) => "figures are not reckoned with; take a measure of one, such as `distance A to B`",
                    _ => "lengths and numbers are multiplied and divided, and an angle by a number",
                };
                throw new FaultException(MakingFindings.KindsDoNotFit(left.KindWithArticle, word, right.KindWithArticle, arithmetic.Span, hint));
        }
    }

    private static Angle Multiple(Real factor, Angle angle) => factor.TryGetRational(out Rational exact) ? exact * angle : Angle.FromDegrees(factor * angle.Degrees);

    private void NotZero(Real divisor, SourceSpan span)
    {
        if (decider.IsZero(divisor))
            throw new FaultException(MakingFindings.DivisionByZero(span));
    }

    private Value Apply(Call call)
    {
        string name = call.Function.Text;
        switch (name)
        {
            case "sqrt":
                {
                    QuantityValue under = Quantity(call.Arguments[0]);
                    if (under.Dimension % 2 != 0)
                        throw new FaultException(MakingFindings.WrongKind(call.Arguments[0].ToString()!, under.KindWithArticle, "a number or an area", call.Arguments[0].Span, "a length times a length is an area, and its root a length"));
                    if (decider.Sign(under.Amount) < 0)
                        throw new FaultException(MakingFindings.RootOfNegative(Written(under), call.Arguments[0].Span));
                    return new QuantityValue(Real.Sqrt(under.Amount), under.Dimension / 2, Traced(name, under.Trace));
                }

            case "sin" or "cos" or "tan":
                {
                    AngleValue of = AngleValueOf(call.Arguments[0]);
                    return new QuantityValue(Trigonometric(name, of.Angle, call.Arguments[0].Span), 0, Traced(name, of.Trace));
                }

            case "asin" or "acos":
                {
                    QuantityValue of = Number(call.Arguments[0]);
                    Real square = 1 - (of.Amount * of.Amount);
                    if (decider.Sign(square) < 0)
                        throw new FaultException(MakingFindings.OutsideDomain($"`{name}` takes a number from -1 to 1, and this is {Written(of)}", call.Arguments[0].Span, $"no angle has such a {(name == "asin" ? "sine" : "cosine")}; look at the figures it is worked out from"));
                    Real other = Real.Sqrt(square);
                    return new AngleValue(name == "asin" ? Angle.OfVector(other, of.Amount) : Angle.OfVector(of.Amount, other), Traced(name, of.Trace));
                }

            case "atan" when call.Arguments.Length == 1:
                {
                    QuantityValue of = Number(call.Arguments[0]);
                    return new AngleValue(Angle.OfVector(1, of.Amount), Traced(name, of.Trace));
                }

            case "atan":
                {
                    (QuantityValue y, QuantityValue x) = OneKind(call, 0, 1);
                    if (decider.IsZero(y.Amount) && decider.IsZero(x.Amount))
                        throw new FaultException(MakingFindings.OutsideDomain("`atan` of nothing and nothing is no angle", call.Span, "one of its two values must be more or less than nothing"));
                    return new AngleValue(Angle.OfVector(x.Amount, y.Amount), Traced(name, y, x));
                }

            case "abs":
                {
                    Value of = Evaluate(call.Arguments[0]);
                    if (of is AngleValue angle)
                        return decider.Recording(() => decider.Sign(angle.Angle.Degrees)) < 0 ? new AngleValue(-angle.Angle, Traced("-", angle.Trace)) : angle;
                    QuantityValue quantity = Quantity(call.Arguments[0]);
                    return decider.Recording(() => decider.Sign(quantity.Amount)) < 0 ? new QuantityValue(-quantity.Amount, quantity.Dimension, Traced("-", quantity.Trace)) : quantity;
                }

            case "min" or "max":
                {
                    return call.Arguments.Select(Evaluate).Aggregate((best, next) => IsLess(next, best, call) == (name == "min") ? next : best);
                }

            case "whole":
                {
                    QuantityValue of = Number(call.Arguments[0]);
                    return new QuantityValue(Floor(of.Amount, call.Span), 0);
                }

            case "remainder":
                {
                    if (Evaluate(call.Arguments[0]) is AngleValue turned)
                    {
                        AngleValue part = AngleValueOf(call.Arguments[1]);
                        NotZero(part.Angle.Degrees, call.Arguments[1].Span);
                        return new AngleValue(turned.Angle - (Floor(turned.Angle.Degrees / part.Angle.Degrees, call.Span) * part.Angle), turned.Trace);
                    }

                    (QuantityValue of, QuantityValue by) = OneKind(call, 0, 1);
                    NotZero(by.Amount, call.Arguments[1].Span);
                    Rational times = Floor(of.Amount / by.Amount, call.Span);
                    return new QuantityValue(of.Amount - (times * by.Amount), of.Dimension, of.Trace);
                }

            case "declination" or "sun_correction":
                {
                    int month = Whole(call.Arguments[0]), day = Whole(call.Arguments[1]);
                    int? year = call.Arguments.Length == 3 ? Whole(call.Arguments[2]) : null;
                    if (year is < 1800 or > 2200)
                        throw new FaultException(MakingFindings.OutsideDomain($"the sun's series is good from 1800 to 2200, and this is {year}", call.Arguments[2].Span, "leave the year out for the mean of the years about now"));
                    if (!Sun.IsDay(month, day, year))
                        throw new FaultException(MakingFindings.OutsideDomain(month is < 1 or > 12 ? $"there is no month {month}" : $"month {month} has no day {day}", call.Span, "the month comes first, then the day: `declination(6, 21)`"));
                    return new AngleValue(Angle.FromDegrees(name == "declination" ? Sun.Declination(month, day, year) : Sun.Correction(month, day, year)));
                }

            default:
                throw new UnreachableException($"No function {name}: the reader knows them all.");
        }
    }

    private Real Trigonometric(string name, Angle angle, SourceSpan span)
    {
        if (name == "sin")
            return angle.Sine;
        if (name == "cos")
            return angle.Cosine;
        (Real x, Real y) = angle.Vector;
        if (decider.IsZero(x))
            throw new FaultException(MakingFindings.OutsideDomain("an angle of 90° has no tangent", span, "leave that case out with `when`; a line at 90° is ruled `square to`"));
        return y / x;
    }

    private Rational Floor(Real value, SourceSpan span)
    {
        if (value.TryGetRational(out Rational exact))
            return exact.Floor();
        double near = Math.Floor(value.ToDouble());
        if (Math.Abs(near) > 1e15)
            throw new FaultException(MakingFindings.OutsideDomain("this is too large to count", span));
        for (Rational whole = Rational.FromDouble(near - 1); ; whole += 1)
            if (decider.Sign(value - (whole + 1)) < 0)
                return whole;
    }

    private bool IsLess(Value a, Value b, Call call)
    {
        switch (a, b)
        {
            case (QuantityValue x, QuantityValue y) when x.Dimension == y.Dimension || x.IsNothing || y.IsNothing:
                return decider.Sign(x.Amount - y.Amount) < 0;
            case (AngleValue x, AngleValue y):
                return decider.Compare(x.Angle, y.Angle).Sign < 0;
            default:
                throw new FaultException(MakingFindings.KindsDoNotFit(a.KindWithArticle, "beside", b.KindWithArticle, call.Span));
        }
    }

    private QuantityValue Distance(DistanceMeasure measure)
    {
        PointValue from = Point(measure.From);
        switch (Resolve(measure.To))
        {
            case PointValue to:
                return new QuantityValue(from.Point.DistanceTo(to.Point), 1, new PointDistance(from.Mark, to.Mark));
            case LineValue to:
                Geometry.Line line = to.Directed.Mark.Line;
                Real side = line.IsKnownToHold(from.Point) ? Real.Zero : line.SideOf(from.Point);
                Real distance = side / line.DirectionLength;
                return new QuantityValue(decider.Sign(side) < 0 ? -distance : distance, 1, new LineDistance(from.Mark, to.Directed.Mark));
            case Value other:
                throw new FaultException(MakingFindings.WrongKind(measure.To.ToString()!, other.KindWithArticle, "a point or a line", measure.To.Span));
            default:
                throw new UnreachableException();
        }
    }

    private AngleValue Turn(TurnMeasure measure)
    {
        LineValue from = Line(measure.From), to = Line(measure.To);
        bool clockwise = measure.Way == Way.Clockwise;
        Real along = Vector.Dot(from.Direction, to.Direction);
        Real across = Vector.Cross(from.Direction, to.Direction);
        return new AngleValue(
            Angle.OfVector(along, clockwise ? -across : across),
            new LineTurn(from.Directed.Mark, from.Directed.IsReversed, to.Directed.Mark, to.Directed.IsReversed, clockwise));
    }

    private AngleValue Corner(AngleMeasure measure)
    {
        PointValue first = Point(measure.First), corner = Point(measure.Corner), second = Point(measure.Second);
        foreach ((PointValue side, Reference name) in ((PointValue, Reference)[])[(first, measure.First), (second, measure.Second)])
            if (ReferenceEquals(side.Mark, corner.Mark))
                throw new FaultException(MakingFindings.OnePointTwice(name.ToString()!, measure.Corner.ToString()!, measure.Span));
        Vector a = first.Point.From(corner.Point), b = second.Point.From(corner.Point);
        Real across = ReferenceEquals(first.Mark, second.Mark) ? Real.Zero : Vector.Cross(a, b);
        return new AngleValue(
            Angle.OfVector(Vector.Dot(a, b), decider.Sign(across) < 0 ? -across : across), new CornerAngle(first.Mark, corner.Mark, second.Mark));
    }

    private QuantityValue Radius(RadiusMeasure measure)
    {
        CircleValue circle = Circle(measure.Circle);
        return new QuantityValue(circle.Mark.Circle.Radius, 1, new CircleRadius(circle.Mark));
    }

    private QuantityValue Coordinate(CoordinateMeasure measure)
    {
        PointValue point = Point(measure.Point);
        return new QuantityValue(measure.IsX ? point.Point.X : point.Point.Y, 1, new PointCoordinate(point.Mark, measure.IsX));
    }

    private QuantityValue Quantity(Expression expression)
    {
        Value value = Evaluate(expression);
        return value as QuantityValue
            ?? throw new FaultException(MakingFindings.WrongKind(expression.ToString()!, value.KindWithArticle, "a number or a length", expression.Span));
    }

    private QuantityValue Number(Expression expression)
    {
        Value value = Evaluate(expression);
        return value is QuantityValue { Dimension: 0 } number
            ? number
            : throw new FaultException(MakingFindings.WrongKind(expression.ToString()!, value.KindWithArticle, "a number", expression.Span));
    }

    private (QuantityValue First, QuantityValue Second) OneKind(Call call, int first, int second)
    {
        QuantityValue a = Quantity(call.Arguments[first]), b = Quantity(call.Arguments[second]);
        if (a.Dimension != b.Dimension && !a.IsNothing && !b.IsNothing)
            throw new FaultException(MakingFindings.KindsDoNotFit(a.KindWithArticle, "beside", b.KindWithArticle, call.Span));
        return (a, b);
    }

    /// <summary>A quantity as a finding tells it, with its unit.</summary>
    public string Written(QuantityValue quantity)
    {
        string unit = quantity.Dimension switch { 0 => "", 1 => " mm", 2 => " mm²", _ => $" mm^{quantity.Dimension}" };
        return (quantity.Amount.TryGetRational(out Rational exact) ? ValueText.Plain(exact) : decider.ToDecimal(quantity.Amount, 6)) + unit;
    }

    private string Formed(ValuePiece piece)
    {
        Value value = Evaluate(piece.Value);
        if (value is TextValue text && piece.Form is null)
            return text.Text;
        Real amount = value switch
        {
            QuantityValue quantity => quantity.Amount,
            AngleValue angle => angle.Angle.Degrees,
            _ => throw new FaultException(MakingFindings.BadTextForm($"{value.KindWithArticle} cannot be written out", piece.Span)),
        };
        string unit = value switch
        {
            AngleValue => "°",
            QuantityValue { Dimension: 1 } => " mm",
            QuantityValue { Dimension: 2 } => " mm²",
            _ => "",
        };
        if (value is AngleValue whole && whole.Angle.TryGetDegrees(out Rational degrees))
            amount = degrees;
        switch (piece.Form)
        {
            case null:
                return (amount.TryGetRational(out Rational plain) ? ValueText.Plain(plain) : decider.ToDecimal(amount, 6)) + unit;
            case "roman" or "chapter" or "clock" or "month":
                if (!amount.TryGetRational(out Rational exact) || unit.Length > 0)
                    throw new FaultException(MakingFindings.BadTextForm($"the form `{piece.Form}` needs an exact number", piece.Span));
                string? formed = piece.Form switch
                {
                    "roman" => exact.IsInteger ? ValueText.Roman(exact.Numerator) : null,
                    "chapter" => ValueText.Chapter(exact),
                    "clock" => ValueText.Clock(exact),
                    _ => ValueText.Month(exact),
                };
                return formed ?? throw new FaultException(MakingFindings.BadTextForm($"{ValueText.Plain(exact)} has no form `{piece.Form}`", piece.Span));
            case { } places when int.TryParse(places, System.Globalization.NumberStyles.None, System.Globalization.CultureInfo.InvariantCulture, out int count) && count <= 50:
                return decider.ToFixed(amount, count) + unit;
            default:
                throw new FaultException(MakingFindings.BadTextForm($"there is no form `{piece.Form}`", piece.Span, "a count of decimals, `roman`, `chapter`, `clock` or `month`"));
        }
    }

    private static FunctionMeasure? Traced(string function, Measure? of) => of is null ? null : new FunctionMeasure(function, [of]);

    private static FunctionMeasure? Traced(string function, Value left, Value right)
    {
        Measure? a = TraceOf(left), b = TraceOf(right);
        return a is null && b is null ? null : new FunctionMeasure(function, [a ?? Constant(left), b ?? Constant(right)]);
    }

    public static Measure? TraceOf(Value value) => value switch
    {
        QuantityValue quantity => quantity.Trace,
        AngleValue angle => angle.Trace,
        _ => null,
    };

    public static ConstantMeasure Constant(Value value) => new(value switch
    {
        QuantityValue quantity => quantity.Amount.ToDouble(),
        AngleValue angle => angle.Angle.ToDegreesDouble(),
        _ => double.NaN,
    });
}
