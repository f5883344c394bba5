using System.Collections.Immutable;
using System.Diagnostics;
using System.Security.Cryptography;
using System.Text;
using RuleAndCompass.Bench;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Making.Wants;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>Carries a script out: text in, layout out.</summary>
public sealed partial class Maker
{
    private readonly MakingOptions options;
    private readonly IProgress<double>? progress;
    private readonly CancellationToken cancellation;
    private readonly Script script;
    private readonly Head head;
    private readonly Decider decider;
    private readonly Evaluator evaluator;
    private readonly Workbench bench;
    private readonly Constructions constructions;
    private readonly StageBook stages;
    private readonly RecipeShelf recipes;
    private readonly List<Diagnostic> findings = [];
    private readonly List<GivenValue> givens = [];
    private readonly List<ClaimResult> claims = [];
    private readonly List<Comparison> comparisons = [];
    private readonly List<Kept> kept = [];
    private readonly List<Lettering> letterings = [];
    private readonly List<string> notes = [];
    private readonly List<string> following = [];
    private readonly HashSet<string> givenNames = new(StringComparer.Ordinal);
    private readonly long deadline;
    private LineMap? lines;
    private (SourceSpan Span, string Recipe)? followed;
    private bool isDial;
    private int carriedOut;
    private int nesting;

    private Maker(Script script, Head head, RecipeShelf recipes, MakingOptions options, IProgress<double>? progress, CancellationToken cancellation)
    {
        this.script = script;
        this.head = head;
        this.recipes = recipes;
        this.options = options;
        this.progress = progress;
        this.cancellation = cancellation;
        TimeSpan limit = options.TimeLimit ?? TimeSpan.MaxValue;
        deadline = limit == TimeSpan.MaxValue ? long.MaxValue : Environment.TickCount64 + (long)limit.TotalMilliseconds;
        decider = new(new DeciderOptions(SHA256.HashData(Encoding.UTF8.GetBytes(script.Text)), options.Prove, TimeLimit: options.TimeLimit), cancellation);
        evaluator = new(decider);
        bench = new(head.Kit, decider, Binding.NamesIn(script.Sentences), options.MaximumActs);
        constructions = new(bench, head.Room, head.Sheet);
        stages = new(head.Title ?? "The layout");
    }

    /// <summary>Reads a script and carries it out.</summary>
    /// <returns>
    /// The layout, or null where the script is wrong. A refuted claim and a comparison out of tolerance are errors that leave the layout standing.
    /// Findings are in source order.
    /// </returns>
    /// <param name="name">What diagnostics and outputs call the script.</param>
    /// <param name="text">The script.</param>
    /// <param name="options">What the caller changes.</param>
    /// <param name="progress">Told the part of the sentences done, 0 to 1.</param>
    /// <param name="cancellation">Ends the making with an <see cref="OperationCanceledException"/>.</param>
    public static Outcome<Layout> Make(string name, string text, MakingOptions? options = null, IProgress<double>? progress = null, CancellationToken cancellation = default)
    {
        Outcome<Script> read = ScriptReader.Read(name, text, cancellation: cancellation);
        if (read.Value is null)
            return new(null, read.Diagnostics);
        Outcome<Layout> made = Make(read.Value, options, progress, cancellation);
        ImmutableArray<Diagnostic> all = [.. read.Diagnostics.Concat(made.Diagnostics).OrderBy(finding => finding.Span.Start)];
        return read.HasErrors ? new(null, all) : new(made.Value, all);
    }

    /// <summary>Carries out a script that has been read.</summary>
    /// <inheritdoc cref="Make(string, string, MakingOptions?, IProgress{double}?, CancellationToken)"/>
    public static Outcome<Layout> Make(Script script, MakingOptions? options = null, IProgress<double>? progress = null, CancellationToken cancellation = default)
    {
        options ??= new();
        List<Diagnostic> headFindings = [];
        Head head = Head.Of(script, options, headFindings);
        RecipeShelf recipes = RecipeShelf.For(script, options, headFindings, cancellation);
        Maker maker = new(script, head, recipes, options, progress, cancellation);
        maker.findings.AddRange(headFindings);
        return maker.CarryOut();
    }

