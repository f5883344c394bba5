using System.Globalization;
using System.Numerics;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Bench;

/// <summary>Values as a maker writes them.</summary>
internal static class ValueText
{
    private static readonly string[] Months =
        ["January", "February", "March", "April", "May", "June", "July", "August", "September", "October", "November", "December"];

    /// <summary><c>7 1/2</c>, <c>-1/3</c>, <c>12</c>.</summary>
    public static string Mixed(Rational value)
    {
        if (value.IsInteger)
            return value.Numerator.ToString(CultureInfo.InvariantCulture);
        Rational size = value.Abs();
        BigInteger whole = size.Floor();
        Rational part = size - whole;
        string sign = value.Sign < 0 ? "-" : "";
        string fraction = $"{part.Numerator}/{part.Denominator}";
        return whole.IsZero ? sign + fraction : $"{sign}{whole} {fraction}";
    }

    /// <summary>A decimal that ends, else a mixed fraction.</summary>
    public static string Plain(Rational value)
    {
        BigInteger rest = value.Denominator;
        int places = 0;
        while (!rest.IsOne && places <= 12)
        {
            BigInteger shared = BigInteger.GreatestCommonDivisor(rest, 10);
            if (shared.IsOne)
                break;
            rest /= shared;
            places++;
        }

        if (!rest.IsOne)
            return Mixed(value);
        BigInteger scaled = value.Numerator * BigInteger.Pow(10, places) / value.Denominator;
        string digits = BigInteger.Abs(scaled).ToString(CultureInfo.InvariantCulture).PadLeft(places + 1, '0');
        string sign = value.Sign < 0 ? "-" : "";
        return places == 0 ? sign + digits : $"{sign}{digits[..^places]}.{digits[^places..]}";
    }

    /// <summary>Capital roman figures; null outside 1 to 3999.</summary>
    public static string? Roman(BigInteger value)
    {
        if (value < 1 || value > 3999)
            return null;
        int rest = (int)value;
        ReadOnlySpan<(int Size, string Figures)> steps =
            [(1000, "M"), (900, "CM"), (500, "D"), (400, "CD"), (100, "C"), (90, "XC"), (50, "L"), (40, "XL"), (10, "X"), (9, "IX"), (5, "V"), (4, "IV"), (1, "I")];
        string figures = "";
        foreach ((int size, string figure) in steps)
            for (; rest >= size; rest -= size)
                figures += figure;
        return figures;
    }

    /// <summary>Any hour as on a dial's chapter ring: I to XII, with IIII for four.</summary>
    public static string? Chapter(Rational hour)
    {
        if (!hour.IsInteger)
            return null;
        BigInteger onDial = OnDial(hour.Numerator);
        return onDial == 4 ? "IIII" : Roman(onDial);
    }

    /// <summary>Any hour as 1 to 12, its part as minutes: <c>4:30</c>.</summary>
    public static string Clock(Rational hour)
    {
        BigInteger whole = hour.Floor();
        Rational minutes = (hour - whole) * 60;
        string text = OnDial(whole).ToString(CultureInfo.InvariantCulture);
        if (minutes.IsZero)
            return text;
        string minuteText = minutes.IsInteger ? minutes.Numerator.ToString("00", CultureInfo.InvariantCulture) : Plain(minutes).PadLeft(2, '0');
        return $"{text}:{minuteText}";
    }

    /// <summary>The month's name; null outside 1 to 12.</summary>
    public static string? Month(Rational month) => month.IsInteger && month.Numerator >= 1 && month.Numerator <= 12 ? Months[(int)month.Numerator - 1] : null;

    /// <summary>The size of an angle as it is set: <c>52°10'</c> where whole minutes say it, else <c>52.17°</c>.</summary>
    public static string Set(Angle angle)
    {
        if (angle.TryGetDegrees(out Rational degrees))
        {
            Rational size = degrees.Abs(), minutes = (size - size.Floor()) * 60;
            if (minutes.IsZero)
                return $"{size.Floor()}°";
            if (minutes.IsInteger)
                return $"{size.Floor()}°{minutes.Numerator:00}'";
        }

        return $"{Decimals(Math.Abs(angle.ToDegreesDouble()), 2)}°";
    }

    /// <summary>A double with at most so many decimals, without trailing zeros.</summary>
    public static string Decimals(double value, int most) => value.ToString("0." + new string('#', most), CultureInfo.InvariantCulture);

    private static BigInteger OnDial(BigInteger hour)
    {
        BigInteger rest = BigInteger.Remainder(hour, 12);
        if (rest.Sign < 0)
            rest += 12;
        return rest.IsZero ? 12 : rest;
    }
}
