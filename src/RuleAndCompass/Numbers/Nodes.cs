namespace RuleAndCompass.Numbers;

/// <summary>What a node does with its operands.</summary>
internal enum Operation : byte
{
    Add,
    Subtract,
    Multiply,
    Divide,
    Sqrt,

    /// <summary>The degrees of the angle of the vector (Left, Right).</summary>
    DegreesOfVector,
}

/// <summary>A fraction.</summary>
internal sealed class RationalReal(Rational value) : Real(Interval.Of(value))
{
    public Rational Value { get; } = value;
}

/// <summary>A node with operands; a square root has only the left one.</summary>
internal sealed class OperationReal(Operation operation, Real left, Real? right, Interval enclosure) : Real(enclosure)
{
    public Operation Operation { get; } = operation;

    public Real Left { get; } = left;

    public Real? Right { get; } = right;

    /// <summary>The best ball so far and the precision it was computed at; 0 for none.</summary>
    public Ball Ball { get; set; }

    public int BallBits { get; set; }
}

/// <summary>A leaf that is no fraction by structure.</summary>
internal abstract class QuantityReal : Real
{
    private protected QuantityReal(Interval enclosure)
        : base(enclosure)
    {
    }

    public abstract Ball Enclose(int bits);
}

/// <summary>π.</summary>
internal sealed class PiReal : QuantityReal
{
    // Between 3.141592653589793 and the next double, as every table of π shows.
    public PiReal()
        : base(new(3.141592653589793, Math.BitIncrement(3.141592653589793)))
    {
    }

    public override Ball Enclose(int bits) => Elementary.Pi(bits);
}

/// <summary>A number given in the script.</summary>
internal sealed class GivenReal(string name, Rational value, Rational? from, Rational? to) : QuantityReal(Interval.Of(value))
{
    public string Name { get; } = name;

    public Rational Value { get; } = value;

    public Rational? From { get; } = from;

    public Rational? To { get; } = to;

    public override Ball Enclose(int bits) => Ball.Of(Value, bits);
}

/// <summary>The cosine or sine of a rational multiple of an angle that has no constructible value.</summary>
internal sealed class DirectionReal : QuantityReal
{
    public DirectionReal(AngleSource source, Rational multiple, bool isSine)
        : base(Interval.Of(Enclose(source, multiple, isSine, 64)))
    {
        Source = source;
        Multiple = multiple;
        IsSine = isSine;
    }

    public AngleSource Source { get; }

    public Rational Multiple { get; }

    public bool IsSine { get; }

    public override Ball Enclose(int bits) => Enclose(Source, Multiple, IsSine, bits);

    private static Ball Enclose(AngleSource source, Rational multiple, bool isSine, int bits)
    {
        (Ball cosine, Ball sine) = source.Degrees.TryGetRational(out Rational degrees)
            ? Elementary.OfDegrees(multiple * degrees, bits)
            : Elementary.OfDegrees(Ball.Multiply(Enclosures.Of(source.Degrees, bits + 16), Ball.Of(multiple, bits + 16), bits + 16), bits);
        return isSine ? sine : cosine;
    }
}

/// <summary>An angle that identities treat as an unknown.</summary>
/// <param name="Name">As the script calls it; null for one that has no name, such as a written 43.3°.</param>
/// <param name="Degrees">Its size.</param>
internal sealed record AngleSource(string? Name, Real Degrees, Rational? From = null, Rational? To = null)
{
    /// <summary>One degree: what written angles are multiples of.</summary>
    public static AngleSource WrittenDegree { get; } = new(null, Real.One);

    public bool Equals(AngleSource? other) => ReferenceEquals(this, other);

    public override int GetHashCode() => System.Runtime.CompilerServices.RuntimeHelpers.GetHashCode(this);
}
