using Xunit;

namespace ResourceCheck.Tests;

public sealed class HouseTests
{
    [Fact]
    public void CultureIsInvariant() => Assert.Equal("0.5", $"{0.5}");
}
