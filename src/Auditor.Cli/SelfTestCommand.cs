using System.Runtime.InteropServices;
using System.Runtime.Intrinsics;
using System.Text;
using Auditor.Reporting;
using Auditor.Results;
using Auditor.SelfTest;

namespace Auditor.Cli;

/// <summary>Compares shipped cases with certified and reference values on this machine; a case below its floor is a fault of the installation.</summary>
internal static class SelfTestCommand
{
    /// <param name="cases">Folder of the shipped cases.</param>
    /// <param name="output">Folder for self-test.json and self-test.html.</param>
    /// <param name="moment">When the run started.</param>
    public static int Run(string cases, string output, DateTimeOffset moment)
    {
        var rules = RuleFiles.Read(null, Path.Combine(cases, "policy-reference.yaml"));
        if (rules.Value is null)
        {
            Complaint.Unusable(rules.Problems);
            return ExitStatus.Fault;
        }

        var record = new SelfTestRun(name => File.OpenRead(Path.Combine(cases, name)), rules.Value.Policy).Run(ThisInstallation(moment));
        var files = Files(output, record);
        if (FilesTogether.Put(output, files) is { } fault)
        {
            return Complaint.Unusable([new Problem(output, null, "the outputs cannot be written here: " + fault)]);
        }

        Console.Out.Write(ConsoleSummary.Of(record));
        foreach (var (path, _) in files)
        {
            Console.Out.WriteLine("Written: " + path);
        }

        return record.Passed ? ExitStatus.Audited : ExitStatus.Fault;
    }

    private static List<(string Path, byte[] Bytes)> Files(string output, SelfTestRecord record) =>
    [
        (Path.Combine(output, "self-test.html"), Encoding.UTF8.GetBytes(SelfTestReport.Html(record, BundledFiles.ReadSelfTestTemplate))),
        (Path.Combine(output, "self-test.json"), SelfTestReport.Json(record)),
    ];

    private static Installation ThisInstallation(DateTimeOffset moment) => new(
        CommandLine.Version,
        RuntimeInformation.FrameworkDescription,
        RuntimeInformation.OSDescription,
        RuntimeInformation.ProcessArchitecture.ToString(),
        Vector512.IsHardwareAccelerated ? 512 : Vector256.IsHardwareAccelerated ? 256 : Vector128.IsHardwareAccelerated ? 128 : 64,
        Clock.Text(moment));
}
