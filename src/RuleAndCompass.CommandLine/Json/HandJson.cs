using System.Text.Json;
using RuleAndCompass.Accuracy;

namespace RuleAndCompass.CommandLine.Json;

/// <summary>Hand errors and who is to blame for them.</summary>
internal static class HandJson
{
    public static void Write(Utf8JsonWriter json, HandErrorReport report)
    {
        json.WriteStartArray("results");
        foreach (HandResult result in report.Results)
        {
            json.WriteStartObject();
            json.WriteString("label", result.Label);
            json.WriteString("kind", ReportJson.KindOf(result.Kind));
            NumberJson.WriteEstimate(json, "sigma", result.Sigma);
            NumberJson.WriteEstimate(json, "low95", result.Low95);
            NumberJson.WriteEstimate(json, "high95", result.High95);
            NumberJson.WriteEstimate(json, "hand95", result.Size95);
            NumberJson.WriteEstimate(json, "far95", result.Far95);
            NumberJson.WriteEstimate(json, "minutesOfTime", result.MinutesOfTime95);
            NumberJson.WriteEstimate(json, "firstOrderSigma", result.FirstOrderSigma);
            json.WriteNumber("lost", result.Lost);
            json.WriteStartArray("blame");
            foreach (Blame blame in result.Blame)
                WriteBlame(json, blame);
            json.WriteEndArray();
            json.WriteEndObject();
        }

        json.WriteEndArray();
        NumberJson.WriteEstimate(json, "rootMeanSquare", report.Summary?.RootMeanSquare);
        NumberJson.WriteEstimate(json, "worst", report.Summary?.Worst);
        json.WriteNumber("trials", report.Trials);
        json.WriteNumber("seed", report.Seed);
    }

    private static void WriteBlame(Utf8JsonWriter json, Blame blame)
    {
        json.WriteStartObject();
        json.WriteNumber("act", blame.Act);
        json.WriteString("share", NumberJson.Estimate(blame.Share));
        json.WriteString("why", blame.Why);
        json.WriteEndObject();
    }
}
