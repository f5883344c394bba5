using System.Numerics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Numbers;

/// <summary>Digits from PARI/GP 2.15.2 (Debian's pari-gp): <c>default(realprecision,90); strprintf("%.70f", sin(Pi/180))</c> and the like.</summary>
public sealed class ElementaryTests
{
    private readonly Decider decider = new(new DeciderOptions());

    [Fact]
    public void Sines_and_cosines_have_the_digits_of_an_independent_library()
    {
        decider.ToFixed(Angle.FromDegrees(1).Sine, 70).ShouldBe("0.0174524064372835128194189785163161924722527203071396426836124276405974");
        decider.ToFixed(Angle.Given("latitude", new Rational(433, 10)).Cosine, 70)
            .ShouldBe("0.7277727576572104784294981470827135804953880576300458340358105730225328");
    }

    [Fact]
    public void Angles_of_vectors_have_the_digits_of_an_independent_library()
    {
        decider.ToFixed(Angle.OfVector(3, 1).Degrees, 70).ShouldBe("18.4349488229220106484278062795467053287957857003547789720139836847119342");
        decider.ToFixed(Angle.OfVector(-7, 2).Degrees, 70).ShouldBe("164.0546040990771452023423104767389057414866320562405452695040418027916499");
        decider.ToFixed(Angle.OfVector(-7, -2).Degrees, 3).ShouldBe("-164.055");
    }

    [Fact]
    public void Pi_has_its_digits()
    {
        decider.ToFixed(Real.Pi, 70).ShouldBe("3.1415926535897932384626433832795028841971693993751058209749445923078164");
    }

    [Fact]
    public void A_ball_of_more_bits_lies_in_one_of_fewer()
    {
        for (int degrees = 1; degrees < 90; degrees += 4)
        {
            (Ball coarse, Ball coarseSine) = Elementary.OfDegrees(degrees, 64);
            (Ball fine, Ball fineSine) = Elementary.OfDegrees(degrees, 2000);

            ShouldHold(coarse, fine);
            ShouldHold(coarseSine, fineSine);
            ShouldHold(Elementary.ArcTangent(Ball.Of(degrees, 64), 64), Elementary.ArcTangent(Ball.Of(degrees, 1000), 1000));
        }
    }

    [Fact]
    public void Doubles_are_rounded_to_nearest_from_fractions()
    {
        new Rational(1, 3).ToDouble().ShouldBe(1.0 / 3);
        new Rational(2, 3).ToDouble().ShouldBe(2.0 / 3);
        Rational.FromDouble(0.1).ToDouble().ShouldBe(0.1);
        Rational.FromDouble(double.Epsilon).ToDouble().ShouldBe(double.Epsilon);
        Rational.FromDouble(double.MaxValue).ToDouble().ShouldBe(double.MaxValue);
        // Half a unit above 2^53 goes to even.
        new Rational(BigInteger.Pow(2, 54) + 1, 2).ToDouble().ShouldBe(9007199254740992.0);
        Rational.ParseDecimal("0.625").ShouldBe(new Rational(5, 8));
        Rational.ParseDecimal("-12").ToString().ShouldBe("-12");
        new Rational(22, 7).ToString().ShouldBe("22/7");
        new Rational(-5, 8).ToString().ShouldBe("-0.625");
        new Rational(-5, 8).Floor().ShouldBe(-1);
        default(Rational).Denominator.ShouldBe(1);
    }

    private static void ShouldHold(Ball coarse, Ball fine)
    {
        coarse.End(upper: false).ShouldBeLessThanOrEqualTo(fine.End(upper: false));
        coarse.End(upper: true).ShouldBeGreaterThanOrEqualTo(fine.End(upper: true));
        (double low, double high) = coarse.ToDoubles();
        Rational.FromDouble(low).ShouldBeLessThanOrEqualTo(coarse.End(upper: false));
        Rational.FromDouble(high).ShouldBeGreaterThanOrEqualTo(coarse.End(upper: true));
    }
}
