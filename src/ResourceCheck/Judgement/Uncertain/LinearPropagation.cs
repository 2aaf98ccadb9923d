using ResourceCheck.Diagnostics;

namespace ResourceCheck.Judgement.Uncertain;

/// <summary>The derivatives of all figures by one uncertain value.</summary>
/// <param name="Input">The value.</param>
/// <param name="OneSided">Whether only one side of it could be looked at.</param>
/// <param name="Of">Derivative and its error by figure, per base unit of the value.</param>
internal sealed record InputDerivatives(UncertainInput Input, bool OneSided, IReadOnlyDictionary<FigureKey, (double Value, double Error)> Of);

/// <summary>Derivatives of figures by the uncertain values, by differences over a part of each uncertainty.</summary>
internal static class LinearPropagation
{
    /// <summary>The step as part of the uncertainty: figures hardly bend within it, and differences still stand far above round-off.</summary>
    private const double StepOfUncertainty = 1.0 / 8;

    /// <summary>Least step relative to the value; below it differences of figures that are exact to 1e-13 lose their digits.</summary>
    private const double LeastStep = 1e-6;

    /// <summary>Near the end of its domain a value may allow smaller steps only.</summary>
    private static readonly double[] Shortenings = [1, 1.0 / 4, 1.0 / 16, 1.0 / 64];

    /// <summary>The derivatives by every input; findings where a value cannot be moved by itself.</summary>
    /// <param name="request">The request at the central values.</param>
    /// <param name="inputs">What is uncertain.</param>
    /// <param name="centre">Figures at the central values.</param>
    /// <param name="source">Gives the figures elsewhere.</param>
    public static Outcome<IReadOnlyList<InputDerivatives>> Of(RunRequest request, IReadOnlyList<UncertainInput> inputs, IReadOnlyList<NamedFigure> centre, FigureSource source)
    {
        Outcome<Moves>[] moves = [.. inputs.Select(i => MovesOf(request, i))];
        Diagnostic[] findings = [.. moves.SelectMany(m => m.Findings)];
        if (findings.Length > 0)
            return Outcome<IReadOnlyList<InputDerivatives>>.Failed(findings);
        (int Input, int Point)[] work = [.. moves.SelectMany((m, i) => Enumerable.Range(0, m.Value!.Stencil.Points.Count).Select(p => (i, p)))];
        Dictionary<FigureKey, double>?[] found = new Dictionary<FigureKey, double>?[work.Length];
        Parallel.For(0, work.Length, Options(request), w =>
        {
            Setup? setup = moves[work[w].Input].Value!.Setups[work[w].Point];
            found[w] = (setup is null ? centre : source(setup))?.ToDictionary(f => f.Key, f => f.Value.Value);
        });
        return Outcome<IReadOnlyList<InputDerivatives>>.Of([.. moves.Select((m, i) => Derive(m.Value!, centre, [.. work.Index().Where(w => w.Item.Input == i).Select(w => found[w.Index])]))]);
    }

    /// <summary>As many threads as asked for.</summary>
    public static ParallelOptions Options(RunRequest request) => new() { CancellationToken = request.Cancellation, MaxDegreeOfParallelism = request.Threads > 0 ? request.Threads : Environment.ProcessorCount };

    private static InputDerivatives Derive(Moves moves, IReadOnlyList<NamedFigure> centre, IReadOnlyList<Dictionary<FigureKey, double>?> values) => new(
        moves.Input,
        moves.Stencil.OneSided,
        centre.ToDictionary(f => f.Key, f => moves.Stencil.Derive([.. values.Select(v => v?.GetValueOrDefault(f.Key, double.NaN) ?? double.NaN)], moves.Step)));

    /// <summary>The first way to move the value that stays within what the conditions allow.</summary>
    private static Outcome<Moves> MovesOf(RunRequest request, UncertainInput input)
    {
        double step = Math.Max(input.BaseUncertainty * StepOfUncertainty, Math.Abs(input.Base) * LeastStep);
        Diagnostic? refusal = null;
        foreach ((double part, Stencil stencil) in Shortenings.SelectMany(p => Stencil.All.Select(s => (p, s))))
        {
            Outcome<Setup>?[] setups = [.. stencil.Points.Select(p => p.Place == 0 ? null : Setup.From(UncertainInputs.Into(request, [(input, input.Base + (p.Place * part * step))])))];
            if (setups.All(s => s is null or { Succeeded: true }))
                return Outcome<Moves>.Of(new Moves(input, stencil, part * step, [.. setups.Select(s => s?.Value)]));
            refusal ??= setups.SelectMany(s => s?.Findings ?? []).First(f => f.Severity == Severity.Error);
        }

        return Outcome<Moves>.Failed([UncertaintyMessages.CannotMove(input, refusal!)]);
    }

    /// <summary>How a value is moved: null stands for the central value itself.</summary>
    private sealed record Moves(UncertainInput Input, Stencil Stencil, double Step, IReadOnlyList<Setup?> Setups);
}
