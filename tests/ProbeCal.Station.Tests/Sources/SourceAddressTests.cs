using System;
using System.Globalization;
using System.Linq;
using ProbeCal.Station.Entry;
using ProbeCal.Station.Sources;
using Xunit;

namespace ProbeCal.Station.Tests.Sources;

public class SourceAddressTests
{
    [Theory]
    [InlineData("serial:/dev/ttyUSB0", "serial:/dev/ttyUSB0?baud=9600&data=8&parity=none&stop=1&flow=none")]
    [InlineData("serial:/dev/serial/by-id/usb-1?baud=1200&data=7&parity=even&stop=2&flow=hardware&dtr=on&rts=on&silence=20min",
        "serial:/dev/serial/by-id/usb-1?baud=1200&data=7&parity=even&stop=2&flow=hardware&dtr=on&rts=on&silence=1200s")]
    [InlineData("serial:COM3", "serial:COM3?baud=9600&data=8&parity=none&stop=1&flow=none")]
    [InlineData("tcp:192.0.2.7:4001", "tcp:192.0.2.7:4001")]
    [InlineData("tcp:[2001:db8::7]:4001?silence=5s", "tcp:[2001:db8::7]:4001?silence=5s")]
    [InlineData("file:some lines.txt", "file:some lines.txt")]
    [InlineData("file:/a/b.csv?pace=10", "file:/a/b.csv?pace=10")]
    [InlineData("stdin", "stdin")]
    [InlineData("simulated", "simulated?seed=1&rate=1Hz&faster=1&temperature=18C&salinity=0&pressure=1013.25hPa&phase=lake")]
    [InlineData("simulated?seed=7&rate=6/min&faster=60&temperature=50F&salinity=35&pressure=760mmHg&phase=air-saturated-water:15min,lake",
        "simulated?seed=7&rate=0.1Hz&faster=60&temperature=10C&salinity=35&pressure=1013.25hPa&phase=air-saturated-water:900s,lake")]
    public void Address_ReadsAndPrints(string text, string printed)
    {
        SourceAddress address = SourceAddress.Parse("--source", text);
        Assert.Equal(printed, address.ToString());
        Assert.Equal(printed, SourceAddress.Parse("--source", printed).ToString());
    }

    [Theory]
    [InlineData("", "this is no source; write for example serial:/dev/ttyUSB0?baud=9600, tcp:HOST:PORT, file:PATH, stdin or simulated")]
    [InlineData("seriel:/dev/ttyUSB0", "this is no source (did you mean serial?); write for example serial:/dev/ttyUSB0?baud=9600, tcp:HOST:PORT, file:PATH, stdin or simulated")]
    [InlineData("/dev/ttyUSB0", "say what it is; write serial:/dev/ttyUSB0")]
    [InlineData("serial:", "the port is missing; write for example serial:/dev/ttyUSB0 or serial:/dev/serial/by-id/NAME")]
    [InlineData("serial:/dev/ttyUSB0?buad=9600", "there is no setting buad (did you mean baud?); it takes baud, data, parity, stop, flow, dtr, rts, silence")]
    [InlineData("serial:/dev/ttyUSB0?9600", "'9600' is no setting; write key=value")]
    [InlineData("serial:/dev/ttyUSB0?baud=1&baud=2", "baud is given twice; leave one out")]
    [InlineData("tcp:4001", "write host and port, for example tcp:192.0.2.7:4001 or tcp:[2001:db8::7]:4001")]
    [InlineData("tcp:2001:db8::7:4001", "write host and port, for example tcp:192.0.2.7:4001 or tcp:[2001:db8::7]:4001")]
    [InlineData("stdin:x", "stdin takes nothing after it")]
    [InlineData("stdin?x=1", "there is no setting x; it takes none")]
    [InlineData("simulated:7", "write its settings after a question mark, for example simulated?seed=7")]
    public void BadAddress_IsRefusedInOneLine(string text, string problem)
    {
        Assert.Equal("--source " + (text.Length == 0 ? "''" : text) + ": " + problem, Assert.Throws<InputException>(() => SourceAddress.Parse("--source", text)).Message);
    }

    [Theory]
    [InlineData("serial:/dev/ttyUSB0?baud=fast", "--source baud fast: this takes a whole number from 50 to 4000000")]
    [InlineData("serial:/dev/ttyUSB0?parity=evn", "--source parity evn: this takes none, even, odd (did you mean even?)")]
    [InlineData("serial:/dev/ttyUSB0?silence=20", "--source silence 20: a duration carries its unit; write for example 3min or 180s (units: s, ms, min, h, d)")]
    [InlineData("tcp:host:99999", "--source tcp:host:99999: port 99999: this takes a whole number from 1 to 65535")]
    [InlineData("file:x?pace=-1", "--source pace -1: this takes a number from 0 to 1000000")]
    [InlineData("simulated?phase=lke", "--source phase lke: there is no place lke (did you mean lake?); the places are lake, lake-still, air-saturated-water, air, zero")]
    [InlineData("simulated?phase=air,lake", "--source phase air,lake: air needs a duration because more follows; write for example air-saturated-water:15min,lake")]
    [InlineData("simulated?temperature=80", "--source temperature 80 C: simulated water is from 1 to 38 C, so that day and night stay within the equations")]
    [InlineData("simulated?pressure=760", "--source pressure 760: a pressure carries its unit; write for example 760mmHg or 1013.25hPa (units: hPa, mbar, kPa, Pa, bar, atm, mmHg, Torr, inHg, psi)")]
    [InlineData("simulated?rate=1kHz&faster=2", "--source faster 2: that would be more than 1000 lines a second; go slower, or write 0 to wait for nothing")]
    public void BadSetting_IsRefusedInOneLine(string text, string message)
    {
        Assert.Equal(message, Assert.Throws<InputException>(() => SourceAddress.Parse("--source", text)).Message);
    }

    [Fact]
    public void EveryCulture_PrintsTheSame()
    {
        CultureInfo before = CultureInfo.CurrentCulture;
        try
        {
            CultureInfo.CurrentCulture = CultureInfo.GetCultureInfo("de-DE");
            Assert.Equal("file:x?pace=1.5", SourceAddress.Parse("s", "file:x?pace=1.5").ToString());
            Assert.Contains("&temperature=18.5C&", SourceAddress.Parse("s", "simulated?temperature=18.5").ToString(), StringComparison.Ordinal);
        }
        finally
        {
            CultureInfo.CurrentCulture = before;
        }
    }
}
