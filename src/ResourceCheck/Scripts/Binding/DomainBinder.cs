using System.Numerics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Reads the values that parameters and inputs may take.</summary>
/// <param name="context">The binding.</param>
internal sealed class DomainBinder(BindContext context)
{
    // Every value of an input is tried, so that a longer range is certainly a slip.
    private const int MostValues = 10_000;

    /// <summary>All values of a listed or whole-number domain, or null after a finding.</summary>
    public IReadOnlyList<Value>? Values(Domain domain)
    {
        if (domain.Values is not null)
            return Listed(domain);
        if (!domain.Whole)
        {
            context.Findings.Report(domain.Span, BindingMessages.RealDomain(context.TextOf(domain.Span)));
            return null;
        }

        if (Range(domain)?.Values is not { } values)
            return null;
        if (values.Count <= MostValues)
            return [.. values.Select(v => new NumberValue(v))];
        context.Findings.Report(domain.Span, BindingMessages.LongDomain(MostValues));
        return null;
    }

    /// <summary>A domain of numbers with its ends, or null after a finding.</summary>
    public (IReadOnlyList<Rational>? Values, Rational From, Rational To)? Numbers(Domain domain)
    {
        if (domain.Values is null)
            return Range(domain);
        if (Listed(domain) is not { } values)
            return null;
        Rational[] numbers = [.. values.OfType<NumberValue>().Select(v => v.Number)];
        if (numbers.Length == values.Count)
            return (numbers, numbers.Min(), numbers.Max());
        context.Findings.Report(domain.Span, BindingMessages.NumbersOnly(context.TextOf(domain.Span)));
        return null;
    }

    /// <summary>A fixed number, or null after a finding.</summary>
    public Rational? Number(Expression expression)
    {
        Value? value = new ExpressionBinder(context, new ConstantView(context)).Expect(expression, ValueKind.Number).Constant;
        if (value is NoneValue)
            context.Findings.Report(expression.Span, BindingMessages.Undefined(context.TextOf(expression.Span)));
        return value is NumberValue number ? number.Number : null;
    }

    private List<Value>? Listed(Domain domain)
    {
        List<Value> values = [];
        ExpressionBinder binder = new(context, new ConstantView(context));
        foreach (Expression expression in domain.Values!)
        {
            Typed typed = binder.Bind(expression);
            if (typed.Constant is not { } value)
                return null;
            if (values.Contains(value))
                context.Findings.Report(expression.Span, BindingMessages.ValueTwice(Written.Write(value)));
            else if (values.Count > 0 && !ValueKinds.Together(ValueKinds.Of(values[0]), typed.Kind))
                context.Findings.Report(expression.Span, BindingMessages.NeverEqual(ValueKinds.Of(values[0]), typed.Kind));
            values.Add(value);
        }

        if (values.Count > 0)
            return values;
        context.Findings.Report(domain.Span, BindingMessages.EmptyDomain(context.TextOf(domain.Span)));
        return null;
    }

    private (IReadOnlyList<Rational>? Values, Rational From, Rational To)? Range(Domain domain)
    {
        if (domain.From is null || domain.To is null || Number(domain.From) is not { } from || Number(domain.To) is not { } to)
            return null;
        BigInteger first = from.Ceiling(), last = to.Floor();
        if (domain.Whole ? last < first : to < from)
            context.Findings.Report(domain.Span, BindingMessages.EmptyDomain(context.TextOf(domain.Span)));
        else if (domain.Whole)
            return (new WholeRange(first, last), Rational.From(first), Rational.From(last));
        else
            return (null, from, to);
        return null;
    }
}
