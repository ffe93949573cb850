namespace SpeedCommand.House.Tests.DocumentCommands;

/// <summary>Which lines of a document are taken for commands.</summary>
public class CommandBlockTests
{
    private const string Document = """
        ```sh
        one
        two
        ```

        <!-- not run: needs a sensor board -->

        ```console
        $ three \
            --more
        printed
        $ four
        ```

        ```text
        not a command
        ```
        """;

    [Fact]
    public void Blocks_AreFound()
    {
        var blocks = CommandBlock.In(Document.Split('\n')).ToList();
        Assert.Equal(
            [new CommandBlock(1, "one\ntwo", null), new CommandBlock(8, "three \\\n--more\nfour", "needs a sensor board")], blocks);
    }
}
