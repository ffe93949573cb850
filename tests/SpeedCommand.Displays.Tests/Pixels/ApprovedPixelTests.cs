using SpeedCommand.Displays.Pixels;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displays.Tests.Pixels;

/// <summary>Each state of the small display, pixel by pixel, as a person approved it.</summary>
public class ApprovedPixelTests
{
    public static TheoryData<string> States => [.. PixelStates.Names];

    [Theory]
    [MemberData(nameof(States))]
    public void Render_State_IsThePageApproved(string state) =>
        ApprovedText.Matches($"pixels-{state}", PixelArt.Text(PixelArt.Page(PixelStates.Named(state)).IsLit));

    [Fact]
    public void Render_AControlJustChanged_IsThePageApproved() =>
        ApprovedText.Matches("pixels-control-changed", PixelArt.Text(PixelArt.Page(Pictures.Changed(Pictures.GlidingTooSlow)).IsLit));

    [Fact]
    public void RenderCaution_IsThePageApproved()
    {
        var page = new PixelPage();
        PixelPanel.RenderCaution(page);
        ApprovedText.Matches("pixels-caution", PixelArt.Text(page.IsLit));
    }
}
