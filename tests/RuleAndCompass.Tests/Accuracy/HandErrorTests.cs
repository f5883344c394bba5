using System.Collections.Immutable;
using System.Globalization;
using RuleAndCompass.Accuracy;
using RuleAndCompass.Bench;
using RuleAndCompass.Bench.Errors;
using RuleAndCompass.Geometry;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;
using RuleAndCompass.Tests.Bench;

namespace RuleAndCompass.Tests.Accuracy;

public sealed class HandErrorTests
{
    [Fact]
    public void The_same_seed_gives_the_same_figures_on_any_number_of_threads()
    {
        Layout layout = SomeOfEach().Layout(Hand.Coarse);

        // Not a multiple of a block, nor of a vector.
        HandErrorOptions options = new() { Trials = 20_003, Seed = 42 };
        string alone = Figures(HandError.Assess(layout, options with { Threads = 1 }));

        Figures(HandError.Assess(layout, options with { Threads = 2 })).ShouldBe(alone);
        Figures(HandError.Assess(layout, options with { Threads = 4 })).ShouldBe(alone);
        Figures(HandError.Assess(layout, options with { Seed = 43 })).ShouldNotBe(alone);
    }

    // Pinned from this program's own run: a machine with other vectors, or another platform, must give the same to the last digit.
    [Fact]
    public void The_figures_are_the_same_on_every_machine()
    {
        ActSequence acts = new();
        PointMark left = acts.Locate(-60, 0);
        SetOpening setting = acts.SetFree(100);
        PointMark top = acts.Cross(acts.Swing(left, setting), acts.Swing(acts.Locate(60, 0), setting));
        acts.CompareTurn(acts.Protract(acts.Lay(left, top), top, 30), acts.Lay(left, top));

        HandResult result = HandError.Assess(acts.Layout(Hand.Ordinary), new HandErrorOptions { Trials = 10_000, Seed = 5 }).Value!.Results[0];

        result.Sigma!.Value.ToString("R", CultureInfo.InvariantCulture).ShouldBe("0.27329953233446047");
        result.High95!.Value.ToString("R", CultureInfo.InvariantCulture).ShouldBe("0.5400390625");
    }

    [Fact]
    public void What_else_is_asked_does_not_change_a_figure()
    {
        ActSequence acts = SomeOfEach();
        HandErrorOptions options = new() { Trials = 5_000 };
        HandResult first = HandError.Assess(acts.Layout(Hand.Ordinary), options).Value!.Results[0];
        acts.ComparePlace(acts.Locate(11, 12));

        HandError.Assess(acts.Layout(Hand.Ordinary), options).Value!.Results[0].Sigma.ShouldBe(first.Sigma);
    }

    [Fact]
    public void First_order_alone_needs_no_trials()
    {
        HandErrorReport report = HandError.Assess(SomeOfEach().Layout(Hand.Fine), new HandErrorOptions { Trials = 0 }).Value!;

        foreach (HandResult result in report.Results)
        {
            result.Sigma.ShouldBe(result.FirstOrderSigma);
            result.Size95.ShouldNotBeNull();
            result.Low95.ShouldBeNull();
            result.Disagreement.ShouldBeNull();
        }

        report.Results[0].Size95!.Value.ShouldBe(1.959964 * report.Results[0].Sigma!.Value, 1e-6);
    }

    [Fact]
    public void Minutes_of_time_and_millimetres_at_the_far_end_follow_from_the_angle()
    {
        ActSequence acts = new();
        PointMark at = acts.Locate(0, 0);
        LineMark noon = acts.Lay(at, acts.Locate(0, 100));
        acts.CompareTurn(noon, acts.Protract(noon, at, -30), rate: -12, farEnd: 150);

        HandResult result = HandError.Assess(acts.Layout(Hand.Ordinary)).Value!.Results[0];

        result.MinutesOfTime95!.Value.ShouldBe(result.Size95!.Value / 12 * 60, 1e-12);
        result.Far95!.Value.ShouldBe(result.Size95.Value * Math.PI / 180 * 150, 1e-12);
    }

