using System.Globalization;
using System.Text;
using RuleAndCompass.Bench;
using RuleAndCompass.Geometry;
using RuleAndCompass.Making;

namespace RuleAndCompass.Comparing;

/// <summary>The acts as numbered sentences under their stages, as plain text.</summary>
public static class StepsText
{
    private const int Measure = 96;

    // Squarer than this, nobody needs to be told.
    private const double SquareEnoughDegrees = 60;

    /// <summary>Sets the acts out.</summary>
    public static string Render(Layout layout)
    {
        ArgumentNullException.ThrowIfNull(layout);
        StringBuilder text = new();
        if (layout.Title.Length > 0)
            text.Append(layout.Title).Append('\n');
        text.Append(CultureInfo.InvariantCulture, $"Sheet: {BenchText.Of(layout.Sheet)}\nKit: {BenchText.Of(layout.Kit)}\n");
        int numberWidth = layout.Acts.Length.ToString(CultureInfo.InvariantCulture).Length;
        int stage = -1;
        foreach (Act act in layout.Acts)
        {
            if (act.Stage != stage)
            {
                stage = act.Stage;
                text.Append(CultureInfo.InvariantCulture, $"\n{layout.Stages[stage].Number}  {layout.Stages[stage].Title}\n\n");
            }

            Wrapped(text, act.Number.ToString(CultureInfo.InvariantCulture).PadLeft(numberWidth) + "  ", act.Says + SizeOf(act, layout));
        }

        return text.ToString();
    }

    // What the sentence leaves out: how squarely curves cross, which span was taken.
    private static string SizeOf(Act act, Layout layout) => act switch
    {
        Cross cross when CrossingAngle.Degrees((Curve)cross.First.Figure, (Curve)cross.Second.Figure, cross.Point.Point) is var degrees && degrees < SquareEnoughDegrees =>
            string.Create(CultureInfo.InvariantCulture, $" They cross at {degrees:0.#}°."),
        Swing swing => $" Its radius is {layout.Decider.ToFixed(swing.Circle.Circle.Radius, 2)} mm.",
        _ => "",
    };

    private static void Wrapped(StringBuilder text, string head, string sentence)
    {
        text.Append(head);
        int column = head.Length;
        bool first = true;
        foreach (string word in sentence.Split(' ', StringSplitOptions.RemoveEmptyEntries))
        {
            if (!first && column + 1 + word.Length > Measure)
            {
                text.Append('\n').Append(' ', head.Length);
                column = head.Length;
                first = true;
            }

            text.Append(first ? "" : " ").Append(word);
            column += word.Length + (first ? 0 : 1);
            first = false;
        }

        text.Append('\n');
    }
}
