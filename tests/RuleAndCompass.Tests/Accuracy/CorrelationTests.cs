using RuleAndCompass.Accuracy;
using RuleAndCompass.Bench;
using RuleAndCompass.Making;
using RuleAndCompass.Tests.Bench;

namespace RuleAndCompass.Tests.Accuracy;

/// <summary>An error is made once: what uses the same mark or setting shares it. Each case stands beside the same figure made of independent parts.</summary>
public sealed class CorrelationTests
{
    private const double P = 0.1;
    private const double E = 0.05;
    private const double O = 0.2;

    private static readonly Hand Test = new("own", P, E, O, 0, 0.25, 0.05);

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void A_point_used_twice_errs_once(bool shared)
    {
        ActSequence acts = new();
        PointMark middle = acts.Locate(0, 0);
        PointMark again = shared ? middle : acts.Locate(0, 0);
        LineMark right = acts.Lay(middle, acts.Locate(100, 0));
        LineMark left = acts.Lay(acts.Locate(-100, 0), again);
        acts.CompareTurn(left, right);

        // Tilts (dR − dM)/100 and (dM − dL)/100: the difference holds 2 dM, of variance 4p², where two points would give 2p². The edge adds 4 × e².
        double pricks = shared ? 6 : 4;
        ShouldHaveSigma(acts.Layout(Test), Degrees(Math.Sqrt(pricks * P * P + 4 * E * E) / 100));
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void A_line_used_twice_errs_once(bool shared)
    {
        ActSequence acts = new();
        PointMark left = acts.Locate(-10, 0);
        PointMark right = acts.Locate(10, 0);
        LineMark line = acts.Lay(left, right);
        LineMark again = shared ? line : acts.Lay(left, right);
        acts.CompareTurn(acts.Slide(line, left), acts.Slide(again, right));

        // What the line is tilted by, both squares carry: only the two squares' own errors are left. Laid twice, four edges over 20 mm come in.
        double edges = shared ? 0 : 4 * Math.Pow(Degrees(E / 20), 2);
        ShouldHaveSigma(acts.Layout(Test), Math.Sqrt(2 * 0.05 * 0.05 + edges));
    }

    [Theory]
    [InlineData(true)]
    [InlineData(false)]
    public void Arcs_of_one_setting_share_its_error(bool shared)
    {
        ActSequence acts = new();
        PointMark left = acts.Locate(-60, 0);
        PointMark right = acts.Locate(60, 0);
        SetOpening setting = acts.SetFree(100);
        CircleMark first = acts.Swing(left, setting);
        CircleMark second = acts.Swing(right, shared ? setting : acts.SetFree(100));
        acts.Compare(QuantityKind.Length, new PointCoordinate(acts.Cross(first, second), true));

        // At (0, 80) the normals are (±3/5, 4/5): 1.2 dx = 3/5 (dLx + uLx) + 4/5 (dLy + uLy) + 3/5 (dRx + uRx) − 4/5 (dRy + uRy) + ρ − ρ' + η − η'.
        double variance = (4 * (0.36 + 0.64) * P * P + 2 * P * P + (shared ? 0 : 2 * O * O)) / 1.44;
        ShouldHaveSigma(acts.Layout(Test), Math.Sqrt(variance));
    }

    private static double Degrees(double radians) => radians * 180 / Math.PI;

    private static void ShouldHaveSigma(Layout layout, double sigma)
    {
        HandResult result = HandError.Assess(layout, new HandErrorOptions { Trials = 40_000 }).Value.ShouldNotBeNull().Results[0];
        result.FirstOrderSigma!.Value.ShouldBe(sigma, 1e-9 * sigma);
        result.Sigma!.Value.ShouldBe(sigma, 0.018 * sigma);
    }
}
