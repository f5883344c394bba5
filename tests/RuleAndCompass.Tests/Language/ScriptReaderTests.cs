using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Tests.Language;

public sealed class ScriptReaderTests
{
    public static TheoryData<string, string> Numbers => LanguageFiles.Table("Numbers.txt");

    public static TheoryData<string, string> Expressions => LanguageFiles.Table("Expressions.txt");

    public static TheoryData<string, string> Sentences => LanguageFiles.Table("Sentences.txt");

    public static TheoryData<string> Forms => [.. SentenceForms.All.SelectMany(entry => entry.Forms).Where(form => form != "end" && !form.StartsWith("otherwise", StringComparison.Ordinal))];

    public static TheoryData<string> Scripts => [.. LanguageFiles.Names("*.setout", "Cases", "Scripts")];

    [Theory]
    [MemberData(nameof(Numbers))]
    public void A_written_number_keeps_its_exact_value(string source, string expected)
    {
        Expression expression = ReadExpression(source);

        string read = expression switch
        {
            NumberLiteral number => $"number {Fraction(number.Value)}",
            LengthLiteral length => $"length {Fraction(length.Millimetres)}",
            AngleLiteral angle => $"angle {Fraction(angle.Degrees)}",
            _ => expression.GetType().Name,
        };
        read.ShouldBe(expected);
        expression.Span.ShouldBe(new SourceSpan(0, source.Length));
    }

    [Theory]
    [MemberData(nameof(Expressions))]
    public void An_expression_is_printed_as_it_was_meant(string source, string expected)
    {
        Expression expression = ReadExpression(source);

        string printed = expression.ToString();

        printed.ShouldBe(expected);
        Shape.Of(ReadExpression(printed)).ShouldBe(Shape.Of(expression));
    }

    [Theory]
    [MemberData(nameof(Sentences))]
    public void A_sentence_is_printed_as_it_was_meant(string source, string expected)
    {
        bool opens = source.Split(' ')[0] is "for" or "when" or "recipe";
        bool inRecipe = source.Split(' ')[0] is "needs" or "gives";
        string script = opens ? $"{source}\nend" : inRecipe ? $"recipe \"r\"\n{source}\nend" : source;

        Outcome<Script> outcome = ScriptReader.Read("case", script);

        if (expected == "!")
        {
            // `recipe` with a doubled brace is a plain text; the others have no meaning
            outcome.HasErrors.ShouldBe(!source.StartsWith("recipe", StringComparison.Ordinal));
            return;
        }

        outcome.Diagnostics.ShouldBeEmpty();
        Sentence sentence = outcome.Value!.Sentences.ShouldHaveSingleItem();
        string printed = (inRecipe ? ((RecipeBlock)sentence).Body[0] : sentence).ToString();
        (opens ? printed[..printed.IndexOf('\n', StringComparison.Ordinal)] : printed).ShouldBe(expected);
    }

    [Theory]
    [MemberData(nameof(Forms))]
    public void Every_form_shown_in_hints_is_itself_a_sentence(string form)
    {
        string word = form.Split(' ')[0];
        string script = word is "for" or "when" or "recipe" ? $"{form}\nend"
            : word is "needs" or "gives" or "trade" or "source" ? $"recipe \"r\"\n{form}\nend"
            : form;

        Outcome<Script> outcome = ScriptReader.Read("form", script);

        outcome.Diagnostics.ShouldBeEmpty();
        TidyPrinter.Print(outcome.Value!).ShouldContain(form);
    }

    [Theory]
    [MemberData(nameof(Scripts))]
    public void The_scripts_are_read_without_a_finding(string file)
    {
        string text = LanguageFiles.Read("Cases", "Scripts", file);

        Outcome<Script> outcome = ScriptReader.Read(file, text);

        outcome.Diagnostics.ShouldBeEmpty();
        outcome.Value!.Sentences.Length.ShouldBeGreaterThan(10);
    }

