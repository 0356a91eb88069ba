namespace Auditor.Benchmarks;

/// <summary>Whole audits by the published program, in processes of their own, record only.</summary>
internal static class WholeTimes
{
    public static void Print(string declaration, string program, int runs)
    {
        var folder = Directory.CreateTempSubdirectory("audit-benchmark-").FullName;
        try
        {
            foreach (var threads in new[] { "1", "2" })
            {
                string[] arguments = [declaration, "--formats", "json", "--out", folder, "--threads", threads, "--quiet"];
                var times = Enumerable.Range(0, runs).Select(_ => Run(program, arguments)).ToList();
                Console.Out.WriteLine($"whole audit, {threads} threads: {Measured.Median(times)}");
            }
        }
        finally
        {
            Directory.Delete(folder, recursive: true);
        }
    }

    private static Measured Run(string program, string[] arguments) =>
        program.EndsWith(".dll", StringComparison.Ordinal) ? Measured.Of("dotnet", [program, .. arguments]) : Measured.Of(program, arguments);
}
