using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Resources;
using ResourceCheck.Scripts;
using ResourceCheck.Scripts.Binding;
using ResourceCheck.Scripts.Syntax;
using ResourceCheck.Timeline;

namespace ResourceCheck.Judgement;

/// <summary>Everything read and checked, nothing evaluated.</summary>
/// <param name="Request">What was asked for.</param>
/// <param name="Choices">Parameter assignments.</param>
/// <param name="Document">The conditions; null when ideal.</param>
/// <param name="Settings">One per parameter assignment.</param>
/// <param name="Notes">Warnings and notes so far.</param>
internal sealed record Setup(
    RunRequest Request, ParameterChoices Choices, ConditionsDocument? Document, IReadOnlyList<Setting> Settings, IReadOnlyList<Diagnostic> Notes)
{
    /// <summary>Reads and checks a request; every mistake of every input is reported together.</summary>
    public static Outcome<Setup> From(RunRequest request)
    {
        List<Diagnostic> findings = [];
        (ScriptTree tree, IReadOnlyList<Diagnostic> formFindings) = Script.Parse(new SourceText(request.Script.Name, request.Script.Text));
        findings.AddRange(formFindings);
        (ParameterChoices choices, IReadOnlyList<Diagnostic> choiceFindings) = ParameterChoices.From(Script.ParametersOf(tree), request.Parameters);
        Outcome<ConditionsDocument>? document = ReadConditions(request);
        List<Setting> settings = [];
        foreach (IReadOnlyDictionary<string, Rational> assignment in choices.Assignments)
            AddSetting(request, tree, assignment, document, settings, findings);
        findings.AddRange(document?.Findings ?? []);
        findings.AddRange(choiceFindings);
        if (request.Uncertainty is null && document?.Value is { Uncertainties: { Count: > 0 } uncertain })
            findings.Add(JudgementMessages.CentralValues(uncertain));
        IReadOnlyList<Diagnostic> told = [.. findings.Distinct()];
        return Outcome<Setup>.From(new Setup(request, choices, document?.Value, settings, told), told);
    }

    /// <summary>Beyond this many parties nothing is asked whether a family could grow so far.</summary>
    private const int MostParties = 64;

    /// <summary>The world of a protocol. Conditions for family members that a larger parameter brings are no slip, so only members beyond those are noted.</summary>
    private static Outcome<World> WorldOf(ConditionsDocument document, Protocol protocol, ScriptTree tree)
    {
        Outcome<World> world = ConditionsFile.Bind(document, protocol);
        if (!world.Findings.Any(IsMemberAbove) || Grown(tree) is not { } grown)
            return world;
        Place?[] beyond = [.. ConditionsFile.Bind(document, grown).Findings.Where(IsMemberAbove).Select(f => f.Place)];
        return new Outcome<World>(world.Value, [.. world.Findings.Where(f => !IsMemberAbove(f) || beyond.Contains(f.Place))]);
    }

    private static bool IsMemberAbove(Diagnostic finding) => finding.Code == ConditionsMessages.MemberAboveCode;

    /// <summary>The protocol at the largest values of its whole-number parameters; null where it is wrong there.</summary>
    private static Protocol? Grown(ScriptTree tree)
    {
        IEnumerable<ParameterInfo> growing = Script.ParametersOf(tree).Where(p => p.Values is not null && p.To.IsWhole && p.To <= MostParties);
        return Script.Bind(tree, growing.ToDictionary(p => p.Name, p => p.To)).Value;
    }

    private static Outcome<ConditionsDocument>? ReadConditions(RunRequest request)
    {
        if (request.Conditions is { } file)
            return ConditionsFile.Read(file.Name, file.Text, request.Overrides);
        return request.Overrides.Count > 0 ? ConditionsFile.Read("--set", "{}", request.Overrides) : null;
    }

    private static void AddSetting(
        RunRequest request, ScriptTree tree, IReadOnlyDictionary<string, Rational> assignment, Outcome<ConditionsDocument>? document, List<Setting> settings, List<Diagnostic> findings)
    {
        Outcome<Protocol> protocol = Script.Bind(tree, assignment);
        findings.AddRange(protocol.Findings);
        if (protocol.Value is not { } checkedProtocol)
            return;
        findings.AddRange(ListFigures.Unanswerable(checkedProtocol));
        findings.AddRange(ChosenNumbers.Findings(request.Choose, checkedProtocol));
        Protocol[] runs = [checkedProtocol, .. checkedProtocol.Dishonest.Select(d => checkedProtocol with { Steps = d.CopySteps })];
        Diagnostic[] misplaced = [.. runs.SelectMany(Planner.MisplacedInterceptions).Select(s => JudgementMessages.InterceptTooKnowing(checkedProtocol.Source.PlaceOf(s.Span)))];
        findings.AddRange(misplaced);
        if (misplaced.Length > 0)
            return;
        Outcome<World>? world = document?.Value is { } read ? WorldOf(read, checkedProtocol, tree) : null;
        findings.AddRange(world?.Findings ?? []);
        (IReadOnlyDictionary<string, System.Numerics.Complex[,]> matrices, IReadOnlyList<Diagnostic> matrixFindings) = ScriptMatrices.Read(checkedProtocol);
        findings.AddRange(matrixFindings);
        if (world is { Succeeded: false } || matrixFindings.Count > 0)
            return;
        World found = world?.Value ?? World.Ideal(checkedProtocol.Parties.Count, checkedProtocol.Levels);
        Setting setting = new(assignment, checkedProtocol, found, Planner.Lay(checkedProtocol, found), matrices);
        findings.AddRange(checkedProtocol.Requirements.Where(r => !r.Holds).Select(r => JudgementMessages.BrokenRequirement(r, checkedProtocol.Source, setting.Words)));
        settings.Add(setting);
    }
}
