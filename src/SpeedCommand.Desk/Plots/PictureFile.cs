using System.Globalization;
using System.Text;
using System.Text.RegularExpressions;
using SkiaSharp;
using SpeedCommand.Desk.Commands;
using SpeedCommand.Replay.Files;

namespace SpeedCommand.Desk.Plots;

/// <summary>A picture, page or text to write; the kind is in the file's name.</summary>
internal sealed partial class PictureFile
{
    private readonly string _option;
    private readonly string _path;
    private readonly string _ending;

    private PictureFile(string option, string path, string ending) => (_option, _path, _ending) = (option, path, ending);

    /// <summary>Checks the name an option gave before any work is done.</summary>
    /// <exception cref="DeskFailure">The name's ending is none of those that can be written.</exception>
    public static PictureFile Named(string option, string path, params string[] endings)
    {
        var ending = endings.FirstOrDefault(ending => path.EndsWith(ending, StringComparison.OrdinalIgnoreCase))
            ?? throw new DeskFailure(ExitStatus.Usage, $"{option}: expected a file name ending in {string.Join(" or ", endings)}, found '{path}'");
        return new PictureFile(option, path, ending);
    }

    /// <summary>Checks before any work is done that it can be written, over none of the files that are read.</summary>
    /// <exception cref="DeskFailure">It must not, or cannot, be written.</exception>
    public PictureFile Checked(params IEnumerable<InputFile> inputs)
    {
        DeskOutput.Check(_option, _path, inputs);
        return this;
    }

    public bool IsText => _ending == ".txt";

    /// <summary>Writes text.</summary>
    public void Write(string text) => File.WriteAllText(_path, text);

    /// <summary>Draws and writes it. The same drawing gives the same bytes.</summary>
    /// <param name="width">Width in the drawing's units: points of a page, pixels of a plain picture.</param>
    /// <param name="height">Height in the same units.</param>
    /// <param name="draw">Draws it.</param>
    /// <param name="pixelsPerUnit">How fine a page becomes as a picture of pixels.</param>
    public void Write(int width, int height, Action<SKCanvas> draw, int pixelsPerUnit = 1)
    {
        using var content = new MemoryStream();
        switch (_ending)
        {
            case ".png":
                WritePng(content, width, height, draw, pixelsPerUnit);
                break;
            case ".svg":
                WriteSvg(content, width, height, draw);
                break;
            case ".pdf":
                WritePdf(content, width, height, draw);
                break;
            default:
                throw new InvalidOperationException($"no way to write {_ending}");
        }

        // Only a whole picture reaches the disk.
        File.WriteAllBytes(_path, content.ToArray());
    }

    /// <summary>The same as text of an SVG, without a file.</summary>
    public static string Svg(int width, int height, Action<SKCanvas> draw)
    {
        using var content = new MemoryStream();
        WriteSvg(content, width, height, draw);
        return Encoding.UTF8.GetString(content.ToArray());
    }

    private static void WritePng(Stream content, int width, int height, Action<SKCanvas> draw, int pixelsPerUnit)
    {
        using var surface = SKSurface.Create(new SKImageInfo(width * pixelsPerUnit, height * pixelsPerUnit));
        surface.Canvas.Clear(SKColors.White);
        surface.Canvas.Scale(pixelsPerUnit);
        draw(surface.Canvas);
        using var image = surface.Snapshot();
        using var bytes = image.Encode(SKEncodedImageFormat.Png, 100);
        bytes.SaveTo(content);
    }

    private static void WriteSvg(Stream content, int width, int height, Action<SKCanvas> draw)
    {
        using var drawn = new MemoryStream();
        using (var canvas = SKSvgCanvas.Create(SKRect.Create(width, height), drawn))
        {
            draw(canvas);
        }

        // Skia numbers its clips through the life of the process; the same drawing shall give the same bytes.
        var numbers = new Dictionary<string, string>();
        content.Write(Encoding.UTF8.GetBytes(ClipName().Replace(Encoding.UTF8.GetString(drawn.ToArray()), match =>
        {
            numbers.TryAdd(match.Value, string.Create(CultureInfo.InvariantCulture, $"clip{numbers.Count + 1}"));
            return numbers[match.Value];
        })));
    }

    [GeneratedRegex("(?<=id=\"|url\\(#)cl_[0-9a-f]+")]
    private static partial Regex ClipName();

    private static void WritePdf(Stream content, int width, int height, Action<SKCanvas> draw)
    {
        using var document = SKDocument.CreatePdf(content);
        draw(document.BeginPage(width, height));
        document.EndPage();
        document.Close();
    }
}
