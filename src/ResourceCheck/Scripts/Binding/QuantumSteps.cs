using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Binds statements about qudits.</summary>
/// <param name="context">The binding.</param>
/// <param name="actors">Finds who acts.</param>
/// <param name="names">Gives names.</param>
/// <param name="labels">Labels of checkpoints.</param>
internal sealed class QuantumSteps(BindContext context, Actors actors, NameMaker names, LabelBinder labels)
{
    private static readonly Dictionary<string, Rational> Units = new()
    {
        ["s"] = 1,
        ["ms"] = Rational.From(1, 1_000),
        ["us"] = Rational.From(1, 1_000_000),
        ["µs"] = Rational.From(1, 1_000_000),
        ["ns"] = Rational.From(1, 1_000_000_000),
        ["ps"] = Rational.From(1, 1_000_000_000_000),
    };

    /// <summary>Binds <c>measure</c>.</summary>
    public void Measure(MeasureStatement statement, List<Step> steps)
    {
        NameState before = context.Now;
        foreach (PartyMention actor in Acting(statement.Actors, "measure", statement.Result))
        {
            Typed basis = Values(before, actor.Party).Expect(statement.Basis, ValueKind.Basis);
            if (basis.Constant is NoneValue)
                context.Findings.Report(statement.Basis.Span, BindingMessages.WrongKind("none", ValueKind.None, ValueKind.Basis));
            int slot = names.Make(actor.Party, statement.Result, SlotKind.Outcome, ValueKind.Number);
            context.Now = context.Now.WithQudit(actor.Party, QuditPhase.Measured, statement.Span);
            if (basis.Bound is not null)
                steps.Add(new MeasureStep(statement.Span, actor.Party, basis.Bound, slot));
        }
    }

    /// <summary>Binds <c>apply</c>.</summary>
    public void Apply(ApplyStatement statement, List<Step> steps)
    {
        NameState before = context.Now;
        foreach (PartyMention actor in actors.WithQudits(statement.Actors, "apply"))
        {
            context.Now = context.Now.WithQudit(actor.Party, QuditPhase.Touched, statement.Span);
            if (Unitary(statement.Unitary, Values(before, actor.Party)) is { } unitary)
                steps.Add(new ApplyStep(statement.Span, actor.Party, unitary));
        }
    }

    /// <summary>Binds <c>wait</c>.</summary>
    public void Wait(WaitStatement statement, List<Step> steps)
    {
        Duration? time = Time(statement);
        foreach (PartyMention actor in actors.Idle(statement.Actors))
        {
            if (context.Now.Qudit(actor.Party) is { Phase: QuditPhase.Fresh })
                context.Now = context.Now.WithQudit(actor.Party, QuditPhase.Touched, statement.Span);
            if (time is { } duration)
                steps.Add(new WaitStep(statement.Span, actor.Party, duration));
        }
    }

    /// <summary>Binds <c>intercepts</c>.</summary>
    public void Intercept(InterceptStatement statement, List<Step> steps)
    {
        NameState before = context.Now;
        IReadOnlyList<PartyMention> outsiders = actors.Outsiders(statement.Actors);
        int victim = new PartyResolver(context).Single(statement.Victim);
        PartyMention mention = new(victim, statement.Victim.Span, false);
        bool possible = victim >= 0 && InFlight(mention, statement);
        if (outsiders.Count == 0 && statement.Actors.Items.Count > 0)
            context.Findings.Suspect(statement.Result.Text);
        foreach (PartyMention outsider in outsiders)
        {
            Typed basis = Values(before, outsider.Party).Expect(statement.Basis, ValueKind.Basis);
            if (basis.Bound is not null && context.DependsOnMessages(basis.Bound))
                context.Findings.Report(statement.Basis.Span, BindingMessages.InterceptUsesMessages(context.NameOf(outsider.Party)));
            actors.NoteIntercept(statement.Span);
            int slot = names.Make(outsider.Party, statement.Result, SlotKind.Outcome, ValueKind.Number);
            if (basis.Bound is not null && possible)
                steps.Add(new InterceptStep(statement.Span, outsider.Party, victim, basis.Bound, slot));
        }

        actors.Name([mention]);
    }

