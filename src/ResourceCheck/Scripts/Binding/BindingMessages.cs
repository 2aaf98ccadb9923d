using static ResourceCheck.Diagnostics.Words;
using static ResourceCheck.Scripts.Binding.Written;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Every text that binding can say: what was found, what would fit, and the cure.</summary>
internal static class BindingMessages
{
    // Codes of findings that may come from the parameter values alone.
    private static readonly HashSet<string> OfParameters = ["S040", "S052", "S055", "S064", "S074"];

    /// <summary>Whether a finding may come from the parameter values alone.</summary>
    public static bool DependsOnParameters(string code) => OfParameters.Contains(code);

    public static Message NeverMade(string name, string? near, string? owner, IReadOnlyList<string> held) =>
        new("S030", $"Nothing in this script is called {name}: {(owner is null ? "a parameter, or a value that somebody makes or receives above," : $"a value that {owner} makes or receives")} fits here.",
            DidYouMean(near is null || owner is null ? near : $"{owner}.{near}") ?? (held.Count == 0 ? null : $"{owner} holds {Who(held)} here"));

    public static Message HeldByOthers(string owner, string name, IReadOnlyList<string> others) =>
        new("S030", $"{owner} holds no {name} here; {Who(others)} {Verb(others.Count, "does", "do")}.", $"write {Or(others.Select(o => $"{o}.{name}"))}");

    public static Message NotKnown(Miss miss, IReadOnlyList<string> actors, string place, BindContext context)
    {
        string[] knowers = [.. miss.Knowers.Select(context.NameOf)];
        string[] makers = [.. miss.Makers.Select(m => context.NameOf(m.Party))];
        string lines = Who(miss.Makers.Select(m => $"{context.NameOf(m.Party)} {Origin(m.Value, context)} {miss.Name} on line {context.LineOf(m.Value.Span)}"));
        string whom = actors.Count == 1 ? actors[0] : "them";
        string only = knowers.Length == 0 ? "nobody knows" : $"only {Who(knowers)} {Verb(knowers.Length, "knows", "know")}";
        return new("S031", $"{Who(actors)} {Verb(actors.Count, "acts", "act")} {place} {miss.Label}, which {only} here.",
            $"let {Or(makers)} announce {miss.Name}, or send it to {whom}, before this line; {lines}.");
    }

    public static Message MadeLater(string name, int line) =>
        new("S032", $"{name} is used here, but it is made only on line {line}.", $"move this line below line {line}");

    public static Message NotMadeHere(string name, int line) =>
        new("S032", $"{name} has no value here: line {line} makes it in another branch, for another party, or for nobody at these parameter values.", $"check who acts on line {line}, and when");

    public static Message SeveralMeanings(string reader, string name, IReadOnlyList<string> parties) =>
        new("S033", $"{name} alone has several meanings for {reader}: {Who(parties)} {Verb(parties.Count, "has sent one more than once", "each have one")}.",
            $"write {Or(parties.Select(p => $"{p}.{name}"))}");

    public static Message ReadDifferently(IReadOnlyList<string> actors) =>
        new("S033", $"{Who(actors)} act in this block, but its condition means a different value for each of them.", "name one party's value, as in Dov.k, that all of them know");

    public static Message MadeTwice(string party, string name, int line) =>
        new("S034", $"{party} already has {name} from line {line}: one name has one meaning.", "give the second value a name of its own");

    public static Message ReceivedTwice(string recipient, string sender, string name, int line) =>
        new("S034", $"{recipient} already has {sender}.{name} from line {line}: one name has one meaning.", "send the second value as another name");

    public static Message BranchKinds(string name, ValueKind first, ValueKind second, int line) =>
        new("S034", $"{name} is {Name(second)} here but {Name(first)} in the other branch, on line {line}.", "give the two values names of their own");

    public static Message NameTwiceInMessage(string name) =>
        new("S034", $"{name} stands twice in this message: each name carries one value.", "send the second value as another name");

    public static Message NameTaken(string name, string role) =>
        new("S035", $"{name} is {role} already: one name has one meaning.", "choose another name");

    public static Message NotPublic(string label, IReadOnlyList<string> without) =>
        new("S036", $"A copy is kept by what everybody knows, but {Who(without)} {Verb(without.Count, "does", "do")} not know {label} here.", $"let it be announced before this line");

