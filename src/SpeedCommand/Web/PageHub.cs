namespace SpeedCommand.Web;

/// <summary>Hands each frame to every browser that watches. Never waits: a slow browser misses frames, a dead one is let go.</summary>
internal sealed class PageHub
{
    /// <summary>More than any cockpit has; each costs some tens of kilobytes.</summary>
    public const int MaxClients = 50;

    private readonly Lock _gate = new();
    private readonly List<PageClient> _clients = [];

    public int ClientCount
    {
        get
        {
            lock (_gate)
            {
                return _clients.Count;
            }
        }
    }

    /// <summary>Adds a browser; null when there are too many.</summary>
    public PageClient? TryAdd()
    {
        lock (_gate)
        {
            if (_clients.Count == MaxClients)
            {
                return null;
            }

            var client = new PageClient();
            _clients.Add(client);
            return client;
        }
    }

    public void Remove(PageClient client)
    {
        lock (_gate)
        {
            _clients.Remove(client);
        }

        client.Dispose();
    }

    public void Publish(ReadOnlyMemory<byte> frame)
    {
        lock (_gate)
        {
            foreach (var client in _clients)
            {
                if (!client.Offer(frame))
                {
                    client.End();
                }
            }
        }
    }

    /// <summary>Lets all go: the service stops.</summary>
    public void EndAll()
    {
        lock (_gate)
        {
            _clients.ForEach(client => client.End());
        }
    }
}
