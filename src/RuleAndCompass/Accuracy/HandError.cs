using System.Collections.Immutable;
using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Bench.Errors;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;

namespace RuleAndCompass.Accuracy;

/// <summary>How far off a layout comes out under the hand that does it, and which acts are to blame.</summary>
/// <remarks>
/// Two computations: first order, by one reverse sweep over the acts for each result; and seeded trials, in which the acts are repeated with random errors.
/// What the error variables are stands with <see cref="ActProgram"/>.
/// </remarks>
public static class HandError
{
    // 20 kilobytes each: bounds the memory of the trials to some 200 MB.
    private const int MaximumQuantities = 10_000;

    // Beyond this the two computations are said to differ; with few trials, beyond what chance alone does.
    private const double TellingDifference = 0.10;
    private const double ChanceFactor = 4;

    /// <summary>Works out the hand error of everything that is compared or kept.</summary>
    /// <returns>The report, or null where the hand or the options make no sense; with findings RC4….</returns>
    public static Outcome<HandErrorReport> Assess(
        Layout layout, HandErrorOptions? options = null, IProgress<double>? progress = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(layout);
        options ??= new HandErrorOptions();
        ImmutableArray<Diagnostic> faults = [.. HandChecks.Faults(layout, options)];
        if (faults.Length > 0)
            return new Outcome<HandErrorReport>(null, faults);

        Hand hand = options.BarsMeasured ? layout.Hand : layout.Hand with { PaperFraction = Hand.UnmeasuredPaperFraction };
        ActProgram program = new(hand);
        program.Append(layout.Acts);
        ImmutableArray<Subject> subjects = [.. Subject.All(layout, program)];
        List<Diagnostic> findings = [];
        if (subjects.IsEmpty)
            findings.Add(AccuracyFindings.NothingToMeasure());

        FirstOrderSweeps sweeps = new(program, Math.Max(1, options.BlameCount));
        Dictionary<Quantity, Figures> figures = [];
        foreach (Subject subject in subjects)
        {
            cancellation.ThrowIfCancellationRequested();
            figures.Add(subject.Quantity, new Figures(subject.Quantity, sweeps.Of(subject.Quantity, addToWhole: subject.Of == HandSubject.Comparison)));
            IEnumerable<Quantity> others = subject.Minutes is { } minutes ? subject.Far.Add(minutes) : subject.Far;
            foreach (Quantity other in others)
                figures.Add(other, new Figures(other, sweeps.Of(other, addToWhole: false)));
        }

        RunTrials(program, [.. figures.Values], options, findings, progress, cancellation);

        BlameReasons reasons = new(layout.Acts, KeptEnds(layout));
        ImmutableArray<HandResult> results = [.. subjects.Select(subject => Result(subject, figures, reasons))];
        foreach (HandResult result in results.Where(result => result.Lost > 0 && result.Lost == options.Trials))
        {
            Blame? worst = result.Blame.FirstOrDefault();
            (SourceSpan span, string? file) = result.Subject == HandSubject.Comparison
                ? (layout.Comparisons[result.Index].Span, layout.Comparisons[result.Index].File)
                : (layout.Kept[result.Index].Span, layout.Kept[result.Index].File);
            findings.Add(AccuracyFindings.AlwaysLost(result.Label, options.Trials, worst?.Act ?? 0, worst?.Why ?? "", span, file));
        }

        ImmutableArray<HandSummary> summaries = Summaries(results);
        bool usesPlate = layout.Acts.Any(act => act is Locate { ByScale: false } or SetOpening { Opening: ScaleOpening { Setting: null } });
        HandErrorReport report = new(
            results, summaries.FirstOrDefault(), summaries, Whole(sweeps.Whole, subjects.Count(subject => subject.Of == HandSubject.Comparison), reasons, options.BlameCount), layout.Hand,
            usesPlate ? hand.PaperFraction : null, options.Trials, options.Seed);
        return new Outcome<HandErrorReport>(report, [.. findings]);
    }

    /// <summary>The ends of what is kept of marks: how far their lines are needed.</summary>
    internal static IEnumerable<KeptEnd> KeptEnds(Layout layout) =>
        from kept in layout.Kept
        let mark = kept.Mark
        where mark is not null
        from piece in kept.Pieces.OfType<SegmentPiece>()
        from end in new[] { piece.From, piece.To }
        select new KeptEnd(mark, end);

    private static void RunTrials(
        ActProgram program, Figures[] figures, HandErrorOptions options, List<Diagnostic> findings, IProgress<double>? progress, CancellationToken cancellation)
    {
        if (figures.Length == 0)
            return;
        if (figures.Length > MaximumQuantities && options.Trials > 0)
            findings.Add(AccuracyFindings.TooManyForTrials(figures.Length, MaximumQuantities));

        Trials biases = new(program, [.. figures.Select(figure => figure.Quantity)], options.Seed);
        foreach ((Figures figure, double bias) in figures.Zip(biases.Biases()))
            figure.Bias = double.IsNaN(bias) ? 0 : bias;
        if (options.Trials == 0)
            return;

        Figures[] tried = figures.Length <= MaximumQuantities ? figures : figures[..MaximumQuantities];
        Trials trials = tried.Length == figures.Length ? biases : new Trials(program, [.. tried.Select(figure => figure.Quantity)], options.Seed);
        Distribution[] distributions = trials.Run(options.Trials, options.Threads ?? Environment.ProcessorCount, progress, cancellation);
        foreach ((Figures figure, Distribution distribution) in tried.Zip(distributions))
            figure.Trials = distribution;
    }

