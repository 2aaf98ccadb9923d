using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Reads parameters, their defaults and domains, and the values given for them.</summary>
/// <param name="context">The binding.</param>
internal sealed class ParameterBinder(BindContext context)
{
    private readonly DomainBinder _domains = new(context);

    /// <summary>Declares all parameters; a default or an end of a range may use parameters declared above.</summary>
    /// <param name="given">Values from outside; absent ones take their default.</param>
    public IReadOnlyList<ParameterInfo> Declare(IReadOnlyDictionary<string, Rational> given)
    {
        List<ParameterInfo> declared = [];
        foreach (ParameterStatement statement in context.Tree.Statements.OfType<ParameterStatement>())
        {
            if (context.Parameters.ContainsKey(statement.Name.Text))
                context.Findings.Report(statement.Name.Span, BindingMessages.DeclaredTwice(statement.Name.Text, FirstLine(statement.Name.Text)));
            else if (Declare(statement, given) is { } info)
                declared.Add(info);
        }

        return declared;
    }

    /// <summary>Reports given values whose parameters the script does not have.</summary>
    public void CheckNames(IReadOnlyDictionary<string, Rational> given)
    {
        string[] known = [.. context.Tree.Statements.OfType<ParameterStatement>().Select(p => p.Name.Text)];
        foreach (string name in given.Keys.Where(n => !known.Contains(n) && !context.Findings.IsSuspect(n)).Order(StringComparer.Ordinal))
            context.Findings.Report(Option(name, given[name]), BindingMessages.UnknownParameter(name, NearWords.Find(name, known), known));
    }

    private ParameterInfo? Declare(ParameterStatement statement, IReadOnlyDictionary<string, Rational> given)
    {
        string name = statement.Name.Text;
        Rational? normal = _domains.Number(statement.Default);
        (IReadOnlyList<Rational>? Values, Rational From, Rational To)? domain = _domains.Numbers(statement.Domain);
        context.Parameters[name] = given.TryGetValue(name, out Rational value) ? value : normal ?? domain?.From ?? Rational.Zero;
        if (normal is not { } number || domain is not { } range)
        {
            if (normal is null && !given.ContainsKey(name))
                Forget(name);
            return null;
        }

        ParameterInfo info = new(name, number, range.Values, range.From, range.To);
        Check(statement, info, given.TryGetValue(name, out Rational chosen) ? chosen : null);
        return info;
    }

    // A value outside the domain is told once; the rest of the script is checked at one inside.
    private void Check(ParameterStatement statement, ParameterInfo info, Rational? given)
    {
        string allowed = context.TextOf(statement.Domain.Span);
        bool usable = info.Allows(info.Default);
        if (!usable)
            context.Findings.Report(statement.Default.Span, BindingMessages.OutsideDomain(info.Name, Written.Number(info.Default), allowed));
        if (given is { } value && !info.Allows(value))
            context.Findings.Report(Option(info.Name, value), BindingMessages.OutsideDomain(info.Name, Written.Number(value), allowed));
        if (!info.Allows(context.Parameters[info.Name]))
            context.Parameters[info.Name] = usable ? info.Default : info.From;
    }

    // Without a value nothing can be said about lines that use the parameter.
    private void Forget(string name)
    {
        context.Parameters.Remove(name);
        context.Findings.Suspect(name);
    }

    private int FirstLine(string name) => context.LineOf(context.Tree.Statements.OfType<ParameterStatement>().First(p => p.Name.Text == name).Span);

    private static string Option(string name, Rational value) => $"--parameter {name}={Written.Number(value)}";
}