    private Outcome<Layout> CarryOut()
    {
        evaluator.Scope = new(null, "");
        LeaveUnread(evaluator.Scope);
        bool finished = false;
        try
        {
            CarryOut(script.Sentences, outermost: true);
            finished = true;
        }
        catch (FaultException fault)
        {
            Add(fault.Finding);
        }

        foreach (string given in options.Givens?.Keys ?? [])
            if (finished && !givenNames.Contains(given))
            {
                string? near = NearName.Find(given, givenNames);
                findings.Add(MakingFindings.BadGiven($"the script has no `given {given}`", default, near is null ? null : $"is `{near}` meant?"));
            }

        ImmutableArray<Diagnostic> sorted = [.. findings.OrderBy(finding => finding.Span.Start)];
        bool stands = finished && findings.All(finding => finding.Severity != Severity.Error || finding.Code is "RC2024" or "RC2026");
        return new(stands ? Result() : null, sorted);
    }

    private Layout Result() => new(
        script, head.Title ?? "", [.. notes], head.Sheet, head.Board, head.Kit, head.Hand, [.. givens], [.. stages.Stages], [.. bench.Acts], [.. claims],
        [.. comparisons.Select(comparison => comparison with { FarEnd = FarEnd.Of(comparison, kept) })], [.. kept], [.. letterings], isDial || RecipeShelf.SpeaksOfDials(head.Title) || comparisons.Exists(comparison => comparison.TimedBy is not null))
    {
        Decider = decider,
    };

    private void CarryOut(ImmutableArray<Sentence> sentences, bool outermost = false)
    {
        int stageBefore = stages.Current;
        for (int index = 0; index < sentences.Length; index++)
        {
            CarryOut(sentences[index]);
            if (outermost)
                progress?.Report((index + 1.0) / sentences.Length);
        }

        stages.Close(stageBefore, bench.Acts.Count);
    }

    private void CarryOut(Sentence sentence)
    {
        Count(sentence.Span);
        try
        {
            Dispatch(sentence);
        }
        catch (FaultException fault) when (fault.Ends == FaultEnds.Sentence || (fault.Ends == FaultEnds.Recipe && sentence is FollowSentence))
        {
            Add(fault.Finding);
            Leave(sentence);
        }
        catch (UndecidedException undecided)
        {
            Add(MakingFindings.Undecided(undecided.Message, undecided.Known, sentence.Span));
            Leave(sentence);
        }
        catch (TooManyActsException limit)
        {
            throw new FaultException(Placed(MakingFindings.Limit("the script asks for too many acts", $"{limit.Limit}", sentence.Span, "look for a loop that runs too long, or divide the work over several scripts")), FaultEnds.Making);
        }
    }

    // Sentences and passes of loops are counted, so that no script runs for ever.
    private void Count(SourceSpan at)
    {
        cancellation.ThrowIfCancellationRequested();
        if (++carriedOut > options.MaximumSentences)
            throw new FaultException(Placed(MakingFindings.Limit("too many sentences are carried out", $"{options.MaximumSentences}", at, "look for a loop that runs too long")), FaultEnds.Making);
        if (Environment.TickCount64 > deadline)
            throw new FaultException(Placed(MakingFindings.Limit("the time allowed has run out here", $"{options.TimeLimit!.Value.TotalSeconds:0.#} s", at, "raise `--time-limit`")), FaultEnds.Making);
    }

    private void Dispatch(Sentence sentence)
    {
        switch (sentence)
        {
            case TitleSentence or SheetSentence or BoardSentence or KitSentence or HandSentence or UseSentence or RecipeBlock:
                // Taken before the work begins; the reader lets them stand outermost only.
                break;
            case NoteSentence note:
                if (followed is null)
                    notes.Add(evaluator.Text(note.Text));
                break;
            case TradeSentence or SourceSentence or NeedsSentence or GivesSentence:
                // The recipe has them.
                break;
            case GivenSentence given:
                Given(given);
                break;
            case LetSentence let:
                Value named = evaluator.Evaluate(let.Value);
                Bind(let.Bound, named is FamilyValue family ? family.SecondName() : named);
                break;
            case StageSentence stage:
                stages.Open(evaluator.Text(stage.Text), bench.Acts.Count);
                break;
            case RefuseSentence refuse:
                throw new FaultException(Placed(MakingFindings.Refused(evaluator.Text(refuse.Text), refuse.Span, followed?.Recipe)), FaultEnds.Recipe);
            case ForBlock loop:
                Nested(loop.Span, () => Loop(loop));
                break;
            case WhenBlock choice:
                Nested(choice.Span, () => When(choice));
                break;
            case FollowSentence follow:
                Nested(follow.Span, () => Follow(follow));
                break;
            case ClaimSentence claim:
                Claim(claim);
                break;
            case CompareSentence compare:
                comparisons.Add(decider.Recording(() => new ComparisonMaker(evaluator, decider).Compare(compare, followed?.Span, Add)));
                break;
            case KeepSentence keep:
                kept.AddRange(new Keeping(evaluator, decider).Keep(keep));
                break;
            case KeepRunSentence run:
                kept.Add(new Keeping(evaluator, decider).Keep(run));
                break;
            case LetterSentence letter:
                letterings.Add(new Keeping(evaluator, decider).Letter(letter));
                break;
            case WantSentence want:
                bench.Begin(stages.ForAct(), followed?.Span ?? want.Span, null);
                new WantMaker(evaluator, bench, constructions, (bound, value) => Bind(bound, value), BindMany).Make(want);
                break;
            default:
                throw new UnreachableException($"Nothing is made of {sentence.GetType().Name}.");
        }
    }

