using System.Collections.Immutable;
using System.Text;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Prints trees back in the one standard layout.</summary>
public static class TidyPrinter
{
    /// <summary>The whole script, comments kept, blocks indented by two spaces; printing twice changes nothing more.</summary>
    /// <remarks>
    /// What could not be read is not in the tree, so a script with errors would lose sentences: look for errors first. A comment within a sentence that goes
    /// over several lines moves above it. Several empty lines become one. A sentence longer than a line is parted after commas and before little words.
    /// </remarks>
    public static string Print(Script script)
    {
        ArgumentNullException.ThrowIfNull(script);
        ScriptPrinter printer = new(script);
        return printer.Print();
    }

    /// <summary>One node as it is written in a sentence; a block over several lines.</summary>
    public static string Print(Node node) => NodePrinter.Print(node);

    /// <summary>One node, with each index for which <paramref name="replace"/> gives a text printed as that text: <c>hour[3]</c> for <c>hour[h]</c>.</summary>
    public static string Print(Node node, Func<Expression, string?> replace) => NodePrinter.Print(node, replace);
}

/// <summary>Lays out the lines of one script.</summary>
internal sealed class ScriptPrinter(Script script)
{
    private const int LineLength = 120;
    private const string Indent = "  ";
    private const string GoingOn = "    ";

    private readonly StringBuilder _out = new();
    private readonly ImmutableArray<Comment> _comments = script.Comments;
    private int _nextComment;
    private int _lastEnd;

    public string Print()
    {
        PrintAll(script.Sentences, 0);
        while (_nextComment < _comments.Length)
            PrintComment(0);
        return _out.ToString();
    }

    private void PrintAll(ImmutableArray<Sentence> sentences, int depth)
    {
        foreach (Sentence sentence in sentences)
            PrintSentence(sentence, depth);
    }

    private void PrintSentence(Sentence sentence, int depth)
    {
        switch (sentence)
        {
            case ForBlock loop:
                PrintLine(loop with { Body = [] }, loop.Span.Start, HeaderEnd(loop.Ranges[^1].Span, loop.Span), depth, depth);
                PrintAll(loop.Body, depth + 1);
                PrintEnd(loop.Span, depth);
                break;
            case RecipeBlock recipe:
                PrintLine(recipe with { Body = [] }, recipe.Span.Start, HeaderEnd(recipe.Title.Span, recipe.Span), depth, depth);
                PrintAll(recipe.Body, depth + 1);
                PrintEnd(recipe.Span, depth);
                break;
            case WhenBlock choice:
                for (int i = 0; i < choice.Branches.Length; i++)
                {
                    WhenBranch branch = choice.Branches[i];
                    Sentence header = i == 0 ? choice with { Branches = [branch with { Body = [] }] } : new OtherwiseSentence(branch.Condition, default);
                    int end = branch.Condition is { } condition ? HeaderEnd(condition.Span, branch.Span) : branch.Span.Start + "otherwise".Length;
                    PrintLine(header, branch.Span.Start, end, depth, i == 0 ? depth : depth + 1);
                    PrintAll(branch.Body, depth + 1);
                }

                PrintEnd(choice.Span, depth);
                break;
            default:
                PrintLine(sentence, sentence.Span.Start, sentence.Span.End, depth, depth);
                break;
        }
    }

    private static int HeaderEnd(SourceSpan last, SourceSpan block) => Math.Max(last.End, block.Start);

    private void PrintEnd(SourceSpan block, int depth)
    {
        int start = Math.Max(block.End - "end".Length, _lastEnd);
        PrintLine(new EndSentence(block), start, block.End, depth, depth + 1);
    }

    private void PrintLine(Sentence sentence, int start, int end, int depth, int commentDepth)
    {
        while (_nextComment < _comments.Length && _comments[_nextComment].Span.Start < end)
            PrintComment(_comments[_nextComment].Span.Start < start ? commentDepth : depth);
        PrintBlankLine(start);
        string text = NodePrinter.Print(sentence);
        // a block without its body prints its `end` as well
        int newLine = text.IndexOf('\n', StringComparison.Ordinal);
        PrintWrapped(newLine < 0 ? text : text[..newLine], depth);
        _lastEnd = Math.Max(_lastEnd, end);
        if (_nextComment < _comments.Length && IsSameLine(end, _comments[_nextComment].Span.Start))
        {
            _out.Append("  ").Append(_comments[_nextComment].Text);
            _lastEnd = _comments[_nextComment++].Span.End;
        }

        _out.Append('\n');
    }

    private void PrintComment(int depth)
    {
        Comment comment = _comments[_nextComment++];
        PrintBlankLine(comment.Span.Start);
        PrintIndent(depth);
        _out.Append(comment.Text).Append('\n');
        _lastEnd = Math.Max(_lastEnd, comment.Span.End);
    }

    private void PrintBlankLine(int next)
    {
        if (_out.Length > 0 && next > _lastEnd && next <= script.Text.Length && CountLines(script.Text.AsSpan(_lastEnd, next - _lastEnd)) > 1)
            _out.Append('\n');
    }

    private bool IsSameLine(int end, int next) => next >= end && next <= script.Text.Length && CountLines(script.Text.AsSpan(end, next - end)) == 0;

    private static int CountLines(ReadOnlySpan<char> text)
    {
        int lines = 0;
        for (int i = 0; i < text.Length; i++)
        {
            if (text[i] == '\n' || (text[i] == '\r' && (i + 1 == text.Length || text[i + 1] != '\n')))
                lines++;
        }

        return lines;
    }

    private void PrintIndent(int depth)
    {
        for (int i = 0; i < depth; i++)
            _out.Append(Indent);
    }

    private void PrintWrapped(string line, int depth)
    {
        PrintIndent(depth);
        int room = Math.Max(LineLength - (depth * Indent.Length), LineLength / 2);
        if (line.Length <= room)
        {
            _out.Append(line);
            return;
        }

        (List<Token> tokens, _, _) = Lexer.Read(line, new ReadingLimits(), CancellationToken.None);
        int start = 0;
        int lastBreak = 0;
        for (int i = 1; i < tokens.Count; i++)
        {
            int at = tokens[i].Span.Start;
            if (at > start && tokens[i].Span.End - start > room && lastBreak > start)
            {
                Break(line.AsSpan(start, lastBreak - start), depth);
                start = lastBreak;
                room = Math.Max(LineLength - (depth * Indent.Length) - GoingOn.Length, LineLength / 2);
            }

            if (tokens[i - 1].IsSign(",") || (tokens[i].Kind == TokenKind.Word && Vocabulary.LittleWords.Contains(tokens[i].Text)))
                lastBreak = at;
        }

        if (line.Length - start > room && lastBreak > start)
        {
            Break(line.AsSpan(start, lastBreak - start), depth);
            start = lastBreak;
        }

        _out.Append(line.AsSpan(start));
    }

    private void Break(ReadOnlySpan<char> piece, int depth)
    {
        _out.Append(piece.TrimEnd(' ')).Append('\n');
        PrintIndent(depth);
        _out.Append(GoingOn);
    }
}
