using System.Diagnostics;
using System.Text;
using RuleAndCompass.CommandLine.Display;

namespace RuleAndCompass.CommandLine.Tests;

/// <summary>What a run left: its exit status and what it wrote.</summary>
internal sealed record Ran(int Status, string Output, string Error);

/// <summary>A folder of its own for a test, gone afterwards, and the program to run in it.</summary>
internal sealed class Workshop : IDisposable
{
    /// <summary>A layout in which all is well: an equilateral triangle on a base, with a claim and a comparison that hold.</summary>
    public const string Triangle = """
        title "Gable of the net loft"
        sheet A4 sideways
        given base = 90 mm
        stage "The base"
        prick A at (-base / 2, -30 mm)
        prick B at (base / 2, -30 mm)
        rule  foot through A, B
        stage "The ridge"
        strike left_arc about A through B
        strike right_arc about B through A
        prick C where left_arc meets right_arc, above A
        rule  rafter through A, C
        keep  foot from A to B cut
        keep  rafter from A to C
        claim distance A to C = distance B to C
        compare distance A to C with base as "rafter" within 0.1 mm
        compare angle from foot to rafter anticlockwise with 60° as "pitch"

        """;

    public Workshop() => Directory.CreateDirectory(Folder);

    public string Folder { get; } = Path.Combine(Path.GetTempPath(), $"setout-tests-{Guid.NewGuid():N}");

    /// <summary>A file's path in the folder.</summary>
    public string At(string name) => Path.Combine(Folder, name);

    public string Read(string name) => File.ReadAllText(At(name));

    /// <summary>Puts a script into the folder and gives its path.</summary>
    public string Script(string name, string text)
    {
        File.WriteAllText(At(name), text);
        return At(name);
    }

    /// <summary>Names of all files under the folder, in order.</summary>
    public string[] Files() => [.. Directory.GetFiles(Folder, "*", SearchOption.AllDirectories).Select(path => Path.GetRelativePath(Folder, path)).Order(StringComparer.Ordinal)];

    /// <summary>Runs the program in this process.</summary>
    public static Ran Run(params string[] args) => RunWith("", CancellationToken.None, args);

    /// <summary>Runs the program in this process with something on standard input.</summary>
    public static Ran RunWith(string input, CancellationToken cancellation, params string[] args)
    {
        using StringWriter output = new(), error = new();
        Terminal terminal = new(() => new MemoryStream(Encoding.UTF8.GetBytes(input)), output, error);
        int status = Program.Run(args, terminal, cancellation);
        return new(status, output.ToString(), error.ToString());
    }

    /// <summary>Runs the built program as a process, its working folder this one.</summary>
    public Ran RunProcess(params string[] args)
    {
        using Process process = Start(closesInput: true, args);
        Task<string> error = process.StandardError.ReadToEndAsync();
        string output = process.StandardOutput.ReadToEnd();
        process.WaitForExit(TimeSpan.FromMinutes(2)).ShouldBeTrue();
        return new(process.ExitCode, output, error.Result);
    }

    public Process Start(bool closesInput, params string[] args)
    {
        ProcessStartInfo start = new(Path.Combine(AppContext.BaseDirectory, OperatingSystem.IsWindows() ? "setout.exe" : "setout"))
        {
            WorkingDirectory = Folder,
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            StandardOutputEncoding = Encoding.UTF8,
            StandardErrorEncoding = Encoding.UTF8,
        };
        foreach (string arg in args)
            start.ArgumentList.Add(arg);
        Process process = Process.Start(start) ?? throw new InvalidOperationException("The program did not start.");
        if (closesInput)
            process.StandardInput.Close();
        return process;
    }

    public void Dispose()
    {
        if (!OperatingSystem.IsWindows())
            foreach (string folder in Directory.GetDirectories(Folder, "*", SearchOption.AllDirectories))
                File.SetUnixFileMode(folder, UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.UserExecute);
        Directory.Delete(Folder, recursive: true);
    }
}
