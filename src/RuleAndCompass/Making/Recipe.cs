using System.Collections.Immutable;
using System.Text;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Making;

/// <summary>A construction that can be followed: a script with needs, in the same language.</summary>
/// <param name="Title">As it is followed.</param>
/// <param name="Needs">In order.</param>
/// <param name="Gives">In order.</param>
/// <param name="Trade">Where it stands in the book, or null.</param>
/// <param name="Says">Its first note, or null.</param>
/// <param name="Source">The book or law it rests on, or null.</param>
/// <param name="Body">Its sentences.</param>
public sealed record Recipe(
    string Title, ImmutableArray<NeedClause> Needs, ImmutableArray<GiveClause> Gives, string? Trade, string? Says, string? Source, ImmutableArray<Sentence> Body)
{
    /// <summary><c>`centre` point, `noon` line</c>.</summary>
    internal string NeedsInWords => string.Join(", ", Needs.Select(need => $"`{need.Name.Text}` {need.Kind.Text}"));

    /// <summary>What a block says of itself.</summary>
    public static Recipe Of(RecipeBlock block) => new(
        Plain(block.Title),
        [.. block.Body.OfType<NeedsSentence>().SelectMany(needs => needs.Needs)],
        [.. block.Body.OfType<GivesSentence>().SelectMany(gives => gives.Gives)],
        block.Body.OfType<TradeSentence>().Select(trade => Plain(trade.Text)).FirstOrDefault(),
        block.Body.OfType<NoteSentence>().Select(note => Plain(note.Text)).FirstOrDefault(),
        block.Body.OfType<SourceSentence>().Select(source => Plain(source.Text)).FirstOrDefault(),
        block.Body);

    /// <summary>A text without values in it.</summary>
    internal static string Plain(TextLiteral text) => string.Concat(text.Pieces.Select(piece => piece is PlainPiece plain ? plain.Text : piece.ToString()));
}

/// <summary>The recipe book that is built in: scripts, embedded one file each.</summary>
public static class RecipeBook
{
    private const string Folder = "RuleAndCompass.Recipes.";
    private const string Ending = ".setout";

    /// <summary>Names closed up, in order: <c>hours-by-the-sine-circle</c>.</summary>
    public static ImmutableArray<string> Names { get; } =
    [
        .. typeof(RecipeBook).Assembly.GetManifestResourceNames()
            .Where(name => name.StartsWith(Folder, StringComparison.Ordinal) && name.EndsWith(Ending, StringComparison.Ordinal))
            .Select(name => name[Folder.Length..^Ending.Length])
            .Order(StringComparer.Ordinal),
    ];

    /// <summary>The closed-up name of a title.</summary>
    public static string ClosedUp(string title) => title.Trim().ToLowerInvariant().Replace(' ', '-');

    /// <summary>The script of a recipe, by its title or closed-up name; null where there is none.</summary>
    public static string? FindText(string title)
    {
        using Stream? stream = typeof(RecipeBook).Assembly.GetManifestResourceStream(Folder + ClosedUp(title) + Ending);
        if (stream is null)
            return null;
        using StreamReader reader = new(stream, Encoding.UTF8);
        return reader.ReadToEnd();
    }

    /// <summary>A recipe, by its title or closed-up name; null where there is none.</summary>
    public static Recipe? Find(string title)
    {
        if (FindText(title) is not { } text)
            return null;
        Outcome<Script> read = ScriptReader.Read(ClosedUp(title) + Ending, text);
        return read.Value?.Sentences.OfType<RecipeBlock>().Select(Recipe.Of).FirstOrDefault();
    }
}

/// <summary>The recipes a script can follow: its own, those of scripts it uses, and the book.</summary>
internal sealed class RecipeShelf
{
    private readonly Dictionary<string, Recipe> recipes = new(StringComparer.Ordinal);

    /// <summary>True where a script to be used could not be read, so that a recipe may be missing for that reason.</summary>
    public bool IsIncomplete { get; private set; }

    /// <summary>What sentences that could not be read would have bound, here and in the scripts used.</summary>
    public HashSet<string> UnreadNames { get; } = new(StringComparer.Ordinal);

    public IEnumerable<string> Titles => recipes.Keys.Concat(RecipeBook.Names.Select(name => name.Replace('-', ' ')));

    public static RecipeShelf For(Script script, MakingOptions options, List<Diagnostic> findings, CancellationToken cancellation)
    {
        RecipeShelf shelf = new();
        shelf.UnreadNames.UnionWith(script.UnreadNames);
        foreach (RecipeBlock block in script.Sentences.OfType<RecipeBlock>())
        {
            Recipe recipe = Recipe.Of(block);
            if (!shelf.recipes.TryAdd(recipe.Title, recipe))
                findings.Add(MakingFindings.BoundTwice(recipe.Title, block.Title.Span));
        }

        foreach (UseSentence use in script.Sentences.OfType<UseSentence>())
            shelf.Use(use, options, findings, cancellation);
        return shelf;
    }

    public Recipe? Find(string title) => recipes.GetValueOrDefault(title) ?? FindBuiltIn(title);

    /// <summary>Whether a title is about sundials, so that their cautions belong on its plates.</summary>
    public static bool SpeaksOfDials(string? title) => title is not null && title.Contains("dial", StringComparison.OrdinalIgnoreCase);

    private Recipe? FindBuiltIn(string title)
    {
        Recipe? recipe = RecipeBook.Find(title);
        if (recipe is not null)
            recipes[title] = recipe;
        return recipe;
    }

    private void Use(UseSentence use, MakingOptions options, List<Diagnostic> findings, CancellationToken cancellation)
    {
        string name = Recipe.Plain(use.File);
        if (options.ReadScript?.Invoke(name) is not { } text)
        {
            findings.Add(MakingFindings.CannotUse(name, use.File.Span));
            IsIncomplete = true;
            return;
        }

        Outcome<Script> read = ScriptReader.Read(name, text, cancellation: cancellation);
        findings.AddRange(read.Diagnostics.Select(finding => finding with { File = name }));
        IsIncomplete |= read.HasErrors;
        UnreadNames.UnionWith(read.Value?.UnreadNames ?? []);
        foreach (RecipeBlock block in read.Value?.Sentences.OfType<RecipeBlock>() ?? [])
            recipes.TryAdd(Recipe.Plain(block.Title), Recipe.Of(block));
    }
}
