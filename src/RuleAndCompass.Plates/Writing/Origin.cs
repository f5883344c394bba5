using System.Globalization;
using System.Text;

namespace RuleAndCompass.Plates.Writing;

/// <summary>The mark in each written file that names the script it came from, so that a file of another script is not replaced unasked.</summary>
public static class Origin
{
    private const string Begins = "Set out from ";
    private const string Ends = " by Rule and Compass";

    /// <summary>One line in plain ASCII; signs outside letters, figures and <c>. _ /</c> are percent-coded, so that it fits into a comment of any format.</summary>
    public static string Line(string scriptName)
    {
        StringBuilder line = new(Begins);
        foreach (byte unit in Encoding.UTF8.GetBytes(scriptName))
        {
            if (char.IsAsciiLetterOrDigit((char)unit) || unit is (byte)'.' or (byte)'_' or (byte)'/')
            {
                line.Append((char)unit);
            }
            else
            {
                line.Append('%').Append(unit.ToString("X2", CultureInfo.InvariantCulture));
            }
        }

        return line.Append(Ends).ToString();
    }

    /// <summary>Whether a file was written from the script of that name.</summary>
    public static bool IsIn(ReadOnlySpan<byte> file, string scriptName) => file.IndexOf(Encoding.ASCII.GetBytes(Line(scriptName))) >= 0;
}
