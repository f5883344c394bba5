using System.Text;
using System.Text.Encodings.Web;
using System.Text.Json;
using RuleAndCompass.CommandLine.Files;
using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.CommandLine.Json;

/// <summary>What every JSON result has in common.</summary>
internal static class ResultJson
{
    /// <summary>The name of the format; a change that a reader could trip over gives it a new one.</summary>
    public const string Format = "setout/1";

    private static readonly JsonWriterOptions Options = new()
    {
        Indented = true,
        NewLine = "\n",
        // Read by programs, not shown inside web pages: degrees and roots stay readable.
        Encoder = JavaScriptEncoder.UnsafeRelaxedJsonEscaping,
    };

    /// <summary>One JSON document, ended by a line feed.</summary>
    public static string Write(Action<Utf8JsonWriter> content)
    {
        using MemoryStream stream = new();
        using (Utf8JsonWriter json = new(stream, Options))
        {
            json.WriteStartObject();
            json.WriteString("format", Format);
            content(json);
            json.WriteEndObject();
        }

        return Encoding.UTF8.GetString(stream.GetBuffer(), 0, (int)stream.Length) + "\n";
    }

    /// <summary>The script's name and the SHA-256 of its text; where it could not be read, the name alone.</summary>
    public static void WriteScript(this Utf8JsonWriter json, string name, ScriptFile? script)
    {
        json.WriteString("script", name);
        if (script is null)
            json.WriteNull("sha256");
        else
            json.WriteString("sha256", script.Hash);
    }

    /// <summary>The list of findings; those of the command line itself have no place.</summary>
    public static void WriteDiagnostics(this Utf8JsonWriter json, IEnumerable<Diagnostic> findings, ScriptFile? script)
    {
        LineMap? lines = script is null ? null : new(script.Text);
        json.WriteStartArray("diagnostics");
        foreach (Diagnostic finding in findings)
        {
            json.WriteStartObject();
            json.WriteString("code", finding.Code);
            json.WriteString("severity", finding.Severity == Severity.Error ? "error" : "warning");
            json.WriteString("message", finding.Message);
            if (finding.File is not null)
                json.WriteString("file", finding.File);
            else if (lines is not null && !Findings.HasNoPlace(finding))
                WritePlace(json, lines, finding.Span);
            if (finding.Hint is not null)
                json.WriteString("hint", finding.Hint);
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WritePlace(Utf8JsonWriter json, LineMap lines, SourceSpan span)
    {
        (LineColumn start, LineColumn end) = lines.Find(span);
        json.WriteNumber("line", start.Line);
        json.WriteNumber("column", start.Column);
        json.WriteNumber("endLine", end.Line);
        json.WriteNumber("endColumn", end.Column);
    }
}
