using Auditor.Declaration;

namespace Auditor.Tests.Declaration;

public sealed class SeveralProblemsTests
{
    private const string Wrong = """
        audit: 2
        model:
          id: tractor lease
          tilte: Loss rate
        data:
          source: leases.csv
          columns:
            region: {kind: level}
          keep:
            - {column: status, equals: closed, present: true}
        response: loss_rate
        final_model:
          terms:
            - price
            - log: {of: price, exponent: 2,
                plus: half}
            - price
          terms: [age]
        left_out:
          - group: engine
            terms: [hours, price]
          - terms: [hours]
            group: engine
        elimination:
          rule: {drop_above: 0.05}
          steps:
            - drop: engin
        ---
        audit: 1
        """;

    [Fact]
    public void All_are_named_by_line() => Assert.Equal(
        [
            "lease.yaml:1: audit: expected 1, the only version of this format, found '2'",
            "lease.yaml:3: model.id: expected 1 to 100 letters a to z, digits and hyphens, not starting with a hyphen, found 'tractor lease'",
            "lease.yaml:4: model: unknown key 'tilte'; did you mean 'title'?",
            "lease.yaml:8: data.columns.region.kind: expected number, levels, date or text, found 'level'; did you mean 'levels'?",
            "lease.yaml:10: data.keep: expected exactly one of equals, not, in, from/to or present, found equals, present",
            "lease.yaml:15: final_model.terms, log: unknown key 'exponent'; the keys are of, plus",
            "lease.yaml:16: final_model.terms, log.plus: expected a number, found 'half'",
            "lease.yaml:17: final_model.terms: the term 'price' stands twice, first on line 14",
            "lease.yaml:18: the key 'terms' stands twice, first on line 13",
            "lease.yaml:21: left_out \"engine\": the term 'price' is also in final_model.terms on line 14",
            "lease.yaml:22: left_out: the group 'engine' stands twice, first on line 20",
            "lease.yaml:22: left_out \"engine\": the term 'hours' stands twice, first on line 21",
            "lease.yaml:27: elimination.steps.drop: no left-out group is called 'engin'; did you mean 'engine'?",
            "lease.yaml:28: a second document starts here; expected one document a file",
        ],
        DeclarationReader.Read(Wrong, "lease.yaml").Problems.Select(problem => problem.ToString()));

    [Fact]
    public void Nothing_but_the_version_leaves_every_required_key_missing() => Assert.Equal(
        [
            "x.yaml:1: declaration: 'model' is missing; expected a map with the key id",
            "x.yaml:1: declaration: 'data' is missing; expected a map with the key source",
            "x.yaml:1: declaration: 'response' is missing; expected a column or a term that yields one number",
            "x.yaml:1: declaration: 'final_model' is missing; expected a map with the key terms",
        ],
        DeclarationReader.Read("audit: 1", "x.yaml").Problems.Select(problem => problem.ToString()));
}
