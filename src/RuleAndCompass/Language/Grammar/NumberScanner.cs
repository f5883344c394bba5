using System.Globalization;
using System.Numerics;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Language.Grammar;

/// <summary>A number or angle found in text; with a fault, the value means nothing.</summary>
internal readonly record struct NumberScan(TokenKind Kind, Rational Value, string Text, bool IsFraction, int End, Diagnostic? Fault);

/// <summary>Reads the longest number or angle from a place where a digit stands: <c>2 1/2</c>, <c>43°18'30"</c>, <c>2h30m</c>. Exact.</summary>
internal readonly ref struct NumberScanner(string text, int end, int maximumDigits)
{
    /// <summary>Reads the number or angle that starts at <paramref name="start"/>.</summary>
    public NumberScan Scan(int start)
    {
        if (FindHours(start) is { } hours)
            return hours;
        Part first = ReadPart(start);
        if (first.Fault is not null)
            return new NumberScan(TokenKind.Number, default, "", false, first.End, first.Fault);
        return Mark(first.End) switch
        {
            '°' => ReadFromDegrees(start, first),
            '\'' => ReadFromMinutes(start, first.End + 1, first.Value / 60, first.IsFraction, afterDegrees: false),
            '"' => Angle(start, first.End + 1, first.Value / 3600, first.IsFraction),
            _ => new NumberScan(TokenKind.Number, first.Value, Standard(start, first.End), first.IsFraction, first.End, null),
        };
    }

    private NumberScan ReadFromDegrees(int start, Part degrees)
    {
        int at = degrees.End + 1;
        if (!IsDigit(at))
            return Angle(start, at, degrees.Value, degrees.IsFraction);
        Part next = ReadPart(at);
        if (next.Fault is not null)
            return new NumberScan(TokenKind.Angle, default, "", false, next.End, next.Fault);
        SourceSpan span = new(at, next.End - at);
        switch (Mark(next.End))
        {
            case '\'':
                return next.Value >= 60
                    ? Faulty(next.End + 1, LanguageFindings.SixtyParts(text.Substring(span.Start, span.Length), "minutes", span))
                    : ReadFromMinutes(start, next.End + 1, degrees.Value + (next.Value / 60), degrees.IsFraction, afterDegrees: true);
            case '"':
                return next.Value >= 60
                    ? Faulty(next.End + 1, LanguageFindings.SixtyParts(text.Substring(span.Start, span.Length), "seconds", span))
                    : Angle(start, next.End + 1, degrees.Value + (next.Value / 3600), degrees.IsFraction);
            default:
                return Faulty(next.End, LanguageFindings.PartWithoutMark(text.Substring(span.Start, Math.Min(span.Length, 20)), span));
        }
    }

    private NumberScan ReadFromMinutes(int start, int at, Rational degrees, bool isFraction, bool afterDegrees)
    {
        if (!IsDigit(at))
            return Angle(start, at, degrees, isFraction);
        Part seconds = ReadPart(at);
        if (seconds.Fault is not null)
            return new NumberScan(TokenKind.Angle, default, "", false, seconds.End, seconds.Fault);
        SourceSpan span = new(at, seconds.End - at);
        if (Mark(seconds.End) != '"')
            return Faulty(seconds.End, LanguageFindings.PartWithoutMark(text.Substring(span.Start, Math.Min(span.Length, 20)), span));
        if (seconds.Value >= 60)
            return Faulty(seconds.End + 1, LanguageFindings.SixtyParts(text.Substring(span.Start, span.Length), "seconds", span));
        return Angle(start, seconds.End + 1, degrees + (seconds.Value / 3600), isFraction);
    }

    // 2h, 2h30m: closed up, whole, and no letter after them
    private NumberScan? FindHours(int start)
    {
        int at = SkipDigits(start);
        if (at >= end || text[at] != 'h' || at - start > 9)
            return null;
        Rational degrees = ParseDigits(start, at) * 15;
        int next = at + 1;
        if (IsDigit(next))
        {
            int close = SkipDigits(next);
            if (close >= end || text[close] != 'm' || close - next > 9 || GoesOn(close + 1))
                return null;
            Rational minutes = ParseDigits(next, close);
            if (minutes >= 60)
                return Faulty(close + 1, LanguageFindings.SixtyParts(text[next..close], "minutes", new SourceSpan(next, close - next)));
            return Angle(start, close + 1, degrees + (minutes / 4), false);
        }

        return GoesOn(next) ? null : Angle(start, next, degrees, false);
    }

    private NumberScan Angle(int start, int close, Rational degrees, bool isFraction) =>
        new(TokenKind.Angle, degrees, Standard(start, close), isFraction, close, null);

    private static NumberScan Faulty(int close, Diagnostic fault) => new(TokenKind.Angle, default, "", false, close, fault);

    /// <summary>One NUMBER of the grammar: whole, decimal, fraction or mixed.</summary>
    private Part ReadPart(int start)
    {
        int whole = SkipDigits(start);
        if (FractionEnd(whole) is var simple && simple > 0)
            return Fraction(start, start, whole, simple, Rational.Zero);
        int numerator = SkipBlanks(whole);
        if (numerator > whole && IsDigit(numerator))
        {
            int slash = SkipDigits(numerator);
            int mixed = FractionEnd(slash);
            if (mixed > 0)
                return TooLong(start, mixed) ?? Fraction(start, numerator, slash, mixed, ParseDigits(start, whole));
        }

        if (whole < end && text[whole] == '.' && IsDigit(whole + 1))
        {
            int close = SkipDigits(whole + 1);
            return TooLong(start, close) ?? new Part(Rational.ParseDecimal(text[start..close]), false, close, null);
        }

        return TooLong(start, whole) ?? new Part(ParseDigits(start, whole), false, whole, null);
    }

    private Part Fraction(int start, int numerator, int slash, int close, Rational whole)
    {
        if (TooLong(start, close) is { } fault)
            return fault;
        Rational below = ParseDigits(slash + 1, close);
        SourceSpan span = new(start, close - start);
        return below.IsZero
            ? new Part(default, true, close, LanguageFindings.ZeroBelow(span))
            : new Part(whole + (ParseDigits(numerator, slash) / below), true, close, null);
    }

    private Part? TooLong(int start, int close) =>
        close - start > maximumDigits ? new Part(default, false, close, LanguageFindings.TooManyDigits(maximumDigits, new SourceSpan(start, close - start))) : null;

    // The end of `/` and digits right at `slash`, or 0. In 5/2.5 the point makes the divisor a decimal, so the slash is a division.
    private int FractionEnd(int slash)
    {
        if (slash >= end || text[slash] != '/' || !IsDigit(slash + 1))
            return 0;
        int close = SkipDigits(slash + 1);
        return close < end && text[close] == '.' && IsDigit(close + 1) ? 0 : close;
    }

    private Rational ParseDigits(int start, int close) => close - start <= 18
        ? (BigInteger)long.Parse(text.AsSpan(start, close - start), NumberStyles.None, CultureInfo.InvariantCulture)
        : BigInteger.Parse(text.AsSpan(start, close - start), NumberStyles.None, CultureInfo.InvariantCulture);

    // The mark right after a digit, typographic ones as their plain fellows; a blank where there is none.
    private char Mark(int at) => at >= end ? ' ' : text[at] switch
    {
        '°' => '°',
        '\'' or '′' => '\'',
        '"' or '″' => '"',
        _ => ' ',
    };

    private bool GoesOn(int at) => at < end && (char.IsLetterOrDigit(text[at]) || text[at] == '_');

    private bool IsDigit(int at) => at < end && char.IsAsciiDigit(text[at]);

    private int SkipDigits(int at)
    {
        while (at < end && char.IsAsciiDigit(text[at]))
            at++;
        return at;
    }

    private int SkipBlanks(int at)
    {
        while (at < end && text[at] is ' ' or '\t')
            at++;
        return at;
    }

    private string Standard(int start, int close)
    {
        ReadOnlySpan<char> written = text.AsSpan(start, close - start);
        int blank = written.IndexOfAny(' ', '\t');
        return blank < 0 ? written.ToString() : string.Concat(written[..blank], " ", Standard(start + blank + written[blank..].IndexOfAnyExcept(' ', '\t'), close));
    }

    private readonly record struct Part(Rational Value, bool IsFraction, int End, Diagnostic? Fault);
}
