using System.Numerics;
using FsCheck.Xunit;
using MathNet.Numerics.LinearAlgebra;
using ResourceCheck.Numerics;
using ResourceCheck.Quantities;
using ResourceCheck.Timeline;

namespace ResourceCheck.Tests.Engines;

/// <summary>Every local noise is a channel: trace is kept (the sink counted), Hermitian stays Hermitian, nothing turns negative, also when it acts on half of a pair.</summary>
public sealed class LocalNoiseLaws
{
    [Property(MaxTest = 60)]
    public bool Noise_keeps_the_trace(int seed)
    {
        (OperatorBasis basis, SiteMap map) = Draw(seed);
        double[] pulled = map.PullBack(basis.Trace);
        return pulled.Zip(basis.Trace, (a, b) => Math.Abs(a - b)).Max() < 1e-12;
    }

    /// <summary>Choi matrix of the map between levels; M.-D. Choi, Linear Algebra Appl. 10, 285 (1975).</summary>
    [Property(MaxTest = 60)]
    public bool Noise_is_completely_positive(int seed)
    {
        (OperatorBasis basis, SiteMap map) = Draw(seed);
        int d = basis.Levels;
        Matrix<Complex> choi = Matrix<Complex>.Build.Dense(d * d, d * d);
        for (int i = 0; i < basis.OperatorCount; i++)
        {
            for (int j = 0; j < basis.OperatorCount; j++)
                choi += Dense(basis, j).Transpose().KroneckerProduct(Dense(basis, i)) * map[i, j];
        }

        return choi.Evd(Symmetricity.Hermitian).EigenValues.Real().Minimum() > -1e-12;
    }

    [Property(MaxTest = 60)]
    public bool Dynamics_over_two_spells_are_dynamics_over_their_sum(int seed)
    {
        Random random = new(seed);
        int d = 2 + (Math.Abs(seed % 3));
        OperatorBasis basis = new(d, true);
        var dynamics = RandomWorld.Dynamics(random, d, true);
        SiteMap Spell(double t) => LocalNoise.Map(basis, new SiteNoise { Dynamics = dynamics, Time = Duration.FromSeconds(t) });
        SiteMap joined = Spell(0.7).After(Spell(0.4)), whole = Spell(1.1);
        return joined.Entries.Zip(whole.Entries, (a, b) => Math.Abs(a - b)).Max() < 1e-12;
    }

    private static (OperatorBasis, SiteMap) Draw(int seed)
    {
        int d = 2 + (Math.Abs(seed % 4));
        OperatorBasis basis = new(d, true);
        var flight = RandomWorld.Of(seed, 1, d, true).Parties[0].Flight;
        SiteNoise noise = PartyNoise.FlightNoise(flight) with { Dynamics = flight.Dynamics, Time = flight.Time, Transmission = flight.Transmission };
        return (basis, LocalNoise.Map(basis, noise));
    }

    private static Matrix<Complex> Dense(OperatorBasis basis, int index)
    {
        Matrix<Complex> m = Matrix<Complex>.Build.Dense(basis.Levels, basis.Levels);
        foreach ((int row, int column, Complex value) in basis.Element(index))
            m[row, column] += value;
        return m;
    }
}
