using ResourceCheck.Engines.Lists;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Engines;

/// <summary>What an engine found for one plan and one assignment of the private inputs. Everything but <see cref="Yield"/>'s factors is of kept copies.</summary>
public sealed record Evaluation
{
    /// <summary>Which engine and why.</summary>
    public required EngineChoice Engine { get; init; }

    /// <summary>Values of the private inputs, in the order of <see cref="Protocol.Inputs"/>.</summary>
    public required IReadOnlyList<Value> Inputs { get; init; }

    /// <summary>Probability that all heralded qudits arrived.</summary>
    public required double Heralded { get; init; }

    /// <summary>Of the heralded, those not dropped for a measurement without a click; 1 when the script handles none itself. A copy that a <c>keep</c> drops is not measured further.</summary>
    public required double Seen { get; init; }

    /// <summary>Of those, the ones that every <c>keep</c> kept.</summary>
    public required double Kept { get; init; }

    /// <summary>Heralded · seen · kept.</summary>
    public double Yield => Heralded * Seen * Kept;

    /// <summary>Probability of success.</summary>
    public required Estimate Success { get; init; }

    /// <summary>Probability of failure, summed by itself and not as 1 - success.</summary>
    public required Estimate Failure { get; init; }

    /// <summary>Probability that a party gave up.</summary>
    public required Estimate Abort { get; init; }

    /// <summary>Probability of harm under the cheating strategy at hand; null in the honest case.</summary>
    public Estimate? Harm { get; init; }

    /// <summary>Law of one kept copy, for protocols on lists: what the rounds leave in the slots, with its probability. Empty otherwise.</summary>
    public IReadOnlyList<CopyType> Copies { get; init; } = [];

    /// <summary>How verdicts on lists were found, in a sentence; null for a protocol on single copies.</summary>
    public string? ListMethod { get; init; }

    /// <summary>Checkpoints in order: prepared, stored, arrived, then the script's.</summary>
    public required IReadOnlyList<CheckpointEvaluation> Checkpoints { get; init; }

    /// <summary>The script's reports in order; see <see cref="Protocol.Reports"/>.</summary>
    public required IReadOnlyList<Estimate> Reports { get; init; }

    /// <summary>The sides of the script's claims in order: left, right.</summary>
    public required IReadOnlyList<(Estimate Left, Estimate Right)> Claims { get; init; }

    /// <summary>Estimated error of integrating collective decay, in probabilities; 0 when there was none.</summary>
    public double IntegrationError { get; init; }

    /// <summary>Outcomes of whole runs, most probable first, at most a handful.</summary>
    public required IReadOnlyList<BranchEvaluation> Ends { get; init; }

    /// <summary>Outcomes in which the success condition fails, most probable first, at most a handful.</summary>
    public required IReadOnlyList<BranchEvaluation> Failures { get; init; }
}

/// <summary>A checkpoint's figures.</summary>
/// <param name="Label">Its label.</param>
/// <param name="Fidelity">Fidelity with the antisymmetric state, of the copies kept so far.</param>
/// <param name="Kept">Fraction of prepared copies kept so far (heralds, clicks and keeps before it).</param>
/// <param name="At">Time of the look, s.</param>
/// <param name="Branches">Fidelity by announced and private outcomes so far, most probable first.</param>
public sealed record CheckpointEvaluation(string Label, Estimate Fidelity, double Kept, double At, IReadOnlyList<BranchEvaluation> Branches);

/// <summary>One history of outcomes.</summary>
/// <param name="Outcomes">Names and values, such as <c>Dov.k = 1</c>.</param>
/// <param name="Probability">Its probability among kept copies.</param>
/// <param name="Fidelity">Fidelity in this branch; null where there is none to tell.</param>
public sealed record BranchEvaluation(IReadOnlyList<KeyValuePair<string, string>> Outcomes, double Probability, double? Fidelity);

/// <summary>An engine and the reason it was chosen.</summary>
/// <param name="Name"><c>dense</c>, <c>product</c> or <c>sampled</c>.</param>
/// <param name="Reason">One sentence.</param>
/// <param name="MemoryBytes">Estimated memory.</param>
/// <param name="Work">Estimated number of multiplications.</param>
public sealed record EngineChoice(string Name, string Reason, double MemoryBytes, double Work);
