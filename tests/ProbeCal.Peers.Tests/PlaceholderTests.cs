using Xunit;
namespace ProbeCal.Peers.Tests;
public class PlaceholderTests { [Fact] public void Builds() { Assert.Equal(0, (int)Status.Ok); } }
