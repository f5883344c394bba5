using System.Globalization;
using System.Numerics;

namespace RuleAndCompass.Numbers;

/// <summary>Integers written as decimals with a point.</summary>
internal static class DecimalText
{
    /// <summary>Writes <paramref name="scaled"/> × 10^−<paramref name="places"/>; <paramref name="trim"/> leaves out the zeros at the end.</summary>
    public static string Write(BigInteger scaled, int places, bool trim)
    {
        string digits = BigInteger.Abs(scaled).ToString(CultureInfo.InvariantCulture);
        if (places < 0)
            (digits, places) = (scaled.IsZero ? "0" : digits + new string('0', -places), 0);
        if (places > 0)
        {
            digits = digits.PadLeft(places + 1, '0');
            digits = $"{digits[..^places]}.{digits[^places..]}";
            if (trim)
                digits = digits.TrimEnd('0').TrimEnd('.');
        }

        return scaled.Sign < 0 ? "-" + digits : digits;
    }
}
