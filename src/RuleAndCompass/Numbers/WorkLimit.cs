using System.Diagnostics;

namespace RuleAndCompass.Numbers;

/// <summary>What ends a decision before its time: the caller's wish or its limit.</summary>
internal sealed class WorkLimit(TimeSpan? limit, CancellationToken cancellation)
{
    private readonly long start = limit is null ? 0 : Stopwatch.GetTimestamp();

    public static WorkLimit None { get; } = new(null, CancellationToken.None);

    /// <exception cref="OperationCanceledException">The caller wants no answer any more.</exception>
    /// <exception cref="OutOfTimeException">The limit is over.</exception>
    public void Check()
    {
        cancellation.ThrowIfCancellationRequested();
        if (limit is { } most && Stopwatch.GetElapsedTime(start) > most)
            throw new OutOfTimeException();
    }
}

/// <summary>The time for one decision is over.</summary>
internal sealed class OutOfTimeException : Exception;
