using System.Runtime.InteropServices;

namespace SpeedCommand.Ports.Linux;

/// <summary>
/// Reads all ports with one thread that sleeps in poll(2). Reading allocates nothing and touches neither the thread pool nor
/// a timer; an eventfd ends the sleep when the service stops.
/// </summary>
internal sealed class PollReader(DeviceNames names, TimeProvider time) : IPortReader
{
    /// <summary>What the kernel keeps for a terminal.</summary>
    private const int BufferSize = 4096;

    public Task RunAsync(IReadOnlyList<PortLine> ports, CancellationToken stop) =>
        Task.Factory.StartNew(() => Run(ports, stop), CancellationToken.None, TaskCreationOptions.LongRunning, TaskScheduler.Default);

    private void Run(IReadOnlyList<PortLine> ports, CancellationToken stop)
    {
        using var wake = new WakeUp();
        using var stopping = stop.Register(wake.Signal);
        var polled = ports.Select(port => new PolledPort(port, names, wake, time)).ToArray();
        try
        {
            Read(polled, wake, stop);
        }
        finally
        {
            Array.ForEach(polled, port => port.Dispose());
        }
    }

    private static void Read(PolledPort[] ports, WakeUp wake, CancellationToken stop)
    {
        var buffer = new byte[BufferSize];
        var entries = new PollEntry[ports.Length + 1];
        entries[^1] = wake.Entry;
        while (!stop.IsCancellationRequested)
        {
            var timeoutMs = Timeout.Infinite;
            for (var i = 0; i < ports.Length; i++)
            {
                entries[i] = new PollEntry { File = ports[i].Prepare(ref timeoutMs), Wanted = SystemCalls.Readable };
            }

            if (SystemCalls.Poll(ref entries[0], (nuint)entries.Length, timeoutMs) < 0)
            {
                if (Marshal.GetLastPInvokeError() != PortFault.Interrupted)
                {
                    throw new InvalidOperationException($"poll: {Marshal.GetLastPInvokeErrorMessage()}");
                }

                continue;
            }

            if (entries[^1].Returned != 0)
            {
                wake.Clear();
            }

            for (var i = 0; i < ports.Length; i++)
            {
                if (entries[i].Returned != 0)
                {
                    ports[i].Read(entries[i].Returned, buffer);
                }
            }
        }
    }
}
