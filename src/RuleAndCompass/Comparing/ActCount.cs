using RuleAndCompass.Bench;

namespace RuleAndCompass.Comparing;

/// <summary>How many acts of each kind a layout takes.</summary>
public sealed record ActCount(int All, int Stages, int Locates, int Lays, int Settings, int Swings, int Crosses, int Protractions, int Slides)
{
    /// <summary>Counts a layout's acts.</summary>
    public static ActCount Of(Making.Layout layout)
    {
        ArgumentNullException.ThrowIfNull(layout);
        int Count<TAct>() => layout.Acts.Count(act => act is TAct);
        return new(
            layout.Acts.Length, layout.Acts.Select(act => act.Stage).Distinct().Count(), Count<Locate>(), Count<Lay>(), Count<SetOpening>(), Count<Swing>(), Count<Cross>(),
            Count<Protract>(), Count<Slide>());
    }

    /// <summary><c>62 acts in 3 stages: 2 points measured, 20 lines laid, …</c>; kinds that do not occur are left out.</summary>
    public override string ToString()
    {
        (int Count, string One, string Many)[] kinds =
        [
            (Locates, "point measured", "points measured"), (Lays, "line laid", "lines laid"), (Settings, "setting", "settings"), (Swings, "arc or circle", "arcs and circles"),
            (Crosses, "crossing pricked", "crossings pricked"), (Protractions, "angle by the protractor", "angles by the protractor"), (Slides, "line by the square", "lines by the square"),
        ];
        string parts = string.Join(", ", kinds.Where(kind => kind.Count > 0).Select(kind => Counted(kind.Count, kind.One, kind.Many)));
        return $"{Counted(All, "act", "acts")} in {Counted(Stages, "stage", "stages")}{(parts.Length > 0 ? $": {parts}" : "")}";
    }

    private static string Counted(int count, string one, string many) => FormattableString.Invariant($"{count} {(count == 1 ? one : many)}");
}
