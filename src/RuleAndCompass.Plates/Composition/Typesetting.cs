using RuleAndCompass.Plates.Fonts;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Composition;

/// <summary>Breaks and fits lines of text.</summary>
internal static class Typesetting
{
    public const string Ellipsis = "…";

    private const char NoBreak = '\u00A0';

    /// <summary>Lines no wider than the measure, broken at spaces; a word wider than that is broken anywhere.</summary>
    public static List<string> Break(string text, Typeface typeface, double sizeMillimetres, double measureMillimetres)
    {
        Face face = Face.Of(typeface);
        double space = face.Width(" ", sizeMillimetres);
        List<string> lines = [];
        string line = "";
        double width = 0;
        foreach (string kept in KeptTogether(face.Shown(text)).Split(' ', StringSplitOptions.RemoveEmptyEntries))
        {
            string word = kept.Replace(NoBreak, ' ');
            double wordWidth = face.Width(word, sizeMillimetres);
            if (line.Length > 0 && width + space + wordWidth <= measureMillimetres)
            {
                line += " " + word;
                width += space + wordWidth;
                continue;
            }

            if (line.Length > 0)
            {
                lines.Add(line);
            }

            line = word;
            width = wordWidth;
            while (width > measureMillimetres)
            {
                int fits = Math.Max(1, Fitting(face, line, sizeMillimetres, measureMillimetres));
                if (fits >= line.Length)
                {
                    break;
                }

                lines.Add(line[..fits]);
                line = line[fits..];
                width = face.Width(line, sizeMillimetres);
            }
        }

        if (line.Length > 0)
        {
            lines.Add(line);
        }

        return lines;
    }

    // A name's index stays on one line, I[11 1/2], and a figure with its unit.
    private static string KeptTogether(string text)
    {
        if (!text.Contains('[') && !text.Contains(" mm", StringComparison.Ordinal))
        {
            return text;
        }

        char[] signs = text.ToCharArray();
        int depth = 0;
        for (int i = 0; i < signs.Length; i++)
        {
            depth = signs[i] == '[' ? depth + 1 : signs[i] == ']' ? Math.Max(0, depth - 1) : depth;
            bool isBeforeUnit = i > 0 && char.IsAsciiDigit(signs[i - 1]) && text.AsSpan(i).StartsWith(" mm");
            if (signs[i] == ' ' && (depth > 0 || isBeforeUnit))
            {
                signs[i] = NoBreak;
            }
        }

        return new string(signs);
    }

    /// <summary>The text, cut short with three dots where it is wider than the measure.</summary>
    public static string Fit(string text, Typeface typeface, double sizeMillimetres, double measureMillimetres)
    {
        Face face = Face.Of(typeface);
        string shown = face.Shown(text);
        if (face.Width(shown, sizeMillimetres) <= measureMillimetres)
        {
            return shown;
        }

        int fits = Fitting(face, shown, sizeMillimetres, measureMillimetres - face.Width(Ellipsis, sizeMillimetres));
        return shown[..fits].TrimEnd() + Ellipsis;
    }

    public static double Width(string text, Typeface typeface, double sizeMillimetres)
    {
        Face face = Face.Of(typeface);
        return face.Width(face.Shown(text), sizeMillimetres);
    }

    private static int Fitting(Face face, string text, double sizeMillimetres, double measureMillimetres)
    {
        double width = 0;
        for (int i = 0; i < text.Length; i++)
        {
            width += face.Width(text.AsSpan(i, 1), sizeMillimetres);
            if (width > measureMillimetres)
            {
                return i;
            }
        }

        return text.Length;
    }
}
