using SpeedCommand.Displays.Readings;
using SpeedCommand.Displays.Terminal;
using SpeedCommand.Displays.Units;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Displaying;

/// <summary>The panel of a replay, drawn as often as a terminal can take when the replay runs faster than life.</summary>
internal sealed class ReplayPanel : IPictureSink, IDisposable
{
    private readonly PanelStyle _style;
    private readonly SpeedSteadier _steadier;
    private readonly int _stride;
    private readonly bool _isTerminal = !Console.IsOutputRedirected;
    private long _count;

    public ReplayPanel(DisplayUnits units, double pace)
    {
        _steadier = new SpeedSteadier(units.Speed);
        _style = new PanelStyle(_isTerminal ? Console.WindowWidth : 80, _isTerminal ? Console.WindowHeight : 24, PanelLook.Colour, units);
        _stride = double.IsFinite(pace) ? Math.Max(1, (int)pace) : 100;
        if (_isTerminal)
        {
            Console.Out.Write(TerminalPanel.Enter);
        }
    }

    public void OnPicture(in CockpitPicture picture)
    {
        var steady = _steadier.Next(picture);
        if (_count++ % _stride == 0)
        {
            Console.Out.Write(_isTerminal ? TerminalPanel.Render(steady, _style) : TerminalPanel.Plain(steady, _style.Units) + "\n");
        }
    }

    public void Dispose()
    {
        if (_isTerminal)
        {
            Console.Out.Write(TerminalPanel.Leave);
        }
    }
}
