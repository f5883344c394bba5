using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Making;

/// <summary>
/// Names and what they stand for. A script and each recipe that is followed have one of their own; a pass of a loop has a smaller one inside it,
/// in which plain names live, while families live in the outer.
/// </summary>
/// <param name="outer">What can be seen beyond; null for a script or a recipe.</param>
/// <param name="prefix">What stands before names on the stock: <c>dial.</c> for a recipe followed as dial.</param>
internal sealed class Scope(Scope? outer, string prefix)
{
    private readonly Dictionary<string, Value> values = new(StringComparer.Ordinal);

    public string Prefix => prefix;

    /// <summary>The scope in which families live.</summary>
    public Scope Root => outer?.Root ?? this;

    /// <summary>A scope for one pass of a loop.</summary>
    public Scope Pass() => new(this, prefix);

    public Value? Find(string name) => values.GetValueOrDefault(name) ?? outer?.Find(name);

    /// <summary>Every name that can be seen, for suggestions.</summary>
    public IEnumerable<string> Names => outer is null ? values.Keys : values.Keys.Concat(outer.Names);

    /// <summary>Binds a plain name here; false where it is bound already and could be seen.</summary>
    public bool TryBind(string name, Value value)
    {
        if (Find(name) is { } bound and not UnboundValue)
            return false;
        values[name] = value;
        return true;
    }

    /// <summary>Binds one of a family; false where that index is bound, or the name is no family.</summary>
    public bool TryBind(string name, ReadOnlySpan<IndexKey> indices, Value value)
    {
        Scope root = Root;
        if (Find(name) is { } seen and not FamilyValue and not UnboundValue)
            return false;
        if (root.values.GetValueOrDefault(name) is not FamilyValue family)
            root.values[name] = family = new();
        for (int depth = 0; depth < indices.Length - 1; depth++)
        {
            if (family.Find(indices[depth]) is not FamilyValue inner)
            {
                inner = new();
                if (!family.TryAdd(indices[depth], inner))
                    return false;
            }

            family = inner;
        }

        return family.TryAdd(indices[^1], value);
    }

    /// <summary>Marks a name as failed or bound in another branch only, where nothing is bound to it.</summary>
    public void Leave(Bound bound, string? why)
    {
        if (bound.Indices.IsEmpty)
            values.TryAdd(bound.Name.Text, new UnboundValue(why));
        else
            Root.values.TryAdd(bound.Name.Text, new UnboundValue(why));
    }

    /// <summary>Sets a loop's variable, or a recipe's need.</summary>
    public void Set(string name, Value value) => values[name] = value;
}
