using System;
using System.Security.Cryptography;
using System.Security.Cryptography.X509Certificates;

namespace ProbeCal.Station.Tests.Publishing;

/// <summary>A certificate authority made for one test.</summary>
public sealed class TestAuthority : IDisposable
{
    private readonly RSA _key = RSA.Create(2048);
    private readonly X509Certificate2 _root;

    public TestAuthority()
    {
        CertificateRequest request = new("CN=test authority " + Guid.NewGuid().ToString("N"), _key, HashAlgorithmName.SHA256, RSASignaturePadding.Pkcs1);
        request.CertificateExtensions.Add(new X509BasicConstraintsExtension(true, false, 0, true));
        request.CertificateExtensions.Add(new X509KeyUsageExtension(X509KeyUsageFlags.KeyCertSign | X509KeyUsageFlags.CrlSign, true));
        _root = request.CreateSelfSigned(Now.AddDays(-30), Now.AddDays(30));
    }

    private static DateTimeOffset Now => TimeProvider.System.GetUtcNow();

    public string Pem => _root.ExportCertificatePem();

    /// <summary>A server certificate for a host name.</summary>
    public X509Certificate2 Issue(string host, bool expired = false)
    {
        using RSA key = RSA.Create(2048);
        CertificateRequest request = new("CN=" + host, key, HashAlgorithmName.SHA256, RSASignaturePadding.Pkcs1);
        SubjectAlternativeNameBuilder names = new();
        names.AddDnsName(host);
        request.CertificateExtensions.Add(names.Build());
        request.CertificateExtensions.Add(new X509EnhancedKeyUsageExtension([new Oid("1.3.6.1.5.5.7.3.1")], false));
        using X509Certificate2 issued = request.Create(_root, Now.AddDays(-20), expired ? Now.AddDays(-1) : Now.AddDays(20), [1, 2, 3, 4]);
        using X509Certificate2 withKey = issued.CopyWithPrivateKey(key);
        return X509CertificateLoader.LoadPkcs12(withKey.Export(X509ContentType.Pfx), null);
    }

    public void Dispose()
    {
        _root.Dispose();
        _key.Dispose();
    }
}
