using System.Globalization;
using System.Text.Json;
using RuleAndCompass.Accuracy;
using RuleAndCompass.Comparing;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.CommandLine.Json;

/// <summary>The lists of comparisons and claims.</summary>
internal static class ReportJson
{
    public static void Write(Utf8JsonWriter json, Layout layout, HandErrorReport? hand, int? digits)
    {
        NumberJson numbers = new(layout.Decider, digits);
        json.WriteStartArray("comparisons");
        for (int index = 0; index < layout.Comparisons.Length; index++)
            WriteComparison(json, layout.Comparisons[index], hand?.Results.FirstOrDefault(result => result.Subject == HandSubject.Comparison && result.Index == index), numbers);
        json.WriteEndArray();
        json.WriteStartArray("claims");
        foreach (ClaimResult claim in layout.Claims)
        {
            json.WriteStartObject();
            json.WriteString("says", claim.Says);
            json.WriteString("verdict", ClaimRow.VerdictOf(claim));
            WriteNullable(json, "by", claim.By);
            json.WriteEndObject();
        }

        json.WriteEndArray();
        json.WriteStartArray("ranges");
        foreach (ValidFor range in layout.ValidRanges)
        {
            json.WriteStartObject();
            json.WriteString("given", range.Given);
            WriteNullable(json, "from", range.From?.ToString(CultureInfo.InvariantCulture));
            WriteNullable(json, "to", range.To?.ToString(CultureInfo.InvariantCulture));
            json.WriteEndObject();
        }

        json.WriteEndArray();
    }

    private static void WriteComparison(Utf8JsonWriter json, Comparison comparison, HandResult? hand, NumberJson numbers)
    {
        json.WriteStartObject();
        json.WriteString("label", comparison.Label);
        json.WriteString("kind", KindOf(comparison.Kind));
        if (comparison.Kind == QuantityKind.Point)
        {
            // A point has both coordinates on both sides.
            numbers.WriteObject(json, "constructed", ("x", comparison.Constructed), ("y", comparison.ConstructedY!));
            numbers.WriteObject(json, "computed", ("x", comparison.Computed), ("y", comparison.ComputedY!));
            WriteDifference(json, comparison, numbers);
        }
        else if (comparison.Decision.Verdict.IsDecided)
        {
            numbers.Write(json, ("constructed", comparison.Constructed), ("computed", comparison.Computed), ("difference", comparison.Decision.IsZero ? Real.Zero : comparison.Difference));
        }
        else
        {
            numbers.Write(json, ("constructed", comparison.Constructed), ("computed", comparison.Computed));
            json.WriteNull("difference");
        }

        json.WriteString("verdict", comparison.Decision.Verdict.ToString());
        WriteNullable(json, "within", comparison.Within is { } within ? numbers.Decimal(within) : null);
        if (comparison.Within is not null)
            json.WriteString("withinUnit", comparison.WithinMinutes ? "minutes of time" : comparison.Kind switch { QuantityKind.Angle => "degrees", QuantityKind.Number => "", _ => "millimetres" });
        json.WriteBoolean("ok", comparison.InTolerance);
        NumberJson.WriteEstimate(json, "hand95", hand?.Size95);
        NumberJson.WriteEstimate(json, "hand95Far", hand?.Far95);
        NumberJson.WriteEstimate(json, "minutesOfTime", comparison.Decision.IsZero && comparison.RatePerHour is not null ? 0 : comparison.MinutesOfTime);
        json.WriteEndObject();
    }

    // Null where it is not decided whether there is one.
    private static void WriteDifference(Utf8JsonWriter json, Comparison comparison, NumberJson numbers) =>
        WriteNullable(json, "difference", comparison.Decision switch
        {
            { IsZero: true } => "0",
            { Verdict.IsDecided: false } => null,
            _ => numbers.Decimal(comparison.Difference),
        });

    public static string KindOf(QuantityKind kind) => kind switch
    {
        QuantityKind.Angle => "angle",
        QuantityKind.Length => "length",
        QuantityKind.Point => "point",
        _ => "number",
    };

    private static void WriteNullable(Utf8JsonWriter json, string name, string? value)
    {
        if (value is null)
            json.WriteNull(name);
        else
            json.WriteString(name, value);
    }
}
