using ResourceCheck.Diagnostics;

namespace ResourceCheck.Judgement.Studies;

/// <summary>Causes and cures of the messages about sweeps and tolerances.</summary>
internal static class StudyCatalogue
{
    public static IReadOnlyList<Explanation> All { get; } =
    [
        new("J001", "range that cannot be read", "What is varied takes values FROM..TO, both with their unit or the last with the unit of both; `:20` asks for 20 values, `:log 20` for 20 evenly spaced in their logarithms.", "Write the range in this form, in quotes when it has a space."),
        new("J002", "two units in one range", "Both ends of a range are in one unit, which the table and the answer use too.", "Convert one end."),
        new("J003", "range without values", "A range begins with its smaller end.", "Swap the ends."),
        new("J004", "logarithm of nothing", "Logarithmic spacing needs ends above 0.", "Leave log out, or begin above 0."),
        new("J005", "number of points", "A range takes at least 2 values, and a whole-number parameter no more than its range holds.", "Choose another number of points."),
        new("J006", "nothing varied, or too much", "A sweep varies one or two paths, a tolerance one.", "Give --vary once or twice."),
        new("J007", "points of another sweep", "A sweep that writes to a file keeps its finished points beside it until it is done. The points there belong to other inputs or ranges.", "Delete that file, or write elsewhere."),
        new("J008", "points cannot be kept", "The file with the finished points could not be written.", "Free the disk or choose another folder; finished points that were kept are not computed again."),
        new("J009", "no goal to hold", "A tolerance is the value at which a goal is just met.", "Give the goal with --until or in the script."),
        new("J010", "tolerance of a harm", "Harm is the worst that a search finds at each value, whose steps would be taken for crossings.", "Set a goal on another figure, or sweep."),
        new("J011", "figure not defined", "Somewhere in the range the figure has no value, for example because no copy is kept.", "Narrow the range."),
        new("J012", "no number of copies to vary", "The command varies the parameter that stands behind `copies`.", "Let the script write copies with a parameter."),
        new("J013", "no threshold", "--optimise names a parameter that does not exist or takes only listed or whole values.", "Name parameters with a real range, or `all`.", "--optimise a,t1"),
        new("J014", "several values beside thresholds", "Thresholds are chosen for fixed values of all other parameters.", "Give one value for each."),
        new("E010", "target not reached", "With these thresholds and this noise, honest failure or a harm does not fall below the target, however many copies are taken, or only with more than the program counts.", "Choose other thresholds, lower the noise, or ask for less."),
    ];
}
