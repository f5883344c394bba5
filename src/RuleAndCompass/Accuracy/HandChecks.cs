using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making;

namespace RuleAndCompass.Accuracy;

/// <summary>Whether a hand and the options make sense.</summary>
internal static class HandChecks
{
    // A quarter of the sheet's shorter side, or 30°, is no error of a hand but of a pen: the trials would lose everything.
    private const double MostPartOfSheet = 0.25;
    private const double MostDegrees = 30;

    public static IEnumerable<Diagnostic> Faults(Layout layout, HandErrorOptions options)
    {
        Hand hand = layout.Hand;
        Sheet sheet = layout.Sheet;
        SourceSpan span = layout.Script.Sentences.OfType<HandSentence>().FirstOrDefault()?.Span ?? default;
        double side = Math.Min(sheet.Width.ToDouble(), sheet.Height.ToDouble());
        (string Name, double Size, bool IsAngle)[] errors =
        [
            ("prick", hand.PrickMillimetres, false),
            ("edge", hand.EdgeMillimetres, false),
            ("opening", hand.OpeningMillimetres, false),
            ("scale", hand.ScaleMillimetres, false),
            ("protractor", hand.ProtractorDegrees, true),
            ("square", hand.SquareDegrees, true),
        ];
        foreach ((string name, double size, bool isAngle) in errors)
        {
            double most = isAngle ? MostDegrees : side * MostPartOfSheet;
            if (!double.IsFinite(size) || size < 0)
                yield return AccuracyFindings.NotAnError(name, size, span);
            else if (size > most)
                yield return AccuracyFindings.AbsurdError(name, Text(size, isAngle), Text(most, isAngle), span);
        }

        if (options.Trials is < 0 or > HandErrorOptions.MaximumTrials)
            yield return AccuracyFindings.TrialsOutsideLimits(options.Trials);
    }

    private static string Text(double size, bool isAngle) => size.ToString("0.###", CultureInfo.InvariantCulture) + (isAngle ? "°" : " mm");
}
