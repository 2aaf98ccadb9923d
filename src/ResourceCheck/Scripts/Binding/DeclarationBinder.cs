using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Reads the declarations of a script, whatever their order: parties, outsiders, resource, inputs, requirements.</summary>
/// <param name="context">The binding.</param>
internal sealed class DeclarationBinder(BindContext context)
{
    // Engines stop far below; the limit only keeps a slip such as P[1..1000000] from filling the memory.
    private const int MostParties = 1000;

    private readonly PartyResolver _parties = new(context);

    /// <summary>Declares parties, outsiders, the resource and inputs.</summary>
    public void Declare()
    {
        Single<ProtocolStatement>("protocol");
        Single<AboutStatement>("about");
        DeclareParties();
        foreach (OutsiderStatement outsider in Top<OutsiderStatement>())
            DeclareOutsider(outsider);
        ClashWithParameters();
        DeclareResource();
        context.Now = context.Now with { Qudits = [.. Enumerable.Range(0, context.Parties.Names.Count).Select(p => context.Parties.Holders.Contains(p) ? new QuditState(QuditPhase.Fresh, default) : null)] };
        foreach (InputStatement input in Top<InputStatement>())
            DeclareInput(input);
    }

    /// <summary>The number of copies; null when the script works on a single one, 1 after a finding.</summary>
    public int? Copies()
    {
        if (Single<CopiesStatement>("copies") is not { } statement)
            return null;
        context.HasCopies = true;
        if (_parties.Whole(statement.Count) is not { } copies)
            return 1;
        if (copies < 1)
            context.Findings.Report(statement.Count.Span, BindingMessages.CopiesCount(Written.Number(copies)));
        return Math.Max(1, copies);
    }

    /// <summary>Evaluates the script's requirements; broken ones are no findings.</summary>
    public IReadOnlyList<Requirement> Requirements() => [.. Top<RequireStatement>().Select(Require).OfType<Requirement>()];

    /// <summary>The only statement of its kind, or null; further ones are reported.</summary>
    public T? Single<T>(string word)
        where T : Statement
    {
        T[] all = [.. Top<T>()];
        foreach (T further in all.Skip(1))
            context.Findings.Report(further.Span, BindingMessages.DeclaredTwice(word, context.LineOf(all[0].Span)));
        return all.FirstOrDefault();
    }

    /// <summary>Reports that a necessary statement is missing, unless a line that could not be read may be it.</summary>
    public void Missing(string word, string example)
    {
        if (!context.Findings.IsSuspect(word))
            context.Findings.Report(new Span(0, 0), BindingMessages.StatementMissing(word, example));
    }

    private IEnumerable<T> Top<T>() => context.Tree.Statements.OfType<T>();

    private void DeclareParties()
    {
        if (Single<PartiesStatement>("parties") is not { } statement)
        {
            context.Parties.IsComplete = false;
            Missing("parties", "parties Ada, Ben, Cyd");
            return;
        }

        foreach (PartyRef item in statement.Parties.Items)
            DeclareParty(item);
        context.Parties.IsComplete &= !context.Findings.IsSuspect("parties");
    }

    private void DeclareParty(PartyRef item)
    {
        switch (item)
        {
            case NamedParty named:
                if (!context.Parties.TryAdd(named.Name))
                    context.Findings.Report(named.Span, BindingMessages.DeclaredTwice(named.Name, context.LineOf(named.Span)));
                break;
            case FamilyParty family:
                DeclareFamily(family);
                break;
            default:
                context.Parties.IsComplete = false;
                context.Findings.Report(item.Span, BindingMessages.NoPartyName(context.TextOf(item.Span)));
                break;
        }
    }

    private void DeclareFamily(FamilyParty family)
    {
        int? from = _parties.Whole(family.From), to = family.To is null ? from : _parties.Whole(family.To);
        if (from is not { } first || to is not { } last || first < 0 || last < first || last - first >= MostParties)
        {
            context.Parties.IsComplete = false;
            if (from is not null && to is not null)
                context.Findings.Report(family.Span, BindingMessages.FamilyRange(family.Family, from.Value, to.Value, MostParties));
        }
        else if (!context.Parties.TryAddFamily(family.Family, first, last))
        {
            context.Findings.Report(family.Span, BindingMessages.DeclaredTwice(family.Family, context.LineOf(family.Span)));
        }
    }

