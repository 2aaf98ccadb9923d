using ResourceCheck.Engines.Lists;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>State of the search for a cheat's worst numbers.</summary>
/// <param name="Case">The cheating strategy.</param>
/// <param name="At">Parameter and input values in words; empty when there are none.</param>
/// <param name="Evaluations">Choices evaluated so far.</param>
/// <param name="Best">Largest harm so far.</param>
public sealed record SearchNote(string Case, string At, int Evaluations, double Best);

/// <summary>Passes the state of a search on to whoever asked for a run.</summary>
internal sealed class SearchTeller(IProgress<SearchNote> progress, string name, string at) : IProgress<SearchProgress>
{
    public static SearchTeller? Of(RunRequest request, DishonestCase cheat, string at) => request.Progress is { } progress ? new SearchTeller(progress, cheat.Name, at) : null;

    public void Report(SearchProgress value)
    {
        ArgumentNullException.ThrowIfNull(value);
        progress.Report(new SearchNote(name, at, value.Evaluations, value.Best));
    }
}
