using ResourceCheck.Engines;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement.Studies;

/// <summary>
/// Quick looks at the harms of settings that differ little from one another: the first is searched as <c>run</c> does it, the others by
/// short climbs from the numbers that were worst before. A climb may miss what a search finds, so whatever is shown is searched.
/// </summary>
internal sealed class HarmClimbs(RunRequest run, double target)
{
    /// <summary>Paths left out, as a part of the target.</summary>
    private const double LeftOut = 1e-4;

    /// <summary>Most that is left out of a path whatever the target.</summary>
    private const double MostLeftOut = 1e-7;

    /// <summary>Numbers that were worst before, remembered for each strategy.</summary>
    private const int MostRemembered = 8;

    private readonly Dictionary<string, List<Remembered>> _worst = [];

    /// <summary>Every strategy at every value of the inputs it depends on, the quickest first.</summary>
    public IEnumerable<(string Key, ListTask Task)> Tasks(Setting setting)
    {
        PreparedState state = Resource.Prepare(setting.World.Resource, setting.Protocol.Holders.Count).Value!; // was read with the request
        EngineChoice engine = Evaluator.Choose(setting, run).Value!;
        foreach (DishonestCase cheat in setting.Protocol.Dishonest.OrderBy(c => c.Choices.Count))
        {
            foreach (IReadOnlyList<Value> inputs in setting.InputAssignments().Take(cheat.Asks(setting.Protocol.Inputs) ? int.MaxValue : 1))
            {
                if (CheatEvaluator.ListTaskOf(setting, cheat, state, inputs, engine, run) is { } task)
                    yield return ($"{cheat.Name}|{string.Join(',', inputs)}", task);
            }
        }
    }

    /// <summary>The worst harm found; above <paramref name="enough"/> it may be more.</summary>
    public double Of(string key, ListTask task, double enough)
    {
        if (task.Case!.Choices.Count == 0)
            return CountingEngine.Evaluate(task, run.Cancellation).Evaluation?.Harm.Value ?? 1;
        if (!_worst.TryGetValue(key, out List<Remembered>? known))
            return Look(key, task);
        int[][] starts = [.. known.Select(k => k.At(task))];
        (int[] point, double harm) = WorstCase.Near(task, starts, new NearbyOptions(Enough: enough), Negligible, run.Cancellation);
        return harm > 0 ? Remember(key, task, point, harm) : Look(key, task);
    }

    /// <summary>The worst harm that a short search of its own finds, which finds attacks of other kinds than those known.</summary>
    public double Look(string key, ListTask task)
    {
        if (task.Case!.Choices.Count == 0)
            return Of(key, task, double.PositiveInfinity);
        (int[] point, double harm) = WorstCase.Look(task, new SearchOptions().Milder(), Negligible, run.Cancellation);
        return Remember(key, task, point, harm);
    }

    private double Negligible => Math.Min(target * LeftOut, MostLeftOut);

    private double Remember(string key, ListTask task, int[] point, double harm)
    {
        if (!_worst.TryGetValue(key, out List<Remembered>? known))
            _worst[key] = known = [];
        Remembered found = new(task.Lists.Copies, point);
        known.RemoveAll(k => k.IsNear(found));
        known.Insert(0, found);
        if (known.Count > MostRemembered)
            known.RemoveAt(MostRemembered);
        return harm;
    }

    /// <summary>Numbers of an attack, and for how many copies.</summary>
    private sealed record Remembered(int Copies, int[] Point)
    {
        /// <summary>Attacks whose numbers differ by less than this part of the copies are of one kind.</summary>
        private const double Kind = 0.03;

        public bool IsNear(Remembered other) =>
            Point.Zip(other.Point).All(p => Math.Abs(((double)p.First / Copies) - ((double)p.Second / other.Copies)) < Kind);

        /// <summary>The numbers that are alike for as many copies as a task has.</summary>
        public int[] At(ListTask task) => [.. Point.Select((n, i) => task.Case!.Choices[i].Whole ? (int)((long)n * task.Lists.Copies / Copies) : n)];
    }
}
