using System.Globalization;
using ResourceCheck.Diagnostics;
using ResourceCheck.Engines;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Judgement.Studies;

/// <summary>
/// Finds the least number of copies for which honest failure and all harms stay below a target. Thresholds on whole numbers make both
/// saw-toothed: honest failure is looked at for every number around the one found, harms, each of which is a search, only where needed.
/// </summary>
internal sealed class CopiesJudgement
{
    /// <summary>Stands for all thresholds.</summary>
    private const string All = "all";

    /// <summary>A list this long takes the counting to minutes a number.</summary>
    private const int MostCopies = 20_000;

    /// <summary>Above this, failure that has not fallen while the number doubled will not fall any more: the noise is beyond the thresholds.</summary>
    private const int Hopeless = 100;

    /// <summary>Numbers in a row that miss the target before smaller ones are given up.</summary>
    private const int Teeth = 16;

    /// <summary>Part of the number found by which larger ones are checked as well.</summary>
    private const double Margin = 0.05;

    /// <summary>Narrowings of the number between one whose harm is too great and one whose is not.</summary>
    private const int HarmSteps = 4;

    private readonly CopiesRequest _request;
    private readonly IReadOnlyList<string> _optimised;
    private readonly int _from;
    private readonly string _parameter;
    private readonly SortedDictionary<int, CopiesStep> _steps = [];

    private CopiesJudgement(CopiesRequest request, string parameter, IReadOnlyList<string> optimised, int from)
    {
        _request = request;
        _optimised = optimised;
        _from = from;
        _parameter = parameter;
    }

    public static Outcome<CopiesResult> Of(CopiesRequest request)
    {
        (ScriptTree tree, _) = Script.Parse(new SourceText(request.Run.Script.Name, request.Run.Script.Text));
        Outcome<Setup> setup = Setup.From(request.Run);
        if (setup.Value is not { } read)
            return Outcome<CopiesResult>.Failed(setup.Findings);
        IReadOnlyList<ParameterInfo> parameters = Script.ParametersOf(tree);
        if (tree.Statements.OfType<CopiesStatement>().FirstOrDefault()?.Count is not NameExpression name || parameters.FirstOrDefault(p => p.Name == name.Text) is not { } parameter)
            return Outcome<CopiesResult>.Failed([StudyMessages.NoCopiesParameter()]);
        try
        {
            int least = (int)Math.Max(1, Math.Ceiling(parameter.From.ToDouble())), most = (int)Math.Min(MostCopies, Math.Floor(parameter.To.ToDouble()));
            (CopiesRequest at, IReadOnlyList<string> chosen, int from) = (request, [], 0);
            if (request.Optimise.Count > 0)
            {
                ParameterInfo[] reals = [.. parameters.Where(p => p.Values is null)];
                if (request.Optimise.FirstOrDefault(n => n != All && reals.All(p => p.Name != n)) is { } unknown)
                    return Outcome<CopiesResult>.Failed([StudyMessages.NoThreshold(unknown, reals.Select(p => p.Name))]);
                ParameterInfo[] thresholds = [.. reals.Where(p => request.Optimise.Contains(All) || request.Optimise.Contains(p.Name))];
                if (read.Settings.Count > 1)
                    return Outcome<CopiesResult>.Failed([StudyMessages.SeveralSettings()]);
                if (ThresholdSearch.Find(request, parameter.Name, thresholds, read.Settings[0].Protocol, most) is not { } proposal)
                    return Outcome<CopiesResult>.Failed([StudyMessages.NoThresholdsReach(most, request)]);
                at = request with { Run = request.Run with { Parameters = [.. request.Run.Parameters.Where(p => thresholds.All(t => t.Name != p.Key)), .. proposal.Thresholds.Select(t => KeyValuePair.Create(t.Key, t.Value.ToString()))] } };
                (chosen, from) = ([.. thresholds.Select(t => t.Name)], proposal.Copies);
            }

            CopiesJudgement judgement = new(at, parameter.Name, chosen, from);
            return judgement.Least(least, most) is { } copies
                ? Outcome<CopiesResult>.Of(judgement.Conclude(copies, read))
                : Outcome<CopiesResult>.Failed([StudyMessages.NotReached(parameter.Name, judgement._steps.Values.Last(), request)]);
        }
        catch (NotCountedException refused)
        {
            return Outcome<CopiesResult>.Failed(refused.Findings);
        }
    }

    private int? Least(int least, int most)
    {
        if (FirstHonest(least, most) is not { } honest)
            return null;
        if (_request.Harm >= 1)
            return honest;
        int good = Math.Max(honest, Math.Min(_from, most)), bad = good - 1; // thresholds were chosen for the number they come with
        while (!HarmHolds(good))
        {
            bad = good;
            if (good == most)
                return null;
            double factor = Math.Log(_request.Harm) / Math.Log(_steps[good].Harm!.Value); // harms fall exponentially in the end
            good = (int)Math.Min(most, Math.Ceiling(good * Math.Clamp(double.IsFinite(factor) ? factor : 2, 1.05, 2)));
        }

        for (int i = 0; i < HarmSteps && good - bad > 1 + (good / 50); i++)
        {
            int middle = (good + bad) / 2;
            (good, bad) = HonestHolds(middle) && HarmHolds(middle) ? (middle, bad) : (good, middle);
        }

        return Settle(good, most);
    }

