namespace RuleAndCompass.Numbers;

/// <summary>An exact real number: an immutable node of an expression graph.</summary>
public abstract class Real
{
    public static Real Zero => throw new NotImplementedException();
    public static Real One => throw new NotImplementedException();
    /// <summary>π, a quantity without an exact value: enclosures only, generic in identities.</summary>
    public static Real Pi => throw new NotImplementedException();
    public static implicit operator Real(int value) => throw new NotImplementedException();
    public static implicit operator Real(Rational value) => throw new NotImplementedException();
    public static Real operator +(Real a, Real b) => throw new NotImplementedException();
    public static Real operator -(Real a, Real b) => throw new NotImplementedException();
    public static Real operator *(Real a, Real b) => throw new NotImplementedException();
    /// <summary>The caller has decided that <paramref name="b"/> is not zero.</summary>
    public static Real operator /(Real a, Real b) => throw new NotImplementedException();
    public static Real operator -(Real a) => throw new NotImplementedException();
    /// <summary>The caller has decided that <paramref name="radicand"/> is not negative.</summary>
    public static Real Sqrt(Real radicand) => throw new NotImplementedException();
    /// <summary>A number or length given in the script: its value is known exactly; identities are sought for every value of it.</summary>
    public static Real Given(string name, Rational value, Rational? from = null, Rational? to = null) => throw new NotImplementedException();
    /// <summary>The value when it is structurally a rational; no decision is made.</summary>
    public bool TryGetRational(out Rational value) => throw new NotImplementedException();
    /// <summary>Within one unit in the last place of the true value.</summary>
    public double ToDouble() => throw new NotImplementedException();
}
