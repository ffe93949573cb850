namespace SpeedCommand.Replay.Tests.Recording;

/// <summary>A disk with so many free bytes; what does not fit is written as far as it does, then fails as a full disk does.</summary>
internal sealed class BoundedDisk
{
    public long FreeBytes { get; set; }

    public List<MemoryStream> Files { get; } = [];

    public Stream Create(string path)
    {
        var file = new BoundedFile(this);
        Files.Add(file);
        return file;
    }

    private sealed class BoundedFile(BoundedDisk disk) : MemoryStream
    {
        public override void Write(ReadOnlySpan<byte> buffer)
        {
            var fitting = (int)Math.Min(buffer.Length, disk.FreeBytes);
            base.Write(buffer[..fitting].ToArray(), 0, fitting);
            disk.FreeBytes -= fitting;
            if (fitting < buffer.Length)
            {
                throw new IOException("No space left on device");
            }
        }

        public override void Write(byte[] buffer, int offset, int count) => Write(buffer.AsSpan(offset, count));
    }
}
