using ResourceCheck.Diagnostics;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Cause and cure of every message about what a script means.</summary>
internal static class BindingCatalogue
{
    /// <summary>In order of code.</summary>
    public static IReadOnlyList<Explanation> All { get; } =
    [
        new("S030", "unknown name", "A line uses a name that no line makes, or asks a party for a value that it does not hold.", "Correct the name, or add the line that makes the value.", "success when Ada.x = 0"),
        new("S031", "value not known to its user", "A party uses a value that another party made and has not told it. Every value belongs to the party that made it.",
            "Let the party that made it announce it, or send it, on a line before.", "Dov measures fourier as k\nAda applies shift(k)"),
        new("S032", "value used before it is made", "The name is made further down, in another branch, or for nobody at these parameter values.", "Move the line that uses the value below the one that makes it.", "Ada applies shift(k)\nAda picks k from 0, 1"),
        new("S033", "name with several meanings", "A bare name stands for one's own value, else for the one value of that name that was received; here several fit.", "Name the party: Ada.v in place of v.", "success when v = 0"),
        new("S034", "name made twice", "A party gives the same name to two values, or receives two values of one name from one sender.", "Give the second value a name of its own. Names in different turns of a loop are different names.", "Ada sets v to 1\nAda sets v to 2"),
        new("S035", "name taken", "A value, counter or parameter has the name of a parameter, counter, party or value that is there already.", "Choose another name.", "parameter Ada = 0 in {0, 1}"),
        new("S036", "copies kept by a secret", "A keep line uses a value that not everybody knows; outsiders do not count.", "Let the value be announced before the keep line.", "keep when Ada.b = Ben.b"),
        new("S037", "name of an ended turn", "A name made inside a loop belongs to its turn and ends with it.", "Use the value inside the loop.", null),
        new("S039", "unknown party", "A line names somebody whom the parties line does not.", "Correct the name, or declare the party.", "Bem measures level as k"),
        new("S040", "family member that does not exist", "The number behind a family's name is missing or outside its range at these parameter values.", "Write a number that the parties line covers.", "P[5] measures level as k"),
        new("S041", "party named twice", "A list names one party more than once.", "Name each party once.", "Ada, Ada measure level as k"),
        new("S042", "message to oneself", "The sender is among the recipients by name.", "Take it out; it knows the value already.", "Ada sends v to Ada, Ben"),
        new("S043", "outsider out of its role", "An outsider holds no qudit: it picks, sets and intercepts, and only outsiders intercept.", "Let a party do it, or declare an outsider.", "Eve measures level as e"),
        new("S044", "list that does not fit", "One party is needed and several are named, or all or others stand where they mean nothing.", "Name the parties.", "input x of others in {0, 1}"),
        new("S045", "qudit measured already", "Measuring consumes a qudit; a later line acts on it or looks at it.", "Move the line above the measurement, or leave the party out.", "Ada measures level as a\nAda applies shift(1)"),
        new("S046", "qudit measured in one branch", "After a when that measures a qudit in one branch only, nobody can say whether it is there.", "Measure it in both branches, or do not use it below.", null),
        new("S047", "no qudit", "The party is not in the resource line.", "Put it there, or leave it out of the line.", null),
        new("S048", "interception too late", "Only a qudit in flight can be intercepted; this one has been acted on by its party.", "Move the interception above every action of that party.", null),
        new("S049", "interception by messages", "No time passes in flight, so no message can have arrived that an interception depends on.", "Let the outsider pick or set its basis by itself.", null),
        new("S050", "wrong sort of value", "Numbers, truth values, bases and parties do not stand for one another; none fits everywhere.", "Write a value of the sort that the message names.", "keep when Ada.v"),
        new("S051", "values of different sorts", "A comparison, choice or list mixes values of different sorts.", "Use values of one sort.", "success when Ada.v = level"),
        new("S052", "level or basis out of range", "A fixed level, basis or number of levels does not exist: levels run from 0 to one less than the parties in the resource.", "Write a number in the range that the message names.", "Ada measures phased(9) as v"),
        new("S053", "unknown function or basis", "No function or basis has this name.", "Use one of those that the message lists.", null),
        new("S054", "wrong arguments", "A function has too few or too many arguments, or lacks the word between them.", "Write it in the shape that the message shows.", "success when abs(1, 2) = 1"),
        new("S055", "number without a value", "A fixed expression divides by zero, or a whole number is needed and a fraction stands there.", "Correct the expression.", "for m from 1/2 up to 3"),
        new("S056", "figure and value mixed up", "Reports, claims and goals hold figures about all copies; everything else holds values of one copy.", "Write probability(…) or mean(…) around a value; keep figures in reports and claims.", "report \"x\" = Ada.v"),
        new("S057", "line missing", "A script needs a parties line, a resource line and a success line.", "Add the line.", null),
        new("S058", "declared twice", "A line that stands once stands again, or a name is declared again.", "Keep one of the two.", "success when true\nsuccess when false"),
        new("S059", "resource too small", "An antisymmetric state needs two parties or more.", "Name more parties in the resource line.", "resource antisymmetric on Ada"),
        new("S060", "value outside its domain", "A parameter's default or the value given for it is not among those that the script allows.", "Choose a value from the domain.", "parameter x = 5 in {0, 1}"),
        new("S061", "unusable domain", "A list or range of values is empty, endless, too long, repeats a value or mixes sorts.", "List the values in braces, or write a range that goes upwards.", "parameter x = 0 in 4..2"),
        new("S062", "unknown parameter given", "A value is given for a parameter that the script does not declare.", "Correct the name on the command line.", null),
        new("S063", "only parameters here", "Declarations, requirements, ranges and numbers of parties are fixed before a run: only parameters and counters are known there.", "Use parameters, counters and numbers.", "require Ada.v > 0, \"never known\""),
        new("S064", "script too long", "Unrolled, the loops make more turns or steps than can be checked.", "Shorten the ranges.", null),
        new("S065", "no time", "The time of a wait is negative or has no unit of time.", "Write a number and s, ms, us, ns or ps.", "Ada waits 3 weeks"),
        new("S066", "unknown label", "A quoted label names no checkpoint, no report above, and no dishonest case.", "Correct the label, or move the report below the one that it uses.", "goal \"after\" >= 0.9"),
        new("S067", "label taken", "Two checkpoints or reports have one label, or one has the name of a checkpoint that every run has.", "Choose another label; inside a loop put the counter in braces into it.", null),
        new("S068", "unknown counter in a label", "Braces in a label are replaced by a counter or parameter, and there is none of this name.", "Write the counter of the loop around.", "checkpoint \"after {q}\": fidelity with antisymmetric on Ada, Ben"),
        new("S069", "form of a claim or goal", "A claim compares two figures; a goal compares a metric with a number.", "Write claim success = 1 or goal success >= 0.9.", "goal mean(Ada.v) >= 0.1"),
        new("S070", "line never reached", "A condition without any name in it is fixed, so that the line can never run.", "Take the line out, or change the condition.", "keep when false"),
        new("S071", "no state for a Bell value", "A Bell value is of the state at the last checkpoint, and one of the parties is not in it.", "Add a checkpoint with both parties.", null),
        new("S072", "empty checkpoint", "At these parameter values nobody is in the checkpoint.", "Name at least one party that holds its qudit.", null),
        new("S073", "message without a name", "A computed value is sent without saying what it is called at the recipients.", "Write as and a name behind it.", null),
        new("S074", "copies not available", "Lists of copies are not available in this version.", "Leave the copies line out.", "copies 100"),
        new("S075", "discussion not available", "Discussions of lists are not available in this version.", "Put decisions about one copy into a round.", null),
        new("S076", "list functions not available", "Functions of lists and sets are not available in this version.", "Compare the values of one copy instead.", null),
        new("S077", "dishonest cases not available", "Cheating strategies are not available in this version.", "Leave the block out.", null),
        new("S078", "choose not available", "Numbers left to a cheat are not available in this version.", "Fix the number.", null),
    ];
}
