using System.Globalization;
using ResourceCheck.Engines;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Resources;

namespace ResourceCheck.Judgement;

/// <summary>Labelled figures of one start under one set of couplings, an entry for each time.</summary>
/// <param name="Antisymmetric">Population of |S_N⟩, all copies.</param>
/// <param name="Symmetric">Population of its counterpart with all signs +, all copies.</param>
/// <param name="Excited">Mean number of excited emitters, all copies.</param>
/// <param name="PhotonFree">Copies without a photon, exact.</param>
/// <param name="IsSampled">Whether some label is sampled.</param>
/// <param name="Error">Estimated error of probabilities from the integration.</param>
/// <param name="Method">How, in a sentence.</param>
internal sealed record RelaxationCurve(
    IReadOnlyList<Estimate> Antisymmetric,
    IReadOnlyList<Estimate> Symmetric,
    IReadOnlyList<Estimate> Excited,
    IReadOnlyList<RelaxationFigures> PhotonFree,
    bool IsSampled,
    double Error,
    string Method)
{
    /// <summary>Of each interval by itself.</summary>
    private const double Confidence = 0.99;

    /// <summary>By the density operator.</summary>
    public static RelaxationCurve Exact(Couplings couplings, PreparedState start, double[] times, double tolerance, CancellationToken cancellation)
    {
        System.Numerics.Complex[] density = start.Density ?? StartStates.Operator(start.Ket!);
        IReadOnlyList<RelaxationFigures> all = Relaxation.Follow(couplings, density, times, true, tolerance, cancellation).Figures;
        IReadOnlyList<RelaxationFigures> quiet = Relaxation.Follow(couplings, density, times, false, tolerance, cancellation).Figures;
        return new RelaxationCurve(
            [.. all.Select(f => Estimate.Exact(Math.Max(0, f.Population)))],
            [.. all.Select(f => Estimate.Exact(Math.Max(0, f.Symmetric)))],
            [.. all.Select(f => Estimate.Exact(Math.Max(0, f.Excitations)))],
            quiet,
            false,
            CollectiveDecay.ProbabilityError(Math.Max(all[^1].ErrorEstimate, quiet[^1].ErrorEstimate), (int)Math.Round(Math.Sqrt(density.Length))),
            "the density operator of all emitters is evolved");
    }

    /// <summary>By one state vector without a photon, and trajectories for what photons add.</summary>
    public static RelaxationCurve ByTrajectories(Couplings couplings, PreparedState start, double[] times, double tolerance, RelaxationRequest request)
    {
        SampledRelaxation relaxation = new(couplings, start.Ket!, tolerance); // density operators of this size are in no file
        IReadOnlyList<RelaxationFigures> quiet = relaxation.WithoutPhoton(times);
        double error = quiet[^1].ErrorEstimate;
        if (relaxation.NothingToSample)
        {
            return new RelaxationCurve(
                [.. quiet.Select(f => Estimate.Exact(f.Population))], [.. quiet.Select(f => Estimate.Exact(f.Symmetric))], [.. quiet.Select(f => Estimate.Exact(f.Excitations))],
                quiet, false, error, "the start holds one excitation, so that copies with a photon add nothing: the state vector without a photon is evolved");
        }

        IReadOnlyList<(SampledMean Population, SampledMean Symmetric, SampledMean Excited)> rest =
            relaxation.WithPhotons(times, unchecked((ulong)request.Seed), request.Samples, Confidence, request.Cancellation);
        return new RelaxationCurve(
            [.. quiet.Zip(rest, (f, r) => Sum(f.Population, r.Population, 1 - f.Kept, 1))],
            [.. quiet.Zip(rest, (f, r) => Sum(f.Symmetric, r.Symmetric, 1 - f.Kept, 1))],
            [.. quiet.Zip(rest, (f, r) => Sum(f.Excitations, r.Excited, 1 - f.Kept, couplings.Emitters))],
            quiet,
            true,
            error,
            string.Create(CultureInfo.InvariantCulture, $"copies without a photon are one state vector and exact; what photons add is sampled by {request.Samples} quantum-jump trajectories"));
    }

    /// <summary>An exact part and a sampled one that copies with a photon, of probability <paramref name="most"/>, add.</summary>
    private static Estimate Sum(double exact, SampledMean sampled, double most, double scale) => most <= 0
        ? Estimate.Exact(exact)
        : new(exact + (scale * sampled.Mean), TruthLabel.Sampled, exact + (scale * sampled.Low), exact + (scale * Math.Max(sampled.Mean, Math.Min(sampled.High, most))), sampled.Confidence);
}
