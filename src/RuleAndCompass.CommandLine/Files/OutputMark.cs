using System.Text;
using System.Text.Json;
using System.Text.RegularExpressions;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.CommandLine.Files;

/// <summary>
/// How an output tells which script it came from: each holds the one line of <see cref="Origin"/>, the same bytes in every format, but for a JSON result, which
/// says it under <c>script</c>.
/// </summary>
internal static partial class OutputMark
{
    private const int BytesLookedAt = 1 << 18; // The line stands in the head of a text and in the head or the tail of a PDF.

    /// <summary>The script that an existing file came from, or null where it does not tell.</summary>
    public static string? Find(string path)
    {
        using FileStream file = new(path, FileMode.Open, FileAccess.Read, FileShare.ReadWrite);
        if (Path.GetExtension(path).Equals(".json", StringComparison.OrdinalIgnoreCase))
            return FindInJson(file);
        byte[] block = new byte[BytesLookedAt];
        string? found = Find(block.AsSpan(0, file.ReadAtLeast(block, block.Length, throwOnEndOfStream: false)));
        if (found is not null || file.Length <= BytesLookedAt)
            return found;
        file.Seek(-BytesLookedAt, SeekOrigin.End);
        return Find(block.AsSpan(0, file.ReadAtLeast(block, block.Length, throwOnEndOfStream: false)));
    }

    private static string? Find(ReadOnlySpan<byte> bytes)
    {
        Match match = Pattern.Match(Encoding.Latin1.GetString(bytes));
        return match.Success ? Uri.UnescapeDataString(match.Groups[1].Value) : null;
    }

    private static string? FindInJson(Stream file)
    {
        try
        {
            using JsonDocument document = JsonDocument.Parse(file);
            return document.RootElement is { ValueKind: JsonValueKind.Object } root
                && root.TryGetProperty("format", out JsonElement format) && format.ValueKind == JsonValueKind.String && format.GetString() == Json.ResultJson.Format
                && root.TryGetProperty("script", out JsonElement script) && script.ValueKind == JsonValueKind.String
                ? script.GetString()
                : null;
        }
        catch (JsonException)
        {
            return null;
        }
    }

    [GeneratedRegex("Set out from ([A-Za-z0-9._/%]+) by Rule and Compass", RegexOptions.CultureInvariant)]
    private static partial Regex Pattern { get; }
}
