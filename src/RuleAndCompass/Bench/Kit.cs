namespace RuleAndCompass.Bench;

/// <summary>A range of openings, millimetres.</summary>
public readonly record struct Reach(Numbers.Rational Least, Numbers.Rational Greatest);

/// <summary>The tools at hand; null or false where one is missing.</summary>
/// <param name="Straightedge">Its length, millimetres; null where the sheet's need is met whatever it is (no <c>kit</c> sentence).</param>
/// <param name="HasStraightedge">Whether there is one.</param>
/// <param name="Dividers">What they open to.</param>
/// <param name="Beam">What the beam compass opens to.</param>
/// <param name="Square">Whether there is a square.</param>
/// <param name="Protractor">Whether there is a protractor.</param>
/// <param name="ScaleStep">The scale's step, millimetres.</param>
public sealed record Kit(
    bool HasStraightedge, Numbers.Rational? Straightedge, Reach? Dividers, Reach? Beam, bool Square, bool Protractor, Numbers.Rational? ScaleStep);