    private void Nested(SourceSpan span, Action inner)
    {
        if (++nesting > options.MaximumNesting)
        {
            nesting--;
            throw new FaultException(MakingFindings.Limit("blocks and recipes are nested too deep", $"{options.MaximumNesting}", span));
        }

        try
        {
            inner();
        }
        finally
        {
            nesting--;
        }
    }

    private void Given(GivenSentence given)
    {
        string name = given.Name.Text;
        givenNames.Add(name);
        Value written = evaluator.Evaluate(given.Value);
        if (written is not (AngleValue or QuantityValue { Dimension: 0 or 1 }))
            throw new FaultException(MakingFindings.BadGiven($"`{name}` is {written.KindWithArticle}, and a given is a number, a length or an angle", given.Value.Span, $"write `let {name} = …`"));
        Value value = written;
        bool fromCaller = false;
        if (options.Givens?.TryGetValue(name, out string? text) == true)
        {
            Outcome<Expression> read = ScriptReader.ReadExpression(text);
            if (read.Value is null || read.HasErrors)
                throw new FaultException(MakingFindings.BadGiven($"`{text}`, set for `{name}`, cannot be read", given.Span, read.Diagnostics.FirstOrDefault()?.Message));
            value = evaluator.Evaluate(read.Value);
            fromCaller = true;
            if (value is QuantityValue { IsNothing: true })
                value = written is AngleValue ? new AngleValue(Angle.Zero) : new QuantityValue(Real.Zero, ((QuantityValue)written).Dimension);
            if (value.GetType() != written.GetType() || (value is QuantityValue q && q.Dimension != ((QuantityValue)written).Dimension && !q.IsNothing))
                throw new FaultException(MakingFindings.BadGiven($"`{name}` is {written.KindWithArticle}, and `{text}` is {value.KindWithArticle}", given.Span, "give it in the same kind, with its unit"));
        }

        GivenRange bounds = BoundsOf(given, value);
        value = bounds.Given(name, value);
        Bind(new Bound(given.Name, [], given.Name.Span), value);
        givens.Add(new(name, value is AngleValue ? QuantityKind.Angle : value is QuantityValue { Dimension: 1 } ? QuantityKind.Length : QuantityKind.Number, fromCaller ? options.Givens![name] : given.Value.ToString()!, fromCaller));
    }

    private GivenRange BoundsOf(GivenSentence given, Value value)
    {
        if (given.From is null || given.To is null)
            return new(null, null);
        Value from = evaluator.Evaluate(given.From), to = evaluator.Evaluate(given.To);
        foreach ((Value bound, Expression at) in ((Value, Expression)[])[(from, given.From), (to, given.To)])
        {
            bool fits = bound is QuantityValue { IsNothing: true } || (bound, value) is (AngleValue, AngleValue)
                || (bound is QuantityValue a && value is QuantityValue b && (a.Dimension == b.Dimension || b.IsNothing));
            if (!fits)
                throw new FaultException(MakingFindings.BadGiven($"`{given.Name.Text}` is {value.KindWithArticle}, and its range is {bound.KindWithArticle}", at.Span, "write the range in the same kind, with its unit"));
        }

        Rational low = Evaluator.Index(from, given.From).Value, high = Evaluator.Index(to, given.To).Value;
        if (low > high)
            throw new FaultException(MakingFindings.BadGiven($"the range of `{given.Name.Text}` runs backward", given.From.Span.To(given.To.Span), "write the smaller first"));
        Rational used = Evaluator.Index(value, given.Value).Value;
        if (used < low || used > high)
            throw new FaultException(MakingFindings.BadGiven(
                $"`{given.Name.Text}` is {options.Givens?.GetValueOrDefault(given.Name.Text) ?? given.Value.ToString()}, outside its range", given.Span, $"it may be from {given.From} to {given.To}"));
        return new(low, high);
    }

