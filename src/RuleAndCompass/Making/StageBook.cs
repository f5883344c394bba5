namespace RuleAndCompass.Making;

/// <summary>Which plate the acts belong on: stages open in blocks, last to the end of their block, and number under the recipe's caller.</summary>
internal sealed class StageBook(string firstTitle)
{
    private readonly List<Stage> stages = [];
    private readonly List<int> children = [];
    private readonly Dictionary<(int Parent, string Title), (int Stage, int ActsThen)> lastOfParent = [];
    private int topLevel;
    private int opening = -1;

    public IReadOnlyList<Stage> Stages => stages;

    /// <summary>The stage acts go to; −1 before any is opened.</summary>
    public int Current { get; private set; } = -1;

    /// <summary>Recipes' stages number under this one; −1 at the top.</summary>
    public int Parent { get; set; } = -1;

    /// <summary>The stage for an act; before any is opened, one with the script's title.</summary>
    public int ForAct()
    {
        if (Current < 0)
            Current = opening >= 0 ? opening : opening = Add(firstTitle, -1);
        return Current;
    }

    /// <summary>Opens a stage; one of the same text that was open last, with no act since, goes on.</summary>
    public void Open(string title, int actsSoFar)
    {
        if (lastOfParent.TryGetValue((Parent, title), out (int Stage, int ActsThen) last) && last.ActsThen == actsSoFar)
            Current = last.Stage;
        else
            Current = Add(title, Parent);
    }

    /// <summary>Ends a block: the stage that was open before it goes on.</summary>
    public void Close(int before, int actsSoFar)
    {
        if (Current >= 0 && Current != before)
            lastOfParent[(Parent, stages[Current].Title)] = (Current, actsSoFar);
        Current = before;
    }

    /// <summary>Goes back to where a recipe was followed from.</summary>
    public void Restore(int current, int parent)
    {
        Current = current < 0 ? Current : current;
        Parent = parent;
    }

    private int Add(string title, int parent)
    {
        string number = parent < 0 ? $"{++topLevel}" : $"{stages[parent].Number}.{++children[parent]}";
        stages.Add(new(number, title));
        children.Add(0);
        return stages.Count - 1;
    }
}
