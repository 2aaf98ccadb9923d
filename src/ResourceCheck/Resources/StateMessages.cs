using ResourceCheck.Diagnostics;
using ResourceCheck.Numerics.States;

namespace ResourceCheck.Resources;

/// <summary>Texts of everything that can be wrong with a prepared state (codes D001 to D049).</summary>
internal static class StateMessages
{
    public static Diagnostic TooManyParties(int parties) => new(
        "D040",
        Severity.Error,
        $"The antisymmetric state of {parties} parties has {parties}^{parties} amplitudes; they are laid out for up to {AntisymmetricState.MostParties} parties.",
        "lower the number of parties, or use a protocol that the product engine evaluates without the amplitudes",
        Place.Of("number of parties"));

    public static Diagnostic ExchangeTooManyParties(int parties) => new(
        "D041",
        Severity.Error,
        $"Preparation by exchange pulses was asked for {parties} parties; it reaches {ExchangePulse.MostParties}, since no pulse time gives a fifth party an equal share.",
        "take `file` for a state prepared in another way, or lower the number of parties",
        Place.Of("resource.exchange"));

    public static Diagnostic ExchangeSteps(int steps, int parties) => new(
        "D042",
        Severity.Error,
        $"Preparation by exchange pulses has {steps} steps; {parties} parties need {parties - 1}.",
        "give one entry per step 1→2, 2→3 and so on",
        Place.Of("resource.exchange"));

    public static Diagnostic ExchangeCouplings(int step, int size) => new(
        "D043",
        Severity.Error,
        $"Step {step} of the preparation by exchange pulses needs finite errors and {size}×{size} finite couplings.",
        "give every pair of qudits of this step one coupling, nominally 1",
        Place.Of("resource.exchange"));

    public static Diagnostic OtherSize(string file, PreparedState state, int parties) => new(
        "D044",
        Severity.Error,
        $"The state has {state.Parties} parties with {state.Levels} levels each; the protocol needs {parties} parties with {parties} levels each.",
        "take a state of that size, or set the protocol's number of parties to the state's",
        Place.Of(file));
}
