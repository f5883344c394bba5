using System.Numerics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Numbers;

public sealed class CyclotomicFieldTests
{
    private static readonly Rational hair = new(1, BigInteger.Pow(10, 27));

    private readonly Decider decider = new(new DeciderOptions(new byte[32]));

    // 30 × 43.3° = 1299° = 3 turns and 219°.
    [Fact]
    public void Thirty_steps_of_one_given_angle_end_at_219_degrees()
    {
        (Real x, Real y) = Steps(Angle.Given("latitude", new Rational(433, 10)), 30);
        Angle end = Angle.FromDegrees(219);

        Decision decision = decider.Decide(x - end.Cosine);

        decision.IsZero.ShouldBeTrue();
        decision.Verdict.Certainty.ShouldBe(Certainty.Certain);
        decision.Verdict.Size.ShouldBeGreaterThanOrEqualTo(120);
        decider.Decide(y - end.Sine).IsZero.ShouldBeTrue();
    }

    // 225 × 43°18′12″ = 9743°15′ = 27 turns and 23°15′, which is 3° × 7.75.
    [Fact]
    public void Two_hundred_and_twenty_five_steps_end_at_23_degrees_15_minutes()
    {
        Rational latitude = 43 + new Rational(18, 60) + new Rational(12, 3600);
        (Real x, Real y) = Steps(Angle.Given("latitude", latitude), 225);
        Angle end = Angle.FromDegrees(23 + new Rational(1, 4));

        decider.Decide(x - end.Cosine).IsZero.ShouldBeTrue();
        decider.Decide(y - end.Sine).IsZero.ShouldBeTrue();
    }

    [Fact]
    public void A_hair_more_is_refused()
    {
        (Real x, Real y) = Steps(Angle.Given("latitude", new Rational(433, 10) + hair), 30);
        Angle end = Angle.FromDegrees(219);

        decider.Decide(x - end.Cosine).Sign.ShouldBe(1);
        decider.Decide(y - end.Sine).Sign.ShouldBe(-1);

        Rational latitude = 43 + new Rational(18, 60) + new Rational(12, 3600) - hair;
        (x, _) = Steps(Angle.Given("latitude", latitude), 225);
        decider.Decide(x - Angle.FromDegrees(23 + new Rational(1, 4)).Cosine).Sign.ShouldBe(1);
    }

    [Fact]
    public void Written_angles_are_decided_at_their_value()
    {
        // tan(3 × 20°) = √3 with tan 20° as tan a (3 − tan² a)/(1 − 3 tan² a): no identity of the generic angle.
        Angle a = Angle.FromDegrees(20);
        Real t = a.Sine / a.Cosine;

        decider.Decide(t * (3 - t * t) / (1 - 3 * t * t) - Real.Sqrt(3)).IsZero.ShouldBeTrue();
        // 4 sin 20° sin 40° sin 80° = √3/2: M. R. Spiegel, Mathematical Handbook, product formulas.
        Decision product = decider.Decide(4 * a.Sine * Angle.FromDegrees(40).Sine * Angle.FromDegrees(80).Sine - Real.Sqrt(3) / 2);
        product.IsZero.ShouldBeTrue();
        decider.Decide(Real.Sqrt(2 + 2 * a.Cosine) - 2 * Angle.FromDegrees(10).Cosine).IsZero.ShouldBeTrue();
        // The half by a root, six times added up, is 60°: cos 6x by the steps of x = 10°.
        Real c = Real.Sqrt((1 + a.Cosine) / 2);
        decider.Decide(4 * c * c * c - 3 * c - Real.Sqrt(3) / 2).IsZero.ShouldBeTrue();
        decider.Decide(4 * c * c * c - 3 * c - Real.Sqrt(3) / 2 + hair).Sign.ShouldBe(1);
    }

    private static (Real X, Real Y) Steps(Angle angle, int count)
    {
        (Real c, Real s) = (angle.Cosine, angle.Sine);
        (Real x, Real y) = ((Real)1, (Real)0);
        for (int i = 0; i < count; i++)
            (x, y) = (x * c - y * s, x * s + y * c);
        return (x, y);
    }
}
