using System.Text;

namespace RuleAndCompass.CommandLine.Files;

/// <summary>
/// The files a run leaves behind, each written whole or not at all: all go to temporary files beside their places, flushed to the disk, and are only then given
/// their names. Until the first has its name, a failure or an interruption leaves everything as it was.
/// </summary>
/// <param name="script">The script they come from; a file that exists is replaced only where it came from the same.</param>
/// <param name="force">Replace any file.</param>
internal sealed class OutputFiles(string script, bool force)
{
    private readonly List<(string Path, byte[] Content)> files = [];

    /// <summary>Opens a temporary file; a test puts in one that fails.</summary>
    internal Func<string, Stream> Open { get; init; } = path => new FileStream(path, FileMode.CreateNew, FileAccess.Write, FileShare.None);

    public IEnumerable<string> Paths => files.Select(file => file.Path);

    public void Add(string path, byte[] content) => files.Add((path, content));

    public void Add(string path, string content) => Add(path, Encoding.UTF8.GetBytes(content));

    /// <summary>Makes sure that no file is in the way, before the work of making them.</summary>
    /// <exception cref="StopException">One of them exists and came from something else.</exception>
    public static void Check(IEnumerable<string> paths, string script, bool force)
    {
        foreach (string path in paths)
        {
            try
            {
                if (Directory.Exists(path))
                    throw new StopException(CommandLineFindings.CannotWrite(path, "it is a folder"), ExitCode.FileTrouble);
                if (force || !File.Exists(path))
                    continue;
                if (new FileInfo(path).Length > 0 && OutputMark.Find(path) is var origin && origin != script)
                    throw new StopException(CommandLineFindings.MadeByAnother(path, origin), ExitCode.FileTrouble);
            }
            catch (Exception failure) when (IsFileTrouble(failure))
            {
                throw new StopException(CommandLineFindings.CannotWrite(path, Reason(failure)), ExitCode.FileTrouble);
            }
        }
    }

    /// <summary>Writes them.</summary>
    /// <exception cref="StopException">One can't be written, or is in the way.</exception>
    public void Write(CancellationToken cancellation)
    {
        Check(Paths, script, force);
        List<(string Temporary, string Path)> written = [];
        string? madeFolder = null;
        string current = files.Count > 0 ? files[0].Path : "";
        try
        {
            foreach ((string path, byte[] content) in files)
            {
                cancellation.ThrowIfCancellationRequested();
                current = path;
                if (Path.GetDirectoryName(path) is { Length: > 0 } folder && !Directory.Exists(folder))
                {
                    madeFolder ??= TopmostMissing(folder);
                    Directory.CreateDirectory(folder);
                }

                string temporary = TemporaryBeside(path);
                written.Add((temporary, path));
                WriteWhole(temporary, content);
                KeepRights(path, temporary);
            }

            cancellation.ThrowIfCancellationRequested();
            while (written.Count > 0)
            {
                (string temporary, string path) = written[0];
                current = path;
                File.Move(temporary, path, overwrite: true);
                written.RemoveAt(0);
                madeFolder = null;
            }
        }
        catch (Exception failure) when (IsFileTrouble(failure))
        {
            throw new StopException(CommandLineFindings.CannotWrite(current, Reason(failure)), ExitCode.FileTrouble);
        }
        finally
        {
            foreach ((string temporary, _) in written)
                Remove(() => File.Delete(temporary));
            if (madeFolder is not null)
                Remove(() => RemoveEmpty(madeFolder));
        }
    }

    /// <summary>Why a file could not be had, in a few words without its path.</summary>
    public static string Reason(Exception failure) => failure switch
    {
        UnauthorizedAccessException => "it is not allowed",
        DirectoryNotFoundException => "its folder does not exist",
        PathTooLongException => "the name is too long",
        IOException when failure.HResult is 28 || failure.Message.StartsWith("No space", StringComparison.Ordinal) => "there is no room on the disk",
        ArgumentException or NotSupportedException => "this is no name a file can have",
        _ => failure.Message.ReplaceLineEndings(" ").TrimEnd('.'),
    };

    public static bool IsFileTrouble(Exception failure) => failure is IOException or UnauthorizedAccessException or NotSupportedException or ArgumentException;

    private static string TemporaryBeside(string path) =>
        Path.Combine(Path.GetDirectoryName(path) ?? "", $".{Path.GetFileName(path)}.{Path.GetRandomFileName()}.part");

    private void WriteWhole(string temporary, byte[] content)
    {
        using Stream stream = Open(temporary);
        stream.Write(content);
        stream.Flush();
        if (stream is FileStream file)
            file.Flush(flushToDisk: true);
    }

    private static void KeepRights(string path, string temporary)
    {
        if (!OperatingSystem.IsWindows() && File.Exists(path))
            File.SetUnixFileMode(temporary, File.GetUnixFileMode(path));
    }

    private static string TopmostMissing(string folder)
    {
        string top = folder;
        while (Path.GetDirectoryName(top) is { Length: > 0 } parent && !Directory.Exists(parent))
            top = parent;
        return top;
    }

    private static void RemoveEmpty(string folder)
    {
        foreach (string inner in Directory.GetDirectories(folder))
            RemoveEmpty(inner);
        Directory.Delete(folder);
    }

    // Clearing up must not hide why it was needed.
    private static void Remove(Action remove)
    {
        try
        {
            remove();
        }
        catch (Exception failure) when (IsFileTrouble(failure))
        {
        }
    }
}
