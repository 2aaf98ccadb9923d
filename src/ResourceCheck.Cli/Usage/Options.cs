using System.CommandLine;

namespace ResourceCheck.Cli.Usage;

/// <summary>All options. Their values are read as text and checked by us, so that every mistake of a command line is told at once and in our own words.</summary>
internal sealed class Options
{
    /// <summary>Choices of <c>--format</c>.</summary>
    public static readonly string[] Formats = ["text", "json", "csv", "markdown", "latex"];

    /// <summary>Choices of <c>explain --format</c>.</summary>
    public static readonly string[] PageFormats = ["text", "markdown"];

    /// <summary>Choices of <c>--engine</c>.</summary>
    public static readonly string[] Engines = ["dense", "product"];

    public static Option<bool> Help { get; } = new("--help", "-h") { Description = "Show how a command is used.", Recursive = true };

    public Option<bool> Version { get; } = new("--version") { Description = "Show the program's version." };

    public Option<string[]> Under { get; } = Value("--under", "FILE", "Conditions to judge under; without it everything is ideal.");

    public Option<string[]> Set { get; } = Value("--set", "PATH=VALUE", "Override a value of the conditions, such as flight.Dov.length=\"5 km\". May be repeated.");

    public Option<string[]> Parameter { get; } = Value("--parameter", "NAME=VALUE", "Set a parameter: a number, a fraction, a list 3,4, a range 3..8, or all. May be repeated.");

    public Option<string[]> Engine { get; } = Value("--engine", "NAME", "Evaluate with this engine (dense, product) instead of letting the program choose.", Engines);

    public Option<string[]> Memory { get; } = Value("--memory", "SIZE", "Most memory an engine may take, such as \"4 GB\".");

    public Option<string[]> Format { get; } = Value("--format", "FORMAT", "Write text, json, csv, markdown or latex.", Formats);

    public Option<string[]> PageFormat { get; } = Value("--format", "FORMAT", "Write text or markdown.", PageFormats);

    public Option<string[]> Out { get; } = Value("--out", "FILE", "Write the result to a file, whole or not at all, instead of standard output.");

    public Option<string[]> Folder { get; } = Value("--folder", "FOLDER", "Where the report goes; made when absent. Without it STUDY-report, beside the study.");

    public Option<string[]> Figure { get; } = Value("--figure", "FILE.svg", "Draw the result as SVG, with its numbers for pgfplots in FILE.dat beside it.");

    public Option<string[]> Seed { get; } = Value("--seed", "NUMBER", "Seed of sampled figures; the same seed gives the same figures. Default 1.");

    public Option<string[]> Threads { get; } = Value("--threads", "NUMBER", "Threads to use; 0, the default, uses all cores.");

    public Option<string[]> Parties { get; } = Value("--parties", "NUMBER", "Number of emitters, one per party. Default 3.");

    public Option<string[]> Vary { get; } = Value("--vary", "PATH=FROM..TO", "What to vary: a conditions path or a parameter, and its range, such as flight.default.length=\"1 km..20 km:20\" or n=3..4; :log 20 spaces logarithmically.");

    public Option<string[]> Goal { get; } = Value("--until", "GOAL", "Goal to hold, such as \"success >= 0.9\"; without it the script's tightest.");

    public Option<string[]> Choose { get; } = Value("--choose", "CASE: NAME=NUMBER, …", "Numbers for a dishonest case in place of the worst ones that a search finds, such as \"receiver forges: m = 24\". May be repeated.");

    public Option<bool> TryLevels { get; } = new("--try-levels") { Description = "Compare which physical level plays which value of the script." };

    public Option<string[]> Drift { get; } = Value("--drift", "FRACTION:FILE", "A fraction of runs under worse conditions, such as 0.01:worse.conditions.json: what failure and harms become, and the floor under them.");

    public Option<bool> Uncertainty { get; } = new("--uncertainty") { Description = "Carry the standard uncertainties of the conditions, as in \"80(10) us\", through to the figures." };

    public Option<string[]> Failure { get; } = Value("--failure", "PROBABILITY", "What honest failure must not exceed, such as 1e-6; several, separated by commas, make a table.");

    public Option<string[]> Harm { get; } = Value("--harm", "PROBABILITY", "What every harm must not exceed; the same as --failure unless said, and with 1 harms are not looked at.");

    public Option<string[]> Optimise { get; } = Value("--optimise", "NAMES", "Choose these thresholds (parameters with a real range, separated by commas, or all) so that few copies suffice.");

    public Option<string[]> Until { get; } = Value("--until", "TIME", "Last time, such as \"5 ns\"; without it the duration in the conditions.");

    public Option<string[]> Points { get; } = Value("--points", "NUMBER", "Number of times from 0 on. Default 41.");

    public Option<string[]> Samples { get; } = Value("--samples", "NUMBER", "Number of trajectories where figures must be sampled. Default 1000.");

    public Option<string[]> Draws { get; } = Value("--draws", "NUMBER", "Draws that check first-order uncertainties; 0 for none. Default 200.");

    public Option<bool> Quiet { get; } = new("--quiet") { Description = "Show no warnings on standard error; documents still hold them." };

    public Option<bool> Mend { get; } = new("--mend") { Description = "Replace a state that is slightly none by the nearest density matrix, and show both." };

    public Option<bool> Check { get; } = new("--check") { Description = "Write nothing; exit with 1 when the script is not in its one shape." };

    public Option<bool> Write { get; } = new("--write") { Description = "Write the script back in its one shape." };

    public Option<bool> Force { get; } = new("--force") { Description = "Replace files that exist." };

    /// <summary>Whether an option may be given several times.</summary>
    public static bool MayRepeat(Option option) => option.Name is "--set" or "--parameter" or "--vary" or "--choose";

    private static Option<string[]> Value(string name, string helpName, string description, string[]? choices = null)
    {
        Option<string[]> option = new(name) { Description = description, HelpName = helpName, Arity = ArgumentArity.ZeroOrMore, AllowMultipleArgumentsPerToken = false };
        if (choices is not null)
            option.CompletionSources.Add(choices);
        return option;
    }
}
