using System.Globalization;
using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.Bench;

/// <summary>What the bench finds delicate or out of reach, one factory each. The figure stands; all are warnings.</summary>
internal static class BenchFindings
{
    public static Diagnostic PointOff(Act act, string point, bool isBoard, double byMillimetres, string side) => new(
        "RC3101",
        Severity.Warning,
        $"act {act.Number}: `{point}` lies {Millimetres(byMillimetres)} off the {(isBoard ? "board" : "sheet")}, beyond its {side} edge",
        act.Span,
        isBoard ? "use a larger `board`, or move or shrink the layout" : "lay the sheet on a `board`, move or shrink the layout, or use a larger sheet",
        act.File);

    public static Diagnostic KeptOff(string kept, double byMillimetres, string side, SourceSpan span, string? file) => new(
        "RC3102",
        Severity.Warning,
        $"what is kept of `{kept}` runs {Millimetres(byMillimetres)} off the sheet, beyond its {side} edge",
        span,
        "move or shrink the layout, keep less of it, or use a larger sheet",
        file);

    public static Diagnostic OpeningOutsideReach(Act act, string tool, double openingMillimetres, Reach reach, bool isTooWide, bool hasBeam) => new(
        "RC3103",
        Severity.Warning,
        $"act {act.Number}: {Millimetres(openingMillimetres)} is outside the reach of the {tool}, {Millimetres(reach.Least.ToDouble())} to {Millimetres(reach.Greatest.ToDouble())}",
        act.Span,
        isTooWide
            ? hasBeam ? "use a longer beam compass, or a smaller layout" : "add a `beam` compass to the kit, or make the layout smaller"
            : "use finer dividers, or a larger layout",
        act.File);

    public static Diagnostic LineTooLong(Act act, string line, double lengthMillimetres, double edgeMillimetres) => new(
        "RC3104",
        Severity.Warning,
        $"act {act.Number}: `{line}` is needed over {Millimetres(lengthMillimetres)}, and the straightedge is {Millimetres(edgeMillimetres)} long",
        act.Span,
        "use a longer straightedge, or draw the line in pieces that overlap by a third",
        act.File);

    public static Diagnostic WeakCrossing(Act act, string point, string first, string second, double degrees, string mend) => new(
        "RC3105",
        Severity.Warning,
        $"act {act.Number}: `{first}` and `{second}` cross at {Degrees(degrees)}, so `{point}` is loose along them: {Times(degrees)} the error of a square crossing",
        act.Span,
        mend,
        act.File);

    public static Diagnostic ShortBase(Act act, string line, string first, string second, double baseMillimetres, double usedMillimetres) => new(
        "RC3106",
        Severity.Warning,
        $"act {act.Number}: `{line}` is laid to `{first}` and `{second}`, {Millimetres(baseMillimetres)} apart, and used over {Millimetres(usedMillimetres)}",
        act.Span,
        $"lay it to points at least {Millimetres(usedMillimetres / 20)} apart, better half of its length; prick one farther out",
        act.File);

    public static Diagnostic PointsTooNear(Act act, string point, string other, int otherAct, double apartMillimetres) => new(
        "RC3107",
        Severity.Warning,
        $"act {act.Number}: `{point}` is pricked {Millimetres(apartMillimetres)} from `{other}` of act {otherAct}: the two can't be told apart at the bench",
        act.Span,
        "make the layout larger, or do without one of the two",
        act.File);

    public static string Millimetres(double length) => $"{length.ToString(
        length switch { < 0.1 => "0.####", < 1 => "0.##", < 100 => "0.#", _ => "0" }, CultureInfo.InvariantCulture)} mm";

    private static string Degrees(double degrees) => $"{degrees.ToString(degrees < 10 ? "0.##" : "0.#", CultureInfo.InvariantCulture)}°";

    private static string Times(double degrees) => degrees < 0.1
        ? "hundreds of times"
        : $"{(1 / Math.Sin(double.DegreesToRadians(degrees))).ToString("0", CultureInfo.InvariantCulture)} times";
}
