using ResourceCheck.Diagnostics;

namespace ResourceCheck.Resources;

/// <summary>Reads prepared states from <c>.npy</c>, Matrix Market <c>.mtx</c> and JSON files (page 7) and describes them.</summary>
public static class StateFile
{
    /// <summary>Reads and checks a state: size, Hermitian, trace 1, positive. Small violations are mended only when asked.</summary>
    /// <param name="path">File to read.</param>
    /// <param name="mend">Whether the nearest density matrix replaces one that slightly is none.</param>
    public static Outcome<PreparedState> Read(string path, bool mend)
    {
        Outcome<CheckedState> check = ReadChecked(path, mend, figures: false);
        return new(check.Value?.Mended ?? check.Value?.Original, check.Findings);
    }

    /// <summary>Describes a state for the <c>state</c> command.</summary>
    public static Outcome<StateDescription> Describe(string path, bool mend)
    {
        Outcome<CheckedState> check = ReadChecked(path, mend, figures: true);
        return check.Value is { } state
            ? new(StateDescriber.Describe(path, StateReader.Hash(path), state), check.Findings)
            : Outcome<StateDescription>.Failed(check.Findings);
    }

    private static Outcome<CheckedState> ReadChecked(string path, bool mend, bool figures)
    {
        Outcome<RawState> read = StateReader.Read(path);
        return read.Value is { } raw ? StateCheck.Check(path, raw, mend, figures) : Outcome<CheckedState>.Failed(read.Findings);
    }
}
