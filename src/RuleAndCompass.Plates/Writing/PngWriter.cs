using System.Buffers.Binary;
using RuleAndCompass.Plates.Scene;
using SkiaSharp;

namespace RuleAndCompass.Plates.Writing;

/// <summary>Writes a page as a picture that knows its own size.</summary>
public static class PngWriter
{
    /// <summary>The most dots along one side; a larger page gets fewer dots to the inch.</summary>
    public const int LargestSidePixels = 8000;

    private const double MillimetresPerInch = 25.4;
    private const int HeaderEnd = 33;

    /// <summary>The file.</summary>
    /// <param name="dotsPerInch">Lowered where a side would need more than <see cref="LargestSidePixels"/>.</param>
    public static byte[] Write(Page page, double dotsPerInch = 150, CancellationToken cancellation = default)
    {
        ArgumentNullException.ThrowIfNull(page);
        ArgumentOutOfRangeException.ThrowIfNegativeOrZero(dotsPerInch);
        double largest = Math.Max(page.WidthMillimetres, page.HeightMillimetres);
        double pixelsPerMillimetre = Math.Min(dotsPerInch / MillimetresPerInch, LargestSidePixels / largest);
        int width = Math.Max(1, (int)Math.Round(page.WidthMillimetres * pixelsPerMillimetre));
        int height = Math.Max(1, (int)Math.Round(page.HeightMillimetres * pixelsPerMillimetre));
        using SKBitmap bitmap = new(width, height, SKColorType.Rgba8888, SKAlphaType.Opaque);
        using (SKCanvas canvas = new(bitmap))
        {
            canvas.Clear(SKColors.White);
            canvas.Scale((float)pixelsPerMillimetre);
            SkiaPainter.Paint(canvas, page, cancellation);
        }

        using SKData data = bitmap.Encode(SKEncodedImageFormat.Png, 100);
        return WithPhysicalSize(data.AsSpan(), pixelsPerMillimetre * 1000);
    }

    // Portable Network Graphics (ISO/IEC 15948), 11.3.5.3: pHYs goes between IHDR, which ends at byte 33, and the first IDAT.
    private static byte[] WithPhysicalSize(ReadOnlySpan<byte> picture, double pixelsPerMetre)
    {
        Span<byte> chunk = stackalloc byte[21];
        BinaryPrimitives.WriteInt32BigEndian(chunk, 9);
        "pHYs"u8.CopyTo(chunk[4..]);
        BinaryPrimitives.WriteInt32BigEndian(chunk[8..], (int)Math.Round(pixelsPerMetre));
        BinaryPrimitives.WriteInt32BigEndian(chunk[12..], (int)Math.Round(pixelsPerMetre));
        chunk[16] = 1;
        BinaryPrimitives.WriteUInt32BigEndian(chunk[17..], Crc(chunk[4..17]));
        byte[] sized = new byte[picture.Length + chunk.Length];
        picture[..HeaderEnd].CopyTo(sized);
        chunk.CopyTo(sized.AsSpan(HeaderEnd));
        picture[HeaderEnd..].CopyTo(sized.AsSpan(HeaderEnd + chunk.Length));
        return sized;
    }

    // The checksum of ISO 3309, as the same standard prescribes it for chunks.
    private static uint Crc(ReadOnlySpan<byte> bytes)
    {
        uint crc = 0xFFFFFFFF;
        foreach (byte value in bytes)
        {
            crc ^= value;
            for (int bit = 0; bit < 8; bit++)
            {
                crc = (crc >> 1) ^ ((crc & 1) * 0xEDB88320);
            }
        }

        return ~crc;
    }
}
