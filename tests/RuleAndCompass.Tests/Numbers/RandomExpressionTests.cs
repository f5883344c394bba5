using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Numbers;

public sealed class RandomExpressionTests
{
    [Theory]
    [InlineData(11, 64)]
    [InlineData(12, 4)]
    [InlineData(13, 1)]
    public void Every_decision_agrees_with_a_ball_of_3000_bits(ulong seed, int maximumDegree)
    {
        var expressions = new RandomExpressions(seed);
        int zeros = 0;
        for (int i = 0; i < 400; i++)
        {
            (Real number, bool? isZero) = expressions.Next();
            var decider = new Decider(new DeciderOptions(BitConverter.GetBytes(i), MaximumDegree: maximumDegree));

            int sign = decider.Decide(number).Sign;
            bool exact = decider.IsExactlyZero(number, out _);

            zeros += exact ? 1 : 0;
            exact.ShouldBe(sign == 0);
            if (RandomExpressions.Judge(number) is { } judged)
                sign.ShouldBe(judged, $"case {i}");
            if (isZero is { } known)
                exact.ShouldBe(known, $"case {i}");
        }

        zeros.ShouldBeGreaterThan(40);
    }
}
