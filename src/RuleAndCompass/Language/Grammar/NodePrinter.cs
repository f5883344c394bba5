using System.Collections.Immutable;
using System.Diagnostics;
using System.Text;
using RuleAndCompass.Language.Syntax;

namespace RuleAndCompass.Language.Grammar;

/// <summary>Writes nodes as they are written in a sentence, one blank between words.</summary>
/// <param name="replace">Gives what to print for an index, or null to print it as it stands.</param>
internal sealed class NodePrinter(Func<Expression, string?>? replace)
{
    // how tightly expressions bind
    private const int SumRank = 1;
    private const int ProductRank = 2;
    private const int FactorRank = 3;

    private readonly StringBuilder _out = new();
    private bool _inBraces;

    public static string Print(Node node, Func<Expression, string?>? replace = null)
    {
        NodePrinter printer = new(replace);
        printer.Write(node);
        return printer._out.ToString();
    }

    private void Write(Node? node)
    {
        switch (node)
        {
            case null:
                break;
            case Expression expression:
                WriteExpression(expression, SumRank);
                break;
            case WantSentence want:
                WriteWant(want);
                Add(want.By switch
                {
                    ByTool.Dividers => " by dividers",
                    ByTool.Square => " by square",
                    ByTool.Protractor => " by protractor",
                    ByTool.Scale => " by scale",
                    _ => "",
                });
                break;
            case Sentence sentence:
                WriteSentence(sentence);
                break;
            default:
                WritePart(node);
                break;
        }
    }

    private void WriteExpression(Expression expression, int rank)
    {
        switch (expression)
        {
            case NumberLiteral number:
                Add(number.Text);
                break;
            case LengthLiteral length:
                Add(length.Text);
                break;
            case AngleLiteral angle:
                Add(_inBraces ? angle.Text.Replace('"', '″') : angle.Text);
                break;
            case TextLiteral text:
                WriteText(text);
                break;
            case Reference reference:
                WriteList(reference.Steps, ".");
                break;
            case Negation negation:
                Add("-");
                WriteExpression(negation.Operand, FactorRank);
                break;
            case Arithmetic arithmetic:
                WriteArithmetic(arithmetic, rank);
                break;
            case Call call:
                Write(call.Function);
                Add("(");
                WriteList(call.Arguments, ", ");
                Add(")");
                break;
            case DistanceMeasure distance:
                Add("distance ", distance.From, " to ", distance.To);
                break;
            case TurnMeasure turn:
                Add("angle from ", turn.From, " to ", turn.To, Way(turn.Way));
                break;
            case AngleMeasure angle:
                Add("angle ", angle.First, " ", angle.Corner, " ", angle.Second);
                break;
            case RadiusMeasure radius:
                Add("radius of ", radius.Circle);
                break;
            case CoordinateMeasure coordinate:
                Add(coordinate.IsX ? "x of " : "y of ", coordinate.Point);
                break;
            default:
                throw new UnreachableException($"No way to print {expression.GetType().Name}.");
        }
    }

    // A chain of sums may be long: it is walked down on the left, not called.
    private void WriteArithmetic(Arithmetic arithmetic, int rank)
    {
        int own = Rank(arithmetic);
        bool brackets = own < rank;
        if (brackets)
            Add("(");
        Stack<Arithmetic> chain = new();
        Expression first = arithmetic;
        while (first is Arithmetic next && Rank(next) == own)
        {
            chain.Push(next);
            first = next.Left;
        }

        WriteExpression(first, own);
        while (chain.TryPop(out Arithmetic? next))
        {
            Add(next.Operator switch
            {
                ArithmeticOperator.Plus => " + ",
                ArithmeticOperator.Minus => " - ",
                ArithmeticOperator.Times => " * ",
                _ => " / ",
            });
            // a fraction is never written bare after a stroke
            bool fraction = next.Operator == ArithmeticOperator.Over && BeginsWithFraction(next.Right);
            if (fraction)
                Add("(");
            WriteExpression(next.Right, fraction ? SumRank : own + 1);
            if (fraction)
                Add(")");
        }

        if (brackets)
            Add(")");
    }

