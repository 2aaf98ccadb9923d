using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Dense;
using ResourceCheck.Numerics.Collective;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts;

namespace ResourceCheck.Judgement;

/// <summary>Texts about parameter choices (P001 to P019) and about results that cannot be trusted or had (E001 to E019).</summary>
internal static class JudgementMessages
{
    public static Diagnostic UnknownParameter(string name, IReadOnlyList<ParameterInfo> known) => Wrong(
        "P001",
        name,
        known.Count == 0 ? $"`{name}` is no parameter: this script has none." : $"`{name}` is no parameter of this script: {Words.Or(known.Select(p => p.Name))} {(known.Count == 1 ? "fits" : "fit")} here.",
        known.Count == 0 ? "leave --parameter out" : Words.DidYouMean(name, known.Select(p => p.Name)) ?? "`inspect` lists the parameters of a script");

    public static Diagnostic UnreadableChoice(string name, string value) => Wrong(
        "P002", name, $"`{value}` gives no value for {name}: a number, a fraction, a list such as 3,4, a range such as 3..8, or all fits here.", $"write for example --parameter {name}=3");

    public static Diagnostic OutsideDomain(ParameterInfo parameter, Rational value) => Wrong(
        "P003",
        parameter.Name,
        $"{parameter.Name} = {value} lies outside what the script allows: {Domain(parameter)} fits here.",
        "choose a value inside, or widen the domain in the script");

    public static Diagnostic NoListedValues(ParameterInfo parameter) => Wrong(
        "P004", parameter.Name, $"{parameter.Name} is a real range, so there is no list of all its values: numbers from {parameter.From} to {parameter.To} fit here.", "name the values you want, separated by commas");

    public static Diagnostic TwiceChosen(string name) => Wrong(
        "P005", name, $"{name} is given twice: one --parameter per name fits here.", "join the values with commas");

    public static Diagnostic TooManyAssignments(double count, int most) => new(
        "P006", Severity.Error, $"The parameter values make {count:R} combinations: up to {most} fit in one run.", "ask for fewer values at once", Place.Of("--parameter"));

    public static Diagnostic BrokenRequirement(Scripts.Binding.Requirement requirement, SourceText source, string at) => new(
        "P010",
        Severity.Warning,
        $"The script requires {requirement.Text}, but here {requirement.Figures}{(at.Length == 0 ? "" : $" ({at})")}: {requirement.Reason}.",
        "choose parameters that meet the requirement; figures are shown all the same, its claims do not hold",
        source.PlaceOf(requirement.Span));

    public static Diagnostic MatrixSize(Place at, string file, int size, int levels) => new(
        "P012", Severity.Error, $"The matrix in {file} is {size}×{size}, but each qudit here has {levels} levels: {levels}×{levels} fits here.", "give a matrix of that size, or change the number of parties", at);

    public static Diagnostic NotUnitary(Place at, string file, double defect) => new(
        "P013", Severity.Error, $"The matrix in {file} is not unitary: U†U differs from 1 by {FigureText.Number(defect)}, more than 1e-9.", "give every entry with all its digits", at);

    public static Diagnostic DoesNotFit(EngineChoice choice, double limit, bool asked, bool hasSink, string? others) => new(
        "E001",
        Severity.Error,
        $"The {choice.Name} evaluation would take {FigureText.Bytes(choice.MemoryBytes)} of memory; {Allowed(limit, asked)}.{(others is null ? "" : $" Nor does another engine serve: {others}.")}",
        $"{(asked && choice.MemoryBytes < DenseEngine.LargestMemory ? "allow more with --memory if the machine has it, " : "")}lower the number of parties{(choice.Name == EngineSelection.Dense ? hasSink ? ", or herald losses (one that is not adds a level)" : "" : ", or leave --engine out")}",
        Place.Of("engine"));

    public static Diagnostic UnknownEngine(string name) => new(
        "E002", Severity.Error, $"`{name}` is no engine: {Words.Or(EngineSelection.Names)} fits here.", "leave --engine out and the program chooses", Place.Of("--engine"));

    public static Diagnostic DoesNotApply(string name, string reason) => new(
        "E019", Severity.Error, $"The {name} engine does not apply here: {reason}.", "leave --engine out and the program chooses", Place.Of("--engine"));

