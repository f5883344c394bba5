using System.Runtime.InteropServices;
using System.Text;
using RuleAndCompass.CommandLine.Display;

namespace RuleAndCompass.CommandLine;

/// <summary>Where the process begins: streams, signals, exit status.</summary>
internal static class Program
{
    private static readonly UTF8Encoding Utf8 = new(encoderShouldEmitUTF8Identifier: false);

    public static int Main(string[] args)
    {
        using StreamWriter output = new(Console.OpenStandardOutput(), Utf8, bufferSize: 1 << 16);
        using StreamWriter error = new(Console.OpenStandardError(), Utf8) { AutoFlush = true };
        using CancellationTokenSource interrupt = new();
        using PosixSignalRegistration onInterrupt = PosixSignalRegistration.Create(PosixSignal.SIGINT, Interrupt);
        using PosixSignalRegistration onTerminate = PosixSignalRegistration.Create(PosixSignal.SIGTERM, Interrupt);
        Terminal terminal = new(Console.OpenStandardInput, output, error)
        {
            OutputIsTerminal = !Console.IsOutputRedirected,
            ErrorIsTerminal = !Console.IsErrorRedirected,
            UsesColour = string.IsNullOrEmpty(Environment.GetEnvironmentVariable("NO_COLOR")),
        };
        int status = Run(args, terminal, interrupt.Token);
        try
        {
            output.Flush();
        }
        catch (IOException failure)
        {
            error.WriteLine($"setout: the result could not be written to standard output: {failure.Message}");
            return Math.Max(status, ExitCode.FileTrouble);
        }

        return status;

        void Interrupt(PosixSignalContext context)
        {
            // The process ends by itself once the work has noticed and cleared up; a second signal ends it at once.
            if (interrupt.IsCancellationRequested)
                return;
            context.Cancel = true;
            interrupt.Cancel();
        }
    }

    /// <summary>Does what the arguments ask and returns the exit status; never throws.</summary>
    public static int Run(string[] args, Terminal terminal, CancellationToken cancellation = default)
    {
        try
        {
            return CommandTree.Run(args, terminal, cancellation);
        }
        catch (OperationCanceledException)
        {
            terminal.Error.WriteLine("setout: interrupted; nothing was left half written");
            return ExitCode.Interrupted;
        }
        catch (Exception failure)
        {
            terminal.Error.WriteLine($"setout: a fault of the program, which its developers would like to hear of with the script that shows it: {InOneLine(failure)}");
            return ExitCode.ProgramFault;
        }
    }

    private static string InOneLine(Exception failure) => $"{failure.GetType().Name}, {failure.Message.ReplaceLineEndings(" ")}";
}
