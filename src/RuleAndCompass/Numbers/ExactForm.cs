using System.Globalization;
using System.Numerics;
using System.Text;

namespace RuleAndCompass.Numbers;

/// <summary>Short exact forms: <c>3/8</c>, <c>√2/2</c>, <c>(1 + √5)/4</c>.</summary>
internal static class ExactForm
{
    public const int MostDegree = 8;
    private const int MostLength = 40;

    public static string? Of(FieldElement element, JointField? tower)
    {
        string? sum = Sum(element, tower, out int terms);
        if (sum is null)
            return null;

        string text = element.Denominator.IsOne ? sum : $"{(terms > 1 ? $"({sum})" : sum)}/{Text(element.Denominator)}";
        return text.Length <= MostLength ? text : null;
    }

    private static string? Sum(FieldElement element, JointField? tower, out int terms)
    {
        terms = 0;
        var text = new StringBuilder();
        var generators = new List<int>();
        for (ulong rest = element.Generators; rest != 0; rest &= rest - 1)
            generators.Add(BitOperations.TrailingZeroCount(rest));

        for (int i = 0; i < element.Coefficients.Length; i++)
        {
            BigInteger coefficient = element.Coefficients[i];
            if (coefficient.IsZero)
                continue;

            string? root = Root(i, generators, tower);
            if (root is null || text.Length > MostLength)
                return null;
            string sign = coefficient.Sign < 0 ? terms == 0 ? "−" : " − " : terms == 0 ? "" : " + ";
            BigInteger size = BigInteger.Abs(coefficient);
            text.Append(sign).Append(root.Length == 0 ? Text(size) : size.IsOne ? root : Text(size) + root);
            terms++;
        }

        if (terms == 0)
            text.Append('0');
        return text.ToString();
    }

    private static string? Root(int product, List<int> generators, JointField? tower)
    {
        BigInteger flat = BigInteger.One;
        var nested = new StringBuilder();
        for (int j = 0; j < generators.Count; j++)
        {
            if ((product >> j & 1) == 0)
                continue;
            FieldElement radicand = tower!.RadicandOf(generators[j]);
            if (radicand.IsRational)
            {
                flat *= radicand.Coefficients[0];
                continue;
            }

            string? inner = Sum(radicand, tower, out _);
            if (inner is null)
                return null;
            nested.Append("√(").Append(inner).Append(')');
        }

        return flat.IsOne ? nested.ToString() : $"√{Text(flat)}{nested}";
    }

    private static string Text(BigInteger value) => value.ToString(CultureInfo.InvariantCulture);
}
