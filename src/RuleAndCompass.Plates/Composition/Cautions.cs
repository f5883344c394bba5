using System.Collections.Immutable;
using RuleAndCompass.Making;

namespace RuleAndCompass.Plates.Composition;

/// <summary>The usual cautions, where work can hurt.</summary>
internal static class Cautions
{
    public static ImmutableArray<string> For(Layout layout)
    {
        ImmutableArray<string>.Builder cautions = ImmutableArray.CreateBuilder<string>();
        cautions.Add("Scribers and dividers are sharp: carry them capped.");
        if (layout.IsDial)
        {
            cautions.Add("Never look at the sun. Keep the tip of a style blunt, or guarded where people pass.");
        }

        cautions.Add("The rules of your workshop and your country come before this sheet.");
        return cautions.ToImmutable();
    }
}
