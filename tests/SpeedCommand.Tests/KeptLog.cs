using System.Collections.Concurrent;
using Microsoft.Extensions.Logging;

namespace SpeedCommand.Tests;

/// <summary>Keeps what is logged.</summary>
internal sealed class KeptLog<T> : ILogger<T>
{
    private readonly ConcurrentQueue<string> _lines = new();

    public IReadOnlyCollection<string> Lines => _lines;

    public IDisposable? BeginScope<TState>(TState state)
        where TState : notnull => null;

    public bool IsEnabled(LogLevel logLevel) => true;

    public void Log<TState>(LogLevel logLevel, EventId eventId, TState state, Exception? exception, Func<TState, Exception?, string> formatter) =>
        _lines.Enqueue(formatter(state, exception));
}