    /// <summary>The first number from which on honest failure holds, as far as it is checked.</summary>
    private int? FirstHonest(int least, int most)
    {
        int good = least;
        while (!HonestHolds(good))
        {
            double before = good > least ? Step(Math.Max(least, good / 2), harms: false).Failure.Value : 0;
            if (good == most || (good > Hopeless && before <= Step(good, harms: false).Failure.Value))
                return null;
            good = Math.Min(most, good * 2);
        }

        int bad = Math.Max(least - 1, good / 2);
        while (good - bad > 1)
        {
            int middle = (good + bad) / 2;
            (good, bad) = HonestHolds(middle) ? (middle, bad) : (good, middle);
        }

        // Below the number found other teeth of the saw may hold too.
        int missed = 0;
        for (int copies = good - 1; copies >= least && missed < Teeth; copies--)
            (good, missed) = HonestHolds(copies) ? (copies, 0) : (good, missed + 1);
        return Settle(good, most);
    }

    /// <summary>Moves on until all numbers of the margin hold.</summary>
    private int? Settle(int good, int most)
    {
        for (int copies = good; copies <= Math.Min(most, CheckedUpTo(good)); copies++)
        {
            if (!HonestHolds(copies))
                good = copies + 1;
        }

        return good > most ? null : good;
    }

    private static int CheckedUpTo(int copies) => copies + Math.Max(Teeth, (int)(copies * Margin));

    private bool HonestHolds(int copies) => Step(copies, harms: false).Failure.High <= _request.Failure;

    private bool HarmHolds(int copies) => Step(copies, harms: true).Harm is not { } harm || harm.High <= _request.Harm;

    private CopiesStep Step(int copies, bool harms)
    {
        if (_steps.TryGetValue(copies, out CopiesStep? known) && (!harms || known.Harm is not null))
            return known;
        List<Evaluated> all = Evaluate(copies, harms);
        Estimate failure = all.Select(e => e.Actual.Failure).MaxBy(f => f.Value)!;
        CopiesStep step = new(copies, failure, harms ? all.SelectMany(e => e.Cheats).Select(c => c.Harm).MaxBy(h => h.Value) ?? Estimate.Exact(0) : null);
        _steps[copies] = step;
        _request.Progress?.Report(step);
        return step;
    }

    private List<Evaluated> Evaluate(int copies, bool harms)
    {
        List<Diagnostic> findings = [];
        Outcome<Setup> setup = Setup.From(At(copies));
        List<Evaluated> all = setup.Value is { } read ? RunJudgement.All(read, findings, harms) : [];
        Diagnostic[] errors = [.. setup.Findings.Concat(findings).Where(f => f.Severity == Severity.Error).Distinct()];
        return errors.Length > 0 ? throw new NotCountedException(errors) : all;
    }

    private RunRequest At(int copies) => _request.Run with
    {
        Parameters = [.. _request.Run.Parameters.Where(p => p.Key != _parameter), new(_parameter, copies.ToString(CultureInfo.InvariantCulture))],
    };

    private CopiesResult Conclude(int copies, Setup setup)
    {
        List<Evaluated> all = Evaluate(copies, harms: _request.Harm < 1);
        YieldResult yield = MetricGathering.Yield(all);
        return new CopiesResult
        {
            Version = Provenance.Version,
            Protocol = new InputFile(_request.Run.Script.Name, _request.Run.Script.Sha256),
            Title = setup.Settings[0].Protocol.Name,
            Conditions = Provenance.Conditions(setup),
            Overrides = _request.Run.Overrides,
            Thresholds = [.. all[0].Setting.Protocol.Parameters.Where(p => p.Name != _parameter).Select(p => KeyValuePair.Create(p.Name, p.Value.ToString()))],
            Optimised = _optimised,
            Parameter = _parameter,
            Targets = (_request.Failure, _request.Harm),
            Copies = copies,
            CheckedUpTo = CheckedUpTo(copies),
            Steps = [.. _steps.Values.Where(s => s.Harm is not null || s.Copies == copies || s.Copies == copies - 1)],
            Attacks = CaseGathering.Attacks(all),
            Seconds = RunJudgement.ListOf(all[0].Setting, yield.Value.Value)?.Seconds,
            Warnings = setup.Notes,
        };
    }

    private sealed class NotCountedException(IReadOnlyList<Diagnostic> findings) : Exception
    {
        public IReadOnlyList<Diagnostic> Findings { get; } = findings;
    }
}
