using System.Security.Cryptography;
using System.Text;

namespace RuleAndCompass.CommandLine.Files;

/// <summary>A script as it was read.</summary>
/// <param name="Name">The file's name without folders, by which findings and outputs call it.</param>
/// <param name="Path">As the command line names it; <c>-</c> for standard input.</param>
/// <param name="Text">The script.</param>
internal sealed record ScriptFile(string Name, string Path, string Text)
{
    /// <summary>What stands for standard input on the command line.</summary>
    public const string StandardInput = "-";

    private const string StandardInputName = "standard input";
    private const string StandardInputStem = "layout";
    private const int MaximumBytes = 64_000_000; // Far above the reader's own limit, which then tells it in its own words.

    /// <summary>The name without its ending, from which outputs take theirs.</summary>
    public string Stem => Path == StandardInput ? StandardInputStem : System.IO.Path.GetFileNameWithoutExtension(Name) is { Length: > 0 } stem ? stem : StandardInputStem;

    /// <summary>The SHA-256 of its text in UTF-8, in small hexadecimal figures.</summary>
    public string Hash => Convert.ToHexStringLower(SHA256.HashData(Encoding.UTF8.GetBytes(Text)));

    /// <summary>Reads a script.</summary>
    /// <exception cref="StopException">It can't be read.</exception>
    public static ScriptFile Read(string path, Surroundings surroundings)
    {
        if (path != StandardInput)
            return new(System.IO.Path.GetFileName(path), path, ReadText(path));
        using Stream input = surroundings.Terminal.OpenInput();
        return new(StandardInputName, path, Decode(StandardInputName, ReadAll(StandardInputName, input, surroundings.Cancellation)));
    }

    /// <summary>Reads a text file.</summary>
    /// <exception cref="StopException">It can't be read.</exception>
    public static string ReadText(string path)
    {
        try
        {
            if (Directory.Exists(path))
                throw new StopException(CommandLineFindings.CannotRead(path, "it is a folder"), ExitCode.FileTrouble);
            using FileStream file = new(path, FileMode.Open, FileAccess.Read, FileShare.Read);
            return Decode(path, ReadAll(path, file, CancellationToken.None));
        }
        catch (Exception failure) when (failure is FileNotFoundException or DirectoryNotFoundException)
        {
            throw new StopException(CommandLineFindings.NoSuchFile(path), ExitCode.FileTrouble);
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException or NotSupportedException or ArgumentException)
        {
            throw new StopException(CommandLineFindings.CannotRead(path, OutputFiles.Reason(failure)), ExitCode.FileTrouble);
        }
    }

    /// <summary>Reads the script that a <c>use</c> sentence of this one names, beside this one; null where it can't be read.</summary>
    public string? ReadBeside(string name)
    {
        string? folder = Path == StandardInput ? null : System.IO.Path.GetDirectoryName(Path);
        try
        {
            return ReadText(string.IsNullOrEmpty(folder) ? name : System.IO.Path.Combine(folder, name));
        }
        catch (StopException)
        {
            return null;
        }
    }

    // A read from a terminal or a pipe may wait for ever; an interruption does not wait for it.
    private static byte[] ReadAll(string name, Stream stream, CancellationToken cancellation)
    {
        using MemoryStream whole = new();
        byte[] block = new byte[1 << 16];
        for (int read; (read = ReadBlock()) > 0;)
        {
            whole.Write(block, 0, read);
            if (whole.Length > MaximumBytes)
                throw new StopException(CommandLineFindings.TooLong(name, MaximumBytes), ExitCode.FileTrouble);
        }

        return whole.ToArray();

        int ReadBlock() => cancellation.CanBeCanceled
            ? Task.Run(() => stream.Read(block)).WaitAsync(cancellation).GetAwaiter().GetResult()
            : stream.Read(block);
    }

    private static string Decode(string name, byte[] bytes)
    {
        ReadOnlySpan<byte> text = bytes;
        if (text.StartsWith(Encoding.UTF8.Preamble))
            text = text[Encoding.UTF8.Preamble.Length..];
        int valid = 0;
        for (ReadOnlySpan<byte> rest = text; rest.Length > 0;)
        {
            if (Rune.DecodeFromUtf8(rest, out _, out int length) != System.Buffers.OperationStatus.Done)
                throw new StopException(CommandLineFindings.NotText(name, bytes.Length - text.Length + valid), ExitCode.FileTrouble);
            valid += length;
            rest = rest[length..];
        }

        return Encoding.UTF8.GetString(text);
    }
}
