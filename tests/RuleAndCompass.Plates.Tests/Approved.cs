namespace RuleAndCompass.Plates.Tests;

/// <summary>
/// Compares with a text under <c>Expected/</c>. With the environment variable <c>APPROVE</c> set, the text is written there instead, for the next look.
/// </summary>
internal static class Approved
{
    public static void ShouldMatch(string name, string text)
    {
        string path = Path.Combine(Repository.Root, "tests", "RuleAndCompass.Plates.Tests", "Expected", name);
        if (Environment.GetEnvironmentVariable("APPROVE") is not null)
        {
            File.WriteAllText(path, text);
        }

        text.ShouldBe(File.ReadAllText(path).ReplaceLineEndings("\n"));
    }
}

/// <summary>Finds the repository from where the tests run.</summary>
internal static class Repository
{
    public static string Root { get; } = Find();

    private static string Find()
    {
        DirectoryInfo? folder = new(AppContext.BaseDirectory);
        while (folder is not null && !File.Exists(Path.Combine(folder.FullName, "RuleAndCompass.sln")))
        {
            folder = folder.Parent;
        }

        return folder?.FullName ?? throw new InvalidOperationException("The tests run outside the repository.");
    }
}
