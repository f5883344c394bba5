using System.Collections.Immutable;
using System.Diagnostics;
using System.Globalization;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Nests the flat sentences into blocks, and sees that each stands where it may.</summary>
internal sealed class BlockBuilder(string text, ReadingLimits limits, List<Diagnostic> findings)
{
    private readonly Stack<OpenBlock> _open = new();
    private readonly ImmutableArray<Sentence>.Builder _outermost = ImmutableArray.CreateBuilder<Sentence>();
    private readonly ImmutableHashSet<string>.Builder _unread = ImmutableHashSet.CreateBuilder<string>(StringComparer.Ordinal);
    private readonly Dictionary<string, Token> _heads = [];
    private readonly List<(Token Opener, Token End)> _askew = [];
    private LineMap? _lines;
    private bool _wantSeen;
    private int _openRecipes;
    private int _strayBranches;

    /// <summary>The names that sentences left out of the tree would have bound.</summary>
    public ImmutableHashSet<string> UnreadNames => _unread.ToImmutable();

    private LineMap Lines => _lines ??= new LineMap(text);

    /// <summary>Takes the next sentence; <paramref name="first"/> is its first word.</summary>
    public void Add(Sentence sentence, Token first)
    {
        bool fits = CheckPlace(first);
        switch (sentence)
        {
            case EndSentence:
                Close(first);
                break;
            case OtherwiseSentence otherwise:
                Branch(otherwise.Condition, first, isBad: false);
                break;
            case ForBlock or WhenBlock or RecipeBlock:
                Open(fits ? sentence : null, first.Text, first);
                if (!fits)
                    Forget(sentence);
                break;
            case var _ when fits:
                Body.Add(sentence);
                break;
            default:
                Forget(sentence);
                break;
        }
    }

    /// <summary>Takes a sentence that can't be read; <paramref name="meant"/> is the word it was meant to begin with, or empty.</summary>
    public void AddBad(string meant, Token first, IEnumerable<string> names)
    {
        _unread.UnionWith(names);
        switch (meant)
        {
            case "for" or "when" or "recipe":
                Open(null, meant, first);
                break;
            case "otherwise":
                Branch(null, first, isBad: true);
                break;
            case "end":
                Close(first);
                break;
            case "prick" or "rule" or "strike":
                _wantSeen |= !InRecipe;
                break;
        }
    }

    /// <summary>Closes what is still open, and gives the outermost sentences.</summary>
    public ImmutableArray<Sentence> Finish()
    {
        while (_open.Count > 0)
        {
            OpenBlock block = _open.Peek();
            findings.Add(LanguageFindings.EndMissing(block.Word, _open.Count == 1 ? Suspicion(block) : null, block.Opener.Span));
            Leave(block.Opener, isWhole: false);
        }

        return _outermost.DrainToImmutable();
    }

    private ImmutableArray<Sentence>.Builder Body => _open.Count == 0 ? _outermost : _open.Peek().Body;

    private bool InRecipe => _openRecipes > 0;

    private void Open(Sentence? header, string word, Token opener)
    {
        if (_open.Count == limits.MaximumNesting)
            findings.Add(LanguageFindings.TooDeep(limits.MaximumNesting, opener.Span));
        _openRecipes += word == "recipe" ? 1 : 0;
        _open.Push(new OpenBlock(_open.Count >= limits.MaximumNesting ? null : header, word, opener));
    }

    private void Branch(Condition? condition, Token word, bool isBad)
    {
        if (_open.Count == 0 || _open.Peek().Word != "when")
        {
            findings.Add(LanguageFindings.OtherwiseOutOfPlace(_open.Count == 0 ? null : _open.Peek().Word, word.Span));
            _strayBranches += _open.Count == 0 ? 1 : 0;
            return;
        }

        OpenBlock block = _open.Peek();
        if (block.LastBranchSeen)
            findings.Add(LanguageFindings.OtherwiseAfterLast(word.Span));
        block.IsBroken |= isBad || block.LastBranchSeen;
        block.LastBranchSeen |= condition is null && !isBad;
        block.EndBranch(word);
        block.Condition = condition;
    }

    private void Close(Token end)
    {
        // the `end` after an `otherwise` without a `when` is the same fault
        if (_open.Count == 0 && _strayBranches > 0)
            _strayBranches--;
        else if (_open.Count == 0)
            findings.Add(LanguageFindings.EndTooMany(end.Span));
        else
            Leave(end, isWhole: true);
    }

