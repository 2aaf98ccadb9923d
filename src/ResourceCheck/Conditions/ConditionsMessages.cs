using System.Globalization;
using ResourceCheck.Conditions.Json;
using ResourceCheck.Conditions.Keys;
using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions;

/// <summary>Every text about conditions files, in one place: form (C001–C009), values (C010–C029), what keys say together (C030–C039), files (C040–C049), protocols (C050–C069), overrides (C070–C079).</summary>
internal static class ConditionsMessages
{
    // form of the file
    public static Diagnostic NotJson(Spot at, string found) =>
        Error("C001", at,
            $"`{found}` does not fit here: JSON is made of objects, lists, texts in double quotes, numbers, true and false.",
            "check the quotes, commas and colons around it");

    public static Diagnostic EndsTooEarly(Spot at) =>
        Error("C001", at,
            "The text ends before its JSON is complete.",
            "close every quote and bracket; the smallest conditions file is {}, the smallest matrix [[1]]");

    public static Diagnostic MissingComma(Spot at) =>
        Error("C001", at,
            "A comma is missing before this.",
            "put a comma behind the value before it");

    public static Diagnostic DecimalComma(Spot at) =>
        Error("C001", at,
            "A comma separates values here, so it cannot be part of a number.",
            "write the number with a point: 0.5");

    public static Diagnostic RootNoObject(Node root) =>
        Error("C001", root.Spot,
            $"A conditions file holds one object, not {root.Kind}.",
            "put everything between { and }");

    public static Diagnostic BrokenText(Spot at) =>
        Error("C001", at,
            "This text holds half of a two-part character code.",
            "write the character itself");

    public static Diagnostic Comment(Spot at) =>
        Error("C002", at,
            "Comments have no place in JSON.",
            "move the words to `about`, or take them out");

    public static Diagnostic TrailingComma(Spot at) => Error("C003", at, "Nothing follows this comma.", "take the comma out");

    public static Diagnostic DuplicateKey(Spot at, string name, Spot first) =>
        Error("C004", at, $"`{name}` is given a second time; the first is {first.InWords()}.", "keep one of them");

    public static Diagnostic Null(Spot at, string path, Shape shape) =>
        Error("C005", at, $"`{path}` is null, but {shape.InWords} fits there.", "give the value, or leave the key out");

    public static Diagnostic TooDeep(Spot at, int most) =>
        Error("C006", at,
            $"Objects and lists lie more than {most} deep here; no key needs that.",
            "take out the needless brackets");

    public static Diagnostic TooLarge(string file, int length) =>
        new("C007", Severity.Error, $"The text has {length} characters; conditions of more than {JsonTree.MaxLength} are not read.", "check that this is the conditions file", Place.Of(file));

    public static Diagnostic TooMany(string file, int most) =>
        new("C008", Severity.Error, $"There are more than {most} mistakes; the rest is left out.", "mend these first", Place.Of(file));

    public static Diagnostic TrailingContent(Spot at) =>
        Error("C009", at,
            "The conditions have ended before this.",
            "keep one object in the file");

    // values
    public static Diagnostic UnknownKey(Spot at, string name, string path, IEnumerable<string> known)
    {
        List<string> names = [.. known.Where(k => k != "$schema")];
        string where = path.Length == 0 ? "of a conditions file" : $"of `{path}`";
        return Error("C010", at,
            $"`{name}` is no key {where}: {Phrase.Or(names)} fit there.",
            NearWords.Find(name, names) is { } near ? $"did you mean {near}?" : "use one of these keys");
    }

    public static Diagnostic WrongKind(Node node, string path, Shape shape) =>
        Error("C011", node.Spot, $"`{path}` is {node.Kind}, but {shape.InWords} fits there.", "write it in that form");

