using System.Diagnostics;
using System.Globalization;
using System.Text.Json;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine.Json;

/// <summary>The acts in full, so that another program can repeat the whole layout with its own arithmetic.</summary>
internal static class ActsJson
{
    // A crossing angle is worked out in doubles; these decimals stand far above their rounding.
    private const string CrossingFormat = "0.#########";

    public static void Write(Utf8JsonWriter json, Layout layout, int? digits, CancellationToken cancellation)
    {
        NumberJson numbers = new(layout.Decider, digits);
        json.WriteString("title", layout.Title);
        numbers.WriteObject(json, "sheet", ("width", layout.Sheet.Width), ("height", layout.Sheet.Height));
        if (layout.Board is { } board)
            numbers.WriteObject(json, "board", ("width", board.Width), ("height", board.Height));
        json.WriteStartArray("acts");
        foreach (Act act in layout.Acts)
        {
            cancellation.ThrowIfCancellationRequested();
            json.WriteStartObject();
            json.WriteNumber("n", act.Number);
            WriteNames(json, "stage", TitlesOf(layout, act));
            WriteAct(json, act, numbers);
            json.WriteString("says", act.Says);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    // From the outermost stage to the act's own: a recipe's stage 3.1 lies under stage 3.
    private static IEnumerable<string> TitlesOf(Layout layout, Act act)
    {
        Stage own = layout.Stages[act.Stage];
        return layout.Stages.Where(stage => stage == own || own.Number.StartsWith(stage.Number + '.', StringComparison.Ordinal)).OrderBy(stage => stage.Number.Length).Select(stage => stage.Title);
    }

    private static void WriteAct(Utf8JsonWriter json, Act act, NumberJson numbers)
    {
        json.WriteString("act", NameOf(act));
        if (act.Makes is { } mark)
            json.WriteString("makes", mark.Name);
        else
            json.WriteNull("makes");
        switch (act)
        {
            case Locate locate:
                WritePoint(json, "point", locate.Point.Point, numbers);
                break;
            case Lay lay:
                WriteLay(json, lay, numbers);
                break;
            case SetOpening set:
                WriteOpening(json, set, numbers);
                break;
            case Swing swing:
                WriteSwing(json, swing, numbers);
                break;
            case Cross cross:
                WriteCross(json, cross, numbers);
                break;
            case Protract protract:
                WriteProtract(json, protract, numbers);
                break;
            case Slide slide:
                WriteSlide(json, slide, numbers);
                break;
        }
    }

    private static string NameOf(Act act) => act switch
    {
        Locate => "locate",
        Lay => "lay",
        SetOpening => "set",
        Swing => "swing",
        Cross => "cross",
        Protract => "protract",
        Slide => "slide",
        _ => throw new UnreachableException($"No JSON for {act.GetType().Name}."),
    };

    private static void WriteLay(Utf8JsonWriter json, Lay lay, NumberJson numbers)
    {
        WriteNames(json, "through", [lay.First.Name, lay.Second.Name]);
        Line line = lay.Line.Line;
        numbers.WriteObject(json, "line", ("x", line.Start.X), ("y", line.Start.Y), ("dx", line.Direction.X), ("dy", line.Direction.Y));
    }

    private static void WriteOpening(Utf8JsonWriter json, SetOpening set, NumberJson numbers)
    {
        switch (set.Opening)
        {
            case SpanOpening span:
                WriteNames(json, "span", [span.First.Name, span.Second.Name]);
                break;
            case ScaleOpening scale:
                numbers.Write(json, ("length", scale.Length));
                break;
            case FreeOpening free:
                numbers.Write(json, ("free", free.Length));
                break;
            default:
                throw new UnreachableException($"No JSON for {set.Opening.GetType().Name}.");
        }
    }

    private static void WriteSwing(Utf8JsonWriter json, Swing swing, NumberJson numbers)
    {
        json.WriteString("centre", swing.Centre.Name);
        numbers.Write(json, ("radius", swing.Circle.Circle.Radius));
    }

    private static void WriteCross(Utf8JsonWriter json, Cross cross, NumberJson numbers)
    {
        WriteNames(json, "of", [cross.First.Name, cross.Second.Name]);
        WritePoint(json, "point", cross.Point.Point, numbers);
        json.WriteString("crossing", CrossingAngle.Degrees((Curve)cross.First.Figure, (Curve)cross.Second.Figure, cross.Point.Point).ToString(CrossingFormat, CultureInfo.InvariantCulture));
    }

    private static void WriteProtract(Utf8JsonWriter json, Protract protract, NumberJson numbers)
    {
        json.WriteString("line", protract.Base.Name);
        json.WriteString("at", protract.At.Name);
        numbers.Write(json, ("by", protract.By.Degrees));
        WriteDirection(json, protract.Line.Line, numbers);
    }

    private static void WriteSlide(Utf8JsonWriter json, Slide slide, NumberJson numbers)
    {
        json.WriteString("line", slide.Base.Name);
        json.WriteString("through", slide.Through.Name);
        WriteDirection(json, slide.Line.Line, numbers);
    }

    private static void WriteDirection(Utf8JsonWriter json, Line line, NumberJson numbers) =>
        numbers.WriteObject(json, "direction", ("dx", line.Direction.X), ("dy", line.Direction.Y));

    private static void WritePoint(Utf8JsonWriter json, string name, Point point, NumberJson numbers) => numbers.WriteObject(json, name, ("x", point.X), ("y", point.Y));

    private static void WriteNames(Utf8JsonWriter json, string name, IEnumerable<string> names)
    {
        json.WriteStartArray(name);
        foreach (string each in names)
            json.WriteStringValue(each);
        json.WriteEndArray();
    }
}
