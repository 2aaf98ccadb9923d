using ResourceCheck.Conditions;
using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Timeline;

/// <summary>
/// Lays a protocol on the clock. The state is handed out at time 0 and flights start together; a party's clock starts when its
/// qudit arrives; a statement starts when its actor is free and everything it uses has arrived; between two operations a held
/// qudit waits. Sending takes the sender no time, rounds do not synchronise anybody.
/// </summary>
public sealed class Planner
{
    private readonly Protocol _protocol;
    private readonly World _world;
    private readonly List<TimelineEntry> _timeline = [];
    private readonly PlanWords _words;
    private readonly Dictionary<int, BoundExpression> _sent = [];

    private Planner(Protocol protocol, World world)
    {
        _protocol = protocol;
        _world = world;
        _words = new PlanWords(protocol);
    }

    /// <summary>The plan of a protocol under a world.</summary>
    public static Plan Lay(Protocol protocol, World world) => new Planner(protocol, world).Lay();

    /// <summary>Interceptions in conditional blocks that ask for more than an outsider knows while qudits fly; they have no place on the clock.</summary>
    public static IEnumerable<Step> MisplacedInterceptions(Protocol protocol)
    {
        Planner planner = new(protocol, World.Ideal(protocol.Parties.Count, protocol.Levels));
        return protocol.Steps.OfType<WhenStep>().Where(b => !planner.IsInFlight(b)).SelectMany(Interceptions);
    }

    private static IEnumerable<Step> Interceptions(WhenStep block) =>
        block.Then.Concat(block.Otherwise).SelectMany(s => s is WhenStep inner ? Interceptions(inner) : s is InterceptStep ? [s] : Enumerable.Empty<Step>());

    private IEnumerable<int> Insiders => Enumerable.Range(0, _protocol.Parties.Count).Except(_protocol.Outsiders);

    private Plan Lay()
    {
        Clock clock = new(_protocol.Parties.Count);
        List<PlanStep> steps = [Look("prepared", 0, [])];
        double parted = AddStorage(steps);
        steps.Add(Look("stored", parted, []));
        AddInFlight(steps, clock, parted);
        AddFlights(steps, clock, parted);
        double arrived = clock.Latest(_protocol.Holders);
        steps.Add(Look("arrived", arrived, Waits(_protocol.Holders, clock, arrived)));
        Add(_protocol.Steps.Where(s => !IsInFlight(s)), [], steps, clock);
        return new Plan
        {
            Protocol = _protocol,
            World = _world,
            NeedsSink = _protocol.Holders.Any(p => PartyNoise.CanLose(_world.Parties[p])),
            Steps = steps,
            Timeline = [.. _timeline.OrderBy(e => e.Start.Seconds).ThenBy(e => e.End.Seconds)],
            Duration = Duration.FromSeconds(clock.Latest(Insiders)),
        };
    }

    private CheckpointPlanStep Look(string label, double at, IReadOnlyList<NoisePlanStep> waits) =>
        new(label, _protocol.Holders, waits, Duration.FromSeconds(at));

    private bool IsInFlight(Step step) => step switch
    {
        InterceptStep => true,
        PickStep pick => _protocol.Outsiders.Contains(pick.Party),
        WhenStep block => IsInFlight(block),
        SetStep set => _protocol.Outsiders.Contains(set.Party) && !Dependencies.Of(set.Value).Any(IsInsidersSlot),
        _ => false,
    };

    /// <summary>A conditional block of an outsider is in flight as a whole when it asks for nothing but outsiders' values.</summary>
    private bool IsInFlight(WhenStep block) =>
        !Dependencies.Of(block.Condition).Any(IsInsidersSlot) && block.Then.Concat(block.Otherwise).All(IsInFlight);

    private bool IsInsidersSlot(int slot) => !_protocol.Outsiders.Contains(_protocol.Slots[slot].Party);

    /// <summary>Preparation ends at time 0; storage, if there is any, lies between that and the flights. Returns when the particles part.</summary>
    private double AddStorage(List<PlanStep> steps)
    {
        if (_world.Storage is not { } storage)
            return 0;
        steps.Add(new StoragePlanStep(storage));
        Record(0, storage.Time.Seconds, -1, TimelineKind.Storage, "emitters stand side by side");
        return storage.Time.Seconds;
    }

    /// <summary>Interceptions act before the noise of the way and take no time.</summary>
    private void AddInFlight(List<PlanStep> steps, Clock clock, double parted)
    {
        foreach (Step step in _protocol.Steps.Where(IsInFlight))
            AddOneInFlight(step, steps, clock, parted);
    }