    private static HandResult Result(Subject subject, Dictionary<Quantity, Figures> figures, BlameReasons reasons)
    {
        Figures figure = figures[subject.Quantity];
        Distribution? trials = figure.Trials is { Kept: > 0 } some ? some : null;
        double? size = figure.Size95;
        double? far = subject.Far.IsEmpty
            ? size * subject.FarFactor
            : subject.Far.Max(end => figures[end].Size95);
        ImmutableArray<Blame> blame = Blames(figure.FirstOrder.Shares, reasons);
        return new HandResult(
            subject.Label,
            subject.Of,
            subject.Index,
            subject.Kind,
            figure.Bias,
            figure.Sigma,
            figure.FirstOrder.Sigma,
            trials?.Percentile(0.025),
            trials?.Percentile(0.5),
            trials?.Percentile(0.975),
            size,
            trials?.SizePercentile(0.99),
            far,
            subject.Minutes is { } minutes ? figures[minutes].Size95 : subject.RatePerHour is { } rate ? size / Math.Abs(rate) * 60 : null,
            figure.Trials?.Lost ?? 0,
            trials is null ? null : Disagreement(figure, trials, subject.Kind),
            blame,
            blame.IsEmpty ? 0 : Math.Max(0, 1 - blame.Sum(act => act.Share)));
    }

    private static string? Disagreement(Figures figure, Distribution trials, QuantityKind kind)
    {
        if (figure.FirstOrder.Sigma is not { } sigma)
            return "first order does not exist, since curves on the way only touch; the trials are trusted";

        double allowed = Math.Max(TellingDifference, ChanceFactor / Math.Sqrt(trials.Kept));
        double byTrials = figure.Quantity.IsPlace ? trials.SizePercentile(0.95) : (trials.Percentile(0.975) - trials.Percentile(0.025)) / 2;
        double expected = figure.FirstOrder.Size95!.Value; // Null only where Sigma is.

        // First order leaves the bias out, and a distance can't be rid of it.
        bool isBiased = figure.Quantity.IsPlace && figure.Bias > TellingDifference * sigma;
        if (Math.Abs(figure.Sigma!.Value - sigma) <= allowed * sigma && (isBiased || Math.Abs(byTrials - expected) <= allowed * expected))
            return null;
        return $"first order says {Text(expected, kind)} at 95 %, the trials {Text(byTrials, kind)}; the trials are trusted";
    }

    private static string Text(double size, QuantityKind kind)
    {
        string figure = size.ToString("G3", CultureInfo.InvariantCulture);
        return kind switch
        {
            QuantityKind.Angle => $"{figure}°",
            QuantityKind.Number => figure,
            _ => $"{figure} mm",
        };
    }

    private static ImmutableArray<Blame> Blames(ImmutableArray<ActShare> shares, BlameReasons reasons) =>
        [.. shares.Select(share => new Blame(share.Act, share.Share, reasons.Why(share.Act)))];

    private static ImmutableArray<Blame> Whole(double[] shares, int compared, BlameReasons reasons, int count)
    {
        List<ActShare> means = [];
        for (int act = 0; act < shares.Length; act++)
        {
            if (shares[act] > 0)
                means.Add(new ActShare(act, shares[act] / compared));
        }

        return Blames(FirstOrderSweeps.Largest(means, count), reasons);
    }

    // The kind most compared first; of two alike the one compared earlier.
    private static ImmutableArray<HandSummary> Summaries(ImmutableArray<HandResult> results) =>
    [
        .. from result in results
           where result.Subject == HandSubject.Comparison && result.Size95 is not null
           group result by result.Kind into kind
           let worst = kind.MaxBy(result => result.Size95)
           orderby kind.Count() descending
           select new HandSummary(
               kind.Key, kind.Count(), Math.Sqrt(kind.Average(result => result.Size95!.Value * result.Size95.Value)), worst.Size95!.Value, worst.Label),
    ];

    /// <summary>What the two computations say of one quantity.</summary>
    private sealed class Figures(Quantity quantity, FirstOrder firstOrder)
    {
        public Quantity Quantity { get; } = quantity;

        public FirstOrder FirstOrder { get; } = firstOrder;

        /// <summary>Zero where the rounding alone loses a crossing.</summary>
        public double Bias { get; set; }

        public Distribution? Trials { get; set; }

        public double? Sigma => Trials switch
        {
            null => FirstOrder.Sigma,
            { Kept: 0 } => null,
            { } trials => Quantity.IsPlace ? Math.Sqrt(Math.Max(0, trials.RootMeanSquare * trials.RootMeanSquare - Bias * Bias)) : trials.Deviation,
        };

        public double? Size95 => Trials switch
        {
            null => FirstOrder.Size95,
            { Kept: 0 } => null,
            { } trials => trials.SizePercentile(0.95),
        };
    }
}
