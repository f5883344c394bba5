namespace RuleAndCompass.Plates;

/// <summary>What a caller may say about the full-size plate.</summary>
public sealed record FullSizeOptions
{
    /// <summary>The script's file name, told on the plate; null where there is none.</summary>
    public string? ScriptName { get; init; }

    /// <summary>Whether construction lines are shown too; where nothing is kept they always are.</summary>
    public bool ShowConstruction { get; init; }
}
