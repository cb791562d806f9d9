using Xunit;
namespace ProbeCal.Host.Tests;
public class PlaceholderTests { [Fact] public void Builds() { Assert.Equal(0, (int)Status.Ok); } }
