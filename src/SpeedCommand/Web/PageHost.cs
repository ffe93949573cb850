using System.Net;

namespace SpeedCommand.Web;

/// <summary>
/// Under what names the page may be asked for. A name of the internet can be another site's, led to this address after its page was
/// loaded (DNS rebinding); an address, a name without a dot or one of the local network (RFC 6762, .local) is nobody's outside.
/// </summary>
internal static class PageHost
{
    private const string LocalEnding = ".local";

    /// <summary>Whether a request's host is one of ours.</summary>
    public static bool IsOurs(string host) =>
        IPAddress.TryParse(host, out _) || !host.Contains('.', StringComparison.Ordinal) || host.EndsWith(LocalEnding, StringComparison.OrdinalIgnoreCase);
}
