using System.Reflection;
using System.Text;

namespace RuleAndCompass.CommandLine;

/// <summary>Texts that are embedded in the program.</summary>
internal static class Resource
{
    /// <summary>An embedded text.</summary>
    /// <exception cref="ArgumentException">There is none of that name.</exception>
    public static string Read(Assembly assembly, string name)
    {
        using Stream stream = assembly.GetManifestResourceStream(name) ?? throw new ArgumentException($"Nothing called {name} is embedded.", nameof(name));
        using StreamReader reader = new(stream, Encoding.UTF8);
        return reader.ReadToEnd();
    }
}
