namespace SpeedCommand.Replay.Recording;

/// <summary>When the recording of the first flight begins; that of each later one begins when it takes off.</summary>
public enum RecordingBegin
{
    /// <summary>With the first line that comes in.</summary>
    Data,

    /// <summary>When the glider flies.</summary>
    Flying,
}
