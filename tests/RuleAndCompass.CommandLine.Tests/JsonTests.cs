using System.Security.Cryptography;
using System.Text;
using System.Text.Json;
using Json.Schema;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine.Tests;

/// <summary>Every JSON result fits the schema that <c>setout explain json</c> prints.</summary>
public sealed class JsonTests
{
    private static readonly JsonSchema Schema = JsonSchema.FromText(Workshop.Run("explain", "json").Output);

    public static TheoryData<string> Commands => ["steps", "report", "check", "make", "hand --trials 500", "check --kit straightedge 300 mm, dividers 2 mm to 120 mm", "steps --digits 40"];

    [Theory]
    [MemberData(nameof(Commands))]
    public void A_result_fits_the_schema(string command)
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", Workshop.Triangle);
        int space = command.IndexOf(" --kit ", StringComparison.Ordinal);
        string[] args = space < 0 ? command.Split(' ') : [command[..space], "--kit", command[(space + 7)..]];

        Ran ran = Workshop.Run([args[0], script, .. args[1..], "--json", .. args[0] == "make" ? ["-o", workshop.At("out")] : Array.Empty<string>()]);

        ran.Status.ShouldBe(0, ran.Error);
        JsonElement result = Fits(ran.Output);
        result.GetProperty("script").GetString().ShouldBe("gable.setout");
        result.GetProperty("sha256").GetString().ShouldBe(Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(Workshop.Triangle))));
    }

    [Fact]
    public void Each_kind_of_act_fits_the_schema_and_names_only_what_stands()
    {
        using Workshop workshop = new();
        string script = workshop.Script("all.setout", """
            sheet A3 sideways
            kit straightedge 400 mm, dividers 2 mm to 150 mm, square, protractor, scale 1/2 mm
            prick A at (0, 0)
            rule l through A toward right
            rule m through A square to l by square
            rule n through A turned 20° from l anticlockwise by protractor
            strike c about A opening 40 mm
            prick B where l meets c, ahead of A
            prick C where n meets c, ahead of A
            rule h halving B to C by dividers
            strike d about B opening A to C

            """);

        Ran ran = Workshop.Run("steps", script, "--json");

        ran.Status.ShouldBe(0, ran.Error);
        JsonElement result = Fits(ran.Output);
        HashSet<string> kinds = [], standing = [];
        foreach (JsonElement act in result.GetProperty("acts").EnumerateArray())
        {
            kinds.Add(act.GetProperty("act").GetString()!);
            foreach (string key in (string[])["through", "of", "span", "centre", "line", "at"])
                if (act.TryGetProperty(key, out JsonElement names))
                    foreach (string name in names.ValueKind switch { JsonValueKind.Array => names.EnumerateArray().Select(name => name.GetString()!), JsonValueKind.String => [names.GetString()!], _ => [] })
                        standing.ShouldContain(name, $"act {act.GetProperty("n")}");
            if (act.GetProperty("makes").GetString() is { } made)
                standing.Add(made).ShouldBeTrue(made);
        }

        kinds.Order(StringComparer.Ordinal).ShouldBe(["cross", "lay", "locate", "protract", "set", "slide", "swing"]);
    }

    [Fact]
    public void Numbers_are_decimal_strings_with_their_exact_forms_beside_them()
    {
        using Workshop workshop = new();
        string script = workshop.Script("root.setout", "prick A at (0, 0)\nprick B at (10 mm, 10 mm * sqrt(2))\ncompare distance A to B with 15 mm as \"diagonal\"\ncompare A with (1 mm, 0) as \"corner\"\n");

        JsonElement result = Fits(Workshop.Run("report", script, "--json").Output);

        JsonElement diagonal = result.GetProperty("comparisons")[0], corner = result.GetProperty("comparisons")[1];
        diagonal.GetProperty("constructed").GetString().ShouldBe("17.320508075688773"); // 10√3: OEIS A002194, ...8772935, rounded
        diagonal.GetProperty("exact").GetProperty("constructed").GetString().ShouldBe("10√3");
        diagonal.GetProperty("computed").GetString().ShouldBe("15");
        diagonal.GetProperty("difference").GetString().ShouldStartWith("2.3205080756887729");
        diagonal.GetProperty("verdict").GetString().ShouldBe("proved");
        // 10√2: OEIS A002193; its seventeenth digit is a nought, which is as certain as the others.
        Fits(Workshop.Run("report", workshop.Script("two.setout", "prick A at (0, 0)\nprick B at (10 mm, 10 mm)\ncompare distance A to B with 0\n"), "--json").Output)
            .GetProperty("comparisons")[0].GetProperty("constructed").GetString().ShouldBe("14.142135623730950");
        corner.GetProperty("computed").GetProperty("x").GetString().ShouldBe("1");
        corner.GetProperty("difference").GetString().ShouldBe("1");
    }

    [Fact]
    public void Findings_have_their_places()
    {
        using Workshop workshop = new();
        string script = workshop.Script("wrong.setout", "prick A at (0, 0)\nrule l through A, B\n");

        Ran ran = Workshop.Run("check", script, "--json");

        ran.Status.ShouldBe(1);
        ran.Error.ShouldBe("");
        JsonElement finding = Fits(ran.Output).GetProperty("diagnostics")[0];
        finding.GetProperty("code").GetString().ShouldBe("RC2001");
        finding.GetProperty("severity").GetString().ShouldBe("error");
        (finding.GetProperty("line").GetInt32(), finding.GetProperty("column").GetInt32(), finding.GetProperty("endLine").GetInt32(), finding.GetProperty("endColumn").GetInt32())
            .ShouldBe((2, 19, 2, 20));
    }

    [Fact]
    public void Several_scripts_and_one_that_is_missing_fit_the_schema()
    {
        using Workshop workshop = new();
        string script = workshop.Script("gable.setout", $"{Workshop.Triangle}claim distance A to B = 1 mm\n");

        Ran several = Workshop.Run("check", script, workshop.At("nowhere.setout"), "--json");

        several.Status.ShouldBe(3);
        JsonElement scripts = Fits(several.Output).GetProperty("scripts");
        scripts.GetArrayLength().ShouldBe(2);
        scripts[0].GetProperty("claims")[1].GetProperty("verdict").GetString().ShouldBe("refuted");
        scripts[1].GetProperty("sha256").ValueKind.ShouldBe(JsonValueKind.Null);
        Fits(Workshop.Run("check", workshop.At("nowhere.setout"), "--json").Output);
    }

    [Fact]
    public void The_recipe_book_fits_the_schema()
    {
        JsonElement book = Fits(Workshop.Run("recipes", "--json").Output);

        book.GetProperty("recipes").GetArrayLength().ShouldBe(RecipeBook.Names.Length);
        foreach (string name in RecipeBook.Names)
            Fits(Workshop.Run("recipes", name, "--json").Output).GetProperty("recipes").GetArrayLength().ShouldBe(1);
    }

    [Fact]
    public void The_schema_refuses_what_it_should()
    {
        foreach (string wrong in (string[])["{}", """{ "format": "setout/2", "recipes": [] }""", """{ "format": "setout/1", "recipes": [ {} ] }""", """{ "format": "setout/1", "more": 1, "recipes": [] }"""])
        {
            using JsonDocument document = JsonDocument.Parse(wrong);
            Schema.Evaluate(document.RootElement).IsValid.ShouldBeFalse(wrong);
        }
    }

    private static JsonElement Fits(string json)
    {
        using JsonDocument document = JsonDocument.Parse(json);
        EvaluationResults results = Schema.Evaluate(document.RootElement, new EvaluationOptions { OutputFormat = OutputFormat.List });
        string faults = string.Join("\n", (results.Details ?? []).Where(detail => detail.Errors is { Count: > 0 }).SelectMany(detail => detail.Errors!.Select(error => $"{detail.InstanceLocation}: {error.Value}")).Take(12));
        results.IsValid.ShouldBeTrue(faults);
        document.RootElement.GetProperty("format").GetString().ShouldBe("setout/1");
        return document.RootElement.Clone();
    }
}
