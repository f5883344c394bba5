using RuleAndCompass.Plates.Fonts;
using RuleAndCompass.Plates.Scene;

namespace RuleAndCompass.Plates.Tests.Fonts;

public sealed class FaceTests
{
    [Theory]
    [InlineData(Typeface.Text)]
    [InlineData(Typeface.Strong)]
    [InlineData(Typeface.Lettering)]
    public void Every_sign_a_plate_needs_is_drawn(Typeface typeface)
    {
        const string needed = "ABCabc0123456789 °′″×÷√±→⊥∥≅≈−∠△φδπ–—‘’“”„«»éÄßŁőŠžΑΩαωЖя½¼¾†•…";

        Face.Of(typeface).Shown(needed).ShouldBe(needed);
    }

    [Fact]
    public void A_sign_outside_the_font_has_a_visible_substitute()
    {
        Face face = Face.Of(Typeface.Text);

        face.Shown("漢字 😀\tA").ShouldBe("\uFFFD\uFFFD \uFFFD A");
        face.Width("\uFFFD", 10).ShouldBeGreaterThan(3);
    }

    [Fact]
    public void Figures_have_one_width()
    {
        Face face = Face.Of(Typeface.Text);

        foreach (char figure in "123456789")
        {
            face.Width([figure], 10).ShouldBe(face.Width("0", 10));
        }
    }

    [Fact]
    public void Capitals_have_the_height_that_is_told()
    {
        using SkiaSharp.SKFont font = Face.Of(Typeface.Lettering).CreateFont(1000);

        using SkiaSharp.SKPath outline = font.GetTextPath("H", new SkiaSharp.SKPoint(0, 0));

        ((double)outline.Bounds.Height).ShouldBe(1000 * Face.CapitalHeight, 0.1);
    }
}
