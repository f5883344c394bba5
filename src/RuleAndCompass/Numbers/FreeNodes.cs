namespace RuleAndCompass.Numbers;

/// <summary>Rebuilds the graph of a number with some of its nodes cut off as independent unknowns.</summary>
internal static class FreeNodes
{
    public static Real Detach(Real x, IReadOnlyCollection<Real> free)
    {
        var made = new Dictionary<Real, Real>(ReferenceEqualityComparer.Instance);
        foreach (Real node in free)
        {
            if (node is not RationalReal)
                made[node] = new FreeReal(node);
        }

        var stack = new Stack<Real>();
        stack.Push(x);
        while (stack.TryPeek(out Real? node))
        {
            if (made.ContainsKey(node))
            {
                stack.Pop();
                continue;
            }

            if (node is not OperationReal operation || operation.Operation == Operation.DegreesOfVector)
            {
                made[node] = node;
                continue;
            }

            bool hasLeft = made.TryGetValue(operation.Left, out Real? left);
            Real? right = null;
            bool hasRight = operation.Right is null || made.TryGetValue(operation.Right, out right);
            if (!hasLeft)
                stack.Push(operation.Left);
            if (!hasRight)
                stack.Push(operation.Right!);
            if (!hasLeft || !hasRight)
                continue;

            made[node] = ReferenceEquals(left, operation.Left) && ReferenceEquals(right, operation.Right) ? node : operation.Operation switch
            {
                Operation.Add => left! + right!,
                Operation.Subtract => left! - right!,
                Operation.Multiply => left! * right!,
                Operation.Divide => left! / right!,
                _ => Real.Sqrt(left!),
            };
        }

        return made[x];
    }
}

/// <summary>A node that stands for another as an unknown near its value.</summary>
internal sealed class FreeReal(Real node) : QuantityReal(new Interval(node.Low, node.High))
{
    public override Ball Enclose(int bits) => Enclosures.Of(node, bits);
}