    private void AddOneInFlight(Step step, List<PlanStep> steps, Clock clock, double parted)
    {
        switch (step)
        {
            case InterceptStep intercept:
                steps.Add(new InterceptPlanStep(intercept.Victim, intercept.Basis, intercept.Slot));
                Record(parted, parted, intercept.Outsider, TimelineKind.Interception, _words.Of(intercept));
                break;
            case WhenStep block:
                steps.Add(new WhenPlanStep(block.Condition, BlockInFlight(block.Then, clock, parted), BlockInFlight(block.Otherwise, clock, parted)));
                break;
            default:
                AddLocal(step, [], steps, clock);
                break;
        }
    }

    private List<PlanStep> BlockInFlight(IEnumerable<Step> block, Clock clock, double parted)
    {
        List<PlanStep> steps = [];
        foreach (Step step in block)
            AddOneInFlight(step, steps, clock, parted);
        return steps;
    }

    private void AddFlights(List<PlanStep> steps, Clock clock, double parted)
    {
        foreach (int party in _protocol.Holders)
        {
            PartyWorld world = _world.Parties[party];
            steps.AddRange(PartyNoise.Flight(party, world));
            double arrives = parted + world.Flight.Time.Seconds;
            clock.Receive(party, arrives);
            Record(parted, arrives, party, TimelineKind.Flight, "qudit arrives");
        }
    }

    private void Add(IEnumerable<Step> source, int[] ambient, List<PlanStep> steps, Clock clock)
    {
        foreach (Step step in source)
            AddOne(step, ambient, steps, clock);
    }

    private void AddOne(Step step, int[] ambient, List<PlanStep> steps, Clock clock)
    {
        switch (step)
        {
            case WhenStep block:
                AddWhen(block, ambient, steps, clock);
                break;
            case KeepStep keep:
                AddKeep(keep, ambient, steps, clock);
                break;
            case CheckpointStep checkpoint:
                AddCheckpoint(checkpoint, steps, clock);
                break;
            default:
                AddLocal(step, ambient, steps, clock);
                break;
        }
    }

    private void AddLocal(Step step, int[] ambient, List<PlanStep> steps, Clock clock)
    {
        switch (step)
        {
            case MeasureStep measure:
                AddMeasure(measure, ambient, steps, clock);
                break;
            case ApplyStep apply:
                AddApply(apply, ambient, steps, clock);
                break;
            case PickStep pick:
                steps.Add(new PickPlanStep(pick.Slot, pick.Options));
                clock.Know(pick.Party, pick.Slot, Start(pick.Party, ambient, clock));
                break;
            case SetStep set:
                steps.Add(new AssignPlanStep(set.Slot, set.Value));
                clock.Know(set.Party, set.Slot, Start(set.Party, [.. ambient, .. Dependencies.Of(set.Value)], clock));
                break;
            case SendStep send:
                AddSend(send, ambient, steps, clock);
                break;
            case WaitStep wait:
                clock.Advance(wait.Party, Start(wait.Party, ambient, clock) + wait.Time.Seconds);
                break;
            case AbortStep abort:
                Start(abort.Party, [.. ambient, .. Dependencies.Of(abort.Condition)], clock);
                steps.Add(new AbortPlanStep(abort.Party, abort.Condition));
                break;
            default:
                throw new InvalidOperationException($"The planner has no place for {step.GetType().Name} here.");
        }
    }

    /// <summary>When a party starts what needs the given values; its clock moves there.</summary>
    private static double Start(int party, int[] needs, Clock clock)
    {
        clock.Advance(party, clock.KnownAt(party, needs));
        return clock.FreeAt(party);
    }

    private void AddMeasure(MeasureStep step, int[] ambient, List<PlanStep> steps, Clock clock)
    {
        DetectionModel model = _world.Parties[step.Party].Detection;
        double start = Start(step.Party, [.. ambient, .. Dependencies.Of(step.Basis)], clock);
        double end = Hold(step.Party, start, model.Time, steps, clock);
        Record(start, end, step.Party, TimelineKind.Detection, _words.Of(step));
        steps.Add(new MeasurePlanStep(step.Party, step.Basis, step.Slot, model));
        clock.Release(step.Party);
        clock.Know(step.Party, step.Slot, end);
    }

    private void AddApply(ApplyStep step, int[] ambient, List<PlanStep> steps, Clock clock)
    {
        OperationModel model = _world.Parties[step.Party].Operations;
        double start = Start(step.Party, [.. ambient, .. Dependencies.Of(step.Unitary)], clock);
        double end = Hold(step.Party, start, model.Time, steps, clock);
        Record(start, end, step.Party, TimelineKind.Operation, _words.Of(step));
        steps.Add(new ApplyPlanStep(step.Party, step.Unitary, model));
    }

