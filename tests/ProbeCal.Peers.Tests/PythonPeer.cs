using System;
using System.Diagnostics;
using System.IO;
using System.Threading.Tasks;
using Xunit;

namespace ProbeCal.Peers.Tests;

/// <summary>A Python with a package, as an independent witness: a program and its input in, its output back.</summary>
internal static class PythonPeer
{
    // The distribution's Python first: a second interpreter earlier in the path does not see distribution packages.
    private static readonly string[] Pythons = ["/usr/bin/python3", "python3"];

    /// <summary>A Python that can import a module, or null.</summary>
    internal static string? With(string module)
    {
        return Array.Find(Pythons, python => Has(python, module));
    }

    /// <summary>Runs a program to its end, which must be a good one, and gives what it wrote.</summary>
    internal static string Run(string python, string program, string input)
    {
        using Process process = Start(python, program);
        // Read while writing: a long answer would otherwise fill its pipe and stop both sides.
        Task<string> output = process.StandardOutput.ReadToEndAsync();
        Task<string> errors = process.StandardError.ReadToEndAsync();
        using (StreamWriter writer = process.StandardInput) { writer.Write(input); }
        string answer = output.GetAwaiter().GetResult();
        process.WaitForExit();
        Assert.True(process.ExitCode == 0, errors.GetAwaiter().GetResult());
        return answer;
    }

    private static bool Has(string python, string module)
    {
        try
        {
            using Process process = Start(python, "import " + module);
            process.StandardInput.Close();
            process.StandardOutput.ReadToEnd();
            process.WaitForExit();
            return process.ExitCode == 0;
        }
        catch (System.ComponentModel.Win32Exception)
        {
            // No such interpreter: the same as one without the module.
            return false;
        }
    }

    private static Process Start(string python, string program)
    {
        ProcessStartInfo start = new(python)
        {
            RedirectStandardInput = true,
            RedirectStandardOutput = true,
            RedirectStandardError = true,
            UseShellExecute = false,
        };
        start.ArgumentList.Add("-c");
        start.ArgumentList.Add(program);
        return Process.Start(start) ?? throw new InvalidOperationException("cannot start " + python);
    }
}
