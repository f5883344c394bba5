using RuleAndCompass.Bench;
using RuleAndCompass.Making;

namespace RuleAndCompass.Comparing;

/// <summary>The sheet, the kit and the hand in words, as a report's head tells them.</summary>
public static class BenchText
{
    /// <summary><c>A4 upright, 210 mm by 297 mm</c>.</summary>
    public static string Of(Sheet sheet)
    {
        ArgumentNullException.ThrowIfNull(sheet);
        string size = $"{sheet.Width} mm by {sheet.Height} mm";
        return sheet.Name is null ? size : $"{sheet.Name}, {size}";
    }

    /// <summary><c>straightedge 600 mm, dividers 2 mm to 180 mm, square</c>.</summary>
    public static string Of(Kit kit)
    {
        ArgumentNullException.ThrowIfNull(kit);
        List<string> tools = [];
        if (kit.HasStraightedge)
            tools.Add(kit.Straightedge is { } length ? $"straightedge {length} mm" : "straightedge");
        if (kit.Dividers is { } dividers)
            tools.Add($"dividers {dividers.Least} mm to {dividers.Greatest} mm");
        else if (kit is { HasStraightedge: true, Straightedge: null })
            tools.Add("dividers");
        if (kit.Beam is { } beam)
            tools.Add($"beam {beam.Least} mm to {beam.Greatest} mm");
        if (kit.Square)
            tools.Add("square");
        if (kit.Protractor)
            tools.Add("protractor");
        if (kit.ScaleStep is { } step)
            tools.Add($"scale {step} mm");
        return tools.Count == 0 ? "nothing" : string.Join(", ", tools);
    }

    /// <summary><c>ordinary: prick 0.1 mm, edge 0.1 mm, opening 0.1 mm, scale 0.2 mm, protractor 0.25°, square 0.05°</c>.</summary>
    public static string Of(Hand hand)
    {
        ArgumentNullException.ThrowIfNull(hand);
        return FormattableString.Invariant($"{hand.Name}: prick {hand.PrickMillimetres:0.####} mm, edge {hand.EdgeMillimetres:0.####} mm, opening {hand.OpeningMillimetres:0.####} mm, ")
            + FormattableString.Invariant($"scale {hand.ScaleMillimetres:0.####} mm, protractor {hand.ProtractorDegrees:0.####}°, square {hand.SquareDegrees:0.####}°");
    }
}
