using System.Diagnostics;
using Spectre.Console;

namespace RuleAndCompass.CommandLine.Display;

/// <summary>One line on a terminal that tells how far long work has come; nothing for short work, and nothing where nobody waits at one.</summary>
internal sealed class ProgressLine(Terminal terminal, string what, bool quiet) : IProgress<double>, IDisposable
{
    private static readonly TimeSpan Patience = TimeSpan.FromMilliseconds(700);
    private static readonly TimeSpan BetweenSigns = TimeSpan.FromMilliseconds(100);

    private readonly Lock guard = new();
    private readonly bool isShown = terminal.ErrorIsTerminal && !quiet;
    private readonly long begun = Stopwatch.GetTimestamp();
    private long next;
    private bool stands;

    public void Report(double value)
    {
        if (!isShown)
            return;
        lock (guard)
        {
            TimeSpan since = Stopwatch.GetElapsedTime(begun);
            if (since < Patience || since.Ticks < next)
                return;
            next = (since + BetweenSigns).Ticks;
            Show(value);
        }
    }

    public void Dispose()
    {
        if (stands)
            terminal.Error.Write("\r\u001b[K");
    }

    private void Show(double value)
    {
        IAnsiConsole console = Tables.ConsoleFor(terminal.Error, terminal.UsesColour);
        terminal.Error.Write("\r\u001b[K");
        console.Write(new Markup($"{Markup.Escape(what)} [grey]{Math.Clamp(value, 0, 1) * 100:0} %[/]"));
        stands = true;
    }
}
