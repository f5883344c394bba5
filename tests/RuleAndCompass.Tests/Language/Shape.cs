using System.Collections;
using System.Reflection;
using System.Text;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Tests.Language;

/// <summary>Writes out trees node by node, spans left out, so that two can be compared by what they hold.</summary>
internal static class Shape
{
    public static string Of(IEnumerable<Node> nodes) => string.Join('\n', nodes.Select(Of));

    public static string Of(Node node)
    {
        StringBuilder text = new();
        Write(text, node);
        return text.ToString();
    }

    private static void Write(StringBuilder text, object? value)
    {
        switch (value)
        {
            case null:
                text.Append("null");
                break;
            case Node node:
                text.Append(node.GetType().Name).Append('(');
                foreach (PropertyInfo property in node.GetType().GetProperties(BindingFlags.Public | BindingFlags.Instance).Where(property => property.PropertyType != typeof(SourceSpan)))
                {
                    Write(text.Append(property.Name).Append('='), property.GetValue(node));
                    text.Append(' ');
                }

                text.Append(')');
                break;
            case string word:
                text.Append('"').Append(word).Append('"');
                break;
            case IEnumerable list:
                text.Append('[');
                foreach (object? item in list)
                    Write(text, item);
                text.Append(']');
                break;
            default:
                text.Append(value);
                break;
        }
    }
}
