namespace Auditor.Cli;

/// <summary>Where a path leads once every link on the way is followed.</summary>
internal static class RealPath
{
    /// <summary>More links than this are taken for a circle, as the operating system does.</summary>
    private const int MostLinks = 40;

    /// <summary>The path without links; what does not exist is taken as it is written. Null when links run in a circle.</summary>
    public static string? Of(string path)
    {
        var links = 0;
        var full = Path.GetFullPath(path);
        var real = Path.GetPathRoot(full)!;
        var rest = new Stack<string>(Parts(full, real));
        while (rest.TryPop(out var part))
        {
            var next = part == ".." ? Path.GetDirectoryName(real) ?? real : Path.Combine(real, part);
            if (Target(next) is not { } target)
            {
                real = next;
                continue;
            }

            if (++links > MostLinks)
            {
                return null;
            }

            real = Path.IsPathRooted(target) ? Path.GetPathRoot(target)! : real;
            Array.ForEach(Parts(target, Path.GetPathRoot(target)!), rest.Push);
        }

        return real;
    }

    /// <summary>Whether a file lies in a folder or below it, links followed on both sides.</summary>
    public static bool Within(string path, string folder)
    {
        if (Of(path) is not { } real || Of(folder) is not { } realFolder)
        {
            return false;
        }

        var relative = Path.GetRelativePath(realFolder, real);
        return relative != ".." && !relative.StartsWith(".." + Path.DirectorySeparatorChar, StringComparison.Ordinal) && !Path.IsPathRooted(relative);
    }

    /// <summary>The names after the root, the last one first.</summary>
    private static string[] Parts(string path, string root) =>
        [.. path[root.Length..].Split([Path.DirectorySeparatorChar, Path.AltDirectorySeparatorChar], StringSplitOptions.RemoveEmptyEntries).Where(part => part != ".").Reverse()];

    /// <summary>What a link says, null for anything else.</summary>
    private static string? Target(string path) => new FileInfo(path).LinkTarget;
}
