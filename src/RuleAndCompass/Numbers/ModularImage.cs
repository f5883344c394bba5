namespace RuleAndCompass.Numbers;

/// <summary>
/// A ring homomorphism from the field of a decision to a field of p² elements, followed through the program as far as asked for. Each generator goes
/// to one of the two roots of its radicand's image, chosen at random: a fixed rule would make dependent-looking patterns.
/// </summary>
internal sealed class ModularImage(JointField joint, PrimeField target, SeededBits random)
{
    private readonly Residue[] values = new Residue[joint.Line.Count];
    private readonly List<Residue> generators = [];
    private int next; public int Reached => next;

    public PrimeField Field => target;

    /// <summary>The instruction whose divisor went to 0, or −1.</summary>
    public int ZeroDivisorAt { get; private set; } = -1;

    public Residue this[int instruction] => values[instruction];

    /// <summary>Follows the program up to and without <paramref name="end"/>; false where a root is missing or a divisor goes to 0.</summary>
    public bool TryAdvance(int end)
    {
        for (; next < end; next++)
        {
            if (!TryStep(joint.Line[next], next))
                return false;
        }

        return true;
    }

    private bool TryStep(StraightLine.Instruction step, int index)
    {
        if (step.IsConstant)
        {
            return TryConstant(step.Value, out values[index]);
        }

        Residue left = values[step.Left];
        switch (step.Operation)
        {
            case Operation.Add:
                values[index] = target.Add(left, values[step.Right]);
                return true;
            case Operation.Subtract:
                values[index] = target.Subtract(left, values[step.Right]);
                return true;
            case Operation.Multiply:
                values[index] = target.Multiply(left, values[step.Right]);
                return true;
            case Operation.Divide:
                if (!target.TryInvert(values[step.Right], out Residue inverse))
                {
                    ZeroDivisorAt = index;
                    return false;
                }

                values[index] = target.Multiply(left, inverse);
                return true;
            default:
                return joint.RootAt(index) is { } element
                    ? TryEvaluate(element, out values[index])
                    : TryFresh(joint.FreshAt(index), left, out values[index]);
        }
    }

    private bool TryConstant(Rational value, out Residue image)
    {
        image = target.Of(value.Numerator);
        if (value.IsInteger)
            return true;
        if (!target.TryInvert(target.Of(value.Denominator), out Residue inverse))
            return false;
        image = target.Multiply(image, inverse);
        return true;
    }

    private bool TryFresh(int generator, Residue radicand, out Residue root)
    {
        root = default;
        if (!TryGenerators(generator) || radicand.IsZero || !TryRoot(radicand, out root))
            return false;
        generators.Add(root);
        return true;
    }

    public bool TryEvaluate(FieldElement element, out Residue value)
    {
        value = default;
        int[] levels = element.Levels();
        if (levels.Length > 0 && !TryGenerators(levels[^1] + 1))
            return false;

        value = Horner(element.Coefficients, levels, levels.Length);
        if (element.Denominator.IsOne)
            return true;
        if (!target.TryInvert(target.Of(element.Denominator), out Residue inverse))
            return false;
        value = target.Multiply(value, inverse);
        return true;
    }

    private Residue Horner(ReadOnlySpan<System.Numerics.BigInteger> coefficients, int[] levels, int level)
    {
        if (level == 0)
            return coefficients[0].IsZero ? default : target.Of(coefficients[0]);

        int half = coefficients.Length / 2;
        Residue low = Horner(coefficients[..half], levels, level - 1);
        Residue high = Horner(coefficients[half..], levels, level - 1);
        return high.IsZero ? low : target.Add(low, target.Multiply(high, generators[levels[level - 1]]));
    }

    /// <summary>Images of the first generators, from their radicands; fresh ones have theirs already.</summary>
    public bool TryGenerators(int count)
    {
        while (generators.Count < count)
        {
            if (!TryEvaluate(joint.RadicandOf(generators.Count), out Residue radicand) || radicand.IsZero || !TryRoot(radicand, out Residue root))
                return false;
            generators.Add(root);
        }

        return true;
    }

    private bool TryRoot(Residue radicand, out Residue root)
    {
        if (!target.TrySqrt(radicand, out root))
            return false;
        if ((random.NextWord() & 1) != 0)
            root = target.Negate(root);
        return true;
    }
}
