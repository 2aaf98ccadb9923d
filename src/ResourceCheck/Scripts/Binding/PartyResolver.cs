using System.Numerics;
using ResourceCheck.Diagnostics;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>A party that a list names.</summary>
/// <param name="Party">Its index.</param>
/// <param name="Span">The words that name it.</param>
/// <param name="Collective">Whether they are <c>all</c> or <c>others</c>.</param>
internal sealed record PartyMention(int Party, Span Span, bool Collective);

/// <summary>Turns written lists of parties into indices.</summary>
/// <param name="context">The binding.</param>
internal sealed class PartyResolver(BindContext context)
{
    /// <summary>A list in a classical statement: <c>all</c> means everyone who is no outsider.</summary>
    public IReadOnlyList<PartyMention> Classical(PartyList list) => Resolve(list, context.Parties.Insiders);

    /// <summary>A list in a quantum statement: <c>all</c> means those who still hold a qudit.</summary>
    public IReadOnlyList<PartyMention> Quantum(PartyList list)
    {
        int[] holders = [.. context.Parties.Holders.Where(p => context.Now.Qudit(p)!.IsHeld)];
        if (holders.Length == 0 && context.Parties.HasResource && list.Items.FirstOrDefault(i => i is CollectiveParty) is { } collective)
            context.Findings.Report(collective.Span, BindingMessages.NobodyHolds(context.TextOf(collective.Span), LastUse()));
        return Resolve(list, holders);
    }

    /// <summary>The one party that a reference names, or -1 after a finding.</summary>
    public int Single(PartyRef reference)
    {
        List<PartyMention> mentions = Resolve(new PartyList(reference.Span, [reference]), context.Parties.Insiders);
        if (mentions.Count == 1 && !mentions[0].Collective)
            return mentions[0].Party;
        if (mentions.Count != 0 || reference is CollectiveParty)
            context.Findings.Report(reference.Span, BindingMessages.OnePartyFits(context.TextOf(reference.Span)));
        return -1;
    }

    /// <summary>A whole number between the bounds of int from parameters and counters, or null after a finding.</summary>
    public int? Whole(Expression expression)
    {
        Typed typed = new ExpressionBinder(context, new ConstantView(context)).Expect(expression, ValueKind.Number);
        if (typed.Constant is not { } value)
            return null;
        if (value is NumberValue { Number.IsWhole: true } number && BigInteger.Abs(number.Number.Numerator) <= int.MaxValue)
            return (int)number.Number.Numerator;
        context.Findings.Report(expression.Span, BindingMessages.WholeNumberNeeded(Written.Write(value)));
        return null;
    }

    private int LastUse() => context.Now.Qudits.OfType<QuditState>().Select(q => context.LineOf(q.By)).DefaultIfEmpty(0).Max();

    private List<PartyMention> Resolve(PartyList list, IEnumerable<int> everybody)
    {
        List<PartyMention> found = [];
        foreach (PartyRef item in list.Items)
        {
            foreach (int party in Members(item, everybody, found))
            {
                if (!found.Any(f => f.Party == party))
                    found.Add(new PartyMention(party, item.Span, item is CollectiveParty));
                else if (item is not CollectiveParty)
                    context.Findings.Report(item.Span, BindingMessages.NamedTwice(context.NameOf(party)));
            }
        }

        return found;
    }

    private int[] Members(PartyRef item, IEnumerable<int> everybody, List<PartyMention> before) => item switch
    {
        NamedParty named => Named(named),
        FamilyParty family => Family(family),
        CollectiveParty { Others: true } others => Others(others, everybody, before),
        _ => [.. everybody],
    };

    private int[] Others(CollectiveParty others, IEnumerable<int> everybody, List<PartyMention> before)
    {
        if (context.Named is not { } named)
        {
            context.Findings.Report(others.Span, BindingMessages.OthersMeansNobody());
            return [];
        }

        return [.. everybody.Where(p => !named.Contains(p) && !before.Any(b => b.Party == p))];
    }

    private int[] Named(NamedParty named)
    {
        int party = context.Parties.IndexOf(named.Name);
        if (party >= 0)
            return [party];
        if (context.Parties.Families.TryGetValue(named.Name, out (int Least, int Most) range))
            context.Findings.Report(named.Span, BindingMessages.FamilyNeedsNumber(named.Name, range.Least, range.Most));
        else if (context.Parties.IsComplete)
            context.Findings.ReportName(named.Name, named.Span, BindingMessages.UnknownParty(named.Name, NearParty(named.Name), context.Parties.Names));
        return [];
    }

    private int[] Family(FamilyParty family)
    {
        int? from = Whole(family.From), to = family.To is null ? from : Whole(family.To);
        if (from is not { } first || to is not { } last)
            return [];
        if (!context.Parties.Families.TryGetValue(family.Family, out (int Least, int Most) range))
        {
            if (context.Parties.IsComplete)
                context.Findings.ReportName(family.Family, family.Span, BindingMessages.UnknownFamily(family.Family, NearFamily(family.Family)));
            return [];
        }

        if (last < first)
            return [];
        int wrong = first < range.Least || first > range.Most ? first : last;
        if (wrong >= range.Least && wrong <= range.Most)
            return [.. Enumerable.Range(first, last - first + 1).Select(n => context.Parties.IndexOf(PartyTable.Member(family.Family, n))).Where(p => p >= 0)];
        context.Findings.Report(family.Span, BindingMessages.OutsideFamily(family.Family, wrong, range.Least, range.Most));
        return [];
    }

    private string? NearParty(string name) => NearWords.Find(name, context.Parties.Names.Concat(context.Parties.Families.Keys));

    private string? NearFamily(string name) => NearWords.Find(name, context.Parties.Families.Keys);
}
