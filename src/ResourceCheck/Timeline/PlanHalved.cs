using ResourceCheck.Conditions;
using ResourceCheck.Quantities;

namespace ResourceCheck.Timeline;

/// <summary>
/// A plan in which one source is half as strong: half the time of decay, half of each probability of noise, half the loss in dB, half of
/// what detectors miss or confuse. Fixed rotations, Kraus operators and prepared states have no half and stay.
/// </summary>
internal static class PlanHalved
{
    /// <summary>The plan; null where the source has nothing that can be halved.</summary>
    public static Plan? Of(Plan plan, Source source) => source switch
    {
        Source.Preparation => plan.World.Resource.White > 0
            ? plan with { World = plan.World with { Resource = plan.World.Resource with { White = plan.World.Resource.White / 2 } } } : null,
        _ => plan with { Steps = [.. plan.Steps.Select(s => Step(s, source))] },
    };

    private static PlanStep Step(PlanStep step, Source source) => step switch
    {
        NoisePlanStep noise => Noise(noise, source),
        StoragePlanStep storage when source == Source.Storage => storage with { Model = storage.Model with { Time = Half(storage.Model.Time) } },
        ApplyPlanStep apply when source == Source.Operations => apply with { Model = apply.Model with { Depolarising = apply.Model.Depolarising / 2, OverRotation = apply.Model.OverRotation / 2 } },
        MeasurePlanStep measure when source == Source.Detection => measure with { Model = Half(measure.Model) },
        CheckpointPlanStep look => look with { Waits = [.. look.Waits.Select(w => Noise(w, source))] },
        WhenPlanStep block => block with { Then = [.. block.Then.Select(s => Step(s, source))], Otherwise = [.. block.Otherwise.Select(s => Step(s, source))] },
        _ => step,
    };

    private static NoisePlanStep Noise(NoisePlanStep step, Source source) => step.Source != source ? step : step with
    {
        Noise = step.Noise with
        {
            Time = Half(step.Noise.Time),
            LeakageProbability = step.Noise.LeakageProbability?.Select(p => p / 2).ToArray(),
            PhaseFactors = step.Noise.PhaseFactors is { } factors ? Root(factors) : null,
            Dephasing = step.Noise.Dephasing / 2,
            Depolarising = step.Noise.Depolarising / 2,
            Transmission = step.Noise.Transmission?.Select(Math.Sqrt).ToArray(),
        },
    };

    private static double[,] Root(double[,] factors)
    {
        double[,] roots = new double[factors.GetLength(0), factors.GetLength(1)];
        for (int i = 0; i < roots.GetLength(0); i++)
        {
            for (int k = 0; k < roots.GetLength(1); k++)
                roots[i, k] = Math.Sqrt(factors[i, k]);
        }

        return roots;
    }

    private static DetectionModel Half(DetectionModel model)
    {
        int levels = model.Confusion.GetLength(0);
        double[,] confusion = new double[levels, levels];
        for (int i = 0; i < levels; i++)
        {
            for (int k = 0; k < levels; k++)
                confusion[i, k] = ((i == k ? 1 : 0) + model.Confusion[i, k]) / 2;
        }

        return model with { Confusion = confusion, Efficiency = (1 + model.Efficiency) / 2, Dark = model.Dark / 2 };
    }

    private static Duration Half(Duration time) => Duration.FromSeconds(time.Seconds / 2);
}
