namespace ResourceCheck.Studies;

/// <summary>Keys of a study file.</summary>
internal static class StudyKeys
{
    public const string Schema = "$schema", About = "about", Title = "title", Parts = "parts", Script = "script", Conditions = "conditions", Set = "set", Parameters = "parameters",
        Budget = "budget", Uncertainty = "uncertainty", Tolerances = "tolerances", Vary = "vary", Goal = "goal", Sweeps = "sweeps", Copies = "copies", Failure = "failure", Harm = "harm";

    public static readonly string[] OfStudy = [Schema, About, Title, Parts];

    public static readonly string[] OfPart = [About, Title, Script, Conditions, Set, Parameters, Uncertainty, Budget, Tolerances, Sweeps, Copies];

    public static readonly string[] OfTolerance = [About, Vary, Goal];

    public static readonly string[] OfSweep = [About, Vary];

    public static readonly string[] OfCopies = [About, Failure, Harm, Vary];
}
