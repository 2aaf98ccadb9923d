using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions;

/// <summary>How the shared state starts: from a preparation, then mixed with white noise.</summary>
/// <param name="Preparation">Where the state comes from.</param>
/// <param name="White">Fraction of white noise mixed in.</param>
public sealed record ResourceModel(StatePreparation Preparation, double White)
{
    /// <summary>The antisymmetric state itself.</summary>
    public static ResourceModel Ideal { get; } = new(new IdealPreparation(), 0);

    /// <summary>
    /// Element v is the physical level that plays value v of the script; null when every level plays itself. States from files and
    /// from exchange pulses come in physical levels and are to be reordered by it; a <see cref="World"/>'s noise already is.
    /// </summary>
    public IReadOnlyList<int>? PhysicalLevels { get; init; }
}

/// <summary>Where the shared state comes from.</summary>
public abstract record StatePreparation;

/// <summary>The antisymmetric state itself.</summary>
public sealed record IdealPreparation : StatePreparation;

/// <summary>A prepared state read from a file (page 7); checked when it is read.</summary>
/// <param name="File">File name, resolved against the conditions file.</param>
/// <param name="Mend">Whether the nearest density matrix is used when the file's is not one.</param>
public sealed record FilePreparation(string File, bool Mend) : StatePreparation;

/// <summary>What collective decay leaves of a start.</summary>
/// <param name="Start">Where relaxation starts.</param>
/// <param name="Decay">How the emitters decay, and for how long.</param>
public sealed record RelaxedPreparation(RelaxedStart Start, CollectiveModel Decay) : StatePreparation;

/// <summary>Start of relaxation; exactly one of its parts is set.</summary>
/// <param name="Levels">Level of each emitter.</param>
/// <param name="Bystanders">The first two emitters share (|01⟩-|10⟩)/√2, the others are in these levels.</param>
/// <param name="File">A prepared state's file.</param>
public sealed record RelaxedStart(IReadOnlyList<int>? Levels, IReadOnlyList<int>? Bystanders, string? File);

/// <summary>Built by exchange pulses (page 4), one step per further party, with errors in the last step or in each.</summary>
/// <param name="Steps">One entry per step 1→2, 2→3, …; entry s prepares s+2 parties.</param>
public sealed record ExchangePreparation(IReadOnlyList<ExchangeStep> Steps) : StatePreparation;

/// <summary>One step of exchange preparation from m-1 to m parties.</summary>
/// <param name="TimeError">Added to the pulse time, in units of the inverse coupling.</param>
/// <param name="PhaseError">Added to the local phase, rad.</param>
/// <param name="Couplings">m×m, symmetric, diagonal 0: strength of each exchange, nominally 1.</param>
public sealed record ExchangeStep(double TimeError, double PhaseError, double[,] Couplings);
