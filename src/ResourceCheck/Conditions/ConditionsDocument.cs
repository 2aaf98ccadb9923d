namespace ResourceCheck.Conditions;

/// <summary>A read conditions file: well formed, quantities in SI units, not yet tied to a protocol.</summary>
public sealed record ConditionsDocument
{
    /// <summary>File name as the user gave it.</summary>
    public required string Name { get; init; }

    /// <summary>SHA-256 of the file's bytes (before overrides), lower-case hexadecimal; empty for ideal conditions.</summary>
    public required string Sha256 { get; init; }

    /// <summary>Overrides in the order given.</summary>
    public required IReadOnlyList<KeyValuePair<string, string>> Overrides { get; init; }

    /// <summary>Quantities that carry a standard uncertainty: path, value and uncertainty in SI units.</summary>
    public required IReadOnlyList<UncertainQuantity> Uncertainties { get; init; }
}

/// <summary>A quantity given with its standard uncertainty.</summary>
/// <param name="Path">Path in the conditions file, such as <c>levels.decay[0].lifetime</c>.</param>
/// <param name="Value">Value in SI units.</param>
/// <param name="StandardUncertainty">Standard uncertainty in SI units.</param>
public sealed record UncertainQuantity(string Path, double Value, double StandardUncertainty);
