using System.CommandLine;
using System.CommandLine.Parsing;
using System.Globalization;
using ResourceCheck.Cli.Files;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Quantities;

namespace ResourceCheck.Cli.Usage;

/// <summary>One use of a command: reads its words and gathers everything that is wrong with them.</summary>
internal sealed class Invocation
{
    private readonly ParseResult _parsed;
    private readonly Words _words;
    private readonly InputFiles _files;
    private bool _usesStandardInput;

    /// <summary>Reads the words that belong to no option.</summary>
    public Invocation(ParseResult parsed, Session session)
    {
        _parsed = parsed;
        Session = session;
        _words = new Words(session.Args);
        _files = new InputFiles(session.Terminal.Host);
        Positional = Positionals.Read(parsed, _words, Findings);
        foreach (Option option in Command.Options.Where(o => o.ValueType != typeof(bool)))
            CheckUse(option);
    }

    /// <summary>The session it belongs to.</summary>
    public Session Session { get; }

    /// <summary>Everything found wrong so far.</summary>
    public List<Diagnostic> Findings { get; } = [];

    /// <summary>The words that belong to no option, unknown options left out.</summary>
    public IReadOnlyList<string> Positional { get; }

    /// <summary>The command used.</summary>
    public Command Command => _parsed.CommandResult.Command;

    /// <summary>Whether a switch is on.</summary>
    public bool Has(Option<bool> option) => _parsed.GetValue(option);

    /// <summary>An option's value, or null when it is not given.</summary>
    public string? Text(Option<string[]> option) => _parsed.GetValue(option)?.FirstOrDefault();

    /// <summary>All values of an option that may be repeated.</summary>
    public IReadOnlyList<string> Texts(Option<string[]> option) => _parsed.GetValue(option) ?? [];

    /// <summary>An option's value out of a list.</summary>
    public string? Choice(Option<string[]> option, IReadOnlyList<string> choices)
    {
        string? value = Text(option);
        if (value is not null && !choices.Contains(value))
            Findings.Add(Usage.Findings.UnknownChoice(_words, option.Name, value, choices));
        return value;
    }

    /// <summary>An option's whole number, or a default.</summary>
    public long Whole(Option<string[]> option, long least, long most, long otherwise)
    {
        if (Text(option) is not { } text)
            return otherwise;
        if (long.TryParse(text, NumberStyles.AllowLeadingSign, CultureInfo.InvariantCulture, out long value) && value >= least && value <= most)
            return value;
        string range = string.Create(CultureInfo.InvariantCulture, $"from {least} to {most}");
        Findings.Add(Usage.Findings.NoWholeNumber(_words, option.Name, text, range));
        return otherwise;
    }

    /// <summary>A fraction and a conditions file; null when the option is not given.</summary>
    public Drift? Drift(Option<string[]> option)
    {
        if (Text(option) is not { } text)
            return null;
        int colon = text.IndexOf(':', StringComparison.Ordinal);
        bool reads = double.TryParse(text[..Math.Max(0, colon)], NumberStyles.Float, CultureInfo.InvariantCulture, out double fraction) && fraction is > 0 and <= 1 && colon < text.Length - 1;
        if (!reads)
            Findings.Add(Usage.Findings.NoDrift(_words, text));
        return reads && Read(text[(colon + 1)..]) is { } file ? new Drift(fraction, file) : null;
    }

    /// <summary>An option's probability, above 0 and up to 1; null when it is not given.</summary>
    public double? Probability(Option<string[]> option)
    {
        if (Text(option) is not { } text)
            return null;
        double? value = ProbabilityOf(text);
        if (value is null)
            Findings.Add(Usage.Findings.NoProbability(_words, option.Name, text));
        return value;
    }

    /// <summary>An option's probabilities, separated by commas; empty when it is not given.</summary>
    public IReadOnlyList<double> Probabilities(Option<string[]> option)
    {
        List<double> probabilities = [];
        foreach (string part in Text(option)?.Split(',', StringSplitOptions.TrimEntries) ?? [])
        {
            if (ProbabilityOf(part) is { } value)
                probabilities.Add(value);
            else
                Findings.Add(Usage.Findings.NoProbability(_words, option.Name, part, Text(option)));
        }

        return probabilities;
    }

