using System.Numerics;
using ResourceCheck.Numerics;
using ResourceCheck.Resources;

namespace ResourceCheck.Engines.Dense;

/// <summary>Turns prepared states into site tensors, one site after another, so that no second matrix of full size is made.</summary>
internal sealed class TensorBuilder
{
    private readonly OperatorBasis _basis;
    private readonly double[] _data;
    private readonly int[] _strides;

    private TensorBuilder(OperatorBasis basis, int sites)
    {
        _basis = basis;
        _strides = new int[sites];
        int size = 1;
        for (int site = sites - 1; site >= 0; site--)
        {
            _strides[site] = size;
            size = checked(size * basis.Dimension);
        }

        _data = new double[size];
    }

    /// <summary>A state of the given parties, with white noise mixed in.</summary>
    public static SiteTensor Build(OperatorBasis basis, IReadOnlyList<int> parties, PreparedState state, double white)
    {
        TensorBuilder builder = new(basis, parties.Count);
        if (state.Ket is { } ket)
            builder.FillFromKet(ket);
        else
            builder.Fill(state.Density!, 0, 0);
        builder.Mix(white);
        return new SiteTensor(basis.Dimension, parties, builder._data);
    }

    private void Mix(double white)
    {
        if (white == 0)
            return;
        for (int i = 0; i < _data.Length; i++)
            _data[i] *= 1 - white;
        _data[0] += white * Math.Pow(_basis.Levels, -_strides.Length / 2.0);
    }

    private void FillFromKet(Complex[] ket)
    {
        int d = _basis.Levels, block = ket.Length / d;
        Complex[] part = new Complex[block * block];
        for (int i = 0; i < _basis.OperatorCount; i++)
        {
            Array.Clear(part);
            foreach ((int row, int column, Complex weight) in _basis.Element(i))
                AddOuter(part, ket.AsSpan(column * block, block), ket.AsSpan(row * block, block), weight);
            FillRest(part, 0, i * _strides[0]);
        }
    }

    /// <summary>part += weight |a⟩⟨b|.</summary>
    private static void AddOuter(Complex[] part, ReadOnlySpan<Complex> a, ReadOnlySpan<Complex> b, Complex weight)
    {
        for (int r = 0; r < a.Length; r++)
        {
            Complex left = weight * a[r];
            if (left == Complex.Zero)
                continue;
            for (int c = 0; c < b.Length; c++)
                part[(r * a.Length) + c] += left * Complex.Conjugate(b[c]);
        }
    }

    /// <summary>Expands a Hermitian matrix on the sites from <paramref name="site"/> on into components from <paramref name="offset"/> on.</summary>
    private void Fill(Complex[] matrix, int site, int offset)
    {
        int d = _basis.Levels;
        int block = (int)Math.Round(Math.Sqrt(matrix.Length)) / d;
        Complex[] part = new Complex[block * block];
        for (int i = 0; i < _basis.OperatorCount; i++)
        {
            Array.Clear(part);
            foreach ((int row, int column, Complex weight) in _basis.Element(i))
                AddBlock(part, matrix, block, column, row, weight);
            FillRest(part, site, offset + (i * _strides[site]));
        }
    }

    private void FillRest(Complex[] part, int site, int offset)
    {
        if (site == _strides.Length - 1)
            _data[offset] = part[0].Real;
        else
            Fill(part, site + 1, offset);
    }

    /// <summary>part += weight · block (row, column) of the matrix.</summary>
    private void AddBlock(Complex[] part, Complex[] matrix, int block, int row, int column, Complex weight)
    {
        int width = block * _basis.Levels;
        for (int r = 0; r < block; r++)
        {
            int start = (((row * block) + r) * width) + (column * block);
            for (int c = 0; c < block; c++)
                part[(r * block) + c] += weight * matrix[start + c];
        }
    }
}
