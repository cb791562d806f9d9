using System;
using ProbeCal.Station.Entry;
using Xunit;

namespace ProbeCal.Station.Tests.Entry;

public class PlainTextTests
{
    [Theory]
    [InlineData("do-1")]
    [InlineData("P_17.b")]
    public void AnIdThatATopicCanCarry_IsTaken(string id)
    {
        Assert.Equal(id, PlainText.Id("--probe", id));
    }

    [Theory]
    [InlineData("a/b")]
    [InlineData("+")]
    [InlineData("#")]
    [InlineData("Messkopf ü")]
    [InlineData("\u001b[A")]
    [InlineData("")]
    public void AnyOtherId_IsRefused(string id)
    {
        string line = Assert.Throws<InputException>(() => PlainText.Id("--probe", id)).Message;
        Assert.StartsWith("--probe ", line, StringComparison.Ordinal);
        Assert.DoesNotContain(line, static c => char.IsControl(c));
        Assert.Throws<InputException>(() => PlainText.Id("--probe", new string('a', 65)));
    }

    [Theory]
    [InlineData("a\nb", "a\\x0Ab")]
    [InlineData("\u001b[31m", "\\x1B[31m")]
    [InlineData("a\u009bb", "a\\x9Bb")]
    [InlineData("a\u202eb", "a\\x202Eb")]
    [InlineData("Prüfkopf 5 °C, 日本", "Prüfkopf 5 °C, 日本")]
    public void WhatWouldMoveTheScreen_IsShownAndNotObeyed(string text, string shown)
    {
        Assert.Equal(shown, Wrong.OneLine(text));
        Assert.Equal(shown, Wrong.Shown(text));
        if (shown == text)
        {
            Assert.Equal(text, PlainText.OneLine("--site", text));
        }
        else
        {
            Assert.Throws<InputException>(() => PlainText.OneLine("--site", text));
        }
    }
}
