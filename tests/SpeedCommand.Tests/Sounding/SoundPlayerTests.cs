using System.Runtime.InteropServices;
using System.Runtime.Versioning;
using SpeedCommand.Displays.Sound;
using SpeedCommand.Sounding;

namespace SpeedCommand.Tests.Sounding;

/// <summary>The pipe to a player program: the real one on ALSA's null device, and scripts that stand for good and bad ones.</summary>
[SupportedOSPlatform("linux")]
public sealed class SoundPlayerTests : IDisposable
{
    private static readonly SoundOrder Tone = new(ClimbTone.FrequencyHz(3), 0, false, SoundCue.None);

    private readonly DirectoryInfo _folder = Directory.CreateTempSubdirectory();
    private readonly KeptLog<SoundPlayer> _log = new();
    private readonly SoundLevel _level = new(1);

    public void Dispose() => _folder.Delete(recursive: true);

    private SoundPlayer Start(string program)
    {
        var player = new SoundPlayer(program, "null", _level, TimeProvider.System, _log);
        player.Start();
        return player;
    }

    private string Script(string body)
    {
        var path = Path.Combine(_folder.FullName, "player");
        File.WriteAllText(path, "#!/bin/sh\n" + body + "\n");
        File.SetUnixFileMode(path, UnixFileMode.UserRead | UnixFileMode.UserWrite | UnixFileMode.UserExecute);
        return path;
    }

    [ToolFact("aplay")]
    public async Task RealPlayer_TakesTheSound_WithoutComplaint()
    {
        using var player = Start(SoundPlayer.Program);
        player.Play(Tone);
        // A second and a half at 20 ms a block: far more than all buffers on the way hold.
        await Eventually.HoldsAsync(() => player.BlockCount > 75 || _log.Lines.Count > 0, "75 blocks taken");
        Assert.Empty(_log.Lines);
    }

    [LinuxFact]
    public async Task Player_GetsWhatIsOrdered_AsLoudAsTheLevelSays()
    {
        var heard = Path.Combine(_folder.FullName, "heard");
        using (var player = Start(Script($"exec cat >> {heard}")))
        {
            player.Play(Tone);
            await Eventually.HoldsAsync(() => player.BlockCount > 10, "a tone");
            _level.IsMuted = true;
            var muted = player.BlockCount;
            await Eventually.HoldsAsync(() => player.BlockCount > muted + 30, "silence");
        }

        var samples = MemoryMarshal.Cast<byte, short>(File.ReadAllBytes(heard)).ToArray();
        Assert.Equal(0, samples.Length % 480);
        Assert.InRange(samples.Take(4800).Max(sample => sample / 32768.0), 0.85, 1);
        Assert.All(samples.TakeLast(480), sample => Assert.Equal(0, sample));
        Assert.Empty(_log.Lines);
    }

    [LinuxFact]
    public async Task PlayerThatDies_IsStartedAgain_AndToldOnce()
    {
        var starts = Path.Combine(_folder.FullName, "starts");
        using var player = Start(Script($"echo x >> {starts}; echo first >&2; echo no such card >&2; exit 1"));
        await Eventually.HoldsAsync(() => File.Exists(starts) && File.ReadAllLines(starts).Length > 1, "a second start");
        Assert.Equal($"sound: {_folder.FullName}/player ended: no such card; it is tried again", Assert.Single(_log.Lines));
    }

    [LinuxFact]
    public async Task PlayerThatIsMissing_IsTold()
    {
        using var player = Start(Path.Combine(_folder.FullName, "none"));
        await Eventually.HoldsAsync(() => _log.Lines.Count > 0, "a complaint");
        Assert.StartsWith($"sound: {_folder.FullName}/none cannot be started: ", Assert.Single(_log.Lines), StringComparison.Ordinal);
    }

    [LinuxFact]
    public async Task PlayerThatHangs_IsEnded()
    {
        var id = Path.Combine(_folder.FullName, "id");
        using var player = Start(Script($"echo $$ > {id}; exec sleep 60"));
        await Eventually.HoldsAsync(() => _log.Lines.Count > 0, "a complaint");
        Assert.EndsWith("takes no more samples; it is tried again", Assert.Single(_log.Lines), StringComparison.Ordinal);
        Assert.InRange(player.BlockCount, 1, 2);
        // It is told before the process has left the table.
        await Eventually.HoldsAsync(() => !Directory.Exists($"/proc/{File.ReadAllText(id).Trim()}"), "the player that hung is gone");
    }
}