    private static bool BeginsWithFraction(Expression expression) => expression switch
    {
        NumberLiteral number => number.Text.Contains('/', StringComparison.Ordinal),
        LengthLiteral length => length.Text.Contains('/', StringComparison.Ordinal),
        AngleLiteral angle => angle.Text.Contains('/', StringComparison.Ordinal),
        Negation negation => BeginsWithFraction(negation.Operand),
        _ => false,
    };

    private static int Rank(Arithmetic arithmetic) => arithmetic.Operator is ArithmeticOperator.Plus or ArithmeticOperator.Minus ? SumRank : ProductRank;

    private void WriteText(TextLiteral text)
    {
        Add("\"");
        foreach (TextPiece piece in text.Pieces)
            WritePart(piece);
        Add("\"");
    }

    private void WritePart(Node node)
    {
        switch (node)
        {
            case Name name:
                Add(name.Text);
                break;
            case Bound bound:
                Write(bound.Name);
                WriteIndices(bound.Indices);
                break;
            case Many many:
                Add(many.Name, "[", many.From, " to ", many.To, Optional(" step ", many.Step), "]");
                break;
            case PlainPiece plain:
                Add(plain.Text.Replace("{", "{{", StringComparison.Ordinal));
                break;
            case ValuePiece value:
                _inBraces = true;
                Add("{", value.Value, value.Form is null ? null : ":" + value.Form, "}");
                _inBraces = false;
                break;
            case Place place:
                Add("(", place.X, ", ", place.Y, ")", Optional(" from ", place.From));
                break;
            case SheetDirection direction:
                Add(direction.Word);
                break;
            case TowardDirection direction:
                Write(direction.Value);
                break;
            case PointsSpan span:
                Add(span.From, " to ", span.To);
                break;
            case LengthSpan span:
                Write(span.Length);
                break;
            case Choice choice:
                WriteChoice(choice);
                break;
            case ToolClause tool:
                Add(ToolWord(tool.Tool), Optional(" ", tool.First), Optional(" to ", tool.Second));
                break;
            case ErrorClause error:
                Add(error.Source, " ", error.Size);
                break;
            case RangeClause range:
                Add(range.From, Optional(" to ", range.To), Optional(" step ", range.Step));
                break;
            case WhenBranch branch:
                Add(branch.Condition is null ? "otherwise" : "when ", branch.Condition);
                break;
            case NeedClause need:
                Add(need.Name, " ", need.Kind, Optional(" = ", need.Default));
                break;
            case GiveClause give:
                Add(give.Name, Optional(" as ", give.As));
                break;
            case ArgumentClause argument:
                Add(argument.Need, " = ", argument.Value);
                break;
            case Condition condition:
                WriteList(condition.Tests, condition.ByOr ? " or " : " and ");
                break;
            case Test test:
                WriteTest(test);
                break;
            case KeepStyle style:
                WriteList(style.Words, " ");
                Add(Optional(" ", style.DrilledWidth));
                break;
            case Leg leg:
                Add("along ", leg.Along, Way(leg.Way), " to ", leg.To);
                break;
            case FromToPortion portion:
                Add("from ", portion.From, " to ", portion.To, Way(portion.Way));
                break;
            case BetweenPortion portion:
                Add("between ", portion.First, " and ", portion.Second);
                break;
            case LimitsPortion portion:
                WriteList(portion.Limits, " and ");
                break;
            case LimitClause limit:
                Add(limit.Inside ? "inside " : "outside ", limit.Circle);
                break;
            case JoinedPortion portion:
                Add(portion.Faired ? "faired" : "joined", portion.Closed ? " closed" : null);
                break;
            case TowardLie lie:
                Add(lie.Feet ? "feet toward " : "head toward ", lie.Toward);
                break;
            case AlongLie lie:
                Add("along ", lie.Line);
                break;
            case RoundLie lie:
                Add("round ", lie.Circle, Way(lie.Way));
                break;
            default:
                throw new UnreachableException($"No way to print {node.GetType().Name}.");
        }
    }

