using System.Text;
using RuleAndCompass.Plates.Scene;
using SkiaSharp;

namespace RuleAndCompass.Plates.Fonts;

/// <summary>An embedded face, loaded when first asked for.</summary>
public sealed class Face
{
    /// <summary>Stands for a sign that the face has no drawing of.</summary>
    public const char Substitute = '\uFFFD';

    /// <summary>The height of a capital as a part of the em; figures have the same.</summary>
    public const double CapitalHeight = 1493.0 / 2048;

    private const int CachedSigns = 0x2600;
    private const float MeasuringSize = 2048;

    private static readonly Lazy<Face> text = new(() => new Face("DejaVuSansCondensed.ttf"));
    private static readonly Lazy<Face> strong = new(() => new Face("DejaVuSansCondensed-Bold.ttf"));
    private static readonly Lazy<Face> lettering = new(() => new Face("DejaVuSans.ttf"));

    private readonly SKFont measuring;
    private readonly float[] advances = new float[CachedSigns];

    private Face(string resource)
    {
        using Stream stream = typeof(Face).Assembly.GetManifestResourceStream(typeof(Face), resource)
            ?? throw new InvalidOperationException($"The font {resource} is not embedded.");
        using SKData data = SKData.Create(stream);
        Skia = SKTypeface.FromData(data) ?? throw new InvalidOperationException($"The font {resource} cannot be read.");
        measuring = CreateFont(MeasuringSize);
        Array.Fill(advances, float.NaN);
    }

    internal SKTypeface Skia { get; }

    /// <summary>The face that <paramref name="typeface"/> names.</summary>
    public static Face Of(Typeface typeface) => typeface switch
    {
        Typeface.Text => text.Value,
        Typeface.Strong => strong.Value,
        Typeface.Lettering => lettering.Value,
        _ => throw new ArgumentOutOfRangeException(nameof(typeface), typeface, "There is no such face."),
    };

    /// <summary>The em at which a capital of the embedded faces is so high.</summary>
    public static double SizeForCapitals(double heightMillimetres) => heightMillimetres / CapitalHeight;

    /// <summary>The text as it can be drawn: signs that the face lacks become <see cref="Substitute"/>, control characters spaces.</summary>
    public string Shown(string written)
    {
        bool plain = true;
        foreach (char sign in written)
        {
            plain &= !char.IsControl(sign) && !char.IsSurrogate(sign) && Draws(sign);
        }

        if (plain)
        {
            return written;
        }

        StringBuilder shown = new(written.Length);
        foreach (Rune rune in written.EnumerateRunes())
        {
            shown.Append(Rune.IsControl(rune) ? ' ' : rune.IsBmp && Draws((char)rune.Value) ? (char)rune.Value : Substitute);
        }

        return shown.ToString();
    }

    /// <summary>How wide a text is, millimetres, as <see cref="Shown"/>.</summary>
    public double Width(ReadOnlySpan<char> shown, double sizeMillimetres)
    {
        double width = 0;
        foreach (char sign in shown)
        {
            width += Advance(sign);
        }

        return width / MeasuringSize * sizeMillimetres;
    }

    internal SKFont CreateFont(float size) => new(Skia, size)
    {
        LinearMetrics = true,
        Subpixel = true,
        Hinting = SKFontHinting.None,
        Edging = SKFontEdging.Antialias,
    };

    private bool Draws(char sign) => Advance(sign) >= 0;

    // The width of a sign in the measuring size; below zero where the face lacks it. Two threads may both fill a place, with the same figure.
    private float Advance(char sign)
    {
        if (sign >= CachedSigns)
        {
            return Measure(sign);
        }

        float known = advances[sign];
        return float.IsNaN(known) ? advances[sign] = Measure(sign) : known;
    }

    private float Measure(char sign)
    {
        lock (measuring)
        {
            ushort glyph = measuring.GetGlyph(sign);
            return glyph == 0 ? -1 : measuring.GetGlyphWidths([glyph])[0];
        }
    }
}
