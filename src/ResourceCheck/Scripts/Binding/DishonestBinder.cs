using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>
/// Binds cheating strategies: for each the whole script is gone through again with the strategy's lines in place of its parties' own,
/// so that every check of the honest case holds there too.
/// </summary>
/// <param name="context">The binding, after the honest case.</param>
/// <param name="start">Who holds what before the first line.</param>
internal sealed class DishonestBinder(BindContext context, NameState start)
{
    private readonly LabelBinder _labels = new(context);

    /// <summary>Binds all strategies; those with mistakes are left out.</summary>
    public IReadOnlyList<DishonestCase> Bind()
    {
        DishonestStatement[] statements = [.. context.Tree.Statements.OfType<DishonestStatement>()];
        foreach (IGrouping<string, DishonestStatement> alike in statements.GroupBy(s => s.Title.Text))
        {
            foreach (DishonestStatement further in alike.Skip(1))
                context.Findings.Report(further.Title.Span, BindingMessages.DeclaredTwice($"The case \"{alike.Key}\"", context.LineOf(alike.First().Span)));
        }

        return [.. statements.Select(Bind).OfType<DishonestCase>()];
    }

    private DishonestCase? Bind(DishonestStatement statement)
    {
        context.Restart(start);
        context.Findings.EnterCase(statement.Span, EndOf(statement));
        context.Makers = new MakerIndex(context.Tree, statement);
        Cheat cheat = new(context, statement, Parties(statement));
        CheckLines(statement);
        CheckChoices(statement, cheat);
        context.Cheat = cheat;
        StepBinder binder = new(context, _labels);
        IReadOnlyList<Step> steps = binder.Bind();
        BoundExpression? harm = Harm(statement);
        BoundExpression? success = context.Findings.Try(() => Success(binder, steps));
        foreach (ChooseStatement unused in cheat.Unused)
            context.Findings.Report(unused.Span, BindingMessages.ChoiceUnused(unused.Name.Text));
        context.Cheat = null;
        context.Makers = new MakerIndex(context.Tree, null);
        context.Findings.LeaveCase();
        if (harm is null)
            return null;
        return new DishonestCase(statement.Title.Text, cheat.By, cheat.Choices, steps, context.HasCopies ? binder.ListSteps : null, harm)
        {
            Success = success,
            PerfectHardware = statement.Body.Any(s => s is PerfectStatement),
        };
    }

    private int EndOf(DishonestStatement statement) =>
        context.Tree.Statements.Where(s => s.Span.Start > statement.Span.Start).Select(s => s.Span.Start).DefaultIfEmpty(int.MaxValue).Min();

    private int[] Parties(DishonestStatement statement)
    {
        IReadOnlyList<PartyMention> mentions = new PartyResolver(context).Classical(statement.By);
        foreach (PartyMention outsider in mentions.Where(m => context.Parties.IsOutsider(m.Party)))
            context.Findings.Report(outsider.Span, BindingMessages.OutsiderMayNot(context.NameOf(outsider.Party), "cheat"));
        return [.. mentions.Select(m => m.Party).Where(p => !context.Parties.IsOutsider(p)).Order()];
    }

    private void CheckLines(DishonestStatement statement)
    {
        HashSet<(string, bool)> replaced = [];
        foreach (ReplaceStatement lines in statement.Body.OfType<ReplaceStatement>())
        {
            string title = lines.Block.Text;
            string[] known = [.. context.Blocks.SelectMany(b => new[] { b.Title, b.Written }).Distinct()];
            if (!known.Contains(title))
                context.Findings.Report(lines.Block.Span, BindingMessages.UnknownBlock(title, NearWords.Find(title, known), [.. context.Blocks.Select(b => b.Title).Distinct()]));
            else if (!replaced.Add((title, lines.Before)))
                context.Findings.Report(lines.Block.Span, BindingMessages.ReplacedTwice(title));
        }

        if (replaced.Count == 0 && !statement.Body.Any(s => s is ReplaceStatement or BrokenStatement))
            context.Findings.Report(statement.Span, BindingMessages.NoReplacement(statement.Title.Text));
    }

    private void CheckChoices(DishonestStatement statement, Cheat cheat)
    {
        foreach (ChooseStatement choose in statement.Body.OfType<ChooseStatement>())
        {
            string name = choose.Name.Text;
            if (!cheat.IsFree(name))
                context.Findings.Report(choose.Name.Span, BindingMessages.NameTaken(name, context.IsNameTaken(name) ? context.RoleOf(name) : "another value"));
        }
    }

    /// <summary>The success condition with what the strategy makes of its names; null when the cheat leaves a name out.</summary>
    private BoundExpression? Success(StepBinder binder, IReadOnlyList<Step> steps)
    {
        RefereeBinder referee = new(context, _labels, steps);
        referee.Bind([.. binder.RefereeLines.Where(l => l.Statement is SuccessStatement).Take(1)]);
        return referee.Success;
    }

    private BoundExpression? Harm(DishonestStatement statement)
    {
        HarmStatement[] harms = [.. statement.Body.OfType<HarmStatement>()];
        foreach (HarmStatement further in harms.Skip(1))
            context.Findings.Report(further.Span, BindingMessages.DeclaredTwice("harm", context.LineOf(harms[0].Span)));
        if (harms.Length == 0)
        {
            if (!statement.Body.Any(s => s is BrokenStatement))
                context.Findings.Report(statement.Span, BindingMessages.HarmMissing(statement.Title.Text));
            return null;
        }

        context.OnLists = context.HasCopies;
        BoundExpression? harm = new ExpressionBinder(context, new RefereeView(context, context.Now)).Expect(harms[0].Condition, ValueKind.Truth).Bound;
        context.OnLists = false;
        return harm;
    }
}
