using ResourceCheck.Diagnostics;

namespace ResourceCheck.Cli.Usage;

/// <summary>All messages about command lines and files. Their causes and cures at length stand in the library's catalogue.</summary>
internal static class Findings
{
    /// <summary>The name that users type.</summary>
    public const string Program = "resourcecheck";

    public static Diagnostic NoCommand(IEnumerable<string> commands) =>
        new("U001", Severity.Error, $"A command is missing: {Diagnostics.Words.Or(commands)} fit here.", "resourcecheck --help explains them.", Place.Of("the command line"));

    public static Diagnostic UnknownCommand(Words words, string word, IReadOnlyList<string> commands) => new(
        "U001", Severity.Error, $"`{word}` is no command: {Diagnostics.Words.Or(commands)} fit here.", Suggest(NearWords.Find(word, commands), "resourcecheck --help explains them."), words.PlaceOf(word));

    public static Diagnostic UnknownOption(Words words, string word, string command, IReadOnlyList<string> options)
    {
        string name = word.Split('=')[0];
        string help = command == Program ? $"{Program} --help" : $"{Program} {command} --help";
        return new("U002", Severity.Error, $"`{name}` is no option of {command}: {Diagnostics.Words.Or(options)} fit here.", Suggest(NearWords.Find(name, options), $"{help} explains them."), words.PlaceOf(word));
    }

    public static Diagnostic OneWordTooMany(Words words, string word, string command, string takes) => new(
        "U003", Severity.Error, $"`{word}` is one word too many: {command} takes {takes}.", "remove it; conditions are given with --under, and names with blanks are put in quotes.", words.PlaceOf(word));

    public static Diagnostic NoValue(Words words, string option, string needs) =>
        new("U004", Severity.Error, $"{option} needs a value: {needs}.", $"give it behind {option}.", words.PlaceOf(option));

    public static Diagnostic GivenTwice(Words words, string option) =>
        new("U005", Severity.Error, $"{option} is given more than once, but takes one value.", "keep one of them.", words.PlaceOfLast(option));

    public static Diagnostic MissingWord(string command, string needs) =>
        new("U006", Severity.Error, $"{command} needs {needs}.", $"add it behind {command}; resourcecheck {command} --help shows how.", Place.Of("the command line"));

    public static Diagnostic UnknownChoice(Words words, string option, string value, IReadOnlyList<string> choices) => new(
        "U007", Severity.Error, $"`{value}` is no choice of {option}: {Diagnostics.Words.Or(choices)} {(choices.Count == 1 ? "fits" : "fit")} here.", Suggest(NearWords.Find(value, choices), $"choose {Diagnostics.Words.Or(choices)}."), words.PlaceOf(value, option));

    public static Diagnostic NoPair(Words words, string option, string value, string example) => new(
        "U008", Severity.Error, $"`{value}` behind {option} is not of the form name=value.", $"write {option} {example}.", words.PlaceOf(value, option));

    public static Diagnostic NoWholeNumber(Words words, string option, string value, string range) => new(
        "U009", Severity.Error, $"`{value}` is no value for {option}: a whole number {range} fits here.", "write it in decimal digits, without point, unit or separators.", words.PlaceOf(value, option));

    public static Diagnostic NoTime(Words words, string option, string value) => new(
        "U014", Severity.Error, $"`{value}` is no time for {option}: a number above 0 with its unit fits here.", $"write for example {option} \"5 ns\".", words.PlaceOf(value, option));

    public static Diagnostic NoMemorySize(Words words, string value) => new(
        "U010", Severity.Error, $"`{value}` is no memory size: a number above 0 with B, kB, MB, GB, TB, KiB, MiB, GiB or TiB fits here.", "write for example \"4 GB\".", words.PlaceOf(value, "--memory"));

    public static Diagnostic Excluding(Words words, string first, string second) =>
        new("U011", Severity.Error, $"{first} and {second} exclude each other.", "leave out one of the two.", words.PlaceOf(second));

    public static Diagnostic NameTwice(Words words, string option, string name, string pair) =>
        new("U012", Severity.Error, $"{option} sets `{name}` more than once.", "keep one of them.", words.PlaceOfLast(pair));

    public static Diagnostic NoSuchFile(string name, string? near) =>
        new("U020", Severity.Error, $"There is no file `{name}`.", Suggest(near, "check the spelling; names are relative to the folder you are in."), Place.Of(name));

    public static Diagnostic IsFolder(string name) =>
        new("U021", Severity.Error, $"`{name}` is a folder, but a file is needed here.", "name a file in it.", Place.Of(name));

