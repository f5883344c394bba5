using System.Globalization;
using System.Text;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Cuts text into tokens, comments and findings. Reads all of its text, whatever it holds.</summary>
internal sealed class Lexer
{
    private readonly string _text;
    private readonly int _end;
    private readonly bool _inBraces;
    private readonly ReadingLimits _limits;
    private int _at;
    private bool _firstOnLine = true;

    private Lexer(string text, int start, int end, bool inBraces, ReadingLimits limits) =>
        (_text, _at, _end, _inBraces, _limits) = (text, start, end, inBraces, limits);

    private List<Token> Tokens { get; } = [];

    private List<Comment> Comments { get; } = [];

    private List<Diagnostic> Findings { get; } = [];

    /// <summary>Reads a whole script.</summary>
    public static (List<Token> Tokens, List<Comment> Comments, List<Diagnostic> Findings) Read(string text, ReadingLimits limits, CancellationToken cancellation)
    {
        Lexer lexer = new(text, 0, text.Length, inBraces: false, limits);
        lexer.ReadAll(cancellation);
        return (lexer.Tokens, lexer.Comments, lexer.Findings);
    }

    /// <summary>Reads what stands between the braces of a text.</summary>
    public static (List<Token> Tokens, List<Diagnostic> Findings) ReadBraces(string text, int start, int end, ReadingLimits limits)
    {
        Lexer lexer = new(text, start, end, inBraces: true, limits);
        lexer.ReadAll(CancellationToken.None);
        return (lexer.Tokens, lexer.Findings);
    }

    private void ReadAll(CancellationToken cancellation)
    {
        if (_at == 0 && _end > 0 && _text[0] == '\uFEFF')
            _at = 1;
        int untilCheck = 4096;
        while (_at < _end)
        {
            if (--untilCheck == 0)
            {
                cancellation.ThrowIfCancellationRequested();
                untilCheck = 4096;
            }

            ReadOne();
        }
    }

    private void ReadOne()
    {
        char c = _text[_at];
        if (c is '\n' or '\r')
        {
            _firstOnLine = true;
            _at++;
        }
        else if (IsBlank(c))
        {
            _at++;
        }
        else if (c == '#' && !_inBraces)
        {
            int end = LineEnd();
            int trimmed = end;
            while (IsBlank(_text[trimmed - 1]))
                trimmed--;
            Comments.Add(new Comment(_text[_at..trimmed], new SourceSpan(_at, trimmed - _at)));
            _at = end;
        }
        else if (char.IsAsciiDigit(c))
        {
            ReadNumber();
        }
        else if (LetterLength(_at) > 0)
        {
            ReadWord();
        }
        else if (c == '"' && !_inBraces)
        {
            ReadText();
        }
        else
        {
            ReadSign(c);
        }
    }

    private void ReadWord()
    {
        int start = _at;
        _at = WordEnd(_at);
        Add(new Token(TokenKind.Word, Vocabulary.Intern(_text.AsSpan(start, _at - start)), SpanFrom(start)));
    }

    private void ReadText()
    {
        int start = _at;
        int found = _text.AsSpan(start + 1, _end - start - 1).IndexOfAny('"', '\n', '\r');
        int close = found < 0 ? _end : start + 1 + found;
        if (close == _end || _text[close] != '"')
        {
            int last = close;
            while (IsBlank(_text[last - 1]))
                last--;
            _at = close;
            Fault(LanguageFindings.TextNotClosed(new SourceSpan(start, last - start)));
            return;
        }

        _at = close + 1;
        Add(new Token(TokenKind.Text, _text[(start + 1)..close], SpanFrom(start)));
    }

    private void ReadSign(char c)
    {
        int start = _at;
        string? sign = c switch
        {
            '(' => "(",
            ')' => ")",
            '[' => "[",
            ']' => "]",
            ',' => ",",
            '=' => "=",
            '+' => "+",
            '-' => "-",
            '*' => "*",
            '/' => "/",
            '.' => ".",
            ':' when _inBraces => ":",
            '<' => Next('=') ? "<=" : "<",
            '>' => Next('=') ? ">=" : ">",
            _ => null,
        };
        if (sign == "." && start + 1 < _end && char.IsAsciiDigit(_text[start + 1]))
        {
            _at = start + 1;
            while (_at < _end && char.IsAsciiDigit(_text[_at]))
                _at++;
            Fault(LanguageFindings.NumberBeginsWithPoint(_text[start..Math.Min(_at, start + 20)], SpanFrom(start)));
        }
        else if (sign is not null)
        {
            _at += sign.Length;
            Add(new Token(TokenKind.Sign, sign, SpanFrom(start)));
        }
        else
        {
            ReadStray();
        }
    }

