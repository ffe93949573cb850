using System.Globalization;

namespace SpeedCommand.Replaying;

/// <summary>
/// Replays many recordings side by side. Progress goes to standard error, one line that is written over on a terminal, a line a
/// flight otherwise; then what was wrong, and the table to standard output, both in the order given.
/// </summary>
internal sealed class FlightBatch(ReplayRequest request)
{
    private readonly Lock _lock = new();
    private readonly bool _isTerminal = !Console.IsErrorRedirected;
    private int _done;

    public int Run(CancellationToken cancel)
    {
        var count = request.Recordings.Length;
        var results = new FlightResult[count];
        var messages = new string[count];
        Array.Fill(messages, "");
        Parallel.For(0, count, new ParallelOptions { MaxDegreeOfParallelism = request.Jobs }, index =>
        {
            using var errors = new StringWriter(CultureInfo.InvariantCulture);
            results[index] = new FlightJob(request, errors).Run(request.Recordings[index], cancel);
            messages[index] = errors.ToString();
            TellProgress(results[index]);
        });

        if (_isTerminal)
        {
            Console.Error.WriteLine();
        }

        foreach (var message in messages)
        {
            Console.Error.Write(message);
        }

        Console.Out.Write(FlightTable.Of(results));
        return results.Max(result => result.Status);
    }

    private void TellProgress(FlightResult result)
    {
        lock (_lock)
        {
            _done++;
            var text = $"{_done} of {request.Recordings.Length} flights: {result.Recording}";
            if (_isTerminal)
            {
                var width = Math.Max(20, Console.WindowWidth - 1);
                Console.Error.Write("\r" + (text.Length > width ? text[..width] : text.PadRight(width)));
            }
            else
            {
                Console.Error.WriteLine(text);
            }
        }
    }
}
