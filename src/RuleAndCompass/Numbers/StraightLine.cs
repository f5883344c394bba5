namespace RuleAndCompass.Numbers;

/// <summary>
/// The sub-graph of one number as a list of instructions, operands first, equal ones merged. Leaves without a rational value are
/// replaced before, so that a program has rationals, the four operations and square roots only.
/// </summary>
internal sealed class StraightLine
{
    private static int lastStamp;

    private readonly Dictionary<Rational, int> constantIndex = [];
    private readonly Dictionary<ulong, int> operationIndex = [];
    private readonly List<Instruction> instructions = [];
    private readonly Dictionary<int, Real> leaves = [];

    private StraightLine()
    {
    }

    /// <param name="IsConstant">Then <paramref name="Value"/> counts, else the operation on the instructions Left and Right.</param>
    public readonly record struct Instruction(bool IsConstant, Rational Value, Operation Operation, int Left, int Right);

    /// <summary>The leaves that <c>replace</c> kept as they are; their constants count for nothing.</summary>
    public IReadOnlyDictionary<int, Real> Leaves => leaves;

    /// <summary>Whether a leaf stood in the graph.</summary>
    public bool HasLeaves { get; private set; }

    /// <summary>How many square roots there are.</summary>
    public int Roots { get; private set; }

    public int Count => instructions.Count;

    public Instruction this[int index] => instructions[index];

    /// <summary>Null where <paramref name="replace"/> gives null for a leaf that stands in the graph.</summary>
    /// <param name="x">The number.</param>
    /// <param name="replace">The stand-in of a leaf, a quantity or the angle of a vector; itself where it is to stay.</param>
    public static StraightLine? Compile(Real x, Func<Real, Real?> replace)
    {
        var line = new StraightLine();
        long stamp = (long)Interlocked.Increment(ref lastStamp) << 32;
        Dictionary<Real, Real>? standIns = null;
        var stack = new Stack<Real>();
        stack.Push(x);
        while (stack.TryPeek(out Real? node))
        {
            if (line.TryIndex(node, stamp, out _))
            {
                stack.Pop();
                continue;
            }

            if (IsLeaf(node))
            {
                line.HasLeaves = true;
                standIns ??= new Dictionary<Real, Real>(ReferenceEqualityComparer.Instance);
                if (!standIns.TryGetValue(node, out Real? standIn))
                {
                    standIn = replace(node);
                    if (standIn is null)
                        return null;
                    standIns.Add(node, standIn);
                }

                if (ReferenceEquals(standIn, node))
                {
                    node.Mark = stamp | (uint)line.Leaf(node);
                    continue;
                }

                if (!line.TryIndex(standIn, stamp, out int at))
                {
                    stack.Push(standIn);
                    continue;
                }

                node.Mark = stamp | (uint)at;
                continue;
            }

            var operation = (OperationReal)node;
            bool hasLeft = line.TryIndex(operation.Left, stamp, out int left);
            int right = left;
            bool hasRight = operation.Right is null || line.TryIndex(operation.Right, stamp, out right);
            if (operation.Right is null)
                right = left;
            if (!hasLeft || !hasRight)
            {
                if (!hasLeft)
                    stack.Push(operation.Left);
                if (!hasRight)
                    stack.Push(operation.Right!);
                continue;
            }

            node.Mark = stamp | (uint)line.Operate(operation.Operation, left, right);
        }

        // The last instruction is the number itself even where it merged with an earlier one.
        line.TryIndex(x, stamp, out int result);
        line.Result = result;
        return line;
    }

    public int Result { get; private set; }

    /// <summary>The leaves below <paramref name="x"/>: quantities and angles of vectors, each once.</summary>
    public static List<Real> LeavesOf(Real x)
    {
        var leaves = new List<Real>();
        var seen = new HashSet<Real>(ReferenceEqualityComparer.Instance);
        var stack = new Stack<Real>();
        stack.Push(x);
        while (stack.TryPop(out Real? node))
        {
            if (node is RationalReal || !seen.Add(node))
                continue;

            if (IsLeaf(node))
            {
                leaves.Add(node);
                continue;
            }

            var operation = (OperationReal)node;
            stack.Push(operation.Left);
            if (operation.Right is not null)
                stack.Push(operation.Right);
        }

        return leaves;
    }

    private static bool IsLeaf(Real node) => node is QuantityReal or OperationReal { Operation: Operation.DegreesOfVector };

    // A node carries the stamp of the compilation that saw it last, with its place. Should another thread write its own between, the node is
    // compiled again and merges with what is there.
    private bool TryIndex(Real node, long stamp, out int index)
    {
        if (node is RationalReal rational)
        {
            index = Constant(rational.Value);
            return true;
        }

        long mark = node.Mark;
        index = (int)mark;
        return mark >> 32 == stamp >> 32;
    }

    private int Constant(Rational value)
    {
        if (!constantIndex.TryGetValue(value, out int at))
        {
            at = instructions.Count;
            instructions.Add(new Instruction(true, value, default, 0, 0));
            constantIndex.Add(value, at);
        }

        return at;
    }

    private int Leaf(Real node)
    {
        leaves[instructions.Count] = node;
        instructions.Add(new Instruction(true, default, default, 0, 0));
        return instructions.Count - 1;
    }

    private int Operate(Operation operation, int left, int right)
    {
        if (operation is Operation.Add or Operation.Multiply && left > right)
            (left, right) = (right, left);
        // Fewer than 2^30 instructions fit into memory.
        ulong key = (ulong)operation << 60 | (ulong)left << 30 | (uint)right;
        if (!operationIndex.TryGetValue(key, out int at))
        {
            at = instructions.Count;
            instructions.Add(new Instruction(false, default, operation, left, right));
            operationIndex.Add(key, at);
            if (operation == Operation.Sqrt)
                Roots++;
        }

        return at;
    }
}
