using System.Buffers.Binary;
using System.Numerics;
using System.Security.Cryptography;

namespace RuleAndCompass.Numbers;

/// <summary>
/// Random bits that follow from a seed: SHA-256 in counter mode (NIST SP 800-90A's hash generator, without reseeding). Whoever writes a
/// script cannot aim at them, and the same script gives the same bits.
/// </summary>
internal sealed class SeededBits(ReadOnlyMemory<byte> seed)
{
    private const int BlockLength = 32;

    private readonly byte[] block = new byte[BlockLength];
    private long counter;
    private int used = BlockLength;

    public ulong NextWord()
    {
        if (used == BlockLength)
        {
            byte[] input = new byte[seed.Length + 8];
            seed.CopyTo(input);
            BinaryPrimitives.WriteInt64LittleEndian(input.AsSpan(seed.Length), counter++);
            SHA256.HashData(input, block);
            used = 0;
        }

        ulong word = BinaryPrimitives.ReadUInt64LittleEndian(block.AsSpan(used));
        used += 8;
        return word;
    }

    /// <summary>An integer in [0, 2^<paramref name="bits"/>).</summary>
    public BigInteger NextInteger(int bits)
    {
        BigInteger value = BigInteger.Zero;
        for (int have = 0; have < bits; have += 64)
            value = value << 64 | NextWord();
        return value & ((BigInteger.One << bits) - 1);
    }
}
