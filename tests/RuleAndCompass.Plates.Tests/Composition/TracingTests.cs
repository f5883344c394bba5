using RuleAndCompass.Making;
using RuleAndCompass.Plates.Composition;

namespace RuleAndCompass.Plates.Tests.Composition;

public sealed class TracingTests
{
    [Fact]
    public void An_arc_is_drawn_only_where_it_is_used()
    {
        Layout layout = Layouts.Of("""
            kit straightedge 300 mm, dividers 2 mm to 150 mm, scale 1/2 mm
            prick A at (0, 0)
            prick B at (60 mm, 0)
            rule l through A, B
            rule m through A square to l
            """);
        Tracing tracing = Tracing.Of(layout, default);

        List<CircleTrace> arcs = [.. tracing.Traces.OfType<CircleTrace>()];

        arcs.ShouldNotBeEmpty();
        arcs.ShouldAllBe(arc => arc.Arcs.Sum(span => span.Sweep) < 1);
    }

    [Fact]
    public void A_named_circle_without_a_use_is_drawn_whole()
    {
        Tracing tracing = Tracing.Of(Layouts.Of("prick A at (0, 0)\nstrike c about A opening 30 mm\n"), default);

        tracing.Traces.OfType<CircleTrace>().ShouldHaveSingleItem().Arcs.ShouldHaveSingleItem().IsWhole.ShouldBeTrue();
    }

    [Fact]
    public void A_line_reaches_from_its_first_use_to_its_last()
    {
        Tracing tracing = Tracing.Of(Layouts.Of(Layouts.Gate), default);

        LineTrace plumb = tracing.Traces.OfType<LineTrace>().Single(line => line.Mark.Name == "plumb");

        // From C, at −40 + 60·√3 above the middle, down to D on the base.
        Math.Max(plumb.From.Y, plumb.To.Y).ShouldBe(40, 1e-9);
        Math.Min(plumb.From.Y, plumb.To.Y).ShouldBe(40 - (60 * Math.Sqrt(3)), 1e-9);
    }
}
