using System.Runtime.CompilerServices;

namespace SpeedCommand.Sentences;

/// <summary>
/// The readings of an XDR sentence, <c>$--XDR,type,value,unit,id[,type,value,unit,id]*hh</c>, in order, for <c>foreach</c>. All
/// measurements are judged at once when this is made: a bad one does not spoil its neighbours. A sentence of another type
/// gives nothing and counts nothing.
/// </summary>
public ref struct XdrReadings
{
    private readonly Room _readings;
    private int _next;

    /// <summary>Reads the measurements of a sentence.</summary>
    /// <param name="sentence">A sentence of any type.</param>
    public XdrReadings(in Sentence sentence)
    {
        if (!sentence.IsOfType("XDR"u8))
        {
            return;
        }

        var fields = sentence.Fields;
        while (fields.MoveNext())
        {
            var type = fields.Current;
            if (!(Next(ref fields, out var number) && Next(ref fields, out var unit) && Next(ref fields, out var id)))
            {
                BadCount++;
                return;
            }

            var form = XdrForm.Find(type, unit, id, out var isKnownId);
            if (!isKnownId)
            {
                UnknownCount++;
            }
            else if (form is null || !SentenceNumber.TryRead(number, out var value))
            {
                BadCount++;
            }
            else
            {
                _readings[Count] = new Reading(form.Kind, form.ToReading(value));
                Count++;
            }
        }
    }

    /// <summary>How many readings there are.</summary>
    public int Count { get; }

    /// <summary>Measurements with an id that is not ours: the business of some other device, no error.</summary>
    public int UnknownCount { get; }

    /// <summary>
    /// Measurements of ours that give no reading: the wrong type or unit, an empty or malformed value; and a group at the
    /// end with fewer than four fields.
    /// </summary>
    public int BadCount { get; }

    /// <summary>The present reading; meaningless before the first <see cref="MoveNext"/>.</summary>
    public Reading Current { get; private set; }

    /// <summary>Goes on to the next reading.</summary>
    /// <returns>False when there is none.</returns>
    public bool MoveNext()
    {
        if (_next == Count)
        {
            return false;
        }

        Current = _readings[_next];
        _next++;
        return true;
    }

    /// <summary>The readings not yet passed, for <c>foreach</c>.</summary>
    /// <returns>A copy with its own place.</returns>
    public readonly XdrReadings GetEnumerator() => this;

    private static bool Next(ref SentenceFields fields, out ReadOnlySpan<byte> field)
    {
        var found = fields.MoveNext();
        field = fields.Current;
        return found;
    }

    /// <summary>
    /// Room for every reading one sentence can hold: 80 characters less "$--XDR" (the checksum may be missing), and the
    /// shortest measurement, ",G,1,,IAS" or ",H,1,P,RH", takes 9.
    /// </summary>
    [InlineArray((SentenceReader.MaxLength - 6) / 9)]
    private struct Room
    {
        private Reading _first;
    }
}
