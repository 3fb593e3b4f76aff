namespace NetFault.Tests;
public class PlaceholderTests { [Fact] public void X() => 1.Should().Be(1); }
