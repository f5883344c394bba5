using System.Globalization;
using CsCheck;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Tests.Language;

/// <summary>Whatever is read, nothing is thrown, every finding lies within the text, and what is read clean prints back.</summary>
public sealed class FuzzTests
{
    private static readonly string[] Words =
    [
        .. SentenceForms.Words, .. Vocabulary.LittleWords, .. Vocabulary.PlaceWords, .. Vocabulary.Units, .. Vocabulary.Functions, .. Vocabulary.Kinds,
        "A", "O", "h", "noon", "(", ")", "[", "]", ",", ".", "=", "==", "<", ">=", "+", "-", "*", "/", ":", ";", "\"", "\"x\"", "\"{h}\"", "\"{h:\"", "\"{{", "}", "{", "#", "\n", "\n", "\r\n", "\t",
        "3", "1/2", "2 1/2", "2/0", "43°18'", "43°18", "30\"", "'", "°", "2h30m", "2h3", ".5", "5.", "1e9", "90mm", "2x", "99999999999999999999999999", "\uFEFF", "\0", "\uD800", "\uDC00", "🜚", "名", "é", "_", "`",
    ];

    private static readonly Gen<string> Soups = Gen.Select(Trees.Pick(Words), Trees.Pick(" ", " ", " ", "")).Select((word, gap) => word + gap).Array[0, 60].Select(string.Concat);

    private static readonly Gen<string> SentenceSoups = Gen.Select(Trees.Pick([.. SentenceForms.Words]), Trees.Pick(Words).Array[0, 12]).Select((first, rest) => $"{first} {string.Join(' ', rest)}");

    private static readonly string[] Scripts = [.. LanguageFiles.Names("*.setout", "Cases", "Scripts").Select(file => LanguageFiles.Read("Cases", "Scripts", file))];

    // A script with a few pieces cut out, doubled, moved or overwritten.
    private static readonly Gen<string> Mutants = Gen.Select(
        Trees.Pick(Scripts),
        Gen.Select(Gen.Int[0, 5], Gen.Double.Unit, Gen.Int[0, 30], Trees.Pick(Words)).Array[1, 6])
        .Select((script, changes) => changes.Aggregate(script, (text, change) =>
        {
            (int kind, double place, int length, string word) = change;
            int at = (int)(place * text.Length);
            int end = Math.Min(text.Length, at + length);
            return kind switch
            {
                0 => text.Remove(at, end - at),
                1 => text.Insert(at, text[at..end]),
                2 => text.Insert(at, word),
                3 => text[..at],
                4 => text.Remove(at, end - at).Insert(at, word),
                _ => text[at..] + text[..at],
            };
        }));

    [Fact]
    public void Token_soup_is_survived() => Soups.Sample(Check, iter: 10_000, threads: 1);

    [Fact]
    public void Sentences_of_random_words_are_survived() => SentenceSoups.Sample(Check, iter: 10_000, threads: 1);

    [Fact]
    public void Damaged_scripts_are_survived() => Mutants.Sample(Check, iter: 3_000, threads: 1);

    [Fact]
    public void Any_characters_are_survived() => Gen.String.Sample(Check, iter: 10_000, threads: 1);

    [Fact]
    public void Random_code_units_are_survived() => Gen.UShort.Array[0, 300].Select(units => new string([.. units.Select(unit => (char)unit)])).Sample(Check, iter: 3_000, threads: 1);

    [Fact]
    public void Random_bytes_are_survived() => Gen.Byte.Array[0, 500].Select(bytes => new string([.. bytes.Select(unit => (char)unit)])).Sample(Check, iter: 3_000, threads: 1);

    [Theory]
    [InlineData("(")]
    [InlineData("let a = (")]
    [InlineData("[")]
    [InlineData("-")]
    [InlineData("for i = 1 to 2\n")]
    [InlineData("when a = b\n")]
    [InlineData("otherwise\n")]
    [InlineData("end\n")]
    [InlineData("recipe \"x\"\n")]
    [InlineData("keep a,\n")]
    [InlineData("claim a = b and ")]
    [InlineData("\"")]
    [InlineData("{")]
    [InlineData("$ ")]
    [InlineData("1")]
    [InlineData("a.")]
    [InlineData("#\n")]
    [InlineData("not ")]
    [InlineData("title \"{")]
    [InlineData("1 1/1 ")]
    public void The_same_again_thirty_thousand_times_is_survived(string piece)
    {
        Check(string.Concat(Enumerable.Repeat(piece, 30_000)));
        Check("let a = " + string.Concat(Enumerable.Repeat(piece, 30_000)));
    }

    [Fact]
    public void Ten_megabytes_are_refused_in_one_finding()
    {
        Outcome<Script> outcome = ScriptReader.Read("large", new string('a', 10 << 20));

        outcome.Value.ShouldBeNull();
        outcome.Diagnostics.ShouldHaveSingleItem().Code.ShouldBe("RC1090");
    }

    private static void Check(string text)
    {
        Outcome<Script> outcome = ScriptReader.Read("fuzz", text);
        DiagnosticRenderer renderer = new("fuzz", text);
        foreach (Diagnostic finding in outcome.Diagnostics.Take(20))
        {
            finding.Span.Start.ShouldBeInRange(0, text.Length);
            finding.Span.End.ShouldBeInRange(finding.Span.Start, text.Length);
            renderer.Render(finding).ShouldContain(finding.Code);
        }

        outcome.Diagnostics.Select(finding => finding.Span.Start).ShouldBeInOrder();
        if (outcome.Value is null || outcome.HasErrors)
            return;
        string printed = TidyPrinter.Print(outcome.Value);
        Outcome<Script> again = ScriptReader.Read("again", printed);
        again.Diagnostics.ShouldBeEmpty(string.Create(CultureInfo.InvariantCulture, $"{text}\n---\n{printed}"));
        Shape.Of(again.Value!.Sentences).ShouldBe(Shape.Of(outcome.Value.Sentences), text);
        TidyPrinter.Print(again.Value).ShouldBe(printed);
    }
}