    private void Loop(ForBlock loop)
    {
        Scope outer = evaluator.Scope;
        foreach (RangeClause range in loop.Ranges)
        {
            Value first = evaluator.Evaluate(range.From);
            IndexKey from = Evaluator.Index(first, range.From);
            IndexKey to = range.To is null ? from : evaluator.Index(range.To);
            Rational step = Rational.One;
            if (range.Step is not null)
            {
                IndexKey by = evaluator.Index(range.Step);
                step = by.Value;
                if (step.Sign <= 0)
                    throw new FaultException(MakingFindings.BadLoop("a loop's step is more than nothing", range.Step.Span, "loops run upward"));
                if (by.Kind != from.Kind)
                    throw new FaultException(MakingFindings.BadLoop("a loop's step is of the same kind as its ends", range.Step.Span));
            }
            else if (range.To is not null && from.Kind != QuantityKind.Number)
            {
                throw new FaultException(MakingFindings.BadLoop("a loop over lengths or angles needs a `step`", range.Span, "such as `step 10 mm` or `step 5°`"));
            }

            if (to.Kind != from.Kind && !to.Value.IsZero && !from.Value.IsZero)
                throw new FaultException(MakingFindings.BadLoop("both ends of a loop are of one kind", range.Span));
            QuantityKind kind = from.Value.IsZero ? to.Kind : from.Kind;
            for (Rational at = from.Value; at <= to.Value; at += step)
            {
                Count(loop.Variable.Span);
                Scope pass = outer.Pass();
                if (outer.Find(loop.Variable.Text) is not (null or UnboundValue))
                    throw new FaultException(MakingFindings.BoundTwice(loop.Variable.Text, loop.Variable.Span));
                ConstantMeasure trace = new(at.ToDouble());
                pass.Set(loop.Variable.Text, kind switch
                {
                    QuantityKind.Angle => new AngleValue(Angle.FromDegrees(at), trace),
                    QuantityKind.Length => new QuantityValue(at, 1, trace),
                    _ => new QuantityValue(at, 0, trace),
                });
                evaluator.Scope = pass;
                try
                {
                    CarryOut(loop.Body);
                }
                finally
                {
                    evaluator.Scope = outer;
                }
            }
        }
    }

    private void When(WhenBlock block)
    {
        int taken = block.Branches.Length;
        for (int branch = 0; branch < block.Branches.Length && taken == block.Branches.Length; branch++)
        {
            if (block.Branches[branch].Condition is not { } condition)
            {
                taken = branch;
                break;
            }

            (bool? holds, Verdict verdict) = decider.Recording(() => new Conditions(evaluator, decider).Test(condition));
            if (holds is null)
                throw new FaultException(MakingFindings.Undecided($"whether `{condition}`", verdict, condition.Span));
            if (holds.Value)
                taken = branch;
        }

        if (taken < block.Branches.Length)
            CarryOut(block.Branches[taken].Body);
        bool inRecipe = followed is not null;
        for (int branch = 0; branch < block.Branches.Length; branch++)
            if (branch != taken)
                foreach (Bound bound in block.Branches[branch].Body.SelectMany(Binding.Of))
                    evaluator.Scope.Leave(bound, KeyOf(bound), new UnboundValue(() => $"`{bound.Name.Text}` is bound only {BranchOf(bound, inRecipe)}, which was not taken"));
    }

    // A recipe's lines are not those of the script at hand.
    private string BranchOf(Bound bound, bool inRecipe) => inRecipe ? "in a branch" : $"in the branch at line {(lines ??= new(script.Text)).Find(bound.Span.Start).Line}";