    [Fact]
    public void Minutes_of_time_of_a_place_count_the_part_along_its_path()
    {
        ActSequence acts = new();
        acts.ComparePlace(acts.Locate(30, 40));
        Layout layout = acts.Layout(Hand.Ordinary);
        layout = layout with { Comparisons = [layout.Comparisons[0] with { RatePerHour = 25, PathRate = (15, -20) }] };

        HandResult result = HandError.Assess(layout, new HandErrorOptions { Trials = 0 }).Value!.Results[0];

        // Prick and scale give each coordinate √(0.01 + 0.04), and so along any path; 25 mm go an hour.
        result.MinutesOfTime95!.Value.ShouldBe(1.959964 * Math.Sqrt(0.05) / 25 * 60, 1e-6);
        result.Size95!.Value.ShouldBe(2.447747 * Math.Sqrt(0.05), 1e-5);
    }

    [Fact]
    public void A_report_tells_of_each_kept_thing()
    {
        HandErrorReport report = HandError.Assess(SomeOfEach().Layout(Hand.Ordinary)).Value!;

        report.Results.Select(result => (result.Label, result.Subject, result.Kind)).ShouldBe(
        [
            ("it", HandSubject.Comparison, QuantityKind.Angle),
            ("there", HandSubject.Comparison, QuantityKind.Point),
            ("ray", HandSubject.Line, QuantityKind.Angle),
            ("rim (radius)", HandSubject.Radius, QuantityKind.Length),
            ("rim (centre)", HandSubject.Centre, QuantityKind.Point),
            ("hole", HandSubject.Point, QuantityKind.Point),
        ]);
        report.Results[2].Far95.ShouldNotBeNull();
        report.Summary!.Count.ShouldBe(1);
        report.Summaries.Length.ShouldBe(2);

        // The free opening's one error, and the prick of the seat each way beside prick and scale of the centre.
        report.Results[3].FirstOrderSigma!.Value.ShouldBe(0.1, 1e-12);
        report.Results[4].FirstOrderSigma!.Value.ShouldBe(Math.Sqrt(4 * 0.01 + 2 * 0.04), 1e-12);
    }

    [Fact]
    public void The_one_figure_is_the_root_mean_square_of_what_is_compared()
    {
        ActSequence acts = new();
        PointMark start = acts.Locate(0, 0);
        acts.Compare(QuantityKind.Length, new PointDistance(start, acts.Locate(100, 0)), label: "near");
        acts.Compare(QuantityKind.Length, new PointDistance(start, acts.Locate(0, 50, from: acts.Locate(0, 20, from: start))), label: "far");

        HandErrorReport report = HandError.Assess(acts.Layout(Hand.Ordinary)).Value!;

        double[] sizes = [.. report.Results.Select(result => result.Size95!.Value)];
        report.Summary!.RootMeanSquare.ShouldBe(Math.Sqrt((sizes[0] * sizes[0] + sizes[1] * sizes[1]) / 2), 1e-12);
        report.Summary.WorstLabel.ShouldBe("far");
        report.Summary.Worst.ShouldBe(sizes[1]);
        report.Blame.Sum(blame => blame.Share).ShouldBe(1, 1e-9);
    }

