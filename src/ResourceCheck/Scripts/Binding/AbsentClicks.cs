using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>
/// Whether a script deals with measurements that saw nothing: whether it mentions <c>none</c> where values of single copies are meant.
/// In the single values of a discussion <c>none</c> says something else, such as a list that was not accepted; and what a cheat
/// reports changes nothing for the honest parties.
/// </summary>
internal static class AbsentClicks
{
    /// <summary>Whether a script deals with them itself.</summary>
    public static bool AreHandled(ScriptTree tree)
    {
        bool lists = tree.Statements.Any(s => s is CopiesStatement);
        return Honest(tree.Statements, lists).Any(part => TreeWalk.Within(part).Any(e => e is NoneExpression));
    }

    private static IEnumerable<Expression?> Honest(IEnumerable<Statement> statements, bool lists)
    {
        foreach (Statement statement in statements)
        {
            if (statement is DishonestStatement)
                continue;
            bool single = lists && statement is (DiscussionStatement or SuccessStatement or ReportStatement or ClaimStatement or GoalStatement);
            foreach (Statement line in statement is DiscussionStatement ? TreeWalk.Statements([statement]) : [statement])
            {
                IEnumerable<Expression?> own = TreeWalk.Expressions(line);
                foreach (Expression? part in single ? own.SelectMany(Predicates) : own)
                    yield return part;
            }

            if (statement is DiscussionStatement)
                continue;
            foreach (Expression? part in Honest(TreeWalk.Body(statement), lists))
                yield return part;
        }
    }

    private static IEnumerable<Expression> Predicates(Expression? expression) =>
        TreeWalk.Within(expression).OfType<CallExpression>()
            .Where(c => ListCalls.Fits(c) && c.Function.Text is ("where" or "count" or "share")).SelectMany(c => c.Arguments);
}