    public static Diagnostic UnitMissing(Spot at, string path, string written, QuantityShape shape) =>
        Error("C012", at,
            $"`{path}` needs a unit: {shape.InWords} fits there, not the bare number {written}.",
            $"write \"{written} {UnitOf(shape.Example)}\" if {UnitOf(shape.Example)} is meant");

    public static Diagnostic UnknownUnit(Spot at, string path, string unit, Shape shape)
    {
        List<string> units = [.. UnitsOf(shape)];
        string fits = units.Count == 0 ? "a plain number without a unit" : Phrase.Or(units);
        string cure = unit == "%" ? "divide by 100: per cent are not taken" : NearUnit(unit, units) is { } near ? $"did you mean {near}?" : $"write {shape.InWords}";
        return Error("C013", at, $"`{unit}` is no unit known here: {fits} fit{(units.Count > 1 ? "" : "s")} `{path}`.", cure);
    }

    public static Diagnostic WrongDimension(Spot at, string path, ParsedQuantity found, QuantityShape shape)
    {
        (Dimension given, Dimension wanted) = (found.Unit!.Dimension, shape.Fits[0]);
        string value = found.Value.ToString("R", CultureInfo.InvariantCulture);
        if (given == Dimension.Frequency && wanted == Dimension.Rate)
            return Error("C015", at,
                $"`{path}` is a rate Γ, given per second; {found.UnitText} counts cycles: a linewidth of Γ/2π in Hz belongs to the rate Γ = 2π·linewidth in /s.",
                $"write \"{TwoPiTimes(found.Value)} /s\" if {value} Hz is a linewidth, \"{value} /s\" if it is the rate itself");
        if (given == Dimension.Rate && wanted == Dimension.Frequency)
            return Error("C015", at,
                $"`{path}` is a frequency Γ/2π, given in Hz; {found.UnitText} is the unit of a rate Γ, which is 2π times as large.",
                "use the key `rate` for a rate in /s, or divide by 2π and write Hz");
        return Error("C014", at,
            $"`{path}` is {UnitTable.NameOf(wanted)}, but {found.UnitText} is a unit of {Bare(given)}: {Phrase.Or(UnitsOf(shape))} fit there.",
            $"write {shape.InWords}");
    }

    public static Diagnostic UnitNotWanted(Spot at, string path, string unit, NumberShape shape) =>
        Error("C014", at, $"`{path}` is a plain number and takes no unit such as {unit}: {shape.InWords} fits there.", "take the unit out");

    public static Diagnostic NoNumber(Spot at, string path, string written, Shape shape) =>
        Error("C016", at,
            $"`{Cut(written)}` is not {shape.InWords}, which fits `{path}`.",
            "begin with the number, digits with a point if need be");

    public static Diagnostic CommaInNumber(Spot at, string path, string written) =>
        Error("C016", at,
            $"`{Cut(written)}` has a comma, which no number in `{path}` may have.",
            $"write a point: {Cut(written).Replace(',', '.')}");

    public static Diagnostic OutOfBounds(Spot at, string path, string written, Bounds bounds, Shape shape) => bounds switch
    {
        Bounds.Probability => Error("C017", at, $"`{path}` is {written}, but only numbers from 0 to 1 fit there.", written.StartsWith('-') ? "take the sign out" : "divide by 100 if per cent were meant"),
        Bounds.Positive => Error("C017", at, $"`{path}` is {written}, but it must be above 0: {shape.InWords} fits there.", "leave the key out if there is no such thing"),
        _ => Error("C017", at, $"`{path}` is {written}, but it must not be below 0: {shape.InWords} fits there.", "take the sign out"),
    };

    public static Diagnostic NoLevel(Spot at, string path, string written) =>
        Error("C018", at, $"`{path}` is {written}, but levels are numbered by whole numbers 0, 1, 2 and so on.", "write a whole number");

    public static Diagnostic NotFinite(Spot at, string path, string written) =>
        Error("C019", at, $"`{path}` is {Cut(written)}, which is too large or too small to compute with.", "check the exponent");

