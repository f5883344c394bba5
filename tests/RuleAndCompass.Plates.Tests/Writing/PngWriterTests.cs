using System.Buffers.Binary;
using System.Text;
using RuleAndCompass.Plates.Scene;
using RuleAndCompass.Plates.Writing;

namespace RuleAndCompass.Plates.Tests.Writing;

public sealed class PngWriterTests
{
    [Fact]
    public void A_picture_knows_its_size()
    {
        byte[] file = PngWriter.Write(new Page(100, 50, "Blank", []), 254);

        BinaryPrimitives.ReadInt32BigEndian(file.AsSpan(16)).ShouldBe(1000);
        BinaryPrimitives.ReadInt32BigEndian(file.AsSpan(20)).ShouldBe(500);
        Encoding.ASCII.GetString(file, 37, 4).ShouldBe("pHYs");
        BinaryPrimitives.ReadInt32BigEndian(file.AsSpan(41)).ShouldBe(10_000);
        BinaryPrimitives.ReadInt32BigEndian(file.AsSpan(45)).ShouldBe(10_000);
        file[49].ShouldBe((byte)1);
        // CRC-32 of the 13 bytes from "pHYs" on, by the table of ISO 3309 as zlib's crc32 gives it.
        BinaryPrimitives.ReadUInt32BigEndian(file.AsSpan(50)).ShouldBe(Crc32(file.AsSpan(37, 13)));
        using SkiaSharp.SKBitmap bitmap = SkiaSharp.SKBitmap.Decode(file);
        bitmap.GetPixel(500, 250).ShouldBe(SkiaSharp.SKColors.White);
    }

    [Fact]
    public void Ink_falls_where_the_scene_has_it()
    {
        Page page = new(100, 50, "Box", [new Fill(Role.Frame, Outline.Around(Box.Of(10, 20, 30, 10)), Ink.Black)]);

        using SkiaSharp.SKBitmap bitmap = SkiaSharp.SKBitmap.Decode(PngWriter.Write(page, 254));

        bitmap.GetPixel(101, 201).Red.ShouldBeLessThan((byte)0x40);
        bitmap.GetPixel(399, 299).Red.ShouldBeLessThan((byte)0x40);
        bitmap.GetPixel(98, 198).ShouldBe(SkiaSharp.SKColors.White);
        bitmap.GetPixel(402, 302).ShouldBe(SkiaSharp.SKColors.White);
    }

    [Fact]
    public void A_huge_page_gets_fewer_dots()
    {
        byte[] file = PngWriter.Write(new Page(20_000, 100, "Long", []), 300);

        BinaryPrimitives.ReadInt32BigEndian(file.AsSpan(16)).ShouldBe(PngWriter.LargestSidePixels);
        BinaryPrimitives.ReadInt32BigEndian(file.AsSpan(41)).ShouldBe(400);
    }

    // The textbook form with a table, apart from the writer's own.
    private static uint Crc32(ReadOnlySpan<byte> bytes)
    {
        uint[] table = new uint[256];
        for (uint i = 0; i < 256; i++)
        {
            uint entry = i;
            for (int bit = 0; bit < 8; bit++)
            {
                entry = (entry & 1) == 1 ? (entry >> 1) ^ 0xEDB88320u : entry >> 1;
            }

            table[i] = entry;
        }

        uint crc = ~0u;
        foreach (byte value in bytes)
        {
            crc = table[(crc ^ value) & 0xFF] ^ (crc >> 8);
        }

        return ~crc;
    }
}
