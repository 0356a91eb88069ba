namespace Auditor.Starting;

/// <summary>What a first declaration is made from, besides the data.</summary>
/// <param name="Id">The model's id.</param>
/// <param name="Source">The data file, relative to the declaration.</param>
/// <param name="Sha256">Of the data file.</param>
/// <param name="Response">The column to be explained.</param>
public sealed record StartRequest(string Id, string Source, string Sha256, string Response)
{
    private const int LongestId = 100;

    /// <summary>A model id made of a data file's name: its letters and digits, hyphens for everything between.</summary>
    public static string IdOf(string fileName)
    {
        var name = fileName.Split('.')[0];
        var letters = string.Concat(name.Select(c => char.IsAsciiLetterOrDigit(c) ? c : '-'));
        var id = string.Join('-', letters.Split('-', StringSplitOptions.RemoveEmptyEntries));
        return id.Length == 0 ? "model" : id[..Math.Min(id.Length, LongestId)].TrimEnd('-');
    }
}
