namespace Auditor.Cli;

/// <summary>
/// Puts several files in place together: all are written under temporary names first, then renamed; when one cannot be put in place, what was
/// there before comes back.
/// </summary>
internal static class FilesTogether
{
    /// <summary>Null when all files are in place, else why none is.</summary>
    public static string? Put(string folder, IReadOnlyList<(string Path, byte[] Bytes)> files)
    {
        var mark = Guid.NewGuid().ToString("N");
        var placed = new List<string>();
        try
        {
            Directory.CreateDirectory(folder);
            foreach (var (path, bytes) in files)
            {
                File.WriteAllBytes(New(path, mark), bytes);
            }

            foreach (var (path, _) in files)
            {
                KeepCopy(path, mark);
                placed.Add(path);
                File.Move(New(path, mark), path, overwrite: true);
            }

            placed.ForEach(path => File.Delete(Old(path, mark)));
            return null;
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            placed.ForEach(path => PutBack(path, mark));
            foreach (var left in files.SelectMany(file => new[] { New(file.Path, mark), Old(file.Path, mark) }).Where(File.Exists))
            {
                File.Delete(left);
            }

            return fault.Message;
        }
    }

    private static string New(string path, string mark) => path + ".new-" + mark;

    private static string Old(string path, string mark) => path + ".old-" + mark;

    /// <summary>A copy, so that there is no moment without the file.</summary>
    private static void KeepCopy(string path, string mark)
    {
        if (Directory.Exists(path))
        {
            throw new IOException($"'{Path.GetFileName(path)}' is a folder there");
        }

        if (File.Exists(path))
        {
            File.Copy(path, Old(path, mark));
        }
    }

    private static void PutBack(string path, string mark)
    {
        if (File.Exists(Old(path, mark)))
        {
            File.Move(Old(path, mark), path, overwrite: true);
        }
        else
        {
            File.Delete(path);
        }
    }
}
