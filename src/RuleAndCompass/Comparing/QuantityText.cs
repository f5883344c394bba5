using System.Globalization;
using System.Numerics;
using RuleAndCompass.Making;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Comparing;

/// <summary>Figures as a report prints them. Each printed digit is certain, the last one rounded.</summary>
internal static class QuantityText
{
    // What a report shows where no digits are asked for: finer than any hand, and short enough to read.
    private const int LengthPlaces = 4;
    private const int AnglePlaces = 5;
    private const int NumberPlaces = 7;
    private const int MinutePlaces = 2;

    // Enough to see how large a difference is.
    private const int DifferenceDigits = 3;

    private static readonly Rational MinutesInDegree = 60;

    /// <summary>A quantity with its unit: <c>61.8034 mm</c>, <c>10°17.53′ = 10.29219°</c>, <c>0.6858184</c>.</summary>
    /// <param name="digits">Significant digits where the caller asks for some, else null.</param>
    public static string Of(Real value, QuantityKind kind, Decider decider, int? digits)
    {
        string Decimal(int places) => digits is { } asked ? decider.ToDecimal(value, asked) : decider.ToFixed(value, places);
        return kind switch
        {
            QuantityKind.Angle => $"{DegreesMinutes(value, decider)} = {Decimal(AnglePlaces)}°",
            QuantityKind.Number => Decimal(NumberPlaces),
            _ => $"{Decimal(LengthPlaces)} mm",
        };
    }

    /// <summary>A place: <c>(12.5000, -3.2500) mm</c>.</summary>
    public static string OfPlace(Real x, Real y, Decider decider, int? digits)
    {
        string Decimal(Real value) => digits is { } asked ? decider.ToDecimal(value, asked) : decider.ToFixed(value, LengthPlaces);
        return $"({Decimal(x)}, {Decimal(y)}) mm";
    }

    /// <summary>A difference that is decided not to be zero, with its sign: <c>+0.212′ (+0.00353°)</c>, <c>-0.0410 mm</c>.</summary>
    public static string OfDifference(Real difference, QuantityKind kind, Decider decider)
    {
        string Signed(Real value)
        {
            string text = decider.ToDecimal(value, DifferenceDigits);
            return text.StartsWith('-') || kind == QuantityKind.Point ? text : $"+{text}";
        }

        return kind switch
        {
            QuantityKind.Angle => $"{Signed(difference * MinutesInDegree)}′ ({Signed(difference)}°)",
            QuantityKind.Number => Signed(difference),
            _ => $"{Signed(difference)} mm",
        };
    }

    /// <summary>Degrees and minutes, the whole rounded once: <c>-10°17.53′</c>.</summary>
    public static string DegreesMinutes(Real degrees, Decider decider)
    {
        string minutes = decider.ToFixed(degrees * MinutesInDegree, MinutePlaces);
        bool negative = minutes.StartsWith('-');
        BigInteger hundredths = BigInteger.Parse(minutes.Replace(".", "", StringComparison.Ordinal).TrimStart('-'), CultureInfo.InvariantCulture);
        (BigInteger whole, BigInteger rest) = BigInteger.DivRem(hundredths, 60 * 100);
        return string.Create(CultureInfo.InvariantCulture, $"{(negative ? "-" : "")}{whole}°{(decimal)rest / 100:00.00}′");
    }

    /// <summary>An estimate, which has no certain digits: so many significant ones, without an exponent.</summary>
    public static string Estimate(double value, int significant = 2)
    {
        if (value == 0 || !double.IsFinite(value))
            return value == 0 ? "0" : "not to be told";
        // By way of the exponent form, since rounding may lead to one figure more before the point: 0.997 is 1.0.
        string rounded = value.ToString($"E{significant - 1}", CultureInfo.InvariantCulture);
        int exponent = int.Parse(rounded.AsSpan(rounded.IndexOf('E', StringComparison.Ordinal) + 1), NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture);
        return value.ToString($"F{Math.Clamp(significant - 1 - exponent, 0, 15)}", CultureInfo.InvariantCulture);
    }
}
