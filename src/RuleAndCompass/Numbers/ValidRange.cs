using System.Collections.Immutable;

namespace RuleAndCompass.Numbers;

/// <summary>How far what a script decided reaches in one of its givens.</summary>
/// <param name="Given">The given's name.</param>
/// <param name="IsAngle">Degrees, else millimetres.</param>
/// <param name="From">Least value over which every decision stays as it is; null where it is shown near the value at hand only.</param>
/// <param name="To">Greatest.</param>
public sealed record ValidFor(string Given, bool IsAngle, double? From, double? To);

/// <summary>
/// How far a script's decisions reach: as the givens move, what vanished goes on vanishing and every choice stays as it is, as long as
/// no radicand, no divisor and no number whose sign was decided vanishes, and intervals over pieces of the range show that none does.
/// </summary>
/// <remarks>
/// What vanishes on an open set of a connected region where a function is analytic vanishes on all of it; pieces as in R. E. Moore,
/// Methods and Applications of Interval Analysis (1979), §4.
/// </remarks>
internal sealed class ValidRange
{
    // One given: pieces down to 1/512 of the range. Several: no more pieces than this in all.
    private const int MostHalvings = 9;
    private const int MostBoxes = 256;

    // Math.Sin and Math.Cos are good to about one unit in the last place; this is a thousand times more.
    private const double TrigonometricMargin = 1e-12;

    private readonly StraightLine line;
    private readonly List<Range> ranges = [];
    private readonly Interval[] values;
    private readonly Interval[] middles;
    private readonly Interval[] slopes;
    private Range? moving;
    private Interval reach;

    private ValidRange(Real x)
    {
        line = StraightLine.Compile(x, leaf => leaf)!; // every leaf is kept
        values = new Interval[line.Count];
        middles = new Interval[line.Count];
        slopes = new Interval[line.Count];
        foreach (Real leaf in line.Leaves.Values)
            switch (leaf)
            {
                case GivenReal given:
                    ranges.Add(new(given, null, given.Name, given.From?.ToDouble(), given.To?.ToDouble(), given.Value));
                    break;
                case DirectionReal { Source: { Name: { } name } source } when ranges.All(range => !ReferenceEquals(range.Source, source)):
                    ranges.Add(new(null, source, name, source.From?.ToDouble(), source.To?.ToDouble(), source.Degrees));
                    break;
            }
    }

    private sealed class Range(Real? leaf, AngleSource? source, string name, double? from, double? to, Real value)
    {
        public Real? Leaf { get; } = leaf;

        public AngleSource? Source { get; } = source;

        public string Name { get; } = name;

        public double? From { get; } = from;

        public double? To { get; } = to;

        public Real Value { get; } = value;

        public double Low { get; set; } = value.Low;

        public double High { get; set; } = value.High;

        public bool IsDeclared => From is not null && To is not null;
    }

    /// <summary>For each given that was decided about: the range declared for it, or as much of that as could be shown.</summary>
    /// <param name="apart">Numbers decided not to be 0.</param>
    /// <param name="vanishing">Numbers decided to be 0 for every value of the givens.</param>
    /// <param name="hasSpecific">Something was decided to be 0 for the very values at hand only.</param>
    public static ImmutableArray<ValidFor> Of(IEnumerable<Real> apart, IEnumerable<Real> vanishing, bool hasSpecific)
    {
        // A quotient asks for just what is to be shown: that its divisor does not vanish.
        Real all = Real.Zero;
        foreach (Real number in apart)
            all += Real.One / number;
        foreach (Real number in vanishing)
            all += number;
        ValidRange valid = new(all);
        List<Range> declared = [.. valid.ranges.Where(range => range.IsDeclared && !hasSpecific)];
        Dictionary<Range, (double Low, double High)> shown = [];
        if (declared is [var only])
        {
            if (valid.RunAboutValue(only) is { } run)
                shown[only] = run;
        }
        else if (declared.Count > 1 && valid.HoldsOverAll(declared))
        {
            foreach (Range range in declared)
                shown[range] = (range.From!.Value, range.To!.Value); // declared ones have both
        }

        return
        [
            .. valid.ranges.Select(range => shown.TryGetValue(range, out (double Low, double High) reach)
                ? new ValidFor(range.Name, range.Source is not null, reach.Low, reach.High)
                : new ValidFor(range.Name, range.Source is not null, null, null)),
        ];
    }