    [Fact]
    public void A_weak_crossing_is_lost_in_some_trials_and_told_apart_from_first_order()
    {
        ActSequence acts = new();
        SetOpening setting = acts.SetFree(100);
        CircleMark left = acts.Swing(acts.Locate(-99.95, 0), setting);
        CircleMark right = acts.Swing(acts.Locate(99.95, 0), setting);
        acts.Compare(QuantityKind.Length, new PointCoordinate(acts.Cross(left, right), false));

        HandResult result = HandError.Assess(acts.Layout(Hand.Ordinary)).Value!.Results[0];

        // The arcs overlap by 0.1 mm; the overlap's deviation is √(2 × 0.01 + 4 × 0.01 × … ) of several tenths, so not far from 4 in 10 are lost.
        result.Lost.ShouldBeInRange(30_000, 50_000);
        result.Disagreement.ShouldNotBeNull().ShouldContain("the trials are trusted");
        result.Sigma!.Value.ShouldBeLessThan(result.FirstOrderSigma!.Value);
        result.Blame.ShouldContain(blame => blame.Why == "the arcs c2 and c4 cross at 3.6°");
    }

    [Fact]
    public void Curves_that_only_touch_have_no_first_order()
    {
        ActSequence acts = new();
        PointMark centre = acts.Locate(0, 0);
        CircleMark circle = acts.Swing(centre, acts.SetFree(50));
        LineMark tangent = acts.Lay(acts.Locate(-80, 50), acts.Locate(80, 50));
        PointMark touching = new("T", new Point(0, 50), false);
        acts.ComparePlace(acts.CrossAt(tangent, circle, touching));

        HandResult result = HandError.Assess(acts.Layout(Hand.Ordinary)).Value!.Results[0];

        result.FirstOrderSigma.ShouldBeNull();
        result.Disagreement.ShouldBe("first order does not exist, since curves on the way only touch; the trials are trusted");

        // As often apart as crossing.
        result.Lost.ShouldBeInRange(49_000, 51_000);
        result.Blame.Single().Act.ShouldBe(7);
        double.IsFinite(result.Sigma!.Value).ShouldBeTrue();
    }

    [Fact]
    public void A_hand_that_loses_every_trial_is_a_finding()
    {
        // Set 10 mm short by a coarse scale, the arcs never meet.
        ActSequence acts = new();
        SetOpening setting = acts.SetScale(100, 90);
        CircleMark left = acts.Swing(acts.Locate(-95, 0), setting);
        CircleMark right = acts.Swing(acts.Locate(95, 0), setting);
        acts.ComparePlace(acts.Cross(left, right), "apex");

        Outcome<HandErrorReport> outcome = HandError.Assess(acts.Layout(Hand.Fine), new HandErrorOptions { Trials = 1000 });

        outcome.Diagnostics.Single().Code.ShouldBe("RC4004");
        outcome.Diagnostics.Single().Message.ShouldBe("in each of 1000 trials a crossing that `apex` needs was lost, so no hand error can be told");
        outcome.Value!.Results[0].Sigma.ShouldBeNull();
        outcome.Value.Results[0].Size95.ShouldBeNull();
        outcome.Value.Results[0].Lost.ShouldBe(1000);
    }

    [Theory]
    [InlineData(-0.1, 100, "RC4001")]
    [InlineData(double.NaN, 100, "RC4001")]
    [InlineData(double.PositiveInfinity, 100, "RC4001")]
    [InlineData(90, 100, "RC4002")]
    [InlineData(0.1, -1, "RC4003")]
    [InlineData(0.1, 2_000_000_000, "RC4003")]
    public void Senseless_hands_and_options_are_findings(double prick, int trials, string code)
    {
        Hand hand = Hand.Ordinary with { PrickMillimetres = prick };

        Outcome<HandErrorReport> outcome = HandError.Assess(SomeOfEach().Layout(hand), new HandErrorOptions { Trials = trials });

        outcome.Value.ShouldBeNull();
        outcome.Diagnostics.Single().Code.ShouldBe(code);
        outcome.Diagnostics.Single().Severity.ShouldBe(Severity.Error);
    }

    [Fact]
    public void A_hand_without_errors_makes_none()
    {
        HandErrorReport report = HandError.Assess(SomeOfEach().Layout(new Hand("own", 0, 0, 0, 0, 0, 0)), new HandErrorOptions { Trials = 100 }).Value!;

        foreach (HandResult result in report.Results)
        {
            // What rounding in the arithmetic of doubles leaves.
            result.Sigma!.Value.ShouldBeLessThan(1e-10);
            result.FirstOrderSigma.ShouldBe(0);
            result.Blame.ShouldBeEmpty();
        }
    }