    public static Diagnostic NothingKept(string at) => new(
        "E003",
        Severity.Error,
        $"No copy is kept{(at.Length == 0 ? "" : $" ({at})")}: every branch ends at a `keep`, a herald or a missing click, so there is no figure to give.",
        "look at what `keep` asks for and at the transmission and efficiency of the conditions",
        Place.Of("result"));

    public static Diagnostic NotFinite(string name, string at) => new(
        "E004",
        Severity.Warning,
        $"{name} is not defined{(at.Length == 0 ? "" : $" ({at})")}: its condition never holds, or it divides by zero.",
        "look at the condition behind `given`, or at the divisor",
        Place.Of("result"));

    public static Diagnostic TooManyEmitters(int emitters, int most) => new(
        "E006", Severity.Error, $"Storage of {emitters} emitters without a photon takes {emitters}! amplitudes: up to {most} emitters fit here.", "ask for fewer emitters", Place.Of("--parties"));

    public static Diagnostic CollectiveTooLarge(int parties, int most) => new(
        "E007",
        Severity.Error,
        $"Storage with photons evolves the density operator of all emitters, which takes {FigureText.Bytes(16 * Math.Pow(parties, 2 * parties))} for {parties} of them: up to {most} emitters fit here.",
        $"lower the number of parties, or look at storage alone: `resourcecheck storage FILE --parties {parties}`, exact for up to {PhotonFreeStorage.MostEmitters} emitters, with and without heralding",
        Place.Of("storage"));

    public static Diagnostic TooLongToIntegrate(string section, double work) => new(
        "E018",
        Severity.Error,
        $"Integrating `{section}` would take about {FigureText.Number(work)} multiplications, hours on one core: up to {FigureText.Number(EvolutionCost.Most)} fit here. Exchange shifts grow as the inverse cube of the spacing.",
        "move the emitters apart, shorten the time, or take the shape `point`, the limit without exchange shifts",
        Place.Of(section));

    public static Diagnostic TooManyToRelax(int emitters, int most) => new(
        "E017",
        Severity.Error,
        $"Relaxation of {emitters} emitters starts from {emitters}^{emitters} amplitudes, {FigureText.Bytes(16 * Math.Pow(emitters, emitters))} of them: up to {most} emitters fit here.",
        "ask for fewer emitters",
        Place.Of("--parties"));

    public static Diagnostic WithoutShifts() => new(
        "P020", Severity.Note, "The emitters stand at one point: exchange shifts, which have no bound there, are left out.", "give a shape with a spacing to see what the shifts do", Place.Of("storage.shape"));

    public static Diagnostic DarkNotStable(double time, double noPhoton, double fidelity, int first, int second) => new(
        "P021",
        Severity.Warning,
        $"Dark is not stable here: after {FigureText.Time(time)} the state has emitted nothing with probability {FigureText.Number(noPhoton)}, yet its fidelity is {FigureText.Number(fidelity)} (both exact). Exchange shifts move it, most of all the one between emitters {first} and {second}.",
        "make all pairs equivalent (a pair, an equilateral triangle), stand further apart, or store for a shorter time",
        Place.Of("storage"));

    public static Diagnostic RoughIntegration(double error) => new(
        "P022",
        Severity.Warning,
        $"Collective decay was integrated with an estimated error of {FigureText.Number(error, Rounding.Up)} in probabilities, so that figures marked exact are exact only to that.",
        "lower `tolerance` in `storage` or `resource.relaxed`",
        Place.Of("tolerance"));

    public static Diagnostic InterceptTooKnowing(Place at) => new(
        "P031",
        Severity.Error,
        "This interception stands in a conditional block that asks for more than the outsider knows while qudits fly: only the outsider's own values and lines fit in such a block.",
        "let the condition use the outsider's own picks alone, and take other lines out of the block",
        at);

    public static Diagnostic CentralValues(IReadOnlyList<Conditions.UncertainQuantity> uncertain) => new(
        "P033",
        Severity.Note,
        $"{Words.And(uncertain.Select(u => $"`{u.Path}`"))} {(uncertain.Count == 1 ? "carries an uncertainty" : "carry uncertainties")}: figures are of the central values.",
        "carry uncertainties through with --uncertainty, which run, budget, sweep and tolerance know",
        Place.Of("conditions"));

