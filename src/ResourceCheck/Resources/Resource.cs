using ResourceCheck.Conditions;
using ResourceCheck.Diagnostics;

namespace ResourceCheck.Resources;

/// <summary>Builds the state that a protocol starts from.</summary>
public static class Resource
{
    /// <summary>The state a resource model gives, without its white noise (which engines mix in).</summary>
    /// <param name="model">How the state is prepared; files are read here.</param>
    /// <param name="parties">Number of qudits, and of levels of each.</param>
    public static Outcome<PreparedState> Prepare(ResourceModel model, int parties) => throw new NotSupportedException();
}
