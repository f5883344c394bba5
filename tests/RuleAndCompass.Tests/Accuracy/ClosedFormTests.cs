using RuleAndCompass.Accuracy;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;
using RuleAndCompass.Tests.Bench;

namespace RuleAndCompass.Tests.Accuracy;

/// <summary>
/// Hand errors that can be worked out on paper. Letters: p, e, o, s the deviations of prick, edge, opening and scale; each derivation is to first order in
/// the offsets of points (dA), seats (u), edges (ε), openings (ρ) and pricks of crossings, with a unit vector's name for its component.
/// </summary>
public sealed class ClosedFormTests
{
    private const double P = 0.11;
    private const double E = 0.07;
    private const double O = 0.13;
    private const double S = 0.17;

    private static readonly Hand Test = new("own", P, E, O, S, 0.25, 0.05);
    private static readonly Hand Unscaled = Test with { ScaleMillimetres = 0 };

    [Fact]
    public void A_perpendicular_at_a_point_by_arcs()
    {
        ActSequence acts = new();
        LineMark line = acts.Lay(acts.Locate(-100, 0), acts.Locate(100, 0));
        PointMark foot = acts.Locate(0, 0);
        CircleMark around = acts.Swing(foot, acts.SetFree(60));
        PointMark left = acts.Cross(line, around, 0);
        PointMark right = acts.Cross(line, around, 1);
        SetOpening wider = acts.SetFree(100);
        PointMark top = acts.Cross(acts.Swing(left, wider), acts.Swing(right, wider), 0);
        acts.CompareTurn(line, acts.Lay(foot, top));

        // The top lies at (0, 80); the arcs' normals there are (±3/5, 4/5). Their equal opening cancels; so does the first one, which moves both feet alike:
        // dTx = dOx + uOx + ½(ξ − ζ + uLx + uRx) + ⅔(ζ' − ξ' + uLy − uRy − 120 × tilt) + (η − η')/1.2. The tilt of the line is carried by the perpendicular in
        // full and cancels in the angle: 80 × angle = −uOx − ½(…) − ⅔(…) − (…)/1.2 + ε' − ε.
        double variance = P * P * (1 + 4 * 0.25 + 4 * (4.0 / 9) + 2 / 1.44) + 2 * E * E;
        ShouldHaveSigma(acts.Layout(Unscaled), Degrees(Math.Sqrt(variance) / 80));
    }

    [Fact]
    public void A_line_laid_to_two_points_and_used_beyond_them()
    {
        ActSequence acts = new();
        PointMark first = acts.Locate(0, 0);
        LineMark line = acts.Lay(first, acts.Locate(20, 0));
        acts.Keep("ray", line, new SegmentPiece(first.Point, new Point(150, 0)));

        // At x the line is off by (dA + ε)(1 − x/20) + (dB + ε')(x/20); each bracket has variance p² + s² + e².
        double each = P * P + S * S + E * E;
        HandResult result = ShouldHaveSigma(acts.Layout(Test), Degrees(Math.Sqrt(2 * each) / 20));
        result.Far95!.Value.ShouldBe(1.96 * Math.Sqrt(each * (6.5 * 6.5 + 7.5 * 7.5)), 0.1);
        result.Blame.Single(blame => blame.Act == 3).Share.ShouldBe(E * E / each, 1e-9);
        result.Blame.Single(blame => blame.Act == 3).Why.ShouldBe("ruled from two points 20 mm apart and used 130 mm away");
    }

    [Theory]
    [InlineData(90)]
    [InlineData(30)]
    [InlineData(15)]
    public void A_slanting_crossing(double degrees)
    {
        ActSequence acts = new();
        (double sine, double cosine) = Math.SinCos(double.DegreesToRadians(degrees));
        LineMark level = acts.Lay(acts.Locate(-100, 0), acts.Locate(100, 0));
        LineMark slant = acts.Lay(acts.Locate(-100 * cosine, -100 * sine), acts.Locate(100 * cosine, 100 * sine));
        acts.ComparePlace(acts.Cross(level, slant));

        // Half way between its points a line is off by the mean of two offsets, (p² + s² + e²)/2; the prick adds p² along each normal. Two normals at the
        // angle θ turn variances v, v into a mean square distance of 2v / sin² θ. The factor 1 / sin θ: check `intersection-factor` (general, from memory).
        double along = (P * P + S * S + E * E) / 2 + P * P;
        ShouldHaveSigma(acts.Layout(Test), Math.Sqrt(2 * along) / sine);
    }

