using System.Numerics;

namespace ResourceCheck.Resources;

/// <summary>What a state file holds, of the right size but not yet checked to be a state.</summary>
/// <param name="Shape">Parties, levels, and whether the numbers are a vector.</param>
/// <param name="Numbers">Amplitudes, or a density matrix row after row.</param>
/// <param name="SinglePrecision">Whether the file's numbers have seven digits only.</param>
internal sealed record RawState(StateShape Shape, Complex[] Numbers, bool SinglePrecision);
