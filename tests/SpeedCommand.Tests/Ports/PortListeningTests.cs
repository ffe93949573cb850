using SpeedCommand.Bench;
using SpeedCommand.Pipeline.Picture;
using SpeedCommand.Ports;
using SpeedCommand.Ports.Listening;
using SpeedCommand.Sentences;
using SpeedCommand.Settings;

namespace SpeedCommand.Tests.Ports;

/// <summary>What check says of a port, for each thing that can be wrong with one.</summary>
public sealed class PortListeningTests
{
    private static readonly byte[] Good = [.. TestFlightLog.Sentence($"P,90000.0,P,STATIC"), (byte)'\r', (byte)'\n'];

    private static async Task<(bool IsGood, string Verdict)> ListenAsync(byte[] sent)
    {
        using var line = new PseudoTerminal();
        var listening = new PortListening(new PortSettings("static", line.DevicePath, 115_200, ChecksumRule.Required));
        var result = listening.ListenAsync(SerialDrivers.Reader(SerialSettings.Standard), TimeSpan.FromSeconds(1), CancellationToken.None);
        for (var i = 0; i < 10; i++)
        {
            await Task.Delay(50);
            line.Write(sent);
        }

        return (await result, listening.Verdict);
    }

    [LinuxFact]
    public async Task GoodBoard_IsGood()
    {
        var (isGood, verdict) = await ListenAsync(Good);
        Assert.True(isGood, verdict);
        Assert.Contains("good: ", verdict, StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task SilentLine_AsksForPowerAndWiring()
    {
        var (isGood, verdict) = await ListenAsync([]);
        Assert.False(isGood);
        Assert.Contains("no data in 1 s; is the board powered", verdict, StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task Garbage_SuspectsTheBaudRate()
    {
        var (isGood, verdict) = await ListenAsync([0x80, 0xFE, (byte)'\n', 0x00, 0x1C]);
        Assert.False(isGood);
        Assert.Contains("no valid line, and 80 % of them are no text; is 115200 baud what the board sends at?", verdict, StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task NoiseWithDollarSigns_IsNotTakenForSentencesWithoutChecksum()
    {
        var (_, verdict) = await ListenAsync([0x80, (byte)'$', 0xFE, (byte)'\n', (byte)'$', 0x1C, (byte)'\n']);
        Assert.Contains("is 115200 baud what the board sends at?", verdict, StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task WrongChecksums_PointToTheChecksum()
    {
        var wrong = (byte[])Good.Clone();
        wrong[8] ^= 1;
        var (isGood, verdict) = await ListenAsync(wrong);
        Assert.False(isGood);
        Assert.Contains("lines with a wrong checksum", verdict, StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task NoLineEnds_AreNamed()
    {
        var (_, verdict) = await ListenAsync(Good[..^2]);
        Assert.Contains("without a line end", verdict, StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task ImpossibleValues_AreNotGood()
    {
        var (isGood, verdict) = await ListenAsync([.. TestFlightLog.Sentence($"P,5.0,P,STATIC"), (byte)'\n']);
        Assert.False(isGood);
        Assert.Contains("every one impossible", verdict, StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task NoChecksum_NamesTheSetting()
    {
        var (isGood, verdict) = await ListenAsync([.. Good.AsSpan(0, Good.Length - 5), (byte)'\n']);
        Assert.False(isGood);
        Assert.Contains("\"checksum\": \"optional\"", verdict, StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task ForeignSentences_PointToTheList()
    {
        var (isGood, verdict) = await ListenAsync("$GPGGA,123519,4807.038,N,01131.000,E,1,08,0.9,545.4,M,46.9,M,,*47\r\n"u8.ToArray());
        Assert.False(isGood);
        Assert.Contains("none with a measurement of ours", verdict, StringComparison.Ordinal);
    }

    [Theory]
    [InlineData("/no/such/device", "no such device; is it plugged in?")]
    [InlineData("/etc/passwd", "is a file, expected a serial device")]
    [InlineData("/etc", "is a folder, expected a serial device")]
    public async Task DeviceThatDoesNotOpen_SaysWhy(string device, string expected)
    {
        var listening = new PortListening(new PortSettings("static", device, 9600, ChecksumRule.Required));
        Assert.False(await listening.ListenAsync(SerialDrivers.Reader(SerialSettings.Standard), TimeSpan.FromSeconds(1), CancellationToken.None));
        Assert.Contains(expected, listening.Verdict, StringComparison.Ordinal);
    }

    [LinuxFact]
    public void NoPermission_NamesTheGroupThatOwnsTheDevice()
    {
        var group = PortFault.GroupOf("/etc/shadow");
        Assert.Equal("shadow", group);
        var trouble = PortFault.Explain("/etc/shadow", "/etc/shadow", PortFault.AccessDenied, 9600);
        Assert.Equal(Faults.PortRefused, trouble.Fault);
        Assert.Contains("its group is 'shadow': run 'sudo usermod -aG shadow $USER'", trouble.Text, StringComparison.Ordinal);
    }
}
