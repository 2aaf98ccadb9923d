using System.Numerics;
using ResourceCheck.Conditions.Json;
using ResourceCheck.Conditions.Keys;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts;

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

    /// <summary>Every number in the file, in the order written, with the path by which <c>--set</c> changes it.</summary>
    public IReadOnlyList<NumericPath> Numbers => [.. SettingWalk.NumbersOf(Root).Select(n => new NumericPath(n.Path, n.Value, UnitTable.BaseSymbolOf(n.Dimension)))];

    /// <summary>The checked tree.</summary>
    internal GroupSetting Root { get; init; } = new(new Spot(new SourceText("", ""), new Span(0, 0), true), "", KeyTable.Root, []);

    /// <summary>Matrices read from files, by the path of the setting that names them.</summary>
    internal IReadOnlyDictionary<string, IReadOnlyList<Complex[,]>> Matrices { get; init; } = new Dictionary<string, IReadOnlyList<Complex[,]>>();
}

/// <summary>A number of a conditions file.</summary>
/// <param name="Path">Its path, such as <c>flight.default.length</c>.</param>
/// <param name="Value">Its value, in <paramref name="Unit"/>.</param>
/// <param name="Unit">Base unit, such as <c>s</c>; empty for a plain number.</param>
public sealed record NumericPath(string Path, double Value, string Unit);

/// <summary>A quantity given with its standard uncertainty.</summary>
/// <param name="Path">Path in the conditions file, such as <c>levels.decay[0].lifetime</c>.</param>
/// <param name="Value">Value in SI units.</param>
/// <param name="StandardUncertainty">Standard uncertainty in SI units.</param>
public sealed record UncertainQuantity(string Path, double Value, double StandardUncertainty)
{
    /// <summary>Unit as written, such as <c>us</c>; empty for a plain number.</summary>
    public string Unit { get; init; } = "";

    /// <summary>SI unit of <see cref="Value"/>, such as <c>s</c>; empty for a plain number.</summary>
    public string BaseUnit { get; init; } = "";
}
