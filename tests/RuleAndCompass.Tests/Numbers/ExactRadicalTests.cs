using System.Globalization;
using System.Numerics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Numbers;

public sealed class ExactRadicalTests
{
    private readonly Decider decider = new(new DeciderOptions(new byte[32]));

    private static Real R2 => Real.Sqrt(2);

    private static Real R3 => Real.Sqrt(3);

    private static Real R5 => Real.Sqrt(5);

    private static Real R10 => Real.Sqrt(10);

    // 115 decimals: PARI/GP 2.15.2 (Debian's pari-gp), `default(realprecision,130); strprintf("%.115f", cos(2*Pi/17))` and the like.
    private const string Cos17 = "0.9324722294043558045731158918215633862625877779451169282483500118605360465696444981280747128504298509751993177719551";

    private const string Cos257 = "0.9997011578430936601557841494475589160942074145078562458405859879198216145274398776101200637260989171188168132491796";

    // Closed forms and figures: checks.json entries cos72 (T. L. Heath, A History of Greek Mathematics, vol. 2, 1921, pp. 276-286) and sin3 to
    // tan22_5 (the standard table of exact sines, quoted there from memory of G. J. Toomer, 1984).
    public static TheoryData<int, string> Sines => new()
    {
        { 3, "0.05233595624294383" },
        { 9, "0.1564344650402309" },
        { 12, "0.2079116908177593" },
        { 15, "0.2588190451025208" },
        { 18, "0.3090169943749474" },
        { 36, "0.5877852522924731" },
    };

    [Theory]
    [MemberData(nameof(Sines))]
    public void Published_radicals_are_the_sines(int degrees, string printed)
    {
        Real radical = degrees switch
        {
            3 => (2 * (1 - R3) * Real.Sqrt(5 + R5) + (R10 - R2) * (R3 + 1)) / 16,
            9 => (R10 + R2 - 2 * Real.Sqrt(5 - R5)) / 8,
            12 => (Real.Sqrt(10 + 2 * R5) - Real.Sqrt(15) + R3) / 8,
            15 => (Real.Sqrt(6) - R2) / 4,
            18 => (R5 - 1) / 4,
            _ => Real.Sqrt(10 - 2 * R5) / 4,
        };

        decider.Decide(Angle.FromDegrees(degrees).Sine - radical).ShouldBe(new Decision(0, Verdict.Proved));
        Math.Abs(double.Parse(printed, CultureInfo.InvariantCulture) - radical.ToDouble()).ShouldBeLessThan(1e-14);
    }

    [Fact]
    public void The_tangent_of_half_a_right_angle_halved_is_root_two_less_one()
    {
        Angle half = Angle.FromDegrees(new Rational(45, 2));

        decider.Decide(half.Sine / half.Cosine - (R2 - 1)).ShouldBe(new Decision(0, Verdict.Proved));
    }

    [Fact]
    public void Every_multiple_of_three_degrees_has_the_digits_of_its_cosine_and_sine()
    {
        for (int degrees = 0; degrees < 360; degrees += 3)
        {
            Angle angle = Angle.FromDegrees(degrees);

            // Addition theorem from 3° and the angle before, and the sizes by the machine's own sine.
            Angle before = Angle.FromDegrees(degrees - 3);
            Angle three = Angle.FromDegrees(3);
            decider.IsZero(angle.Sine - before.Sine * three.Cosine - before.Cosine * three.Sine).ShouldBeTrue();
            Math.Abs(angle.Sine.ToDouble() - Math.Sin(degrees * Math.PI / 180)).ShouldBeLessThan(1e-14);
            Math.Abs(angle.Cosine.ToDouble() - Math.Cos(degrees * Math.PI / 180)).ShouldBeLessThan(1e-14);
        }
    }

    // checks.json cos17: C. F. Gauss, Disquisitiones Arithmeticae (1801), art. 365.
    [Fact]
    public void The_17th_part_of_a_turn_has_the_cosine_of_Gauss()
    {
        Real r17 = Real.Sqrt(17);
        Real inner = Real.Sqrt(34 - 2 * r17);
        Real gauss = (-1 + r17 + inner + 2 * Real.Sqrt(17 + 3 * r17 - inner - 2 * Real.Sqrt(34 + 2 * r17))) / 16;

        decider.ToFixed(gauss, 115).ShouldBe(Cos17);
        // T₁₇(cos 2π/17) = 1.
        decider.Decide(Chebyshev(gauss, 17) - 1).ShouldBe(new Decision(0, Verdict.Proved));
    }

    [Fact]
    public void The_257th_part_of_a_turn_has_the_digits_of_its_cosine_and_closes()
    {
        Real cosine = new GaussPeriods(257).Get(128, 0) / 2;

        decider.ToFixed(cosine, 115).ShouldBe(Cos257);
        Decision closed = decider.Decide(Chebyshev(cosine, 257) - 1);
        closed.IsZero.ShouldBeTrue();
        closed.Verdict.Certainty.ShouldBe(Certainty.Certain);
        closed.Verdict.Size.ShouldBeGreaterThanOrEqualTo(120);
        // There the polynomial has a greatest value, so that a hair to either side it is less: by some 10^-595.
        decider.Decide(Chebyshev(cosine + new Rational(1, BigInteger.Pow(10, 300)), 257) - 1).Sign.ShouldBe(-1);
    }

