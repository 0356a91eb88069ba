using Auditor.Data;
using Microsoft.Win32.SafeHandles;

namespace Auditor.Cli;

/// <summary>
/// A file for one column of a run. It has no name any more once it is open where the system allows that, so nothing is left behind however the run ends;
/// elsewhere it goes when it is closed.
/// </summary>
internal sealed class SpillFile : IRandomAccessBytes
{
    private readonly SafeFileHandle _handle;
    private readonly string _folder;

    private SpillFile(SafeFileHandle handle, string folder) => (_handle, _folder) = (handle, folder);

    public static SpillFile Create(string folder)
    {
        try
        {
            Directory.CreateDirectory(folder);
            var path = Path.Combine(folder, ".columns-" + Guid.NewGuid().ToString("N"));
            var handle = File.OpenHandle(path, FileMode.CreateNew, FileAccess.ReadWrite, FileShare.Delete, FileOptions.DeleteOnClose);
            if (!OperatingSystem.IsWindows())
            {
                File.Delete(path);
            }

            return new SpillFile(handle, folder);
        }
        catch (Exception fault) when (fault is IOException or UnauthorizedAccessException)
        {
            throw new SpillFault(folder, fault);
        }
    }

    public void Read(long at, Span<byte> into)
    {
        try
        {
            for (var done = 0; done < into.Length;)
            {
                var got = RandomAccess.Read(_handle, into[done..], at + done);
                done += got > 0 ? got : throw new EndOfStreamException("the file of a column ends too early");
            }
        }
        catch (IOException fault)
        {
            throw new SpillFault(_folder, fault);
        }
    }

    public void Write(long at, ReadOnlySpan<byte> bytes)
    {
        try
        {
            RandomAccess.Write(_handle, bytes, at);
        }
        catch (IOException fault)
        {
            throw new SpillFault(_folder, fault);
        }
    }

    public void Dispose() => _handle.Dispose();
}