    private void Follow(FollowSentence follow)
    {
        string title = evaluator.Text(follow.Recipe);
        if (recipes.Find(title) is not { } recipe)
            throw new FaultException(recipes.IsIncomplete || recipes.UnreadNames.Contains(title) ? null : MakingFindings.UnknownRecipe(title, NearName.Find(title, recipes.Titles), follow.Recipe.Span));
        if (following.Contains(recipe.Title))
            throw new FaultException(MakingFindings.FollowsItself(recipe.Title, follow.Recipe.Span));
        Scope caller = evaluator.Scope;
        Scope inner = new(null, evaluator.NameOf(follow.Alias) + ".");
        LeaveUnread(inner);
        BindNeeds(follow, recipe, inner);
        (SourceSpan Span, string Recipe)? followedBefore = followed;
        int stageBefore = stages.Current, parentBefore = stages.Parent, findingsBefore = findings.Count;
        followed = (followedBefore?.Span ?? follow.Span, recipe.Title);
        following.Add(recipe.Title);
        stages.Parent = stages.ForAct();
        isDial |= recipe.Trade == "dials";
        evaluator.Scope = inner;
        try
        {
            CarryOut(recipe.Body);
            Dictionary<string, Value> gifts = new(StringComparer.Ordinal);
            foreach (GiveClause gift in recipe.Gives)
                gifts[gift.Name.Text] = inner.Find(gift.Name.Text) ?? new UnboundValue(() => $"recipe \"{recipe.Title}\" did not make `{gift.Name.Text}` this time");
            evaluator.Scope = caller;
            Bind(follow.Alias, new GivenByRecipe(recipe.Title, gifts));
        }
        finally
        {
            evaluator.Scope = caller;
            following.RemoveAt(following.Count - 1);
            stages.Restore(stageBefore, parentBefore);
            followed = followedBefore;
        }

        if (findings.Skip(findingsBefore).Any(finding => finding.Severity == Severity.Error && finding.Code is not ("RC2024" or "RC2026")))
            Leave(follow);
    }

    private void BindNeeds(FollowSentence follow, Recipe recipe, Scope inner)
    {
        Dictionary<string, ArgumentClause> arguments = new(StringComparer.Ordinal);
        foreach (ArgumentClause argument in follow.Arguments)
        {
            if (recipe.Needs.All(need => need.Name.Text != argument.Need.Text))
            {
                if (recipes.UnreadNames.Contains(argument.Need.Text))
                    throw new FaultException(null);
                string? near = NearName.Find(argument.Need.Text, recipe.Needs.Select(need => need.Name.Text));
                throw new FaultException(MakingFindings.BadNeed($"recipe \"{recipe.Title}\" has no need called `{argument.Need.Text}`", argument.Need.Span,
                    near is null ? $"it needs {recipe.NeedsInWords}" : $"is `{near}` meant?"));
            }

            if (!arguments.TryAdd(argument.Need.Text, argument))
                throw new FaultException(MakingFindings.BadNeed($"`{argument.Need.Text}` is given twice", argument.Span));
        }

        foreach (NeedClause need in recipe.Needs)
        {
            if (arguments.TryGetValue(need.Name.Text, out ArgumentClause? argument))
            {
                Value value = evaluator.Evaluate(argument.Value);
                inner.Set(need.Name.Text, Kinds.Fit(value, need.Kind.Text)
                    ?? throw new FaultException(MakingFindings.BadNeed($"`{need.Name.Text}` is {Kinds.WithArticle(need.Kind.Text)}, and `{argument.Value}` is {value.KindWithArticle}", argument.Value.Span)));
            }
            else if (need.Default is not null)
            {
                Scope caller = evaluator.Scope;
                evaluator.Scope = inner;
                try
                {
                    Value value = evaluator.Evaluate(need.Default);
                    inner.Set(need.Name.Text, Kinds.Fit(value, need.Kind.Text)
                        ?? throw new FaultException(MakingFindings.BadNeed($"recipe \"{recipe.Title}\" gives `{need.Name.Text}` {value.KindWithArticle} of its own, and needs {Kinds.WithArticle(need.Kind.Text)}", follow.Recipe.Span, "mend the recipe's `needs`")));
                }
                finally
                {
                    evaluator.Scope = caller;
                }
            }
            else
            {
                throw new FaultException(MakingFindings.BadNeed($"recipe \"{recipe.Title}\" needs `{need.Name.Text}`, {Kinds.WithArticle(need.Kind.Text)}", follow.Span, $"add `with {need.Name.Text} = …`; it needs {recipe.NeedsInWords}"));
            }
        }
    }

