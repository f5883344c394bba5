using System.Globalization;
using System.Text.Json;

namespace RuleAndCompass.Tests.References;

/// <summary>One published figure, or a short row of them.</summary>
/// <param name="Id">Its key in <c>published.json</c>.</param>
/// <param name="Values">As printed.</param>
/// <param name="Tolerance">What the printed digits allow, in the same unit.</param>
/// <param name="Source">Author, title, year and place.</param>
/// <param name="Inputs">What it was printed for.</param>
internal sealed record PublishedFigure(string Id, IReadOnlyList<double> Values, double Tolerance, string Source, IReadOnlyDictionary<string, JsonElement> Inputs)
{
    public double Value => Values.ShouldHaveSingleItem();

    public string Input(string name) => Inputs[name].GetRawText();

    /// <summary>Holds what a script constructed against the printed figures, from the first on.</summary>
    public void Check(params ReadOnlySpan<double> constructed)
    {
        constructed.Length.ShouldBeLessThanOrEqualTo(Values.Count);
        for (int place = 0; place < constructed.Length; place++)
            constructed[place].ShouldBe(Values[place], Tolerance, $"{Id}, figure {place + 1}: {Source}");
    }
}

/// <summary>The published figures that the tests check against, with their sources.</summary>
internal static class Published
{
    private static readonly Lazy<JsonDocument> Document = new(() => JsonDocument.Parse(File.ReadAllText(Path.Combine(AppContext.BaseDirectory, "References", "published.json"))));

    public static IEnumerable<PublishedFigure> Topic(string topic) => Document.Value.RootElement.GetProperty("topics").GetProperty(topic).EnumerateArray().Select(Read);

    public static PublishedFigure Figure(string topic, string id) => Topic(topic).Single(figure => figure.Id == id);

    public static IEnumerable<string> Ids(string topic, string prefix) => Topic(topic).Select(figure => figure.Id).Where(id => id.StartsWith(prefix, StringComparison.Ordinal));

    private static PublishedFigure Read(JsonElement entry)
    {
        JsonElement value = entry.GetProperty("value");
        double[] values = value.ValueKind == JsonValueKind.Array ? [.. value.EnumerateArray().Select(item => item.GetDouble())] : [value.GetDouble()];
        return new(
            entry.GetProperty("id").GetString()!,
            values,
            entry.GetProperty("tolerance").GetDouble(),
            Source(entry.GetProperty("source").GetString()!) + (entry.GetProperty("basis").GetString() == "read" ? "" : $" ({entry.GetProperty("basis").GetString()})"),
            entry.GetProperty("inputs").EnumerateObject().ToDictionary(input => input.Name, input => input.Value));
    }

    private static string Source(string key)
    {
        JsonElement source = Document.Value.RootElement.GetProperty("sources").GetProperty(key);
        return string.Join(", ", source.EnumerateObject().Select(part => part.Value.ValueKind == JsonValueKind.Number ? part.Value.GetInt32().ToString(CultureInfo.InvariantCulture) : part.Value.GetString()));
    }
}
