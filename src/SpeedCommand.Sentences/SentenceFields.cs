namespace SpeedCommand.Sentences;

/// <summary>
/// The comma-separated fields of a sentence, for <c>foreach</c> or by hand with <see cref="MoveNext"/>. An empty field is a
/// field; a sentence without any comma has none.
/// </summary>
public ref struct SentenceFields
{
    private ReadOnlySpan<byte> _rest;
    private bool _more;

    /// <param name="afterAddress">Empty, or a comma and the fields.</param>
    internal SentenceFields(ReadOnlySpan<byte> afterAddress)
    {
        _more = afterAddress.Length > 0;
        _rest = _more ? afterAddress[1..] : default;
    }

    /// <summary>The present field, possibly empty. Empty before the first and after the last.</summary>
    public ReadOnlySpan<byte> Current { get; private set; }

    /// <summary>Goes on to the next field.</summary>
    /// <returns>False when there is none.</returns>
    public bool MoveNext()
    {
        if (!_more)
        {
            Current = default;
            return false;
        }

        var comma = _rest.IndexOf((byte)',');
        _more = comma >= 0;
        Current = _more ? _rest[..comma] : _rest;
        _rest = _more ? _rest[(comma + 1)..] : default;
        return true;
    }

    /// <summary>The fields not yet passed, for <c>foreach</c>.</summary>
    /// <returns>A copy with its own place.</returns>
    public readonly SentenceFields GetEnumerator() => this;
}
