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
        // Where rows are few, the words of the correction stand in the rule above the reasons.
        var wordRows = isRoomy ? 2 : 1;
        var rowsLeft = height - (1 + BarHeight + wordRows + ReasonRows + 1);
        DigitHeight = 5;
        while (DigitHeight + 2 <= rowsLeft - wordRows
            && BlockDigits.Width(3, DigitHeight + 2) + CaptionWidth <= width)
        {
            DigitHeight += 2;
        }

        var empty = rowsLeft - DigitHeight;
        // At least one empty row below the header, or its band would run into the digits.
        DigitTop = 1 + (empty + 2) / 3;
        HealthRow = height - 1;
        ReasonTop = HealthRow - ReasonRows;
        BarTop = isRoomy ? DigitTop + DigitHeight + (empty + 1) / 3 : ReasonTop - wordRows - BarHeight;
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