    private void DeclareOutsider(OutsiderStatement outsider)
    {
        if (!context.Parties.TryAddOutsider(outsider.Name.Text))
            context.Findings.Report(outsider.Name.Span, BindingMessages.DeclaredTwice(outsider.Name.Text, context.LineOf(outsider.Span)));
    }

    private void ClashWithParameters()
    {
        foreach (ParameterStatement parameter in Top<ParameterStatement>())
        {
            string name = parameter.Name.Text;
            if (context.Parties.IndexOf(name) >= 0 || context.Parties.Families.ContainsKey(name))
                context.Findings.Report(parameter.Name.Span, BindingMessages.NameTaken(name, "a party"));
        }
    }

    private void DeclareResource()
    {
        PartyTable parties = context.Parties;
        if (Single<ResourceStatement>("resource") is not { } statement)
        {
            parties.Holders = [.. parties.Insiders];
            parties.HasResource = false;
            Missing("resource", "resource antisymmetric on all");
            return;
        }

        PartyMention[] holders = [.. _parties.Classical(statement.Parties)];
        foreach (PartyMention outsider in holders.Where(h => parties.IsOutsider(h.Party)))
            context.Findings.Report(outsider.Span, BindingMessages.OutsiderHoldsNothing(context.NameOf(outsider.Party)));
        parties.Holders = [.. holders.Select(h => h.Party).Where(p => !parties.IsOutsider(p)).Order()];
        if (parties.Holders.Count >= 2)
            return;
        parties.HasResource = false;
        if (parties.IsComplete && holders.Length == parties.Holders.Count)
            context.Findings.Report(statement.Parties.Span, BindingMessages.ResourceTooSmall(parties.Holders.Count));
    }

    private void DeclareInput(InputStatement input)
    {
        IReadOnlyList<Value>? values = new DomainBinder(context).Values(input.Domain);
        ValueKind kind = values is null || values.Count == 0 ? ValueKind.Unknown : ValueKinds.Of(values[0]);
        if (context.IsNameTaken(input.Name.Text))
            context.Findings.Report(input.Name.Span, BindingMessages.NameTaken(input.Name.Text, context.RoleOf(input.Name.Text)));
        foreach (PartyMention owner in _parties.Classical(new PartyList(input.Owner.Span, [input.Owner])))
        {
            if (context.Now.Own.TryGetValue(new(owner.Party, input.Name.Text), out Holding? present))
                context.Findings.Report(input.Name.Span, BindingMessages.MadeTwice(context.NameOf(owner.Party), input.Name.Text, context.LineOf(present.Span)));
            int slot = context.AddSlot(input.Name.Text, owner.Party, SlotKind.Input, input.Name.Span);
            context.Now = context.Now.WithOwn(owner.Party, input.Name.Text, new Holding([slot], kind, input.Name.Span));
            context.Inputs.Add(new InputValues(input.Name.Text, owner.Party, slot, values ?? []));
        }
    }

    private Requirement? Require(RequireStatement statement)
    {
        Typed condition = new ExpressionBinder(context, new ConstantView(context)).Expect(statement.Condition, ValueKind.Truth);
        if (condition.Constant is not { } value)
            return null;
        string text = context.TextOf(statement.Condition.Span);
        return new Requirement(text, statement.Reason.Text, value is TruthValue { Truth: true }, Figures(statement.Condition), statement.Span);
    }

    private string Figures(Expression expression) => expression switch
    {
        BinaryExpression { Operator: BinaryOperator.And or BinaryOperator.Or } e =>
            $"{Figures(e.Left)} {(e.Operator == BinaryOperator.And ? "and" : "or")} {Figures(e.Right)}",
        BinaryExpression { Operator: >= BinaryOperator.Equal and <= BinaryOperator.GreaterOrEqual } e => $"{Figure(e.Left)} {Sign(e.Operator)} {Figure(e.Right)}",
        UnaryExpression { Operator: UnaryOperator.Not } e => $"not ({Figures(e.Operand)})",
        _ => Figure(expression),
    };

    private string Figure(Expression expression) =>
        new ExpressionBinder(context, new ConstantView(context)).Bind(expression).Constant is { } value ? Written.Write(value) : context.TextOf(expression.Span);

    private static string Sign(BinaryOperator op) => op switch
    {
        BinaryOperator.Equal => "=",
        BinaryOperator.Unequal => "!=",
        BinaryOperator.Less => "<",
        BinaryOperator.LessOrEqual => "<=",
        BinaryOperator.Greater => ">",
        _ => ">=",
    };
}
