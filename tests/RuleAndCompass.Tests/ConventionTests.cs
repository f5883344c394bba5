using System.Text.RegularExpressions;
using RuleAndCompass.Tests.Making;

namespace RuleAndCompass.Tests;

/// <summary>What the house keeps to, read from its source files.</summary>
public sealed partial class ConventionTests
{
    // Each room uses those before it. The recipe book is data and belongs to Making.
    private static readonly string[] Rooms = ["Numbers", "Geometry", "Language", "Bench", "Making", "Accuracy", "Comparing"];

    private static readonly (string Path, string Text)[] Library = [.. Sources(Path.Combine(MakingFiles.Repository, "src", "RuleAndCompass"))];

    private static readonly (string Path, string Text)[] AllProjects = [.. Sources(Path.Combine(MakingFiles.Repository, "src"))];

    public static TheoryData<string> LibraryFiles => [.. Library.Select(file => file.Path)];

    [Fact]
    public void There_is_something_to_read() => Library.Length.ShouldBeGreaterThan(100);

    [Theory]
    [MemberData(nameof(LibraryFiles))]
    public void A_room_uses_only_rooms_before_it(string path)
    {
        string text = Library.Single(file => file.Path == path).Text;
        int room = Array.IndexOf(Rooms, path.Split('/')[0]);
        room.ShouldBeGreaterThanOrEqualTo(0, $"{path} stands in no room");

        Namespace(text).ShouldStartWith($"RuleAndCompass.{Rooms[room]}");
        foreach (Match used in Room().Matches(text))
            Array.IndexOf(Rooms, used.Groups[1].Value).ShouldBeLessThanOrEqualTo(room, $"{path} uses {used.Value}");
    }

    [Fact]
    public void The_folder_is_the_namespace()
    {
        foreach ((string path, string text) in Library)
            Namespace(text).ShouldBe(string.Join('.', ["RuleAndCompass", .. path.Split('/')[..^1]]), path);
    }

    [Fact]
    public void The_parser_library_stays_inside_the_grammar() =>
        AllProjects.Where(file => file.Text.Contains("Sprache", StringComparison.Ordinal)).Select(file => file.Path)
            .ShouldAllBe(path => path.StartsWith("RuleAndCompass/Language/Grammar/", StringComparison.Ordinal));

    [Fact]
    public void The_drawing_library_stays_inside_the_plates() =>
        AllProjects.Where(file => file.Text.Contains("SkiaSharp", StringComparison.Ordinal)).Select(file => file.Path)
            .ShouldAllBe(path => path.StartsWith("RuleAndCompass.Plates/", StringComparison.Ordinal));

    [Fact]
    public void The_library_asks_no_one_for_the_time_a_file_or_a_word()
    {
        // A limit of time is asked for by the caller and counts ticks since the start; trials alone have threads of their own.
        string[] mayCount = ["Making/Maker.cs", "Numbers/WorkLimit.cs"];
        foreach ((string path, string text) in Library)
        {
            string code = Code(text);
            World().Matches(code).Select(match => match.Value).ShouldBeEmpty(path);
            if (!mayCount.Contains(path))
                Clock().Matches(code).Select(match => match.Value).ShouldBeEmpty(path);
            if (!path.StartsWith("Accuracy/", StringComparison.Ordinal))
                Threads().Matches(code).Select(match => match.Value).ShouldBeEmpty(path);
        }
    }

    [Fact]
    public void Nothing_is_looked_up_by_reflection()
    {
        foreach ((string path, string text) in AllProjects)
            Reflection().Matches(Code(text)).Select(match => match.Value)
                .Where(used => used != "System.Reflection" || !text.Contains("GetManifestResource", StringComparison.Ordinal)).ShouldBeEmpty(path);
    }

    [Fact]
    public void What_decides_holds_no_tolerance()
    {
        // Doubles may bound a search, seed an interval or word a sentence; none is compared with a small number where something is decided.
        foreach ((string path, string text) in Library.Where(file => file.Path.StartsWith("Geometry/", StringComparison.Ordinal)))
            Tolerance().Matches(Code(text)).Select(match => match.Value).ShouldBeEmpty(path);
    }

