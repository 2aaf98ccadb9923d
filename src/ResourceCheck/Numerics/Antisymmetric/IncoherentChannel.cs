using System.Numerics;

namespace ResourceCheck.Numerics.Antisymmetric;

/// <summary>
/// What an incoherent channel is made of: population p moves to a with <see cref="Jump"/>, the coherence between p and q keeps the part
/// <see cref="Keep"/>.
/// </summary>
internal sealed class IncoherentChannel
{
    private readonly double[] _jump;
    private readonly double[] _keep;

    private IncoherentChannel(int levels, double[] jump, double[] keep) => (Levels, _jump, _keep) = (levels, jump, keep);

    public int Levels { get; }

    /// <summary>Part of the population of p that moves to a.</summary>
    public double Jump(int a, int p) => _jump[(a * Levels) + p];

    /// <summary>What is left of the coherence between p and q; 0 for p = q, which counts as a jump from p to p.</summary>
    public double Keep(int p, int q) => _keep[(p * Levels) + q];

    /// <summary>
    /// Of any channel, its average over equal phases of input and output levels. Beside parties whose channels are incoherent and real this is
    /// all that counts of one that is not, because the antisymmetric state takes phases of levels for a phase of its own.
    /// </summary>
    public static IncoherentChannel Of(LocalChannel channel)
    {
        int d = channel.Levels;
        double[] jump = new double[d * d], keep = new double[d * d];
        for (int a = 0; a < d; a++)
        {
            for (int p = 0; p < d; p++)
            {
                jump[(a * d) + p] = channel[a, a, p, p].Real;
                keep[(a * d) + p] = a == p ? 0 : channel[a, p, a, p].Real;
            }
        }

        return new IncoherentChannel(d, jump, keep);
    }

    /// <summary>Whether two levels may be exchanged without changing the channel.</summary>
    public bool IsSymmetric(int x, int y, double tolerance)
    {
        int Other(int l) => l == x ? y : l == y ? x : l;
        for (int a = 0; a < Levels; a++)
        {
            for (int p = 0; p < Levels; p++)
            {
                if (Math.Abs(Jump(a, p) - Jump(Other(a), Other(p))) > tolerance || Math.Abs(Keep(a, p) - Keep(Other(a), Other(p))) > tolerance)
                    return false;
            }
        }

        return true;
    }
}
