using System.Globalization;

namespace RuleAndCompass.Plates.Composition;

/// <summary>A drawing's scale: so many millimetres on the page for so many on the stock.</summary>
/// <remarks>The steps 1, 2 and 5 with their tens are those of ISO 5455; 2.5 and 4 stand between them by common practice.</remarks>
internal readonly record struct PlateScale(double OnPage, double OnStock)
{
    private static readonly double[] steps = [1, 2, 2.5, 4, 5];

    public double Factor => OnPage / OnStock;

    /// <summary>The largest standard scale, not above 10 : 1, at which the sizes fit.</summary>
    public static PlateScale Fitting(double stockWidth, double stockHeight, double pageWidth, double pageHeight)
    {
        double most = Math.Min(pageWidth / stockWidth, pageHeight / stockHeight) * (1 + 1e-9);
        foreach (double enlarged in (ReadOnlySpan<double>)[10, 5, 2, 1])
        {
            if (enlarged <= most)
            {
                return new PlateScale(enlarged, 1);
            }
        }

        for (double tens = 1; ; tens *= 10)
        {
            foreach (double step in steps)
            {
                if (1 / (step * tens) <= most)
                {
                    return new PlateScale(1, step * tens);
                }
            }
        }
    }

    public override string ToString() => string.Create(CultureInfo.InvariantCulture, $"{OnPage:0.#} : {OnStock:0.#}");
}
