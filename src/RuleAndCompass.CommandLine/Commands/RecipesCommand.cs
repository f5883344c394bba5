using System.CommandLine;
using RuleAndCompass.CommandLine.Display;
using RuleAndCompass.CommandLine.Json;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Making;

namespace RuleAndCompass.CommandLine.Commands;

/// <summary><c>setout recipes [NAME]</c>: the built-in recipes, or the script of one.</summary>
internal static class RecipesCommand
{
    public static Command Build(Surroundings surroundings)
    {
        Argument<string?> name = new("NAME") { Description = "A recipe, its name in quotes or closed up by hyphens", Arity = ArgumentArity.ZeroOrOne };
        name.CompletionSources.Add(_ => RecipeBook.Names.Select(known => new System.CommandLine.Completions.CompletionItem(known)));
        Command command = new("recipes", "List the built-in recipes, or print the script of one")
        {
            name, surroundings.Options.Json,
        };
        command.SetAction(parsed => Run(parsed.GetValue(name), parsed.GetValue(surroundings.Options.Json), surroundings.Terminal));
        return command;
    }

    /// <summary>A recipe of the book.</summary>
    /// <exception cref="StopException">There is no such recipe.</exception>
    public static Recipe Find(string name) => RecipeBook.Find(name) ?? throw new StopException(
        CommandLineFindings.UnknownRecipe(name, NearName.Find(RecipeBook.ClosedUp(name), RecipeBook.Names)?.Replace('-', ' ')), ExitCode.CommandLineWrong);

    private static int Run(string? name, bool asJson, Terminal terminal)
    {
        if (name is not null)
        {
            Recipe recipe = Find(name);
            terminal.Output.Write(asJson ? Json([recipe]) : RecipeBook.FindText(name));
            return ExitCode.Well;
        }

        Recipe[] recipes = [.. RecipeBook.Names.Select(RecipeBook.Find).OfType<Recipe>().OrderBy(recipe => recipe.Trade, StringComparer.Ordinal)];
        if (asJson)
        {
            terminal.Output.Write(Json(recipes));
        }
        else if (terminal.OutputIsTerminal)
        {
            Tables.Write(terminal, ["trade", "recipe", "what it does"], recipes.Select(recipe => (string[])[recipe.Trade ?? "", recipe.Title, recipe.Says ?? ""]));
        }
        else
        {
            int width = recipes.Max(recipe => recipe.Title.Length);
            foreach (IGrouping<string?, Recipe> trade in recipes.GroupBy(recipe => recipe.Trade))
            {
                terminal.Output.WriteLine(trade.Key ?? "other");
                foreach (Recipe recipe in trade)
                    terminal.Output.WriteLine($"  {recipe.Title.PadRight(width)}  {recipe.Says}".TrimEnd());
            }
        }

        return ExitCode.Well;
    }

    private static string Json(IEnumerable<Recipe> recipes) => ResultJson.Write(json => RecipesJson.Write(json, recipes));
}