    [Fact]
    public void Steps_at_one_setting_along_a_line()
    {
        const int Steps = 12;
        ActSequence acts = new();
        PointMark start = acts.Locate(0, 0);
        LineMark line = acts.Lay(start, acts.Locate(200, 0));
        SetOpening setting = acts.SetScale(10, 10);
        PointMark at = start;
        for (int step = 0; step < Steps; step++)
            at = acts.Cross(line, acts.Swing(at, setting), 1);
        acts.Compare(QuantityKind.Length, new PointDistance(start, at));

        // Each step adds a seat and a prick of its own, and the one error of the setting: n ρ + Σ(u + η).
        double variance = 2 * Steps * P * P + Steps * Steps * (O * O + S * S);
        HandResult result = ShouldHaveSigma(acts.Layout(Test), Math.Sqrt(variance));

        // As if each step were set afresh: far too little.
        double independent = Math.Sqrt(2 * Steps * P * P + Steps * (O * O + S * S));
        result.Sigma!.Value.ShouldBeGreaterThan(2 * independent);
        result.Blame[0].Why.ShouldBe("an opening by the scale, which 12 arcs share");
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void Steps_of_the_radius_round_its_circle(bool sameSetting)
    {
        ActSequence acts = new();
        PointMark centre = acts.Locate(0, 0);
        LineMark line = acts.Lay(centre, acts.Locate(100, 0));
        SetOpening setting = acts.SetFree(50);
        CircleMark circle = acts.Swing(centre, setting);
        PointMark start = acts.Cross(line, circle, 1);
        if (!sameSetting)
            setting = acts.SetFree(50);
        PointMark at = start;
        PointMark? before = null;
        for (int step = 0; step < 4; step++)
        {
            CircleMark arc = acts.Swing(at, setting);
            PointMark next = acts.Cross(circle, arc, 0);
            if (before is not null && DistanceBetween(next, before) < 1)
                throw new InvalidOperationException("walked back");
            (before, at) = (at, next);
        }

        acts.Compare(QuantityKind.Angle, new CornerAngle(start, centre, at));

        // A chord that subtends φ: R cos(φ/2)(dθ' − dθ) = ρ + ξ + u − sin(φ/2)(r + r'), r = ρc + η being what a point is out along the radius. Over n = 4 steps of
        // 60°, where sin(φ/2) = ½: R cos(φ/2) Δθ = 4ρ − 4ρc + Σξ + Σu − ½(η₀ + 2η₁ + 2η₂ + 2η₃ + η₄). With one setting ρ and ρc cancel: the hexagon closes by
        // itself. Seen from the pricked centre the circle's seat adds u·(t₄ − t₀), of square 2 − 2 cos 240° = 3.
        double chords = 4 + 4 + 0.25 * (1 + 4 * 3 + 1);
        double variance = P * P * (chords / 0.75 + 3) + (sameSetting ? 0 : 2 * 16 * O * O / 0.75);
        ShouldHaveSigma(acts.Layout(Unscaled), Degrees(Math.Sqrt(variance) / 50));
    }

    [Fact]
    public void A_chord_set_by_scale()
    {
        const double Radius = 100;
        const double Wanted = 68.375;
        const double Setting = 68.5;
        ActSequence acts = new();
        PointMark centre = acts.Locate(0, 0);
        LineMark line = acts.Lay(centre, acts.Locate(150, 0));
        CircleMark circle = acts.Swing(centre, acts.SetFree(Radius));
        PointMark start = acts.Cross(line, circle, 1);
        CircleMark arc = acts.Swing(start, acts.SetScale(Wanted, Setting));
        acts.Compare(QuantityKind.Angle, new CornerAngle(start, centre, acts.Cross(circle, arc, 0)));

        // One step of the walk above, its setting read on the scale: cos(φ/2) R Δθ = ρ + σ + ξ + u − sin(φ/2)(2ρc + η₀ + η₁), and u·(t₁ − t₀) from the seat.
        // The locates' scale errors move the whole figure and drop out.
        double halfSine = Wanted / 2 / Radius;
        double squared = halfSine * halfSine;
        double variance = (O * O + S * S + 2 * P * P + squared * (4 * O * O + 2 * P * P)) / (1 - squared) + P * P * 4 * squared;
        HandResult result = ShouldHaveSigma(acts.Layout(Test), Degrees(Math.Sqrt(variance) / Radius));

        // Exactly: the angle of the chord that is set less the angle of the one wanted.
        double bias = Degrees(2 * (Math.Asin(Setting / 2 / Radius) - Math.Asin(halfSine)));
        result.Bias.ShouldBe(bias, 1e-9);
        result.Median!.Value.ShouldBe(bias, 5 * 0.0063 * result.Sigma!.Value);

        // Each of these percentiles has a standard error of 0.013 deviations at forty thousand trials, their middle 0.0095.
        ((result.High95 + result.Low95) / 2)!.Value.ShouldBe(bias, 5 * 0.0095 * result.Sigma!.Value);
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void An_angle_carried_from_one_place_to_another(bool sameSetting)
    {
        ActSequence acts = new();
        PointMark corner = acts.Locate(-100, 0);
        LineMark side = acts.Lay(corner, acts.Locate(-40, 0));
        LineMark other = acts.Lay(corner, acts.Locate(-64, 48));
        PointMark newCorner = acts.Locate(50, 0);
        LineMark newSide = acts.Lay(newCorner, acts.Locate(110, 0));
        SetOpening setting = acts.SetFree(60);
        CircleMark arc = acts.Swing(corner, setting);
        PointMark a = acts.Cross(side, arc, 1);
        PointMark b = acts.Cross(other, arc, 1);
        if (!sameSetting)
            setting = acts.SetFree(60);
        CircleMark newArc = acts.Swing(newCorner, setting);
        PointMark newA = acts.Cross(newSide, newArc, 1);
        CircleMark span = acts.Swing(newA, acts.SetSpan(a, b));
        PointMark newB = acts.Cross(newArc, span, 0);
        DistanceBetween(newB, newCorner).ShouldBe(60, 1e-9);
        newB.Point.YMillimetres.ShouldBe(48, 1e-9);
        acts.Compare(QuantityKind.Angle, new CornerAngle(newA, newCorner, newB));

        // cos α = 3/5, so sin²(α/2) = 1/5 and cos²(α/2) = 4/5. The sides' points lie on the arc, so a side is off there by its point's own offset, x.
        // Span: ds = sin(α/2)(2ρ + a + b + 2 cos(α/2) w) + cos(α/2)(x_b + b' − x_a − a'), w being dO + u_O along the bisector. At the new corner
        // cos(α/2) r Δ = ds + ρ' + ξ + u − sin(α/2)(2ρ + a'' + b''), and the new arc's seat adds u·(n_b − n_a), of square 4 sin²(α/2). One setting for both arcs
        // cancels; two leave 4 sin²(α/2)(o² + o²).
        const double Sine = 0.2;
        const double Cosine = 0.8;
        double variance = (P * P * (Sine * (4 + 8 * Cosine) + 4 * Cosine + 2) + O * O + (sameSetting ? 0 : 8 * Sine * O * O)) / Cosine + P * P * 4 * Sine;
        ShouldHaveSigma(acts.Layout(Unscaled with { EdgeMillimetres = 0 }), Degrees(Math.Sqrt(variance) / 60));
    }

    [Fact]
    public void Tools_for_angles_add_their_own_error_and_the_edge_moves_the_line_only()
    {
        ActSequence acts = new();
        PointMark at = acts.Locate(0, 0);
        LineMark line = acts.Lay(at, acts.Locate(100, 0));
        LineMark ray = acts.Protract(line, at, 37);
        acts.CompareTurn(line, acts.Slide(ray, at));

        // The angle is the sum of protractor's and square's.
        ShouldHaveSigma(acts.Layout(Test), Math.Sqrt(0.25 * 0.25 + 0.05 * 0.05));
    }

    [Fact]
    public void What_is_taken_off_the_printed_plate_carries_its_scale()
    {
        ActSequence acts = new();
        PointMark first = acts.Locate(-100, 0, byScale: false);
        PointMark second = acts.Locate(100, 0, byScale: false);
        acts.Compare(QuantityKind.Length, new PointDistance(first, second));

        // One scale error for both: 200 × 0.3 % with the bars measured, 1 % without; and two pricks.
        double pricks = 2 * P * P;
        ShouldHaveSigma(acts.Layout(Test), Math.Sqrt(0.6 * 0.6 + pricks), new HandErrorOptions { BarsMeasured = true });
        ShouldHaveSigma(acts.Layout(Test), Math.Sqrt(2 * 2 + pricks));
    }

    [Fact]
    public void A_point_measured_from_another_carries_its_error()
    {
        ActSequence acts = new();
        PointMark first = acts.Locate(10, 20);
        PointMark second = acts.Locate(40, 60, from: first);
        acts.ComparePlace(second);

        ShouldHaveSigma(acts.Layout(Test), Math.Sqrt(4 * (P * P + S * S)));
    }

    private static double Degrees(double radians) => radians * 180 / Math.PI;

    private static double DistanceBetween(PointMark a, PointMark b) =>
        double.Hypot(a.Point.XMillimetres - b.Point.XMillimetres, a.Point.YMillimetres - b.Point.YMillimetres);

    private static HandResult ShouldHaveSigma(Layout layout, double sigma, HandErrorOptions? options = null)
    {
        HandErrorReport report = HandError.Assess(layout, (options ?? new HandErrorOptions()) with { Trials = 40_000 }).Value.ShouldNotBeNull();

        HandResult result = report.Results[0];
        result.FirstOrderSigma!.Value.ShouldBe(sigma, 1e-9 * sigma);

        // Five standard errors of forty thousand trials are 1.8 %.
        result.Sigma!.Value.ShouldBe(sigma, 0.018 * sigma);
        result.Lost.ShouldBe(0);
        result.Disagreement.ShouldBeNull();
        (result.Blame.Sum(blame => blame.Share) + result.Rest).ShouldBe(1, 1e-9);
        return result;
    }
}
