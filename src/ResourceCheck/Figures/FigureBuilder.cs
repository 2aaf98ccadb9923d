using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;

namespace ResourceCheck.Figures;

/// <summary>Draws results. The same result gives the same bytes, whatever the machine's fonts and culture.</summary>
public static class FigureBuilder
{
    /// <summary>Curves against one value or a map of two for each goal.</summary>
    /// <param name="sweep">The sweep.</param>
    /// <param name="id">Name of the figure.</param>
    /// <param name="tolerated">Value up to which the goal is met, to be marked on curves.</param>
    public static IReadOnlyList<FigureImage> Of(SweepResult sweep, string id = "sweep", double? tolerated = null) => SweepFigures.Of(sweep, id, tolerated);

    /// <summary>The goal's figure with its crossings.</summary>
    public static FigureImage Of(ToleranceResult tolerance, string id = "tolerance") => CurveFigures.Of(tolerance, id);

    /// <summary>Loss by source; null when nothing is lost.</summary>
    public static FigureImage? Of(BudgetResult budget, string id = "budget") => BudgetFigure.Of(budget, id);

    /// <summary>Failure against the number of copies.</summary>
    public static FigureImage Of(CopiesResult copies, string id = "copies") => CurveFigures.Of(copies, id);

    /// <summary>Numbers of copies against a varied value, one series for each target; null when nothing is varied or no number was found.</summary>
    public static FigureImage? Of(CopiesTable copies, string id = "copies") => CurveFigures.Of(copies, id);

    /// <summary>Parties and messages against time; null when nothing takes time.</summary>
    public static FigureImage? Of(RunResult run, string id = "timeline") => TimelineFigure.Of(run, id);

    /// <summary>Fidelities against storage time.</summary>
    public static FigureImage Of(StorageResult storage, string id = "storage") => CurveFigures.Of(storage, id);

    /// <summary>Populations against time of relaxation.</summary>
    public static FigureImage Of(RelaxationResult relaxation, string id = "relaxation") => CurveFigures.Of(relaxation, id);
}
