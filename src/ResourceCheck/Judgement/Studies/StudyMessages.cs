using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;

namespace ResourceCheck.Judgement.Studies;

/// <summary>Texts about what a sweep or a tolerance varies (J001 to J019).</summary>
internal static class StudyMessages
{
    private const string Example = "flight.default.length=1 km..20 km:20";

    public static Diagnostic UnreadableRange(string path, string text) => Wrong(
        "J001", path, $"`{text}` is no range of values: FROM..TO, with a number of points behind a colon if need be, fits here.", $"write for example --vary {path}=0..0.1:11, or {Example}, or with log in front of the number of points");

    public static Diagnostic TwoUnits(string path, string one, string other) => Wrong(
        "J002", path, $"The range of {path} begins in {one} and ends in {other}: one unit fits here.", "write both ends in the same unit");

    public static Diagnostic EmptyRange(string path, string text) => Wrong(
        "J003", path, $"`{text}` holds no range: it must begin with the smaller end.", "swap the ends");

    public static Diagnostic NoLogarithm(string path, string text) => Wrong(
        "J004", path, $"`{text}` cannot be spaced logarithmically: both ends must be above 0.", "leave log out, or begin above 0");

    public static Diagnostic TooManyPoints(string path, int count, int most) => Wrong(
        "J005", path, $"{path} would take {count} values: 2 to {most} fit here.", "choose another number of points, or a wider range");

    public static Diagnostic NothingVaried(int found, int most) => Wrong(
        "J006", "", found == 0 ? "Nothing is varied." : $"{found} paths are varied: up to {most} fit here.", $"say what is varied, such as --vary \"{Example}\"");

    public static Diagnostic OtherJournal(string journal) => new(
        "J007", Severity.Error, $"{journal} holds the points of another sweep.", "delete it, or write to another file with --out", Place.Of("--out"));

    public static Diagnostic JournalRefused(string journal, string reason) => new(
        "J008", Severity.Error, $"The finished points cannot be kept in {journal}: {reason}.", "free the disk or choose another file with --out; run again to go on where it stopped", Place.Of("--out"));

    public static Diagnostic NoGoal() => new(
        "J009", Severity.Error, "There is no goal to hold: one such as `success >= 0.9` fits here.", "give it with --until, or write a goal line into the script", Place.Of("--until"));

    public static Diagnostic GoalOnHarm() => new(
        "J010", Severity.Error, "A tolerance follows success, failure, abort, yield, a checkpoint or a report; harm of a dishonest case is searched anew at each value and does not fit here.", "set a goal on another figure", Place.Of("--until"));

    public static Diagnostic UndefinedGoal(string path, string value) => Wrong(
        "J011", path, $"The goal's figure is not defined at {path} = {value}.", "choose a range in which it is");

    public static Diagnostic NoCopiesParameter() => new(
        "J012", Severity.Error, "The number of copies cannot be varied: a `copies` line with a parameter, as in `copies M`, fits here.", "declare `parameter M = 150 in 12..1000000` and write `copies M`", Place.Of("script"));

    public static Diagnostic NoThreshold(string name, IEnumerable<string> known) => new(
        "J013", Severity.Error, $"`{name}` is no threshold that could be chosen: {Words.Or(known.Append("all"))} fit here.", Words.DidYouMean(name, known) ?? "thresholds are parameters with a real range, such as `in 0 to 1`", Place.Of("--optimise"));

    public static Diagnostic SeveralSettings() => new(
        "J014", Severity.Error, "Thresholds are chosen for one value of every other parameter, but several are given.", "give one value each with --parameter", Place.Of("--optimise"));

    public static Diagnostic NoThresholdsReach(int most, CopiesRequest request) => new(
        "E010",
        Severity.Error,
        $"No thresholds were found that hold the targets (honest failure {FigureText.Number(request.Failure)}, harms {FigureText.Number(request.Harm)}) with up to {most} copies.",
        "lower the noise, ask for less, or begin with other thresholds",
        Place.Of("copies"));

    public static Diagnostic NotReached(string parameter, CopiesStep last, CopiesRequest request) => new(
        "E010",
        Severity.Error,
        $"No number of copies up to {last.Copies} holds the targets: at {parameter} = {last.Copies} honest failure is {FigureText.Number(last.Failure.Value)}, the target {FigureText.Number(request.Failure)}"
            + (last.Harm is { } harm ? $", the worst harm {FigureText.Number(harm.Value)}, the target {FigureText.Number(request.Harm)}." : "."),
        "choose other thresholds with --parameter, lower the noise, or ask for less",
        Place.Of("copies"));

    private static Diagnostic Wrong(string code, string path, string message, string cure) => new(code, Severity.Error, message, cure, Place.Of(path.Length == 0 ? "--vary" : $"--vary {path}"));
}