    // S. Ramanujan, J. Indian Math. Soc.; B. C. Berndt, Ramanujan's Notebooks IV (1994), ch. 22, from memory; square-root ones only.
    [Fact]
    public void Nested_roots_of_the_literature_collapse()
    {
        // Textbook.
        Zero(Real.Sqrt(5 + 2 * Real.Sqrt(6)) - R2 - R3);
        Zero(Real.Sqrt(3 + 2 * R2) - 1 - R2);
        // D. Shanks, Incredible identities, Fibonacci Quarterly 12 (1974): √5 + √(22 + 2√5) = √(11 + 2√29) + √(16 − 2√29 + 2√(55 − 10√29)).
        Real left = R5 + Real.Sqrt(22 + 2 * R5);
        Real r29 = Real.Sqrt(29);
        Zero(left - Real.Sqrt(11 + 2 * r29) - Real.Sqrt(16 - 2 * r29 + 2 * Real.Sqrt(55 - 10 * r29)));
        // Borodin, Fagin, Hopcroft, Tompa (1985): √(112 + 70√2 + (46 + 34√2)√5) = (5 + 4√2) + (3 + √2)√5.
        Zero(Real.Sqrt(112 + 70 * R2 + (46 + 34 * R2) * R5) - (5 + 4 * R2) - (3 + R2) * R5);
        // The same paper: √(1 + √3) + √(3 + 3√3) − √(10 + 6√3) = 0.
        Zero(Real.Sqrt(1 + R3) + Real.Sqrt(3 + 3 * R3) - Real.Sqrt(10 + 6 * R3));
        // Ramanujan: ⁴√((3 + 2 ⁴√5)/(3 − 2 ⁴√5)) = (⁴√5 + 1)/(⁴√5 − 1).
        Real q5 = Real.Sqrt(R5);
        Zero(Real.Sqrt(Real.Sqrt((3 + 2 * q5) / (3 - 2 * q5))) - (q5 + 1) / (q5 - 1));
    }

    [Fact]
    public void Roots_of_roots_of_roots_unfold()
    {
        Real x = 7;
        for (int i = 0; i < 5; i++)
            x = Real.Sqrt(2 + x);
        for (int i = 0; i < 5; i++)
            x = x * x - 2;

        Zero(x - 7);
        // √(2 + √(2 + √(2 + √2))) = 2 cos(90°/16).
        Zero(Real.Sqrt(2 + Real.Sqrt(2 + Real.Sqrt(2 + R2))) - 2 * Angle.FromDegrees(new Rational(45, 8)).Cosine);
    }

    // Sums of square roots that nearly agree: J. O'Rourke, Open Problem 33 of The Open Problems Project, and R. L. Graham's examples quoted
    // there: √10 + √11 against √5 + √18 (from memory). Prouhet–Tarry–Escott sums (Qian and Wang, 2006) come closer than any guess: Σ(−1)^i C(n,i) √(t + i).
    [Fact]
    public void Sums_of_roots_that_nearly_agree_are_told_apart()
    {
        Real two = Real.Sqrt(10) + Real.Sqrt(11) - R5 - Real.Sqrt(18);
        decider.Decide(two).Sign.ShouldBe(1);
        // PARI/GP: strprintf("%.12f", sqrt(10)+sqrt(11)-sqrt(5)-sqrt(18)).
        decider.ToFixed(two, 12).ShouldBe("0.000193785905");

        Real sum = Real.Zero;
        BigInteger binomial = 1;
        const int Order = 20;
        for (int i = 0; i <= Order; i++)
        {
            sum += (Real)(Rational)(i % 2 == 0 ? binomial : -binomial) * Real.Sqrt((Rational)(BigInteger.Pow(10, 18) + i));
            binomial = binomial * (Order - i) / (i + 1);
        }

        // The 20th difference of √t has the sign of the 20th derivative, which is less than zero.
        decider.Decide(sum).ShouldBe(new Decision(-1, Verdict.Proved));
    }

    private void Zero(Real x)
    {
        Decision decision = decider.Decide(x);
        decision.ShouldBe(new Decision(0, Verdict.Proved));
        decider.Decide(x + new Rational(1, BigInteger.Pow(10, 300))).Sign.ShouldBe(1);
        decider.Decide(x - new Rational(1, BigInteger.Pow(10, 300))).Sign.ShouldBe(-1);
    }

    // T_n by doubling: T_2k = 2 T_k² − 1, T_2k+1 = 2 T_k T_k+1 − x.
    private static Real Chebyshev(Real x, int n)
    {
        (Real low, Real high) = ((Real)1, x);
        for (int bit = 31 - BitOperations.LeadingZeroCount((uint)n); bit >= 0; bit--)
        {
            Real middle = 2 * low * high - x;
            (low, high) = (n >> bit & 1) == 0 ? (2 * low * low - 1, middle) : (middle, 2 * high * high - 1);
        }

        return low;
    }
}