    /// <summary>A leaf that stands for a given.</summary>
    public static bool IsNamed(Real leaf) => leaf is GivenReal or DirectionReal { Source.Name: not null };

    // The pieces that hold, joined as far as they reach from the one about the value.
    private (double Low, double High)? RunAboutValue(Range range)
    {
        List<(double Low, double High)> pieces = [];
        moving = range;
        Split(range.From!.Value, range.To!.Value, 0); // only a declared range comes here
        (double Low, double High)? run = null;
        double value = range.Value.ToDouble();
        foreach ((double low, double high) in pieces)
        {
            if (run is { } before && before.High == low)
                run = (before.Low, high);
            else if (run is { } past && past.Low <= value && value <= past.High)
                break;
            else
                run = (low, high);
        }

        return run is { } found && found.Low <= value && value <= found.High ? found : null;

        void Split(double low, double high, int depth)
        {
            (range.Low, range.High) = (low, high);
            double half = Math.BitIncrement((high - low) / 2);
            reach = new(Math.BitDecrement(-half), Math.BitIncrement(half));
            if (Holds())
            {
                pieces.Add((low, high));
                return;
            }

            if (depth == MostHalvings)
                return;
            double middle = (low + high) / 2;
            Split(low, middle, depth + 1);
            Split(middle, high, depth + 1);
        }
    }

    private bool HoldsOverAll(List<Range> declared)
    {
        Stack<(double Low, double High)[]> boxes = new();
        boxes.Push([.. declared.Select(range => (range.From!.Value, range.To!.Value))]); // declared ones have both
        for (int tried = 0; boxes.TryPop(out (double Low, double High)[]? box); tried++)
        {
            if (tried == MostBoxes)
                return false;
            for (int side = 0; side < box.Length; side++)
                (declared[side].Low, declared[side].High) = box[side];
            if (Holds())
                continue;
            int widest = 0;
            for (int side = 1; side < box.Length; side++)
                if (Part(side) > Part(widest))
                    widest = side;
            double middle = (box[widest].Low + box[widest].High) / 2;
            (double Low, double High)[] lower = [.. box], upper = [.. box];
            lower[widest].High = middle;
            upper[widest].Low = middle;
            boxes.Push(upper);
            boxes.Push(lower);

            double Part(int side) => (box[side].High - box[side].Low) / (declared[side].To!.Value - declared[side].From!.Value);
        }

        return true;
    }

    private bool Holds()
    {
        for (int at = 0; at < line.Count; at++)
        {
            StraightLine.Instruction step = line[at];
            if (line.Leaves.TryGetValue(at, out Real? leaf))
            {
                (values[at], middles[at], slopes[at]) = Over(leaf);
                continue;
            }

            if (step.IsConstant)
            {
                (values[at], middles[at], slopes[at]) = (Interval.Of(step.Value), Interval.Of(step.Value), default);
                continue;
            }

            Interval left = values[step.Left], right = values[step.Right];
            if ((step.Operation == Operation.Divide && right.Low <= 0 && right.High >= 0) || (step.Operation == Operation.Sqrt && !(left.Low > 0)))
                return false;
            bool isSquare = step.Left == step.Right && step.Operation == Operation.Multiply;
            Interval value = isSquare ? Interval.Square(left) : Interval.Apply(step.Operation, left, right);
            middles[at] = Interval.Apply(step.Operation, middles[step.Left], middles[step.Right]);
            slopes[at] = Slope(step, value);
            // The mean value form is the sharper the smaller the piece: Moore (1979), §3.3.
            values[at] = moving is null ? value : Interval.Meet(value, Interval.Apply(Operation.Add, middles[at], Interval.Apply(Operation.Multiply, slopes[at], reach)));
        }

        return true;
    }

