using System.Collections.Immutable;

namespace RuleAndCompass.Plates;

/// <summary>What paper plates are composed for; both lie on their long side.</summary>
public enum PlatePaper
{
    /// <summary>297 × 210 mm.</summary>
    A4,

    /// <summary>420 × 297 mm.</summary>
    A3,
}

/// <summary>What a caller may say about step plates.</summary>
public sealed record StepPlateOptions
{
    /// <summary>The script's file name, told in the title block; null where there is none.</summary>
    public string? ScriptName { get; init; }

    /// <summary>The paper; null for A4, or A3 where A4 would show the sheet smaller than 1 : 10.</summary>
    public PlatePaper? Paper { get; init; }

    /// <summary>Short cautions by act number, told under its sentence: a flat crossing, a short base.</summary>
    public ImmutableDictionary<int, ImmutableArray<string>> Cautions { get; init; } = ImmutableDictionary<int, ImmutableArray<string>>.Empty;
}
