using System.Numerics;
using ResourceCheck.Numerics;

namespace ResourceCheck.Engines.Dense;

/// <summary>The reverse of <see cref="TensorBuilder"/>: a density operator from its components; what is in the sink is left out.</summary>
internal static class TensorUnfolding
{
    /// <summary>The operator on the levels of all the tensor's sites, d^N × d^N row after row.</summary>
    public static Complex[] ToDensity(OperatorBasis basis, SiteTensor tensor) => Unfold(basis, tensor.Data, tensor.Parties.Count, 0);

    private static Complex[] Unfold(OperatorBasis basis, double[] data, int sites, int offset)
    {
        if (sites == 0)
            return [data[offset]];
        int stride = 1;
        for (int s = 1; s < sites; s++)
            stride *= basis.Dimension;
        int block = (int)Math.Round(Math.Pow(basis.Levels, sites - 1)), width = block * basis.Levels;
        Complex[] result = new Complex[width * width];
        for (int i = 0; i < basis.OperatorCount; i++)
        {
            Complex[] part = Unfold(basis, data, sites - 1, offset + (i * stride));
            foreach ((int row, int column, Complex weight) in basis.Element(i))
                AddBlock(result, width, part, block, row, column, weight);
        }

        return result;
    }

    private static void AddBlock(Complex[] result, int width, Complex[] part, int block, int row, int column, Complex weight)
    {
        for (int r = 0; r < block; r++)
        {
            for (int c = 0; c < block; c++)
                result[(((row * block) + r) * width) + (column * block) + c] += weight * part[(r * block) + c];
        }
    }
}
