namespace SpeedCommand.Tests.Live;

/// <summary>Live tests run one after the other: the service's log is one for the process, and the machine's two cores are enough for one cockpit.</summary>
[CollectionDefinition(Name, DisableParallelization = true)]
public sealed class LiveTests
{
    public const string Name = "live";
}
