using System.Numerics;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>A thread's share of the double sign form of <see cref="DistinctOutcomes"/>; its loops allocate nothing.</summary>
internal sealed class DistinctSum
{
    private readonly int _outcomes;
    private readonly int _parties;
    private readonly int _free;
    private readonly int _size;
    private readonly double[] _effectsRe;
    private readonly double[] _effectsIm;
    private readonly double[] _re;
    private readonly double[] _im;
    private readonly SignedDeterminants _inner;

    public DistinctSum(IReadOnlyList<IReadOnlyList<LocalOperator>> effects, IReadOnlyList<LocalOperator> others)
    {
        int n = effects.Count + others.Count;
        (_outcomes, _parties, _size) = (effects[0].Count, effects.Count, n * n);
        _free = _outcomes - _parties;
        (_effectsRe, _effectsIm) = (new double[_outcomes * _parties * _size], new double[_outcomes * _parties * _size]);
        for (int k = 0; k < _outcomes; k++)
        {
            for (int i = 0; i < _parties; i++)
            {
                effects[i][k].Re.CopyTo(_effectsRe, ((k * _parties) + i) * _size);
                effects[i][k].Im.CopyTo(_effectsIm, ((k * _parties) + i) * _size);
            }
        }

        (_re, _im) = (new double[n * _size], new double[n * _size]);
        for (int j = 0; j < others.Count; j++)
        {
            others[j].Re.CopyTo(_re, (_parties + j) * _size);
            others[j].Im.CopyTo(_im, (_parties + j) * _size);
        }

        _inner = new SignedDeterminants(n, n);
    }

    /// <summary>The terms whose signs of outcomes 1 … d-1 are the bits of <paramref name="first"/> to before <paramref name="end"/>.</summary>
    public RoundedSum Part(int first, int end)
    {
        RoundedSum sum = default;
        for (int signs = first; signs < end; signs++)
        {
            int negative = BitOperations.PopCount((uint)signs);
            double factor = Math.Pow(_outcomes - (2 * negative), _free) * (int.IsEvenInteger(negative) ? 1 : -1);
            if (factor == 0)
                continue;
            Combine(_effectsRe, _re, signs);
            Combine(_effectsIm, _im, signs);
            sum += _inner.Sum(_re, _im).Times(factor);
        }

        return sum;
    }

    /// <summary>Σ_k ε_k A_i^k for all parties at once.</summary>
    private void Combine(double[] effects, double[] target, int signs)
    {
        int length = _parties * _size;
        Span<double> sum = target.AsSpan(0, length);
        effects.AsSpan(0, length).CopyTo(sum); // ε of outcome 0 is 1
        for (int k = 1; k < _outcomes; k++)
            Vectors.AddScaled((signs >> (k - 1) & 1) == 0 ? 1 : -1, effects.AsSpan(k * length, length), sum);
    }
}
