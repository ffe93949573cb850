using SpeedCommand.Bench;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;
using SpeedCommand.Sentences;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests.Ports;

public sealed class PollReaderTests
{
    private sealed class Listener : IPortListener
    {
        public TaskCompletionSource Opened { get; } = new(TaskCreationOptions.RunContinuationsAsynchronously);

        public TaskCompletionSource<PortTrouble> Refused { get; } = new(TaskCreationOptions.RunContinuationsAsynchronously);

        public Action<int> Taken { get; set; } = _ => { };

        public void OnOpen(string path) => Opened.TrySetResult();

        public void OnBytes(ReadOnlySpan<byte> bytes) => Taken(bytes.Length);

        public void OnGone(string cause)
        {
        }

        public void OnTrouble(PortTrouble trouble) => Refused.TrySetResult(trouble);
    }

    private static PortLine Line(string device, Listener listener) => new(new PortSettings("port", device, 115_200, ChecksumRule.Required), listener);

    public static TheoryData<string> Readers => ["Poll", "Portable"];

    private static IPortReader Reader(string kind) => SerialDrivers.Reader(new SerialSettings(Enum.Parse<PortReaderKind>(kind), "/no/such/folder"));

    [LinuxTheory]
    [MemberData(nameof(Readers))]
    public async Task Stop_EndsTheReader_WhateverItsPortsDo(string kind)
    {
        using var silent = new PseudoTerminal();
        Listener open = new(), missing = new(), refused = new();
        using var stop = new CancellationTokenSource();
        var reading = Reader(kind).RunAsync([Line(silent.DevicePath, open), Line("/no/such/device", missing), Line("/", refused)], stop.Token);
        await open.Opened.Task;
        Assert.Equal(Faults.PortMissing, (await missing.Refused.Task).Fault);
        Assert.Equal(Faults.PortRefused, (await refused.Refused.Task).Fault);
        Assert.False(reading.IsCompleted);
        await stop.CancelAsync();
        // Far beyond what it takes; a thread that hangs would hang for ever.
        await reading.WaitAsync(TimeSpan.FromSeconds(20));
    }

    [LinuxTheory]
    [MemberData(nameof(Readers))]
    public async Task BugInAListener_ComesOut(string kind)
    {
        using var line = new PseudoTerminal();
        var listener = new Listener { Taken = _ => throw new InvalidOperationException("a bug") };
        var reading = Reader(kind).RunAsync([Line(line.DevicePath, listener)], CancellationToken.None);
        await listener.Opened.Task;
        line.Write("x"u8);
        Assert.Equal("a bug", (await Assert.ThrowsAsync<InvalidOperationException>(() => reading)).Message);
    }

    [LinuxFact]
    public async Task Reading_AllocatesNothing()
    {
        using var line = new PseudoTerminal();
        var count = 0;
        long last = 0, least = long.MaxValue;
        var listener = new Listener
        {
            Taken = _ =>
            {
                // One thread reads, so its own count is that of the reading loop.
                if (count % 100 == 0)
                {
                    var sum = GC.GetAllocatedBytesForCurrentThread();
                    (last, least) = (sum, count == 0 ? least : Math.Min(least, sum - last));
                }

                Volatile.Write(ref count, count + 1);
            },
        };
        using var stop = new CancellationTokenSource();
        var reading = Reader("Poll").RunAsync([Line(line.DevicePath, listener)], stop.Token);
        await listener.Opened.Task;
        for (var i = 0; i < 1000; i++)
        {
            line.Write("$YXXDR,P,95461.2,P,STATIC*74\r\n"u8);
            Assert.True(SpinWait.SpinUntil(() => Volatile.Read(ref count) > i, TimeSpan.FromSeconds(20)));
        }

        await stop.CancelAsync();
        await reading;
        Assert.Equal(1000, count);
        Assert.Equal(0, least);
    }

    [LinuxFact]
    public async Task FloodedPort_DoesNotStarveTheOther()
    {
        using var flooded = new PseudoTerminal();
        using var calm = new PseudoTerminal();
        Listener noise = new(), listener = new();
        var calmBytes = new TaskCompletionSource<int>(TaskCreationOptions.RunContinuationsAsynchronously);
        listener.Taken = count => calmBytes.TrySetResult(count);
        // The flood feeds itself: each read is followed by a write, so the first port is never idle.
        var flood = new byte[4000];
        noise.Taken = _ => flooded.Write(flood);
        using var stop = new CancellationTokenSource();
        var reading = Reader("Poll").RunAsync([Line(flooded.DevicePath, noise), Line(calm.DevicePath, listener)], stop.Token);
        await Task.WhenAll(noise.Opened.Task, listener.Opened.Task);
        flooded.Write(flood);
        calm.Write("calm"u8);
        Assert.Equal(4, await calmBytes.Task.WaitAsync(TimeSpan.FromSeconds(20)));
        await stop.CancelAsync();
        await reading.WaitAsync(TimeSpan.FromSeconds(20));
    }
}