    // A run of strays is one fault, so that binary rubbish does not drown the rest; a mark that people write for another stands alone.
    private void ReadStray()
    {
        int start = _at;
        Rune first = RuneAt(_at, out int length);
        _at += length;
        if (LanguageFindings.FindMeant(first) is null)
        {
            while (_at < _end && !char.IsAsciiLetterOrDigit(_text[_at]) && !IsBlank(_text[_at]) && _text[_at] is not ('\n' or '\r' or '"' or '#' or '(' or ')' or '[' or ']' or ','))
            {
                Rune next = RuneAt(_at, out length);
                if (Rune.IsLetter(next) || LanguageFindings.FindMeant(next) is not null)
                    break;
                _at += length;
            }
        }

        Fault(LanguageFindings.StraySign(_text[start..Math.Min(_at, start + 8)], first, SpanFrom(start)));
    }

    private void ReadNumber()
    {
        int start = _at;
        NumberScanner scanner = new(_text, _end, _limits.MaximumDigits);
        NumberScan scan = scanner.Scan(start);
        _at = scan.End;
        int wordEnd = LetterLength(_at) > 0 || (_at < _end && _text[_at] == '_') ? WordEnd(_at) : _at;
        if (scan.Fault is { } fault)
        {
            _at = Math.Max(_at, wordEnd);
            Fault(fault);
        }
        else if (wordEnd > _at && (scan.Kind == TokenKind.Angle || !IsUnit(_text.AsSpan(_at, wordEnd - _at))))
        {
            string word = _text[_at..Math.Min(wordEnd, _at + 40)];
            SourceSpan span = new(start, wordEnd - start);
            Diagnostic finding = LanguageFindings.ClosedUp(scan.Text, word, new SourceSpan(_at, wordEnd - _at), span, scan.Kind == TokenKind.Number);
            _at = wordEnd;
            Fault(finding);
        }
        else
        {
            Add(new Token(scan.Kind, scan.Text, SpanFrom(start)) { Value = scan.Value, IsFraction = scan.IsFraction });
        }
    }

    private void Fault(Diagnostic finding)
    {
        Findings.Add(finding);
        Add(new Token(TokenKind.Fault, "", finding.Span));
    }

    private void Add(Token token)
    {
        Tokens.Add(_firstOnLine ? token with { FirstOnLine = true } : token);
        _firstOnLine = false;
    }

    private SourceSpan SpanFrom(int start) => new(start, _at - start);

    private bool Next(char c) => _at + 1 < _end && _text[_at + 1] == c;

    private int LineEnd()
    {
        int end = _text.AsSpan(_at, _end - _at).IndexOfAny('\n', '\r');
        return end < 0 ? _end : _at + end;
    }

    private int WordEnd(int at)
    {
        while (at < _end)
        {
            int length = ContinuingLength(at);
            if (length == 0)
                break;
            at += length;
        }

        return at;
    }

    private int LetterLength(int at)
    {
        if (at >= _end)
            return 0;
        if (char.IsAscii(_text[at]))
            return char.IsAsciiLetter(_text[at]) ? 1 : 0;
        Rune rune = RuneAt(at, out int length);
        return Rune.IsLetter(rune) ? length : 0;
    }

    private int ContinuingLength(int at)
    {
        char c = _text[at];
        if (char.IsAscii(c))
            return char.IsAsciiLetterOrDigit(c) || c == '_' ? 1 : 0;
        Rune rune = RuneAt(at, out int length);
        // marks: many scripts write vowels and accents as signs of their own after the letter
        bool goesOn = Rune.IsLetterOrDigit(rune) || Rune.GetUnicodeCategory(rune) is UnicodeCategory.NonSpacingMark or UnicodeCategory.SpacingCombiningMark;
        return goesOn ? length : 0;
    }

    // A lone surrogate comes back as the replacement character, one unit long.
    private Rune RuneAt(int at, out int length)
    {
        Rune.DecodeFromUtf16(_text.AsSpan(at, _end - at), out Rune rune, out length);
        return rune;
    }

    private static bool IsUnit(ReadOnlySpan<char> word) => word is "mm" or "cm" or "m" or "in" or "ft" or "deg" or "turn";

    private static bool IsBlank(char c) => c is ' ' or '\t' || (c is not ('\n' or '\r') && (char.IsWhiteSpace(c) || c is '\uFEFF' or '\u200B'));
}
