using CsCheck;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Tests.Language;

public sealed class TidyPrinterTests
{
    public static TheoryData<string> Scripts => [.. LanguageFiles.Names("*.setout", "Cases", "Scripts")];

    [Theory]
    [MemberData(nameof(Scripts))]
    public void A_printed_script_reads_back_as_the_same_tree(string file)
    {
        Script script = ScriptReader.Read(file, LanguageFiles.Read("Cases", "Scripts", file)).Value!;

        string printed = TidyPrinter.Print(script);
        Script again = ScriptReader.Read(file, printed).Value!;

        Shape.Of(again.Sentences).ShouldBe(Shape.Of(script.Sentences));
        again.Comments.Select(comment => comment.Text).ShouldBe(script.Comments.Select(comment => comment.Text));
        TidyPrinter.Print(again).ShouldBe(printed);
    }

    [Fact]
    public void Any_tree_printed_reads_back_as_itself() => Trees.Scripts.Sample(
        script =>
        {
            string printed = TidyPrinter.Print(script);
            Outcome<Script> again = ScriptReader.Read("again", printed);
            again.Diagnostics.ShouldBeEmpty(printed);
            Shape.Of(again.Value!.Sentences).ShouldBe(Shape.Of(script.Sentences), printed);
            TidyPrinter.Print(again.Value).ShouldBe(printed);
        },
        iter: 150,
        threads: 1);

    [Fact]
    public void Any_expression_printed_reads_back_as_itself() => Trees.Expressions.Sample(
        expression =>
        {
            string printed = expression.ToString();
            Outcome<Expression> again = ScriptReader.ReadExpression(printed);
            again.Diagnostics.ShouldBeEmpty(printed);
            Shape.Of(again.Value!).ShouldBe(Shape.Of(expression), printed);
        },
        iter: 4_000,
        threads: 1);

    [Fact]
    public void Comments_and_empty_lines_are_kept_and_blocks_indented()
    {
        const string Text = """
            # head


            title   "x"     # named
            for i=1 to 3    # three
            # first
            when i=2

               keep  a  # a
            # before otherwise
            otherwise   # else
            keep b
            end # of when
            # last in loop
            end   # of for
            compare a with b   # one
              as "x"     # two
              within 1'  # three
            # tail
            """;
        const string Tidy = """
            # head

            title "x"  # named
            for i = 1 to 3  # three
              # first
              when i = 2

                keep a  # a
                # before otherwise
              otherwise  # else
                keep b
              end  # of when
              # last in loop
            end  # of for
            # one
            # two
            compare a with b as "x" within 1'  # three
            # tail

            """;

        string printed = TidyPrinter.Print(ScriptReader.Read("tidy", Text).Value!);

        printed.ShouldBe(Tidy);
        TidyPrinter.Print(ScriptReader.Read("tidy", printed).Value!).ShouldBe(printed);
    }

    [Fact]
    public void A_long_sentence_is_parted_where_it_may_go_on()
    {
        const string Text = "compare angle from the_noon_line_of_the_dial to the_hour_line_of_the_dial[h] clockwise with atan(sin(latitude) * sin(15° * h), cos(15° * h)) as \"the hour of {h:clock}\" timed by h within 1/2 minutes";

        string printed = TidyPrinter.Print(ScriptReader.Read("long", "when a = b\n" + Text + "\nend").Value!);

        string[] lines = printed.Split('\n');
        lines[1].ShouldBe("  compare angle from the_noon_line_of_the_dial to the_hour_line_of_the_dial[h] clockwise");
        lines[2].ShouldBe("      with atan(sin(latitude) * sin(15° * h), cos(15° * h)) as \"the hour of {h:clock}\" timed by h within 1/2 minutes");
        lines.ShouldAllBe(line => line.Length <= 120);
    }

    [Fact]
    public void An_index_can_be_printed_worked_out()
    {
        Expression measure = ScriptReader.ReadExpression("angle from noon to dial.hour[h + 1] clockwise").Value!;

        string label = TidyPrinter.Print(measure, index => index.ToString() == "h + 1" ? "3" : null);

        label.ShouldBe("angle from noon to dial.hour[3] clockwise");
    }

    [Fact]
    public void A_node_prints_itself()
    {
        Script script = ScriptReader.Read("node", "prick P where a meets b, same side of l as Q").Value!;

        PrickWhere want = script.Sentences.Single().ShouldBeOfType<PrickWhere>();

        want.ToString().ShouldBe("prick P where a meets b, same side of l as Q");
        want.Choice!.ToString().ShouldBe("same side of l as Q");
        $"{want.First}".ShouldBe("a");
    }
}
