namespace SpeedCommand.Sentences.Tests;

/// <summary>Keeps a copy of every line.</summary>
internal sealed class LineCollector : ILineSink
{
    public List<string> Lines { get; } = [];

    public void OnLine(ReadOnlySpan<byte> line) => Lines.Add(WireText.Text(line));
}
