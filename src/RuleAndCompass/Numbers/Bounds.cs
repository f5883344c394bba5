namespace RuleAndCompass.Numbers;

/// <summary>
/// How large and of what degree the norm of a number with unknowns can be. A number is written as u/l with u and l integral over the
/// polynomials in the unknowns; degrees and sizes of both are followed through the program.
/// </summary>
/// <remarks>The bookkeeping is that of C. Burnikel, R. Fleischer, K. Mehlhorn and S. Schirra, Algorithmica 27 (2000), carried to polynomials.</remarks>
internal readonly record struct Bounds(int LogDegree, int ProofBits)
{
    private record struct Part(double UpperDegree, double LowerDegree, double UpperLog, double LowerLog);

    public static Bounds Of(StraightLine line, Dictionary<int, (int Unknown, int Degree)> places, int unknowns)
    {
        var parts = new Part[line.Count];
        var moving = new bool[line.Count];
        int roots = 0;
        double greatestDegree = 1;
        double greatestLog = 1;
        for (int i = 0; i < line.Count; i++)
        {
            StraightLine.Instruction step = line[i];
            if (places.TryGetValue(i, out (int Unknown, int Degree) place))
            {
                moving[i] = true;
                // Cosine and sine: (1 − t²)ⁿ and the like over (1 + t²)ⁿ, each at most 2ⁿ on the unit circle; a number: t over 1.
                parts[i] = place.Degree < 0 ? new Part(1, 0, 0, 0) : new Part(place.Degree, place.Degree, place.Degree, place.Degree / 2.0);
                continue;
            }

            if (step.IsConstant)
            {
                parts[i] = new Part(0, 0, Log(step.Value.Numerator), Log(step.Value.Denominator));
                continue;
            }

            Part a = parts[step.Left];
            Part b = parts[step.Right];
            moving[i] = moving[step.Left] || moving[step.Right];
            parts[i] = step.Operation switch
            {
                Operation.Multiply => new Part(a.UpperDegree + b.UpperDegree, a.LowerDegree + b.LowerDegree, a.UpperLog + b.UpperLog, a.LowerLog + b.LowerLog),
                Operation.Divide => new Part(a.UpperDegree + b.LowerDegree, a.LowerDegree + b.UpperDegree, a.UpperLog + b.LowerLog, a.LowerLog + b.UpperLog),
                Operation.Sqrt => new Part((a.UpperDegree + a.LowerDegree) / 2, a.LowerDegree, (a.UpperLog + a.LowerLog) / 2, a.LowerLog),
                _ => new Part(
                    Math.Max(a.UpperDegree + b.LowerDegree, b.UpperDegree + a.LowerDegree),
                    a.LowerDegree + b.LowerDegree,
                    Math.Max(a.UpperLog + b.LowerLog, b.UpperLog + a.LowerLog) + 1,
                    a.LowerLog + b.LowerLog),
            };
            if (step.Operation == Operation.Sqrt && moving[i])
                roots++;
            greatestDegree = Math.Max(greatestDegree, Math.Max(parts[i].UpperDegree, parts[i].LowerDegree));
            greatestLog = Math.Max(greatestLog, Math.Max(parts[i].UpperLog, parts[i].LowerLog));
        }

        _ = unknowns;
        double logDegree = roots + Math.Log2(greatestDegree) + 1;
        double proofBits = (greatestLog + 1) * Math.Pow(2, roots);
        return new Bounds(
            logDegree < 10000 ? (int)Math.Ceiling(logDegree) : int.MaxValue,
            proofBits < 1e9 ? (int)Math.Ceiling(proofBits) + 1 : int.MaxValue);
    }

    private static double Log(System.Numerics.BigInteger value) => value.IsZero ? 0 : value.GetBitLength();
}