    public static Message OfAnEndedTurn(string name, int line, int loop) =>
        new("S037", $"{name} belongs to a turn of the loop on line {loop}, made on line {line}: it can be used inside that turn only.", "use it inside the loop, or make the value outside of it");

    public static Message UnknownParty(string name, string? near, IReadOnlyList<string> parties) =>
        new("S039", $"{name} is no party: {Some(parties, "or")} would fit.", DidYouMean(near) ?? "name the party in the parties line");

    public static Message UnknownFamily(string name, string? near) =>
        new("S039", $"{name} is no numbered family of parties.", DidYouMean(near) ?? $"declare it, as in parties {name}[1..3]");

    public static Message OutsideFamily(string family, int number, int least, int most) =>
        new("S040", $"{family}[{number}] does not exist: {family} is numbered from {least} to {most} at these parameter values.", null);

    public static Message FamilyNeedsNumber(string family, int least, int most) =>
        new("S040", $"{family} is a family of parties: a number from {least} to {most} is missing.", $"write {family}[{least}], or {family}[{least}..{most}] for all of them");

    public static Message NamedTwice(string party) =>
        new("S041", $"{party} is named twice in this list.", "name each party once");

    public static Message SentToSelf(string party) =>
        new("S042", $"{party} sends to itself.", $"take {party} out of the recipients; it knows the value already");

    public static Message OutsiderMayNot(string name, string verb) =>
        new("S043", $"{name} is an outsider and cannot {verb}: outsiders pick, set and intercept.", null);

    public static Message OnlyOutsidersIntercept(string name) =>
        new("S043", $"{name} is no outsider: only outsiders intercept.", $"let {name} measure, or declare an outsider");

    public static Message OutsiderHoldsNothing(string name) =>
        new("S043", $"{name} is an outsider and holds no qudit.", "name parties that are no outsiders");

    public static Message OthersMeansNobody() =>
        new("S044", "others has no meaning here: it stands for the parties not yet named in a round.", "name the parties, or write all");

    public static Message OnePartyFits(string text) =>
        new("S044", $"`{text}` does not name exactly one party; one fits here.", null);

    public static Message NoPartyName(string text) =>
        new("S044", $"`{text}` names nobody here: names such as Ada, or a numbered family such as P[1..4], fit.", null);

    public static Message AlreadyMeasured(string party, string verb, int line) =>
        new("S045", $"{party} cannot {Doing(verb)}: its qudit was measured on line {line}.", $"move this line above line {line}, or leave {party} out");

    public static Message NobodyHolds(string word, int line) =>
        new("S045", $"{word} stands for those who still hold a qudit, and nobody does: the last was measured on line {line}.", $"move this line above line {line}");

    public static Message MeasuredInOneBranch(string party, string verb, int line) =>
        new("S046", $"{party} cannot {Doing(verb)}: its qudit is measured on line {line} in one branch of a when but not in the other.", $"let {party} measure in both branches, or leave it out below");

    public static Message HoldsNoQudit(string party, string verb) =>
        new("S047", $"{party} cannot {Doing(verb)}: it is not in the resource and holds no qudit.", $"put {party} into the resource line, or leave it out here");

    public static Message InterceptTooLate(string party, int line) =>
        new("S048", $"{party} uses its qudit already on line {line}: only qudits in flight are intercepted.", $"move this line above line {line}");

    public static Message InterceptUsesMessages(string outsider) =>
        new("S049", $"{outsider} intercepts by something that depends on a message: no message has arrived while the qudits fly.", "let the outsider pick or set its basis on its own");

    public static Message WrongKind(string text, ValueKind found, ValueKind wanted) =>
        new("S050", $"`{text}` is {Name(found)}: {Name(wanted)} fits here.", null);

    public static Message NeverEqual(ValueKind first, ValueKind second) =>
        new("S051", $"{Capital(Name(first))} is compared with {Name(second)}: the two are never equal.", "compare values of one sort");

    public static Message BranchesDiffer(ValueKind first, ValueKind second) =>
        new("S051", $"This is {Name(first)} in one case and {Name(second)} in another: a value is of one sort, or none.", null);

