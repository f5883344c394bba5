using Spectre.Console;

namespace RuleAndCompass.CommandLine.Display;

/// <summary>Tables for someone who reads at a terminal. What is piped stays plain text.</summary>
internal static class Tables
{
    /// <summary>Draws a table to the terminal's width.</summary>
    public static void Write(Terminal terminal, IEnumerable<string> names, IEnumerable<IEnumerable<string>> rows)
    {
        Table table = new() { Border = TableBorder.Simple };
        foreach (string name in names)
            table.AddColumn(new TableColumn(Markup.Escape(name)));
        foreach (IEnumerable<string> row in rows)
            table.AddRow([.. row.Select(cell => new Text(cell))]);
        ConsoleFor(terminal.Output, terminal.UsesColour).Write(table);
    }

    public static IAnsiConsole ConsoleFor(TextWriter writer, bool usesColour) => AnsiConsole.Create(new AnsiConsoleSettings
    {
        Ansi = AnsiSupport.Yes,
        ColorSystem = usesColour ? ColorSystemSupport.Detect : ColorSystemSupport.NoColors,
        Interactive = InteractionSupport.No,
        Out = new AnsiConsoleOutput(writer),
    });
}
