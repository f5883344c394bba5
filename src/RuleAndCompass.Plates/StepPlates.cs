using System.Collections.Immutable;
using RuleAndCompass.Making;
using RuleAndCompass.Plates.Composition;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates;

/// <summary>The plates a maker works from at the bench: one to a stage, more where a stage has many acts.</summary>
public static class StepPlates
{
    /// <summary>Composes the pages, in order; at least one.</summary>
    /// <param name="progress">Told the part of the pages done, 0 to 1.</param>
    /// <param name="cancellation">Ends the work with an <see cref="OperationCanceledException"/>.</param>
    public static ImmutableArray<Page> Compose(
        Layout layout, StepPlateOptions? options = null, IProgress<double>? progress = null, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(layout);
        return new StepPlateComposer(layout, options ?? new(), cancellation).Compose(progress);
    }
}
