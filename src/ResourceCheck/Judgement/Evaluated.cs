using ResourceCheck.Engines;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>One evaluation with the setting it belongs to and the same under ideal conditions.</summary>
internal sealed record Evaluated(Setting Setting, Evaluation Actual, Evaluation Ideal)
{
    /// <summary>What cheating strategies do at this setting, for all inputs.</summary>
    public IReadOnlyList<CheatEvaluation> Cheats { get; init; } = [];

    /// <summary>Parameter and input values in words; empty when there are none.</summary>
    public string At
    {
        get
        {
            IEnumerable<string> inputs = Setting.Protocol.Inputs.Zip(Actual.Inputs, (input, value) => $"{Setting.Protocol.Parties[input.Party]}.{input.Name} = {value}");
            return string.Join(", ", (Setting.Words.Length == 0 ? inputs : inputs.Prepend(Setting.Words)));
        }
    }

    /// <summary>The figure a goal or claim names; null when this setting has no such label.</summary>
    public Estimate? Figure(MetricName metric) => Figure(Actual, metric);

    private Estimate? Figure(Evaluation evaluation, MetricName metric) => metric.Kind switch
    {
        MetricKind.Success => evaluation.Success,
        MetricKind.Failure => evaluation.Failure,
        MetricKind.Abort => evaluation.Abort,
        MetricKind.Yield => Estimate.Exact(evaluation.Yield),
        MetricKind.Checkpoint => evaluation.Checkpoints.FirstOrDefault(c => c.Label == metric.Label)?.Fidelity,
        MetricKind.Report => Report(evaluation, metric.Label),
        MetricKind.Harm => Cheats.Where(c => c.Case.Name == metric.Label).MaxBy(c => c.Harm.Value)?.Harm,
        _ => null,
    };

    private Estimate? Report(Evaluation evaluation, string label)
    {
        for (int i = 0; i < Setting.Protocol.Reports.Count; i++)
        {
            if (Setting.Protocol.Reports[i].Label == label)
                return evaluation.Reports[i];
        }

        return null;
    }
}
