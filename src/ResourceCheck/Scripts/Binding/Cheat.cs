using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>A cheating strategy while it is bound: who cheats, which blocks change, which numbers are left open.</summary>
/// <param name="context">The binding.</param>
/// <param name="statement">The <c>dishonest</c> block.</param>
/// <param name="by">Indices of the parties that cheat.</param>
internal sealed class Cheat(BindContext context, DishonestStatement statement, IReadOnlyList<int> by)
{
    private readonly ChooseStatement[] _choices = [.. statement.Body.OfType<ChooseStatement>()];
    private readonly Choice?[] _ranges = new Choice?[statement.Body.Count(s => s is ChooseStatement)];
    private readonly bool[] _used = new bool[statement.Body.Count(s => s is ChooseStatement)];
    private int _open = int.MaxValue;

    /// <summary>Indices of the parties that cheat.</summary>
    public IReadOnlyList<int> By => by;

    /// <summary>Names of the parties that cheat.</summary>
    public string Names => Words.And(by.Select(context.NameOf));

    /// <summary>Whether the lines at hand are the strategy's own, which only the parties that cheat may act in.</summary>
    public bool Speaks { get; set; }

    /// <summary>Whether the lines at hand are those of a replaced block, in which the parties that cheat do nothing.</summary>
    public bool Replaces { get; set; }

    /// <summary>The numbers left open, once all lines are bound; those whose range was wrong are left out.</summary>
    public IReadOnlyList<Choice> Choices => [.. _ranges.OfType<Choice>()];

    /// <summary>Numbers that no line uses.</summary>
    public IEnumerable<ChooseStatement> Unused => _choices.Where((c, i) => !_used[i] && IsFree(c.Name.Text));

    /// <summary>What stands in place of a block, or before it, or null.</summary>
    public ReplaceStatement? For(string written, string title, bool before) => statement.Body.OfType<ReplaceStatement>()
        .FirstOrDefault(r => r.Before == before && (r.Block.Text == written || r.Block.Text == title));

    /// <summary>Whether a name is a number left open.</summary>
    public bool Chooses(string name) => _choices.Any(c => c.Name.Text == name) && IsFree(name);

    /// <summary>Whether a name of a choice means nothing else in the script.</summary>
    public bool IsFree(string name) => !context.IsNameTaken(name) && context.Makers.Of(name).Count <= 1;

    /// <summary>A number left open; its range is read as whoever uses it first knows it there.</summary>
    public Typed Use(NameExpression name, NameView view)
    {
        int index = Array.FindIndex(_choices, c => c.Name.Text == name.Text);
        if (index >= _open)
        {
            context.Findings.Report(name.Span, BindingMessages.ChoiceBelow(name.Text));
            return Typed.Broken;
        }

        if (!_used[index])
        {
            _used[index] = true;
            int outer = _open;
            _open = index;
            _ranges[index] = Range(_choices[index], view);
            _open = outer;
        }

        return new Typed(new BoundChoice(name.Span, index), ValueKind.Number);
    }

    private Choice? Range(ChooseStatement choose, NameView view)
    {
        Domain domain = choose.Domain;
        if (domain.From is null || domain.To is null)
        {
            context.Findings.Report(domain.Span, BindingMessages.ChoiceFromList(context.TextOf(domain.Span)));
            return null;
        }

        ExpressionBinder values = new(context, view) { IsRange = true };
        Typed from = values.Expect(domain.From, ValueKind.Number), to = values.Expect(domain.To, ValueKind.Number);
        if (from.Constant is NumberValue least && to.Constant is NumberValue most && Empty(least.Number, most.Number, domain.Whole))
            context.Findings.Report(domain.Span, BindingMessages.EmptyDomain(context.TextOf(domain.Span)));
        return from.Bound is null || to.Bound is null ? null : new Choice(choose.Name.Text, from.Bound, to.Bound, domain.Whole);
    }

    private static bool Empty(Quantities.Rational least, Quantities.Rational most, bool whole) => whole ? most.Floor() < least.Ceiling() : most < least;
}
