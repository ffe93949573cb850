using System.Text;
using Microsoft.AspNetCore.Http;
using Microsoft.AspNetCore.Http.Features;
using SpeedCommand.Controls;

namespace SpeedCommand.Web;

/// <summary>
/// Changes of controls from the page: one line in, one line back. A page of another site that the same browser shows must not get here:
/// it cannot send our header without asking first, which nobody answers, it cannot hide its name, and <see cref="PageHost"/> keeps it from
/// having us under a name of its own.
/// </summary>
internal sealed class SetRequests(ControlDesk desk)
{
    public const string Path = "/set";

    /// <summary>What only our own page sends, and who means it.</summary>
    public const string OwnHeader = "X-SpeedCommand", OwnValue = "set";

    /// <summary>More than any line that means something.</summary>
    public const int MaxBytes = 100;

    /// <summary>A line comes in the packet of the headers, or in the next.</summary>
    private static readonly TimeSpan BodyTime = TimeSpan.FromSeconds(1);

    public async Task AnswerAsync(HttpContext context)
    {
        if (WhyForeign(context.Request) is { } reason)
        {
            await RefuseAsync(context, StatusCodes.Status403Forbidden, reason).ConfigureAwait(false);
            return;
        }

        try
        {
            if (await ReadLineAsync(context).ConfigureAwait(false) is not { } line)
            {
                await RefuseAsync(context, StatusCodes.Status413PayloadTooLarge, $"expected at most {MaxBytes} bytes, found more").ConfigureAwait(false);
                return;
            }

            var isDone = desk.TryAnswer(line, ControlSource.WebPage, out var message);
            await WriteAsync(context, isDone ? StatusCodes.Status200OK : StatusCodes.Status422UnprocessableEntity, message).ConfigureAwait(false);
        }
        catch (OperationCanceledException)
        {
            // An answer would first wait for the rest of the line, for seconds.
            context.Abort();
        }
        catch (BadHttpRequestException fault)
        {
            await RefuseAsync(context, fault.StatusCode, fault.Message).ConfigureAwait(false);
        }
        catch (IOException)
        {
            // The browser has gone in the middle of its line.
        }
    }

    /// <summary>Why the request may be another site's doing; null when it is not.</summary>
    private static string? WhyForeign(HttpRequest request)
    {
        if (request.Headers[OwnHeader] != OwnValue)
        {
            return $"expected the header {OwnHeader}: {OwnValue}, found none";
        }

        var origin = request.Headers.Origin;
        return origin.Count == 0 || string.Equals(origin, $"http://{request.Host.Value}", StringComparison.OrdinalIgnoreCase)
            ? null
            : "expected a change by this page, found one by another site's";
    }

    /// <summary>The line without its end; null when it is too long.</summary>
    private static async Task<string?> ReadLineAsync(HttpContext context)
    {
        if (context.Request.ContentLength > MaxBytes)
        {
            return null;
        }

        // Kestrel's own limit is for the other paths, which take no body; one byte more tells too much from just enough.
        context.Features.Get<IHttpMaxRequestBodySizeFeature>()!.MaxRequestBodySize = null;
        var bytes = new byte[MaxBytes + 1];
        using var limit = CancellationTokenSource.CreateLinkedTokenSource(context.RequestAborted);
        limit.CancelAfter(BodyTime);
        var count = await context.Request.Body.ReadAtLeastAsync(bytes, bytes.Length, throwOnEndOfStream: false, limit.Token).ConfigureAwait(false);
        return count > MaxBytes ? null : Encoding.Latin1.GetString(bytes, 0, count).TrimEnd('\r', '\n');
    }

    /// <summary>The connection ends with a refusal, so that no body is waited for.</summary>
    private static Task RefuseAsync(HttpContext context, int status, string reason)
    {
        context.Response.Headers.Connection = "close";
        return WriteAsync(context, status, reason);
    }

    private static Task WriteAsync(HttpContext context, int status, string text)
    {
        var bytes = Encoding.ASCII.GetBytes(text + "\n");
        context.Response.StatusCode = status;
        context.Response.ContentType = "text/plain";
        context.Response.ContentLength = bytes.Length;
        return context.Response.Body.WriteAsync(bytes, context.RequestAborted).AsTask();
    }
}
