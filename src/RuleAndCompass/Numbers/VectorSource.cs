namespace RuleAndCompass.Numbers;

/// <summary>The angle of an exact vector, with its halves, quarters and so on as far as they were asked for.</summary>
internal sealed class VectorSource(Real x, Real y)
{
    private readonly List<(Real Cosine, Real Sine)> units = [];
    private AngleSource? source;

    public Real X { get; } = x;

    public Real Y { get; } = y;

    /// <summary>For parts of the angle that have no exact direction.</summary>
    public AngleSource Source => source ??= new AngleSource(null, Degrees);

    /// <summary>An enclosure-only number.</summary>
    public Real Degrees { get; } = new OperationReal(Operation.DegreesOfVector, x, y, new Interval(-180, 180));

    /// <summary>The unit vector of the angle halved <paramref name="halvings"/> times.</summary>
    public (Real Cosine, Real Sine) Unit(int halvings)
    {
        if (units.Count == 0)
        {
            Real length = Real.Sqrt(X * X + Y * Y);
            units.Add((X / length, Y / length));
        }

        while (units.Count <= halvings)
        {
            (Real cosine, Real sine) = units[^1];
            if (units.Count == 1 && IsStraight())
            {
                units.Add((Real.Zero, Real.One));
                continue;
            }

            // The half lies in (−90°, 90°), so its cosine is the root that is greater than zero.
            Real half = Real.Sqrt((1 + cosine) / 2);
            units.Add((half, sine / (2 * half)));
        }

        return units[halvings];
    }

    /// <summary>A vector along half the angle: one root, that of the length.</summary>
    public (Real X, Real Y) Half() => IsStraight() ? (Real.Zero, Real.One) : (Real.Sqrt(X * X + Y * Y) + X, Y);

    // 180° is the one angle whose half has the cosine 0.
    private bool IsStraight()
    {
        if (X.Low > 0 || Y.Low > 0 || Y.High < 0)
            return false;

        var decider = new Decider(new DeciderOptions());
        return decider.Sign(X) < 0 && decider.Sign(Y) == 0;
    }
}