    private void WriteIndices(ImmutableArray<Expression> indices)
    {
        if (indices.IsDefaultOrEmpty)
            return;
        for (int i = 0; i < indices.Length; i++)
        {
            Add(i == 0 ? "[" : ", ");
            if (replace?.Invoke(indices[i]) is { } value)
                Add(value);
            else
                Write(indices[i]);
        }

        Add("]");
    }

    private void WriteTest(Test test)
    {
        Add(test.Negated ? "not " : "");
        switch (test)
        {
            case RelationTest relation:
                Add(
                    relation.Left,
                    relation.Relation switch
                    {
                        Relation.Equal => " = ",
                        Relation.Less => " < ",
                        Relation.Greater => " > ",
                        Relation.AtMost => " <= ",
                        _ => " >= ",
                    },
                    relation.Right);
                break;
            case FigureTest figures:
                Add(
                    figures.Left,
                    figures.Relation switch
                    {
                        FigureRelation.On => " on ",
                        FigureRelation.SquareTo => " square to ",
                        FigureRelation.ParallelTo => " parallel to ",
                        FigureRelation.Touches => " touches ",
                        _ => " meets ",
                    },
                    figures.Right);
                break;
            case SharedTest shared:
                WriteList(shared.Figures, ", ");
                Add(shared.Relation switch
                {
                    SharedRelation.OnOneLine => " on one line",
                    SharedRelation.OnOneCircle => " on one circle",
                    _ => " through one point",
                });
                break;
            default:
                throw new UnreachableException($"No way to print {test.GetType().Name}.");
        }
    }

    private void WriteChoice(Choice choice)
    {
        switch (choice.Kind)
        {
            case ChoiceKind.SameSide:
                Add("same side of ", choice.Of, " as ", choice.From);
                break;
            case ChoiceKind.Across:
                Add("across ", choice.Of, " from ", choice.From);
                break;
            default:
                Add(
                    choice.Kind switch
                    {
                        ChoiceKind.Nearest => "nearest ",
                        ChoiceKind.FarthestFrom => "farthest from ",
                        ChoiceKind.OtherThan => "other than ",
                        ChoiceKind.Above => "above ",
                        ChoiceKind.Below => "below ",
                        ChoiceKind.LeftOf => "left of ",
                        ChoiceKind.RightOf => "right of ",
                        ChoiceKind.LeftAlong => "left along ",
                        ChoiceKind.RightAlong => "right along ",
                        ChoiceKind.AheadOf => "ahead of ",
                        ChoiceKind.Behind => "behind ",
                        ChoiceKind.Inside => "inside ",
                        _ => "outside ",
                    },
                    choice.Of);
                break;
        }
    }

