using Xunit;
namespace ProbeCal.Station.Tests;
public class PlaceholderTests { [Fact] public void Builds() { Assert.Equal(0, (int)Status.Ok); } }
