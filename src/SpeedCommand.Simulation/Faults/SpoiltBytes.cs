using SpeedCommand.Simulation.Randomness;

namespace SpeedCommand.Simulation.Faults;

/// <summary>What happens to the bytes of a line on the wire.</summary>
internal sealed class SpoiltBytes
{
    private const int MostFlips = 3;

    private readonly byte[] _stream;
    private readonly List<(FaultSpec Spec, FaultTimes Times, SeededNoise Random)> _faults;

    public SpoiltBytes(byte[] stream, IEnumerable<(FaultSpec Spec, SeededNoise Random)> faults)
    {
        _stream = stream;
        _faults = [.. faults.Where(fault => fault.Spec.Kind is FaultKind.Unplugged or FaultKind.LooseWire or FaultKind.Garbage
                or FaultKind.BitFlips or FaultKind.HalfLines or FaultKind.WrongBaud)
            .Select(fault => (fault.Spec, new FaultTimes(fault.Spec, fault.Random), fault.Random))];
    }

    /// <summary>Sends a line with its end, or what is left of it.</summary>
    /// <param name="timeUs">When it was sent.</param>
    /// <param name="arrivalUs">What the clock says when it arrives.</param>
    /// <param name="line">The line without its end.</param>
    /// <param name="sink">Where the bytes go.</param>
    public void Send(long timeUs, long arrivalUs, ReadOnlySpan<byte> line, IPortBytesSink sink)
    {
        byte[] bytes = [.. line, (byte)'\r', (byte)'\n'];
        var hangsUp = false;
        foreach (var (spec, times, random) in _faults)
        {
            switch (spec.Kind)
            {
                case FaultKind.Unplugged or FaultKind.LooseWire:
                    var moment = times.At(timeUs);
                    bytes = Interrupt(moment, bytes, random);
                    hangsUp |= moment == FaultMoment.Begins && spec.Kind == FaultKind.Unplugged;
                    break;
                case FaultKind.Garbage when times.At(timeUs) == FaultMoment.Begins:
                    bytes = [.. Burst(spec.Bytes, random), .. bytes];
                    break;
                case FaultKind.BitFlips when times.Hits(timeUs):
                    Flip(bytes, random);
                    break;
                case FaultKind.HalfLines when times.Hits(timeUs):
                    bytes = bytes[..PlaceIn(bytes, random)];
                    break;
                case FaultKind.WrongBaud when times.At(timeUs) is FaultMoment.Begins or FaultMoment.Lasts:
                    bytes = MisreadSerial.Read(bytes, spec.SentBaud, spec.HeardBaud);
                    break;
            }
        }

        if (bytes.Length > 0)
        {
            sink.OnBytes(arrivalUs, _stream, bytes);
        }

        if (hangsUp)
        {
            sink.OnHangUp(_stream);
        }
    }

    /// <summary>The head of the line in which it happens, the tail of the one in which it is over, nothing between.</summary>
    private static byte[] Interrupt(FaultMoment moment, byte[] bytes, SeededNoise random) => moment switch
    {
        FaultMoment.Begins => bytes[..PlaceIn(bytes, random)],
        FaultMoment.Lasts => [],
        FaultMoment.Ended => bytes[PlaceIn(bytes, random)..],
        _ => bytes,
    };

    private static byte[] Burst(int count, SeededNoise random)
    {
        var burst = new byte[count];
        for (var i = 0; i < count; i++)
        {
            burst[i] = (byte)random.NextBits();
        }

        return burst;
    }

    private static void Flip(byte[] bytes, SeededNoise random)
    {
        var flips = 1 + (int)(random.NextUniform() * MostFlips);
        for (var i = 0; i < flips && bytes.Length > 0; i++)
        {
            bytes[PlaceIn(bytes, random)] ^= (byte)(1 << (int)(random.NextUniform() * 8));
        }
    }

    private static int PlaceIn(byte[] bytes, SeededNoise random) => (int)(random.NextUniform() * bytes.Length);
}
