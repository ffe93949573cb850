namespace SpeedCommand.Displays.Sound;

/// <summary>What is to be heard from now on.</summary>
/// <param name="FrequencyHz">Pitch of the climb tone, Hz; 0 for none.</param>
/// <param name="CadenceHz">Pulses a second; 0 for a tone without a break.</param>
/// <param name="IsHoarse">Whether the tone rests on a doubtful number and must sound like it.</param>
/// <param name="Cue">A signal to begin now.</param>
public readonly record struct SoundOrder(double FrequencyHz, double CadenceHz, bool IsHoarse, SoundCue Cue)
{
    /// <summary>Nothing is to be heard.</summary>
    public static SoundOrder Silence => default;
}
