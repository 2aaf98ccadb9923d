using ResourceCheck.Diagnostics;

namespace ResourceCheck.Scripts;

/// <summary>Cause and cure of every message about a script's form.</summary>
internal static class SyntaxCatalogue
{
    /// <summary>In order of code.</summary>
    public static IReadOnlyList<Explanation> All { get; } =
    [
        new("S001", "stray character", "A character stands outside quotes and comments that no name, number or sign contains.",
            "Take it out. Names start with a letter of any script and go on with letters, digits and underscores.", "parties Ada, B$n"),
        new("S002", "text not closed", "A quotation mark opens a text that has no closing mark on its line.",
            "Close the text on the line where it starts; a text cannot contain a straight quotation mark.", "protocol \"Removal"),
        new("S003", "malformed number", "A number has two points, a point at its edge, a comma for its decimals, or digits of another script.",
            "Write digits 0 to 9 with at most one point inside and, where wanted, an exponent: 0.25, 12, 1e-6.", "copies 1.2.3"),
        new("S004", "number out of reach", "Numbers are exact, so their length is limited: 400 digits and exponents from -400 to 400.",
            "Use a number of ordinary size.", "copies 1e999"),
        new("S005", "unreadable character", "The file holds a control character or bytes that are no UTF-8; often it is not a text file at all.",
            "Check that the right file was named, and save it as UTF-8 text.", "copies \u00013"),
        new("S006", "unknown statement", "A line starts with a word that begins no statement, and that is not a party followed by a verb.",
            "Use one of the statements the message lists; keywords are lower case.", "resorce antisymmetric on all"),
        new("S007", "unknown verb", "The word after the actors is not something parties can do.",
            "Use one of the verbs the message lists, in the singular or the plural.", "round \"one\"\n  Ada mesures level as k\nend"),
        new("S008", "statement in the wrong place", "Quantum steps belong in rounds, lists and decisions in discussions, declarations outside of blocks, choices and harm in dishonest cases.",
            "Move the line to where the message says, or check that no end stands too early or is missing.", "Ada measures level as k"),
        new("S009", "block not closed", "A round, discussion, loop, when, dishonest case or replacement has no end of its own.",
            "Add a line with end after the block's last line. The message stands at the line that opens the block.", "round \"one\"\n  Ada measures level as k"),
        new("S010", "end without a block", "There is one end more than there are open blocks.", "Take it out, or look for the line that should have opened a block.", "end"),
        new("S011", "otherwise without a when", "An otherwise stands outside of a when, or is the second of one.",
            "Give each when at most one otherwise; put further conditions into a when inside it.", "otherwise"),
        new("S012", "word does not fit", "The line was readable up to the marked word, where the sentence needs something else.",
            "Write what the message says would fit.", "resource antisymmetric for all"),
        new("S013", "line goes on", "A complete statement is followed by something more; one line holds one statement.",
            "Start a new line, or take the rest out.", "success when true true"),
        new("S014", "unknown basis", "A measurement, interception or complement names a basis that is neither one of the language's nor a variable of the script.",
            "Use level, fourier, fourier on m, phased(j), matrix \"file\", or a variable that holds a basis.", "round \"one\"\n  Dov measures furrier as k\nend"),
        new("S015", "unknown function", "A word before a bracket is none of the functions.", "Use one of the functions that the message lists.", "report \"r\" = probabilty(true)"),
        new("S016", "wrong word between arguments", "Some functions part their arguments by a word of their own, such as over, in, of, from or given; another one was found.",
            "Use the word that belongs to the function.", "report \"r\" = count(true from all)"),
        new("S017", "word of the language as a name", "A word that has a meaning in the language stands where a name is given or expected.",
            "Choose another name; a capital letter is enough to tell it apart.", "parties Ada, level"),
        new("S018", "nested too deep", "Brackets, conditions, signs or blocks nest deeper than any protocol needs, or one line holds too many operators.",
            "Name parts of the expression with set, or split the block.", "copies " + new string('(', 200) + "1" + new string(')', 200)),
        new("S019", "chained comparison", "A comparison has a truth value, which cannot be compared by size again.",
            "Write a < b and b < c.", "success when 1 < 2 < 3"),
        new("S020", "unknown operation", "The word behind apply is none of the local unitaries.", "Use one of the operations that the message lists.", "round \"one\"\n  Ada apply shft(1)\nend"),
        new("S021", "value without a name", "A message carries the value of an expression, and its recipients need a name for it.",
            "Add as and a name: announces k + 1 as next.", "round \"one\"\n  Ada announces k + 1\nend"),
        new("S022", "bracket not closed", "A bracket that opens on a line does not close on it.", "Close the bracket where its content ends.", "copies (2 + 3"),
        new("S023", "sign of another language", "A sign was used that other notations have and this one has not.",
            "Use = and != for equality, <= and >= for order, and, or, not for logic, mod for the remainder.", "success when a == b"),
        new("S024", "empty script", "The file holds nothing but blanks and comments.", "Start with protocol and a quoted name.", "# nothing yet"),
        new("S025", "range as a value", "P[1..3] means several parties, where a single value is needed.", "Write v of P[1..3] for the values of several parties.", "success when P[1..3]"),
        new("S026", "no comparison", "A goal or claim must compare one figure with a number, by a sign it allows.",
            "Write for example goal success >= 0.9 or claim success = 1.", "goal success"),
        new("S027", "no values listed", "The braces of a domain are empty.", "List the values, as in {0, 1}.", "parameter x = 0 in {}"),
        new("S028", "text without quotes", "Titles, labels, reasons and file names stand between quotation marks.", "Put the text between straight quotation marks.", "protocol Removal"),
        new("S029", "wrong quotation marks", "Curved or single quotation marks, as word processors put them, do not open a text.", "Replace them by straight ones.", "protocol 'Removal'"),
    ];
}
