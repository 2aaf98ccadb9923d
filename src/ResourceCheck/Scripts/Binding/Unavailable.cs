using ResourceCheck.Scripts.Syntax;

namespace ResourceCheck.Scripts.Binding;

/// <summary>Parts of the language that this version reads but cannot check or run.</summary>
internal static class Unavailable
{
    /// <summary>The refusal of a statement, or null when it is available.</summary>
    public static Message? Of(Statement statement) => statement switch
    {
        CopiesStatement => BindingMessages.CopiesNotAvailable(),
        DiscussionStatement => BindingMessages.DiscussionNotAvailable(),
        DishonestStatement or ReplaceStatement or HarmStatement => BindingMessages.DishonestNotAvailable(),
        ChooseStatement => BindingMessages.ChooseNotAvailable(),
        _ => null,
    };

    /// <summary>Marks the names that a skipped statement would have made, so that lines which use them are not blamed.</summary>
    public static void Suspect(BindContext context, Statement statement)
    {
        foreach (Name name in TreeWalk.Makes(statement))
            context.Findings.Suspect(name.Text);
        if (statement is CheckpointStatement checkpoint)
            context.Findings.Suspect(checkpoint.Label.Text);
    }
}
