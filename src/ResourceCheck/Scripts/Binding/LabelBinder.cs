using System.Globalization;
using System.Text;
using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Labels of checkpoints and reports: counters replaced, each used once, known to goals and claims.</summary>
/// <param name="context">The binding.</param>
internal sealed class LabelBinder(BindContext context)
{
    private readonly Dictionary<string, (MetricKind Kind, Span Span, int Order)> _labels = [];

    /// <summary>Checkpoints that every run has.</summary>
    public static IReadOnlyList<string> BuiltIn { get; } = ["prepared", "stored", "arrived"];

    /// <summary>A label with <c>{m}</c> replaced by the counter's value.</summary>
    public string Write(Quoted label) => Write(label.Text, label.Span);

    /// <summary>A text with <c>{m}</c> replaced by the counter's value.</summary>
    public string Write(string text, Span span)
    {
        StringBuilder written = new();
        int at = 0;
        for (int open; (open = text.IndexOf('{', at)) >= 0;)
        {
            int close = text.IndexOf('}', open);
            if (close < 0)
                break;
            written.Append(text, at, open - at).Append(Replace(text[(open + 1)..close], span));
            at = close + 1;
        }

        return written.Append(text, at, text.Length - at).ToString();
    }

    /// <summary>Enters a label; reports it when it is taken.</summary>
    public string Enter(Quoted quoted, MetricKind kind)
    {
        string label = Write(quoted);
        if (context.Findings.IsMuted || context.Cheat is not null)
            return label;
        if (BuiltIn.Contains(label))
            context.Findings.Report(quoted.Span, BindingMessages.LabelBuiltIn(label));
        else if (!_labels.TryAdd(label, (kind, quoted.Span, _labels.Count)))
            context.Findings.Report(quoted.Span, BindingMessages.LabelTwice(label, context.LineOf(_labels[label].Span), _labels[label].Span == quoted.Span));
        return label;
    }

    /// <summary>What a label names, or null after a finding.</summary>
    /// <param name="quoted">The label as written.</param>
    /// <param name="reader">Label of the report that reads it; null for goals and claims.</param>
    public MetricName? Find(Quoted quoted, string? reader)
    {
        string label = Write(quoted);
        if (BuiltIn.Contains(label))
            return new MetricName(MetricKind.Checkpoint, label);
        if (!_labels.TryGetValue(label, out (MetricKind Kind, Span Span, int Order) found))
        {
            if (!context.Findings.IsSuspect(label))
                context.Findings.Report(quoted.Span, BindingMessages.UnknownLabel(label, NearWords.Find(label, _labels.Keys.Concat(BuiltIn)), _labels.Keys));
            return null;
        }

        bool below = reader is not null && found.Kind == MetricKind.Report && found.Order >= _labels[reader].Order;
        if (below)
            context.Findings.Report(quoted.Span, BindingMessages.ReportBelow(label, context.LineOf(found.Span)));
        return below ? null : new MetricName(found.Kind, label);
    }

    private string Replace(string name, Span span)
    {
        if (context.Counters.TryGetValue(name, out int counter))
            return counter.ToString(CultureInfo.InvariantCulture);
        if (context.Parameters.TryGetValue(name, out Rational parameter))
            return Written.Number(parameter);
        context.Findings.Report(span, BindingMessages.UnknownInLabel(name, [.. context.Counters.Keys.Concat(context.Parameters.Keys).Order()]));
        return $"{{{name}}}";
    }
}
