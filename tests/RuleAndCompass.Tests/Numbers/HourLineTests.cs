using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Numbers;

/// <summary>
/// The hour lines of a horizontal dial by four classical ways, each against tan y = sin L tan x (Encyclopaedia Britannica, 7th ed. 1842,
/// "Dialling", art. 23).
/// </summary>
public sealed class HourLineTests
{
    private readonly Decider decider = new(new DeciderOptions(new byte[32]));
    private readonly Angle latitude = Angle.Given("latitude", new Rational(433, 10));
    private readonly Real radius = 80;

    public static TheoryData<int, int> Hours => new() { { 15, 1 }, { 45, 1 }, { 75, 1 }, { 15, 4 }, { 105, 4 } };

    [Theory]
    [MemberData(nameof(Hours))]
    public void The_sine_circle(int numerator, int denominator)
    {
        // The sine of the latitude is taken between the slant through the centre and the end of the noon line, and swung to the noon line.
        (Real X, Real Y) hour = Hour(numerator, denominator);
        (Real X, Real Y) slant = (latitude.Sine, latitude.Cosine);
        Real along = radius * slant.Y;
        (Real X, Real Y) foot = (along * slant.X, along * slant.Y);
        Real sine = Real.Sqrt(foot.X * foot.X + (foot.Y - radius) * (foot.Y - radius));
        Real onBar = sine * hour.Y / hour.X;

        ShouldBeHourLine((onBar, radius), hour);
    }

    [Theory]
    [MemberData(nameof(Hours))]
    public void The_projected_sphere(int numerator, int denominator)
    {
        // Hour circles pass through the projected poles; where one meets the horizon the hour line ends. Art. 42 and after; centres by the rule
        // of Snyder, USGS Professional Paper 1395 (1987), for the stereographic projection.
        (Real X, Real Y) hour = Hour(numerator, denominator);
        Real tangent = latitude.Sine / latitude.Cosine;
        Real half = radius / latitude.Cosine;
        (Real X, Real Y) centre = (half * hour.X / hour.Y, -radius * tangent);
        (Real X, Real Y) pole = (0, half - radius * tangent);
        Real r2 = (pole.X - centre.X) * (pole.X - centre.X) + (pole.Y - centre.Y) * (pole.Y - centre.Y);
        Real d2 = centre.X * centre.X + centre.Y * centre.Y;
        Real along = (radius * radius - r2 + d2) / (2 * d2);
        Real across = Real.Sqrt(radius * radius / d2 - along * along);

        ShouldBeHourLine((along * centre.X - across * centre.Y, along * centre.Y + across * centre.X), hour);
    }

    [Theory]
    [MemberData(nameof(Hours))]
    public void The_scales_of_hours_and_latitudes(int numerator, int denominator)
    {
        // Arts. 30 to 35.
        (Real X, Real Y) hour = Hour(numerator, denominator);
        Real sine = latitude.Sine;
        Real onSix = radius * sine / Real.Sqrt(1 + sine * sine);
        Real onNoon = Real.Sqrt(radius * radius - onSix * onSix);
        Real t = (hour.X - hour.Y) / (hour.X + hour.Y);
        Real part = (1 - t) / 2;

        ShouldBeHourLine((part * onSix, onNoon - part * onNoon), hour);
    }

    [Theory]
    [MemberData(nameof(Hours))]
    public void The_two_circles(int numerator, int denominator)
    {
        (Real X, Real Y) hour = Hour(numerator, denominator);
        Real length = Real.Sqrt(hour.X * hour.X + hour.Y * hour.Y);

        ShouldBeHourLine((radius * latitude.Sine * hour.Y / length, radius * hour.X / length), hour);
    }

    [Fact]
    public void A_wrong_latitude_is_refuted()
    {
        (Real X, Real Y) hour = Hour(45, 1);
        Angle other = Angle.Given("other", new Rational(433, 10) + new Rational(1, System.Numerics.BigInteger.Pow(10, 30)));

        decider.Decide(hour.Y * other.Sine - hour.Y * latitude.Sine).Sign.ShouldBe(1);
    }

    private static (Real X, Real Y) Hour(int numerator, int denominator) => Angle.FromDegrees(new Rational(numerator, denominator)).Vector;

    private void ShouldBeHourLine((Real X, Real Y) point, (Real X, Real Y) hour)
    {
        Decision decision = decider.Decide(point.X * hour.X - point.Y * (latitude.Sine * hour.Y));

        decision.IsZero.ShouldBeTrue();
        decision.Verdict.ToString().ShouldBe("proved for every latitude");
    }
}
