using System.Text.Json;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine.Json;

/// <summary>The recipe book as a list.</summary>
internal static class RecipesJson
{
    public static void Write(Utf8JsonWriter json, IEnumerable<Recipe> recipes)
    {
        json.WriteStartArray("recipes");
        foreach (Recipe recipe in recipes)
        {
            json.WriteStartObject();
            json.WriteString("name", recipe.Title);
            WriteNullable(json, "trade", recipe.Trade);
            WriteNullable(json, "says", recipe.Says);
            json.WriteStartArray("needs");
            foreach (NeedClause need in recipe.Needs)
            {
                json.WriteStartObject();
                json.WriteString("name", need.Name.Text);
                json.WriteString("kind", need.Kind.Text);
                WriteNullable(json, "default", need.Default?.ToString());
                json.WriteEndObject();
            }

            json.WriteEndArray();
            json.WriteStartArray("gives");
            foreach (GiveClause give in recipe.Gives)
            {
                json.WriteStartObject();
                json.WriteString("name", give.Name.Text);
                WriteNullable(json, "as", give.As is null ? null : Text(give.As));
                json.WriteEndObject();
            }

            json.WriteEndArray();
            WriteNullable(json, "source", recipe.Source);
            json.WriteBoolean("near", IsNear(recipe));
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    /// <summary>Whether a recipe is an approximation: the books write it so in the trade or in the first note.</summary>
    public static bool IsNear(Recipe recipe) =>
        recipe.Trade?.StartsWith("near", StringComparison.OrdinalIgnoreCase) == true || recipe.Says?.Contains("near construction", StringComparison.OrdinalIgnoreCase) == true;

    private static string Text(TextLiteral text) => string.Concat(text.Pieces.Select(piece => piece is PlainPiece plain ? plain.Text : piece.ToString()));

    private static void WriteNullable(Utf8JsonWriter json, string name, string? value)
    {
        if (value is null)
            json.WriteNull(name);
        else
            json.WriteString(name, value);
    }
}