    public static Diagnostic NoSuchWord(Spot at, string path, string written, WordShape shape) =>
        Error("C020", at, $"`{Cut(written)}` does not fit `{path}`: {shape.InWords} does.", $"write {shape.InWords}");

    public static Diagnostic MissingKey(Spot at, string path, IReadOnlyList<Key> keys) =>
        Error("C021", at,
            $"`{path}` lacks {Phrase.Or(keys.Select(k => $"`{k.Name}`"))}.",
            $"give {Phrase.Or(keys.Select(k => $"`{k.Name}` ({k.Shape.InWords})"))}");

    public static Diagnostic Exclusive(Spot at, string path, string first, string second) =>
        Error("C022", at, $"`{path}` has both `{first}` and `{second}`, of which only one can hold.", "keep one of them");

    public static Diagnostic ListLength(ArrayNode node, string path, ListShape shape) =>
        Error("C023", node.Spot,
            $"`{path}` has {Entries(node.Items.Count)}, but {shape.InWords} fits there.",
            shape.Least == shape.Most ? $"give {shape.Most} entries" : $"give {shape.Least} to {shape.Most} entries");

    public static Diagnostic BadMapKey(Spot at, string path, string name, MapShape shape) => Error(
        "C024",
        at,
        shape.Keys switch
        {
            MapKey.Level => $"`{Cut(name)}` is no level: the keys of `{path}` are level numbers such as \"1\".",
            MapKey.LevelPair => $"`{Cut(name)}` is no pair of levels: the keys of `{path}` name two different levels, such as \"0-1\".",
            MapKey.QuditPair => $"`{Cut(name)}` is no pair of qudits: the keys of `{path}` name two different qudits, counted from 1, such as \"1-3\".",
            _ => $"`{Cut(name)}` is no pair of parties: the keys of `{path}` name two different parties, such as \"Ada-Ben\" or \"P[1]-P[2]\".",
        },
        $"write it like \"{shape.KeyExample}\"");

    public static Diagnostic WrongCount(Spot at, string path, int found, int wanted, string what) =>
        Error("C061", at,
            $"`{path}` has {found} entries, but the protocol has {wanted} {what}.",
            "give one entry for each");

    public static Diagnostic ShapeNeedsSpacing(Spot at, string path, string shape) =>
        Error("C062", at,
            $"A {shape} needs the distance of its neighbours, but `{path}.spacing` is missing.",
            "write for example \"spacing\": \"0.1 wavelengths\"");

    public static Diagnostic PairOfTwo(Spot at, int parties) =>
        Error("C063", at,
            $"A pair has two emitters, but the protocol has {parties}: ring, chain, point or `positions` fit here.",
            "choose another shape");

    public static Diagnostic WavelengthNeeded(Spot at, string path) =>
        Error("C064", at,
            $"`{path}` is in metres, and no `wavelength` says how long that is for the light.",
            "give `wavelength`, or the length in wavelengths");

    public static Diagnostic NoStorage(string file) =>
        new("C066", Severity.Error, "These conditions have no `storage` section, so there is nothing to follow.", "add one, such as {\"shape\": \"ring\", \"spacing\": \"0.1 wavelengths\", \"linewidth\": \"6.07 MHz\", \"duration\": \"5 ns\"}", Place.Of(file));

    public static Diagnostic NoRelaxation(string file) =>
        new("C068", Severity.Error, "These conditions have no `resource.relaxed` section, so there is nothing to follow.", "add one, such as {\"resource\": {\"relaxed\": {\"shape\": \"point\", \"linewidth\": \"6.07 MHz\", \"start\": {\"bystanders\": [2]}, \"time\": \"50 ns\"}}}", Place.Of(file));

    public static Diagnostic BadGeometry(Spot at, string what, string cure) => Error("C065", at, what, cure);