    [Theory]
    [MemberData(nameof(Scripts))]
    public void Line_ends_of_either_kind_give_the_same_tree(string file)
    {
        string text = LanguageFiles.Read("Cases", "Scripts", file);

        Script plain = ScriptReader.Read(file, text).Value!;
        Script returned = ScriptReader.Read(file, text.Replace("\n", "\r\n", StringComparison.Ordinal)).Value!;
        Script olden = ScriptReader.Read(file, text.Replace('\n', '\r')).Value!;

        Shape.Of(returned.Sentences).ShouldBe(Shape.Of(plain.Sentences));
        Shape.Of(olden.Sentences).ShouldBe(Shape.Of(plain.Sentences));
    }

    [Fact]
    public void A_sentence_goes_on_after_a_comma_and_before_a_little_word()
    {
        const string Text = "kit square,\n  # the scale is kept dry\n\n  protractor\ncompare a with b\n  as \"x\"   # label\n  within 1'\nprick P\n at (0, 0)";

        Script script = ScriptReader.Read("joined", Text).Value!;

        script.Sentences.Select(sentence => sentence.ToString()).ShouldBe(["kit square, protractor", "compare a with b as \"x\" within 1'", "prick P at (0, 0)"]);
        script.Comments.Select(comment => comment.Text).ShouldBe(["# the scale is kept dry", "# label"]);
    }

    [Fact]
    public void Blocks_are_nested_and_know_where_they_end()
    {
        const string Text = "for i = 1 to 3\n  when i = 2\n    keep a\n  otherwise when i = 3\n    keep b\n  otherwise\n    keep c\n  end\nend\nkeep d";

        Script script = ScriptReader.Read("blocks", Text).Value!;

        script.Sentences.Length.ShouldBe(2);
        ForBlock loop = script.Sentences[0].ShouldBeOfType<ForBlock>();
        WhenBlock choice = loop.Body.ShouldHaveSingleItem().ShouldBeOfType<WhenBlock>();
        choice.Branches.Select(branch => branch.Condition?.ToString()).ShouldBe(["i = 2", "i = 3", null]);
        choice.Branches.Select(branch => branch.Body.Single().ToString()).ShouldBe(["keep a", "keep b", "keep c"]);
        Text.Substring(loop.Span.Start, loop.Span.Length).ShouldEndWith("end\nend");
        Text.Substring(choice.Branches[1].Span.Start, choice.Branches[1].Span.Length).ShouldBe("otherwise when i = 3\n    keep b");
        loop.ToString().ShouldBe(Text[..Text.LastIndexOf('\n')]);
    }

    [Fact]
    public void Spans_begin_and_end_on_what_they_mean()
    {
        const string Text = "  rule hour[ 3 ]  through  O.a ,  T[h]   by square  # laid";

        RuleThrough rule = ScriptReader.Read("spans", Text).Value!.Sentences.Single().ShouldBeOfType<RuleThrough>();

        Shown(Text, rule).ShouldBe("rule hour[ 3 ]  through  O.a ,  T[h]   by square");
        Shown(Text, rule.Line).ShouldBe("hour[ 3 ]");
        Shown(Text, rule.First).ShouldBe("O.a");
        Shown(Text, rule.Second).ShouldBe("T[h]");
    }

    [Fact]
    public void A_value_in_a_text_keeps_its_place_in_the_script()
    {
        const string Text = "title \"for {{ {latitude + 1°:2} north\"";

        TitleSentence title = ScriptReader.Read("text", Text).Value!.Sentences.Single().ShouldBeOfType<TitleSentence>();

        ((PlainPiece)title.Text.Pieces[0]).Text.ShouldBe("for { ");
        ValuePiece value = title.Text.Pieces[1].ShouldBeOfType<ValuePiece>();
        Shown(Text, value).ShouldBe("{latitude + 1°:2}");
        Shown(Text, value.Value).ShouldBe("latitude + 1°");
        value.Form.ShouldBe("2");
    }

    [Fact]
    public void A_bad_sentence_does_not_hide_the_next()
    {
        const string Text = "prick O at (0, 0\nrule l through O tward up\nprick P at (1 mm, 0)\nkeep P\n";

        Outcome<Script> outcome = ScriptReader.Read("bad", Text);

        outcome.Diagnostics.Select(finding => finding.Code).ShouldBe(["RC1007", "RC1002"]);
        outcome.Value!.Sentences.Select(sentence => sentence.ToString()).ShouldBe(["prick P at (1 mm, 0)", "keep P"]);
        outcome.Value.UnreadNames.ShouldBe(["O", "l"], ignoreOrder: true);
    }

