using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;

namespace RuleAndCompass.Plates.Writing;

/// <summary>The true size of a PDF's page.</summary>
/// <param name="Width">In the page's own units.</param>
/// <param name="Height">Likewise.</param>
/// <param name="Top">The whole number of units the page was begun with: its content hangs from there.</param>
/// <param name="Unit">How many points a unit has; 1 unless the page is very large.</param>
internal readonly record struct PdfPageSize(double Width, double Height, double Top, int Unit);

/// <summary>
/// Gives the pages of a finished PDF their exact sizes. The library that draws rounds them to whole points, so an incremental update
/// (ISO 32000-1, 7.5.6) replaces each page object by one with the true <c>/MediaBox</c>; nothing that is already written is touched.
/// </summary>
internal static partial class PdfPageSizes
{
    public static byte[] Append(ReadOnlySpan<byte> file, List<PdfPageSize> sizes, string? scriptName)
    {
        string text = Encoding.Latin1.GetString(file); // One sign a byte, so that places in the text are places in the file.
        int start = text.LastIndexOf("startxref", StringComparison.Ordinal);
        int table = int.Parse(text.AsSpan(start + 9, text.IndexOf("%%EOF", start, StringComparison.Ordinal) - start - 9), CultureInfo.InvariantCulture);
        string trailer = text[text.LastIndexOf("trailer", StringComparison.Ordinal)..start];

        MemoryStream appended = new();
        appended.Write(file);
        List<(int Number, long Place)> replaced = [];
        foreach ((int number, int place) in Objects(text, table))
        {
            int end = text.IndexOf("endobj", place, StringComparison.Ordinal);
            int stream = text.IndexOf("stream", place, end - place, StringComparison.Ordinal);
            string body = text[place..(stream < 0 ? end : stream)];
            if (!PageType().IsMatch(body))
            {
                continue;
            }

            PdfPageSize size = sizes[replaced.Count];
            string box = $"/MediaBox [0 {Figure(size.Top - size.Height)} {Figure(size.Width)} {Figure(size.Top)}]" + (size.Unit == 1 ? "" : $"\n/UserUnit {size.Unit}");
            replaced.Add((number, appended.Length));
            Write(appended, MediaBox().Replace(body, box, 1) + "endobj\n");
        }

        if (replaced.Count != sizes.Count)
        {
            throw new InvalidOperationException($"The PDF has {replaced.Count} page objects for {sizes.Count} pages.");
        }

        long place2 = appended.Length;
        StringBuilder update = new("xref\n");
        foreach ((int number, long place) in replaced)
        {
            update.Append(CultureInfo.InvariantCulture, $"{number} 1\n{place:D10} 00000 n \n");
        }

        string newTrailer = trailer.TrimEnd();
        newTrailer = newTrailer[..newTrailer.LastIndexOf(">>", StringComparison.Ordinal)];
        update.Append(CultureInfo.InvariantCulture, $"{newTrailer}\n/Prev {table}>>\n");
        if (scriptName is not null)
        {
            update.Append('%').Append(Origin.Line(scriptName)).Append('\n');
        }

        update.Append(CultureInfo.InvariantCulture, $"startxref\n{place2}\n%%EOF\n");
        Write(appended, update.ToString());
        return appended.ToArray();
    }

    // Object numbers and places, in the order of the numbers, which is the order in which pages were begun.
    private static IEnumerable<(int Number, int Place)> Objects(string text, int table)
    {
        int line = text.IndexOf('\n', table) + 1;
        string[] section = text[line..text.IndexOf('\n', line)].Split(' ');
        int first = int.Parse(section[0], CultureInfo.InvariantCulture);
        int count = int.Parse(section[1], CultureInfo.InvariantCulture);
        int entry = text.IndexOf('\n', line) + 1;
        for (int i = 0; i < count; i++, entry += 20)
        {
            if (text[entry + 17] == 'n')
            {
                yield return (first + i, int.Parse(text.AsSpan(entry, 10), CultureInfo.InvariantCulture));
            }
        }
    }

    private static void Write(MemoryStream stream, string text) => stream.Write(Encoding.Latin1.GetBytes(text));

    private static string Figure(double value) => Math.Round(value, 6).ToString("0.######", CultureInfo.InvariantCulture);

    [GeneratedRegex(@"/Type\s*/Page[^s\w]")]
    private static partial Regex PageType();

    [GeneratedRegex(@"/MediaBox\s*\[[^\]]*\]")]
    private static partial Regex MediaBox();
}