    public static Message OutsideLevels(string where, string value, int least, int most, int levels) =>
        new("S052", $"{where} {value} does not exist with {levels} levels: whole numbers from {least} to {most} fit.", null);

    public static Message UnknownFunction(string name, string? near, IEnumerable<string> known) =>
        new("S053", $"{name} is no function here: {Or(known)} would fit.", DidYouMean(near));

    public static Message NoBasis(string name, string? near) =>
        new("S053", $"{name} is no basis: level, fourier, phased(j), matrix \"file\" or a value that holds a basis fit here.", DidYouMean(near));

    public static Message WrongArguments(string name, string shape) =>
        new("S054", $"{name} is given the wrong arguments: {shape} fits.", null);

    public static Message Undefined(string text) =>
        new("S055", $"`{text}` has no value here: a number fits that does not divide by zero.", null);

    public static Message WholeNumberNeeded(string value) =>
        new("S055", $"This is {value}: a whole number fits here.", null);

    public static Message FigureAmongValues(string name) =>
        new("S056", $"{name}(…) is a figure about all copies, but one copy's value is needed here.", $"use {name}(…) in a report or a claim");

    public static Message NoFigure(string text, string? near = null) =>
        new("S056", $"`{text}` is no figure about all copies: a number, success, failure, abort, yield, a quoted label or a function such as probability(…) fits.",
            near is null ? "write probability(…) around a condition, mean(…) around a number" : $"did you mean {near}?");

    public static Message NoValueHere(string text) =>
        new("S056", $"`{text}` is no value of a single copy: numbers, names, bases and functions of them fit here.", null);

    public static Message ListOutsideFunction(string text) =>
        new("S056", $"`{text}` stands for several values: it fits inside a function such as distinct(…).", null);

    public static Message StatementMissing(string word, string example) =>
        new("S057", $"The script has no {word} line.", $"add one, such as {example}");

    public static Message DeclaredTwice(string word, int line) =>
        new("S058", $"{word} is there already, on line {line}: one fits.", "keep one of the two");

    public static Message ResourceTooSmall(int holders) =>
        new("S059", $"An antisymmetric resource on {holders} {Verb(holders, "party", "parties")} does not exist: at least two parties share it.", "name two or more parties");

    public static Message OutsideDomain(string name, string value, string domain) =>
        new("S060", $"{name} = {value} lies outside {domain}.", $"choose {name} in {domain}");

    public static Message EmptyDomain(string text) =>
        new("S061", $"`{text}` holds no value.", "begin with the smaller end");

    public static Message LongDomain(int most) =>
        new("S061", $"This range is too long to try every value: at most {most} fit.", null);

    public static Message RealDomain(string text) =>
        new("S061", $"`{text}` has no end of values, but every value of an input is tried.", "list the values, as in {0, 1}, or write a range of whole numbers, as in 0..3");

    public static Message NumbersOnly(string text) =>
        new("S061", $"`{text}` holds something that is no number: parameters are numbers.", null);

    public static Message ValueTwice(string value) =>
        new("S061", $"{value} stands twice in this list.", "keep one of the two");

    public static Message FamilyRange(string family, int from, int to, int most) =>
        new("S061", $"{family}[{from}..{to}] is no family: numbers go upwards from 0 or more, to at most {most} members.", null);

    public static Message UnknownParameter(string name, string? near, IReadOnlyList<string> known) =>
        new("S062", $"This script has no parameter {name}: {(known.Count == 0 ? "it has none" : $"it has {Who(known)}")}.", DidYouMean(near));

    public static Message NotConstant(string name, string? near, IReadOnlyList<string> known) =>
        new("S063", $"{name} cannot stand here, where only parameters and counters are known{(known.Count == 0 ? "" : $": {Some(known, "or")} would fit")}.", DidYouMean(near));

    public static Message DeclarationInBlock(string text) =>
        new("S063", $"`{text}` does not fit inside a block: it belongs to the script itself.", "move the line out of the block");

    public static Message TooManyTurns(int most) =>
        new("S064", $"The loops of this script make more than {most} turns: that is more than can be checked.", "shorten the range");

    public static Message TooManySteps(int most) =>
        new("S064", $"The script unrolls to more than {most} steps: that is more than can be checked.", "shorten the loops, or name fewer parties");

