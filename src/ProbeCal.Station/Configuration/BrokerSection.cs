using System;
using System.IO;
using ProbeCal.Station.Entry;

namespace ProbeCal.Station.Configuration;

/// <summary>The section "broker".</summary>
internal static class BrokerSection
{
    private const int PlainPort = 1883;
    private const int TlsPort = 8883;

    internal static BrokerConfiguration? Read(ConfigurationNode? section, string folder)
    {
        if (section == null)
        {
            return null;
        }

        ConfigurationNode address = section.Require("address", "\"mqtts://broker.example:8883\"");
        Uri uri = Address(address);
        bool tls = uri.Scheme == "mqtts";
        RequireTls(section, "caFile", tls);
        RequireTls(section, "checkRevocation", tls);
        string? user = section.Find("user")?.AsText();
        ConfigurationNode? variable = section.Find("passwordEnvironment");
        ConfigurationNode? file = section.Find("passwordFile");
        if (variable != null && file != null)
        {
            throw new InputException(file.What + ": passwordEnvironment names another place already; leave one of the two out");
        }

        if (user == null && (variable ?? file) is { } password)
        {
            throw new InputException(password.What + ": a password needs a user; add broker.user");
        }

        return new BrokerConfiguration
        {
            Host = uri.DnsSafeHost,
            Port = uri.Port < 0 ? (tls ? TlsPort : PlainPort) : uri.Port,
            UseTls = tls,
            User = user,
            PasswordVariable = variable?.AsText(),
            PasswordFile = file == null ? null : Path.Combine(folder, file.AsText()),
            AuthorityFile = section.Find("caFile") is { } authority ? ExistingFile(authority, folder) : null,
            CheckRevocation = section.Find("checkRevocation")?.AsFlag() ?? true,
        };
    }

    private static Uri Address(ConfigurationNode node)
    {
        string text = node.AsText();
        bool isUri = Uri.TryCreate(text, UriKind.Absolute, out Uri? uri) && uri.Scheme is "mqtt" or "mqtts" && uri.Host.Length != 0;
        if (!isUri)
        {
            throw Wrong.Input(node.What, text, "this is no broker; write mqtt://HOST:1883, or mqtts://HOST:8883 for TLS");
        }

        if (uri!.UserInfo.Length != 0)
        {
            // Not shown: what stands there may be a password.
            throw new InputException(node.What + ": user and password do not belong in the address; use broker.user and broker.passwordEnvironment or passwordFile");
        }

        return uri.PathAndQuery is "" or "/" ? uri : throw Wrong.Input(node.What, text, "nothing follows the port");
    }

    private static void RequireTls(ConfigurationNode section, string key, bool tls)
    {
        if (!tls && section.Find(key) is { } node)
        {
            throw new InputException(node.What + ": this belongs to TLS; write the address with mqtts://");
        }
    }

    private static string ExistingFile(ConfigurationNode node, string folder)
    {
        string path = Path.Combine(folder, node.AsText());
        return File.Exists(path) ? path : throw Wrong.Input(node.What, node.Text, "there is no such file");
    }
}
