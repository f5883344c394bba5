using System.Diagnostics;
using System.Globalization;
using RuleAndCompass.Bench;
using RuleAndCompass.Language.Diagnostics;
using RuleAndCompass.Language.Grammar;
using RuleAndCompass.Language.Syntax;
using RuleAndCompass.Numbers;

namespace RuleAndCompass.Making;

/// <summary>What the head sentences settle: title, sheet, board, kit and hand.</summary>
internal sealed class Head
{
    // ISO 216 and the US sizes, millimetres, upright.
    private static readonly (string Name, Rational Width, Rational Height)[] Standard =
    [
        ("A0", 841, 1189), ("A1", 594, 841), ("A2", 420, 594), ("A3", 297, 420), ("A4", 210, 297), ("A5", 148, 210), ("A6", 105, 148),
        ("letter", new(2159, 10), new(2794, 10)), ("legal", new(2159, 10), new(3556, 10)), ("tabloid", new(2794, 10), new(4318, 10)),
    ];

    private readonly List<Diagnostic> findings;
    private readonly Evaluator evaluator = new(new Decider(new DeciderOptions()));

    private Kit? kit;

    private Head(List<Diagnostic> findings) => this.findings = findings;

    public string? Title { get; private set; }

    public Sheet Sheet { get; private set; } = new("A4 upright", 210, 297);

    public Sheet? Board { get; private set; }

    /// <summary>Without a kit sentence: all but the beam compass, as large as the room needs, the scale to half a millimetre.</summary>
    public Kit Kit => kit ?? new(true, null, new Reach(1, Room.Width + Room.Height), null, true, true, new Rational(1, 2));

    public Hand Hand { get; private set; } = Hand.Ordinary;

    /// <summary>Where acts have room: the board where there is one, else the sheet.</summary>
    public Sheet Room => Board ?? Sheet;

    /// <summary>Reads the head of a script, what the caller asks for taking the place of the script's own.</summary>
    public static Head Of(Script script, MakingOptions options, List<Diagnostic> findings)
    {
        Head head = new(findings);
        // The reader lets each stand once, and before the first want.
        foreach (Sentence sentence in script.Sentences)
            head.Take(sentence);
        head.TakeText("sheet", options.Sheet);
        head.TakeText("kit", options.Kit);
        head.TakeText("hand", options.Hand);
        return head;
    }

    private void TakeText(string word, string? text)
    {
        if (text is null)
            return;
        Outcome<Script> read = ScriptReader.Read($"--{word}", $"{word} {text}\n");
        Diagnostic? bad = read.Diagnostics.FirstOrDefault(finding => finding.Severity == Severity.Error);
        if (bad is not null || read.Value?.Sentences is not [var sentence])
            findings.Add(MakingFindings.BadGiven($"`--{word} {text}` cannot be read: {bad?.Message ?? "it is more than one sentence"}", default, bad?.Hint));
        else
            Take(sentence, asked: true);
    }

    private void Take(Sentence sentence, bool asked = false)
    {
        int before = findings.Count;
        try
        {
            switch (sentence)
            {
                case TitleSentence title:
                    Title = evaluator.Text(title.Text);
                    break;
                case SheetSentence sheet:
                    Sheet = SheetOf(sheet);
                    break;
                case BoardSentence board:
                    Board = new(null, Size(board.Width), Size(board.Height));
                    break;
                case KitSentence sentenceKit:
                    kit = KitOf(sentenceKit);
                    break;
                case HandSentence hand:
                    Hand = HandOf(hand);
                    break;
            }
        }
        catch (FaultException fault) when (fault.Finding is not null)
        {
            findings.Add(fault.Finding);
        }

        // A span in what the command line asked for means nothing in the script.
        for (int index = before; asked && index < findings.Count; index++)
            findings[index] = findings[index] with { Span = default };
    }

    private Sheet SheetOf(SheetSentence sentence)
    {
        if (sentence.Standard is { } name)
        {
            (string found, Rational width, Rational height) = Standard.FirstOrDefault(size => size.Name.Equals(name.Text, StringComparison.OrdinalIgnoreCase));
            if (found is null)
                throw new UnreachableException($"No sheet {name.Text}: the reader knows them all.");
            return sentence.Orientation == Orientation.Sideways ? new($"{found} sideways", height, width) : new($"{found} upright", width, height);
        }

        Rational across = Size(sentence.Width!), up = Size(sentence.Height!); // the grammar gives both where there is no name
        bool turn = sentence.Orientation is { } asked && (asked == Orientation.Sideways) != (across > up);
        return turn ? new(null, up, across) : new(null, across, up);
    }

