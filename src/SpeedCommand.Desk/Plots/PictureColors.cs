using SkiaSharp;

namespace SpeedCommand.Desk.Plots;

/// <summary>
/// Colours that stay apart for every kind of colour vision: Okabe and Ito, "Color Universal Design" (2008). Nothing is told by
/// colour alone: each thing has its own shape, dash or words.
/// </summary>
internal static class PictureColors
{
    public static readonly SKColor Ink = new(0x22, 0x2B, 0x33);
    public static readonly SKColor Quiet = new(0x66, 0x70, 0x78);
    public static readonly SKColor Faint = new(0xDD, 0xE2, 0xE6);
    public static readonly SKColor Blue = new(0x00, 0x72, 0xB2);
    public static readonly SKColor Green = new(0x00, 0x9E, 0x73);
    public static readonly SKColor Vermilion = new(0xD5, 0x5E, 0x00);
    public static readonly SKColor Orange = new(0xE6, 0x9F, 0x00);
}
