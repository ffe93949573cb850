using Microsoft.AspNetCore.Hosting.Server;
using Microsoft.AspNetCore.Http;
using Microsoft.AspNetCore.Http.Features;

namespace SpeedCommand.Web;

/// <summary>
/// Answers requests: three files and a stream of events by GET, changes of controls by POST where they are allowed, and nothing else. Of
/// a GET nothing is read but the first line and the headers that say it brings a body.
/// </summary>
/// <param name="hub">Who watches.</param>
/// <param name="sets">Who takes changes of controls; null when the page may not change any.</param>
internal sealed class PageApplication(PageHub hub, SetRequests? sets) : IHttpApplication<HttpContext>
{
    public const string EventsPath = "/events";

    /// <summary>
    /// What the page may do: load its own files and its own events, and be framed by nobody. No other site may read from it, none is
    /// told of it, and nothing is kept that could be old.
    /// </summary>
    private static readonly KeyValuePair<string, string>[] SecurityHeaders =
    [
        new("Content-Security-Policy",
            "default-src 'none'; script-src 'self'; style-src 'self'; connect-src 'self'; base-uri 'none'; form-action 'none'; frame-ancestors 'none'"),
        new("X-Content-Type-Options", "nosniff"),
        new("X-Frame-Options", "DENY"),
        new("Referrer-Policy", "no-referrer"),
        new("Cross-Origin-Resource-Policy", "same-origin"),
        new("Cache-Control", "no-store"),
    ];

    private readonly IReadOnlyDictionary<string, PageFile> _files = PageFile.ReadAll();

    public HttpContext CreateContext(IFeatureCollection contextFeatures) => new DefaultHttpContext(contextFeatures);

    public void DisposeContext(HttpContext context, Exception? exception)
    {
    }

    public Task ProcessRequestAsync(HttpContext context)
    {
        foreach (var (name, value) in SecurityHeaders)
        {
            context.Response.Headers[name] = value;
        }

        if (!PageHost.IsOurs(context.Request.Host.Host))
        {
            return RefuseAsync(context, StatusCodes.Status403Forbidden);
        }

        var path = context.Request.Path.Value ?? "";
        if (sets is not null && path == SetRequests.Path)
        {
            return HttpMethods.IsPost(context.Request.Method) ? sets.AnswerAsync(context) : RefuseMethodAsync(context, HttpMethods.Post);
        }

        var isEvents = path == EventsPath;
        if (!isEvents && !_files.ContainsKey(path))
        {
            return RefuseAsync(context, StatusCodes.Status404NotFound);
        }

        if (!HttpMethods.IsGet(context.Request.Method))
        {
            return RefuseMethodAsync(context, HttpMethods.Get);
        }

        if (context.Request.ContentLength > 0 || context.Request.Headers.TransferEncoding.Count > 0)
        {
            return RefuseAsync(context, StatusCodes.Status413PayloadTooLarge);
        }

        return isEvents ? SendEventsAsync(context) : SendFileAsync(context, _files[path]);
    }

    private static Task RefuseMethodAsync(HttpContext context, string allowed)
    {
        context.Response.Headers.Allow = allowed;
        return RefuseAsync(context, StatusCodes.Status405MethodNotAllowed);
    }

    /// <summary>The connection ends with a refusal, so that no body is waited for.</summary>
    private static Task RefuseAsync(HttpContext context, int status)
    {
        context.Response.StatusCode = status;
        context.Response.ContentLength = 0;
        context.Response.Headers.Connection = "close";
        return Task.CompletedTask;
    }

    private static Task SendFileAsync(HttpContext context, PageFile file)
    {
        context.Response.ContentType = file.ContentType;
        context.Response.ContentLength = file.Bytes.Length;
        return context.Response.Body.WriteAsync(file.Bytes, context.RequestAborted).AsTask();
    }

    private async Task SendEventsAsync(HttpContext context)
    {
        if (hub.TryAdd() is not { } client)
        {
            await RefuseAsync(context, StatusCodes.Status503ServiceUnavailable).ConfigureAwait(false);
            return;
        }

        context.Response.ContentType = "text/event-stream";
        // A write to a browser that reads nothing waits for ever; ending the connection ends the write.
        await using var ended = client.Ended.UnsafeRegister(static state => ((HttpContext)state!).Abort(), context).ConfigureAwait(false);
        try
        {
            // A browser that lost the service asks again so soon, ms.
            await context.Response.BodyWriter.WriteAsync("retry: 500\n\n"u8.ToArray(), context.RequestAborted).ConfigureAwait(false);
            while (true)
            {
                var frame = await client.NextAsync(context.RequestAborted).ConfigureAwait(false);
                await context.Response.BodyWriter.WriteAsync(frame, context.RequestAborted).ConfigureAwait(false);
            }
        }
        catch (Exception fault) when (fault is OperationCanceledException or IOException)
        {
            // The browser has gone, or was let go.
        }
        finally
        {
            hub.Remove(client);
        }
    }
}
