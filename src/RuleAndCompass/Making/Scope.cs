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
        Value? seen = Find(name);
        if (seen is not (null or FamilyValue or UnboundValue))
            return false;
        if (root.values.GetValueOrDefault(name) is not FamilyValue family)
            root.values[name] = family = new() { Rest = seen as UnboundValue };
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
    /// <param name="key">Which one of a family, where its only index can be worked out.</param>
    public void Leave(Bound bound, IndexKey? key, UnboundValue why)
    {
        string name = bound.Name.Text;
        switch (Find(name))
        {
            case null when bound.Indices.IsEmpty:
                values[name] = why;
                break;
            case null when key is { } first:
                FamilyValue begun = new();
                begun.Missing[first] = why;
                Root.values[name] = begun;
                break;
            case null:
                Root.values[name] = new FamilyValue { Rest = why };
                break;
            case FamilyValue { IsSecondName: false } family when key is { } one:
                family.Missing.TryAdd(one, why);
                break;
            case FamilyValue { IsSecondName: false } family when !bound.Indices.IsEmpty:
                family.Rest ??= why;
                break;
        }
    }

    /// <summary>Sets a loop's variable, or a recipe's need.</summary>
    public void Set(string name, Value value) => values[name] = value;
}
