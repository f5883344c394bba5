namespace RuleAndCompass.Numbers;

/// <summary>Runs a straight-line program in a tower made for it.</summary>
internal static class ExactEvaluation
{
    /// <summary>The value as an element of <paramref name="tower"/>; every instruction's is in <paramref name="elements"/>.</summary>
    public static FieldElement Run(StraightLine line, Tower tower, CancellationToken cancellation, out FieldElement[] elements)
    {
        elements = new FieldElement[line.Count];
        for (int i = 0; i < line.Count; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            StraightLine.Instruction step = line[i];
            elements[i] = step.IsConstant ? FieldElement.Of(step.Value) : step.Operation switch
            {
                Operation.Add => Tower.Add(elements[step.Left], elements[step.Right]),
                Operation.Subtract => Tower.Subtract(elements[step.Left], elements[step.Right]),
                Operation.Multiply => tower.Multiply(elements[step.Left], elements[step.Right]),
                Operation.Divide => tower.Multiply(elements[step.Left], tower.Invert(elements[step.Right])),
                _ => tower.Sqrt(elements[step.Left]),
            };
        }

        return elements[line.Result];
    }

    /// <summary>Balls of every instruction, with some constants replaced.</summary>
    public static Ball[] Balls(StraightLine line, IReadOnlyDictionary<int, Ball>? replaced, int bits)
    {
        var balls = new Ball[line.Count];
        for (int i = 0; i < line.Count; i++)
        {
            StraightLine.Instruction step = line[i];
            balls[i] = replaced is not null && replaced.TryGetValue(i, out Ball other) ? other
                : step.IsConstant ? Ball.Of(step.Value, bits)
                : Enclosures.Apply(step.Operation, balls[step.Left], balls[step.Right], bits);
        }

        return balls;
    }
}
