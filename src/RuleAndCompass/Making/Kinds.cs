using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>The kinds a recipe's needs may have.</summary>
internal static class Kinds
{
    /// <summary><c>a point</c>, <c>an angle</c>, <c>a family of points</c>.</summary>
    public static string WithArticle(string kind) => kind switch
    {
        "angle" => "an angle",
        _ when kind.EndsWith('s') => $"a family of {kind}",
        _ => $"a {kind}",
    };

    /// <summary>The value as the kind says, nothing taking any kind; null where it does not fit.</summary>
    public static Value? Fit(Value value, string kind) => (kind, value) switch
    {
        ("point", PointValue) or ("line", LineValue) or ("circle", CircleValue) or ("angle", AngleValue) or ("text", TextValue) => value,
        ("number", QuantityValue { Dimension: 0 }) or ("length", QuantityValue { Dimension: 1 }) => value,
        ("length", QuantityValue { IsNothing: true }) => new QuantityValue(Real.Zero, 1),
        ("angle", QuantityValue { IsNothing: true }) => new AngleValue(Angle.Zero),
        ({ } plural, FamilyValue family) when plural.EndsWith('s') && family.Flattened().All(member => Fit(member, plural[..^1]) is not null) => family.SecondName(),
        _ => null,
    };
}

/// <summary>The range of a <c>given</c>.</summary>
internal readonly record struct GivenRange(Rational? Low, Rational? High)
{
    /// <summary>The value as a given: identities in it are sought for every value.</summary>
    public Value Given(string name, Value value) => value switch
    {
        AngleValue angle when angle.Angle.TryGetDegrees(out Rational degrees) => new AngleValue(Angle.Given(name, degrees, Low, High)),
        QuantityValue { Dimension: 1 } quantity when quantity.Amount.TryGetRational(out Rational amount) && !amount.IsZero => new QuantityValue(Real.Given(name, amount, Low, High), 1),
        _ => value,
    };
}
