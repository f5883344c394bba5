using System.Collections.Immutable;
using RuleAndCompass.Bench;
using RuleAndCompass.Making;

namespace RuleAndCompass.Plates.Composition;

/// <summary>One plate: a stage, or as many of its acts as the column holds.</summary>
/// <param name="Index">From 0.</param>
/// <param name="Stage">Index into the layout's stages.</param>
/// <param name="First">Index of its first act.</param>
/// <param name="End">Index after its last act.</param>
internal sealed record PlatePlan(int Index, int Stage, int First, int End, ImmutableArray<SentenceBlock> Blocks);

/// <summary>Shares the acts out over plates, so that none is cut off.</summary>
internal sealed class PlatePlanner(
    Layout layout, ImmutableDictionary<int, ImmutableArray<string>> cautions, PlateFormat format, PlateHeading heading, CancellationToken cancellation)
{
    private const int MostMoved = 5;

    /// <summary>The plates in order; at least one.</summary>
    public List<PlatePlan> Plan()
    {
        List<PlatePlan> plans = [];
        List<SentenceBlock> blocks = [];
        double room = 0;
        int first = 0, stage = layout.Acts.IsEmpty ? 0 : layout.Acts[0].Stage;

        foreach (string note in Preface())
        {
            Take(SentenceBlock.OfNote(note, format), 0);
        }

        for (int i = 0; i < layout.Acts.Length; i++)
        {
            cancellation.ThrowIfCancellationRequested();
            Act act = layout.Acts[i];
            if (act.Stage != stage)
            {
                if (blocks.Count > 0)
                {
                    Finish(i);
                }

                stage = act.Stage;
            }

            Take(SentenceBlock.OfAct(act, cautions.GetValueOrDefault(act.Number, []), format), i);
        }

        if (blocks.Count > 0 || plans.Count == 0)
        {
            Finish(layout.Acts.Length);
        }

        return plans;

        void Take(SentenceBlock block, int at)
        {
            if (blocks.Count == 0)
            {
                room = Room(plans.Count == 0, stage);
            }
            else if (block.Height > room)
            {
                // The acts of one sentence stay together where that moves few of them.
                int moved = 0;
                while (moved < MostMoved && moved < blocks.Count - 1 && at - moved - 1 >= first && layout.Acts[at - moved - 1].Want == layout.Acts[at].Want)
                {
                    moved++;
                }

                if (moved == MostMoved || moved >= at - first)
                {
                    moved = 0;
                }

                List<SentenceBlock> taken = blocks.GetRange(blocks.Count - moved, moved);
                blocks.RemoveRange(blocks.Count - moved, moved);
                Finish(at - moved);
                room = Room(false, stage) - taken.Sum(earlier => earlier.Height);
                blocks.AddRange(taken);
            }

            room -= block.Height;
            blocks.Add(block);
        }

        void Finish(int end)
        {
            plans.Add(new(plans.Count, stage, first, end, [.. blocks]));
            blocks.Clear();
            first = end;
        }
    }

    private IEnumerable<string> Preface()
    {
        if (layout.Acts.IsEmpty)
        {
            yield return "Nothing is to be done: the script asks for no act.";
        }

        if (!layout.Givens.IsEmpty)
        {
            yield return "Given: " + string.Join("; ", layout.Givens.Select(given => $"{given.Name} = {given.Text}")) + ".";
        }

        foreach (string note in layout.Notes)
        {
            yield return note;
        }
    }

    private double Room(bool isFirst, int stage) =>
        format.TitleBlockTop - PlateFormat.Leading - (isFirst ? PlateFormat.KeyHeight : 0) - heading.Bottom(stage);
}
