using RuleAndCompass.Making;
using RuleAndCompass.Tests.References;

namespace RuleAndCompass.Tests.Making;

/// <summary>Another arithmetic follows the acts and lands on the same points.</summary>
public sealed class ReplayTests
{
    // Decimals hold a sheet to about 1e-25 mm; weak crossings lose some of it.
    private const double NearMillimetres = 1e-9;

    public static TheoryData<string> Scripts => [.. MakingFiles.Scripts];

    public static TheoryData<string, string, string> Dials
    {
        get
        {
            TheoryData<string, string, string> data = [];
            foreach (string recipe in HorizontalDialTests.Recipes)
                foreach (string latitude in (string[])["1°", "43°18'", "-33 1/3°", "89°"])
                    foreach (string kit in Kits)
                        data.Add(recipe, latitude, kit);
            return data;
        }
    }

    private static readonly string[] Kits =
    [
        "straightedge 2 m, dividers 1 mm to 400 mm, square, protractor, scale 1/2 mm",
        "straightedge 2 m, dividers 1 mm to 400 mm, scale 1/2 mm",
        "straightedge 2 m, dividers 1 mm to 400 mm, square, scale 1/2 mm",
        "straightedge 2 m, dividers 1 mm to 400 mm, protractor",
    ];

    [Theory]
    [MemberData(nameof(Scripts))]
    public void Each_script_replayed_lands_on_the_same_points(string path)
    {
        Layout layout = Layouts.Make(MakingFiles.ReadScript(path));

        (double off, string name) = Replay.Worst(layout);

        layout.Acts.Length.ShouldBeGreaterThan(10);
        off.ShouldBeLessThan(NearMillimetres, name);
    }

    [Theory]
    [MemberData(nameof(Dials))]
    public void Each_recipe_replayed_with_each_kit_lands_on_the_same_points(string recipe, string latitude, string kit)
    {
        Layout layout = Layouts.Make($"""
            sheet 2 m by 2 m
            kit {kit}
            given latitude = {latitude}
            prick O at (0, 0)
            rule noon through O toward 70°
            follow "{recipe}" as dial with centre = O, noon = noon, latitude = latitude, radius = 60 mm, first = -7, last = 7
            """);

        (double off, string name) = Replay.Worst(layout);

        off.ShouldBeLessThan(NearMillimetres, name);
    }

    [Fact]
    public void The_scale_of_chords_replayed_lands_on_the_same_points()
    {
        Layout layout = Layouts.Make("""
            prick A at (-80 mm, -60 mm)
            rule base through A toward right
            follow "scale of chords" as scale with start = A, base = base, radius = 100 mm, step = 5°
            prick K at (0, 40 mm)
            rule foot through K toward 20°
            follow "angle by the scale of chords" as slope with corner = K, base = foot, turn = 35°, start = A, chords = scale.C
            """);

        (double off, string name) = Replay.Worst(layout);

        off.ShouldBeLessThan(NearMillimetres, name);
    }
}