    [Fact]
    public void A_layout_without_anything_compared_or_kept_says_so()
    {
        ActSequence acts = new();
        acts.Locate(0, 0);

        HandError.Assess(acts.Layout(Hand.Fine)).Diagnostics.Single().Code.ShouldBe("RC4005");
    }

    [Fact]
    public void Trials_can_be_interrupted_and_tell_their_progress()
    {
        ActSequence acts = new();
        acts.ComparePlace(acts.Locate(0, 0));
        Layout layout = acts.Layout(Hand.Fine);
        List<double> parts = [];
        using CancellationTokenSource stopping = new();

        HandError.Assess(layout, new HandErrorOptions { Trials = 300_000 }, new Listener(parts.Add));
        parts.Count.ShouldBeGreaterThan(1);
        parts.ShouldBeInOrder();
        parts[^1].ShouldBe(1);

        stopping.Cancel();
        Should.Throw<OperationCanceledException>(() => HandError.Assess(layout, null, null, stopping.Token));
    }

    [Fact]
    public void Memory_does_not_grow_with_the_trials()
    {
        ActSequence acts = new();
        PointMark start = acts.Locate(0, 0);
        for (int place = 1; place <= 30; place++)
            acts.Compare(QuantityKind.Length, new PointDistance(start, acts.Locate(place, 2 * place)));
        Layout layout = acts.Layout(Hand.Ordinary);
        Allocated(1_000);

        // 30 results of 40,000 trials more would be 9.6 MB if they were held.
        (Allocated(50_000) - Allocated(10_000)).ShouldBeLessThan(500_000);

        // One thread's work is done on the caller's.
        long Allocated(int trials)
        {
            long before = GC.GetAllocatedBytesForCurrentThread();
            HandError.Assess(layout, new HandErrorOptions { Trials = trials, Threads = 1 });
            return GC.GetAllocatedBytesForCurrentThread() - before;
        }
    }

    [Fact]
    public void Every_function_of_the_language_can_be_measured_through()
    {
        ActSequence acts = new();
        PointMark o = acts.Locate(0, 0);
        PointMark a = acts.Locate(80, 10);
        PointDistance span = new(o, a);
        FunctionMeasure ratio = Of("/", span, new ConstantMeasure(100));
        ActProgram program = new(Hand.Ordinary);
        program.Append(acts.Acts);
        Sweep sweep = new(program);
        double distance = Math.Sqrt(6500);
        (Measure Measure, double Value)[] cases =
        [
            (Of("-", span), -distance),
            (Of("+", span, span), 2 * distance),
            (Of("-", new ConstantMeasure(7), span), 7 - distance),
            (Of("*", span, ratio), distance * distance / 100),
            (Of("sqrt", span), Math.Sqrt(distance)),
            (Of("sin", span), Math.Sin(distance * Math.PI / 180)),
            (Of("cos", span), Math.Cos(distance * Math.PI / 180)),
            (Of("tan", span), Math.Tan(distance * Math.PI / 180)),
            (Of("asin", ratio), Math.Asin(distance / 100) * 180 / Math.PI),
            (Of("acos", ratio), Math.Acos(distance / 100) * 180 / Math.PI),
            (Of("atan", ratio), Math.Atan(distance / 100) * 180 / Math.PI),
            (Of("atan", span, ratio), Math.Atan2(distance, distance / 100) * 180 / Math.PI),
            (Of("abs", Of("-", span)), distance),
            (Of("min", span, ratio, new ConstantMeasure(5)), distance / 100),
            (Of("max", ratio, span), distance),
            (Of("whole", ratio), 0),
            (Of("remainder", span, new ConstantMeasure(7)), distance - 77),
            (new LineDistance(a, acts.Lay(o, acts.Locate(0, 50))), 80),
        ];
        program.Append(acts.Acts.Skip(program.Steps.Count));
        foreach ((Measure measure, double expected) in cases)
        {
            Gauge gauge = Gauge.Compile(measure, program);
            gauge.Value(program.Nominal).ShouldBe(expected, 1e-12 * Math.Abs(expected), measure.ToString());

            // The derivative along x of A, against a central difference.
            int slot = program.SlotOf(a);
            double nominal = program.Nominal[slot];
            double derivative = sweep.Run(start => gauge.Pull(start, 1)).Where(found => found.Variable == 6).Sum(found => found.Value);
            program.Nominal[slot] = nominal + 1e-4;
            double above = gauge.Value(program.Nominal);
            program.Nominal[slot] = nominal - 1e-4;
            double below = gauge.Value(program.Nominal);
            program.Nominal[slot] = nominal;
            derivative.ShouldBe((above - below) / 2e-4, 1e-6 * (1 + Math.Abs(derivative)), measure.ToString());
        }

        static FunctionMeasure Of(string function, params ImmutableArray<Measure> arguments) => new(function, arguments);
    }

