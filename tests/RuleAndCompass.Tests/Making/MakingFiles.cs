namespace RuleAndCompass.Tests.Making;

/// <summary>The repository's files that these tests read.</summary>
internal static class MakingFiles
{
    public static string Repository { get; } = FindRepository();

    private static readonly string Expected = Path.Combine(Repository, "tests", "RuleAndCompass.Tests", "Making", "Expected");

    /// <summary>The text of one of the pairs of script and report.</summary>
    public static string ReadExpected(string file) => File.ReadAllText(Path.Combine(Expected, file));

    /// <summary>The scripts that have a report beside them, in order.</summary>
    public static IEnumerable<string> Pairs => Directory.GetFiles(Expected, "*.setout").Select(file => Path.GetFileName(file)).Order(StringComparer.Ordinal);

    /// <summary>The example scripts, by their path in the repository.</summary>
    public static IEnumerable<string> Scripts =>
        Directory.GetFiles(Path.Combine(Repository, "scripts"), "*.setout", SearchOption.AllDirectories)
            .Concat(Directory.GetFiles(Path.Combine(Repository, "tests", "RuleAndCompass.Tests", "Language", "Cases", "Scripts"), "*.setout"))
            .Select(file => Path.GetRelativePath(Repository, file).Replace('\\', '/')).Order(StringComparer.Ordinal);

    public static string ReadScript(string path) => File.ReadAllText(Path.Combine(Repository, path));

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
