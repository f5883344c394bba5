using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>What a name or an expression stands for.</summary>
internal abstract class Value
{
    /// <summary>With its article: <c>a length</c>.</summary>
    public abstract string KindWithArticle { get; }
}

/// <summary>A bare number, a length or a power of one.</summary>
/// <param name="amount">In millimetres to the power of <paramref name="dimension"/>.</param>
/// <param name="dimension">0 for a number, 1 for a length, 2 for an area.</param>
/// <param name="trace">How it follows from loop variables and marks; null where it depends on none.</param>
internal sealed class QuantityValue(Real amount, int dimension, Measure? trace = null) : Value
{
    public Real Amount { get; } = amount;

    public int Dimension { get; } = dimension;

    public Measure? Trace { get; } = trace;

    /// <summary>The nothing of every kind.</summary>
    public bool IsNothing => Amount.TryGetRational(out Rational value) && value.IsZero;

    public override string KindWithArticle => Dimension switch
    {
        0 => "a number",
        1 => "a length",
        2 => "an area",
        3 => "a volume",
        _ => $"a length to the power of {Dimension}",
    };
}

/// <summary>An angle; its trace is in degrees.</summary>
internal sealed class AngleValue(Angle angle, Measure? trace = null) : Value
{
    public Angle Angle { get; } = angle;

    public Measure? Trace { get; } = trace;

    public override string KindWithArticle => "an angle";
}

/// <summary>A text.</summary>
internal sealed class TextValue(string text) : Value
{
    public string Text { get; } = text;

    public override string KindWithArticle => "a text";
}

/// <summary>A point.</summary>
internal sealed class PointValue(PointMark mark) : Value
{
    public PointMark Mark { get; } = mark;

    public Point Point => Mark.Point;

    public override string KindWithArticle => "a point";
}

/// <summary>A line or a circle.</summary>
internal abstract class CurveValue : Value
{
    public abstract CurveMark CurveMark { get; }
}

/// <summary>A line, with the way and the start that its name gives it.</summary>
internal sealed class LineValue(DirectedLine directed, Point start) : CurveValue
{
    public override CurveMark CurveMark => Directed.Mark;

    public DirectedLine Directed { get; } = directed;

    public Point Start { get; } = start;

    public Vector Direction => Directed.Direction;

    public override string KindWithArticle => "a line";
}

/// <summary>A circle.</summary>
internal sealed class CircleValue(CircleMark mark) : CurveValue
{
    public override CurveMark CurveMark => Mark;

    public CircleMark Mark { get; } = mark;

    public override string KindWithArticle => "a circle";
}

/// <summary>Which one of a family: a number, an angle in degrees or a length in millimetres.</summary>
internal readonly record struct IndexKey(QuantityKind Kind, Rational Value) : IComparable<IndexKey>
{
    public int CompareTo(IndexKey other) => Value.CompareTo(other.Value);

    /// <summary>As an index is written.</summary>
    public override string ToString() => Kind switch
    {
        QuantityKind.Angle => $"{ValueText.Mixed(Value)}°",
        QuantityKind.Length => $"{ValueText.Mixed(Value)} mm",
        _ => ValueText.Mixed(Value),
    };
}

/// <summary>A family: values by index, in order of the index, which is of one kind throughout.</summary>
internal sealed class FamilyValue : Value
{
    private readonly SortedDictionary<IndexKey, Value> members;
    private readonly Dictionary<IndexKey, UnboundValue> missing;

    public FamilyValue() => (members, missing) = ([], []);

    private FamilyValue(FamilyValue other)
    {
        (members, missing) = (other.members, other.missing);
        Rest = other.Rest;
        IsSecondName = true;
    }

    public IReadOnlyDictionary<IndexKey, Value> Members => members;

    public override string KindWithArticle => "a family";

    /// <summary>True for the name a <c>let</c> or a need gave it, by which nothing is added.</summary>
    public bool IsSecondName { get; }

    /// <summary>Why members may be missing whose index is not known; null where all are known.</summary>
    public UnboundValue? Rest { get; set; }

    /// <summary>What is known of members that no sentence bound.</summary>
    public IDictionary<IndexKey, UnboundValue> Missing => missing;

    public FamilyValue SecondName() => new(this);

    public Value? Find(IndexKey key) => Takes(key) ? members.GetValueOrDefault(key) : null;

    /// <summary>False where that index is bound, or the family is seen by its second name.</summary>
    public bool TryAdd(IndexKey key, Value value) => !IsSecondName && members.TryAdd(key, value);

    /// <summary>Whether the index is of the kind that the others are; nothing is of every kind.</summary>
    public bool Takes(IndexKey key)
    {
        if (key.Value.IsZero)
            return true;
        foreach (IndexKey known in members.Keys)
            if (!known.Value.IsZero)
                return known.Kind == key.Kind;
        return true;
    }

    /// <summary>All members, those of inner families in place.</summary>
    public IEnumerable<Value> Flattened() => members.Values.SelectMany(member => member is FamilyValue inner ? inner.Flattened() : [member]);
}

/// <summary>What a recipe gave, by name.</summary>
internal sealed class GivenByRecipe(string recipe, IReadOnlyDictionary<string, Value> gifts) : Value
{
    public string Recipe { get; } = recipe;

    public IReadOnlyDictionary<string, Value> Gifts { get; } = gifts;

    public override string KindWithArticle => "what a recipe gave";
}

/// <summary>A name whose sentence failed, or that only another branch binds: using it raises no second error, unless there is something to tell.</summary>
/// <param name="why">What to tell where it is used; null to tell nothing.</param>
internal sealed class UnboundValue(Func<string>? why = null) : Value
{
    public string? Why => why?.Invoke();

    public override string KindWithArticle => "nothing";
}