    private static double? ProbabilityOf(string text) => double.TryParse(text, NumberStyles.Float, CultureInfo.InvariantCulture, out double value) && value is > 0 and <= 1 ? value : null;

    /// <summary>An option's memory size in bytes, or null when it is not given.</summary>
    public double? Memory(Option<string[]> option)
    {
        if (Text(option) is not { } text)
            return null;
        double? size = MemorySize.Parse(text);
        if (size is null)
            Findings.Add(Usage.Findings.NoMemorySize(_words, text));
        return size;
    }

    /// <summary>An option's time in seconds, or null when it is not given.</summary>
    public double? Time(Option<string[]> option)
    {
        if (Text(option) is not { } text)
            return null;
        if (Durations.TryParse(text, out double seconds))
            return seconds;
        Findings.Add(Usage.Findings.NoTime(_words, option.Name, text));
        return null;
    }

    /// <summary>An option's pairs of name and value, in the order given.</summary>
    public IReadOnlyList<KeyValuePair<string, string>> Pairs(Option<string[]> option, string example)
    {
        List<KeyValuePair<string, string>> pairs = [];
        foreach (string text in _parsed.GetValue(option) ?? [])
        {
            int equals = text.IndexOf('=', StringComparison.Ordinal);
            string name = equals < 0 ? "" : text[..equals].Trim();
            if (name.Length == 0 || equals == text.Length - 1)
                Findings.Add(Usage.Findings.NoPair(_words, option.Name, text, example));
            else if (pairs.Any(p => p.Key == name))
                Findings.Add(Usage.Findings.NameTwice(_words, option.Name, name, text));
            else
                pairs.Add(new(name, text[(equals + 1)..].Trim()));
        }

        return pairs;
    }

    /// <summary>The only positional word; a missing or superfluous one is a finding.</summary>
    /// <param name="needs">What is needed, such as <c>a script</c>.</param>
    /// <param name="optional">Whether it may be left out.</param>
    public string? Only(string needs, bool optional = false)
    {
        if (Positional.Count == 0 && !optional && !HasStrayWords)
            Findings.Add(Usage.Findings.MissingWord(Command.Name, needs));
        foreach (string word in Positional.Skip(1))
            Findings.Add(Usage.Findings.OneWordTooMany(_words, word, Command.Name, needs));
        return Positional.Count > 0 ? Positional[0] : null;
    }

    /// <summary>Reads a file that an input file names; null when it cannot be read, with the reason added to the findings given.</summary>
    public InputText? ReadBeside(string name, List<Diagnostic> findings) => _files.Read(name, findings);

    /// <summary>Reads an input file; null when there is none or it cannot be read.</summary>
    public InputText? Read(string? name)
    {
        if (name is null)
            return null;
        bool twice = name == InputFiles.StandardInput && _usesStandardInput;
        _usesStandardInput |= name == InputFiles.StandardInput;
        if (!twice)
            return _files.Read(name, Findings);
        Findings.Add(Usage.Findings.InputTwice());
        return null;
    }

    /// <summary>Two switches that must not stand together.</summary>
    public void Exclude(Option first, Option second)
    {
        if (Given(first) && Given(second))
            Findings.Add(Usage.Findings.Excluding(_words, first.Name, second.Name));
    }

    private bool Given(Option option) => option is Option<bool> flag ? Has(flag) : Text((Option<string[]>)option) is not null;

    // A missing word beside an unknown option is most likely that option's doing: one slip, one error.
    private bool HasStrayWords => Findings.Any(f => f.Code == "U002");

    private void CheckUse(Option option)
    {
        if (_parsed.GetResult(option) is not OptionResult { Implicit: false } use)
            return;
        if (use.Tokens.Count < use.IdentifierTokenCount)
            Findings.Add(Usage.Findings.NoValue(_words, option.Name, option.HelpName ?? "a text"));
        else if (use.IdentifierTokenCount > 1 && !Options.MayRepeat(option))
            Findings.Add(Usage.Findings.GivenTwice(_words, option.Name));
    }
}
