using ResourceCheck.Quantities;
using ResourceCheck.Scripts.Binding;

namespace ResourceCheck.Conditions.Resolving;

/// <summary>Ties a checked conditions file to the parties and levels of a protocol.</summary>
internal sealed class WorldBuilder
{
    private readonly ConditionsDocument _document;
    private readonly Protocol _protocol;
    private readonly Findings _findings;
    private readonly PartyNames _names;

    public WorldBuilder(ConditionsDocument document, Protocol protocol, Findings findings)
    {
        _document = document;
        _protocol = protocol;
        _findings = findings;
        _names = new PartyNames(protocol, findings);
    }

    /// <summary>The world; meaningless when an error was found.</summary>
    public World Build()
    {
        GroupSetting root = _document.Root;
        _names.Check(root);
        GroupSetting? resource = root.Find("resource") as GroupSetting;
        LevelOrder order = LevelOrder.Of(resource, _protocol.Levels, _findings);
        PartyWorld[] parties = [.. Enumerable.Range(0, _protocol.Parties.Count).Select(p => PartyOf(p, order))];
        return new World
        {
            About = (root.Find("about") as TextSetting)?.Text ?? "",
            Levels = _protocol.Levels,
            Resource = new ResourceBuilder(_protocol.Levels, ConditionsFile.FolderOf(_document.Name), _findings).Build(resource, order),
            Storage = root.Find("storage") is GroupSetting storage ? new CollectiveBuilder(_protocol.Levels, _findings).Build(storage, "duration") : null,
            Preparation = PreparationOf(root.Find("preparation") as GroupSetting),
            Parties = parties,
            Messages = new MessageBuilder(_protocol, _names).Build(root.Find("messages") as GroupSetting, parties),
        };
    }

    private static PreparationModel? PreparationOf(GroupSetting? preparation) =>
        preparation?.NumberOf("attempts") is { } attempts
            ? new PreparationModel(Rate.FromPerSecond(attempts.Value), Probability.From(preparation.Number("success", 1)))
            : null;

    private PartyWorld PartyOf(int party, LevelOrder order)
    {
        if (_protocol.Outsiders.Contains(party))
            return PartyWorld.Ideal(_protocol.Levels);
        PartyName? name = PartyName.Parse(_protocol.Parties[party]);
        GroupSetting? View(string section) => _document.Root.Find(section) is GroupSetting group ? Merging.ViewOf(group, name) : null;

        DynamicsBuilder dynamics = new(order, _findings);
        FlightBuilder flights = new(order, dynamics, _document.Matrices, _findings);
        GroupSetting? flight = View("flight");
        LocalDynamics levels = dynamics.Build(View("levels"));
        return new PartyWorld
        {
            Flight = flights.Build(flight, levels),
            Interface = InterfaceOf(flight?.Find("interface") as GroupSetting),
            Waiting = flights.Holding(View("waiting"), levels),
            Operations = OperationsOf(View("operations")),
            Detection = DetectionBuilder.Build(View("detection"), order.Levels, _findings),
        };
    }

    private static InterfaceModel? InterfaceOf(GroupSetting? group) =>
        group is null ? null : new InterfaceModel(group.Number("efficiency", 1), group.Number("depolarising", 0));

    private static OperationModel OperationsOf(GroupSetting? group) =>
        group is null
            ? OperationModel.Ideal
            : new OperationModel(Duration.FromSeconds(group.Number("duration", 0)), group.Number("depolarising", 0), group.Number("overRotation", 0));
}
