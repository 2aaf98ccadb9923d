using System.Runtime.InteropServices;

namespace ResourceCheck.Cli;

/// <summary>Turns Ctrl-C into a cancelled token; a second one ends the process at once.</summary>
internal sealed class Interruption : IDisposable
{
    private readonly CancellationTokenSource _source = new();
    private readonly List<PosixSignalRegistration> _registrations;
    private int _signals;

    /// <summary>Begins to listen.</summary>
    public Interruption() => _registrations =
        [PosixSignalRegistration.Create(PosixSignal.SIGINT, OnSignal), PosixSignalRegistration.Create(PosixSignal.SIGTERM, OnSignal)];

    /// <summary>Cancelled by the first signal.</summary>
    public CancellationToken Token => _source.Token;

    /// <inheritdoc/>
    public void Dispose()
    {
        _registrations.ForEach(r => r.Dispose());
        _source.Dispose();
    }

    private void OnSignal(PosixSignalContext context)
    {
        context.Cancel = true;
        if (Interlocked.Increment(ref _signals) > 1)
            Environment.Exit(ExitCodes.Interrupted);
        _source.Cancel();
    }
}
