namespace RuleAndCompass.Bench.Errors;

/// <summary>The sensitivity of a result to one error variable.</summary>
internal readonly record struct Sensitivity(int Variable, double Value);

/// <summary>
/// One reverse sweep (adjoint differentiation) over an <see cref="ActProgram"/>: from the derivatives of a result with respect to the
/// slots it is measured on to its sensitivities to every error variable, in one pass whatever their number.
/// </summary>
/// <remarks>A. Griewank and A. Walther, Evaluating Derivatives, 2nd ed. (2008), ch. 3.</remarks>
internal sealed class Sweep(ActProgram program)
{
    // Curves nearer to touching than this sine are taken as touching: doubles can't tell, and no first order exists there.
    private const double TouchingSine = 1e-7;

    private readonly List<Sensitivity> found = [];
    private readonly double[] paper = new double[2];
    private double[] adjoint = [];
    private int highestSlot;

    /// <summary>Slots at their exact places.</summary>
    public double[] Value => program.Nominal;

    /// <summary>The act at which the derivative is not finite, as where curves only touch; 0 for the measure itself; null where all is well.</summary>
    public int? SingularAct { get; private set; }

    public void MarkSingular(int act) => SingularAct = act;

    /// <summary>The sensitivities of one result. The list is used again by the next sweep.</summary>
    /// <param name="seed">Called first, to <see cref="Add"/> the result's derivatives.</param>
    public List<Sensitivity> Run(Action<Sweep> seed)
    {
        if (adjoint.Length < program.SlotCount)
            adjoint = new double[Math.Max(program.SlotCount, 2 * adjoint.Length)];
        found.Clear();
        paper.AsSpan().Clear();
        SingularAct = null;
        highestSlot = -1;
        seed(this);
        if (highestSlot >= 0)
        {
            for (int step = program.StepOfSlot(highestSlot); step >= 0; step--)
                program.Steps[step].Pull(this);
        }

        for (int axis = 0; axis < 2; axis++)
        {
            if (paper[axis] != 0)
                found.Add(new Sensitivity(axis, paper[axis]));
        }

        return found;
    }

    /// <summary>Adds to the derivative with respect to a slot.</summary>
    public void Add(int slot, double derivative)
    {
        adjoint[slot] += derivative;
        highestSlot = Math.Max(highestSlot, slot);
    }

    public void AddPair(int slot, double x, double y)
    {
        Add(slot, x);
        Add(slot + 1, y);
    }

    /// <summary>Reads a derivative and leaves zero, ready for the next sweep.</summary>
    public double Take(int slot)
    {
        double derivative = adjoint[slot];
        adjoint[slot] = 0;
        return derivative;
    }

    /// <summary>Notes the sensitivity to an error variable.</summary>
    public void Feel(int variable, double derivative)
    {
        if (variable < 2)
            paper[variable] += derivative;
        else if (derivative != 0)
            found.Add(new Sensitivity(variable, derivative));
    }

    /// <summary>
    /// A crossing keeps n·dp = (what each curve moves along its normal n there): shares (<paramref name="px"/>, <paramref name="py"/>) out between
    /// the two normals.
    /// </summary>
    public (double First, double Second) Share(int act, double px, double py, (double X, double Y) first, (double X, double Y) second)
    {
        double sine = first.X * second.Y - first.Y * second.X;
        if (Math.Abs(sine) < TouchingSine)
        {
            MarkSingular(act);
            return (0, 0);
        }

        return ((px * second.Y - py * second.X) / sine, (first.X * py - first.Y * px) / sine);
    }
}
