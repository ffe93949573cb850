namespace SpeedCommand.House.Tests.DocumentCommands;

/// <summary>A fenced block of commands in a document.</summary>
/// <param name="Line">The line of its fence, from 1.</param>
/// <param name="Script">The commands.</param>
/// <param name="NotRunReason">Why the author says it cannot be run in a test; null when it can.</param>
internal sealed record CommandBlock(int Line, string Script, string? NotRunReason)
{
    /// <summary>Before a block that needs hardware, another user or the network stands: &lt;!-- not run: reason --&gt;.</summary>
    private const string MarkerStart = "<!-- not run:", MarkerEnd = "-->";

    private const string Fence = "```", Prompt = "$ ";
    private static readonly string[] ShellTags = ["sh", "bash", "shell", "console"];

    public static IEnumerable<CommandBlock> In(string[] lines)
    {
        for (var start = 0; start < lines.Length; start++)
        {
            if (!lines[start].TrimStart().StartsWith(Fence, StringComparison.Ordinal))
            {
                continue;
            }

            var end = Array.FindIndex(lines, start + 1, line => line.Trim() == Fence);
            Assert.True(end > start, $"the block of line {start + 1} has no end");
            var tag = lines[start].Trim()[Fence.Length..];
            if (ShellTags.Contains(tag))
            {
                yield return new CommandBlock(start + 1, Commands(tag, lines[(start + 1)..end]), Reason(lines[..start]));
            }

            start = end;
        }
    }

    /// <summary>In a console block only lines after a prompt are commands, the rest is what they print.</summary>
    private static string Commands(string tag, string[] lines)
    {
        if (tag != "console")
        {
            return string.Join('\n', lines);
        }

        var commands = new List<string>();
        var isContinued = false;
        foreach (var line in lines.Select(line => line.TrimStart()))
        {
            if (isContinued || line.StartsWith(Prompt, StringComparison.Ordinal))
            {
                commands.Add(isContinued ? line : line[Prompt.Length..]);
                isContinued = line.EndsWith('\\');
            }
        }

        return string.Join('\n', commands);
    }

    private static string? Reason(string[] before)
    {
        var last = before.LastOrDefault(line => line.Trim().Length > 0)?.Trim() ?? "";
        return last.StartsWith(MarkerStart, StringComparison.Ordinal) && last.EndsWith(MarkerEnd, StringComparison.Ordinal)
            ? last[MarkerStart.Length..^MarkerEnd.Length].Trim()
            : null;
    }
}
