namespace RuleAndCompass.Bench;

/// <summary>The hand's small errors, one standard deviation each. Lengths in millimetres, angles in degrees.</summary>
/// <param name="Name"><c>fine</c>, <c>ordinary</c>, <c>coarse</c> or <c>own</c>; with changes <c>coarse, but edge 1 mm</c>.</param>
/// <param name="PrickMillimetres">A pricked point, or the needle's seat.</param>
/// <param name="EdgeMillimetres">A drawn line from each point it is laid to.</param>
/// <param name="OpeningMillimetres">A span set.</param>
/// <param name="ScaleMillimetres">A reading of the scale.</param>
/// <param name="ProtractorDegrees">An angle marked.</param>
/// <param name="SquareDegrees">The square's own corner.</param>
public sealed record Hand(
    string Name, double PrickMillimetres, double EdgeMillimetres, double OpeningMillimetres, double ScaleMillimetres, double ProtractorDegrees, double SquareDegrees)
{
    /// <summary>A fine scriber.</summary>
    public static Hand Fine { get; } = new("fine", 0.05, 0.05, 0.05, 0.10, 0.10, 0.02);
    /// <summary>An ordinary hand.</summary>
    public static Hand Ordinary { get; } = new("ordinary", 0.10, 0.10, 0.10, 0.20, 0.25, 0.05);
    /// <summary>Chalk or a carpenter's pencil.</summary>
    public static Hand Coarse { get; } = new("coarse", 0.25, 0.25, 0.25, 0.50, 0.50, 0.10);
}
