using System.CommandLine;
using System.Text;

namespace ResourceCheck.Cli.Usage;

/// <summary>What <c>--help</c> prints: made from the commands themselves, so that no option can be missing.</summary>
internal static class HelpPage
{
    private const string Cautions = """

        Before you use a result:
          - It is the evaluation of a model with the values you entered. It is no security proof, no
            certification and no safety case; accredited evaluators judge a deployment by the
            standards that apply to it.
          - "Goal met" holds for these values; "not met" does not show that it cannot be done.
          - Harms are those of the cheating strategies listed in the script, in this model, with a
            trusted source and trusted calibration.
          - Random numbers drawn by the program must never serve as secret keys.
          - Documents hold file names and settings: read them before you pass them on.
          - Lasers (infrared light in fibres is invisible), high voltage and cryogens are worked with
            under local rules and by licensed people.

        """;

    private const string ExitCodeList = """

        Exit codes:
          0  computed; goals met, or none set
          1  computed; a goal is not met, a claim is refuted, or format --check found a difference
          2  the input is wrong
          3  no trustworthy result could be had
          70  a mistake of the program itself
          130  interrupted

        """;

    /// <summary>The page of a command or of the whole tool.</summary>
    public static string Of(Command command)
    {
        StringBuilder page = new($"{command.Description}\n\nUsage: {UsageOf(command)}\n");
        Append(page, "Commands", command.Subcommands.Where(c => !c.Hidden).Select(c => ($"{c.Name} {string.Concat(c.Arguments.Select(a => a.Name))}", c.Description)));
        Append(page, "Options", command.Options.Concat(command is RootCommand ? [] : [Options.Help]).Where(o => !o.Hidden).Select(o => (NameOf(o), o.Description)));
        if (command is RootCommand)
            page.Append(ExitCodeList).Append(Cautions);
        else
            page.Append("\nAs the name of a script or of conditions, - stands for standard input. resourcecheck --help tells exit codes and cautions.\n");
        return page.ToString();
    }

    private static string UsageOf(Command command) => command is RootCommand
        ? "resourcecheck COMMAND ..."
        : $"resourcecheck {command.Name} {string.Concat(command.Arguments.Select(a => a.Name))} [options]";

    private static string NameOf(Option option) => string.Join(", ", option.Aliases.Order(StringComparer.Ordinal).Append(option.Name).Distinct()) + (option.HelpName is null || option.ValueType == typeof(bool) ? "" : $" {option.HelpName}");

    private static void Append(StringBuilder page, string title, IEnumerable<(string Name, string? Description)> lines)
    {
        (string Name, string? Description)[] all = [.. lines];
        if (all.Length == 0)
            return;
        int width = all.Max(l => l.Name.Length);
        page.Append('\n').Append(title).Append(":\n");
        foreach ((string name, string? description) in all)
            page.Append("  ").Append(name.PadRight(width)).Append("  ").Append(description).Append('\n');
    }
}
