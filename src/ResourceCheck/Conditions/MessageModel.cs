using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions;

/// <summary>Classical messages. A message arrives after its delay.</summary>
/// <param name="Delay">parties×parties, seconds: distance over speed plus processing, from sender (row) to recipient (column).</param>
/// <param name="Distance">parties×parties, metres.</param>
public sealed record MessageModel(double[,] Delay, double[,] Distance)
{
    /// <summary>Messages that take no time.</summary>
    public static MessageModel Instant(int parties) => new(new double[parties, parties], new double[parties, parties]);

    /// <summary>Time a message takes.</summary>
    public Duration From(int sender, int recipient) => Duration.FromSeconds(Delay[sender, recipient]);
}