    public static Diagnostic KeyBesideParties(Spot at, string path, string name) =>
        Error("C026", at,
            $"`{name}` stands beside party names in `{path}`: a section either holds keys for everybody, or `default` and party names.",
            $"move `{name}` into `default`");

    public static Diagnostic PairTwice(Spot at, string path, string name) =>
        Error("C027", at,
            $"The pair `{name}` is given twice in `{path}`.",
            "keep one of them; the order within a pair does not matter");

    public static Diagnostic NoPartyName(Spot at, string name) =>
        Error("C028", at,
            $"`{Cut(name)}` is no party name: parties are named like Dov, members of a family like P[3] or P[2..5].",
            "use the name as the script has it");

    public static Diagnostic BadText(Spot at, string path, TextShape shape) =>
        Error("C029", at,
            $"`{path}` must be {shape.InWords}.",
            shape.IsFile ? "write the name of a file, relative to the conditions file" : "put everything in one line");

    // what keys say together
    public static Diagnostic LengthWithoutSpeed(Spot at, string path) =>
        Error("C030", at,
            $"`{path}` is given without a speed, so that the time of flight is not known.",
            "add \"speed\": \"2.04e8 m/s\" beside it, or to `default`, or give `time`");

    public static Diagnostic BranchingSum(Spot at, string path, double sum) =>
        Error("C031", at,
            $"The fractions in `{path}` add up to {Number(sum)}, but a level that decays must go somewhere: they must add up to 1.",
            "name every branch, or scale the fractions");

    public static Diagnostic DecayOntoItself(Spot at, string path, int level) =>
        Error("C032", at,
            $"`{path}` lets level {level} decay to itself.",
            "name two different levels");

    public static Diagnostic SameLevelTwice(Spot at, string path, int level) =>
        Error("C032", at,
            $"`{path}` names level {level} twice.",
            "name two different levels");

    public static Diagnostic BranchTwice(Spot at, string path, int from, int to) =>
        Error("C033", at,
            $"`{path}` gives the branch from level {from} to level {to} a second time.",
            "give each branch once, with its whole rate");

    public static Diagnostic ConfusionSum(Spot at, string path, double sum) =>
        Error("C034", at,
            $"The row `{path}` adds up to {Number(sum)}, but some outcome is always read: each row must add up to 1.",
            "mend the row; rows are true outcomes, columns the outcomes read");

    public static Diagnostic NotSquare(Spot at, string path, int found, int wanted) =>
        Error("C034", at,
            $"The row `{path}` has {Entries(found)}, but the matrix has {wanted} rows.",
            $"give {wanted} entries");

    public static Diagnostic PairBothWays(Spot at, string path, string pair) =>
        Error("C035", at,
            $"`{path}` gives {pair} a dephasing time although `coherence` already covers them.",
            "give `coherence` (T2, decay included) or `dephasingTime` (pure dephasing alone), never both for one pair");

    public static Diagnostic NoPermutation(Spot at, string path, int count) =>
        Error("C036", at,
            $"`{path}` must name each of the {count} levels 0 to {count - 1} once.",
            "say for each value of the script which physical level plays it, such as [2, 0, 1]");

    public static Diagnostic DistancesWithoutSpeed(Spot at, string path) =>
        Error("C037", at,
            $"`{path}` is given without a speed of messages, so that it has no effect.",
            "add \"speed\": \"2.04e8 m/s\" to `messages`");

    // files
    public static Diagnostic FileNotRead(Spot at, string path, string file, string why) =>
        Error("C040", at,
            $"The file {file} of `{path}` cannot be read: {why}.",
            $"check the name; it counts from the folder of {(at.IsOption ? "the conditions file, or from the one you are in" : at.Source.Name)}");

    public static Diagnostic BadMatrix(Spot at, string file, string found, string wanted) =>
        Error("C041", at,
            $"There is {found} here in {file}, but {wanted} fits.",
            "write rows of numbers, complex ones as [real, imaginary]");