    /// <summary>The qudit waits until an action starts, and for as long as it takes; returns when it ends.</summary>
    private double Hold(int party, double start, Duration takes, List<PlanStep> steps, Clock clock)
    {
        double end = start + takes.Seconds;
        if (start > clock.AccountedTo(party))
            Record(clock.AccountedTo(party), start, party, TimelineKind.Waiting, "holds its qudit");
        AddWaiting(party, end, steps, clock);
        clock.Advance(party, end);
        return end;
    }

    private void AddWaiting(int party, double until, List<PlanStep> steps, Clock clock)
    {
        if (WaitUntil(party, until, clock) is { } noise)
            steps.Add(noise);
        clock.Account(party, Math.Max(until, clock.AccountedTo(party)));
    }

    private NoisePlanStep? WaitUntil(int party, double until, Clock clock) =>
        PartyNoise.Waiting(party, _world.Parties[party].Waiting, Duration.FromSeconds(until - clock.AccountedTo(party)));

    private void AddSend(SendStep step, int[] ambient, List<PlanStep> steps, Clock clock)
    {
        double start = Start(step.Party, [.. ambient, .. Dependencies.Of(step.Value)], clock);
        steps.Add(new AssignPlanStep(step.Slot, step.Value));
        _sent[step.Slot] = step.Value;
        clock.Know(step.Party, step.Slot, start);
        foreach (int recipient in step.Recipients)
        {
            double arrives = start + _world.Messages.From(step.Party, recipient).Seconds;
            clock.Know(recipient, step.Slot, arrives);
            foreach (int original in Passed(step.Value)) // what is named after its maker is known from the same message
                clock.Know(recipient, original, arrives);
            Record(start, arrives, step.Party, TimelineKind.Message, _words.Of(step), recipient);
        }
    }

    /// <summary>The slots whose content a message passes on, however often it was passed on before.</summary>
    private IEnumerable<int> Passed(BoundExpression? value)
    {
        while (value is BoundSlot { Slot: var slot })
        {
            yield return slot;
            value = _sent.GetValueOrDefault(slot);
        }
    }

    private void AddKeep(KeepStep step, int[] ambient, List<PlanStep> steps, Clock clock)
    {
        int[] needs = [.. ambient, .. Dependencies.Of(step.Condition)];
        foreach (int party in Insiders)
            Start(party, needs, clock);
        steps.Add(new KeepPlanStep(step.Condition));
    }

    private void AddCheckpoint(CheckpointStep step, List<PlanStep> steps, Clock clock)
    {
        double at = clock.Latest(step.Parties);
        steps.Add(new CheckpointPlanStep(step.Label, step.Parties, Waits(step.Parties, clock, at), Duration.FromSeconds(at)));
        Record(at, at, -1, TimelineKind.Checkpoint, step.Label);
    }

    private NoisePlanStep[] Waits(IEnumerable<int> parties, Clock clock, double until) =>
        [.. parties.Select(p => WaitUntil(p, until, clock)).OfType<NoisePlanStep>()];

    private void AddWhen(WhenStep step, int[] ambient, List<PlanStep> steps, Clock clock)
    {
        int[] needs = [.. ambient, .. Dependencies.Of(step.Condition)];
        (List<PlanStep> then, List<PlanStep> otherwise) = ([], []);
        (Clock thenClock, Clock otherwiseClock) = (clock.Copy(), clock.Copy());
        Add(step.Then, needs, then, thenClock);
        Add(step.Otherwise, needs, otherwise, otherwiseClock);
        Clock joined = Clock.Join(thenClock, otherwiseClock);
        Equalise(then, thenClock, joined);
        Equalise(otherwise, otherwiseClock, joined);
        clock.TakeFrom(joined);
        steps.Add(new WhenPlanStep(step.Condition, then, otherwise));
    }

    /// <summary>In the branch that touched a qudit less, it waits as long as in the other.</summary>
    private void Equalise(List<PlanStep> steps, Clock branch, Clock joined)
    {
        foreach (int party in _protocol.Holders.Where(p => branch.Holds(p) && branch.AccountedTo(p) < joined.AccountedTo(p)))
            AddWaiting(party, joined.AccountedTo(party), steps, branch);
    }

    private void Record(double start, double end, int party, TimelineKind kind, string text, int to = -1) =>
        _timeline.Add(new TimelineEntry(Duration.FromSeconds(start), Duration.FromSeconds(end), party, kind, text, to));
}
