namespace Auditor.Data;

/// <summary>How a delimited text file is stored. Told by its name alone, never guessed from its content.</summary>
/// <param name="Separator">A comma or a tab.</param>
/// <param name="Gzip">Whether the bytes are compressed.</param>
public sealed record DelimitedFormat(char Separator, bool Gzip)
{
    /// <summary>The format of a name that ends in .csv, .tsv, .csv.gz or .tsv.gz, in any case; null for any other name.</summary>
    public static DelimitedFormat? FromFileName(string name)
    {
        var gzip = name.EndsWith(".gz", StringComparison.OrdinalIgnoreCase);
        return Path.GetExtension(gzip ? name[..^3] : name).ToUpperInvariant() switch
        {
            ".CSV" => new DelimitedFormat(',', gzip),
            ".TSV" => new DelimitedFormat('\t', gzip),
            _ => null,
        };
    }
}
