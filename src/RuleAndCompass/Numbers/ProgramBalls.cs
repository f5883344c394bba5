namespace RuleAndCompass.Numbers;

/// <summary>Balls of a whole program.</summary>
internal static class ProgramBalls
{
    /// <summary>Balls of every instruction, with some constants replaced.</summary>
    public static Ball[] Evaluate(StraightLine line, IReadOnlyDictionary<int, Ball>? replaced, int bits)
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
