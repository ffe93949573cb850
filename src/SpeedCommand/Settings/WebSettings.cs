using System.Net;

namespace SpeedCommand.Settings;

/// <summary>Where the web page is served.</summary>
/// <param name="IsOn">Whether it is served at all.</param>
/// <param name="Address">The address to listen on.</param>
/// <param name="Port">The TCP port; 0 for any that is free, which the settings do not allow.</param>
internal sealed record WebSettings(bool IsOn, IPAddress Address, int Port)
{
    /// <summary>What is used unless the settings say otherwise: off, and if on, for this computer alone.</summary>
    public static WebSettings Standard { get; } = new(false, IPAddress.Loopback, 8080);
}
