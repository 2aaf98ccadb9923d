namespace ResourceCheck.Judgement.Uncertain;

/// <summary>Asks for the uncertainties of the conditions to be carried through to the figures.</summary>
/// <param name="Samples">Draws by which the linear figures are checked where a command checks them; 0 for no check.</param>
public sealed record UncertaintyRequest(int Samples)
{
    /// <summary>Draws when nothing is said: a standard uncertainty from so many is good to 5 %, and more would keep the user waiting.</summary>
    public const int DefaultSamples = 200;
}
