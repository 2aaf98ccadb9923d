namespace ResourceCheck.Resources.Formats;

/// <summary>The description at the head of an <c>.npy</c> file.</summary>
/// <param name="Type">Type of the numbers, such as <c>&lt;c16</c>; the text as found when it is no plain type.</param>
/// <param name="FortranOrder">Whether columns follow each other rather than rows.</param>
/// <param name="Shape">Lengths of the axes.</param>
internal sealed record NpyHeader(string Type, bool FortranOrder, IReadOnlyList<long> Shape)
{
    /// <summary>Axes and digits beyond these are lies; no number of an axis overflows.</summary>
    private const int MostAxes = 32;

    private const int MostDigits = 18;

    /// <summary>Reads <c>{'descr': …, 'fortran_order': …, 'shape': (…), }</c>; null when the text deviates from that form in any way.</summary>
    public static NpyHeader? TryParse(string text)
    {
        Cursor cursor = new(text);
        string? type = null;
        bool? order = null;
        List<long>? shape = null;
        if (!cursor.Take('{'))
            return null;
        while (!cursor.Take('}'))
        {
            bool read = cursor.TakeQuoted() switch
            {
                "descr" when type is null => cursor.Take(':') && (type = cursor.TakeType()) is not null,
                "fortran_order" when order is null => cursor.Take(':') && (order = cursor.TakeBoolean()) is not null,
                "shape" when shape is null => cursor.Take(':') && (shape = cursor.TakeShape()) is not null,
                _ => false,
            };
            if (!read || !(cursor.Take(',') || cursor.Sees('}')))
                return null;
        }

        return type is not null && order is { } fortran && shape is not null && cursor.AtEnd ? new(type, fortran, shape) : null;
    }

    private sealed class Cursor(string text)
    {
        private int _at;

        public bool AtEnd
        {
            get
            {
                Skip();
                return _at == text.Length;
            }
        }

        public bool Sees(char c)
        {
            Skip();
            return _at < text.Length && text[_at] == c;
        }

        public bool Take(char c)
        {
            bool seen = Sees(c);
            _at += seen ? 1 : 0;
            return seen;
        }

        public string? TakeQuoted()
        {
            if (!Sees('\'') && !Sees('"'))
                return null;
            int end = text.IndexOf(text[_at], _at + 1);
            if (end < 0)
                return null;
            string content = text[(_at + 1)..end];
            _at = end + 1;
            return content;
        }

        /// <summary>A quoted type, or a list of fields, which is taken whole so that the message can name it.</summary>
        public string? TakeType()
        {
            if (!Sees('['))
                return TakeQuoted();
            int end = text.IndexOf(']', _at);
            if (end < 0)
                return null;
            string fields = text[_at..(end + 1)];
            _at = end + 1;
            return fields;
        }

        public bool? TakeBoolean() => TakeWord("True") ? true : TakeWord("False") ? false : null;

        public List<long>? TakeShape()
        {
            List<long> shape = [];
            if (!Take('('))
                return null;
            while (!Take(')'))
            {
                if (shape.Count == MostAxes || TakeNumber() is not { } length)
                    return null;
                shape.Add(length);
                // One axis is written with a comma behind it, since (3) would be a number in brackets.
                bool comma = Take(',');
                if (!comma && (shape.Count == 1 || !Sees(')')))
                    return null;
            }

            return shape;
        }

        private long? TakeNumber()
        {
            Skip();
            int start = _at;
            while (_at < text.Length && char.IsAsciiDigit(text[_at]))
                _at++;
            return _at > start && _at - start <= MostDigits ? long.Parse(text.AsSpan(start, _at - start)) : null;
        }

        private bool TakeWord(string word)
        {
            Skip();
            bool seen = string.CompareOrdinal(text, _at, word, 0, word.Length) == 0;
            _at += seen ? word.Length : 0;
            return seen;
        }

        private void Skip()
        {
            while (_at < text.Length && (text[_at] is ' ' or '\n'))
                _at++;
        }
    }
}
