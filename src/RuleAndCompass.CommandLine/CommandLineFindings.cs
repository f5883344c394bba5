using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.CommandLine;

/// <summary>What can be wrong with the command line and the files it names: codes RC6001 to RC6999.</summary>
internal static class CommandLineFindings
{
    public static Diagnostic NoSuchFile(string path) =>
        Error("RC6001", $"there is no file `{path}`", "look at the name and the folder; `-` reads standard input");

    public static Diagnostic CannotRead(string path, string why) => Error("RC6002", $"`{path}` cannot be read: {why}", null);

    public static Diagnostic NotText(string path, int position) =>
        Error("RC6003", FormattableString.Invariant($"`{path}` is not text in UTF-8: byte {position + 1} cannot be read"), "save it as UTF-8");

    public static Diagnostic TooLong(string path, int limit) =>
        Error("RC6004", FormattableString.Invariant($"`{path}` is longer than any script; the limit is {limit / 1_000_000} million bytes"), "is it a script?");

    public static Diagnostic CannotWrite(string path, string why) => Error("RC6005", $"`{path}` cannot be written: {why}", "name another place with `-o`");

    public static Diagnostic MadeByAnother(string path, string? script) => Error(
        "RC6006",
        script is null ? $"`{path}` exists and was not made by this program" : $"`{path}` exists and was made from `{script}`",
        "name another place with `-o`, or replace it with `--force`");

    public static Diagnostic BadArguments(string message, string? hint) => Error("RC6010", message, hint);

    public static Diagnostic NotNameAndValue(string text) =>
        Error("RC6011", $"`--given {text}` does not give a name its value", "write it so: `--given latitude=43°18'`");

    public static Diagnostic ValueNotRead(string name, string text, string why) =>
        Error("RC6011", $"the value of `--given {name}={text}` cannot be read: {why}", "write it as in a script, with its unit: `80 mm`, `43°18'`");

    public static Diagnostic GivenTwice(string name) => Error("RC6011", $"`--given` sets `{name}` twice", "once is enough");

    public static Diagnostic UnknownEnding(string path, string kind, string endings) =>
        Error("RC6012", $"`{path}` does not end in a format that {kind} can have", $"let its name end in {endings}");

    public static Diagnostic UnknownRecipe(string name, string? near) =>
        Error("RC6013", $"the book has no recipe `{name}`", near is null ? "`setout recipes` lists them" : $"is `{near}` meant?");

    public static Diagnostic NothingToExplain(string word, string? near) =>
        Error("RC6014", $"there is nothing to explain about `{word}`", near is null ? "`setout explain` alone prints the whole language" : $"is `{near}` meant?");

    public static Diagnostic NotTidy(string path) =>
        new("RC6015", Severity.Warning, $"`{path}` is not in the standard layout", default, $"`setout tidy {path}` puts it right");

    private static Diagnostic Error(string code, string message, string? hint) => new(code, Severity.Error, message, default, hint);
}
