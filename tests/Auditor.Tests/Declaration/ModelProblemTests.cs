namespace Auditor.Tests.Declaration;

/// <summary>What is said about the head of a declaration, word by word. Each case puts one key of the least declaration in another way.</summary>
public sealed class ModelProblemTests
{
    public static readonly TheoryData<string[], string[]> Cases = new()
    {
        {
            ["audit: 2"],
            [
                "1: audit: expected 1, the only version of this format, found '2'",
            ]
        },
        {
            ["audit: [1]"],
            [
                "1: audit: expected 1, the only version of this format, found a list",
            ]
        },
        {
            ["audits: 1"],
            [
                "6: declaration: unknown key 'audits'; did you mean 'audit'?",
            ]
        },
        {
            ["title: x"],
            [
                "6: declaration: unknown key 'title'; the keys are audit, model, data, response, final_model, left_out, elimination, reported",
            ]
        },
        {
            ["model: {title: x}"],
            [
                "2: model: 'id' is missing; expected 1 to 100 letters a to z, digits and hyphens, not starting with a hyphen",
            ]
        },
        {
            ["model: {id: }"],
            [
                "2: model.id: expected 1 to 100 letters a to z, digits and hyphens, not starting with a hyphen, found nothing",
            ]
        },
        {
            ["model: {id: ../x}"],
            [
                "2: model.id: expected 1 to 100 letters a to z, digits and hyphens, not starting with a hyphen, found '../x'",
            ]
        },
        {
            ["model: {id: -x}"],
            [
                "2: model.id: expected 1 to 100 letters a to z, digits and hyphens, not starting with a hyphen, found '-x'",
            ]
        },
        {
            ["model: {id: a_b, titel: X, preparedby: Y}"],
            [
                "2: model: unknown key 'titel'; did you mean 'title'?",
                "2: model: unknown key 'preparedby'; did you mean 'prepared_by'?",
                "2: model.id: expected 1 to 100 letters a to z, digits and hyphens, not starting with a hyphen, found 'a_b'",
            ]
        },
        {
            ["model: {id: x, title: [a]}"],
            [
                "2: model.title: expected a text, found a list",
            ]
        },
        {
            ["model: lease"],
            [
                "2: model: expected a map with the keys id, title, version, prepared_by, found 'lease'",
            ]
        },
    };

    [Theory]
    [MemberData(nameof(Cases))]
    public void Every_problem_is_named_with_its_line(string[] declared, string[] problems) =>
        Assert.Equal(problems, Declared.Problems(declared));
}
