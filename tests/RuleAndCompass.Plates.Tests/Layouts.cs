using RuleAndCompass.Making;

namespace RuleAndCompass.Plates.Tests;

/// <summary>Layouts for tests, made from scripts.</summary>
internal static class Layouts
{
    public const string Empty = "title \"Nothing yet\"\n";

    public const string OnePoint = "title \"One point\"\nprick A at (0, 0)\n";

    public const string Gate = """
        title "Gate plate"
        note "Mind the grain."
        sheet 240 mm by 180 mm
        kit straightedge 300 mm, dividers 2 mm to 150 mm, square, protractor, scale 1/2 mm
        stage "The base"
        prick A at (-60 mm, -40 mm)
        prick B at (60 mm, -40 mm)
        rule base through A, B
        stage "The arcs"
        strike west about A through B
        strike east about B through A
        prick C where west meets east, above A
        rule plumb through C square to base
        prick D where plumb meets base
        rule slant through A turned 20° from base anticlockwise
        keep base from A to B heavy
        keep plumb from C to D
        letter "I" at D height 5 mm
        """;

    // Hour lines by the tangent: the sine of the latitude is laid off, so that the figures come from the construction.
    public const string Dial = """
        title "Dial for the wash-house at Carrow Holm"
        sheet A4 upright
        kit straightedge 600 mm, dividers 2 mm to 180 mm, square, protractor, scale 1/2 mm
        given latitude = 50°
        given R = 60 mm
        stage "The noon line"
        prick O at (-60 mm, -40 mm)
        rule noon through O toward up
        rule six through O square to noon
        strike rim about O opening R
        stage "The sine of the latitude"
        prick S where noon meets rim, ahead of O
        rule bar through S square to noon
        rule slant through O turned latitude from noon clockwise
        prick F at foot of S on slant
        stage "The tangents"
        strike lesser about S through F
        prick C where noon meets lesser, farthest from O
        rule plumb through C back along noon
        for h = 1 to 5
          rule ray[h] through C turned 15° * h from plumb anticlockwise
          prick T[h] where ray[h] meets bar
          rule hour[h] through O, T[h]
          keep hour[h] from O to T[h]
          compare angle from noon to hour[h] clockwise with atan(sin(latitude) * tan(15° * h)) timed by h
        end
        """;

    public static Layout Of(string script)
    {
        Language.Diagnostics.Outcome<Layout> made = Maker.Make("test.setout", script);
        return made.Value ?? throw new InvalidOperationException(string.Join("; ", made.Diagnostics.Select(finding => finding.Message)));
    }
}