    [Fact]
    public void Each_code_has_one_room()
    {
        Dictionary<string, string> owner = [];
        foreach ((string path, string text) in AllProjects)
            foreach (string code in CodeLiteral().Matches(Code(text)).Select(match => match.Groups[1].Value).Distinct())
                if (path.EndsWith("Findings.cs", StringComparison.Ordinal))
                    owner.TryAdd(code, path).ShouldBeTrue($"{code} stands in {owner[code]} and {path}");

        owner.Where(entry => entry.Value.EndsWith("MakingFindings.cs", StringComparison.Ordinal)).ShouldAllBe(entry => entry.Key.StartsWith("RC2", StringComparison.Ordinal));
        owner.Where(entry => entry.Value.EndsWith("LanguageFindings.cs", StringComparison.Ordinal)).ShouldAllBe(entry => entry.Key.StartsWith("RC1", StringComparison.Ordinal));
        owner.Where(entry => entry.Value.EndsWith("BenchFindings.cs", StringComparison.Ordinal)).ShouldAllBe(entry => entry.Key.StartsWith("RC3", StringComparison.Ordinal));
        owner.Where(entry => entry.Value.EndsWith("AccuracyFindings.cs", StringComparison.Ordinal)).ShouldAllBe(entry => entry.Key.StartsWith("RC4", StringComparison.Ordinal));
    }

    [Fact]
    public void Each_finding_of_the_making_is_explained_in_the_reference()
    {
        string reference = File.ReadAllText(Path.Combine(MakingFiles.Repository, "src", "RuleAndCompass", "Language", "README.md")).ReplaceLineEndings("\n");
        int findings = reference.IndexOf("\n## Findings\n", StringComparison.Ordinal);
        findings.ShouldBeGreaterThan(0);

        foreach (string code in MakingFindingsTests.Codes())
        {
            int start = reference.IndexOf($"\n### {code}\n", findings, StringComparison.Ordinal);
            start.ShouldBeGreaterThan(0, $"{code} is not explained");
            int end = reference.IndexOf("\n### ", start + 1, StringComparison.Ordinal);
            string entry = reference[start..(end < 0 ? reference.Length : end)];
            if (code != "RC2040")
                entry.ShouldContain("```", customMessage: $"{code} has no example");
            entry.Length.ShouldBeGreaterThan(120, $"{code} is hardly explained");
        }
    }

    private static IEnumerable<(string Path, string Text)> Sources(string folder) =>
        Directory.GetFiles(folder, "*.cs", SearchOption.AllDirectories)
            .Select(file => (Path: Path.GetRelativePath(folder, file).Replace('\\', '/'), Text: File.ReadAllText(file)))
            .Where(file => !file.Path.Split('/').Any(part => part is "obj" or "bin"))
            .OrderBy(file => file.Path, StringComparer.Ordinal);

    private static string Namespace(string text) => NamespaceLine().Match(text).Groups[1].Value;

    // The text without comments, which may speak of anything.
    private static string Code(string text) => Comment().Replace(text, "");

    [GeneratedRegex(@"\bRuleAndCompass\.(\w+)")]
    private static partial Regex Room();

    [GeneratedRegex(@"^namespace ([\w.]+);", RegexOptions.Multiline)]
    private static partial Regex NamespaceLine();

    [GeneratedRegex(@"(?<![""\w:])//.*$", RegexOptions.Multiline)]
    private static partial Regex Comment();

    [GeneratedRegex(@"\b(Console|Process|HttpClient)\.\w+|\bDateTime(Offset)?\.(Now|UtcNow|Today)|\b(File|Directory)\.[A-Z]\w*\(|\bEnvironment\.(?!TickCount64|ProcessorCount)\w+|\bnew Random\b|\bRandom\.Shared\b|\bGuid\.NewGuid\b")]
    private static partial Regex World();

    [GeneratedRegex(@"\bEnvironment\.TickCount64|\bStopwatch\b|\bTimeProvider\b")]
    private static partial Regex Clock();

    [GeneratedRegex(@"\bParallel\.\w+|\bnew Thread\b|\bTask\.Run\b|\bThreadPool\b")]
    private static partial Regex Threads();

    [GeneratedRegex(@"\bSystem\.Reflection\b(?!\.Metadata)|\.GetMethods?\(|\.GetProperties\(|\.GetFields?\(|\bActivator\.|\bType\.GetType\(|\bdynamic\s+\w+\s*=|\.MakeGenericType\(")]
    private static partial Regex Reflection();

    [GeneratedRegex(@"\b\d+(\.\d+)?[eE]-\d+|[Ee]psilon|\bMath\.Abs\(")]
    private static partial Regex Tolerance();

    [GeneratedRegex(@"""(RC\d{4})""")]
    private static partial Regex CodeLiteral();
}
