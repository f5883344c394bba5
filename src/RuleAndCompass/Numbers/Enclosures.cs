namespace RuleAndCompass.Numbers;

/// <summary>Balls of whole graphs, computed without recursion: a chain of a hundred thousand nodes is no deeper than one.</summary>
internal static class Enclosures
{
    private const int FirstBits = 96;
    private const int DoubleBits = 8192;

    /// <summary>The ball of <paramref name="x"/> computed with <paramref name="bits"/> bits a step.</summary>
    public static Ball Of(Real x, int bits, CancellationToken cancellation = default)
    {
        if (Known(x, bits) is { } known)
            return known;

        var stack = new Stack<OperationReal>();
        stack.Push((OperationReal)x);
        while (stack.TryPeek(out OperationReal? node))
        {
            if (node.BallBits >= bits)
            {
                stack.Pop();
                continue;
            }

            Ball? left = Known(node.Left, bits);
            Ball? right = node.Right is null ? default(Ball) : Known(node.Right, bits);
            if (left is null || right is null)
            {
                if (left is null)
                    stack.Push((OperationReal)node.Left);
                if (right is null)
                    stack.Push((OperationReal)node.Right!);
                continue;
            }

            cancellation.ThrowIfCancellationRequested();
            stack.Pop();
            node.Ball = Apply(node.Operation, left.Value, right.Value, bits);
            node.BallBits = bits;
            node.Tighten(node.Ball.ToDoubles());
        }

        return ((OperationReal)x).Ball;
    }

    public static Ball Apply(Operation operation, in Ball left, in Ball right, int bits) => operation switch
    {
        Operation.Add => Ball.Add(left, right, bits),
        Operation.Subtract => Ball.Subtract(left, right, bits),
        Operation.Multiply => Ball.Multiply(left, right, bits),
        Operation.Divide => Ball.Divide(left, right, bits),
        Operation.Sqrt => Ball.Sqrt(left, bits),
        _ => Elementary.DegreesOfVector(left, right, bits),
    };

    /// <summary>A double within one unit in the last place of <paramref name="x"/>.</summary>
    public static double ToDouble(Real x)
    {
        for (int bits = FirstBits; bits <= DoubleBits; bits *= 2)
        {
            x.Tighten(Of(x, bits).ToDoubles());
            if (x.High <= Math.BitIncrement(x.Low))
                return x.Low;

            // A number that may be 0 and is far below every use of a double.
            if (bits > FirstBits && x.Low > -1e-40 && x.High < 1e-40)
                return 0;
        }

        return x.Low + (x.High - x.Low) / 2;
    }

    private static Ball? Known(Real x, int bits) => x switch
    {
        OperationReal operation => operation.BallBits >= bits ? operation.Ball : null,
        RationalReal rational => Ball.Of(rational.Value, bits),
        _ => ((QuantityReal)x).Enclose(bits),
    };
}
