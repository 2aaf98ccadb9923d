using ResourceCheck.Quantities;

namespace ResourceCheck.Conditions.Keys;

/// <summary>Every key of a conditions file.</summary>
internal static class KeyTable
{
    private static readonly GroupShape DecayEntry = new(
        "decayEntry",
        [
            new("from", Shapes.Level, "", "level that decays", true),
            new("to", Shapes.Level, "", "level that it decays to"),
            new("branching", new MapShape(MapKey.Level, Shapes.Probability("0.6")), "", "levels that it decays to with their fractions, which add up to 1"),
            new("lifetime", Shapes.TimeConstant("100 us"), "", "1/Γ of the branch, or of the level when `branching` is given"),
            new("rate", Shapes.Rate("1e4 /s"), "", "Γ"),
            new("linewidth", new QuantityShape([Dimension.Frequency], Bounds.NotNegative, "6.07 MHz"), "", "Γ/2π"),
        ],
        [new(["to", "branching"], true), new(["lifetime", "rate", "linewidth"], true)]);

    private static readonly Key Decay = new("decay", new ListShape(DecayEntry, 0, 4096, "a list of branches such as [{\"from\": 0, \"to\": 1, \"lifetime\": \"100 us\"}]"), "none", "branches by which levels decay");

    private static readonly Key Coherence = new("coherence", Shapes.PairTimes("5 ms"), "as decay allows", "T2 of level 0 with every other level, or of each pair of levels named");

    private static readonly Key DephasingTime = new("dephasingTime", Shapes.PairTimes("400 us"), "none", "time constant of pure dephasing of every pair of levels, or of each pair named");

    private static readonly Alternative CoherenceOrDephasing = new(["coherence", "dephasingTime"], false, true);

    private static readonly GroupShape Rotation = new(
        "rotation",
        [
            new("levels", Shapes.TwoLevels, "", "pair [i, k] whose plane is turned: i goes to cos θ i + sin θ k"),
            new("generator", new WordShape(["clock"]), "", "`\"clock\"`: level a gets the phase -aθ"),
            new("file", Shapes.File, "", "JSON file of a Hermitian d×d matrix G; exp(-iθG) acts"),
            new("angle", Shapes.Angle(Bounds.Any, "0.05 rad"), "", "θ", true),
        ],
        [new(["levels", "generator", "file"], true)]);

    private static readonly GroupShape Interface = new(
        "interface",
        [
            new("efficiency", Shapes.Probability("0.9"), "1", "probability that the qudit is transferred; else it is lost"),
            new("depolarising", Shapes.Probability("0.01"), "0", "depolarising probability of the transfer"),
        ],
        []);

    private static readonly GroupShape Thermal = new(
        "thermal",
        [
            new("levels", Shapes.TwoLevels, "", "upper and lower level [a, b]", true),
            new("rate", Shapes.Rate("100 /s"), "", "rate of a → b", true),
            new("ratio", new NumberShape(Bounds.NotNegative, "0.1"), "", "rate of b → a over that of a → b", true),
        ],
        []);

    private static readonly GroupShape Leakage = new(
        "leakage",
        [
            new("from", Shapes.Level, "", "level that leaks into the sink, which no detector sees", true),
            new("probability", Shapes.Probability("0.001"), "", "once per flight, or per spell of waiting longer than 0"),
            new("rate", Shapes.Rate("5 /s"), "", "for as long as the flight or the waiting lasts"),
        ],
        [new(["probability", "rate"], true)]);

    private static readonly Key ThermalKey = new("thermal", Shapes.OneOrSeveral(Thermal), "none", "thermal exchange between two levels");

    private static readonly Key LeakageKey = new("leakage", Shapes.OneOrSeveral(Leakage), "none", "loss out of a level");

    private static readonly Key Kraus = new("kraus", Shapes.File, "none", "JSON file of a list of d×d matrices K with Σ K†K = 1 to 1e-9");

    private static readonly GroupShape ExchangeStep = new(
        "exchangeStep",
        [
            new("timeError", new NumberShape(Bounds.Any, "0.05"), "0", "added to the pulse time, in units of the inverse coupling"),
            new("phaseError", Shapes.Angle(Bounds.Any, "0.1 rad"), "0", "added to the local phase"),
            new("couplings", new MapShape(MapKey.QuditPair, new NumberShape(Bounds.Any, "0.97")), "1 each", "strengths of exchange between qudits, counted from 1, relative to the nominal one"),
        ],
        []);

    private static readonly GroupShape Exchange = new(
        "exchange",
        [.. ExchangeStep.Keys, new("steps", new ListShape(ExchangeStep, 1, 3, "a list with one object per step"), "last step only", "errors of each step 1→2, 2→3, 3→4 in place of the last alone")],
        [new(["steps", "timeError"], false), new(["steps", "phaseError"], false), new(["steps", "couplings"], false)]);

