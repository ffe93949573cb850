namespace SpeedCommand.Displays.Terminal;

/// <summary>Which rows the parts of the panel take, for a page of at least 60 x 16: the speed to hold gets all that is left.</summary>
internal readonly record struct PanelLayout
{
    // The columns beside the big number that its captions need.
    private const int CaptionWidth = 30;

    private PanelLayout(int width, int height)
    {
        var isRoomy = height >= 20;
        BarHeight = isRoomy ? 3 : 2;
        ReasonRows = isRoomy ? 6 : 5;
        var rowsLeft = height - (1 + BarHeight + 1 + 1 + ReasonRows + 1);
        DigitHeight = 5;
        while (DigitHeight + 2 <= rowsLeft - (isRoomy ? 2 : 0)
            && BlockDigits.Width(3, DigitHeight + 2) + CaptionWidth <= width)
        {
            DigitHeight += 2;
        }

        var empty = rowsLeft - DigitHeight;
        DigitTop = 1 + (empty + 1) / 3;
        BarTop = DigitTop + DigitHeight + (empty + 1) / 3;
        HealthRow = height - 1;
        ReasonTop = HealthRow - ReasonRows;
        DigitLeft = (width - BlockDigits.Width(3, DigitHeight) - CaptionWidth) / 2;
        CaptionLeft = DigitLeft + BlockDigits.Width(3, DigitHeight) + 4;
    }

    public int DigitTop { get; }

    public int DigitHeight { get; }

    public int DigitLeft { get; }

    public int CaptionLeft { get; }

    public int BarTop { get; }

    public int BarHeight { get; }

    public int ReasonTop { get; }

    public int ReasonRows { get; }

    public int HealthRow { get; }

    public static PanelLayout For(PanelStyle style) => new(style.Width, style.Height);
}
