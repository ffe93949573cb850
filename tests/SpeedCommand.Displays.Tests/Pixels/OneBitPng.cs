using System.Buffers.Binary;
using System.IO.Compression;
using System.Text;

namespace SpeedCommand.Displays.Tests.Pixels;

/// <summary>A picture of one bit a pixel as a PNG (ISO/IEC 15948): signature, header, one zlib stream, end; each chunk with its CRC.</summary>
internal static class OneBitPng
{
    private static readonly byte[] Signature = [0x89, .. "PNG\r\n\u001a\n"u8];

    public static byte[] Of(int width, int height, Func<int, int, bool> isLit)
    {
        var rows = new byte[height * (1 + width / 8)];
        for (var i = 0; i < width * height; i++)
        {
            // Each row begins with its filter, none; the leftmost pixel is the highest bit.
            rows[i / width * (1 + width / 8) + 1 + i % width / 8] |= (byte)((isLit(i % width, i / width) ? 0x80 : 0) >> i % 8);
        }

        using var packed = new MemoryStream();
        using (var zlib = new ZLibStream(packed, CompressionLevel.SmallestSize, leaveOpen: true))
        {
            zlib.Write(rows);
        }

        var header = new byte[13];
        BinaryPrimitives.WriteInt32BigEndian(header, width);
        BinaryPrimitives.WriteInt32BigEndian(header.AsSpan(4), height);
        header[8] = 1;
        return [.. Signature, .. Chunk("IHDR", header), .. Chunk("IDAT", packed.ToArray()), .. Chunk("IEND", [])];
    }

    private static byte[] Chunk(string type, byte[] content)
    {
        byte[] named = [.. Encoding.ASCII.GetBytes(type), .. content];
        var chunk = new byte[4 + named.Length + 4];
        BinaryPrimitives.WriteInt32BigEndian(chunk, content.Length);
        named.CopyTo(chunk, 4);
        BinaryPrimitives.WriteUInt32BigEndian(chunk.AsSpan(4 + named.Length), Crc(named));
        return chunk;
    }

    /// <summary>CRC-32 of ISO 3309, bit by bit; of "123456789" it is CBF43926 (published check value).</summary>
    public static uint Crc(ReadOnlySpan<byte> bytes)
    {
        var crc = uint.MaxValue;
        foreach (var value in bytes)
        {
            crc ^= value;
            for (var bit = 0; bit < 8; bit++)
            {
                crc = crc >> 1 ^ ((crc & 1) != 0 ? 0xEDB88320 : 0);
            }
        }

        return ~crc;
    }
}