    [Fact]
    public void A_forecast_tells_single_marks_and_can_be_taken_back()
    {
        ActSequence acts = new();
        PointMark o = acts.Locate(0, 0);
        PointMark a = acts.Locate(10, 0);
        LineMark near = acts.Lay(o, a);
        CircleMark circle = acts.Swing(o, acts.SetFree(20));
        ErrorForecast forecast = new(Hand.Ordinary);
        foreach (Act act in acts.Acts)
            forecast.Append(act);

        // Prick and scale each way: 2 (0.01 + 0.04). The line at 0 and 100 mm: each end's p² + s² + e² = 0.06, by 1 and by 9² + 10².
        forecast.Sigma(a).ShouldBe(Math.Sqrt(0.1), 1e-12);
        forecast.Sigma(near).ShouldBe(Math.Sqrt(0.06 * (1 + 81 + 100) / 2), 1e-12);
        forecast.Sigma(circle).ShouldBe(Math.Sqrt(0.1 + 0.02 + 0.01), 1e-12);

        forecast.Truncate(2);
        Should.Throw<ArgumentException>(() => forecast.Sigma(near));
        forecast.Append(acts.Acts[2]);
        forecast.Sigma(near).ShouldBe(Math.Sqrt(0.06 * (1 + 81 + 100) / 2), 1e-12);
    }

    private static ActSequence SomeOfEach()
    {
        ActSequence acts = new();
        PointMark o = acts.Locate(0, 0);
        LineMark noon = acts.Lay(o, acts.Locate(0, 100));
        CircleMark rim = acts.Swing(o, acts.SetFree(60), "rim");
        PointMark top = acts.Cross(noon, rim, 1);
        LineMark bar = acts.Slide(noon, top);
        LineMark ray = acts.Protract(noon, o, -35, "ray");
        PointMark end = acts.Cross(ray, bar, 0, "hole");
        acts.CompareTurn(noon, ray);
        acts.ComparePlace(end, "there");
        acts.Keep("ray", ray, new SegmentPiece(o.Point, end.Point));
        acts.Keep("rim", rim, new CirclePiece(o.Point, rim.Circle.Radius));
        acts.Keep("hole", end, new PointPiece(end.Point));
        return acts;
    }

    private static string Figures(Outcome<HandErrorReport> outcome) => string.Join('\n', outcome.Value!.Results.Select(result => string.Create(
        CultureInfo.InvariantCulture, $"{result.Sigma:R} {result.Low95:R} {result.Median:R} {result.High95:R} {result.Size95:R} {result.Size99:R} {result.Far95:R} {result.Lost}")));

    private sealed class Listener(Action<double> hear) : IProgress<double>
    {
        public void Report(double value) => hear(value);
    }
}
