using System.Collections.Concurrent;
using System.Runtime.Intrinsics;
using RuleAndCompass.Bench.Errors;

namespace RuleAndCompass.Accuracy;

/// <summary>
/// Seeded trials: the acts that some quantities depend on, replayed with random errors, eight trials at a time, in blocks shared among
/// the cores. The figures follow from the seed alone: each random number is a function of seed, trial and act, classes are counted in
/// whole numbers, and sums are added in the order of the blocks.
/// </summary>
internal sealed class Trials
{
    private const int BlocksAtOnce = 64;
    private const int PilotTrials = 256;

    private readonly ActProgram program;
    private readonly Quantity[] quantities;
    private readonly ulong seed;
    private readonly Step[] steps;
    private readonly Draw[] draws;

    // Power of two; the errors of a block's trials stay within 8 MB whatever the number of quantities.
    private readonly int blockTrials;

    public Trials(ActProgram program, IReadOnlyList<Quantity> quantities, ulong seed)
    {
        this.program = program;
        this.quantities = [.. quantities];
        this.seed = seed;
        blockTrials = 4096;
        while (blockTrials > NormalNumbers.Lanes && (long)blockTrials * quantities.Count > 1 << 20)
            blockTrials /= 2;

        Slice slice = new(program.Steps.Count, program.StepOfSlot);
        foreach (Quantity quantity in quantities)
            quantity.Need(slice);
        HashSet<int> acts = [0];
        List<Step> needed = [];
        for (int step = program.Steps.Count - 1; step >= 0; step--)
        {
            if (!slice.IsNeeded(step))
                continue;
            program.Steps[step].Need(slice);
            needed.Add(program.Steps[step]);
            acts.Add(program.Steps[step].Act);
        }

        needed.Reverse();
        steps = [.. needed];
        draws = [.. Draws().Where(draw => acts.Contains(program.Variables[draw.Variable].Act))];
    }

    /// <summary>What the quantities are out by through rounded settings alone, all else being exact.</summary>
    public double[] Biases()
    {
        Workspace space = new(this);
        foreach (Step step in steps)
            step.Replay(space.Slots, space.Noise);
        return [.. quantities.Select(quantity => quantity.Error(space.Slots)[0])];
    }

    /// <summary>Runs the trials.</summary>
    /// <param name="count">How many; more than zero.</param>
    /// <param name="threads">The most threads to use.</param>
    /// <param name="progress">Told the part done.</param>
    /// <returns>One distribution for each quantity.</returns>
    public Distribution[] Run(int count, int threads, IProgress<double>? progress, CancellationToken cancellation)
    {
        Distribution[] distributions = Pilot(Math.Min(count, PilotTrials));
        ConcurrentBag<Workspace> free = [];
        ParallelOptions parallel = new() { MaxDegreeOfParallelism = threads, CancellationToken = cancellation };
        (double, double)[] sums = new (double, double)[BlocksAtOnce * quantities.Length];
        int blocks = (int)((count + (long)blockTrials - 1) / blockTrials);
        for (int from = 0; from < blocks; from += BlocksAtOnce)
        {
            int first = from;
            int these = Math.Min(BlocksAtOnce, blocks - from);
            Parallel.For(0, these, parallel, block =>
            {
                if (!free.TryTake(out Workspace? space))
                    space = new Workspace(this);
                int start = (first + block) * blockTrials;
                int trials = Math.Min(blockTrials, count - start);
                Replay(space, (uint)start, trials);
                for (int quantity = 0; quantity < quantities.Length; quantity++)
                {
                    lock (distributions[quantity])
                        sums[block * quantities.Length + quantity] = distributions[quantity].Tally(space.ErrorsOf(quantity, trials));
                }

                free.Add(space);
            });

            for (int block = 0; block < these; block++)
            {
                for (int quantity = 0; quantity < quantities.Length; quantity++)
                    distributions[quantity].AddSums(sums[block * quantities.Length + quantity]);
            }

            progress?.Report((from + these) / (double)blocks);
        }

        return distributions;
    }

    // A few trials tell the size of the errors, on which the classes of the distributions are laid out.
    private Distribution[] Pilot(int trials)
    {
        Workspace space = new(this);
        Replay(space, 0, trials);
        Distribution[] distributions = new Distribution[quantities.Length];
        for (int quantity = 0; quantity < quantities.Length; quantity++)
        {
            double squares = 0;
            int kept = 0;
            foreach (double error in space.ErrorsOf(quantity, trials))
            {
                if (double.IsNaN(error))
                    continue;
                squares += error * error;
                kept++;
            }

            double typical = Math.Sqrt(squares / Math.Max(1, kept));
            distributions[quantity] = new Distribution(double.IsNormal(typical) ? typical : 1);
        }

        return distributions;
    }

    private void Replay(Workspace space, uint firstTrial, int trials)
    {
        for (int trial = 0; trial < trials; trial += NormalNumbers.Lanes)
        {
            foreach (Draw draw in draws)
            {
                (Vector256<double> first, Vector256<double> second, Vector256<double> laterFirst, Vector256<double> laterSecond) =
                    NormalNumbers.Draw(seed, firstTrial + (uint)trial, draw.Number);
                space.Noise[draw.Variable] = first * draw.Sigma;
                space.Noise[draw.Variable + 1] = second * draw.SecondSigma;
                space.LaterNoise[draw.Variable] = laterFirst * draw.Sigma;
                space.LaterNoise[draw.Variable + 1] = laterSecond * draw.SecondSigma;
            }

            foreach (Step step in steps)
            {
                step.Replay(space.Slots, space.Noise);
                step.Replay(space.LaterSlots, space.LaterNoise);
            }

            for (int quantity = 0; quantity < quantities.Length; quantity++)
            {
                Span<double> errors = space.Errors.AsSpan(quantity * blockTrials + trial, NormalNumbers.Lanes);
                quantities[quantity].Error(space.Slots).CopyTo(errors);
                quantities[quantity].Error(space.LaterSlots).CopyTo(errors[Vector256<double>.Count..]);
            }
        }
    }

    // The counter of an act's first pair of errors is twice its number, of its second one more: it stays the same whatever else is asked.
    private IEnumerable<Draw> Draws()
    {
        int act = -1;
        uint ofAct = 0;
        for (int variable = 0; variable < program.Variables.Count; variable += 2)
        {
            ErrorVariable error = program.Variables[variable];
            ofAct = error.Act == act ? ofAct + 1 : 0;
            act = error.Act;
            double second = program.Variables[variable + 1].Sigma;
            if (error.Sigma != 0 || second != 0)
                yield return new Draw((uint)act * 2 + ofAct, variable, error.Sigma, second);
        }
    }

    /// <summary>A pair of errors drawn together.</summary>
    private readonly record struct Draw(uint Number, int Variable, double Sigma, double SecondSigma);

    /// <summary>What one thread works in.</summary>
    private sealed class Workspace(Trials trials)
    {
        public Vector256<double>[] Slots { get; } = new Vector256<double>[trials.program.SlotCount];

        public Vector256<double>[] LaterSlots { get; } = new Vector256<double>[trials.program.SlotCount];

        public Vector256<double>[] Noise { get; } = new Vector256<double>[trials.program.Variables.Count];

        public Vector256<double>[] LaterNoise { get; } = new Vector256<double>[trials.program.Variables.Count];

        public double[] Errors { get; } = new double[trials.quantities.Length * trials.blockTrials];

        public ReadOnlySpan<double> ErrorsOf(int quantity, int count) => Errors.AsSpan(quantity * trials.blockTrials, count);
    }
}
