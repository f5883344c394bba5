using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Numbers;

public sealed class DeciderTests
{
    private readonly Decider decider = new(new DeciderOptions());

    [Fact]
    public void A_root_of_a_square_folds()
    {
        Real.Sqrt(new Rational(9, 16)).TryGetRational(out Rational value).ShouldBeTrue();

        value.ShouldBe(new Rational(3, 4));
    }

    [Fact]
    public void Nested_roots_collapse()
    {
        Real left = Real.Sqrt(5 + 2 * Real.Sqrt(6));
        Real right = Real.Sqrt(2) + Real.Sqrt(3);

        decider.Decide(left - right).ShouldBe(new Decision(0, Verdict.Proved));
        decider.Sign(left - right - new Rational(1, System.Numerics.BigInteger.Pow(10, 300))).ShouldBe(-1);
    }

    [Fact]
    public void Every_multiple_of_a_degree_and_a_half_is_the_sum_of_two_others()
    {
        for (int k = 0; k <= 240; k += 7)
        {
            Angle a = Angle.FromDegrees(new Rational(3 * k, 2));
            Angle b = Angle.FromDegrees(new Rational(3, 2));
            Angle sum = a + b;

            decider.IsZero(sum.Cosine - (a.Cosine * b.Cosine - a.Sine * b.Sine)).ShouldBeTrue();
            decider.IsZero(a.Cosine * a.Cosine + a.Sine * a.Sine - 1).ShouldBeTrue();
            Math.Abs(a.Cosine.ToDouble() - Math.Cos(a.ToDegreesDouble() * Math.PI / 180)).ShouldBeLessThan(1e-14);
            Math.Abs(a.Sine.ToDouble() - Math.Sin(a.ToDegreesDouble() * Math.PI / 180)).ShouldBeLessThan(1e-14);
        }
    }

    [Fact]
    public void An_identity_of_a_given_angle_is_proved_for_every_value()
    {
        Angle latitude = Angle.Given("latitude", new Rational(433, 10));
        Real c = latitude.Cosine;
        Real s = latitude.Sine;

        decider.Decide(c * c + s * s - 1).Verdict.ToString().ShouldBe("proved for every latitude");
        decider.Decide(((Rational)2 * latitude).Sine - 2 * s * c).Verdict.ToString().ShouldBe("proved for every latitude");
        decider.Decide(Real.Sqrt(1 - s * s) - c).Verdict.ToString().ShouldBe("proved for every latitude");
        decider.Decide(Real.Sqrt(1 - s * s) + c).Sign.ShouldBe(1);
    }

    [Fact]
    public void An_identity_at_one_constructible_latitude_is_proved_there()
    {
        Angle latitude = Angle.Given("latitude", 45);

        decider.Decide(latitude.Cosine - latitude.Sine).ShouldBe(new Decision(0, Verdict.Proved));
    }

    [Fact]
    public void Quantities_without_exact_value_agree_to_so_many_digits()
    {
        Decision decision = decider.Decide(Real.Pi - Angle.FromDegrees(Real.Pi).Degrees);
        decision.IsZero.ShouldBeTrue();

        Angle angle = Angle.OfVector(3, 4);
        Decision parts = decider.Decide(((Rational)new Rational(1, 3) * angle).Cosine - (angle - new Rational(2, 3) * angle).Cosine);

        parts.IsZero.ShouldBeTrue();
        decider.Decide(Real.Pi - 3).Sign.ShouldBe(1);
    }

    [Fact]
    public void Angles_of_vectors_compare_exactly()
    {
        Angle a = Angle.OfVector(1, Real.Sqrt(3));
        Angle b = Angle.FromDegrees(60);

        decider.Compare(a, b).ShouldBe(new Decision(0, Verdict.Proved));
        decider.Compare(a + Angle.FromDegrees(360), b).Sign.ShouldBe(1);
        decider.CompareDirections(a + Angle.FromDegrees(360), b).IsZero.ShouldBeTrue();
        decider.Compare(new Rational(1, 2) * a, Angle.FromDegrees(30)).IsZero.ShouldBeTrue();
        decider.Compare(new Rational(1, 3) * a, Angle.FromDegrees(20)).IsZero.ShouldBeTrue();
    }

    [Fact]
    public void Digits_are_certain()
    {
        decider.ToDecimal(Real.Pi, 30).ShouldBe("3.14159265358979323846264338328"); // DLMF §3.12
        decider.ToDecimal(Real.Sqrt(2), 20).ShouldBe("1.4142135623730950488");
        decider.ToFixed(Real.Sqrt(2), 3).ShouldBe("1.414");
        decider.ToFixed(new Rational(1, 8), 2).ShouldBe("0.13");
        decider.ToDecimal(Real.Sqrt(5 + 2 * Real.Sqrt(6)) - Real.Sqrt(2) - Real.Sqrt(3), 10).ShouldBe("0");
        decider.ToExactForm(Real.Sqrt(2) / 2).ShouldBe("√2/2");
        decider.ToExactForm(Angle.FromDegrees(36).Cosine).ShouldBe("(1 + √5)/4");
    }

    [Fact]
    public void A_chain_of_a_hundred_thousand_nodes_does_not_overflow()
    {
        Real x = Real.Sqrt(2);
        Real sum = Real.Zero;
        for (int i = 0; i < 50_000; i++)
            sum = sum + x - 1;

        decider.IsZero(sum - 50_000 * (x - 1)).ShouldBeTrue();
    }

