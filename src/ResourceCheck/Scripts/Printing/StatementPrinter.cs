using ResourceCheck.Scripts.Parsing;
using ResourceCheck.Scripts.Syntax;
using static ResourceCheck.Scripts.Printing.ExpressionPrinter;

namespace ResourceCheck.Scripts.Printing;

/// <summary>Writes a statement's own line; of a block, the line that opens it.</summary>
internal static class StatementPrinter
{
    public static string PrintHeader(Statement statement, SourceText source) => Declaration(statement) ?? Block(statement) ?? Figure(statement)
        ?? Action(statement) ?? (statement is BrokenStatement ? AsWritten(statement.Span, source) : throw Unknown(statement));

    private static string? Declaration(Statement statement) => statement switch
    {
        ProtocolStatement s => $"protocol {PrintQuoted(s.Title)}",
        AboutStatement s => $"about {PrintQuoted(s.Text)}",
        ParameterStatement s => $"parameter {s.Name.Text} = {Print(s.Default)} in {Domain(s.Domain)}",
        InputStatement s => $"input {s.Name.Text} of {PrintParty(s.Owner)} in {Domain(s.Domain)}",
        RequireStatement s => $"require {Print(s.Condition)}, {PrintQuoted(s.Reason)}",
        PartiesStatement s => $"parties {PrintParties(s.Parties)}",
        OutsiderStatement s => $"outsider {s.Name.Text}",
        ResourceStatement s => $"resource antisymmetric on {PrintParties(s.Parties)}",
        CopiesStatement s => $"copies {Print(s.Count)}",
        PerfectStatement => "perfect hardware",
        ChooseStatement s => $"choose {s.Name.Text} in {Domain(s.Domain)}",
        _ => null,
    };

    private static string? Block(Statement statement) => statement switch
    {
        ForStatement s => $"for {s.Counter.Text} from {Print(s.From)} {(s.Down ? "down" : "up")} to {Print(s.To)}",
        RoundStatement s => $"round {PrintQuoted(s.Title)}",
        DiscussionStatement s => $"discussion {PrintQuoted(s.Title)}",
        WhenStatement s => $"when {Print(s.Condition)}",
        DishonestStatement s => $"dishonest {PrintQuoted(s.Title)} by {PrintParties(s.By)}",
        ReplaceStatement s => $"{(s.Before ? "before" : "instead of")} {PrintQuoted(s.Block)}",
        _ => null,
    };

    private static string? Figure(Statement statement) => statement switch
    {
        KeepStatement s => $"keep when {Print(s.Condition)}",
        CheckpointStatement s => $"checkpoint {PrintQuoted(s.Label)}: fidelity with antisymmetric on {PrintParties(s.Parties)}",
        SuccessStatement s => $"success when {Print(s.Condition)}",
        ReportStatement s => $"report {PrintQuoted(s.Label)} = {Print(s.Value)}",
        ClaimStatement s => $"claim {Print(s.Comparison)}",
        GoalStatement s => $"goal {Print(s.Comparison)}",
        HarmStatement s => $"harm when {Print(s.Condition)}",
        _ => null,
    };

    private static string? Action(Statement statement) => statement switch
    {
        MeasureStatement s => $"{Doing(s.Actors, "measure")} {PrintBasis(s.Basis, false)} as {s.Result.Text}",
        PickStatement s => $"{Doing(s.Actors, "pick")} {s.Result.Text} from {PrintList(s.Options)}",
        SendStatement { Recipients: { } to } s => $"{Doing(s.Actors, "send")} {Items(s.Items)} to {PrintParties(to)}",
        SendStatement s => $"{Doing(s.Actors, "announce")} {Items(s.Items)}",
        ApplyStatement s => $"{Doing(s.Actors, "apply")} {UnitaryPrinter.Print(s.Unitary)}",
        WaitStatement s => $"{Doing(s.Actors, "wait")} {s.Number} {s.Unit}",
        SetStatement s => $"{Doing(s.Actors, "set")} {s.Result.Text} to {Print(s.Value)}",
        AbortStatement s => $"{Doing(s.Actors, "abort")} when {Print(s.Condition)}",
        InterceptStatement s => $"{Doing(s.Actors, "intercept")} {PrintParty(s.Victim)} in {PrintBasis(s.Basis, false)} as {s.Result.Text}",
        _ => null,
    };

    private static string Doing(PartyList actors, string verb)
    {
        bool several = actors.Items is not [NamedParty or FamilyParty { To: null }];
        return $"{PrintParties(actors)} {(several ? verb : VerbTable.Find(verb)!.Singular)}";
    }

    private static string Items(IReadOnlyList<MessageItem> items)
    {
        IEnumerable<string> texts = items.Select((item, i) =>
        {
            // A name behind the value stops a list of parties by itself.
            string value = i < items.Count - 1 && item.Name is null ? PrintBeforeComma(item.Value) : Print(item.Value);
            return item.Name is null ? value : $"{value} as {item.Name.Text}";
        });
        return string.Join(", ", texts);
    }

    private static string Domain(Domain domain)
    {
        if (domain.Values is { } values)
            return $"{{{PrintList(values)}}}";
        string parting = domain.Whole ? ".." : " to ";
        return $"{(domain.From is null ? "" : PrintSum(domain.From))}{parting}{(domain.To is null ? "" : PrintSum(domain.To))}";
    }

    private static string AsWritten(Span span, SourceText source)
    {
        int start = Math.Clamp(span.Start, 0, source.Text.Length);
        return source.Text[start..Math.Clamp(span.End, start, source.Text.Length)];
    }

    private static ArgumentException Unknown(Statement statement) => new($"Unknown kind of statement {statement.GetType().Name}.", nameof(statement));
}
