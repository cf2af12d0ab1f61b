using System.Runtime.InteropServices;

namespace StackTiming.Terminal;

/// <summary>
/// Turns Ctrl-C and a request to end into a cancelled token, so that running work stops cleanly and no half file is left. A second
/// Ctrl-C ends the process at once.
/// </summary>
public sealed class Interruption : IDisposable
{
    private readonly CancellationTokenSource source = new();
    private readonly PosixSignalRegistration interrupt;
    private readonly PosixSignalRegistration terminate;

    /// <summary>Begins to listen.</summary>
    public Interruption()
    {
        interrupt = PosixSignalRegistration.Create(PosixSignal.SIGINT, Handle);
        terminate = PosixSignalRegistration.Create(PosixSignal.SIGTERM, Handle);
    }

    /// <summary>Cancelled once the user wants the program to stop.</summary>
    public CancellationToken Token => source.Token;

    /// <inheritdoc/>
    public void Dispose()
    {
        interrupt.Dispose();
        terminate.Dispose();
        source.Dispose();
    }

    private void Handle(PosixSignalContext context)
    {
        if (source.IsCancellationRequested)
            return; // the default action ends the process
        context.Cancel = true;
        source.Cancel();
    }
}
