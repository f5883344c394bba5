using RuleAndCompass.Language.Grammar;

namespace RuleAndCompass.Tests.Language;

/// <summary>The reference says what the reader does: its examples are read here.</summary>
public sealed class LanguageReferenceTests
{
    public static TheoryData<string> Examples => [.. Fenced(Reference[..FindingsStart])];

    public static TheoryData<string, string> FindingExamples
    {
        get
        {
            TheoryData<string, string> examples = [];
            foreach (string entry in Reference[FindingsStart..].Split("\n### ").Skip(1).Where(entry => entry.StartsWith("RC1", StringComparison.Ordinal)))
            {
                string code = entry[..6];
                if (string.CompareOrdinal(code, "RC1090") < 0)
                    examples.Add(code, Fenced(entry).Single());
            }

            return examples;
        }
    }

    private static string Reference => LanguageFindingsTests.LanguageReference();

    private static int FindingsStart => Reference.IndexOf("\n## Findings\n", StringComparison.Ordinal);

    [Theory]
    [MemberData(nameof(Examples))]
    public void Every_example_is_read_without_a_finding(string example) => ScriptReader.Read("example", example).Diagnostics.ShouldBeEmpty();

    [Theory]
    [MemberData(nameof(FindingExamples))]
    public void Every_example_of_a_finding_gives_it_and_nothing_else(string code, string example) =>
        ScriptReader.Read("example", example).Diagnostics.Select(finding => finding.Code).Distinct().ShouldBe([code]);

    [Fact]
    public void Every_sentence_shown_in_running_text_or_a_table_is_read()
    {
        // a span of code that begins with a sentence word and goes on is a sentence
        List<string> sentences = [.. Reference[..Reference.IndexOf("\n## Grammar\n", StringComparison.Ordinal)].Split('`')
            .Where((piece, i) => i % 2 == 1 && piece.Contains(' ', StringComparison.Ordinal) && SentenceForms.Begins(piece.Split(' ')[0]) && !piece.Contains('…', StringComparison.Ordinal) && !piece.Contains('\n', StringComparison.Ordinal))];

        sentences.Count.ShouldBeGreaterThan(50);
        foreach (string sentence in sentences)
        {
            string script = sentence.Split(' ')[0] switch
            {
                "needs" or "gives" or "trade" or "source" => $"recipe \"r\"\n{sentence}\nend",
                "for" or "when" or "recipe" => $"{sentence}\nend",
                _ => sentence,
            };
            ScriptReader.Read("reference", script).Diagnostics.ShouldBeEmpty(sentence);
        }
    }

    [Fact]
    public void Every_sentence_has_a_section_and_every_word_is_listed()
    {
        foreach (string word in SentenceForms.Words)
            Reference.ShouldContain($"\n### {word}\n");
        foreach (string word in Vocabulary.LittleWords.Concat(Vocabulary.Units).Concat(Vocabulary.Functions).Concat(Vocabulary.Forms).Concat(Vocabulary.PlaceWords))
            Reference.ShouldContain(word);
    }

    [Fact]
    public void The_little_words_are_listed_as_they_are()
    {
        string start = Reference[Reference.IndexOf("\n> about ", StringComparison.Ordinal)..];
        string list = start[..start.IndexOf("\n\n", StringComparison.Ordinal)];

        list.Split([' ', '\n', '>'], StringSplitOptions.RemoveEmptyEntries).ShouldBe(Vocabulary.LittleWords.Order(StringComparer.Ordinal));
    }

    private static IEnumerable<string> Fenced(string text)
    {
        string[] lines = text.Split('\n');
        for (int i = 0; i < lines.Length; i++)
        {
            if (!lines[i].StartsWith("```", StringComparison.Ordinal))
                continue;
            int end = Array.IndexOf(lines, "```", i + 1);
            if (lines[i] == "```")
                yield return string.Join('\n', lines[(i + 1)..end]);
            i = end;
        }
    }
}
