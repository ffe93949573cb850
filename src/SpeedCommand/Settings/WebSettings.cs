using System.Net;

namespace SpeedCommand.Settings;

/// <summary>Where the web page is served.</summary>
/// <param name="IsOn">Whether it is served at all.</param>
/// <param name="Address">The address to listen on.</param>
/// <param name="Port">The TCP port; 0 for any that is free, which the settings do not allow.</param>
/// <param name="MaySet">Whether whoever reads the page may change the pilot's controls.</param>
internal sealed record WebSettings(bool IsOn, IPAddress Address, int Port, bool MaySet)
{
    /// <summary>What is used unless the settings say otherwise: off, and if on, for this computer alone and to look at only.</summary>
    public static WebSettings Standard { get; } = new(false, IPAddress.Loopback, 8080, false);
}
