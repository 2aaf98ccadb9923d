using ResourceCheck.Judgement.Uncertain;

namespace ResourceCheck.Judgement;

/// <summary>What a user asks for: texts and choices, nothing checked yet.</summary>
public sealed record RunRequest
{
    /// <summary>The script.</summary>
    public required InputText Script { get; init; }

    /// <summary>The conditions; null for ideal ones.</summary>
    public InputText? Conditions { get; init; }

    /// <summary>Overrides of conditions, path and value, in the order given.</summary>
    public IReadOnlyList<KeyValuePair<string, string>> Overrides { get; init; } = [];

    /// <summary>Parameter choices, name and value: a number, a fraction, a list <c>3,4</c>, a range <c>3..8</c>, or <c>all</c>.</summary>
    public IReadOnlyList<KeyValuePair<string, string>> Parameters { get; init; } = [];

    /// <summary>Engine asked for; null lets the program choose.</summary>
    public string? Engine { get; init; }

    /// <summary>Seed of sampled figures.</summary>
    public long Seed { get; init; } = 1;

    /// <summary>Threads; 0 uses all cores.</summary>
    public int Threads { get; init; }

    /// <summary>Stops the evaluation.</summary>
    public CancellationToken Cancellation { get; init; }

    /// <summary>A fraction of runs that are under worse conditions without anybody noticing; null for none.</summary>
    public Drift? Drift { get; init; }

    /// <summary>How the uncertainties of the conditions are carried through to the figures; null leaves them out.</summary>
    public UncertaintyRequest? Uncertainty { get; init; }

    /// <summary>Numbers for cheats in place of the worst ones that a search finds, such as <c>sender splits: n = 84, k1 = 0</c>.</summary>
    public IReadOnlyList<string> Choose { get; init; } = [];

    /// <summary>Whether every assignment of physical levels to the script's values is compared.</summary>
    public bool TryLevels { get; init; }

    /// <summary>Searches made for this request; requests made from it share them.</summary>
    internal AttackMemory Searches { get; } = new();

    /// <summary>Told about the search for the worst numbers; null for nobody.</summary>
    public IProgress<SearchNote>? Progress { get; init; }

    /// <summary>Most memory an engine may take, bytes; null uses what the machine has free.</summary>
    public double? MemoryLimit { get; init; }
}

/// <summary>A drift of the apparatus.</summary>
/// <param name="Fraction">Fraction of runs.</param>
/// <param name="Conditions">Conditions of these runs.</param>
public sealed record Drift(double Fraction, InputText Conditions);

/// <summary>An input file as read.</summary>
/// <param name="Name">Name as the user gave it.</param>
/// <param name="Text">Its content.</param>
/// <param name="Sha256">SHA-256 of its bytes, lower-case hexadecimal.</param>
public sealed record InputText(string Name, string Text, string Sha256);
