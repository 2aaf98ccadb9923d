namespace ResourceCheck.Cli;

/// <summary>What the tool tells a calling script; documented in docs/commands.md.</summary>
internal static class ExitCodes
{
    /// <summary>Computed; goals met, or none set.</summary>
    public const int Done = 0;

    /// <summary>Computed; a goal is not met or undecided, a claim is refuted, or a script is not in its one shape.</summary>
    public const int NotMet = 1;

    /// <summary>The input is wrong.</summary>
    public const int WrongInput = 2;

    /// <summary>No trustworthy result could be had.</summary>
    public const int NoResult = 3;

    /// <summary>A mistake of the program.</summary>
    public const int OwnMistake = 70;

    /// <summary>Interrupted by the user.</summary>
    public const int Interrupted = 130;
}
