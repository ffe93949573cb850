using System.Text;
using SpeedCommand.Pipeline.Picture;

namespace SpeedCommand.Replay.Pictures;

/// <summary>One column of replay output: its name, and how to read it off a picture.</summary>
public sealed class PictureColumn
{
    private readonly NumberOf? _number;
    private readonly WordOf? _word;

    /// <summary>A column of numbers.</summary>
    internal PictureColumn(string name, int decimals, NumberOf number)
        : this(name, PictureColumnKind.Number) => (Decimals, _number) = (decimals, number);

    /// <summary>A column of words.</summary>
    internal PictureColumn(string name, WordOf word)
        : this(name, PictureColumnKind.Word) => _word = word;

    internal PictureColumn(string name, PictureColumnKind kind)
    {
        (Name, Kind) = (name, kind);
        JsonKey = Encoding.ASCII.GetBytes($"\"{name}\":");
    }

    internal delegate double NumberOf(in CockpitPicture picture);

    internal delegate string? WordOf(in CockpitPicture picture);

    /// <summary>The name, ending in the unit.</summary>
    public string Name { get; }

    /// <summary>What stands in it.</summary>
    public PictureColumnKind Kind { get; }

    /// <summary>Decimals that are printed; 0 where there are no numbers.</summary>
    public int Decimals { get; }

    internal byte[] JsonKey { get; }

    /// <summary>The number in a picture.</summary>
    /// <param name="picture">The picture.</param>
    /// <returns>The number in the unit of the column's name, unrounded; NaN when blank, and in columns of other kinds.</returns>
    public double Number(in CockpitPicture picture) => _number is null ? double.NaN : _number(picture);

    /// <summary>The word in a picture.</summary>
    /// <param name="picture">The picture.</param>
    /// <returns>The word; null when there is none, and in columns of other kinds.</returns>
    public string? Word(in CockpitPicture picture) => _word?.Invoke(picture);
}

/// <summary>What stands in a column.</summary>
public enum PictureColumnKind
{
    /// <summary>A number, which may be blank.</summary>
    Number,

    /// <summary>One word, or none.</summary>
    Word,

    /// <summary>Any number of names of <see cref="FaultNames"/>.</summary>
    Faults,
}
