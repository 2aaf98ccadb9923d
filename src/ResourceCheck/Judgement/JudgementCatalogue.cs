using ResourceCheck.Diagnostics;

namespace ResourceCheck.Judgement;

/// <summary>Cause and cure of the messages about parameter choices and results.</summary>
internal static class JudgementCatalogue
{
    /// <summary>All explanations, in order of code.</summary>
    public static IReadOnlyList<Explanation> All { get; } =
    [
        new("E001", "does not fit", "The evaluation was estimated before anything was allocated, and it needs more memory than may be used. A density operator of N qudits of d levels takes d^2N numbers, of which four are held at once.", "Lower the number of parties, or raise --memory on a larger machine. Loss that is not heralded adds a component per qudit.", "resourcecheck run protocols/leader-draw.protocol --parameter n=7"),
        new("E002", "unknown engine", "The engine named with --engine does not exist.", "Leave --engine out; the program chooses and says why.", "--engine fast"),
        new("E003", "nothing kept", "No copy survives: a `keep` that never holds, a transmission of 0 on a heralded flight, or detectors that never click.", "Look at the keeps of the script and at transmission, efficiency and dark counts of the conditions."),
        new("E004", "undefined figure", "A figure divides by zero or is asked for copies that never occur, such as probability(A given B) with B impossible, or a Bell value at a checkpoint where a party holds no qudit.", "Change the condition behind `given`, or give the figure a case in which it is defined."),
        new("E006", "too many emitters", "Without a photon the state of N emitters stays among N! arrangements of levels, which are laid out up to nine emitters.", "Ask for fewer emitters."),
        new("E007", "storage too large", "What is left after a photon is followed with the density operator of all emitters.", "Lower the number of parties, or use `resourcecheck storage`, which follows copies without a photon."),
        new("E008", "search refused", "The worst choice of a cheat on lists is found by counting, which is too much work here or does not apply.", "Lower M, or fix some of the choices."),
        new("E009", "loss that cannot be shared out", "A budget compares a figure with and without each source of loss; the figure must be exact and defined each time.", "Set a goal on another figure, which the budget is then about."),
        new("E017", "relaxation too large", "Relaxation starts from a state vector of N emitters with N levels each, and beyond eight of them it does not fit in memory.", "Ask for fewer emitters."),
        new("E019", "engine does not apply", "The engine asked for with --engine takes other resources, other noise, or other conditions than this protocol and these conditions have.", "Leave --engine out; the program chooses and says why.", "resourcecheck run protocols/removal-stored.protocol --under protocols/removal-stored.conditions.json --engine product"),
        new("E018", "integration too long", "Exchange shifts between emitters grow as the inverse cube of their spacing, and the state must be followed through every turn they make; here that would take hours.", "Move the emitters apart, shorten the time, or take the shape `point`, which has no exchange shifts.", "\"spacing\": \"0.0002 wavelengths\""),
        new("P001", "unknown parameter", "--parameter names something that the script does not declare.", "Use a declared name; `inspect` lists them.", "--parameter m=3"),
        new("P002", "unreadable value", "The value of --parameter is no number, fraction, list, range or `all`.", "Write a number, 1/3, 3,4 or 3..8.", "--parameter n=three"),
        new("P003", "outside the domain", "The script limits the values of this parameter.", "Choose a value inside, or widen the domain in the script.", "--parameter n=40"),
        new("P004", "no list of all values", "`all` was asked for a parameter that may take any real number of a range.", "Name the values you want.", "--parameter t=all"),
        new("P005", "chosen twice", "The same parameter stands behind --parameter twice.", "Join the values with commas.", "--parameter n=3 --parameter n=4"),
        new("P006", "too many combinations", "Every combination of the chosen values is evaluated, and there are too many for one run.", "Ask for fewer values at once."),
        new("P010", "requirement broken", "The script states with `require` what its parameters must satisfy; these values do not. Figures are shown all the same, but what the protocol claims need not hold.", "Choose parameters that meet the requirement."),
        new("P011", "no claims", "`verify` proves what a script claims, and this one claims nothing.", "State what the protocol promises, such as `claim success = 1`."),
        new("P012", "matrix size", "A matrix file named by the script does not have as many rows as each qudit has levels.", "Give a matrix of that size."),
        new("P013", "not unitary", "The columns of a matrix file named by the script are not orthonormal to 1e-9.", "Give every entry with all its digits."),
        new("P020", "no exchange shifts at one point", "At no distance the exchange shifts between emitters have no bound; the shape `point` is the limit in which they are left out.", "Give a shape with a spacing to see what they do."),
        new("P021", "dark is not stable", "The antisymmetric state hardly emits, but exchange shifts that differ from pair to pair turn it into other dark states: the no-photon probability stays high while the fidelity falls.", "Make all pairs equivalent, stand further apart, or store for a shorter time."),
        new("P022", "rough integration", "The evolution of emitters that decay together was integrated with a tolerance so wide that its estimated error shows in the figures.", "Lower `tolerance` in `storage` or `resource.relaxed`; 1e-12 is taken where it is not given.", "\"tolerance\": 0.01"),
        new("P030", "figure of a discussion", "A report or claim of a list protocol asks for the probability of something that a discussion made once for all copies.", "Let `success` or the harm of a dishonest case ask for it."),
        new("P031", "interception that knows too much", "An interception happens in flight, when no message has been sent yet, so a conditional block around it can use only the outsider's own values and hold only the outsider's lines.", "Condition it on the outsider's own picks."),
        new("P032", "choices out of reach", "On single copies every combination of a cheat's choices is tried; here there are none, or too many.", "Narrow the ranges, or make a case for each part."),
        new("P033", "uncertainties are not carried through", "Values of the conditions are given with a standard uncertainty. Figures are computed from the central values; this is a note.", "Add --uncertainty to run, budget, sweep or tolerance."),
        new("P045", "uncertain value that cannot be moved", "Uncertainties are carried through by moving each uncertain value a little while the others stay. Here the conditions allow that on no side, most often because numbers must add up to 1.", "Give the uncertainty to a value that others do not depend on.", "\"confusion\": [[\"0.98(1)\", 0.02], [0.02, 0.98]]"),
        new("P046", "figure that bends", "To first order a figure is taken to change in proportion to each uncertain value. Here draws give another uncertainty, or the slope depends on how far one looks.", "Go by the sampled band; a sweep over the value shows the bend."),
        new("P047", "nothing uncertain", "--uncertainty was asked for, but no value of the conditions carries one.", "Write the standard uncertainty behind a value, in units of its last digits.", "\"lifetime\": \"80(10) us\""),
        new("P040", "unknown case", "--choose names a case that the script does not have, that leaves no number open, or that has its numbers already.", "Name a case of the script whose `choose` lines leave numbers open, once.", "--choose \"sender splits: n = 84, k1 = 0, k2 = 15, o = 7, n1 = 126\""),
        new("P041", "numbers of a case", "--choose must give every number that the case leaves open, each once.", "Write the case, a colon, and each number as name = value, separated by commas."),
        new("P042", "number outside its range", "A number given with --choose lies outside the range of its `choose` line, or is not whole where the range is.", "Give a number within the range; ranges may depend on numbers before."),
        new("P043", "levels cannot be compared", "--try-levels evaluates every order of the physical levels, which are too many for more than four, and must be as many for all parameter values.", "Leave it out, and try single assignments with --set resource.levels=\"[2, 0, 1]\"."),
    ];
}
