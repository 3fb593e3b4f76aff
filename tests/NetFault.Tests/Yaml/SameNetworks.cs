namespace NetFault.Tests.Yaml;

/// <summary>Whether two networks say the same.</summary>
internal static class SameNetworks
{
    public static void Compare(Network one, Network other)
    {
        one.Title.Should().Be(other.Title);
        one.FrequencyHz.Should().Be(other.FrequencyHz);
        one.BaseMva.Should().Be(other.BaseMva);
        one.Elements.Should().Equal(other.Elements);
    }
}
