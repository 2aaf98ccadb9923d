using System.Numerics;
using ResourceCheck.Diagnostics;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Judgement;

/// <summary>Reads the matrix files that a script names.</summary>
internal static class ScriptMatrices
{
    public static (IReadOnlyDictionary<string, Complex[,]> Matrices, IReadOnlyList<Diagnostic> Findings) Read(Protocol protocol) =>
        (new Dictionary<string, Complex[,]>(), []);
}
