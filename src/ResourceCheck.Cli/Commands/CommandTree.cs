using System.CommandLine;
using ResourceCheck.Cli.Usage;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Cli.Commands;

/// <summary>All commands with their words, options and actions.</summary>
internal static class CommandTree
{
    /// <summary>Builds the tree for a session.</summary>
    public static RootCommand Build(Session session)
    {
        Options o = new();
        RootCommand root = new("Judges whether a prepared antisymmetric multi-party state is good enough for a protocol.") { TreatUnmatchedTokensAsErrors = false };
        root.Options.Clear();
        root.Options.Add(Options.Help);
        root.Options.Add(o.Version);
        Option[] judging = [o.Under, o.Set, o.Parameter, o.Engine, o.Memory];
        Option[] writing = [o.Format, o.Out, o.Quiet];
        Option[] computing = [o.Seed, o.Threads];
        Add("run", "SCRIPT", "Evaluate a protocol under conditions: success, harm, yield, fidelity, time, verdict.", RunCommand.Execute, [.. judging, o.Choose, o.Drift, o.TryLevels, o.Uncertainty, o.Draws, .. writing, o.Figure, .. computing]);
        Add("verify", "SCRIPT", "Prove or refute what the protocol claims, exactly, under ideal conditions.", VerifyCommand.Execute, [o.Parameter, o.Memory, .. writing, .. computing]);
        Add("inspect", "SCRIPT", "Compute nothing: show who knows what, the timeline, the engine and its cost, and every mistake.", InspectCommand.Execute, [.. judging, .. writing, .. computing]);
        Add("budget", "SCRIPT", "Share a loss out among its sources: each alone, each removed, and its part of the whole.", BudgetCommand.Execute, [.. judging, o.Uncertainty, .. writing, o.Figure, .. computing]);
        Add("tolerance", "SCRIPT", "Find up to which value a goal is met.", ToleranceCommand.Execute, [o.Vary, o.Goal, o.Uncertainty, .. judging, .. writing, o.Figure, .. computing]);
        Add("sweep", "SCRIPT", "Evaluate at every point of one or two ranges; interrupted sweeps go on.", SweepCommand.Execute, [o.Vary, o.Uncertainty, .. judging, .. writing, o.Figure, .. computing]);
        Add("copies", "SCRIPT", "Find how many copies a failure probability costs, honest and with the cheats listed.", CopiesCommand.Execute, [o.Failure, o.Harm, o.Optimise, o.Vary, .. judging, .. writing, o.Figure, .. computing]);
        Add("report", "STUDY", "Write a feasibility section from a study file: verdicts, tolerances, budgets, rates, copies, figures, tables.", ReportCommand.Execute, [o.Folder, o.Quiet, .. computing]);
        Add("state", "FILE", "Tell what a prepared state is: validity, fidelity, purity, negativity, populations.", StateCommand.Execute, [o.Mend, .. writing]);
        Add("storage", "CONDITIONS", "Tell how long emitters side by side keep the antisymmetric state, beside its symmetric counterpart and independent decay.", StorageCommand.Execute, [o.Set, o.Parties, o.Until, o.Points, .. writing, o.Figure]);
        Add("relaxation", "CONDITIONS", "Tell what shared decay makes of a start: fidelity, populations and yield against time.", RelaxationCommand.Execute, [o.Set, o.Parties, o.Until, o.Points, o.Samples, o.Seed, .. writing, o.Figure]);
        Add("format", "SCRIPT", "Print a script in its one shape.", FormatCommand.Execute, [o.Check, o.Write, o.Out, o.Quiet]);
        Add("explain", "[CODE]", "Tell cause and cure of a message; without a code, list all.", ExplainCommand.Execute, [o.PageFormat, o.Out]);
        Add("schema", "NAME", "Print the JSON schema of a file kind.", SchemaCommand.Execute, [o.Out]);
        Add("new", "NAME", "Write a commented script and conditions file to start from.", NewCommand.Execute, [o.Force]);
        root.SetAction((parsed, _) => Task.FromResult(RootCommandAction.Execute(parsed, root, o, session)));
        return root;

        void Add(string name, string word, string description, Func<Invocation, Options, CancellationToken, Task<int>> execute, Option[] options)
        {
            Command command = new(name, description) { TreatUnmatchedTokensAsErrors = false };
            command.Arguments.Add(new Argument<string[]>(word) { Arity = ArgumentArity.ZeroOrMore });
            foreach (Option option in options)
                command.Options.Add(option);
            command.SetAction((parsed, token) => parsed.GetValue(Options.Help)
                ? Task.FromResult(session.Terminal.Write(HelpPage.Of(command), ExitCodes.Done))
                : Interruptible(() => execute(new Invocation(parsed, session), o, token), token));
            root.Subcommands.Add(command);
        }
    }

    // A read from a terminal or a pipe cannot be cancelled: it is left behind instead, and ends with the process.
    private static Task<int> Interruptible(Func<Task<int>> execute, CancellationToken token) => Task.Run(execute, token).WaitAsync(token);
}