    // How fast the number may change with the one given that moves.
    private Interval Slope(StraightLine.Instruction step, Interval value)
    {
        Interval left = slopes[step.Left], right = slopes[step.Right];
        switch (step.Operation)
        {
            case Operation.Add or Operation.Subtract:
                return Interval.Apply(step.Operation, left, right);
            case Operation.Multiply:
                return Interval.Apply(Operation.Add, Interval.Apply(Operation.Multiply, left, values[step.Right]), Interval.Apply(Operation.Multiply, values[step.Left], right));
            case Operation.Divide:
                Interval changed = Interval.Apply(Operation.Subtract, left, Interval.Apply(Operation.Multiply, value, right));
                return Interval.Apply(Operation.Divide, changed, values[step.Right]);
            case Operation.Sqrt:
                return Interval.Apply(Operation.Divide, left, Interval.Apply(Operation.Add, value, value));
            default:
                return Interval.Everything;
        }
    }

    // What a leaf may be while the givens are anywhere in their pieces, in the middle of the piece, and how fast it changes.
    private (Interval Value, Interval Middle, Interval Slope) Over(Real leaf)
    {
        switch (leaf)
        {
            case DirectionReal direction when ranges.Find(range => ReferenceEquals(range.Source, direction.Source)) is { } turned:
                double multiple = direction.Multiple.ToDouble(), middle = (turned.Low + turned.High) / 2;
                Interval slope = direction.IsSine
                    ? Turned(turned.Low * multiple, turned.High * multiple, false)
                    : Interval.Apply(Operation.Subtract, default, Turned(turned.Low * multiple, turned.High * multiple, true));
                Interval perDegree = Interval.Apply(Operation.Multiply, slope, new(Math.BitDecrement(multiple * Math.PI / 180), Math.BitIncrement(multiple * Math.PI / 180)));
                return (Turned(turned.Low * multiple, turned.High * multiple, direction.IsSine), Turned(middle * multiple, middle * multiple, direction.IsSine), ReferenceEquals(turned, moving) ? perDegree : default);
            case GivenReal given when ranges.Find(range => ReferenceEquals(range.Leaf, given)) is { } known:
                double centre = (known.Low + known.High) / 2;
                return (new(known.Low, known.High), new(centre, centre), ReferenceEquals(known, moving) ? new(1, 1) : default);
            case OperationReal:
                // The degrees of a vector that may itself depend on the givens.
                return (Interval.Everything, Interval.Everything, Interval.Everything);
            default:
                return (new(leaf.Low, leaf.High), new(leaf.Low, leaf.High), default);
        }
    }

    private static Interval Turned(double first, double second, bool isSine)
    {
        double low = Math.Min(first, second) - TrigonometricMargin - (isSine ? 90 : 0), high = Math.Max(first, second) + TrigonometricMargin - (isSine ? 90 : 0);
        // cos falls from a whole turn to the half turn and climbs back: its greatest and least stand at multiples of 180°.
        if (!(Math.Abs(low) < 1e6 && Math.Abs(high) < 1e6))
            return new(-1, 1);
        double a = Math.Cos(low * Math.PI / 180), b = Math.Cos(high * Math.PI / 180);
        double least = Math.Min(a, b), greatest = Math.Max(a, b);
        if (Math.Ceiling(low / 360) * 360 <= high)
            greatest = 1;
        if ((Math.Ceiling((low - 180) / 360) * 360) + 180 <= high)
            least = -1;
        return new(Math.Max(-1, least - TrigonometricMargin), Math.Min(1, greatest + TrigonometricMargin));
    }
}