    private void Claim(ClaimSentence claim)
    {
        Conditions conditions = new(evaluator, decider);
        string says = conditions.Says(claim.Condition);
        (bool? holds, Verdict verdict) = decider.Recording(() => conditions.Test(claim.Condition));
        string? by = holds == false ? conditions.ByHowMuch : null;
        claims.Add(new(says, holds, verdict, by, followed?.Span ?? claim.Span, null));
        if (holds == false)
            Add(MakingFindings.ClaimRefuted(says, by, claim.Span));
        else if (holds is null)
            Add(MakingFindings.ClaimUndecided(says, verdict, claim.Span));
    }

    private void Bind(Bound bound, Value value)
    {
        string name = bound.Name.Text;
        if (bound.Indices.IsEmpty)
        {
            if (!evaluator.Scope.TryBind(name, value))
                throw new FaultException(MakingFindings.BoundTwice(name, bound.Span));
            return;
        }

        IndexKey[] keys = [.. bound.Indices.Select(evaluator.Index)];
        OfOneKind(name, keys, bound.Span);
        if (!evaluator.Scope.TryBind(name, keys, value))
            throw new FaultException(Taken(name, string.Join(", ", keys), bound.Span));
    }

    private void BindMany(Many many, IReadOnlyList<(IndexKey Key, Value Value)> members)
    {
        foreach ((IndexKey key, Value value) in members)
        {
            OfOneKind(many.Name.Text, [key], many.Span);
            if (!evaluator.Scope.TryBind(many.Name.Text, [key], value))
                throw new FaultException(Taken(many.Name.Text, key.ToString(), many.Span));
        }
    }

    private void OfOneKind(string name, IEnumerable<IndexKey> keys, SourceSpan span)
    {
        Value? family = evaluator.Scope.Find(name);
        foreach (IndexKey key in keys)
        {
            if (family is not FamilyValue known)
                return;
            if (!known.Takes(key))
                throw new FaultException(MakingFindings.BadIndex($"`{name}[{key}]` is counted in another way than the rest of its family", span, $"the others are like `{name}[{known.Members.Keys.Last()}]`; keep to one kind of index"));
            family = known.Find(key);
        }
    }

    private Diagnostic Taken(string name, string index, SourceSpan span) => evaluator.Scope.Find(name) switch
    {
        FamilyValue { IsSecondName: true } => MakingFindings.BoundTwice(name, span) with { Hint = $"`{name}` is another name for a family that is made elsewhere; bind to the family's own name" },
        FamilyValue => MakingFindings.BoundTwice($"{name}[{index}]", span),
        _ => MakingFindings.BoundTwice(name, span),
    };

    // What a sentence that could not be read would have bound is told of already.
    private void LeaveUnread(Scope scope)
    {
        UnboundValue unread = new();
        foreach (string name in recipes.UnreadNames)
            scope.Leave(new Bound(new Name(name, default), [], default), null, unread);
    }

    private void Leave(Sentence sentence)
    {
        UnboundValue failed = new();
        foreach (Bound bound in Binding.Of(sentence))
            evaluator.Scope.Leave(bound, KeyOf(bound), failed);
    }

    // Which one of a family a sentence would have bound; null where that cannot be worked out.
    private IndexKey? KeyOf(Bound bound)
    {
        if (bound.Indices.Length != 1)
            return null;
        try
        {
            return evaluator.Index(bound.Indices[0]);
        }
        catch (FaultException)
        {
            return null;
        }
        catch (UndecidedException)
        {
            return null;
        }
    }

    private void Add(Diagnostic? finding)
    {
        if (finding is null)
            return;
        Diagnostic placed = Placed(finding);
        // A fault in a loop is told once, not once for each pass.
        if (!findings.Any(told => told.Code == placed.Code && told.Span == placed.Span && (told.Code is not ("RC2024" or "RC2026") || told.Message == placed.Message)))
            findings.Add(placed);
    }

    // A finding inside a recipe is told at the sentence that follows it, with the recipe's name.
    private Diagnostic Placed(Diagnostic finding) => followed is not { } follow
        ? finding
        : finding with { Span = follow.Span, Message = finding.Code == "RC2023" ? finding.Message : $"in the recipe \"{follow.Recipe}\": {finding.Message}" };
}
