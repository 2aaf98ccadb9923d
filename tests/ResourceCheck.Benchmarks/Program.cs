using System.Diagnostics;
using System.Globalization;
using ResourceCheck.Numerics.Collective;

// Prints, for each case, its name, the median time in seconds of several warm repetitions, and a figure by which compare.py checks
// that its twin computed the same.
(string Name, Func<Func<double>> Prepare)[] cases = [("storage-ring-8", StorageRing8.Prepare)];
foreach ((string name, Func<Func<double>> prepare) in cases.Where(c => args.Length == 0 || args.Contains(c.Name)))
{
    (double seconds, double figure) = Median(prepare);
    Console.WriteLine(string.Create(CultureInfo.InvariantCulture, $"{name} {seconds:R} {figure:R}"));
}

static (double Seconds, double Figure) Median(Func<Func<double>> prepare)
{
    const int repetitions = 7;
    double figure = prepare()(); // compiled and warm from here on
    double[] seconds = new double[repetitions];
    for (int i = 0; i < repetitions; i++)
    {
        Func<double> run = prepare();
        long start = Stopwatch.GetTimestamp();
        figure = run();
        seconds[i] = Stopwatch.GetElapsedTime(start).TotalSeconds;
    }

    Array.Sort(seconds);
    return (seconds[repetitions / 2], figure);
}

/// <summary>Storage without a photon of eight emitters in a ring with spacing 0.1 wavelengths and seven unequal transitions, for t = 2/Γ.</summary>
internal static class StorageRing8
{
    private const int Emitters = 8;
    private const double Spacing = 0.1;
    private const double Time = 2;

    /// <summary>The propagation alone is timed; its generator is built before, as the twin's is.</summary>
    public static Func<double> Prepare()
    {
        Transition[] transitions = [.. Enumerable.Range(1, Emitters - 1).Select(j => new Transition(1, 1, [Math.Cos(j), Math.Sin(j), 0.3 * j]))];
        PhotonFreeStorage storage = PhotonFreeStorage.Antisymmetric(Couplings.From(EmitterShape.Ring(Emitters, Spacing), transitions));
        return () => storage.AdvanceTo(Time).NoPhoton;
    }
}