    public static Diagnostic Unreadable(string name, string reason) =>
        new("U022", Severity.Error, $"`{name}` cannot be read: {Sentence(reason)}", "check its permissions and the disk.", Place.Of(name));

    public static Diagnostic NotUtf8(string name, int line, long offset) => new(
        "U023", Severity.Error, $"`{name}` is not UTF-8 text: the bytes from offset {Digits(offset)}, on line {Digits(line)}, are no character.", "save it as UTF-8.", new Place(name, line, 1, null, 0, 0));

    public static Diagnostic TooLarge(string name, long most) => new(
        "U024", Severity.Error, $"`{name}` is larger than {Digits(most / 1_000_000)} MB, far beyond what a script or a conditions file needs.", "name the right file.", Place.Of(name));

    public static Diagnostic InputTwice() =>
        new("U025", Severity.Error, "The name - stands for standard input, which can be read only once, but is given twice.", "give one of the two as a file.", Place.Of("the command line"));

    public static Diagnostic NoFolder(string name, string folder) =>
        new("U030", Severity.Error, $"`{name}` cannot be written: there is no folder `{folder}`.", "make the folder first, or choose another.", Place.Of(name));

    public static Diagnostic NotWritten(string name, string reason) =>
        new("U031", Severity.Error, $"`{name}` cannot be written: {Sentence(reason)}", "check permissions and free space, or choose another name.", Place.Of(name));

    public static Diagnostic Exists(string name) =>
        new("U032", Severity.Error, $"`{name}` exists already, and new writes no file over another.", "choose another name, or add --force to replace it.", Place.Of(name));

    public static Diagnostic NoProbability(Words words, string option, string text) =>
        new("U042", Severity.Error, $"`{text}` is no probability for {option}: a number above 0 and up to 1, such as 1e-6, fits here.", "write for example 1e-6 or 0.001.", words.PlaceOf(text, option));

    public static Diagnostic NoDrift(Words words, string text) =>
        new("U043", Severity.Error, $"`{text}` is no drift: a fraction above 0 and up to 1, a colon and a conditions file fit here.", "write for example --drift 0.01:worse.conditions.json.", words.PlaceOf(text, "--drift"));

    public static Diagnostic UnfitName(string name) =>
        new("U033", Severity.Error, $"`{name}` is no name for new files.", "give a name such as study or work/study.", Place.Of("the command line"));

    public static Diagnostic OverInput(string name) =>
        new("U035", Severity.Error, $"--out {name} would write over a file that is read here.", "choose another name for the result.", Place.Of("--out"));

    public static Diagnostic OutputRefused(string reason) =>
        new("U034", Severity.Error, $"Standard output cannot be written: {Sentence(reason)}", "free some space, or send the result elsewhere with --out.", Place.Of("standard output"));

    public static Diagnostic UnknownCode(string code, IReadOnlyList<string> known)
    {
        string[] family = [.. known.Where(k => code.Length > 0 && k[0] == char.ToUpperInvariant(code[0])).Take(6)];
        return new("U040", Severity.Error, $"There is no message `{code}`{(family.Length > 0 ? $"; near it are {string.Join(", ", family)}" : "")}.", "resourcecheck explain lists all codes.", Place.Of("the command line"));
    }

    public static Diagnostic UnknownSchema(string name, IReadOnlyList<string> known) => new(
        "U041", Severity.Error, $"There is no schema `{name}`: {Diagnostics.Words.Or(known)} fit here.", Suggest(NearWords.Find(name, known), $"choose {Diagnostics.Words.Or(known)}."), Place.Of("the command line"));

    public static Diagnostic OutOfMemory() =>
        new("U090", Severity.Error, "The work needs more memory than there is, so no result could be had.", "use a smaller case, or set --memory so that a leaner engine is chosen.", Place.Of("the machine"));

    public static Diagnostic OwnMistake(Exception mistake, string version) => new(
        "U099", Severity.Error, $"ResourceCheck {version} made a mistake of its own ({mistake.GetType().Name}); no result could be had, and your input need not be wrong.", "report this message with the command line and the input files; RESOURCECHECK_TRACE=1 shows details.", Place.Of("the program"));

    private static string Suggest(string? near, string otherwise) => near is null ? otherwise : $"did you mean {near}?";

    private static string Sentence(string reason) => reason.EndsWith('.') ? reason : reason + ".";

    private static string Digits(long number) => number.ToString(System.Globalization.CultureInfo.InvariantCulture);
}