    [Fact]
    public void A_block_whose_first_line_is_bad_still_takes_its_end_and_its_sentences_are_read()
    {
        const string Text = "fro h = 1 to 5\n  prick T[h] at (0, 0)\n  rule l throgh A, B\nend\nkeep T";

        Outcome<Script> outcome = ScriptReader.Read("bad", Text);

        outcome.Diagnostics.Select(finding => finding.Code).ShouldBe(["RC1001", "RC1002"]);
        outcome.Value!.Sentences.ShouldHaveSingleItem().ToString().ShouldBe("keep T");
        outcome.Value.UnreadNames.ShouldBe(["h", "T", "l"], ignoreOrder: true);
    }

    [Theory]
    [InlineData("kit divders 2 mm to 3 mm,\nprick O at (0, 0)", "RC1002", "prick O at (0, 0)")]
    [InlineData("kit square,\nprick O at (0, 0)", "RC1006", "prick O at (0, 0)")]
    [InlineData("kit square; protractor,\nprick O at (0, 0)", "RC1013", "prick O at (0, 0)")]
    [InlineData("kti square,\nprick O at (0, 0)", "RC1001", "prick O at (0, 0)")]
    [InlineData("hand edj 0.1 mm,\nprick 0.1 mm\nkeep O", "RC1002", "keep O")]
    public void A_comma_after_a_fault_does_not_take_the_next_sentence_with_it(string text, string code, string kept)
    {
        Outcome<Script> outcome = ScriptReader.Read("comma", text);

        outcome.Diagnostics.ShouldHaveSingleItem().Code.ShouldBe(code);
        outcome.Value!.Sentences.ShouldHaveSingleItem().ToString().ShouldBe(kept);
    }

    [Fact]
    public void A_line_that_begins_with_a_sentence_word_may_go_on_with_the_line_before() =>
        ScriptReader.Read("hand", "hand edge 0.1 mm,\nprick 0.1 mm").Value!.Sentences.ShouldHaveSingleItem().ToString().ShouldBe("hand edge 0.1 mm, prick 0.1 mm");

    [Theory]
    [InlineData("")]
    [InlineData("keep a,\n")]
    [InlineData("let a = (,\n")]
    [InlineData("foo a,\nprick b,\n")]
    [InlineData("keep $,\n")]
    [InlineData("prick at at,\n")]
    [InlineData("needs a,\n")]
    [InlineData("a = b and\n")]
    [InlineData("when a = b\n")]
    [InlineData("recipe \"x\"\n")]
    [InlineData("end ")]
    [InlineData("\"\" ")]
    [InlineData("title \"{a}\" ")]
    [InlineData("1 ")]
    [InlineData("° ")]
    public void A_script_of_the_greatest_size_takes_no_longer_than_its_size(string piece)
    {
        string text = piece.Length == 0 ? "" : string.Concat(Enumerable.Repeat(piece, (4 << 20) / piece.Length));
        using CancellationTokenSource late = new(TimeSpan.FromSeconds(60));

        // a reader whose time grew with the square of the size would take hours
        Should.NotThrow(() => ScriptReader.Read("great", text, null, late.Token));
    }

    [Theory]
    [InlineData("", "")]
    [InlineData("\uFEFF# only a comment\n\n", "")]
    [InlineData("\uFEFFtitle \"x\"", "title \"x\"")]
    public void Empty_scripts_and_byte_order_marks_are_no_matter(string text, string printed)
    {
        Outcome<Script> outcome = ScriptReader.Read("empty", text);

        outcome.Diagnostics.ShouldBeEmpty();
        Shape.Of(outcome.Value!.Sentences).ShouldBe(Shape.Of(ScriptReader.Read("empty", printed).Value!.Sentences));
    }

    [Theory]
    [InlineData("43°18'", "43°18'")]
    [InlineData(" 80 mm # wide ", "80 mm")]
    [InlineData("R + 1 mm", "R + 1 mm")]
    public void A_lone_expression_is_read(string text, string printed) => ReadExpression(text).ToString().ShouldBe(printed);

