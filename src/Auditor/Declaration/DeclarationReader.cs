using Auditor.Yaml;

namespace Auditor.Declaration;

/// <summary>Reads a declaration and makes every check that needs no data. All problems are found in one go.</summary>
public static class DeclarationReader
{
    /// <summary>The only format version there is.</summary>
    private const string Version = "1";

    /// <param name="yaml">The text of the declaration.</param>
    /// <param name="file">Its name, for messages.</param>
    public static DeclarationReading Read(string yaml, string file)
    {
        var problems = new ProblemList(file);
        var columns = new ColumnNames();
        var data = new DataReader(columns);
        var root = YamlFile.Read(yaml, problems);
        var declaration = root is null ? null : Declaration(Place.Document(root, "declaration", problems), columns, data, file);
        return new DeclarationReading(problems.Any ? null : declaration, problems.InOrder, columns.InOrder, data.Sources);
    }

    private static ModelDeclaration? Declaration(Place root, ColumnNames columns, DataReader dataReader, string file)
    {
        if (Keys.Of(root, "audit", "model", "data", "response", "final_model", "left_out", "elimination", "reported") is not { } keys)
        {
            return null;
        }

        RequireVersion(keys);
        var model = keys.Required("model", "a map with the key id") is { } identity ? ModelReader.Read(identity) : null;
        var data = keys.Required("data", "a map with the key source") is { } described ? dataReader.Read(described) : null;
        var response = keys.Required("response", "a column or a term that yields one number") is { } explained
            ? new TermReader(columns, "response").ReadOneColumn(explained, "the response")
            : null;
        var final = keys.Required("final_model", "a map with the key terms") is { } stayed ? FinalModelReader.Read(stayed, columns) : null;
        var leftOut = keys.Optional("left_out") is { } dropped ? LeftOutReader.Read(dropped, columns) : [];
        TermClashes.Check(response, final, leftOut, root.Problems);
        TimeNeeds.Check(data, TermWalk.All(response, final, leftOut), root.Problems);
        var elimination = keys.Optional("elimination") is { } path ? EliminationReader.Read(path, final, leftOut) : null;
        var reported = keys.Optional("reported") is { } printed ? ReportedReader.Model(printed) : null;
        return model is null || data is null || response is null || final is null
            ? null
            : new ModelDeclaration(file, model, data, response, final, leftOut, elimination, reported);
    }

    private static void RequireVersion(Keys keys)
    {
        if (keys.Required("audit", "audit: 1, the version of this format") is { } version
            && version.Node is not TextValue { Text: Version })
        {
            version.Refuse("1, the only version of this format");
        }
    }
}
