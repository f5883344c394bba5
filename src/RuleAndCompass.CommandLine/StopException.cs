using RuleAndCompass.Language.Diagnostics;

namespace RuleAndCompass.CommandLine;

/// <summary>Work on the command line that cannot go on; tells why, and with which exit status the program ends.</summary>
internal sealed class StopException(Diagnostic finding, int status) : Exception(finding.Message)
{
    public Diagnostic Finding { get; } = finding;

    public int Status { get; } = status;
}
