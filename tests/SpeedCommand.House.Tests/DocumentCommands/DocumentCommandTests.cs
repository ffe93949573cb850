namespace SpeedCommand.House.Tests.DocumentCommands;

/// <summary>Every command that a document tells its reader to type works, in a scratch copy of the repository.</summary>
public class DocumentCommandTests(ScratchCopy copy) : IClassFixture<ScratchCopy>
{
    public static TheoryData<string, int> Blocks
    {
        get
        {
            var blocks = new TheoryData<string, int>();
            foreach (var document in Repository.Documents)
            {
                foreach (var block in CommandBlock.In(Repository.Lines(document)).Where(block => block.NotRunReason is null))
                {
                    blocks.Add(document, block.Line);
                }
            }

            return blocks;
        }
    }

    [Theory]
    [MemberData(nameof(Blocks))]
    public void Commands_Work(string document, int line)
    {
        var block = CommandBlock.In(Repository.Lines(document)).Single(block => block.Line == line);
        var (exitStatus, printed) = copy.Run(block.Script);
        Assert.True(exitStatus == 0, $"{document}:{line}: exit status {exitStatus}\n{block.Script}\n--- printed:\n{printed}");
    }

    [Fact]
    public void BlocksNotRun_SayWhy() => Assert.DoesNotContain("",
        Repository.Documents.SelectMany(document => CommandBlock.In(Repository.Lines(document))).Select(block => block.NotRunReason));

    [Theory]
    [InlineData("dotnet run -c Release --project src/SpeedCommand -- replay no-such.log", 66)]
    [InlineData("speedcommand no-such-command\necho goes on", 2)]
    [InlineData("dotnet run --project src/NoSuchProject", 97)]
    [InlineData("dotnet no-such-verb", 97)]
    [InlineData("no-such-program", 127)]
    public void CommandThatFails_IsNoticed(string script, int exitStatus) => Assert.Equal(exitStatus, copy.Run(script).ExitStatus);
}
