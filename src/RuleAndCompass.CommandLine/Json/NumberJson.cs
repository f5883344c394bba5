using System.Globalization;
using System.Text.Json;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.CommandLine.Json;

/// <summary>Writes exact numbers as decimal strings with so many certain digits, and their exact forms beside them where those are short.</summary>
/// <param name="decider">The layout's own.</param>
/// <param name="digits">Significant digits; null for as many as a double has.</param>
internal sealed class NumberJson(Decider decider, int? digits)
{
    /// <summary>As many as carry a double there and back (IEEE 754).</summary>
    public const int LeastDigits = 17;

    private const int LongestExactForm = 40;

    public string Decimal(Real value) => decider.ToDecimal(value, digits ?? LeastDigits);

    /// <summary>A member <paramref name="name"/> that is an object of numbers: <c>"point": { "x": "0", "y": "20" }</c>.</summary>
    public void WriteObject(Utf8JsonWriter json, string name, params ReadOnlySpan<(string Key, Real Value)> numbers)
    {
        json.WriteStartObject(name);
        Write(json, numbers);
        json.WriteEndObject();
    }

    /// <summary>Members of the object that is open, followed by <c>"exact": { KEY: FORM }</c> for those with a short exact form that says more than the decimal.</summary>
    public void Write(Utf8JsonWriter json, params ReadOnlySpan<(string Key, Real Value)> numbers)
    {
        List<(string Key, string Form)> exact = [];
        foreach ((string key, Real value) in numbers)
        {
            string text = Decimal(value);
            json.WriteString(key, text);
            if (ExactForm(value) is { } form && form.Replace('−', '-') != text)
                exact.Add((key, form));
        }

        if (exact.Count == 0)
            return;
        json.WriteStartObject("exact");
        foreach ((string key, string form) in exact)
            json.WriteString(key, form);
        json.WriteEndObject();
    }

    /// <summary>An estimate such as a hand error, which has no certain digits: four significant ones.</summary>
    public static string Estimate(double value)
    {
        if (value == 0)
            return "0";
        int places = Math.Clamp(3 - (int)Math.Floor(Math.Log10(Math.Abs(value))), 0, 15);
        string text = value.ToString($"F{places}", CultureInfo.InvariantCulture);
        return places > 0 ? text.TrimEnd('0').TrimEnd('.') : text;
    }

    /// <summary>A member that is an estimate, or null where there is none.</summary>
    public static void WriteEstimate(Utf8JsonWriter json, string name, double? value)
    {
        if (value is { } figure && double.IsFinite(figure))
            json.WriteString(name, Estimate(figure));
        else
            json.WriteNull(name);
    }

    private string? ExactForm(Real value) => decider.ToExactForm(value) is { Length: <= LongestExactForm } form ? form : null;
}