    private void WriteWant(WantSentence want)
    {
        switch (want)
        {
            case PrickAt w:
                Add("prick ", w.Point, " at ", w.Place);
                break;
            case PrickFoot w:
                Add("prick ", w.Point, " at foot of ", w.From, " on ", w.On);
                break;
            case PrickCentre w:
                Add("prick ", w.Point, " at centre of ", w.Circle);
                break;
            case PrickMidway w:
                Add("prick ", w.Point, " midway ", w.From, " to ", w.To);
                break;
            case PrickAcross w:
                Add("prick ", w.Point, " opposite ", w.Of, " across ", w.Across);
                break;
            case PrickAbout w:
                Add("prick ", w.Point, " opposite ", w.Of, " about ", w.About);
                break;
            case PrickWhere w:
                Add("prick ", w.Point, " where ", w.First, " meets ", w.Second, Optional(", ", w.Choice));
                break;
            case PrickBoth w:
                Add("prick ", w.Point, ", ", w.Other, " where ", w.First, " meets ", w.Second);
                break;
            case PrickOnToward w:
                Add("prick ", w.Point, " on ", w.Line, ", ", w.Length, " from ", w.From, " toward ", w.Toward);
                break;
            case PrickOnAhead w:
                Add("prick ", w.Point, " on ", w.Line, ", ", w.Length, w.Ahead ? " ahead of " : " behind ", w.Of);
                break;
            case PrickOnCircle w:
                Add("prick ", w.Point, " on ", w.Circle, " toward ", w.Toward);
                break;
            case PrickTurned w:
                Add("prick ", w.Point, " on ", w.Circle, " turned ", w.Angle, " from ", w.From, Way(w.Way));
                break;
            case PrickDividing w:
                Add("prick ", w.Points, " dividing ", w.From, " to ", w.To);
                break;
            case PrickRound w:
                Add("prick ", w.Points, " round ", w.Centre, " from ", w.From, Way(w.Way));
                break;
            case PrickSteppingAlong w:
                Add("prick ", w.Points, " stepping ", w.Opening, " along ", w.Line, " from ", w.From, " toward ", w.Toward);
                break;
            case PrickSteppingRound w:
                Add("prick ", w.Points, " stepping ", w.Opening, " round ", w.Circle, " from ", w.From, Way(w.Way));
                break;
            case RuleThrough w:
                Add("rule ", w.Line, " through ", w.First, ", ", w.Second);
                break;
            case RuleToward w:
                Add("rule ", w.Line, " through ", w.Through, " toward ", w.Toward);
                break;
            case RuleSquare w:
                Add("rule ", w.Line, " through ", w.Through, " square to ", w.To);
                break;
            case RuleParallel w:
                Add("rule ", w.Line, " through ", w.Through, " parallel to ", w.To);
                break;
            case RuleBack w:
                Add("rule ", w.Line, " through ", w.Through, " back along ", w.Along);
                break;
            case RuleTurned w:
                Add("rule ", w.Line, " through ", w.Through, " turned ", w.Angle, " from ", w.From, Way(w.Way));
                break;
            case RuleHalving w:
                Add("rule ", w.Line, " halving ", w.From, " to ", w.To);
                break;
            case RuleHalvingAngle w:
                Add("rule ", w.Line, " halving angle ", w.First, " ", w.Corner, " ", w.Second);
                break;
            case RuleTouchingAt w:
                Add("rule ", w.Line, " touching ", w.Circle, " at ", w.At);
                break;
            case RuleTouchingFrom w:
                Add("rule ", w.Line, " touching ", w.Circle, " from ", w.From, ", ", w.Choice);
                break;
            case RuleTouchingBoth w:
                Add("rule ", w.Line, " touching ", w.First, ", ", w.Second, w.Crossed ? " crossed, " : " open, ", w.Choice);
                break;
            case StrikeThrough w:
                Add("strike ", w.Circle, " about ", w.About, " through ", w.Through);
                break;
            case StrikeOpening w:
                Add("strike ", w.Circle, " about ", w.About, " opening ", w.Opening);
                break;
            case StrikeTouching w:
                Add("strike ", w.Circle, " about ", w.About, " touching ", w.Touching);
                break;
            case StrikeThroughThree w:
                Add("strike ", w.Circle, " through ", w.First, ", ", w.Second, ", ", w.Third);
                break;
            default:
                throw new UnreachableException($"No way to print {want.GetType().Name}.");
        }
    }

