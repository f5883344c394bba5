using System.Collections.Immutable;

namespace RuleAndCompass.Language.Diagnostics;

/// <summary>A place as people count it: line and column from 1, the column in UTF-16 units.</summary>
public readonly record struct LineColumn(int Line, int Column);

/// <summary>Finds lines and columns in a text, whose lines end in a line feed, a carriage return or both.</summary>
public sealed class LineMap
{
    private readonly string _text;
    private readonly ImmutableArray<int> _starts;

    /// <summary>Maps the lines of a text.</summary>
    public LineMap(string text)
    {
        ArgumentNullException.ThrowIfNull(text);
        _text = text;
        ImmutableArray<int>.Builder starts = ImmutableArray.CreateBuilder<int>();
        starts.Add(0);
        for (int at = 0; at < text.Length; at++)
        {
            if (text[at] == '\n' || (text[at] == '\r' && (at + 1 == text.Length || text[at + 1] != '\n')))
                starts.Add(at + 1);
        }

        _starts = starts.DrainToImmutable();
    }

    /// <summary>How many lines there are; one in an empty text.</summary>
    public int Count => _starts.Length;

    /// <summary>The line and column of a position; one past the end is counted as the end.</summary>
    public LineColumn Find(int position)
    {
        int inside = Math.Clamp(position, 0, _text.Length);
        int index = _starts.BinarySearch(inside);
        if (index < 0)
            index = ~index - 1;
        return new LineColumn(index + 1, inside - _starts[index] + 1);
    }

    /// <summary>The first place of a span and the first after it.</summary>
    public (LineColumn Start, LineColumn End) Find(SourceSpan span) => (Find(span.Start), Find(span.End));

    /// <summary>The span of a line, counted from 1, without its end.</summary>
    public SourceSpan LineSpan(int line)
    {
        int start = _starts[line - 1];
        int end = line < _starts.Length ? _starts[line] : _text.Length;
        while (end > start && _text[end - 1] is '\n' or '\r')
            end--;
        return new SourceSpan(start, end - start);
    }
}
