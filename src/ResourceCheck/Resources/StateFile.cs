using ResourceCheck.Diagnostics;

namespace ResourceCheck.Resources;

/// <summary>Reads prepared states from <c>.npy</c>, Matrix Market <c>.mtx</c> and JSON files (page 7) and describes them.</summary>
public static class StateFile
{
    /// <summary>Reads and checks a state: size, Hermitian, trace 1, positive. Small violations are mended only when asked.</summary>
    /// <param name="path">File to read.</param>
    /// <param name="mend">Whether the nearest density matrix replaces one that slightly is none.</param>
    public static Outcome<PreparedState> Read(string path, bool mend) => throw new NotSupportedException();

    /// <summary>Describes a state for the <c>state</c> command.</summary>
    public static Outcome<StateDescription> Describe(string path, bool mend) => throw new NotSupportedException();
}
