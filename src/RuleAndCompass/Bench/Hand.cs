namespace RuleAndCompass.Bench;

/// <summary>The hand's small errors, one standard deviation each. Lengths in millimetres, angles in degrees.</summary>
/// <param name="Name"><c>fine</c>, <c>ordinary</c>, <c>coarse</c> or <c>own</c>; with changes <c>coarse, but edge 1 mm</c>.</param>
/// <param name="PrickMillimetres">A pricked point, or the needle's seat.</param>
/// <param name="EdgeMillimetres">A drawn line from each point it is laid to.</param>
/// <param name="OpeningMillimetres">A span set.</param>
/// <param name="ScaleMillimetres">A reading of the scale.</param>
/// <param name="ProtractorDegrees">An angle marked.</param>
/// <param name="SquareDegrees">The square's own corner.</param>
/// <remarks>
/// Where the three presets come from:
/// <list type="bullet">
/// <item>Coarse prick, edge and opening, 0.25 mm: the plotting accuracy usually adopted; ordinary, 0.10 mm: the lower end of its range of 0.1 to 0.4 mm
/// (NPTEL, Surveying course 105107122, Plotting accuracy: <c>plot-mean</c>, <c>plot-range</c>). One minute of arc, what the eye parts, is 0.07 mm at
/// 250 mm (<c>acuity</c>, from memory).</item>
/// <item>Fine prick, edge and opening, 0.05 mm: a line scribed from a vernier height gauge; scale, 0.10 mm fine and 0.20 mm ordinary: a scribed line set
/// from a rule, 0.1 to 0.25 mm (<c>marking-metal</c>, workshop manuals from memory, of low confidence).</item>
/// <item>Coarse scale 0.50 mm, half a division of a millimetre rule; all of protractor and square: <i>common practice</i>.</item>
/// <item>Paper, 0.1 % and 0.3 %: bond paper changes with the air's damp by 0.1 to 0.2 % along the grain and 0.2 to 0.4 % across it (<c>paper-hygro</c>);
/// 1 % where nobody measured: printers are said to be up to 2 % out (<c>laser-scale</c>). Both sources are postings: take them as <i>common practice</i>.</item>
/// </list>
/// </remarks>
public sealed record Hand(
    string Name, double PrickMillimetres, double EdgeMillimetres, double OpeningMillimetres, double ScaleMillimetres, double ProtractorDegrees, double SquareDegrees)
{
    /// <summary>The plate's scale error, in parts of one, for a print that nobody measured.</summary>
    public const double UnmeasuredPaperFraction = 0.01;

    /// <summary>A fine scriber.</summary>
    public static Hand Fine { get; } = new("fine", 0.05, 0.05, 0.05, 0.10, 0.10, 0.02) { PaperFraction = 0.001 };
    /// <summary>An ordinary hand.</summary>
    public static Hand Ordinary { get; } = new("ordinary", 0.10, 0.10, 0.10, 0.20, 0.25, 0.05);
    /// <summary>Chalk or a carpenter's pencil.</summary>
    public static Hand Coarse { get; } = new("coarse", 0.25, 0.25, 0.25, 0.50, 0.50, 0.10);

    /// <summary>
    /// A printed plate's scale error across, and likewise up, in parts of one, once its bars were measured. No script sets it; it concerns only what is
    /// taken off the plate.
    /// </summary>
    public double PaperFraction { get; init; } = 0.003;
}
