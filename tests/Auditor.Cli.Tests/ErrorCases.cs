using System.Text;

namespace Auditor.Cli.Tests;

/// <summary>Wrong uses whose messages stand in golden/errors.txt.</summary>
internal static class ErrorCases
{
    private const string Leases3 = "lease_no,loss,price,region,engine_hours,age\n";

    public static IReadOnlyList<ErrorCase> All { get; } = [.. CommandLines(), .. Declarations(), .. Data(), .. Places(), .. PolicyAndRules(), .. Acceptances()];

    private static IEnumerable<ErrorCase> CommandLines() =>
    [
        ErrorCase.Of("no argument"),
        ErrorCase.Of("an empty argument", ""),
        ErrorCase.Of("two declarations", "lease.yaml", "other.yaml"),
        ErrorCase.Of("an unknown option, alone", "--bogus"),
        ErrorCase.Of("an unknown option before the declaration", "--polcy", "lease.yaml"),
        ErrorCase.Of("an unknown option after the declaration", "lease.yaml", "--fail-om", "low"),
        ErrorCase.Of("an unknown option after a command", "demo", "--quite"),
        ErrorCase.Of("an option before a command", "--out", "out", "demo"),
        ErrorCase.Of("a declaration before a command", "lease.yaml", "demo"),
        ErrorCase.Of("an option without its value", "lease.yaml", "--threads"),
        ErrorCase.Of("an option given twice", "lease.yaml", "--seed", "1", "--seed", "2"),
        ErrorCase.Of(
            "several values that cannot be", "lease.yaml", "--formats", "pdf,sarif", "--fail-on", "hihg", "--threads", "0", "--memory", "4X", "--seed", "-1", "--as-of", "31.12.2026"),
        ErrorCase.Of("an @ does not name a file of options", "@options"),
        ErrorCase.Of("an unknown rule", "rules", "exclusion-not-suported"),
        ErrorCase.Of("the beginning of a rule's id", "rules", "segment-efect"),
        ErrorCase.Of("an unknown fact", "rules", "p_ajusted"),
        ErrorCase.Of("neither rule nor fact", "rules", "zzz"),
        ErrorCase.Of("a misspelt command", "dmo"),
        ErrorCase.Of("a misspelt command with what belongs to it", "nwe", "leases.csv", "--response", "loss"),
        ErrorCase.Of("two rules", "rules", "a", "b"),
        ErrorCase.Of("a word after the self-test", "self-test", "longley"),
        ErrorCase.Of("a first declaration without data", "new"),
        ErrorCase.Of("a first declaration without a response", "new", "leases.csv"),
        ErrorCase.Of("a first declaration of data that are not there", "new", "leasse.csv", "--response", "loss"),
        ErrorCase.Of("a first declaration of no data file", "new", "lease.yaml", "--response", "loss"),
        ErrorCase.Of("a response that is not there", "new", "leases.csv", "--response", "los"),
        ErrorCase.Of("a response of levels", "new", "leases.csv", "--response", "region"),
        ErrorCase.Of("a first declaration over a file", "new", "leases.csv", "--response", "loss", "--out", "lease.yaml"),
        ErrorCase.Of("a first declaration in no folder", "new", "leases.csv", "--response", "loss", "--out", "nowhere/lease.yaml"),
    ];

    private static IEnumerable<ErrorCase> Declarations() =>
    [
        ErrorCase.Of("no such declaration", "leese.yaml"),
        new("a folder as declaration", ["models"], folder => folder.WithFolder("models")),
        new("a declaration that is not UTF-8", ["lease.yaml"], folder => folder.With("lease.yaml", Encoding.Latin1.GetBytes("audit: 1\nmodel: {id: lease, title: Verlust für Schlepper}\n"))),
        ErrorCase.File("an empty declaration", "lease.yaml", "", "lease.yaml"),
        ErrorCase.File("a declaration that is no YAML", "lease.yaml", "audit: 1\nmodel: {id: lease\ndata: {source: leases.csv}\n", "lease.yaml"),
        ErrorCase.Declared("a misspelt key", "left_out:", "leftout:"),
        ErrorCase.Declared("a key twice", "response: loss", "response: loss\nresponse: price"),
        ErrorCase.Declared("a kind of weights by its beginning", "source: leases.csv", "source: leases.csv\n  weights: {column: age, kind: prec}"),
        ErrorCase.Declared("an id that leads out of the folder", "id: lease-loss", "id: ../lease"),
        ErrorCase.Declared("a term in the model and in a group", "[engine_hours, age]", "[engine_hours, price]"),
        ErrorCase.File(
            "every problem of a declaration at once",
            "lease.yaml",
            """
            audit: 1
            model:
              id: lease loss
            data:
              source: leases.csv
              keep:
                - {column: statsu, equals: closed}
                - {column: regoin, equals: north}
            response: los
            final_model:
              terms: [pirce, {lgo: price}, region]
            left_out:
              - group: engine condition
                terms: [engine_houres, region]
                becuase: Not significant.
              - group: engine condition
                terms: [aeg]
            """,
            "lease.yaml"),
    ];