    private static readonly Shape Spacing = new QuantityShape([Dimension.Wavelengths, Dimension.Length], Bounds.Any, "0.1 wavelengths");

    private static readonly Shape Linewidth = new QuantityShape([Dimension.Frequency], Bounds.Positive, "6.07 MHz");

    private static readonly Shape Wavelength = new QuantityShape([Dimension.Length], Bounds.Positive, "780 nm");

    private static readonly IReadOnlyList<Key> Geometry =
    [
        new("shape", new WordShape(["point", "pair", "ring", "chain"]), "", "how the emitters stand; `point` is the limit of no distance, without exchange shifts"),
        new("positions", new ListShape(new ListShape(Spacing, 3, 3, "three coordinates such as [\"0 wavelengths\", \"0.1 wavelengths\", \"0 wavelengths\"]"), 2, 16, "a list with one place per emitter"), "", "where each emitter stands, in the order of the parties"),
        new("spacing", new QuantityShape([Dimension.Wavelengths, Dimension.Length], Bounds.Positive, "0.1 wavelengths"), "", "distance of neighbours in a pair, ring or chain, in wavelengths of the first transition or in metres"),
        new("dipoles", new ChoiceShape([new WordShape(["normal"]), new ListShape(new ListShape(new NumberShape(Bounds.Any, "1"), 3, 3, "three components such as [0, 0, 1]"), 1, 16, "a list with one vector per transition")]), "normal", "directions of the transition dipoles; `normal` stands on the plane of a ring and on the line of a chain"),
        new("linewidth", new ChoiceShape([Linewidth, new ListShape(Linewidth, 1, 16, "a list with one linewidth per transition")]), "", "Γ/2π of the decay of level 0 into level j, the same for all or one per transition", true),
        new("wavelength", new ChoiceShape([Wavelength, new ListShape(Wavelength, 1, 16, "a list with one wavelength per transition")]), "nearly the same for all", "wavelength of each transition; needed where lengths are in metres"),
        new("heralded", new FlagShape(), "false", "whether copies that emitted a photon meanwhile are dropped"),
        new("tolerance", new NumberShape(Bounds.Positive, "1e-12"), "1e-12", "truncation error allowed per step of the integration"),
    ];

    private static readonly IReadOnlyList<Alternative> GeometryAlternatives = [new(["shape", "positions"], true)];

    private static readonly GroupShape Storage = new(
        "storage",
        [.. Geometry, new("duration", Shapes.Duration("5 ns"), "", "how long the emitters stay side by side", true)],
        GeometryAlternatives);

    private static readonly GroupShape RelaxedStart = new(
        "relaxedStart",
        [
            new("levels", Shapes.PerLevel(Shapes.Level, "[0, 0, 0]"), "", "level of each emitter"),
            new("bystanders", new ListShape(Shapes.Level, 0, 16, "a list of levels such as [2]"), "", "the first two emitters share (|01⟩-|10⟩)/√2, the others are in these levels"),
            new("file", Shapes.File, "", "a prepared state"),
        ],
        [new(["levels", "bystanders", "file"], true)]);

    private static readonly GroupShape Relaxed = new(
        "relaxed",
        [
            .. Geometry,
            new("start", new ChoiceShape([new WordShape(["excited"]), RelaxedStart]), "", "where relaxation starts: `\"excited\"` (all in level 0), levels, a pair with bystanders, or a file", true),
            new("time", Shapes.Duration("50 ns"), "", "how long the emitters relax", true),
        ],
        GeometryAlternatives);

    private static readonly GroupShape Resource = new(
        "resource",
        [
            new("white", Shapes.Probability("0.02"), "0", "fraction of white noise mixed in"),
            new("file", Shapes.File, "the ideal state", "prepared state to start from"),
            new("mend", new FlagShape(), "false", "whether the nearest density matrix replaces a file's matrix that slightly is none"),
            new("exchange", Exchange, "the ideal state", "building by exchange pulses, up to four parties"),
            new("relaxed", Relaxed, "the ideal state", "what collective decay leaves of a start"),
            new("levels", Shapes.PerLevel(Shapes.Level, "[2, 0, 1]"), "[0, 1, 2, …]", "physical level that plays each value of the script"),
        ],
        [new(["file", "exchange", "relaxed"], false)]);

    private static readonly GroupShape Preparation = new(
        "preparation",
        [
            new("attempts", new QuantityShape([Dimension.Frequency, Dimension.Rate], Bounds.Positive, "10 kHz"), "", "attempts per second", true),
            new("success", Shapes.Probability("0.2"), "1", "probability that an attempt gives a copy"),
        ],
        []);

    private static readonly GroupShape Levels = new("levels", [Decay, Coherence, DephasingTime], [CoherenceOrDephasing]);

