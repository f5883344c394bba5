using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>Where the sun stands, by the published low-accuracy series, at noon of universal time.</summary>
/// <remarks>
/// Meeus, Astronomical Algorithms, 2nd ed. (1998), ch. 7 (day number), 22 (obliquity), 25 (low accuracy) and 28 (equation of time).
/// The series is good to about 0.01°; its sum is rounded to a billionth of a degree and that figure is exact from there on, so that identities in it can be decided.
/// </remarks>
internal static class Sun
{
    private const int FirstMeanYear = 2025;
    private const int MeanYears = 4;
    private const double RoundingPerDegree = 1e9;
    private const double JulianDaysPerCentury = 36525;
    private const double Epoch2000 = 2451545;

    /// <summary>Degrees north of the equator; without a year the mean of 2025 to 2028.</summary>
    public static Rational Declination(int month, int day, int? year) => Mean(month, day, year, date => At(date).Declination);

    /// <summary>The equation of time, apparent less mean, as an angle in degrees.</summary>
    public static Rational Correction(int month, int day, int? year) => Mean(month, day, year, date => At(date).Correction);

    /// <summary>True for a day of the calendar; without a year 29 February counts.</summary>
    public static bool IsDay(int month, int day, int? year) =>
        month is >= 1 and <= 12 && day >= 1 && day <= DateTime.DaysInMonth(year ?? 2028, month);

    private static Rational Mean(int month, int day, int? year, Func<double, double> of)
    {
        double sum = 0;
        int count = year is null ? MeanYears : 1;
        for (int next = 0; next < count; next++)
            sum += of(JulianDay(year ?? (FirstMeanYear + next), month, day));
        return new Rational((long)Math.Round(sum / count * RoundingPerDegree), (long)RoundingPerDegree);
    }

    // Meeus, formula 7.1, Gregorian calendar, at noon.
    private static double JulianDay(int year, int month, int day)
    {
        if (month <= 2)
        {
            year--;
            month += 12;
        }

        int century = year / 100;
        return Math.Floor(365.25 * (year + 4716)) + Math.Floor(30.6001 * (month + 1)) + day + (2 - century + (century / 4)) - 1524.5 + 0.5;
    }

    private static (double Declination, double Correction) At(double julianDay)
    {
        double t = (julianDay - Epoch2000) / JulianDaysPerCentury;
        double meanLongitude = 280.46646 + (36000.76983 * t) + (0.0003032 * t * t);
        double anomaly = Radians(357.52911 + (35999.05029 * t) - (0.0001537 * t * t));
        double eccentricity = 0.016708634 - (0.000042037 * t) - (0.0000001267 * t * t);
        double centre = ((1.914602 - (0.004817 * t) - (0.000014 * t * t)) * Math.Sin(anomaly)) + ((0.019993 - (0.000101 * t)) * Math.Sin(2 * anomaly)) + (0.000289 * Math.Sin(3 * anomaly));
        double node = Radians(125.04 - (1934.136 * t));
        double longitude = Radians(meanLongitude + centre - 0.00569 - (0.00478 * Math.Sin(node)));
        double obliquity = Radians(23 + (26 / 60.0) + (21.448 / 3600) - (46.8150 / 3600 * t) - (0.00059 / 3600 * t * t) + (0.001813 / 3600 * t * t * t) + (0.00256 * Math.Cos(node)));
        double declination = Math.Asin(Math.Sin(obliquity) * Math.Sin(longitude));
        double y = Math.Pow(Math.Tan(obliquity / 2), 2);
        double l = Radians(meanLongitude);
        double correction = (y * Math.Sin(2 * l)) - (2 * eccentricity * Math.Sin(anomaly)) + (4 * eccentricity * y * Math.Sin(anomaly) * Math.Cos(2 * l))
            - (0.5 * y * y * Math.Sin(4 * l)) - (1.25 * eccentricity * eccentricity * Math.Sin(2 * anomaly));
        return (Degrees(declination), Degrees(correction));
    }

    private static double Radians(double degrees) => degrees * Math.PI / 180;

    private static double Degrees(double radians) => radians * 180 / Math.PI;
}
