using System.Collections;
using System.Numerics;
using ResourceCheck.Quantities;

namespace ResourceCheck.Scripts;

/// <summary>The whole numbers from one to another, both included, made when asked for: a range may hold millions.</summary>
internal sealed class WholeRange(BigInteger first, BigInteger last) : IReadOnlyList<Rational>, ICollection<Rational>
{
    /// <summary>How many; ranges beyond the largest index are counted up to it.</summary>
    public int Count => (int)BigInteger.Clamp(last - first + 1, 0, int.MaxValue);

    public bool IsReadOnly => true;

    public Rational this[int index] =>
        index >= 0 && index < Count ? Rational.From(first + index) : throw new ArgumentOutOfRangeException(nameof(index));

    /// <summary>Whether a number lies in the range, in one step.</summary>
    public bool Contains(Rational item) => item.IsWhole && item.Numerator >= first && item.Numerator <= last;

    public void CopyTo(Rational[] array, int arrayIndex)
    {
        for (int i = 0; i < Count; i++)
            array[arrayIndex + i] = this[i];
    }

    public IEnumerator<Rational> GetEnumerator()
    {
        for (int i = 0; i < Count; i++)
            yield return this[i];
    }

    IEnumerator IEnumerable.GetEnumerator() => GetEnumerator();

    void ICollection<Rational>.Add(Rational item) => throw new NotSupportedException();

    void ICollection<Rational>.Clear() => throw new NotSupportedException();

    bool ICollection<Rational>.Remove(Rational item) => throw new NotSupportedException();
}