    public static Diagnostic NotHermitian(Spot at, string path, string file, double defect) =>
        Error("C042", at,
            $"The matrix in {file} is not Hermitian: an element differs by {Number(defect)} of the largest one from its conjugate across the diagonal, so that exp(-iθG) would not be unitary.",
            $"mend the matrix of `{path}`");

    public static Diagnostic Incomplete(Spot at, string path, string file, double defect) =>
        Error("C043", at,
            $"The Kraus operators in {file} are not complete: Σ K†K differs from 1 by {Number(defect)}, more than 1e-9.",
            $"give every operator of `{path}` with all its digits");

    public static Diagnostic WrongMatrixSize(Spot at, string path, string file, int found, int levels) =>
        Error("C044", at,
            $"The matrices in {file} are {found}×{found}, but the protocol's qudits have {levels} levels.",
            $"give {levels}×{levels} matrices for `{path}`");

    public static Diagnostic RotationNotFinite(Spot at, string path, string file) =>
        Error("C045", at,
            $"The rotation by the matrix in {file} cannot be computed: its elements times the angle of `{path}` are too large.",
            "scale the matrix");

    // against a protocol
    public static Diagnostic UnknownParty(Spot at, string name, string section, IReadOnlyList<string> parties)
    {
        string known = parties.Count == 0 ? "the protocol has no parties" : $"{Phrase.And(parties)} take{(parties.Count == 1 ? "s" : "")} part";
        return Error("C050", at,
            $"`{section}` speaks of {name}, but there is no such party: {known}.",
            NearWords.Find(name, parties) is { } near ? $"did you mean {near}?" : "use a name of the script");
    }

    public static Diagnostic Outsider(Spot at, string name, string section) =>
        Error("C051", at,
            $"`{section}` speaks of {name}, who is an outsider: nothing that conditions describe happens to outsiders.",
            "take the entry out");

    /// <summary>Code of the note on family members above today's last one.</summary>
    public const string MemberAboveCode = "C052";

    public static Diagnostic MemberAbove(Spot at, string name, string section, string last) =>
        new(MemberAboveCode, Severity.Note, $"`{section}` speaks of {name}; at today's parameters the family ends with {last}, and what lies above it has no effect.", null, at.ToPlace());

    public static Diagnostic NoSuchLevel(Spot at, string path, int level, int levels) =>
        Error("C053", at,
            $"`{path}` speaks of level {level}, but the protocol's qudits have {levels} levels, 0 to {levels - 1}.",
            "use one of these levels");

    public static Diagnostic WrongSize(Spot at, string path, int found, int levels) =>
        Error("C054", at,
            $"`{path}` has {Entries(found)}, but the protocol's qudits have {levels} levels.",
            $"give {levels} entries, one per level");

    public static Diagnostic CoherenceTooLong(Spot at, string path, double seconds, double limit, string pair) =>
        Error("C055", at,
            $"`{path}` is {Time(seconds)}, longer than decay allows for {pair}: T2 is at most {Time(limit)}.",
            "shorten it, or leave it out for coherence that only decay limits");

    public static Diagnostic NotRealisable(Spot at, string path) =>
        Error("C056", at,
            $"The times in `{path}` fit no physical noise: the matrix of factors exp(-φt) of all pairs of levels has a negative eigenvalue.",
            "check that no pair keeps its phase while both lose it with a third level; pairs not named do not dephase");

    public static Diagnostic TooManyForExchange(Spot at, string path, int parties, int most) =>
        Error("C057", at,
            $"`{path}` builds states of 2 to {most} parties, but {parties} hold a qudit here.",
            "take it out, or give the state as `resource.file`");

    public static Diagnostic ExchangeSteps(Spot at, string path, int found, int steps) =>
        Error("C058", at,
            $"`{path}` has {Entries(found)}, but {steps + 1} qudits are built in {steps} steps.",
            $"give {steps} entries; {{}} is a step without errors");

