using System.Diagnostics;
using System.Text.Json;
using ResourceCheck.Diagnostics;
using ResourceCheck.Judgement.Uncertain;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Judgement.Studies;

/// <summary>Evaluates a protocol at every point of a grid.</summary>
internal static class SweepJudgement
{
    private const int MostVaried = 2;

    public static Outcome<SweepResult> Of(SweepRequest request)
    {
        Outcome<IReadOnlyList<Variation>> varied = Variations(request.Run, request.Vary, MostVaried);
        if (varied.Value is not { } variations)
            return Outcome<SweepResult>.Failed(varied.Findings);
        double[][] points = [.. Grid(variations)];
        if (points.Length > Variation.MostPoints)
            return Outcome<SweepResult>.Failed([StudyMessages.TooManyPoints(string.Join(", ", variations.Select(v => v.Path)), points.Length, Variation.MostPoints)]);
        // What is wrong with the first point is most often wrong with all: it is told before anything is computed.
        Outcome<Setup> first = Setup.From(Request(request.Run, variations, points[0])), last = Setup.From(Request(request.Run, variations, points[^1]));
        if (first.Value is null && last.Value is null)
            return Outcome<SweepResult>.Failed(first.Findings);
        try
        {
            using SweepJournal? journal = request.Journal is { } name ? SweepJournal.Open(name, SweepJournal.Identity(request.Run, variations)) : null;
            return request.Journal is not null && journal is null
                ? Outcome<SweepResult>.Failed([StudyMessages.OtherJournal(request.Journal)])
                : Outcome<SweepResult>.Of(Conclude(request, variations, (first.Value ?? last.Value)!, Evaluate(request, variations, points, journal)));
        }
        catch (AggregateException several) when (several.InnerExceptions.OfType<IOException>().FirstOrDefault() is { } failure)
        {
            return Outcome<SweepResult>.Failed([StudyMessages.JournalRefused(request.Journal!, failure.Message)]);
        }
        catch (Exception failure) when (failure is IOException or UnauthorizedAccessException or JsonException && request.Journal is not null)
        {
            return Outcome<SweepResult>.Failed([StudyMessages.JournalRefused(request.Journal!, failure.Message)]);
        }
    }

    /// <summary>Reads what is varied.</summary>
    public static Outcome<IReadOnlyList<Variation>> Variations(RunRequest request, IReadOnlyList<KeyValuePair<string, string>> vary, int most)
    {
        if (vary.Count is 0 || vary.Count > most)
            return Outcome<IReadOnlyList<Variation>>.Failed([StudyMessages.NothingVaried(vary.Count, most)]);
        (ScriptTree tree, _) = Script.Parse(new SourceText(request.Script.Name, request.Script.Text));
        IReadOnlyList<ParameterInfo> parameters = Script.ParametersOf(tree);
        Outcome<Variation>[] read = [.. vary.Select(v => Variation.Read(v.Key, v.Value, parameters))];
        return Outcome<IReadOnlyList<Variation>>.From([.. read.Select(r => r.Value).OfType<Variation>()], [.. read.SelectMany(r => r.Findings)]);
    }

    private static IEnumerable<double[]> Grid(IReadOnlyList<Variation> variations)
    {
        IEnumerable<double[]> points = [[]];
        foreach (Variation variation in variations)
            points = points.SelectMany(p => variation.Values.Select(v => (double[])[.. p, v]));
        return points;
    }

    private static RunRequest Request(RunRequest request, IReadOnlyList<Variation> variations, double[] point) =>
        variations.Zip(point).Aggregate(request, (r, pair) => pair.First.Into(r, pair.Second));

    private static SweepPoint[] Evaluate(SweepRequest request, IReadOnlyList<Variation> variations, double[][] points, SweepJournal? journal)
    {
        SweepPoint?[] results = [.. points.Select((_, i) => journal?.Finished.GetValueOrDefault(i))];
        int[] open = [.. Enumerable.Range(0, points.Length).Where(i => results[i] is null)];
        int before = points.Length - open.Length, done = 0;
        long start = Stopwatch.GetTimestamp();
        ParallelOptions options = new() { CancellationToken = request.Run.Cancellation, MaxDegreeOfParallelism = request.Run.Threads > 0 ? request.Run.Threads : Environment.ProcessorCount };
        Parallel.ForEach(open, options, i =>
        {
            results[i] = PointFigures.Of(points[i], Request(request.Run, variations, points[i]));
            journal?.Add(i, results[i]!);
            int finished = Interlocked.Increment(ref done);
            request.Progress?.Report(new SweepProgress(before + finished, points.Length, Stopwatch.GetElapsedTime(start).TotalSeconds / finished * (open.Length - finished)));
        });
        return results!;
    }

    private static SweepResult Conclude(SweepRequest request, IReadOnlyList<Variation> variations, Setup setup, IReadOnlyList<SweepPoint> points) => new()
    {
        Version = Provenance.Version,
        Protocol = new InputFile(request.Run.Script.Name, request.Run.Script.Sha256),
        Title = setup.Settings[0].Protocol.Name,
        Conditions = Provenance.Conditions(setup),
        Overrides = request.Run.Overrides,
        Varied = variations,
        Points = points,
        Goals = [.. setup.Settings[0].Protocol.Goals.Where(g => g.Metric.Kind != MetricKind.Harm).Select(g => new SweepGoal(PointFigures.Name(g.Metric), g.Text, g.Threshold))],
        Warnings = request.Run.Uncertainty is not null && UncertainInputs.Of(setup.Document).Count == 0 ? [.. setup.Notes, UncertaintyMessages.NothingUncertain()] : [.. setup.Notes],
    };
}
