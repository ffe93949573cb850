namespace SpeedCommand.Displaying;

/// <summary>
/// A thread for one display on a bus whose writes cannot be cut short: a stuck bus holds up this thread and nothing else, neither the pool that
/// the other displays and the recorder share nor the end of the program. One job at a time; there is no queue.
/// </summary>
internal sealed class BusThread : IDisposable
{
    private readonly SemaphoreSlim _bell = new(0);
    private readonly TimeSpan _limit;
    private volatile TaskCompletionSource? _done;
    private volatile Action? _job;

    /// <param name="name">The thread's name.</param>
    /// <param name="limit">How long a job may take before it is told that the bus is stuck.</param>
    public BusThread(string name, TimeSpan limit)
    {
        _limit = limit;
        new Thread(Run) { Name = name, IsBackground = true }.Start();
    }

    /// <summary>Whether the last job still runs: nothing that it uses may be touched.</summary>
    public bool IsBusy => _done is { Task.IsCompleted: false };

    /// <summary>Runs a job; what it throws comes out here.</summary>
    /// <returns>False when it did not end in time. It is then left to itself.</returns>
    public async ValueTask<bool> TryRunAsync(Action job)
    {
        if (IsBusy)
        {
            return false;
        }

        var done = new TaskCompletionSource(TaskCreationOptions.RunContinuationsAsynchronously);
        (_job, _done) = (job, done);
        _bell.Release();
        try
        {
            await done.Task.WaitAsync(_limit).ConfigureAwait(false);
            return true;
        }
        catch (TimeoutException)
        {
            return false;
        }
    }

    /// <summary>Lets the thread end when its job has ended.</summary>
    public void Dispose()
    {
        _job = null;
        _bell.Release();
    }

    private void Run()
    {
        while (true)
        {
            _bell.Wait();
            if (_job is not { } job)
            {
                return;
            }

            var done = _done!;
            try
            {
                job();
                done.SetResult();
            }
#pragma warning disable CA1031 // Whatever it is, it is thrown again where the job was given.
            catch (Exception fault)
#pragma warning restore CA1031
            {
                done.SetException(fault);
            }
        }
    }
}