    public static Diagnostic NoSuchQudit(Spot at, string path, int qudit, int qudits) =>
        Error("C059", at, $"`{path}` speaks of qudit {qudit}, but this step joins {qudits} qudits, counted from 1.", "name two of these");

    public static Diagnostic FamilyName(Spot at, string name, string section, string range) =>
        Error("C060", at, $"`{section}` speaks of {name}, which is a family, not a party.", $"write \"{range}\" for all of it");

    public static Diagnostic FasterThanLight(Spot at, string path, double speed) =>
        new("C067", Severity.Warning, $"`{path}` is {speed.ToString("0.####e0", System.Globalization.CultureInfo.InvariantCulture)} m/s, faster than light in vacuum, 2.998e8 m/s: nothing travels like this.", "check the value and its unit", at.ToPlace());

    // overrides
    public static Diagnostic MalformedPath(Spot at, string path) =>
        Error("C070", at,
            $"`{Cut(path)}` is no path: keys are joined by points, list entries are counted in brackets from 0.",
            "write it like flight.Dov.length or levels.decay[0].lifetime");

    public static Diagnostic NoSuchItem(Spot at, string path, string list, int index, int count) =>
        Error("C071", at,
            count == 0 ? $"`{Cut(path)}` leads nowhere: `{Cut(list)}` is no list with entries." : $"`{Cut(path)}` leads nowhere: `{Cut(list)}` has {Entries(count)}, counted from 0, and none is number {index}.",
            count == 0 ? "set the whole list" : count == 1 ? "use index 0" : $"use an index from 0 to {count - 1}");

    public static Diagnostic PathIntoList(Spot at, string path, string reached, int count) =>
        Error("C071", at,
            $"`{Cut(path)}` leads nowhere: `{Cut(reached)}` is a list.",
            count == 0 ? "set the whole list" : $"say which entry, such as {Cut(reached)}[0]");

    public static Diagnostic PathIntoValue(Spot at, string path, string reached, string kind) =>
        Error("C071", at,
            $"`{Cut(path)}` leads nowhere: `{Cut(reached)}` is {kind} and has no keys.",
            $"set {Cut(reached)} itself");

    public static Diagnostic PathNeedsParty(Spot at, string path, string section, string rest) =>
        Error("C072", at,
            $"`{Cut(path)}` does not say whose: `{section}` is given per party here.",
            $"write {section}.default.{rest}, or a party's name in place of default");

    private static Diagnostic Error(string code, Spot at, string message, string cure) => new(code, Severity.Error, message, cure, at.ToPlace());

    private static IEnumerable<string> UnitsOf(Shape shape) => shape is QuantityShape quantity ? quantity.Fits.SelectMany(UnitTable.ShownSymbolsOf) : [];

    /// <summary>A slip in upper and lower case is the likeliest.</summary>
    private static string? NearUnit(string unit, List<string> units) =>
        units.FirstOrDefault(u => u.Equals(unit, StringComparison.OrdinalIgnoreCase)) ?? NearWords.Find(unit, units);

    private static string UnitOf(string example) => example[(example.IndexOf(' ', StringComparison.Ordinal) + 1)..];

    private static string Entries(int count) => count == 1 ? "1 entry" : $"{count} entries";

    private static string Bare(Dimension dimension) => UnitTable.NameOf(dimension).Split(' ', 2)[1];

    private static string Number(double value) => value.ToString("G6", CultureInfo.InvariantCulture);

    private static string TwoPiTimes(double value) => (2 * Math.PI * value).ToString("0.####e0", CultureInfo.InvariantCulture);

    private static string Time(double seconds) => QuantityText.Of(Duration.FromSeconds(seconds), 4);

    /// <summary>A mistaken text may be long; its beginning is enough to find it.</summary>
    private static string Cut(string text) => text.Length <= 60 ? text : text[..60] + "…";
}