    [Theory]
    [InlineData("", "RC1003")]
    [InlineData("  ", "RC1003")]
    [InlineData("80 nm", "RC1020")]
    [InlineData("80 mm 3", "RC1005")]
    [InlineData("(80 mm", "RC1007")]
    [InlineData("R/2/3", "RC1019")]
    [InlineData("80 €", "RC1013")]
    public void A_lone_expression_that_is_none_is_told(string text, string code)
    {
        Outcome<Expression> outcome = ScriptReader.ReadExpression(text);

        outcome.Value.ShouldBeNull();
        outcome.Diagnostics.ShouldHaveSingleItem().Code.ShouldBe(code);
    }

    [Fact]
    public void Limits_are_told_and_kept()
    {
        Codes("title \"abc\"", new ReadingLimits(MaximumBytes: 10)).ShouldBe(["RC1090"]);
        Codes("title \"ä\"", new ReadingLimits(MaximumBytes: 9)).ShouldBe(["RC1090"]);
        Codes("keep a\nkeep b\nkeep c", new ReadingLimits(MaximumSentences: 2)).ShouldBe(["RC1091"]);
        Codes("let a = " + new string('(', 101) + "1" + new string(')', 101)).ShouldBe(["RC1092"]);
        Codes("let a = " + new string('(', 5_000)).ShouldBe(["RC1092"]);
        Codes("let a = " + new string('-', 5_000) + "1").ShouldBe(["RC1092"]);
        Codes("let a = " + string.Concat(Enumerable.Repeat("a[", 5_000))).ShouldBe(["RC1092"]);
        Codes("let a = " + string.Concat(Enumerable.Repeat("sin(", 5_000)), new ReadingLimits(MaximumNesting: 1_000_000)).ShouldBe(["RC1092"]);
        Codes(string.Concat(Enumerable.Repeat("for i = 1 to 2\n", 101)) + string.Concat(Enumerable.Repeat("end\n", 101))).ShouldBe(["RC1092"]);
        Codes("let a = " + new string('1', 10_001)).ShouldBe(["RC1093"]);
        Codes("let a = 1" + string.Concat(Enumerable.Repeat(" + 1", 1_001))).ShouldBe(["RC1094"]);
        Codes("a\nb\nc", new ReadingLimits(MaximumFindings: 2)).ShouldBe(["RC1001", "RC1001", "RC1095"]);
    }

    [Fact]
    public void What_is_within_the_limits_is_read()
    {
        Codes("let a = " + new string('(', 98) + "1" + new string(')', 98)).ShouldBeEmpty();
        Codes("let a = " + new string('1', 10_000)).ShouldBeEmpty();
        Codes("let a = 1" + string.Concat(Enumerable.Repeat(" + 1", 1_000))).ShouldBeEmpty();
        Codes(string.Concat(Enumerable.Repeat("for i = 1 to 2\n", 100)) + string.Concat(Enumerable.Repeat("end\n", 100))).ShouldBeEmpty();
    }

    [Fact]
    public void Reading_ends_when_it_is_cancelled()
    {
        using CancellationTokenSource cancelled = new();
        cancelled.Cancel();

        Should.Throw<OperationCanceledException>(() => ScriptReader.Read("long", "keep a", null, cancelled.Token));
    }

    [Fact]
    public void A_finding_says_what_sort_of_thing_was_expected_in_source_order()
    {
        const string Text = "end\nlet a = (1 + ]\nwhen x\nend\nlet b = [";

        Outcome<Script> outcome = ScriptReader.Read("order", Text);

        outcome.Diagnostics.Select(finding => finding.Span.Start).ShouldBeInOrder();
        outcome.Diagnostics.Length.ShouldBe(4);
    }

    private static IEnumerable<string> Codes(string text, ReadingLimits? limits = null) =>
        ScriptReader.Read("limits", text, limits).Diagnostics.Select(finding => finding.Code);

    private static string Shown(string text, Node node) => text.Substring(node.Span.Start, node.Span.Length);

    private static string Fraction(Rational value) => value.IsInteger ? $"{value.Numerator}" : $"{value.Numerator}/{value.Denominator}";

    private static Expression ReadExpression(string source)
    {
        Outcome<Expression> outcome = ScriptReader.ReadExpression(source);
        outcome.Diagnostics.ShouldBeEmpty();
        return outcome.Value.ShouldNotBeNull();
    }
}
