using System.Globalization;
using System.IO.Compression;
using System.Text;
using Auditor.Numerics.Random;

namespace Auditor.Benchmarks;

/// <summary>
/// A file of made-up numbers and the declaration that goes with it: response y, numbers f1… of the final model, numbers z1… dealt out to the left-out
/// groups in turn. Same size and seed, same bytes.
/// </summary>
/// <param name="Columns">All columns p, the response included.</param>
/// <param name="Final">Numbers in the final model; the rest but the response are left out.</param>
/// <param name="Groups">Left-out groups; 0 to leave none out.</param>
/// <param name="MissingShare">Share of the cells of left-out columns that are empty.</param>
internal sealed record DataSet(int Rows, int Columns, int Final, int Groups, double MissingShare, ulong Seed)
{
    /// <summary>Rows are correlated within themselves by this share of a common number.</summary>
    private const double Common = 0.3;

    private int LeftOut => Columns - 1 - Final;

    public string[] Names =>
        ["y", .. Enumerable.Range(1, Final).Select(i => Name("f", i)), .. Enumerable.Range(1, LeftOut).Select(i => Name("z", i))];

    /// <summary>Writes NAME.csv (NAME.csv.gz) and NAME.yaml; returns the path of the data.</summary>
    public string Write(string folder, string name, bool gzip)
    {
        Directory.CreateDirectory(folder);
        var file = name + (gzip ? ".csv.gz" : ".csv");
        using (var stored = File.Create(Path.Combine(folder, file)))
        using (var bytes = gzip ? new GZipStream(stored, CompressionLevel.Fastest) : (Stream)stored)
        using (var text = new StreamWriter(bytes, new UTF8Encoding(false), 1 << 16))
        {
            text.Write(string.Join(',', Names) + "\n");
            WriteRows(text);
        }

        File.WriteAllText(Path.Combine(folder, name + ".yaml"), Declaration(name, file));
        return Path.Combine(folder, file);
    }

    private void WriteRows(StreamWriter text)
    {
        var random = new Generator(Seed, (ulong)Rows, (ulong)Columns);
        var row = new double[Columns];
        Span<char> cell = stackalloc char[32];
        for (var i = 0; i < Rows; i++)
        {
            Fill(row, random);
            for (var j = 0; j < Columns; j++)
            {
                var missing = j > Final && MissingShare > 0 && random.Uniform() < MissingShare;
                row[j].TryFormat(cell, out var length, j % 2 == 0 ? "F5" : "F4", CultureInfo.InvariantCulture);
                text.Write(missing ? [] : cell[..length]);
                text.Write(j + 1 < Columns ? ',' : '\n');
            }
        }
    }

    /// <summary>Normal numbers; the first left-out column has a small effect, and the errors' variance grows with it.</summary>
    private void Fill(double[] row, Generator random)
    {
        var common = random.Normal();
        for (var j = 1; j < row.Length; j++)
        {
            row[j] = (Common * common) + random.Normal();
        }

        var effect = LeftOut > 0 ? row[Final + 1] : 0;
        var y = 1 + (0.003 * effect);
        for (var j = 1; j <= Final; j++)
        {
            y += row[j] / (j + 1);
        }

        row[0] = y + (random.Normal() * Math.Exp(0.2 * effect));
    }

    private string Declaration(string name, string file)
    {
        var text = new StringBuilder($"audit: 1\nmodel: {{id: {name}, title: Made-up numbers, version: \"1\", prepared_by: generator}}\ndata: {{source: {file}}}\n");
        text.Append(CultureInfo.InvariantCulture, $"response: y\nfinal_model: {{terms: [{Listed("f", Enumerable.Range(1, Final))}]}}\n");
        text.Append(Groups > 0 ? "left_out:\n" : "");
        for (var g = 0; g < Groups; g++)
        {
            var columns = Enumerable.Range(1, LeftOut).Where(i => (i - 1) % Groups == g);
            text.Append(CultureInfo.InvariantCulture, $"  - {{group: g{g + 1}, terms: [{Listed("z", columns)}], because: Made up.}}\n");
        }

        return text.ToString();
    }

    private static string Listed(string letter, IEnumerable<int> numbers) => string.Join(", ", numbers.Select(i => Name(letter, i)));

    private static string Name(string letter, int i) => string.Create(CultureInfo.InvariantCulture, $"{letter}{i}");
}
