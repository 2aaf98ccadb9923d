using System.Runtime.ExceptionServices;

namespace ResourceCheck.Numerics.Collective;

/// <summary>
/// Short loops shared between cores, many times a second. Whoever is free takes the next chunk, and the caller waits for chunks that were
/// begun but never for a helper to wake up: Parallel.For takes about 100 µs for that, half of a product of 8 emitters. The caller works
/// from the front and helpers from the back, so that from one loop to the next most chunks stay in the cache of one core.
/// </summary>
internal static class ChunkLoop
{
    /// <summary>Runs the body for 0 … chunks-1 in any order, at the same time on all cores.</summary>
    public static void Run(int chunks, Action<int> body)
    {
        Job job = new(chunks, body);
        for (int helper = 1; helper < Math.Min(Environment.ProcessorCount, chunks); helper++)
            ThreadPool.UnsafeQueueUserWorkItem(job, preferLocal: false);
        job.Work(fromFront: true);
        job.Wait();
    }

    private sealed class Job(int chunks, Action<int> body) : IThreadPoolWorkItem
    {
        private int _taken;
        private int _front;
        private int _back;
        private int _done;
        private ExceptionDispatchInfo? _failure;

        public void Execute() => Work(fromFront: false);

        public void Work(bool fromFront)
        {
            while (Interlocked.Increment(ref _taken) <= chunks)
            {
                int chunk = fromFront ? Interlocked.Increment(ref _front) - 1 : chunks - Interlocked.Increment(ref _back);
                try
                {
                    body(chunk);
                }
                catch (Exception failure) when (Keep(failure))
                {
                    // thrown again by the caller's thread: on a helper it would end the process without a word
                }

                Interlocked.Increment(ref _done);
            }
        }

        public void Wait()
        {
            // no sleeping: a helper is at most one chunk away, and a sleep takes longer than ten of them
            SpinWait spin = default;
            while (Volatile.Read(ref _done) < chunks)
                spin.SpinOnce(sleep1Threshold: -1);
            _failure?.Throw();
        }

        private bool Keep(Exception failure)
        {
            _failure = ExceptionDispatchInfo.Capture(failure);
            return true;
        }
    }
}
