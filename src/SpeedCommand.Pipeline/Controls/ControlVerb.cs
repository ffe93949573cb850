namespace SpeedCommand.Pipeline.Controls;

/// <summary>What is asked of a control.</summary>
public enum ControlVerb
{
    /// <summary>Stand at a value.</summary>
    Set,

    /// <summary>Go one step up; a word goes to the next.</summary>
    More,

    /// <summary>Go one step down; a word goes to the one before.</summary>
    Less,

    /// <summary>Let the instrument choose.</summary>
    Automatic,

    /// <summary>Ballast: the valves are open from now on.</summary>
    Dump,

    /// <summary>Ballast: the valves are shut from now on.</summary>
    Stop,
}
