using System.Globalization;
using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Engines.Lists;
using ResourceCheck.Resources;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>Evaluates cheating strategies: on single copies all choices, on lists the worst choices that a search finds.</summary>
internal static class CheatEvaluator
{
    /// <summary>Combinations of a cheat's numbers on single copies that are all tried; each is an evaluation of its own.</summary>
    private const int MostCombinations = 1000;

    /// <summary>One strategy at one assignment of the private inputs.</summary>
    /// <param name="setting">Protocol and world.</param>
    /// <param name="cheat">The strategy.</param>
    /// <param name="state">The prepared state.</param>
    /// <param name="honest">The honest case at the same inputs.</param>
    /// <param name="request">What was asked for.</param>
    public static Outcome<CheatEvaluation> Evaluate(Setting setting, DishonestCase cheat, PreparedState state, Evaluation honest, RunRequest request)
    {
        Cheating cheating = new(setting, cheat, state, honest.Inputs, honest.Engine, cheat.Asks(setting.Protocol.Inputs) ? new Evaluated(setting, honest, honest).At : setting.Words, request);
        return setting.Protocol.Lists is null ? OnCopies(cheating) : OnLists(cheating);
    }

    /// <summary>What one strategy asks of the lists at some inputs; null when no copy is kept or numbers are used before there are lists.</summary>
    public static ListTask? ListTaskOf(Setting setting, DishonestCase cheat, PreparedState state, IReadOnlyList<Value> inputs, EngineChoice engine, RunRequest request) =>
        cheat.ChoosesInRounds ? null : new Cheating(setting, cheat, state, inputs, engine, setting.Words, request).Task();

    /// <summary>One strategy with all that its evaluation needs.</summary>
    private sealed record Cheating(Setting Setting, DishonestCase Case, PreparedState State, IReadOnlyList<Value> Inputs, EngineChoice Engine, string At, RunRequest Request)
    {
        public Evaluation Copies(IReadOnlyList<Value> choices)
        {
            Plan plan = Planner.Lay(Setting.Protocol.Lists is null ? Case.In(Setting.Protocol, choices) : Case.Rounds(Setting.Protocol), Case.PerfectHardware ? PerfectHardware.Of(Setting.World, Case.By) : Setting.World);
            return Evaluator.Copies(Setting, plan, State, Inputs, Engine, Request);
        }

        /// <summary>What is asked of the lists; null when no copy is kept.</summary>
        public ListTask? Task()
        {
            Evaluation copies = Copies([]);
            return copies.Yield > 0 ? new ListTask { Protocol = Setting.Protocol, Copies = copies.Copies, Inputs = Inputs, Case = Case } : null;
        }

        public KeyValuePair<string, string>[] Named(IReadOnlyList<Value> choices) => [.. Case.Choices.Zip(choices, (c, v) => KeyValuePair.Create(c.Name, Scripts.Binding.Written.Write(v)))];
    }

    private static Outcome<CheatEvaluation> OnCopies(Cheating cheating)
    {
        ChoiceRange[] ranges = [.. cheating.Case.Choices.Select(c => new ChoiceRange(c, 0, cheating.Setting.Protocol.Levels))];
        double combinations = ranges.Aggregate(1.0, (product, r) => product * Math.Max(0, (double)r.Last - r.First + 1));
        Value[]? given = ChosenNumbers.For(cheating.Request.Choose, cheating.Case);
        if (given is null && combinations is < 1 or > MostCombinations)
            return Outcome<CheatEvaluation>.Failed([JudgementMessages.ChoicesOutOfReach(cheating.Case.Name, combinations, MostCombinations)]);
        (Value[] choices, Evaluation worst) = (given is null ? Combinations(ranges) : [given]).Select(c => (c, cheating.Copies(c)))
            .Where(pair => pair.Item2.Yield > 0).DefaultIfEmpty(([], null!)).MaxBy(pair => pair.Item2?.Harm?.Value);
        if (worst is null)
            return Outcome<CheatEvaluation>.Failed([JudgementMessages.NothingKept($"case \"{cheating.Case.Name}\"")]);
        bool proved = given is not null || cheating.Case.Choices.All(c => c.Whole);
        Estimate harm = proved ? worst.Harm! : Estimate.AtLeast(worst.Harm!.Value);
        string method = given is not null ? "followed exactly at the numbers given" : ranges.Length == 0 ? "followed exactly" : string.Create(CultureInfo.InvariantCulture, $"{(proved ? "all" : "a grid of")} {combinations} choices tried, each followed exactly");
        return Outcome<CheatEvaluation>.Of(new CheatEvaluation(cheating.Case, cheating.At, harm, null, worst, cheating.Named(choices), method));
    }

    private static IEnumerable<Value[]> Combinations(ChoiceRange[] ranges)
    {
        IEnumerable<Value[]> all = [[]];
        foreach (ChoiceRange range in ranges)
            all = all.SelectMany(before => Enumerable.Range(range.First, range.Last - range.First + 1).Select(i => range.At(i)).Where(v => range.Allows(v, before)).Select(v => (Value[])[.. before, v]));
        return all;
    }

    private static Outcome<CheatEvaluation> OnLists(Cheating cheating)
    {
        if (cheating.Case.ChoosesInRounds)
            return Outcome<CheatEvaluation>.Failed([JudgementMessages.SearchRefused(cheating.Case.Name, "a number is used in a round, before there are lists; make a case for each of its values.")]);
        if (cheating.Task() is not { } task)
            return Outcome<CheatEvaluation>.Failed([JudgementMessages.NothingKept($"case \"{cheating.Case.Name}\"")]);
        if (cheating.Case.Choices.Count == 0)
        {
            ListEvaluation verdict = ListVerdicts.Of(task, cheating.Request);
            return Outcome<CheatEvaluation>.Of(new CheatEvaluation(cheating.Case, cheating.At, verdict.Harm, null, null, [], verdict.Method));
        }

        AttackOutcome worst = ChosenNumbers.For(cheating.Request.Choose, cheating.Case) is { } given
            ? WorstCase.At(task with { Choices = given }, cheating.Request.Cancellation)
            : cheating.Request.Searches.Of(task, () => WorstCase.Find(task, new SearchOptions(), SearchTeller.Of(cheating.Request, cheating.Case, cheating.At), cheating.Request.Cancellation));
        if (worst is not { Choices: { } choices, Evaluation: { } evaluation, Average: { } average })
            return Outcome<CheatEvaluation>.Failed([JudgementMessages.SearchRefused(cheating.Case.Name, worst.Refusal!)]);
        return Outcome<CheatEvaluation>.Of(new CheatEvaluation(
            cheating.Case, cheating.At, Estimate.AtMost(evaluation.Harm.Value), average.Harm, null, cheating.Named(choices), $"{worst.Search?.Check ?? "evaluated at the numbers given"}; on average {average.Strategy}"));
    }
}
