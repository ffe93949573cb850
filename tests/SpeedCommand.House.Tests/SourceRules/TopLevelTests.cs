using System.Text.RegularExpressions;

namespace SpeedCommand.House.Tests.SourceRules;

/// <summary>A newcomer sees the whole top of the repository at one glance.</summary>
public partial class TopLevelTests
{
    private const long MaxFileBytes = 1 << 20;

    [GeneratedRegex(@"^(README\.md|DEVELOPERS\.md|SpeedCommand\.sln|src|tests|replay-logs|docs|LICENSE|Directory\.[A-Za-z]+\.props|\..+)$")]
    private static partial Regex Agreed();

    [Fact]
    public void TopLevel_HoldsOnlyWhatWasAgreed() => Offences.None(Repository.TopLevel().Where(name => !Agreed().IsMatch(name)));

    [Theory]
    [InlineData("README.md")]
    [InlineData("DEVELOPERS.md")]
    [InlineData("LICENSE")]
    [InlineData(".ci/run")]
    public void TopLevel_HoldsWhatEveryReaderLooksFor(string file) => Assert.Contains(file, Repository.Files);

    [Fact]
    public void ContinuousIntegration_MayBeRun() =>
        Assert.True(File.GetUnixFileMode(Repository.PathOf(".ci/run")).HasFlag(UnixFileMode.UserExecute));

    [Fact]
    public void Files_AreSmallEnoughToClone() =>
        Offences.None(Repository.Files.Where(file => new FileInfo(Repository.PathOf(file)).Length > MaxFileBytes));
}