    public static Diagnostic FigureOfDiscussion(Place at) => new(
        "P030",
        Severity.Error,
        "This figure is about what a discussion made, which has no probability per copy: `success`, `failure`, `abort` and figures of the rounds fit here.",
        "let `success` or the harm of a dishonest case ask for it",
        at);

    public static Diagnostic ChoicesOutOfReach(string name, double combinations, int most) => new(
        "P032",
        Severity.Error,
        combinations < 1 ? $"The choices of \"{name}\" leave nothing: a range is empty at these parameter values." : $"The choices of \"{name}\" make {FigureText.Number(combinations)} combinations: up to {most} are all tried on single copies.",
        combinations < 1 ? "widen the range" : "narrow the ranges, or make a case for each part",
        Place.Of($"dishonest \"{name}\""));

    public static Diagnostic NothingToShare(string metric, string reason) => new(
        "E009", Severity.Error, $"The loss of {metric} cannot be shared out among its sources: {reason}.", "set a goal on another figure", Place.Of("budget"));

    public static Diagnostic SearchRefused(string name, string reason) => new(
        "E008",
        Severity.Error,
        $"The worst choice of \"{name}\" could not be searched: {reason}",
        "lower M, or fix some of the choices",
        Place.Of($"dishonest \"{name}\""));

    public static Diagnostic UnknownCheat(string text, string name, IEnumerable<string> known) => new(
        "P040",
        Severity.Error,
        known.Any() ? $"`{name}` is no case whose numbers are left open: {Words.Or(known)} fit here." : $"`{text}` gives numbers to a case, but no case of this script leaves any open.",
        known.Any() ? Words.DidYouMean(name, known) ?? "name a case, a colon and its numbers" : "leave --choose out",
        Place.Of("--choose"));

    public static Diagnostic CheatTwice(string name) => new(
        "P040", Severity.Error, $"The numbers of case \"{name}\" are given twice: one --choose per case fits here.", "keep one of them", Place.Of("--choose"));

    public static Diagnostic UnreadableNumbers(string text, Scripts.Binding.DishonestCase cheat) => new(
        "P041",
        Severity.Error,
        $"`{text}` does not give each number of case \"{cheat.Name}\" once: a value for {Words.And(cheat.Choices.Select(c => c.Name))} fits here.",
        $"write for example --choose \"{cheat.Name}: {string.Join(", ", cheat.Choices.Select(c => $"{c.Name} = 1"))}\"",
        Place.Of("--choose"));

    public static Diagnostic NumberOutside(Scripts.Binding.DishonestCase cheat, int index, Scripts.Binding.Value value) => new(
        "P042",
        Severity.Error,
        $"{cheat.Choices[index].Name} = {Scripts.Binding.Written.Write(value)} lies outside what case \"{cheat.Name}\" leaves open: {(cheat.Choices[index].Whole ? "a whole number" : "a number")} within its `choose` line fits here.",
        "look at the ranges in the script; they may depend on the numbers before",
        Place.Of("--choose"));

    public static Diagnostic TooManyLevels(int levels, int most) => new(
        "P043", Severity.Error, $"All assignments of {levels} levels are too many to compare: one number of levels, up to {most}, fits here.", "leave --try-levels out, and set resource.levels to the assignments that matter", Place.Of("--try-levels"));

    public static Diagnostic NoClaims(SourceText source) => new(
        "P011", Severity.Warning, "This script makes no claims, so there is nothing to prove.", "state what it promises, such as `claim success = 1`", Place.Of(source.Name));

    private static string Allowed(double limit, bool asked) => FigureText.Bytes(limit) switch
    {
        var size when limit >= DenseEngine.LargestMemory => $"the engine can use {size} at most on any machine",
        var size when asked => $"--memory allows {size}",
        var size => $"of this machine's, {size} may be used",
    };

    private static string Domain(ParameterInfo parameter) =>
        parameter.Values is { } values ? Words.Or(values.Select(v => v.ToString())) : $"a number from {parameter.From} to {parameter.To}";

    private static Diagnostic Wrong(string code, string name, string message, string cure) => new(code, Severity.Error, message, cure, Place.Of($"--parameter {name}"));
}