    private void WriteSentence(Sentence sentence)
    {
        switch (sentence)
        {
            case TitleSentence s:
                Add("title ", s.Text);
                break;
            case SheetSentence s:
                Add("sheet ", s.Standard, s.Width, Optional(" by ", s.Height));
                Add(s.Orientation switch { Orientation.Upright => " upright", Orientation.Sideways => " sideways", _ => "" });
                break;
            case BoardSentence s:
                Add("board ", s.Width, " by ", s.Height);
                break;
            case KitSentence s:
                Add("kit ");
                WriteList(s.Tools, ", ");
                break;
            case HandSentence s:
                Add("hand ", s.Preset, s.Preset is not null && !s.Errors.IsEmpty ? ", but " : null);
                WriteList(s.Errors, ", ");
                break;
            case NoteSentence s:
                Add("note ", s.Text);
                break;
            case UseSentence s:
                Add("use ", s.File);
                break;
            case GivenSentence s:
                Add("given ", s.Name, " = ", s.Value, Optional(" from ", s.From), Optional(" to ", s.To));
                break;
            case LetSentence s:
                Add("let ", s.Bound, " = ", s.Value);
                break;
            case StageSentence s:
                Add("stage ", s.Text);
                break;
            case RefuseSentence s:
                Add("refuse ", s.Text);
                break;
            case ForBlock s:
                Add("for ", s.Variable, " = ");
                WriteList(s.Ranges, ", ");
                WriteBody(s.Body);
                Add("\nend");
                break;
            case WhenBlock s:
                for (int i = 0; i < s.Branches.Length; i++)
                {
                    Add(i > 0 ? "\n" : "", i > 0 && s.Branches[i].Condition is not null ? "otherwise " : "", s.Branches[i]);
                    WriteBody(s.Branches[i].Body);
                }

                Add("\nend");
                break;
            case RecipeBlock s:
                Add("recipe ", s.Title);
                WriteBody(s.Body);
                Add("\nend");
                break;
            case OtherwiseSentence s:
                Add(s.Condition is null ? "otherwise" : "otherwise when ", s.Condition);
                break;
            case EndSentence:
                Add("end");
                break;
            case NeedsSentence s:
                Add("needs ");
                WriteList(s.Needs, ", ");
                break;
            case GivesSentence s:
                Add("gives ");
                WriteList(s.Gives, ", ");
                break;
            case TradeSentence s:
                Add("trade ", s.Text);
                break;
            case SourceSentence s:
                Add("source ", s.Text);
                break;
            case FollowSentence s:
                Add("follow ", s.Recipe, " as ", s.Alias, s.Arguments.IsEmpty ? null : " with ");
                WriteList(s.Arguments, ", ");
                break;
            case ClaimSentence s:
                Add("claim ", s.Condition);
                break;
            case CompareSentence s:
                Add("compare ", s.Constructed, " with ", s.Computed, s.ComputedPlace, Optional(" as ", s.Label), Optional(" timed by ", s.TimedBy), Optional(" within ", s.Within));
                Add(s.WithinMinutes ? " minutes" : "");
                break;
            case KeepSentence s:
                Add("keep ", s.Figure, Optional(" ", s.Portion), s.Style.Words.IsEmpty ? null : " ", s.Style);
                break;
            case KeepRunSentence s:
                Add("keep from ", s.From, " ");
                WriteList(s.Legs, ", ");
                Add(s.Style.Words.IsEmpty ? null : " ", s.Style);
                break;
            case LetterSentence s:
                Add("letter ", s.Text, s.Anchor switch { TextAnchor.Middle => " at ", TextAnchor.Begin => " from ", _ => " to " }, s.At, " height ", s.Height, Optional(" ", s.Lie));
                break;
            default:
                throw new UnreachableException($"No way to print {sentence.GetType().Name}.");
        }
    }

    // A block printed alone: each line two blanks further in.
    private void WriteBody(ImmutableArray<Sentence> body)
    {
        foreach (Sentence sentence in body)
            Add("\n  ", Print(sentence, replace).Replace("\n", "\n  ", StringComparison.Ordinal));
    }

    private static string ToolWord(ToolKind tool) => tool switch
    {
        ToolKind.Straightedge => "straightedge",
        ToolKind.Dividers => "dividers",
        ToolKind.Beam => "beam",
        ToolKind.Square => "square",
        ToolKind.Protractor => "protractor",
        _ => "scale",
    };

    private static string? Way(Way? way) => way switch
    {
        Syntax.Way.Clockwise => " clockwise",
        Syntax.Way.Anticlockwise => " anticlockwise",
        _ => null,
    };

    private static (string Before, Node Node)? Optional(string before, Node? node) => node is null ? null : (before, node);

    private void WriteList<T>(ImmutableArray<T> nodes, string separator)
        where T : Node
    {
        for (int i = 0; i < nodes.Length; i++)
        {
            if (i > 0)
                Add(separator);
            Write(nodes[i]);
        }
    }

    // Words, nodes, and words with a node after them that is left out with it.
    private void Add(params ReadOnlySpan<object?> parts)
    {
        foreach (object? part in parts)
        {
            switch (part)
            {
                case string word:
                    _out.Append(word);
                    break;
                case Node node:
                    Write(node);
                    break;
                case ValueTuple<string, Node> optional:
                    _out.Append(optional.Item1);
                    Write(optional.Item2);
                    break;
            }
        }
    }
}
