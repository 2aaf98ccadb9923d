namespace ResourceCheck.Cli;

/// <summary>What every command works with: the words given, the streams, the library.</summary>
/// <param name="Args">The command line as given.</param>
/// <param name="Terminal">Where to speak.</param>
/// <param name="Library">What to call.</param>
internal sealed record Session(IReadOnlyList<string> Args, Terminal Terminal, Library Library);