    private static readonly GroupShape Flight = new(
        "flight",
        [
            new("length", Shapes.Length("2.5 km"), "0", "distance from the source; needs `speed` or `time`"),
            new("speed", Shapes.Speed, "", "speed on the way"),
            new("time", Shapes.Duration("12 us"), "length / speed", "time of flight, in place of `speed`"),
            new("attenuation", new QuantityShape([Dimension.LossPerLength], Bounds.NotNegative, "0.2 dB/km"), "0", "loss per length"),
            new("insertionLoss", new QuantityShape([Dimension.Loss], Bounds.NotNegative, "1 dB"), "0", "loss once per flight"),
            new("transmission", new ChoiceShape([Shapes.Probability("0.9"), Shapes.PerLevel(Shapes.Probability("0.8"), "[1, 0.8, 0.5]")]), "1", "probability to arrive, one for all levels or one per level, besides `attenuation` and `insertionLoss`"),
            new("depolarising", Shapes.Probability("0.01"), "0", "p in ρ → (1-p)ρ + p 1/d"),
            new("dephasing", Shapes.Probability("0.02"), "0", "x: off-diagonal elements are multiplied by 1-x"),
            new("phaseNoise", Shapes.Angle(Bounds.NotNegative, "0.1 rad"), "0", "root-mean-square phase σ per level step: element (a,b) is multiplied by exp(-σ²(a-b)²/2)"),
            new("rotation", Rotation, "none", "fixed local unitary exp(-iθG)"),
            new("heralded", new FlagShape(), "false", "whether copies whose qudit did not arrive are dropped"),
            new("interface", Interface, "none", "the qudit leaves its emitter before the flight, so that `levels` do not act on the way"),
            ThermalKey,
            LeakageKey,
            Kraus,
        ],
        [new(["speed", "time"], false)]);

    private static readonly GroupShape Waiting = new(
        "waiting",
        [Decay, Coherence, DephasingTime, new("depolarisingRate", Shapes.Rate("20 /s"), "0", "r: after t, depolarising with p = 1 - exp(-rt)"), ThermalKey, LeakageKey, Kraus],
        [CoherenceOrDephasing]);

    private static readonly GroupShape Operations = new(
        "operations",
        [
            new("duration", Shapes.Duration("2 us"), "0", "the qudit waits that long, then the unitary acts"),
            new("depolarising", Shapes.Probability("0.003"), "0", "depolarising probability behind each unitary"),
            new("overRotation", new NumberShape(Bounds.Any, "0.01"), "0", "ε: U^(1+ε) acts in place of U, by the principal logarithm, eigenvalue -1 at +π"),
        ],
        []);

    private static readonly GroupShape Detection = new(
        "detection",
        [
            new("duration", Shapes.Duration("5 us"), "0", "the qudit waits that long, then it is detected"),
            new("efficiency", Shapes.Probability("0.92"), "1", "probability that a qudit that is there gives a click"),
            new("confusion", new ChoiceShape([Shapes.Probability("0.01"), Shapes.PerLevel(Shapes.PerLevel(Shapes.Probability("0.01"), "[0.98, 0.01, 0.01]"), "[[0.98, 0.01, 0.01], …]")]), "0", "c: right with 1-c, each other outcome with c/(d-1); or a d×d matrix, row = true outcome, column = outcome read, rows adding up to 1"),
            new("dark", Shapes.Probability("1e-5"), "0", "probability, per measurement, that a missing click becomes a uniformly random outcome"),
        ],
        []);

    private static readonly GroupShape Messages = new(
        "messages",
        [
            new("speed", Shapes.Speed, "instant", "speed of messages"),
            new("processing", Shapes.Duration("1 us"), "0", "added to every message's way"),
            new("distances", new MapShape(MapKey.PartyPair, Shapes.Length("3 km")), "flight lengths of both, added", "distances between parties, for the pairs that do not talk by way of the source; needs `speed`"),
        ],
        []);

    /// <summary>The whole file.</summary>
    public static GroupShape Root { get; } = new(
        "conditions",
        [
            new("$schema", new TextShape(false), "", "address of the JSON schema, for editors; not used"),
            new("about", new TextShape(false), "", "what these conditions are, in one line"),
            new("resource", Resource, "the ideal state", "how the shared state starts"),
            new("preparation", Preparation, "not known", "how often a copy is made; needed for wall-clock time"),
            new("storage", Storage, "none", "collective decay while the emitters stand side by side"),
            new("levels", new PartyShape(Levels), "no decay", "decay of the levels that hold the qudit"),
            new("flight", new PartyShape(Flight), "instant, no loss", "way from the source to a party"),
            new("waiting", new PartyShape(Waiting), "`levels` go on acting", "what acts on a qudit that is held after arrival; `{}` for nothing"),
            new("operations", new PartyShape(Operations), "instant, exact", "local unitaries"),
            new("detection", new PartyShape(Detection), "instant, exact", "measurements"),
            new("messages", Messages, "instant", "classical messages"),
        ],
        []);

    /// <summary>The key that spells out what holds for every party.</summary>
    public const string Default = "default";
}
