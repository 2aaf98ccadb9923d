namespace ResourceCheck.Diagnostics;

/// <summary>How grave a finding is: errors stop the work (exit code 2), warnings and notes do not.</summary>
public enum Severity
{
    /// <summary>The input is wrong; nothing is computed.</summary>
    Error,

    /// <summary>The result stands, but the user must know this before using it.</summary>
    Warning,

    /// <summary>Worth knowing.</summary>
    Note,
}