    /// <summary>Binds <c>checkpoint</c>.</summary>
    public void Checkpoint(CheckpointStatement statement, List<Step> steps)
    {
        string label = labels.Enter(statement.Label, MetricKind.Checkpoint);
        PartyMention[] mentions = [.. new PartyResolver(context).Quantum(statement.Parties)];
        PartyMention[] held = [.. mentions.Where(m => actors.HoldsQudit(m, "checkpoint"))];
        if (held.Length > 0)
            steps.Add(new CheckpointStep(statement.Span, label, [.. held.Select(h => h.Party).Order()]));
        else if (mentions.Length == 0 && statement.Parties.Items.All(i => i is FamilyParty) && context.Parties.IsComplete)
            context.Findings.Report(statement.Parties.Span, BindingMessages.EmptyCheckpoint());
    }

    private IReadOnlyList<PartyMention> Acting(PartyList list, string verb, Name result)
    {
        IReadOnlyList<PartyMention> acting = actors.WithQudits(list, verb);
        // Whoever could not act has been told; lines that use the value are not the cause.
        if (acting.Count == 0 && !context.Findings.IsEmpty)
            context.Findings.Suspect(result.Text);
        return acting;
    }

    private ExpressionBinder Values(NameState before, int actor) => new(context, new ActorView(context, before, actor));

    private bool InFlight(PartyMention victim, InterceptStatement statement)
    {
        if (context.Parties.IsOutsider(victim.Party))
        {
            context.Findings.Report(victim.Span, BindingMessages.OutsiderHoldsNothing(context.NameOf(victim.Party)));
            return false;
        }

        if (!actors.HoldsQudit(victim, "intercept"))
            return false;
        QuditState qudit = context.Now.Qudit(victim.Party)!;
        if (qudit.Phase == QuditPhase.Fresh)
            return true;
        context.Findings.Report(statement.Victim.Span, BindingMessages.InterceptTooLate(context.NameOf(victim.Party), context.LineOf(qudit.By)));
        return false;
    }

    private BoundUnitary? Unitary(UnitaryExpression u, ExpressionBinder values)
    {
        int top = context.Levels - 1;
        Typed basis = u.Basis is null ? Typed.Broken : values.Expect(u.Basis, ValueKind.Basis);
        Typed first = u.First is null ? Typed.Broken : u.Kind switch
        {
            UnitaryKind.Complement => values.Index(u.First, "complement", 0, top),
            UnitaryKind.LevelSwap => values.Index(u.First, "levelswap", 0, top),
            UnitaryKind.Fourier or UnitaryKind.InverseFourier => values.Index(u.First, "fourier on", 1, context.Levels),
            _ => Steps(values, u.First),
        };
        Typed second = u.Second is null ? Typed.Broken : values.Index(u.Second, "levelswap", 0, top);
        bool broken = (u.Basis is not null && basis.Bound is null) || (u.First is not null && first.Bound is null) || (u.Second is not null && second.Bound is null);
        return broken ? null : new BoundUnitary(u.Span, u.Kind, basis.Bound, first.Bound, second.Bound, u.File?.Text);
    }

    private static Typed Steps(ExpressionBinder values, Expression expression)
    {
        Typed typed = values.Expect(expression, ValueKind.Number);
        return typed.Constant is NumberValue { Number.IsWhole: false } number
            ? values.Refuse(expression.Span, BindingMessages.WholeNumberNeeded(Written.Number(number.Number)))
            : typed;
    }

    private Duration? Time(WaitStatement statement)
    {
        if (Rational.TryParse(statement.Number, out Rational number) && number.Sign >= 0 && Units.TryGetValue(statement.Unit, out Rational unit)
            && double.IsFinite((number * unit).ToDouble()))
            return Duration.FromSeconds((number * unit).ToDouble());
        context.Findings.Report(statement.QuantitySpan, BindingMessages.NoTime(context.TextOf(statement.QuantitySpan)));
        return null;
    }
}
