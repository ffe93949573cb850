using System.Runtime.InteropServices;
using Microsoft.Extensions.Logging;
using SpeedCommand.Displays.Sound;

namespace SpeedCommand.Sounding;

/// <summary>
/// Sends samples to a player program, block after block, on a thread of its own, so that a player that hangs or dies delays nobody. It is
/// started again after a while.
/// </summary>
internal sealed class SoundPlayer(string program, string device, SoundLevel level, TimeProvider time, ILogger log) : IDisposable
{
    /// <summary>ALSA's own player.</summary>
    public const string Program = "aplay";

    private const int BlockSamples = Synthesizer.SampleRateHz / 50;

    /// <summary>A sound card that is gone costs an attempt a minute in the end.</summary>
    private static readonly TimeSpan FirstDelay = TimeSpan.FromMilliseconds(500), LongestDelay = TimeSpan.FromMinutes(1);

    /// <summary>What played for so long works; the next failure is a new one.</summary>
    private static readonly TimeSpan Settled = TimeSpan.FromSeconds(10);

    private readonly Lock _gate = new();
    private readonly ManualResetEventSlim _stop = new();
    private readonly Synthesizer _synthesizer = new();
    private readonly short[] _block = new short[BlockSamples];
    private SoundOrder _order;
    private Thread? _thread;

    /// <summary>Blocks that a player took, for tests.</summary>
    public long BlockCount { get; private set; }

    /// <summary>Begins to play; nothing is heard before the first order.</summary>
    public void Start()
    {
        _thread = new Thread(Run) { IsBackground = true, Name = "sound" };
        _thread.Start();
    }

    /// <summary>What is to be heard from now on. Returns at once.</summary>
    public void Play(in SoundOrder order)
    {
        lock (_gate)
        {
            // A signal that no block has begun with yet must not get lost.
            _order = order.Cue == SoundCue.None ? order with { Cue = _order.Cue } : order;
        }
    }

    /// <summary>Ends the sound and the player.</summary>
    public void Dispose()
    {
        _stop.Set();
        _thread?.Join();
        _stop.Dispose();
    }

    private void Run()
    {
        var complaint = "";
        for (var delay = FirstDelay; !_stop.IsSet; delay = delay * 2 < LongestDelay ? delay * 2 : LongestDelay)
        {
            var started = time.GetTimestamp();
            var trouble = PlayOnce();
            if (time.GetElapsedTime(started) > Settled)
            {
                (complaint, delay) = ("", FirstDelay);
            }

            if (!_stop.IsSet && trouble != complaint)
            {
                log.LogWarning("sound: {Trouble}; it is tried again", trouble);
                complaint = trouble;
            }

            _stop.Wait(delay);
        }
    }

    /// <summary>Plays until the player ends, or the service.</summary>
    /// <returns>What is wrong with the player.</returns>
    private string PlayOnce()
    {
        using var pipe = PlayerPipe.TryStart(program, device, out var trouble);
        if (pipe is null)
        {
            return trouble;
        }

        var started = time.GetTimestamp();
        for (long count = 0; !_stop.IsSet; count++)
        {
            _synthesizer.Render(TakeOrder(), level.Gain, _block);
            if (!pipe.TryWrite(MemoryMarshal.AsBytes<short>(_block)))
            {
                return pipe.Trouble;
            }

            BlockCount++;
            HoldBack(count, time.GetElapsedTime(started));
        }

        return "";
    }

    /// <summary>
    /// A sound card takes samples at its own pace. A device that takes any number at once, as ALSA's "null" does, is fed one per cent
    /// faster than life: no card's clock is so wrong, so that none is ever held back by this.
    /// </summary>
    private void HoldBack(long blocks, TimeSpan elapsed)
    {
        const double AheadS = 0.25, Faster = 1.01;
        var aheadS = (double)blocks * BlockSamples / Synthesizer.SampleRateHz - elapsed.TotalSeconds * Faster;
        if (aheadS > AheadS)
        {
            _stop.Wait(TimeSpan.FromSeconds(aheadS - AheadS) + TimeSpan.FromMilliseconds(1));
        }
    }

    private SoundOrder TakeOrder()
    {
        lock (_gate)
        {
            var order = _order;
            _order = order with { Cue = SoundCue.None };
            return order;
        }
    }
}
