using Xunit;
namespace ProbeCal.Nano.Tests;
public class PlaceholderTests { [Fact] public void Builds() { Assert.Equal(0, (int)Status.Ok); } }
