using System.Globalization;
using System.Text;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine;

/// <summary>Writes a script that follows a recipe, each of its needs filled in with something that a maker then changes.</summary>
internal sealed class StarterScript
{
    private const int MembersOfFamily = 3;

    private readonly StringBuilder text = new();
    private readonly List<string> arguments = [];
    private readonly Recipe recipe;
    private string? firstPoint;
    private int points;

    private StarterScript(Recipe recipe) => this.recipe = recipe;

    public static string For(Recipe recipe) => new StarterScript(recipe).Write();

    private string Write()
    {
        text.Append(CultureInfo.InvariantCulture, $"# Begun from the recipe \"{recipe.Title}\": change the figures to your own.\n");
        if (recipe.Says is { } says)
            text.Append(CultureInfo.InvariantCulture, $"# {says}\n");
        text.Append(CultureInfo.InvariantCulture, $"title \"{Capital(recipe.Title)}\"\nsheet A3 sideways\n\n");
        NeedClause[] measures = [.. recipe.Needs.Where(need => Written(need.Kind.Text) is not null)];
        foreach (NeedClause need in measures)
            Give(need);
        if (measures.Length > 0)
            text.Append('\n');

        // Points first: lines and circles need one to pass through.
        NeedClause[] figures = [.. recipe.Needs.Except(measures).OrderBy(need => need.Kind.Text.StartsWith("point", StringComparison.Ordinal) ? 0 : 1)];
        if (recipe.Needs.Any(IsFamily))
            text.Append("# Where a whole family is needed, put the one that your script makes in place of these three.\n");
        foreach (NeedClause need in figures)
            Draw(need);
        if (figures.Length > 0)
            text.Append('\n');

        text.Append(CultureInfo.InvariantCulture, $"follow \"{recipe.Title}\" as {Alias()}");
        if (arguments.Count > 0)
            text.Append("\n  with ").AppendJoin(",\n  ", arguments);
        text.Append('\n');
        text.Append(CultureInfo.InvariantCulture, $"# It gives {string.Join(", ", recipe.Gives.Select(give => $"{Alias()}.{give.Name.Text}"))}: keep what the finished piece shows.\n");
        return text.ToString();
    }

    private static bool IsFamily(NeedClause need) => need.Kind.Text is not "text" && need.Kind.Text.EndsWith('s');

    // What stands for a quantity of this kind where the recipe names none; null for figures.
    private static string? Written(string kind) => kind switch
    {
        "number" or "numbers" => "6",
        "length" or "lengths" => "60 mm",
        "angle" or "angles" => "45°",
        "text" or "texts" => "\"…\"",
        _ => null,
    };

    private void Give(NeedClause need)
    {
        string name = need.Name.Text;
        if (need.Kind.Text is "numbers" or "lengths" or "angles" or "texts")
        {
            for (int index = 1; index <= MembersOfFamily; index++)
                text.Append(CultureInfo.InvariantCulture, $"let {name}[{index}] = {Written(need.Kind.Text)}\n");
        }
        else
        {
            // A need with a value of its own may be left out; it is shown, to be changed.
            string word = need.Kind.Text == "text" ? "let" : "given";
            text.Append(CultureInfo.InvariantCulture, $"{word} {name} = {(object?)need.Default ?? Written(need.Kind.Text)}\n");
        }

        arguments.Add($"{name} = {name}");
    }

    private void Draw(NeedClause need)
    {
        string name = need.Name.Text;
        switch (need.Kind.Text)
        {
            case "point":
                Prick(name);
                break;
            case "points":
                for (int index = 1; index <= MembersOfFamily; index++)
                    Prick($"{name}[{index}]");
                break;
            case "line":
                text.Append(CultureInfo.InvariantCulture, $"rule {name} through {Point()} toward up\n");
                break;
            case "lines":
                for (int index = 1; index <= MembersOfFamily; index++)
                    text.Append(CultureInfo.InvariantCulture, $"rule {name}[{index}] through {Point()} toward {index * 30}°\n");
                break;
            case "circle":
                text.Append(CultureInfo.InvariantCulture, $"strike {name} about {Point()} opening 60 mm\n");
                break;
            default:
                for (int index = 1; index <= MembersOfFamily; index++)
                    text.Append(CultureInfo.InvariantCulture, $"strike {name}[{index}] about {Point()} opening {index * 20} mm\n");
                break;
        }

        arguments.Add($"{name} = {name}");
    }

    private string Point()
    {
        if (firstPoint is null)
            Prick("middle");
        return firstPoint!; // Pricked at the latest just now.
    }

    // The first in the middle of the sheet, others about it where no three are on one line.
    private void Prick(string name)
    {
        (int x, int y) = points switch
        {
            0 => (0, 0),
            var count => (40 * count, 15 * count * count),
        };
        text.Append(CultureInfo.InvariantCulture, $"prick {name} at ({Length(x)}, {Length(y)})\n");
        firstPoint ??= name;
        points++;
    }

    private static string Length(int millimetres) => millimetres == 0 ? "0" : FormattableString.Invariant($"{millimetres} mm");

    private string Alias()
    {
        string alias = "work";
        while (recipe.Needs.Any(need => need.Name.Text == alias))
            alias += "_";
        return alias;
    }

    private static string Capital(string title) => char.ToUpperInvariant(title[0]) + title[1..];
}
