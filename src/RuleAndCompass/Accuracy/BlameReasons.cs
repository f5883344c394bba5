using System.Collections.Immutable;
using System.Globalization;
using RuleAndCompass.Bench;

namespace RuleAndCompass.Accuracy;

/// <summary>Says in plain words why an act throws the work out.</summary>
internal sealed class BlameReasons
{
    // Settings nearer than this are the same setting made again; exactness is not at stake in a sentence.
    private const double SameSettingMillimetres = 1e-6;

    private readonly Dictionary<int, Act> acts;
    private readonly ImmutableDictionary<LineMark, LineUse> uses;
    private readonly ILookup<SetOpening, Swing> swings;
    private readonly Dictionary<long, int> settings = [];

    public BlameReasons(ImmutableArray<Act> acts, IEnumerable<KeptEnd> keptEnds)
    {
        this.acts = acts.ToDictionary(act => act.Number);
        uses = LineUse.Of(acts, keptEnds);
        swings = acts.OfType<Swing>().ToLookup(swing => swing.Setting);
        foreach (SetOpening set in acts.OfType<SetOpening>())
        {
            long key = Key(set);
            settings[key] = settings.GetValueOrDefault(key) + 1;
        }
    }

    /// <summary>The reason for an act's share; of the printed plate for 0.</summary>
    public string Why(int number) => number == 0 ? "the scale of the printed plate" : acts[number] switch
    {
        Locate { ByScale: true } locate => $"{locate.Point.Name} is measured by the scale",
        Locate locate => $"{locate.Point.Name} is taken off the printed plate",
        Cross cross => WhyCross(cross),
        Lay lay => WhyLay(lay),
        Protract protract => $"an angle by the protractor{Away(protract.Line, protract.At)}",
        Slide slide => $"squared from {slide.Base.Name}{Away(slide.Line, slide.Through)}",
        SetOpening set => WhySet(set),
        Swing swing => $"the needle is seated at {swing.Centre.Name}, for an arc of {Millimetres(swing.Setting.Opening.Length.ToDouble())}",
        _ => "",
    };

    private static string WhyCross(Cross cross)
    {
        string first = cross.First.Name;
        string second = cross.Second.Name;
        string curves = (cross.First is LineMark, cross.Second is LineMark) switch
        {
            (true, true) => $"the lines {first} and {second}",
            (false, false) => $"the arcs {first} and {second}",
            (true, false) => $"line {first} and arc {second}",
            (false, true) => $"arc {first} and line {second}",
        };
        double degrees = CrossingAngle.Degrees((Geometry.Curve)cross.First.Figure, (Geometry.Curve)cross.Second.Figure, cross.Point.Point);
        return $"{curves} cross at {degrees.ToString(degrees < 10 ? "0.#" : "0", CultureInfo.InvariantCulture)}°";
    }

    private string WhyLay(Lay lay)
    {
        double second = LineUse.Along(lay.Line.Line, lay.Second.Point);
        double first = LineUse.Along(lay.Line.Line, lay.First.Point);
        double away = uses.TryGetValue(lay.Line, out LineUse use)
            ? Math.Max(Math.Min(first, second) - use.FromMillimetres, use.ToMillimetres - Math.Max(first, second))
            : 0;
        string ruled = $"ruled from two points {Millimetres(Math.Abs(second - first))} apart";
        return away > Math.Abs(second - first) / 4 ? $"{ruled} and used {Millimetres(away)} away" : ruled;
    }

    private string WhySet(SetOpening set)
    {
        int afresh = settings[Key(set)];
        int arcs = swings[set].Count();
        string how = set.Opening switch
        {
            SpanOpening span => $"the span from {span.First.Name} to {span.Second.Name}",
            ScaleOpening { Setting: not null } => "an opening by the scale",
            ScaleOpening => "an opening off the printed plate",
            _ => "an opening",
        };
        return (afresh, arcs) switch
        {
            ( > 1, _) => $"the opening is set {Times(afresh)} afresh",
            (_, > 1) => $"{how}, which {arcs.ToString(CultureInfo.InvariantCulture)} arcs share",
            _ => how,
        };
    }

    private string Away(LineMark line, PointMark at)
    {
        if (!uses.TryGetValue(line, out LineUse use))
            return "";
        double from = LineUse.Along(line.Line, at.Point);
        double away = Math.Max(use.ToMillimetres - from, from - use.FromMillimetres);
        return away < 1 ? "" : $", used {Millimetres(away)} away";
    }

    private static long Key(SetOpening set) => (long)Math.Round(set.Opening.Length.ToDouble() / SameSettingMillimetres);

    private static string Times(int count) => count switch
    {
        2 => "twice",
        3 => "three times",
        4 => "four times",
        5 => "five times",
        6 => "six times",
        _ => $"{count.ToString(CultureInfo.InvariantCulture)} times",
    };

    private static string Millimetres(double length) => $"{length.ToString(length < 10 ? "0.#" : "0", CultureInfo.InvariantCulture)} mm";
}
