namespace RuleAndCompass.CommandLine;

/// <summary>What the program tells the shell. Of several, the highest.</summary>
internal static class ExitCode
{
    public const int Well = 0;

    /// <summary>The script is wrong, a claim is refuted, a comparison is out of tolerance, or a script is not tidy.</summary>
    public const int ScriptWrong = 1;

    public const int CommandLineWrong = 2;

    /// <summary>A file can't be read or written.</summary>
    public const int FileTrouble = 3;

    /// <summary>A fault of the program itself; the number is that of EX_SOFTWARE in sysexits.h.</summary>
    public const int ProgramFault = 70;

    public const int Interrupted = 130;
}
