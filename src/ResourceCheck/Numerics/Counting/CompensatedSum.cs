namespace ResourceCheck.Numerics.Counting;

/// <summary>
/// A running sum with the rounding errors carried along: A. Neumaier, Z. Angew. Math. Mech. 54, 39 (1974). Terms may come in any
/// order without loss, which a sum from small to large would achieve only after sorting.
/// </summary>
internal struct CompensatedSum
{
    private double _sum, _carry;

    /// <summary>The sum so far.</summary>
    public readonly double Value => _sum + _carry;

    /// <summary>Adds a term.</summary>
    public void Add(double term)
    {
        double next = _sum + term;
        _carry += Math.Abs(_sum) >= Math.Abs(term) ? _sum - next + term : term - next + _sum;
        _sum = next;
    }
}