    private static IEnumerable<ErrorCase> Data() =>
    [
        ErrorCase.Declared("no such data file", "source: leases.csv", "source: laeses.csv"),
        ErrorCase.Declared("data of an unknown kind", "source: leases.csv", "source: lease.yaml"),
        new("a folder of data", ["lease.yaml"], folder => folder.With("lease.yaml", Leases.Declaration.Replace("leases.csv", "many", StringComparison.Ordinal)).WithFolder("many")),
        ErrorCase.Declared("another file than the declared one", "source: leases.csv", "source: leases.csv\n  sha256: " + new string('0', 64)),
        new("data that are not UTF-8", ["lease.yaml"], folder => folder.With("leases.csv", Encoding.Latin1.GetBytes(Leases3 + "L1,1,2,Süd,3,4\n"))),
        ErrorCase.Data("data without rows", Leases3),
        ErrorCase.Data("a row with too few fields", Leases3 + "L1,1,2,north,3,4\nL2,1,2,north\n"),
        ErrorCase.Data("cells that are no numbers", Leases3 + "L1,1,2,north,3,4\nL2,1.5,n/a,north,3,4\nL3,2,5,south,\"1,200\",4\n"),
        ErrorCase.Data("a column twice", "loss," + Leases3 + "9,L1,1,2,north,3,4\n"),
        ErrorCase.Declared("rows that all lack a value", "response: loss", "response: {log: {of: loss, plus: -1000}}"),
    ];

    private static IEnumerable<ErrorCase> Places() =>
    [
        new("data outside the declaration's folder", ["models/lease.yaml"], folder => folder.With("models/lease.yaml", Leases.Declaration.Replace("leases.csv", "../leases.csv", StringComparison.Ordinal))),
        new("a link to data outside", ["models/lease.yaml"], folder =>
        {
            folder.With("models/lease.yaml", Leases.Declaration);
            File.CreateSymbolicLink(folder.At("models/leases.csv"), folder.At("leases.csv"));
        }),
        new("a link to a folder outside", ["models/lease.yaml"], folder =>
        {
            folder.With("models/lease.yaml", Leases.Declaration.Replace("leases.csv", "data/leases.csv", StringComparison.Ordinal)).With("shared/leases.csv", Leases.Csv());
            Directory.CreateSymbolicLink(folder.At("models/data"), folder.At("shared"));
        }),
        new("links in a circle", ["lease.yaml"], folder =>
        {
            File.Delete(folder.At("leases.csv"));
            File.CreateSymbolicLink(folder.At("leases.csv"), folder.At("leases.tsv"));
            File.CreateSymbolicLink(folder.At("leases.tsv"), folder.At("leases.csv"));
        }),
    ];

    private static IEnumerable<ErrorCase> PolicyAndRules() =>
    [
        ErrorCase.Of("no such policy", "lease.yaml", "--policy", "firm.yaml"),
        new("a folder as policy", ["lease.yaml", "--policy", "firm"], folder => folder.WithFolder("firm")),
        ErrorCase.File("an unknown name in the policy", "firm.yaml", "significence: 0.01\n", "lease.yaml", "--policy", "firm.yaml"),
        ErrorCase.File("a policy name that is half right", "firm.yaml", "negligible_partial_r2: 0.02\n", "lease.yaml", "--policy", "firm.yaml"),
        ErrorCase.File("a value that a policy cannot have", "firm.yaml", "significance: 5\n", "lease.yaml", "--policy", "firm.yaml"),
        ErrorCase.Of("no such rule folder", "lease.yaml", "--rules", "house"),
        new("an empty rule folder", ["rules", "--rules", "house"], folder => folder.WithFolder("house")),
        ErrorCase.File(
            "a misspelt fact",
            "house/own.yaml",
            "- id: own\n  about: exclusion\n  when: [{fact: p_ajusted, below: 0.05}]\n  severity: high\n  message: x\n  advice: y\n  source: common practice\n",
            "rules", "--rules", "house"),
        ErrorCase.File("a wrong policy beside a wrong declaration", "firm.yaml", "significence: 0.01\n", "leese.yaml", "--policy", "firm.yaml"),
    ];

    private static IEnumerable<ErrorCase> Acceptances() =>
    [
        ErrorCase.Of("no such acceptances", "lease.yaml", "--acceptances", "leases.yaml"),
        new("a folder as acceptances", ["lease.yaml", "--acceptances", "accepted"], folder => folder.WithFolder("accepted")),
        Accepted("empty acceptances", ""),
        Accepted("acceptances of another format", "acceptances: 2\naccept: []\n"),
        Accepted("a declaration as acceptances", Leases.Declaration),
        ErrorCase.Declared("acceptances named by the author", "response: loss", "response: loss\nacceptances: accepted.yaml"),
        Accepted(
            "every problem of acceptances at once",
            """
            acceptances: 1
            accept:
              - {rule: exclusion-inconlusive, subject: engine condition, model: lease-loss, version: 1, severity: medum, approved_by: R. Okafor,
                 approved_on: 2026-01-01, expires: 2026-12-31, because: Known.}
              - rule: acceptance-lapsed
                subject: "exclusion-inconclusive: engine condition"
                model: lease-loss
                version: 1
                severity: medium
                approved_by: "  "
                approved_on: 2026-02-30
                expries: 2026-12-31
                because:
              - {rule: rows-zero-weight, subject: lease-loss, model: lease-loss, version: 1, severity: note, worst: {p: 0.01, partial_r_squared: 2},
                 approved_by: R. Okafor, approved_on: 2026-06-01, expires: 2026-05-31, because: Known.}
              - {rule: exclusion-inconclusive, subject: age, model: lease-loss, version: 1, severity: medium, worst: {}, approved_by: R. Okafor,
                 approved_on: 2026-01-01, expires: 2026-12-31, because: Known.}
              - {rule: exclusion-inconclusive, subject: age, model: lease-loss, version: 1, severity: high, approved_by: R. Okafor,
                 approved_on: 2026-01-01, expires: 2026-12-31, because: Known twice.}
              - engine condition
            """),
        new("acceptances beside other problems", ["leese.yaml", "--policy", "firm.yaml", "--acceptances", "accepted.yaml"], _ => { }),
    ];

    private static ErrorCase Accepted(string title, string text) => ErrorCase.File(title, "accepted.yaml", text, "lease.yaml", "--acceptances", "accepted.yaml");
}