    [Fact]
    public void An_hour_line_of_the_sine_circle_is_proved_for_every_latitude()
    {
        Angle latitude = Angle.Given("latitude", new Rational(433, 10));
        Real radius = 80;
        Real side = radius * latitude.Sine;
        Real foot = Real.Sqrt(radius * radius - side * side);
        Real sine = Real.Sqrt(radius * radius - foot * foot);
        Angle hour = Angle.FromDegrees(45);

        Real across = sine * hour.Sine / hour.Cosine;
        Decision decision = decider.Decide(across / radius - latitude.Sine * hour.Sine / hour.Cosine);

        decision.Verdict.ToString().ShouldBe("proved for every latitude");
        decision.IsZero.ShouldBeTrue();
    }

    [Fact]
    public void A_theorem_about_free_points_holds_identically()
    {
        // The altitudes of a triangle meet: free corners.
        Real[] c = [Real.Sqrt(2), Real.Sqrt(3), Real.Sqrt(5), Real.Sqrt(7), Real.Sqrt(11), Real.Sqrt(13)];
        // (A − B)·(H − C) + (B − C)·(H − A) + (C − A)·(H − B) = 0 for every H.
        Real Dot(int a, int b, int h, int d) => (c[a] - c[b]) * (c[h] - c[d]);
        Real sum = Dot(0, 1, 3, 2) + Dot(1, 2, 3, 0) + Dot(2, 0, 3, 1);

        decider.HoldsIdentically(sum, c, out Verdict verdict).ShouldBeTrue();
        verdict.IsDecided.ShouldBeTrue();
        decider.HoldsIdentically(sum + c[0] * c[0] - 2, c, out _).ShouldBeFalse();
    }

    [Fact]
    public void What_was_decided_tells_the_range_over_which_nothing_vanishes()
    {
        Decider near = NewDecider();
        Angle latitude = Angle.Given("latitude", new Rational(433, 10), 1, 89);
        Decision decision = near.Recording(() => near.Decide(Real.Sqrt(1 - latitude.Sine * latitude.Sine) - latitude.Cosine));

        decision.Verdict.ToString().ShouldBe("proved for every latitude");
        near.FindRanges().ShouldBe([new ValidFor("latitude", true, 1, 89)]);

        // Beyond a right angle the root is −cos: the identity ends there.
        Decider far = NewDecider();
        Angle wide = Angle.Given("latitude", new Rational(433, 10), -30, 150);
        far.Recording(() => far.Decide(Real.Sqrt(1 - wide.Sine * wide.Sine) - wide.Cosine)).IsZero.ShouldBeTrue();
        ValidFor range = far.FindRanges().ShouldHaveSingleItem();
        range.From.ShouldBe(-30);
        range.To!.Value.ShouldBeInRange(88, 90);
    }

    [Fact]
    public void A_choice_that_changes_within_the_range_ends_it()
    {
        Decider decider = NewDecider();
        Angle latitude = Angle.Given("latitude", 40, 1, 89);

        decider.Recording(() => decider.Sign(latitude.Sine - latitude.Cosine)).ShouldBe(-1);

        ValidFor range = decider.FindRanges().ShouldHaveSingleItem();
        range.From.ShouldBe(1);
        range.To!.Value.ShouldBeInRange(44, 45);
    }

    [Fact]
    public void Two_givens_are_shown_over_every_pair_in_their_ranges()
    {
        Decider decider = NewDecider();
        Angle a = Angle.Given("latitude", 40, 30, 50);
        Real r = Real.Given("radius", 80, 60, 100);

        Decision decision = decider.Recording(() => decider.Decide(Real.Sqrt(r * r - r * r * a.Sine * a.Sine) - r * a.Cosine));

        decision.IsZero.ShouldBeTrue();
        decision.Verdict.Certainty.ShouldBe(Certainty.CertainForEvery);
        decision.Verdict.Size.ShouldBeGreaterThanOrEqualTo(120);
        decider.FindRanges().ShouldBe([new ValidFor("radius", false, 60, 100), new ValidFor("latitude", true, 30, 50)], ignoreOrder: true);
    }

    private static Decider NewDecider() => new(new DeciderOptions());

    [Fact]
    public void Numbers_of_very_many_digits_are_refused_not_awaited()
    {
        Real x = new Rational(3, 7);
        for (int i = 0; i < 40; i++)
            x = x * x + new Rational(1, 3);
        Real y = Real.Sqrt(x) - Real.Sqrt(x + 1) + Real.One / (Real.Sqrt(x) + Real.Sqrt(x + 1));

        Should.Throw<UndecidedException>(() => new Decider(new DeciderOptions(MaximumBits: 4096, TimeLimit: TimeSpan.FromSeconds(5))).Decide(y));
    }

    [Fact]
    public void A_hidden_zero_divisor_is_told()
    {
        Real zero = Real.Sqrt(5 + 2 * Real.Sqrt(6)) - Real.Sqrt(2) - Real.Sqrt(3);

        Should.Throw<UndecidedException>(() => decider.Decide(1 / zero)).Message.ShouldBe("a divisor is exactly 0");
        Should.Throw<DivideByZeroException>(() => Real.One / Real.Zero);
    }
}
