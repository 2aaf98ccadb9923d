namespace ResourceCheck.Numerics.Collective;

/// <summary>A photon of one trajectory.</summary>
/// <param name="Time">When it was emitted.</param>
/// <param name="Channel">The collective channel it left by.</param>
internal readonly record struct Photon(double Time, JumpChannel Channel);
