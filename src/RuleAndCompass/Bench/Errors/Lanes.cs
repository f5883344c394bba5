using System.Runtime.Intrinsics;

namespace RuleAndCompass.Bench.Errors;

/// <summary>
/// Elementary functions of four trials at once. Only additions, products, quotients, roots and choices are used, each
/// rounded as IEEE 754 prescribes and none fused, so every lane gives the same bits on every machine, whatever the width of its vectors.
/// </summary>
/// <remarks>
/// Polynomials: sine, cosine and logarithm of fdlibm (Sun Microsystems, 1993: k_sin.c, k_cos.c, e_log.c); arc tangent of Cephes
/// (S. Moshier, 1984–2000: atan.c).
/// </remarks>
internal static class Lanes
{
    // 2^52 + 2^51: adding it to a small double leaves the nearest whole number in the low bits.
    private const double RoundingConstant = 6755399441055744.0;

    public static Vector256<double> All(double value) => Vector256.Create(value);

    /// <summary>Sine and cosine of an angle in turns, of at most 2^48 turns.</summary>
    public static (Vector256<double> Sine, Vector256<double> Cosine) SineCosine(Vector256<double> turns)
    {
        Vector256<double> shifted = turns * 4.0 + All(RoundingConstant);
        Vector256<ulong> quadrant = shifted.AsUInt64();
        Vector256<double> x = (turns - (shifted - All(RoundingConstant)) * 0.25) * Math.Tau;
        Vector256<double> z = x * x;

        Vector256<double> sine = x + x * z * (All(-1.66666666666666324348e-01) + z * (All(8.33333333332248946124e-03)
            + z * (All(-1.98412698298579493134e-04) + z * (All(2.75573137070700676789e-06)
            + z * (All(-2.50507602534068634195e-08) + z * All(1.58969099521155010221e-10))))));
        Vector256<double> cosine = All(1.0) - (z * 0.5 - z * z * (All(4.16666666666666019037e-02) + z * (All(-1.38888888888741095749e-03)
            + z * (All(2.48015872894767294178e-05) + z * (All(-2.75573143513906633035e-07)
            + z * (All(2.08757232129817482790e-09) + z * All(-1.13596475577881948265e-11)))))));

        Vector256<ulong> one = Vector256.Create(1UL);
        Vector256<ulong> two = Vector256.Create(2UL);
        Vector256<double> odd = Vector256.Equals(quadrant & one, one).AsDouble();
        Vector256<ulong> sineSign = (quadrant & two) << 62;
        Vector256<ulong> cosineSign = ((quadrant + one) & two) << 62;
        return (
            (Vector256.ConditionalSelect(odd, cosine, sine).AsUInt64() ^ sineSign).AsDouble(),
            (Vector256.ConditionalSelect(odd, sine, cosine).AsUInt64() ^ cosineSign).AsDouble());
    }

    /// <summary>The natural logarithm of normal, positive numbers.</summary>
    public static Vector256<double> Logarithm(Vector256<double> value)
    {
        // value = 2^exponent × (1 + f), with 1 + f from √½ to √2: the constant is the distance from √½ to 1 in the bits.
        Vector256<ulong> bits = value.AsUInt64() + Vector256.Create(0x3FF0000000000000UL - 0x3FE6A09E667F3BCDUL);
        Vector256<ulong> mantissa = (bits & Vector256.Create(0x000FFFFFFFFFFFFFUL)) + Vector256.Create(0x3FE6A09E667F3BCDUL);
        Vector256<double> exponent = ((bits >> 52) | Vector256.Create(0x4330000000000000UL)).AsDouble() - All(4503599627370496.0 + 1023.0);
        Vector256<double> f = mantissa.AsDouble() - All(1.0);
        Vector256<double> s = f / (f + All(2.0));
        Vector256<double> z = s * s;
        Vector256<double> r = z * (All(6.666666666666735130e-01) + z * (All(3.999999999940941908e-01) + z * (All(2.857142874366239149e-01)
            + z * (All(2.222219843214978396e-01) + z * (All(1.818357216161805012e-01) + z * (All(1.531383769920937332e-01)
            + z * All(1.479819860511658591e-01)))))));
        Vector256<double> half = f * f * 0.5;
        return exponent * 6.93147180369123816490e-01 - ((half - (s * (half + r) + exponent * 1.90821492927058770002e-10)) - f);
    }

    /// <summary>The angle of (<paramref name="x"/>, <paramref name="y"/>) in radians, from −π to π; 0 for the zero vector.</summary>
    public static Vector256<double> Angle(Vector256<double> y, Vector256<double> x)
    {
        Vector256<double> absoluteX = Vector256.Abs(x);
        Vector256<double> absoluteY = Vector256.Abs(y);
        Vector256<double> steep = Vector256.GreaterThan(absoluteY, absoluteX);
        Vector256<double> numerator = Vector256.ConditionalSelect(steep, absoluteX, absoluteY);
        Vector256<double> denominator = Vector256.ConditionalSelect(steep, absoluteY, absoluteX);

        // Above tan 33° the angle less 45° is smaller: (n − d) / (n + d).
        Vector256<double> far = Vector256.GreaterThan(numerator, denominator * 0.66);
        Vector256<double> top = Vector256.ConditionalSelect(far, numerator - denominator, numerator);
        Vector256<double> bottom = Vector256.ConditionalSelect(far, numerator + denominator, denominator);
        bottom = Vector256.ConditionalSelect(Vector256.Equals(bottom, Vector256<double>.Zero), All(1.0), bottom);
        Vector256<double> t = top / bottom;
        Vector256<double> z = t * t;
        Vector256<double> p = (((All(-8.750608600031904122785e-01) * z + All(-1.615753718733365076637e+01)) * z
            + All(-7.500855792314704667340e+01)) * z + All(-1.228866684490136173410e+02)) * z + All(-6.485021904942025371773e+01);
        Vector256<double> q = ((((z + All(2.485846490142306297962e+01)) * z + All(1.650270098316988542046e+02)) * z
            + All(4.328810604912902668951e+02)) * z + All(4.853903996359136964868e+02)) * z + All(1.945506571482613964425e+02);
        Vector256<double> angle = t + t * z * p / q + Vector256.ConditionalSelect(far, All(Math.PI / 4), Vector256<double>.Zero);

        angle = Vector256.ConditionalSelect(steep, All(Math.PI / 2) - angle, angle);
        angle = Vector256.ConditionalSelect(Vector256.LessThan(x, Vector256<double>.Zero), All(Math.PI) - angle, angle);
        return Vector256.ConditionalSelect(Vector256.LessThan(y, Vector256<double>.Zero), -angle, angle);
    }

    /// <summary>Not a number where <paramref name="lost"/>, else <paramref name="value"/>.</summary>
    public static Vector256<double> Lose(Vector256<double> lost, Vector256<double> value) => Vector256.ConditionalSelect(lost, All(double.NaN), value);
}