    public static Message NoTime(string text) =>
        new("S065", $"`{text}` is no time: a number that is not negative and s, ms, us, ns or ps fit.", null);

    public static Message UnknownLabel(string label, string? near, IEnumerable<string> known) =>
        new("S066", $"Nothing is labelled \"{label}\" here: {(known.Any() ? Some([.. known.Select(k => $"\"{k}\"")], "or") : "a label of a checkpoint or report")} would fit.",
            near is null ? null : $"did you mean \"{near}\"?");

    public static Message UnknownCase(string label, string? near, IEnumerable<string> known) =>
        new("S066", $"No dishonest case is called \"{label}\"{(known.Any() ? $": {Some([.. known.Select(k => $"\"{k}\"")], "or")} would fit" : "; the script has none")}.",
            near is null ? null : $"did you mean \"{near}\"?");

    public static Message ReportBelow(string label, int line) =>
        new("S066", $"The report \"{label}\" stands on line {line}: a report uses only reports above it.", $"move this line below line {line}");

    public static Message LabelTwice(string label, int line, bool sameLine) => sameLine
        ? new("S067", $"Each turn of the loop gives the label \"{label}\" again: a label stands once.", "put the counter into the label, as in \"after {m}\"")
        : new("S067", $"The label \"{label}\" stands on line {line} already.", "choose another label");

    public static Message LabelBuiltIn(string label) =>
        new("S067", $"The label \"{label}\" is taken: every run has that checkpoint.", "choose another label");

    public static Message UnknownInLabel(string name, IReadOnlyList<string> known) =>
        new("S068", $"{{{name}}} in this label is no counter or parameter{(known.Count == 0 ? "" : $": {Or(known.Select(k => $"{{{k}}}"))} would fit")}.", "write a counter of the loop around, or leave the braces out");

    public static Message ClaimForm() =>
        new("S069", "A claim compares two figures with =, >= or <=.", "write it as in claim success = 1");

    public static Message GoalForm(string? near) =>
        new("S069", "A goal is a metric, then >= or <=, then a number.", near is not null ? $"did you mean {near}?" : "write it as in goal success >= 0.9; give a longer figure a report and name its label");

    public static Message NeverReached(string because) =>
        new("S070", $"This line is never reached: {because}.", "take it out, or change the condition");

    public static Message NotInCheckpoint(string party, IReadOnlyList<string> parties) =>
        new("S071", $"{party} is not in the last checkpoint, whose state a Bell value is of: that has {Who(parties)}.", "add a checkpoint with both parties");

    public static Message EmptyCheckpoint() =>
        new("S072", "This checkpoint has nobody in it at these parameter values.", "name at least one party that holds its qudit");

    public static Message MessageNeedsName(string text) =>
        new("S073", $"`{text}` travels without a name.", $"write {text} as w, with a name for the recipients");

    public static Message CopiesCount(string value) =>
        new("S074", $"{value} copies cannot be made: a whole number from 1 fits.", "write it as in copies 300, or give a parameter");

    public static Message DiscussionWithoutCopies() =>
        new("S075", "A discussion works on lists, and a script without copies has none.", "add a line such as copies 300, or put decisions about one copy into a round");

    public static Message BelowDiscussion(int line) =>
        new("S075", $"This line is about single copies, but the discussion on line {line} follows all copies.", $"move it above line {line}");

    public static Message QuantumInDiscussion() =>
        new("S075", "A discussion is classical, and the qudits of all copies are used up by then: set, send, announce and abort fit here.", "replace the round in which the party acts on its qudit");

    public static Message NothingPickedHere() =>
        new("S075", "Nothing is picked in a discussion: chance comes from the copies and from positions drawn.", "pick in a round, or draw positions with some(k of SET)");

    public static Message ListsNotHere(string shape, bool hasCopies) =>
        new("S076", $"{shape} looks at the lists of all copies: it fits in a discussion{(hasCopies ? " and in the referee's lines" : " of a script with copies")}.",
            hasCopies ? "move the line into a discussion below the rounds" : "compare the values of one copy, or add a copies line and a discussion");

    public static Message NothingDrawnHere() =>
        new("S076", "Positions are drawn only where a value is set or sent, so that all who read it mean the same ones.", "set a name to some(k of SET) on a line above, and use that name");

    public static Message SetsCompared(string function) =>
        new("S076", $"{function}(…) compares single values, and a set of positions stands among these.", "compare their sizes, or two sets with =");

    public static Message UnknownBlock(string title, string? near, IReadOnlyList<string> known) =>
        new("S077", $"No round or discussion is called \"{title}\"{(known.Count == 0 ? "; the script has none" : $": {Some([.. known.Select(k => $"\"{k}\"")], "or")} would fit")}.",
            near is null ? null : $"did you mean \"{near}\"?");

    public static Message ReplacedTwice(string title) =>
        new("S077", $"\"{title}\" is changed twice in this case: one list of lines stands in place of a block, and one before it.", "put all lines into one of the two");

    public static Message NothingToReplace(string cheats, string title, int count) =>
        new("S077", $"{cheats} {Verb(count, "does", "do")} nothing in \"{title}\" that could be replaced.", $"write before \"{title}\" to add lines");

    public static Message NoReplacement(string title) =>
        new("S077", $"The case \"{title}\" changes nothing: lines stand in instead of \"…\" or before \"…\".", "say which round or discussion the party plays differently");

    public static Message HonestInCheat(string party, string cheats) =>
        new("S077", $"{party} is honest in this case: its lines say what {cheats} {Verb(cheats.Contains(' ', StringComparison.Ordinal) ? 2 : 1, "does", "do")}.", $"leave {party} out, or name it behind by");

    public static Message KeepInCheat() =>
        new("S077", "Copies are kept by what everybody knows: no party can replace that.", "leave the line out");

    public static Message HarmMissing(string title) =>
        new("S077", $"The case \"{title}\" does not say when harm is done.", "add a line such as harm when Ben.out != Cyd.out");

    public static Message ChoiceBelow(string name) =>
        new("S078", $"{name} is chosen further down, or here itself: a range uses only choices above it.", "put the choices in the order in which they are made");

    public static Message ChoiceFromList(string text) =>
        new("S078", $"`{text}` is a list, but a choice is made in a range.", "write it as in 0..3 for whole numbers or 0 to 1 for real ones");

    public static Message ChoiceUnused(string name) =>
        new("S078", $"No line of this case uses {name}.", "take the choice out, or use it");

    public static Message OnePerCopy(string label) =>
        new("S079", $"{label} is a list with one value for each copy: one value for all copies fits here.",
            $"ask about its positions, as in where({label} = 0), count({label} = 0 in J) or share({label} = 0 in J)");

    public static Message SameInEveryCopy(string text) =>
        new("S079", $"`{text}` holds in every copy or in none: a condition on a value of the rounds fits here.", "name a value that was made in a round; where(true) stands for all positions");

    /// <summary>Code of what goes wrong in honest lines because of a cheating strategy.</summary>
    public const string CaseCode = "S080";

    public static Message WrongInCase(int line, Message message) =>
        new(CaseCode, $"In this case line {line} cannot run as it is written: {message.Text}", "make the names again that later lines use, for the same parties, and leave the qudits that they need");

    private static string? DidYouMean(string? near) => near is null ? null : $"did you mean {near}?";

    private static string Name(ValueKind kind) => ValueKinds.Name(kind);

    private static string Capital(string text) => char.ToUpperInvariant(text[0]) + text[1..];

    private static string Doing(string verb) => verb switch
    {
        "checkpoint" => "be in this checkpoint",
        "intercept" => "be intercepted",
        "apply" => "apply an operation",
        _ => verb,
    };

    // Long lists say less than their beginning.
    private static string Who(IEnumerable<string> parties) => parties.Any() ? And(parties) : "nobody";

    private static string Some(IReadOnlyList<string> items, string last) =>
        items.Count == 0 ? "nothing" : items.Count <= 8 ? last == "or" ? Or(items) : And(items) : $"{string.Join(", ", items.Take(7))} and so on";

    private static string Origin(Holding value, BindContext context) => context.Slots[value.Slots[0]].Kind switch
    {
        SlotKind.Input => "holds",
        SlotKind.Message => "sent",
        _ => "made",
    };
}
