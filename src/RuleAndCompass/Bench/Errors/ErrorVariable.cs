namespace RuleAndCompass.Bench.Errors;

/// <summary>Where an error comes from; each has its own standard deviation in the <see cref="Hand"/>.</summary>
public enum ErrorSource
{
    /// <summary>A pricked point, or the needle's seat.</summary>
    Prick,

    /// <summary>A drawn line from a point it is laid to.</summary>
    Edge,

    /// <summary>A span set.</summary>
    Opening,

    /// <summary>A reading of the scale.</summary>
    Scale,

    /// <summary>An angle marked by the protractor.</summary>
    Protractor,

    /// <summary>The square's corner.</summary>
    Square,

    /// <summary>The printed plate's two scale errors, across and up.</summary>
    Paper,
}

/// <summary>One independent error: normal, about zero.</summary>
/// <param name="Source">Where it comes from.</param>
/// <param name="Act">The number of the act it arises at; 0 for the sheet.</param>
/// <param name="Sigma">Standard deviation: millimetres, radians for a protractor or square, parts of one for the paper.</param>
internal readonly record struct ErrorVariable(ErrorSource Source, int Act, double Sigma);
