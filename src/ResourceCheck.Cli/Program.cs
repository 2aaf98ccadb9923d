using ResourceCheck.Cli;

using Interruption interruption = new();
return await CommandLineTool.RunAsync(args, ToolHost.OfProcess(), new Library(), interruption.Token);
