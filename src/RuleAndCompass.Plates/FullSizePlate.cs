using System.Collections.Immutable;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Composition;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates;

/// <summary>The layout at exactly 1 : 1, to be pricked through onto the stock.</summary>
/// <remarks>
/// The page is the sheet itself, edge for edge, where two check bars and the instruction find free room on it; else it is larger than the sheet by a
/// margin all round and a strip for them below. Pages are given as a list, so that tiling over several can take this place.
/// </remarks>
public static class FullSizePlate
{
    /// <summary>Composes the page.</summary>
    /// <param name="cancellation">Ends the work with an <see cref="OperationCanceledException"/>.</param>
    public static ImmutableArray<Page> Compose(Layout layout, FullSizeOptions? options = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(layout);
        return [new FullSizeComposer(layout, options ?? new(), cancellation).Compose()];
    }
}