    private void Leave(Token end, bool isWhole)
    {
        OpenBlock block = _open.Pop();
        _openRecipes -= block.Word == "recipe" ? 1 : 0;
        if (isWhole && Indent(block.Opener) != Indent(end))
            _askew.Add((block.Opener, end));
        SourceSpan span = block.Opener.Span.To(end.Span);
        if (block.Header is null || block.IsBroken || !isWhole)
        {
            if (block.Header is not null)
                Forget(block.Header);
            foreach (Sentence sentence in block.AllSentences())
                Forget(sentence);
            return;
        }

        block.EndBranch(end);
        Body.Add(block.Header switch
        {
            ForBlock loop => loop with { Body = block.Branches[0].Body, Span = span },
            RecipeBlock recipe => recipe with { Body = block.Branches[0].Body, Span = span },
            WhenBlock choice => choice with { Branches = [.. block.Branches], Span = span },
            _ => throw new UnreachableException(),
        });
    }

    // Whether the sentence may stand here; what is wrong is told.
    private bool CheckPlace(Token first)
    {
        string word = first.Text;
        string? block = _open.Count == 0 ? null : _open.Peek().Word;
        switch (word)
        {
            case "title" or "sheet" or "board" or "kit" or "hand":
                return CheckHead(first, block);
            case "given" or "recipe" when block is not null:
                findings.Add(LanguageFindings.NotOutermost(word, InRecipe ? "recipe" : block, first.Span));
                return false;
            case "needs" or "gives" or "trade" or "source" when block != "recipe":
                findings.Add(LanguageFindings.OutsideRecipe(word, first.Span));
                return false;
            case "prick" or "rule" or "strike" or "follow":
                // what a recipe makes is not made here
                _wantSeen |= !InRecipe;
                return true;
            default:
                return true;
        }
    }

    private bool CheckHead(Token first, string? block)
    {
        if (block is not null)
            findings.Add(LanguageFindings.NotOutermost(first.Text, block, first.Span));
        else if (_wantSeen)
            findings.Add(LanguageFindings.HeadTooLate(first.Text, first.Span));
        else if (_heads.TryGetValue(first.Text, out Token? earlier))
            findings.Add(LanguageFindings.HeadTwice(first.Text, Lines.Find(earlier.Span.Start).Line, first.Span));
        else
            return _heads.TryAdd(first.Text, first);
        return false;
    }

    // Of the blocks closed so far the first whose `end` stands further left than its opener took the `end` of another, most likely.
    private string? Suspicion(OpenBlock unclosed)
    {
        foreach ((Token opener, Token end) in _askew)
        {
            if (opener.Span.Start > unclosed.Opener.Span.Start && Indent(end) < Indent(opener))
                return string.Create(CultureInfo.InvariantCulture, $"the `end` on line {Lines.Find(end.Span.Start).Line} closes the `{opener.Text}` on line {Lines.Find(opener.Span.Start).Line}, by its indent perhaps not meant; put the missing `end` before it");
        }

        return null;
    }

    private int Indent(Token token)
    {
        int start = token.Span.Start;
        while (start > 0 && text[start - 1] is ' ' or '\t')
            start--;
        return token.Span.Start - start;
    }

    private void Forget(Sentence sentence)
    {
        switch (sentence)
        {
            case GivenSentence given:
                _unread.Add(given.Name.Text);
                break;
            case ForBlock loop:
                _unread.Add(loop.Variable.Text);
                ForgetAll(loop.Body);
                break;
            case WhenBlock choice:
                foreach (WhenBranch branch in choice.Branches)
                    ForgetAll(branch.Body);
                break;
            case RecipeBlock { Title.Pieces: [PlainPiece title] }:
                _unread.Add(title.Text);
                break;
            case NeedsSentence needs:
                _unread.UnionWith(needs.Needs.Select(need => need.Name.Text));
                break;
            default:
                _unread.UnionWith(BoundNames.Find(sentence));
                break;
        }
    }

    private void ForgetAll(ImmutableArray<Sentence> sentences)
    {
        foreach (Sentence sentence in sentences)
            Forget(sentence);
    }

    /// <summary>A block whose <c>end</c> has not come yet. Without a header it was not understood, and what it holds is not kept.</summary>
    private sealed class OpenBlock(Sentence? header, string word, Token opener)
    {
        private Token _branchStart = opener;

        public Sentence? Header { get; } = header;

        public string Word { get; } = word;

        public Token Opener { get; } = opener;

        public bool IsBroken { get; set; }

        public bool LastBranchSeen { get; set; }

        public Condition? Condition { get; set; } = (header as WhenBlock)?.Branches[0].Condition;

        public ImmutableArray<Sentence>.Builder Body { get; } = ImmutableArray.CreateBuilder<Sentence>();

        public List<WhenBranch> Branches { get; } = [];

        // A branch's span ends where the last thing in it ends.
        public void EndBranch(Token next)
        {
            SourceSpan last = Body.Count > 0 ? Body[^1].Span : Condition?.Span ?? _branchStart.Span;
            Branches.Add(new WhenBranch(Condition, Body.DrainToImmutable(), _branchStart.Span.To(last)));
            _branchStart = next;
        }

        public IEnumerable<Sentence> AllSentences() => Branches.SelectMany(branch => branch.Body).Concat(Body);
    }
}