    private Kit KitOf(KitSentence sentence)
    {
        Kit tools = new(false, null, null, null, false, false, null);
        HashSet<ToolKind> seen = [];
        foreach (ToolClause tool in sentence.Tools)
        {
            if (!seen.Add(tool.Tool))
                throw new FaultException(MakingFindings.BadKit($"the kit names its {tool.Tool.ToString().ToLowerInvariant()} twice", tool.Span, "one of each is enough"));
            tools = tool.Tool switch
            {
                ToolKind.Straightedge => tools with { HasStraightedge = true, Straightedge = Size(tool.First!) },
                ToolKind.Dividers => tools with { Dividers = ReachOf(tool) },
                ToolKind.Beam => tools with { Beam = ReachOf(tool) },
                ToolKind.Square => tools with { Square = true },
                ToolKind.Protractor => tools with { Protractor = true },
                _ => tools with { ScaleStep = Size(tool.First!) },
            };
        }

        return tools;
    }

    private Reach ReachOf(ToolClause tool)
    {
        Rational least = Size(tool.First!), greatest = Size(tool.Second!); // the grammar gives both for dividers and beam
        if (least > greatest)
            throw new FaultException(MakingFindings.BadKit("the least opening is greater than the greatest", tool.Span, "write the smaller first: `dividers 2 mm to 180 mm`"));
        return new(least, greatest);
    }

    private Hand HandOf(HandSentence sentence)
    {
        Hand hand = Hand.Ordinary;
        if (sentence.Preset is { } preset)
            hand = preset.Text switch
            {
                "fine" => Hand.Fine,
                "coarse" => Hand.Coarse,
                _ => Hand.Ordinary,
            };
        if (sentence.Errors.IsEmpty)
            return hand;
        hand = hand with { Name = sentence.Preset is null ? "own" : $"{hand.Name}, but {string.Join(", ", sentence.Errors)}" };
        HashSet<string> seen = new(StringComparer.Ordinal);
        foreach (ErrorClause error in sentence.Errors)
        {
            string source = error.Source.Text;
            if (!seen.Add(source))
                throw new FaultException(MakingFindings.BadHand($"the hand's `{source}` is told twice", error.Span));
            bool isAngle = source is "protractor" or "square";
            double size = isAngle ? evaluator.AngleOf(error.Size).ToDegreesDouble() : evaluator.Length(error.Size).Amount.ToDouble();
            if (size < 0)
                throw new FaultException(MakingFindings.BadHand($"the hand's `{source}` is less than nothing", error.Size.Span, "an error is a size, such as `0.1 mm`"));
            if (isAngle ? size > 45 : size > 1000)
                throw new FaultException(MakingFindings.BadHand($"the hand's `{source}` of {size.ToString("0.##", CultureInfo.InvariantCulture)}{(isAngle ? "°" : " mm")} is more than any hand's", error.Size.Span));
            hand = source switch
            {
                "prick" => hand with { PrickMillimetres = size },
                "edge" => hand with { EdgeMillimetres = size },
                "opening" => hand with { OpeningMillimetres = size },
                "scale" => hand with { ScaleMillimetres = size },
                "protractor" => hand with { ProtractorDegrees = size },
                _ => hand with { SquareDegrees = size },
            };
        }

        return hand;
    }

    private Rational Size(Expression expression)
    {
        QuantityValue size = evaluator.Length(expression);
        if (!size.Amount.TryGetRational(out Rational exact))
            throw new FaultException(MakingFindings.WrongKind(expression.ToString()!, "a length without end", "a length that is a plain fraction", expression.Span));
        if (exact.Sign <= 0)
            throw new FaultException(MakingFindings.NotPositive($"`{expression}`", $"{ValueText.Plain(exact)} mm", expression.Span));
        if (exact > 1_000_000)
            throw new FaultException(MakingFindings.Limit($"`{expression}` is too long", "1 km", expression.Span));
        return exact;
    }
}
