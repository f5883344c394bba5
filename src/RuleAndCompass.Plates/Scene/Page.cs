using System.Collections.Immutable;

namespace RuleAndCompass.Plates.Scene;

/// <summary>One page, finished: everything on it in millimetres. The writers only translate it.</summary>
/// <param name="Title">What a reader of the file calls it.</param>
public sealed record Page(double WidthMillimetres, double HeightMillimetres, string Title, ImmutableArray<Item> Items);
