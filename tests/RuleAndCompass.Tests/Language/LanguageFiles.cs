namespace RuleAndCompass.Tests.Language;

/// <summary>The text files beside the tests of the language.</summary>
internal static class LanguageFiles
{
    private static readonly string Folder = Path.Combine(FindRepository(), "tests", "RuleAndCompass.Tests", "Language");

    /// <summary>The text of a file beside these tests.</summary>
    public static string Read(params string[] path) => File.ReadAllText(Path.Combine([Folder, .. path]));

    /// <summary>The names of the files in a folder beside these tests, in order.</summary>
    public static IEnumerable<string> Names(string pattern, params string[] folder) =>
        Directory.GetFiles(Path.Combine([Folder, .. folder]), pattern).Select(file => Path.GetFileName(file)).Order(StringComparer.Ordinal);

    /// <summary>The lines <c>source => result</c> of a table; a line without an arrow gives its source back.</summary>
    public static TheoryData<string, string> Table(string name)
    {
        TheoryData<string, string> cases = [];
        foreach (string line in Read("Cases", name).Split('\n'))
        {
            if (string.IsNullOrWhiteSpace(line) || line.StartsWith('#'))
                continue;
            int arrow = line.IndexOf(" => ", StringComparison.Ordinal);
            if (arrow < 0)
                cases.Add(line.Trim(), line.Trim());
            else
                cases.Add(line[..arrow].Trim(), line[(arrow + 4)..].Trim());
        }

        return cases;
    }

    private static string FindRepository()
    {
        for (DirectoryInfo? folder = new(AppContext.BaseDirectory); folder is not null; folder = folder.Parent)
        {
            if (File.Exists(Path.Combine(folder.FullName, "RuleAndCompass.sln")))
                return folder.FullName;
        }

        throw new DirectoryNotFoundException("No folder above the tests holds RuleAndCompass.sln.");
    }
}
