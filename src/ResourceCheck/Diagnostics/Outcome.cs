namespace ResourceCheck.Diagnostics;

/// <summary>What a step returns for input from outside: a value, or the findings that prevented it; notes and warnings may come with a value.</summary>
/// <typeparam name="T">The step's product.</typeparam>
/// <param name="Value">The product; null exactly when an error was found.</param>
/// <param name="Findings">Everything found, in order of place.</param>
public sealed record Outcome<T>(T? Value, IReadOnlyList<Diagnostic> Findings)
    where T : class
{
    /// <summary>Whether there is a value.</summary>
    public bool Succeeded => Value is not null;

    /// <summary>A value without findings.</summary>
    public static Outcome<T> Of(T value) => new(value, []);

    /// <summary>No value, only findings.</summary>
    public static Outcome<T> Failed(IEnumerable<Diagnostic> findings) => new(null, [.. findings]);

    /// <summary>The value when no finding is an error, else only the findings.</summary>
    public static Outcome<T> From(T value, IReadOnlyList<Diagnostic> findings) =>
        findings.Any(f => f.Severity == Severity.Error) ? new(null, findings) : new(value, findings);
}
