using System.Text.RegularExpressions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>From a script's tree to the checked protocol.</summary>
internal static partial class ProtocolBinder
{
    /// <summary>Binds a script at given parameter values.</summary>
    public static Outcome<Protocol> Bind(ScriptTree tree, IReadOnlyDictionary<string, Rational> given)
    {
        BindContext context = new(tree);
        SuspectBrokenLines(context);
        ParameterBinder parameters = new(context);
        IReadOnlyList<ParameterInfo> declared = parameters.Declare(given);
        parameters.CheckNames(given);
        DeclarationBinder declarations = new(context);
        declarations.Declare();
        int? copies = declarations.Copies();
        IReadOnlyList<Requirement> requirements = declarations.Requirements();
        NameState start = context.Now;
        LabelBinder labels = new(context);
        StepBinder binder = new(context, labels);
        IReadOnlyList<Step> steps = binder.Bind();
        RefereeBinder referee = new(context, labels, steps);
        referee.Bind(binder.RefereeLines);
        if (!tree.Statements.Any(s => s is SuccessStatement))
            declarations.Missing("success", "success when true");
        IReadOnlyList<DishonestCase> dishonest = new DishonestBinder(context, start).Bind();
        if (!context.Findings.IsEmpty || referee.Success is null || TreeWalk.Statements(tree.Statements).Any(s => s is BrokenStatement))
            return Outcome<Protocol>.Failed(context.Findings.All);
        Protocol protocol = Assemble(context, given, declared, requirements, steps, referee) with { Dishonest = dishonest };
        if (copies is not { } count)
            return Outcome<Protocol>.Of(protocol);
        ListProtocol lists = new(count, 0, binder.ListSteps, binder.Discussions);
        return Outcome<Protocol>.Of(SlotOrder.Arrange(protocol with { Lists = lists }, context.IsPerCopy));
    }

    private static Protocol Assemble(
        BindContext context, IReadOnlyDictionary<string, Rational> given, IReadOnlyList<ParameterInfo> declared,
        IReadOnlyList<Requirement> requirements, IReadOnlyList<Step> steps, RefereeBinder referee) => new()
        {
            Source = context.Tree.Source,
            Name = context.Tree.Statements.OfType<ProtocolStatement>().FirstOrDefault()?.Title.Text ?? Path.GetFileNameWithoutExtension(context.Tree.Source.Name),
            About = context.Tree.Statements.OfType<AboutStatement>().FirstOrDefault()?.Text.Text ?? "",
            Parties = context.Parties.Names,
            Holders = context.Parties.Holders,
            Outsiders = context.Parties.Outsiders,
            Parameters = [.. declared.Select(d => new ParameterValue(d.Name, context.Parameters[d.Name], !given.ContainsKey(d.Name)))],
            Inputs = context.Inputs,
            Slots = context.Slots,
            Steps = steps,
            Success = referee.Success!,
            Reports = referee.Reports,
            Claims = referee.Claims,
            Goals = referee.Goals,
            Requirements = requirements,
            HandlesNone = AbsentClicks.AreHandled(context.Tree),
        };

    // A line that could not be read was told about already; names in it must not be reported as missing elsewhere.
    private static void SuspectBrokenLines(BindContext context)
    {
        foreach (Statement statement in TreeWalk.Statements(context.Tree.Statements))
        {
            if (statement is BrokenStatement)
            {
                foreach (Match word in Word().Matches(LineOf(context.Tree.Source, statement.Span)))
                    context.Findings.Suspect(word.Groups[1].Success ? word.Groups[1].Value : word.Value);
            }
        }
    }

    private static string LineOf(SourceText source, Span span)
    {
        string text = source.Text;
        int start = Math.Clamp(span.Start, 0, text.Length), end = Math.Clamp(span.End, start, text.Length);
        start = start == 0 ? 0 : text.LastIndexOf('\n', start - 1) + 1;
        int next = text.IndexOf('\n', end);
        return text[start..(next < 0 ? text.Length : next)];
    }

    [GeneratedRegex("""\"([^"]*)\"|[\p{L}_][\p{L}\p{Nd}_]*""")]
    private static partial Regex Word();
}
