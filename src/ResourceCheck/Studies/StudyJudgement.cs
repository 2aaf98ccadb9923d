using System.Diagnostics;
using System.Globalization;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement;
using ResourceCheck.Judgement.Studies;

namespace ResourceCheck.Studies;

/// <summary>Works a study off, step by step. What fails is told and the rest stands; what is wrong with the inputs is told before anything is computed.</summary>
public sealed class StudyJudgement
{
    private readonly StudyRequest _request;
    private readonly long _start = Stopwatch.GetTimestamp();
    private readonly int _steps;
    private int _step;

    private StudyJudgement(StudyRequest request)
    {
        _request = request;
        _steps = request.Study.Parts.Sum(p => 1 + (p.Budget ? 1 : 0) + p.Tolerances.Count + p.Sweeps.Count + p.Copies.Count);
    }

    /// <summary>Computes a study.</summary>
    public static Outcome<StudyResult> Of(StudyRequest request)
    {
        Diagnostic[] mistakes = [.. request.Study.Parts.SelectMany(Mistakes).Distinct()];
        if (mistakes.Length > 0)
            return Outcome<StudyResult>.Failed(mistakes);
        StudyJudgement judgement = new(request);
        StudyResult result = new(Judgement.Provenance.Version, request.Study, [.. request.Study.Parts.Select(judgement.Compute)]);
        return result.Parts.Any(p => p.Run is not null)
            ? Outcome<StudyResult>.Of(result)
            : Outcome<StudyResult>.Failed([.. result.Parts.SelectMany(p => p.Failures.SelectMany(f => f.Findings.Select(d => StudyFileMessages.InPart(d, p.Part.Title)))).Distinct(), StudyFileMessages.NothingComputed()]);
    }

    /// <summary>Errors of script, conditions, parameters and ranges; those that only computing shows come later.</summary>
    private static IEnumerable<Diagnostic> Mistakes(StudyPart part)
    {
        IEnumerable<Diagnostic> found = Judge.Inspect(part.Request).Findings
            .Concat(part.Tolerances.SelectMany(t => SweepJudgement.Variations(part.Request, [new(t.Path, t.Range)], 1).Findings))
            .Concat(part.Copies.Where(c => c.Vary.Count > 0).SelectMany(c => SweepJudgement.Variations(part.Request, c.Vary, 1).Findings))
            .Concat(part.Sweeps.SelectMany(s => SweepJudgement.Variations(part.Request, s, s.Count).Findings));
        return found.Where(f => f.Severity == Severity.Error && !f.Code.StartsWith('E')).Select(f => StudyFileMessages.InPart(f, part.Title));
    }

    private StudyPartResult Compute(StudyPart part, int index)
    {
        List<StudyFailure> failures = [];
        RunRequest request = part.Request with { Threads = _request.Threads, Seed = _request.Seed, Cancellation = _request.Cancellation };
        // Bands of every subset of sources and of every point of a map would take most of the time, and no figure shows them.
        RunRequest plain = request with { Uncertainty = null };
        RunResult? run = Step("verdict", () => Judge.Run(request));
        BudgetResult? budget = part.Budget ? Step("loss by source", () => Judge.Budget(plain)) : null;
        ToleranceResult?[] tolerances = [.. part.Tolerances.Select(t => Step($"tolerance of {t.Path}", () => Judge.Tolerance(new ToleranceRequest(request, [new(t.Path, t.Range)], t.Goal))))];
        SweepResult?[] sweeps = [.. part.Sweeps.Select((s, i) => Step(
            $"figures against {string.Join(" and ", s.Select(v => v.Key))}", () => Judge.Sweep(new SweepRequest(s.Count == 1 ? request : plain, s, Journal(index, i), null))))];
        CopiesResult?[] copies = [.. part.Copies.Where(c => c.Vary.Count == 0).Select(c => Step(
            string.Create(CultureInfo.InvariantCulture, $"copies for a failure of {c.Failure:R}"), () => Judge.Copies(new CopiesRequest(request, c.Failure, c.Harm, null))))];
        CopiesTable?[] tables = [.. part.Copies.Where(c => c.Vary.Count > 0).Select(c => Step(
            $"copies against {c.Vary[0].Key}", () => Judge.Copies(new CopiesTableRequest(new CopiesRequest(request, c.Failure, c.Harm, null), [c.Failure], c.Harm, c.Vary))))];
        return new StudyPartResult
        {
            Part = part,
            Run = run,
            Budget = budget,
            Tolerances = [.. tolerances.OfType<ToleranceResult>()],
            Sweeps = [.. sweeps.OfType<SweepResult>()],
            Copies = [.. copies.OfType<CopiesResult>()],
            CopiesTables = [.. tables.OfType<CopiesTable>()],
            Failures = failures,
        };

        T? Step<T>(string what, Func<Outcome<T>> compute)
            where T : class
        {
            _request.Cancellation.ThrowIfCancellationRequested();
            double passed = Stopwatch.GetElapsedTime(_start).TotalSeconds;
            _request.Progress?.Report(new StudyProgress(++_step, _steps, part.Title, what, _step > 1 ? passed / (_step - 1) * (_steps - _step + 1) : null));
            Outcome<T> outcome = compute();
            if (outcome.Value is null)
                failures.Add(new StudyFailure(what, [.. outcome.Findings.Where(f => f.Severity == Severity.Error)]));
            return outcome.Value;
        }
    }

    private string? Journal(int part, int sweep) =>
        _request.Journals is { } folder ? Path.Combine(folder, string.Create(CultureInfo.InvariantCulture, $"part-{part + 1}-sweep-{sweep + 1}.points")) : null;
}
