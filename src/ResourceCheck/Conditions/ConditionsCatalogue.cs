using ResourceCheck.Diagnostics;

namespace ResourceCheck.Conditions;

/// <summary>Cause and cure of every finding about conditions.</summary>
internal static class ConditionsCatalogue
{
    /// <summary>All explanations in order of code.</summary>
    public static IReadOnlyList<Explanation> All { get; } =
    [
        new(
            "C001",
            "Not JSON",
            "The text does not follow JSON's grammar, or ends too early.",
            "Check quotes, commas, colons and brackets where the mark stands.",
            "{ 'about': \"Winter\" }"),
        new(
            "C002",
            "Comment",
            "The file holds a comment, which JSON does not have.",
            "Move the words to `about`, or take them out.",
            "{ } // winter"),
        new(
            "C003",
            "Trailing comma",
            "A comma stands before a closing bracket.",
            "Take the comma out.",
            "{ \"about\": \"Winter\", }"),
        new(
            "C004",
            "Key given twice",
            "An object holds the same key twice, so that one of the values would silently be lost.",
            "Keep one of them.",
            "{ \"about\": \"Winter\", \"about\": \"Summer\" }"),
        new(
            "C005",
            "Null in place of a value",
            "A key holds null.",
            "Give the value, or leave the key out: what is absent is ideal.",
            "{ \"resource\": { \"white\": null } }"),
        new(
            "C006",
            "Nested too deep",
            "Brackets lie deeper than any key needs.",
            "Take out the needless brackets."),
        new(
            "C007",
            "Text too large",
            "The text is larger than any conditions file written by people.",
            "Check that the right file was given."),
        new(
            "C008",
            "Too many mistakes",
            "More mistakes were found than are worth showing at once.",
            "Mend those shown and check again."),
        new(
            "C009",
            "More than one value",
            "Something follows the end of the object.",
            "Keep one object in the file.",
            "{ } { }"),
        new(
            "C010",
            "Unknown key",
            "A key is not among those of its section.",
            "Use the key suggested, or one of those listed.",
            "{ \"flihgt\": { } }"),
        new(
            "C011",
            "Wrong kind of value",
            "A key holds, say, a text where an object belongs.",
            "Write the value in the form shown.",
            "{ \"flight\": { \"heralded\": 1 } }"),
        new(
            "C012",
            "Unit missing",
            "A quantity is written as a bare number; its unit cannot be guessed.",
            "Write number and unit as a text, such as \"2.5 km\".",
            "{ \"operations\": { \"duration\": 2 } }"),
        new(
            "C013",
            "Unknown unit",
            "What stands behind the number is no unit of the table.",
            "Use one of the units listed; upper and lower case differ.",
            "{ \"operations\": { \"duration\": \"2 usec\" } }"),
        new(
            "C014",
            "Unit of another quantity",
            "The unit measures something else than the key.",
            "Use a unit of the quantity that the key holds.",
            "{ \"operations\": { \"duration\": \"2 km\" } }"),
        new(
            "C015",
            "Hertz and rates mixed up",
            "A rate Γ is given in Hz, or a linewidth Γ/2π in /s; they differ by 2π.",
            "Give a rate in /s or a linewidth in Hz.",
            "{ \"waiting\": { \"depolarisingRate\": \"20 Hz\" } }"),
        new(
            "C016",
            "No number",
            "A quantity does not begin with a number, or its number has a comma.",
            "Begin with digits; the decimal sign is a point.",
            "{ \"operations\": { \"duration\": \"0,5 us\" } }"),
        new(
            "C017",
            "Out of range",
            "A number is negative, 0 or above 1 where it must not be.",
            "Give a number in the range named.",
            "{ \"resource\": { \"white\": 1.2 } }"),
        new(
            "C018",
            "No whole number",
            "A level is not given as a whole number from 0.",
            "Write 0, 1, 2 and so on.",
            "{ \"resource\": { \"levels\": [1.5, 0] } }"),
        new(
            "C019",
            "Number too large or too small",
            "A number cannot be computed with.",
            "Check its exponent.",
            "{ \"operations\": { \"duration\": \"1e400 s\" } }"),
        new(
            "C020",
            "Unknown word",
            "A key takes one of a few words, and this is none of them.",
            "Use one of the words named.",
            "{ \"flight\": { \"rotation\": { \"generator\": \"clok\", \"angle\": \"1 rad\" } } }"),
        new(
            "C021",
            "Key missing",
            "A group makes no sense without a key that is absent.",
            "Give the key.",
            "{ \"preparation\": { \"success\": 0.2 } }"),
        new(
            "C022",
            "Keys exclude each other",
            "Two keys say the same thing in different ways.",
            "Keep one of them.",
            "{ \"flight\": { \"length\": \"2 km\", \"speed\": \"2e8 m/s\", \"time\": \"9 us\" } }"),
        new(
            "C023",
            "Wrong number of entries",
            "A list has too few or too many entries.",
            "Give as many as named.",
            "{ \"flight\": { \"rotation\": { \"levels\": [0], \"angle\": \"1 rad\" } } }"),
        new(
            "C024",
            "Key names no pair",
            "The keys of this object name levels, qudits or parties, and this one does not.",
            "Write the key like the one shown.",
            "{ \"levels\": { \"coherence\": { \"0:1\": \"5 ms\" } } }"),
        new(
            "C026",
            "Keys beside party names",
            "A section mixes keys for everybody with party names.",
            "Move the keys into `default`.",
            "{ \"flight\": { \"default\": { }, \"dephasing\": 0.1 } }"),
        new(
            "C027",
            "Pair given twice",
            "The same pair is given twice, perhaps in the other order.",
            "Keep one of them.",
            "{ \"levels\": { \"coherence\": { \"0-1\": \"5 ms\", \"1-0\": \"6 ms\" } } }"),
        new(
            "C028",
            "No party name",
            "A section per party has a key that can be no party's name.",
            "Name parties as the script does: Dov, P[3] or P[2..5].",
            "{ \"flight\": { \"P[5..2]\": { } } }"),
        new(
            "C029",
            "Text not usable",
            "A description runs over several lines, or a file name is empty.",
            "Put it in one line, or name a file.",
            "{ \"resource\": { \"file\": \"\" } }"),
        new(
            "C030",
            "Length without speed",
            "The time of flight does not follow from a length alone.",
            "Give `speed` or `time` beside it or in `default`.",
            "{ \"flight\": { \"length\": \"2 km\" } }"),
        new(
            "C031",
            "Branching does not add up",
            "The fractions of a level's decay do not add up to 1.",
            "Name every branch, or scale the fractions.",
            "{ \"levels\": { \"decay\": [ { \"from\": 0, \"lifetime\": \"5 us\", \"branching\": { \"1\": 0.6 } } ] } }"),
        new(
            "C032",
            "Same level twice",
            "Two levels of a pair or branch are the same.",
            "Name two different levels.",
            "{ \"levels\": { \"decay\": [ { \"from\": 1, \"to\": 1, \"rate\": \"5 /s\" } ] } }"),
        new(
            "C033",
            "Branch given twice",
            "Two entries give the decay between the same two levels.",
            "Give each branch once, with its whole rate."),
        new(
            "C034",
            "Confusion is no matrix of probabilities",
            "Rows of `confusion` do not add up to 1, or the matrix is not square.",
            "Mend the row; rows are true outcomes.",
            "{ \"detection\": { \"confusion\": [[0.9, 0.2], [0.1, 0.9]] } }"),
        new(
            "C035",
            "Coherence and dephasing for one pair",
            "T2, which includes decay, and a pure dephasing time are given for the same pair.",
            "Keep one of them.",
            "{ \"levels\": { \"coherence\": \"5 ms\", \"dephasingTime\": \"9 ms\" } }"),
        new(
            "C036",
            "Levels are no permutation",
            "`resource.levels` must name each level once.",
            "Say for each value of the script which physical level plays it.",
            "{ \"resource\": { \"levels\": [2, 0, 2] } }"),
        new(
            "C037",
            "Distances without speed",
            "Distances of messages have no effect without their speed.",
            "Give `messages.speed`.",
            "{ \"messages\": { \"distances\": { \"Ada-Ben\": \"3 km\" } } }"),
        new(
            "C040",
            "File not readable",
            "A file that the conditions or the script name is absent, too large or not readable.",
            "Check the name; it counts from the folder of the file that names it."),
        new(
            "C041",
            "No matrix",
            "A matrix file does not hold rows of numbers.",
            "Write rows of equal length, complex entries as [real, imaginary]."),
        new(
            "C042",
            "Matrix not Hermitian",
            "The generator of a rotation differs from its conjugate transpose.",
            "Mend the matrix."),
        new(
            "C043",
            "Kraus operators not complete",
            "Σ K†K differs from 1 by more than 1e-9.",
            "Give all operators, with all their digits."),
        new(
            "C044",
            "Matrix of another size",
            "A matrix does not have as many rows as the qudits have levels.",
            "Give d×d matrices."),
        new(
            "C045",
            "Rotation not computable",
            "The matrix times the angle is too large for its exponential to be trusted.",
            "Scale the matrix."),
        new(
            "C050",
            "Unknown party",
            "The script has no party of this name.",
            "Use the name suggested, or one of those listed."),
        new(
            "C051",
            "Conditions for an outsider",
            "Conditions describe those who take part; nothing happens to outsiders.",
            "Take the entry out."),
        new(
            "C052",
            "Family member above the last",
            "The family has fewer members, at today's parameters and at the largest that the script allows. This is a note: the entry has no effect.",
            "Take the entry out, unless the script is to grow."),
        new(
            "C053",
            "No such level",
            "A level is not below the number of levels d.",
            "Use a level from 0 to d-1."),
        new(
            "C054",
            "List not as long as there are levels",
            "A list with one entry per level has too few or too many.",
            "Give d entries."),
        new(
            "C055",
            "Coherence longer than decay allows",
            "T2 is above 2/Γ_0 (for a pair, 2/(Γ_a+Γ_b)); no noise makes coherence outlive the levels.",
            "Shorten it, or leave it out for coherence that only decay limits."),
        new(
            "C056",
            "Dephasing of no physical noise",
            "The rates per pair of levels are not conditionally negative definite.",
            "Give rates for all pairs that a noise of the levels' phases could have."),
        new(
            "C057",
            "Exchange preparation of too many",
            "Exchange pulses prepare the state for 2 to 4 parties only.",
            "Take `exchange` out, or give the state as a file."),
        new(
            "C058",
            "Wrong number of exchange steps",
            "N qudits are built in N-1 steps.",
            "Give one entry per step."),
        new(
            "C059",
            "No such qudit in this step",
            "Step m-1 → m joins m qudits, counted from 1.",
            "Name two of these."),
        new(
            "C060",
            "Family in place of a party",
            "The name is that of a family.",
            "Name its members: P[3] or P[1..4]."),
        new(
            "C061",
            "Wrong number of entries",
            "A list has one entry per emitter or per transition, and this one has more or fewer.",
            "Give one entry for each; N emitters have N levels and N-1 transitions."),
        new(
            "C062",
            "Spacing missing",
            "A pair, ring or chain is laid out from the distance of neighbours.",
            "Give `spacing` in wavelengths or metres."),
        new(
            "C063",
            "Pair of more than two",
            "The shape `pair` has two emitters, the protocol another number.",
            "Choose ring, chain, point or explicit positions."),
        new(
            "C064",
            "Wavelength missing",
            "A length in metres means nothing to collective decay unless the wavelength is known.",
            "Give `wavelength`, or lengths in wavelengths."),
        new(
            "C065",
            "Unfit geometry",
            "Emitters coincide outside the shape `point`, a dipole has no direction, or transitions of one wavelength with dipoles that are not orthogonal would couple to each other.",
            "Move the emitters apart, give a direction, or tell the wavelengths as they differ."),
        new(
            "C066",
            "No storage",
            "`resourcecheck storage` follows what the `storage` section of the conditions describes.",
            "Add a `storage` section."),
        new(
            "C067",
            "Faster than light",
            "A speed above that of light in vacuum. This is a warning: figures are computed all the same, for a world that does not exist.",
            "Check the value and its unit."),
        new(
            "C068",
            "No relaxation",
            "`resourcecheck relaxation` follows what the `resource.relaxed` section of the conditions describes.",
            "Add a `resource.relaxed` section."),
        new(
            "C070",
            "Malformed path",
            "The path of `--set` cannot be taken apart.",
            "Join keys by points, count list entries in brackets from 0."),
        new(
            "C071",
            "Path leads nowhere",
            "The path of `--set` goes into a value that has no keys or no such entry.",
            "Set the value itself, or an entry that exists."),
        new(
            "C072",
            "Path without a party",
            "The section is given per party, and the path does not say whose value is meant.",
            "Put `default` or a party's name into the path."),
    ];
}
