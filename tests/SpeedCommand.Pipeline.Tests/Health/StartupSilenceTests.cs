using SpeedCommand.Pipeline.Health;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Pipeline.Tests.Health;

public class StartupSilenceTests
{
    private const Faults NoStatic = Faults.StaticSilent, NoSpeed = Faults.AirspeedSilent, NoTemperature = Faults.TemperatureSilent;

    [Fact] // ports take five seconds to open; then static and airspeed speak, and the thermometer never
    public void Silence_CountsFromTwoSecondsAfterTheFirstDataOn_OrWhenASensorBrokeOff()
    {
        var startup = new StartupSilence();
        Assert.Equal(Faults.BadLines, startup.Counted(5_000_000, NoStatic | NoSpeed | NoTemperature | Faults.BadLines));
        Assert.False(startup.HasData);
        Assert.Equal(Faults.None, startup.Counted(5_100_000, NoTemperature));
        Assert.True(startup.HasData);
        Assert.Equal(NoSpeed, startup.Counted(5_200_000, NoTemperature | NoSpeed));
        Assert.Equal(Faults.None, startup.Counted(6_900_000, NoTemperature));
        Assert.Equal(NoTemperature, startup.Counted(7_100_000, NoTemperature));
    }
}
